using System.Globalization;
using BandSpec.Core.Quantities;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.LotJudging;

/// <summary>
/// A figure that is a weighted sum of one unit's errors, such as the thermal zero shift at one temperature. Each place is a figure of its own,
/// because the worst of several is not normally distributed and one of them alone is.
/// </summary>
/// <param name="Name">What is derived, as in <see cref="LotDerivedLimit.Name"/>.</param>
/// <param name="Place">Where: temperature, and pressure fraction where it matters.</param>
/// <param name="Terms">Index of a point and the weight of its error.</param>
/// <param name="Limit">The magnitude that may not be exceeded.</param>
internal sealed record DerivedFigure(string Name, string Place, (int Point, double Weight)[] Terms, PercentOfSpan Limit)
{
    /// <summary>The figure of one unit in %FS, from its errors by point; NaN as soon as one it needs is missing (NaN).</summary>
    public double Of(ReadOnlySpan<float> errors)
    {
        double sum = 0;
        foreach ((int point, double weight) in Terms)
            sum += weight * errors[point];
        return sum;
    }

    /// <summary>Every figure that the limits name and the points can give.</summary>
    public static IReadOnlyList<DerivedFigure> AllOf(LotLimits limits) => new DerivedFigures(limits).All();
}

/// <summary>Works out which points each derived figure is made of.</summary>
internal sealed class DerivedFigures
{
    private readonly LotLimits limits;
    private readonly Temperature reference;

    public DerivedFigures(LotLimits limits)
    {
        this.limits = limits;
        reference = limits.ReferenceTemperature is { } wanted
            ? Temperatures.MinBy(t => Math.Abs((t - wanted).Kelvin))
            : limits.Points.GroupBy(p => p.Temperature).MaxBy(group => group.Count())!.Key;
    }

    private IEnumerable<Temperature> Temperatures => limits.Points.Select(p => p.Temperature).Distinct();

    public IReadOnlyList<DerivedFigure> All() => [.. limits.DerivedLimits.SelectMany(FiguresOf)];

    private IEnumerable<DerivedFigure> FiguresOf(LotDerivedLimit limit)
    {
        IEnumerable<(string Place, (int, double)[]? Terms)> figures = limit.Name switch
        {
            "zero" => [(At(reference), Zero(reference))],
            "span" => [(At(reference), Span(reference))],
            "non-linearity" => Fractions(reference).Select(x => (At(reference, x), NonLinearity(x))),
            "hysteresis" => Temperatures.SelectMany(t => Fractions(t).Select(x => (At(t, x), Hysteresis(t, x)))),
            "thermal-zero-shift" => Region(limit).Select(t => (At(t), Difference(Zero(t), Zero(reference)))),
            "thermal-span-shift" => Region(limit).Select(t => (At(t), Difference(Span(t), Span(reference)))),
            _ => [],
        };
        return from figure in figures
               where figure.Terms is not null
               select new DerivedFigure(limit.Name, figure.Place, figure.Terms, limit.Limit);
    }

    /// <summary>The pressure fractions strictly inside the range at which a temperature is tested.</summary>
    private IEnumerable<double> Fractions(Temperature t) =>
        limits.Points.Where(p => p.Temperature == t && p.PressureFraction is > 0 and < 1).Select(p => p.PressureFraction).Distinct();

    private IEnumerable<Temperature> Region(LotDerivedLimit limit) =>
        Temperatures.Where(t => t != reference && (limit.From is not { } from || t >= from) && (limit.To is not { } to || t <= to));

    private (int, double)[]? Zero(Temperature t) => Average(t, 0);

    private (int, double)[]? Span(Temperature t) => Difference(Average(t, 1), Average(t, 0));

    /// <summary>Deviation from the line through both terminals (IEC 61298-2).</summary>
    private (int, double)[]? NonLinearity(double x) =>
        Difference(Difference(Average(reference, x), Scaled(Average(reference, 0), 1 - x)), Scaled(Average(reference, 1), x));

    private (int, double)[]? Hysteresis(Temperature t, double x) =>
        Difference(Average(t, x, PressureDirection.Falling), Average(t, x, PressureDirection.Rising));

    /// <summary>The mean of the readings of both directions, from which errors are counted so that hysteresis does not enter.</summary>
    private (int, double)[]? Average(Temperature t, double x, PressureDirection? only = null)
    {
        int[] points = [.. Enumerable.Range(0, limits.Points.Count).Where(i => limits.Points[i] is var p
            && p.Temperature == t && p.PressureFraction == x && (only is null || p.Direction == only))];
        return points.Length == 0 ? null : [.. points.Select(point => (point, 1.0 / points.Length))];
    }

    private static (int, double)[]? Scaled((int Point, double Weight)[]? terms, double factor) =>
        terms is null ? null : [.. terms.Select(term => (term.Point, factor * term.Weight))];

    private static (int, double)[]? Difference((int, double)[]? a, (int, double)[]? b) =>
        a is null || b is null ? null : [.. a, .. Scaled(b, -1)!];

    private static string At(Temperature t) => t.ToString();

    private static string At(Temperature t, double x) => string.Create(CultureInfo.InvariantCulture, $"{t}, x = {x:0.###}");
}
