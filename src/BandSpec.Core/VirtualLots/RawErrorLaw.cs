using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics.RandomStreams;
using BandSpec.Core.Requirements;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>How the coefficients of the raw error scatter: a lot shifts all its units, each unit shifts about its lot.</summary>
internal sealed class RawErrorLaw
{
    private readonly int[] places;
    private readonly double[] means;
    private readonly double[] sigmas;
    private readonly double[] lotSigmas;
    private readonly FactorEntry[][] factor;

    /// <summary>The law of a platform, its coefficients put at the given places.</summary>
    public RawErrorLaw(Platform platform, ShapePlaces where)
    {
        places = [.. platform.RawError.Select(c => where.Of(c.Name.Shape, c.Name.Degree))];
        means = [.. platform.RawError.Select(c => c.Mean)];
        sigmas = [.. platform.RawError.Select(c => c.Sigma)];
        lotSigmas = [.. platform.RawError.Select(c => c.LotSigma)];
        factor = CorrelationFactor.Rows(platform.RawError, platform.Correlations);
    }

    /// <summary>How many coefficients scatter.</summary>
    public int Count => places.Length;

    /// <summary>Every number of the law, to tell one law from another.</summary>
    public IEnumerable<double> Numbers =>
        places.Select(p => (double)p).Concat(means).Concat(sigmas).Concat(lotSigmas).Concat(factor.SelectMany(r => r).Select(e => e.Weight + e.Column));

    /// <summary>The mean coefficients of one lot.</summary>
    public void DrawLot(RandomStream stream, ulong lot, Span<double> lotMeans)
    {
        Lanes[] normals = new Lanes[Count];
        stream.FillNormals(Vector512.Create(lot), 0, normals);
        for (int j = 0; j < Count; j++)
            lotMeans[j] = means[j] + (lotSigmas[j] * Correlated(normals, j).ToScalar());
    }

    /// <summary>The mean coefficients of all production.</summary>
    public void Nominal(Span<double> lotMeans) => means.CopyTo(lotMeans);

    /// <summary>The mean coefficients of all production, each at its place.</summary>
    /// <param name="count">How many places there are.</param>
    public double[] NominalCoefficients(int count) => AtPlaces(means, count);

    /// <summary>
    /// What each of independent standard normal numbers does to the coefficients of a unit whose lot is drawn with it: units and lots scatter
    /// independently, with the same correlations.
    /// </summary>
    /// <param name="count">How many places there are.</param>
    public IEnumerable<double[]> Sources(int count)
    {
        foreach (double[] scatter in new[] { sigmas, lotSigmas })
            for (int column = 0; column < Count; column++)
            {
                double[] source = [.. factor.Select((row, j) => scatter[j] * row.FirstOrDefault(e => e.Column == column).Weight)];
                if (source.Any(v => v != 0))
                    yield return AtPlaces(source, count);
            }
    }

    private double[] AtPlaces(double[] coefficients, int count)
    {
        double[] result = new double[count];
        for (int j = 0; j < places.Length; j++)
            result[places[j]] = coefficients[j];
        return result;
    }

    /// <summary>The coefficients of eight units of a lot.</summary>
    /// <param name="lotMeans">The lot's means, <see cref="Count"/> of them.</param>
    /// <param name="normals">Independent standard normal numbers, as many; zeros for the lot's mean unit.</param>
    /// <param name="raw">All places of the error; those without a coefficient become 0.</param>
    public void Unit(ReadOnlySpan<double> lotMeans, ReadOnlySpan<Lanes> normals, Span<Lanes> raw)
    {
        raw.Clear();
        for (int j = 0; j < places.Length; j++)
            raw[places[j]] = Vector512.FusedMultiplyAdd(Vector512.Create(sigmas[j]), Correlated(normals, j), Vector512.Create(lotMeans[j]));
    }

    private Lanes Correlated(ReadOnlySpan<Lanes> normals, int j)
    {
        Lanes sum = Lanes.Zero;
        foreach (FactorEntry entry in factor[j])
            sum = Vector512.FusedMultiplyAdd(Vector512.Create(entry.Weight), normals[entry.Column], sum);
        return sum;
    }
}
