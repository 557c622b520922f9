using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// How a unit's error moves with independent standard normal numbers, to first order: found by moving one source at a time through the very
/// compensation run that makes the virtual lots. Only unsettled temperature is not linear there (it acts through the unit's own slope); it
/// enters with its variance. The coefficients left over have one covariance, whose factor is all that remains of the many sources.
/// </summary>
internal sealed class LinearUnit
{
    private readonly ShapePlaces places;
    private readonly double[][] rows;

    /// <summary>The unit of a law, its lot drawn with it.</summary>
    public LinearUnit(LotLaw law)
    {
        places = law.Places;
        List<double[]> raw = [.. law.RawError.Sources(places.Count)];
        List<double[]> left = [.. raw.Select(law.Run.LeftOf)];
        left.AddRange(law.Run.CarriedSources(law.RawError.NominalCoefficients(places.Count), raw));
        rows = SemidefiniteFactor.RowsOf(Covariance(left));
    }

    /// <summary>How many independent numbers are behind what compensation leaves over.</summary>
    public int Dimensions => rows.Length;

    /// <summary>What each of them does to the error at a place.</summary>
    public void WeightsAt(in ShapeValues shapes, double tau, Span<double> weights)
    {
        Lanes[] coefficients = new Lanes[places.Count];
        for (int row = 0; row < rows.Length; row++)
        {
            for (int p = 0; p < coefficients.Length; p++)
                coefficients[p] = Vector512.Create(rows[row][p]);
            weights[row] = places.At(coefficients, 1, shapes, Vector512.Create(tau)).ToScalar();
        }
    }

    private double[,] Covariance(List<double[]> sources)
    {
        double[,] covariance = new double[places.Count, places.Count];
        foreach (double[] source in sources)
            for (int i = 0; i < source.Length; i++)
                for (int j = 0; j < source.Length; j++)
                    covariance[i, j] += source[i] * source[j];
        return covariance;
    }
}
