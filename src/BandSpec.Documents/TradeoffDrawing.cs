using System.Text;
using BandSpec.Core.Planning;
using BandSpec.Core.Specifying;
using BandSpec.Documents.Charts;
using BandSpec.Documents.Printing;
using BandSpec.Documents.Templates;

namespace BandSpec.Documents;

/// <summary>Draws what more money buys. The same arguments give the same bytes.</summary>
public static class TradeoffDrawing
{
    /// <summary>The fronts as an SVG file.</summary>
    /// <param name="found">The alternatives, at least one.</param>
    /// <param name="options">Language and templates of words.</param>
    public static ReadOnlyMemory<byte> Draw(PlanAlternatives found, DocumentOptions options)
    {
        ArgumentNullException.ThrowIfNull(found);
        ArgumentNullException.ThrowIfNull(options);
        var words = Words.Load(new TemplateSources(options.Templates), options.Language);
        var sign = words.Plain("decimal-sign");
        (string, object)[] about =
        [
            ("currency", found.Application.Station.Chamber.HourlyRate.Currency),
            ("number", found.Application.Requirement.Identity.Number), ("revision", found.Application.Requirement.Identity.Revision),
            ("plans", found.ByMargin.Count), ("cheapest", Money(found.ByMargin[0], sign)), ("dearest", Money(found.ByMargin[^1], sign)),
            ("least", Margin(found.ByMargin[0], sign)), ("most", Margin(found.ByMargin[^1], sign)),
            ("considered", new Rounded(found.Fronts.PlansConsidered.ToString(System.Globalization.CultureInfo.InvariantCulture)).Shown(sign)),
        ];
        string Word(string key) => words.Plain(key, about);
        var taken = found.Pinned ?? found.Optimum;
        var chart = new FrontChart(
            new(
                Word("axis.cost"), Word("axis.margin"), Word("axis.rms"), Word("key.best"), Word("key.fits"), Word("key.short"),
                Word(found.Pinned is null ? "key.optimum" : "key.pinned"), Word("key.needed")),
            [.. found.ByMargin.Select(one => Spot(one, one.Point.Margin))], [.. found.ByRmsError.Select(one => Spot(one, one.Point.RmsError))],
            new(taken.Run.CostPerUnit, taken.ContinuousMargin)) { DecimalSign = sign };
        return Encoding.UTF8.GetBytes(SvgPen.Draw(chart, Word("tradeoff.title"), Word("tradeoff.text")));
    }

    private static FrontSpot Spot(PlanAlternative one, double figure) => new(
        one.Point.CostPerUnit, figure, one.Point.Margin >= 1 - PlanChoice.Shortfall, one.Number.ToString(System.Globalization.CultureInfo.InvariantCulture));

    private static string Money(PlanAlternative one, string sign) => Rounded.Nearest(one.Point.CostPerUnit, 2).Shown(sign);

    private static string Margin(PlanAlternative one, string sign) => Rounded.Down(one.Point.Margin, 0.001).Shown(sign);
}
