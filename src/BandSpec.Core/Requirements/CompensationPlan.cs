using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>Where a unit is read for compensation, and the degrees of the correction fitted to those readings.</summary>
/// <param name="Temperatures">Plan temperatures, rising, at least two.</param>
/// <param name="ZeroDegree">Degree in temperature of the zero correction, <c>d_z</c>.</param>
/// <param name="SpanDegree">Degree in temperature of the span correction, <c>d_s</c>.</param>
/// <param name="Points">Every reading point, in the order of the chamber run: coldest first, pressures rising.</param>
public sealed record CompensationPlan(
    IReadOnlyList<Temperature> Temperatures, int ZeroDegree, int SpanDegree, IReadOnlyList<PlanPoint> Points)
{
    /// <summary>
    /// The plan with the station's pressures: the <c>reference</c> list at the plan temperature nearest the requirement's reference
    /// temperature, the colder one on a tie; the <c>others</c> list elsewhere.
    /// </summary>
    /// <param name="temperatures">Plan temperatures, rising.</param>
    /// <param name="zeroDegree">Degree of the zero correction.</param>
    /// <param name="spanDegree">Degree of the span correction.</param>
    /// <param name="reference">The requirement's reference temperature <c>T_r</c>.</param>
    /// <param name="pressures">The station's pressure lists.</param>
    public static CompensationPlan Of(
        IReadOnlyList<Temperature> temperatures, int zeroDegree, int spanDegree, Temperature reference, PressureLists pressures)
    {
        ArgumentNullException.ThrowIfNull(temperatures);
        ArgumentNullException.ThrowIfNull(pressures);
        return new CompensationPlan(temperatures, zeroDegree, spanDegree, PointsAt(temperatures, reference, pressures));
    }

    /// <summary>Whether another plan has the same temperatures and degrees.</summary>
    /// <param name="other">The other plan.</param>
    public bool IsLike(CompensationPlan other)
    {
        ArgumentNullException.ThrowIfNull(other);
        return (ZeroDegree, SpanDegree) == (other.ZeroDegree, other.SpanDegree) && Temperatures.SequenceEqual(other.Temperatures);
    }

    /// <summary>The temperature of a list that is nearest the reference temperature, the colder one on a tie.</summary>
    public static Temperature NearestTo(Temperature reference, IEnumerable<Temperature> temperatures) =>
        temperatures.Order().MinBy(t => Math.Abs((t - reference).Kelvin));

    private static List<PlanPoint> PointsAt(IReadOnlyList<Temperature> temperatures, Temperature reference, PressureLists pressures)
    {
        Temperature nearest = NearestTo(reference, temperatures);
        return [.. temperatures.SelectMany(t => pressures.At(t == nearest).Select(x => new PlanPoint(t, x)))];
    }
}

/// <summary>One reading point of a plan.</summary>
/// <param name="Temperature">Chamber temperature.</param>
/// <param name="PressureFraction">Applied pressure as a fraction of the span.</param>
public sealed record PlanPoint(Temperature Temperature, double PressureFraction);
