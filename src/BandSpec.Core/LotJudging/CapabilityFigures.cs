using BandSpec.Core.Numerics;

namespace BandSpec.Core.LotJudging;

/// <summary>
/// Capability of one characteristic by the normal law: Cp and Cpk from the scatter within lots, or Pp and Ppk from that within and between them. Limits are
/// two-sided, ±tolerance; an index is infinite when no value differs from another.
/// </summary>
/// <param name="Deviation">The standard deviation it is counted with, %FS.</param>
/// <param name="DegreesOfFreedom">Its degrees of freedom.</param>
/// <param name="EffectiveReadings">How many independent values would fix the mean as well; fewer than were read when lots differ.</param>
/// <param name="Spread">Cp or Pp: tolerance over six standard deviations.</param>
/// <param name="SpreadLower">95 % lower limit of it, by chi-square.</param>
/// <param name="Nearer">Cpk or Ppk: distance of the mean to the nearer limit over three standard deviations.</param>
/// <param name="NearerLower">
/// 95 % lower limit of it by the noncentral t, which is the exact law of Cpk where the process is placed least favourably: it never claims too much.
/// </param>
/// <param name="NearerUpper">95 % upper limit, likewise.</param>
/// <param name="NearerLowerHere">95 % lower limit of it by the exact law, the process taken to be off the middle as far as it was seen.</param>
/// <param name="Outside">Fraction outside the tolerance that the normal law expects.</param>
public sealed record CapabilityFigures(
    double Deviation, double DegreesOfFreedom, double EffectiveReadings, double Spread, double SpreadLower,
    double Nearer, double NearerLower, double NearerUpper, double NearerLowerHere, double Outside)
{
    /// <summary>Confidence of every limit.</summary>
    public const double Confidence = 0.95;

    internal static CapabilityFigures Of(double mean, double deviation, double freedom, double count, Interval tolerance)
    {
        if (deviation == 0)
        {
            double only = tolerance.Contains(mean) ? double.PositiveInfinity : double.NegativeInfinity;
            return new(0, freedom, count, double.PositiveInfinity, double.PositiveInfinity, only, only, only, only, only > 0 ? 0 : 1);
        }

        Interval z = tolerance.Standardize(mean, deviation);
        double spread = z.Width / 6, nearer = Math.Min(z.Upper, -z.Lower) / 3, offCentre = (z.Upper + z.Lower) / 2;
        return new(deviation, freedom, count, spread, CapabilityLaw.SpreadLimit(spread, freedom, Confidence), nearer,
            CapabilityLaw.OneSidedLimit(nearer, count, freedom, Confidence),
            CapabilityLaw.OneSidedLimit(nearer, count, freedom, 1 - Confidence),
            CapabilityLaw.TwoSidedLimit(nearer, offCentre, count, freedom, Confidence),
            NormalDistribution.UpperTail(z.Upper) + NormalDistribution.Cumulative(z.Lower));
    }
}
