using System.Xml;
using BandSpec.Documents.Printing;
using BandSpec.Documents.Templates;

namespace BandSpec.Documents.Limits;

/// <summary>
/// Reads back what a layout wrote: every point is there, in order and once, followed by its own lower and upper limit with exactly the
/// figures of the specification before the next point begins. So a loop cut short, a filter, or a number written in a country's way is
/// found here and not on the test floor.
/// </summary>
internal static class LimitsCheck
{
    public static void Check(string template, string file, string written, IReadOnlyList<PointView> points)
    {
        var words = Words(written);
        var at = 0;
        for (int i = 0; i < points.Count; i++)
        {
            var start = words.IndexOf(points[i].Id, at);
            if (start < 0) throw Fault(template, file, points[i], words.Contains(points[i].Id) ? "stands out of order" : "is missing");
            var end = i + 1 < points.Count && words.IndexOf(points[i + 1].Id, start) is var next && next >= 0 ? next : words.Count;
            Find(template, file, words, start, end, points[i], "lower", points[i].Lower.Plain);
            Find(template, file, words, start, end, points[i], "upper", points[i].Upper.Plain);
            at = start + 1;
        }
        if (file.EndsWith(".xml", StringComparison.Ordinal)) CheckXml(template, written);
    }

    private static void Find(
        string template, string file, List<string> words, int start, int end, PointView point, string side, string figure)
    {
        if (words.IndexOf(figure, start, end - start) < 0) throw Fault(template, file, point, $"lacks its {side} limit {figure}");
    }

    private static TemplateException Fault(string template, string file, PointView point, string what) =>
        new(template, 1, 1, $"In {file}, which this layout writes, the point {point.Id} {what}.");

    private static void CheckXml(string template, string written)
    {
        try
        {
            using var reader = XmlReader.Create(new StringReader(written));
            while (reader.Read()) { }
        }
        catch (XmlException fault)
        {
            throw new TemplateException(template, 1, 1, $"This layout does not write well-formed XML: {fault.Message}");
        }
    }

    // Letters, digits, points and signs make a word; everything else, commas too, stands between words.
    private static List<string> Words(string text)
    {
        List<string> words = [];
        var start = -1;
        for (int i = 0; i <= text.Length; i++)
        {
            var inside = i < text.Length && (char.IsLetterOrDigit(text[i]) || text[i] is '.' or '-' or '+' or '_');
            if (inside && start < 0) start = i;
            if (inside || start < 0) continue;
            words.Add(text[start..i]);
            start = -1;
        }
        return words;
    }
}
