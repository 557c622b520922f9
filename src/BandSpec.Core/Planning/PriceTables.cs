using BandSpec.Core.Numerics;
using MathNet.Numerics.LinearAlgebra;

namespace BandSpec.Core.Planning;

/// <summary>What prices need to know of the candidates, for one form of correction.</summary>
internal sealed class PriceTables
{
    private readonly SearchTables tables;
    private readonly Reading[][] reference;
    private readonly Reading[][] others;

    public PriceTables(SearchTables tables, int zeroDegree, int spanDegree)
    {
        this.tables = tables;
        Basis = new PriceBasis(tables.Raw, tables.RowsOf(zeroDegree, spanDegree).Form);
        reference = [.. tables.Candidates.Select(c => tables.Reference.Select((p, i) => new Reading(Basis.At(p.Fraction, c.Place.Tau), c.ReferenceSigmas[i])).ToArray())];
        others = [.. tables.Candidates.Select(c => tables.Others.Select((p, i) => new Reading(Basis.At(p.Fraction, c.Place.Tau), c.OtherSigmas[i])).ToArray())];
    }

    /// <summary>The terms that functions are made of.</summary>
    public PriceBasis Basis { get; }

    /// <summary>Whether every reading has noise: without, a price would be infinite.</summary>
    public bool HaveNoise => reference.Concat(others).All(c => c.All(r => r.Sigma > 0));

    /// <summary><c>A = Σ b bᵀ/v</c> over the readings of a list.</summary>
    public Matrix<double> InformationOf(int[] list)
    {
        var sum = Matrix<double>.Build.Dense(Basis.Count, Basis.Count);
        int nearest = tables.NearestIn(list);
        for (int place = 0; place < list.Length; place++)
            foreach (Reading reading in (place == nearest ? reference : others)[list[place]])
                for (int i = 0; i < Basis.Count; i++)
                    for (int j = 0; j < Basis.Count; j++)
                        sum[i, j] += reading.Basis[i] * reading.Basis[j] / (reading.Sigma * reading.Sigma);
        return sum;
    }

    /// <summary>The cut of a sum of squared functions <c>bᵀ Z b</c>: its price at a reading is <c>bᵀ Z b/v</c>.</summary>
    public PriceCut CutOf(double[,] squares, double debt)
    {
        double Pay(Reading[] readings) => readings.Sum(r => Vectors.Form(r.Basis, squares, r.Basis) / (r.Sigma * r.Sigma));
        double[] prices = [.. others.Select(Pay)];
        return new PriceCut(prices, [.. reference.Select((r, i) => Pay(r) - prices[i])], debt);
    }

    /// <summary>What a list pays for one function, <c>Σ h²/v</c> over its readings.</summary>
    public double PaidBy(int[] list, double[] eta)
    {
        double sum = 0;
        int nearest = tables.NearestIn(list);
        for (int place = 0; place < list.Length; place++)
            foreach (Reading reading in (place == nearest ? reference : others)[list[place]])
            {
                double ratio = Vectors.Dot(eta, reading.Basis) / reading.Sigma;
                sum += ratio * ratio;
            }

        return sum;
    }

    /// <summary>One reading of a candidate: <c>b</c> and the standard deviation <c>√v</c>.</summary>
    private sealed record Reading(double[] Basis, double Sigma);
}
