using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Bands;

/// <summary>
/// What compensation leaves at a place, told apart by group: means, covariances within a lot and over lots (each 3×3, in the order of
/// <see cref="ResidueGroup"/>), and the variances of carried noise and of the pressure standard. In %FS and (%FS)².
/// </summary>
internal sealed record ResidueShares(double[] Means, double[,] Within, double[,] LongRun, double Carried, double Standard)
{
    private static readonly (ErrorTerm Term, ResidueGroup Group)[] Groups =
    [
        (ErrorTerm.ZeroResidue, ResidueGroup.Zero),
        (ErrorTerm.SpanResidue, ResidueGroup.Span),
        (ErrorTerm.LinearityResidue, ResidueGroup.Linearity),
    ];

    /// <summary><c>μ</c>.</summary>
    public double Mean => Means.Sum();

    /// <summary>Variance within a lot of all that comes through the correction, its noise and the standard included.</summary>
    public double VarianceWithin => SumOf(Within) + Carried + Standard;

    /// <summary>The same over lots.</summary>
    public double VarianceLongRun => SumOf(LongRun) + Carried + Standard;

    /// <summary>The shares of a residue.</summary>
    public static ResidueShares Of(Correction correction, Residue residue, Station station)
    {
        var within = new double[3, 3];
        var longRun = new double[3, 3];
        foreach ((_, ResidueGroup a) in Groups)
            foreach ((_, ResidueGroup b) in Groups)
            {
                double least = a == b ? 0 : double.NegativeInfinity;
                double units = Math.Max(least, correction.CovarianceWithin(residue, a, b));
                double lots = Math.Max(least, correction.CovarianceOfLots(residue, a, b));
                within[(int)a, (int)b] = units;
                longRun[(int)a, (int)b] = units + lots;
            }

        return new ResidueShares(
            [.. Groups.Select(g => correction.Mean(residue, g.Group))],
            within, longRun, correction.CarriedVariance(residue), correction.StandardVariance(residue, station));
    }

    /// <summary>A perfect correction: nothing left, no noise carried, only the standard, <c>u_0² + u_1²x²</c>.</summary>
    public static ResidueShares Perfect(Station station, double x)
    {
        double zero = station.StandardZero.Percent, proportional = station.StandardProportional.Percent * x;
        return new ResidueShares(new double[3], new double[3, 3], new double[3, 3], 0, (zero * zero) + (proportional * proportional));
    }

    /// <summary>The five terms that come through the correction, in the order of <see cref="ErrorTerm.Usual"/>.</summary>
    public IEnumerable<TermShare> Terms()
    {
        foreach ((ErrorTerm term, ResidueGroup group) in Groups)
        {
            int i = (int)group;
            yield return Share(term, Math.Abs(Means[i]), Math.Sqrt(Within[i, i]), Math.Sqrt(LongRun[i, i]));
        }

        yield return Share(ErrorTerm.CarriedNoise, 0, Math.Sqrt(Carried), Math.Sqrt(Carried));
        yield return Share(ErrorTerm.PressureStandard, 0, Math.Sqrt(Standard), Math.Sqrt(Standard));
    }

    private static TermShare Share(ErrorTerm term, double added, double within, double longRun) =>
        new(term, PercentOfSpan.FromPercent(added), PercentOfSpan.FromPercent(within), PercentOfSpan.FromPercent(longRun));

    private static double SumOf(double[,] covariance)
    {
        double sum = 0;
        foreach (double c in covariance)
            sum += c;
        return Math.Max(0, sum);
    }
}
