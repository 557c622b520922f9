using System.Globalization;
using System.Text;
using BandSpec.Documents.Charts;
using BandSpec.Documents.Printing;
using BandSpec.Documents.Templates;

namespace BandSpec.Documents;

/// <summary>One value of a sweep with what it led to.</summary>
/// <param name="Value">The value that was tried.</param>
/// <param name="Margin">Margin of the plan chosen for it.</param>
/// <param name="Yield">Share of units that the verification test accepted, 0 … 1.</param>
/// <param name="Chance">Probability that a unit leaves the allowed error anywhere, 0 … 1.</param>
public sealed record SweepPlace(double Value, double Margin, double Yield, double Chance);

/// <summary>Draws what one figure does to margin, yield and chance of leaving. The same arguments give the same bytes.</summary>
public static class SweepDrawing
{
    /// <summary>The sweep as an SVG file.</summary>
    /// <param name="path">The path of the figure that was changed, such as <c>safety-factor</c>.</param>
    /// <param name="places">What was tried, rising; at least one.</param>
    /// <param name="options">Language and templates of words.</param>
    /// <exception cref="ArgumentException">There is no place.</exception>
    public static ReadOnlyMemory<byte> Draw(string path, IReadOnlyList<SweepPlace> places, DocumentOptions options)
    {
        ArgumentNullException.ThrowIfNull(places);
        ArgumentNullException.ThrowIfNull(options);
        if (places.Count == 0)
            throw new ArgumentException("a sweep of nothing has no picture", nameof(places));
        var words = Words.Load(new TemplateSources(options.Templates), options.Language);
        var sign = words.Plain("decimal-sign");
        (string, object)[] about =
        [
            ("path", path), ("values", places.Count), ("from", Shown(places[0].Value, sign)), ("to", Shown(places[^1].Value, sign)),
            ("margin_from", Rounded.Down(places[0].Margin, 0.001).Shown(sign)), ("margin_to", Rounded.Down(places[^1].Margin, 0.001).Shown(sign)),
        ];
        string Word(string key) => words.Plain(key, about);
        var chart = new SweepChart(
            new(
                path, Word("axis.margin"), Word("axis.yield"), Word("axis.chance"), Word("key.closed-form"), Word("key.counted"), Word("key.sampled"),
                Word("key.needed")),
            [.. places.Select(p => new Spot(p.Value, p.Margin))], [.. places.Select(p => new Spot(p.Value, 100 * p.Yield))],
            [.. places.Select(p => new Spot(p.Value, p.Chance))]) { DecimalSign = sign };
        return Encoding.UTF8.GetBytes(SvgPen.Draw(chart, Word("sweep.title"), Word("sweep.text")));
    }

    private static string Shown(double value, string sign) => new Rounded(value.ToString(CultureInfo.InvariantCulture)).Shown(sign);
}
