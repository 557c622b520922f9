using System.Globalization;
using BandSpec.Core.Specifying;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Revisions;

/// <summary>
/// A point of the verification test whose limits changed: the same place in both records, whatever the point is called there. Its figures are
/// also among <see cref="Comparison.Outcome"/>; here they are told together.
/// </summary>
/// <param name="Place">Temperature, pressure as a part of the span, and direction.</param>
/// <param name="Old">The point in the older record; <see langword="null"/> when nothing was tested there.</param>
/// <param name="New">The point in the newer record; <see langword="null"/> when nothing is tested there any more.</param>
public sealed record PointChange(string Place, VerificationPoint? Old, VerificationPoint? New)
{
    /// <summary>Seven digits tell any two steps of a 20-bit output apart.</summary>
    private const int Digits = 7;

    /// <summary>What the change means for production: neutral when one limit becomes tighter and the other looser.</summary>
    public Bearing ForProduction { get; private init; }

    /// <summary>What the change means for the customer, told by the tolerance.</summary>
    public Bearing ForCustomer { get; private init; }

    /// <summary>
    /// The acceptance intervals to be shown side by side, in the unit of each record's output; <see langword="null"/> for a point that is not
    /// there. The exact limits are among <see cref="Comparison.Outcome"/>.
    /// </summary>
    public (string? Old, string? New) Shown { get; private init; }

    /// <summary>The changed points in the order of the newer test; those that are gone follow.</summary>
    internal static IReadOnlyList<PointChange> Between(Specification old, Specification now, IReadOnlyList<FigureChange> outcome)
    {
        Dictionary<string, VerificationPoint> before = ByPlace(old), after = ByPlace(now);
        string oldUnit = old.Application.Requirement.Output.Unit, unit = now.Application.Requirement.Output.Unit;
        return
        [
            .. from change in outcome
               where change.Subject == FigureSubject.Verification
               group change by change.Place into figures
               let then = before.GetValueOrDefault(figures.Key)
               let today = after.GetValueOrDefault(figures.Key)
               select new PointChange(figures.Key, then, today)
               {
                   Shown = (Interval(then, oldUnit), Interval(today, unit)),
                   ForProduction = Together(figures.Where(f => f.Name is VerificationFigures.LowerLimit or VerificationFigures.UpperLimit).Select(f => f.ForProduction)),
                   ForCustomer = Together(figures.Select(f => f.Name == VerificationFigures.Tolerance ? f.ForCustomer : Bearing.Neutral)),
               },
        ];
    }

    /// <summary>Where a point is, in words.</summary>
    internal static string PlaceOf(VerificationPoint point) => string.Create(
        CultureInfo.InvariantCulture, $"{point.Temperature}, {100 * point.PressureFraction} % of span, {Words.Of(point.Direction)}");

    private static string? Interval(VerificationPoint? point, string unit)
    {
        if (point is null)
            return null;
        string[] ends = ShownFigures.WithDigits(Digits, point.Lower, point.Upper);
        return $"{ends[0]} … {ends[1]} {unit}";
    }

    private static Dictionary<string, VerificationPoint> ByPlace(Specification specification) => specification.VerificationPoints
        .GroupBy(PlaceOf).ToDictionary(points => points.Key, points => points.First());

    private static Bearing Together(IEnumerable<Bearing> bearings)
    {
        Bearing[] told = [.. bearings.Where(b => b != Bearing.Neutral).Distinct()];
        return told.Length == 1 ? told[0] : Bearing.Neutral;
    }
}
