using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>
/// The allowed error in one temperature region: constant, or running linearly from <see cref="Limit"/> at the colder end to
/// <see cref="LimitAtEnd"/> at the hotter; never below <see cref="OfReading"/> of the pressure at hand.
/// </summary>
/// <param name="From">The colder end, which belongs to the region.</param>
/// <param name="To">The hotter end, which belongs to the region.</param>
/// <param name="Limit">Allowed error at the colder end.</param>
/// <param name="LimitAtEnd">Allowed error at the hotter end; <see langword="null"/> for the same as at the colder.</param>
/// <param name="OfReading">A ratio of the reading that is allowed where it is larger: 0.02 for 2 %; 0 for none.</param>
public sealed record AllowedErrorRegion(Temperature From, Temperature To, PercentOfSpan Limit, PercentOfSpan? LimitAtEnd, double OfReading)
{
    /// <summary>
    /// The allowed error <c>A(x,T)</c> in %FS: the larger of the line between the ends and <c>100·OfReading·|p|/span</c>.
    /// </summary>
    /// <param name="temperature">A temperature inside the region.</param>
    /// <param name="magnitude">The size of the pressure as a part of the span, <see cref="PressureRange.MagnitudeAt"/>.</param>
    public double At(Temperature temperature, double magnitude) => Math.Max(LimitAlong(temperature), 100 * OfReading * magnitude);

    private double LimitAlong(Temperature temperature)
    {
        double width = (To - From).Kelvin;
        if (LimitAtEnd is not { } end || width <= 0)
            return Limit.Percent;
        double along = (temperature - From).Kelvin / width;
        return ((1 - along) * Limit.Percent) + (along * end.Percent);
    }
}
