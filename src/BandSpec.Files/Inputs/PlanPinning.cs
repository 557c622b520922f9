using System.Globalization;
using System.Text;
using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace BandSpec.Files.Inputs;

/// <summary>
/// Writes a plan into the text of a requirement, as the keys <c>plan</c>, <c>zero-degree</c> and <c>span-degree</c> of its <c>compensation</c>. Nothing
/// else of the text changes by a byte: comments, order, line ends and the other keys stay.
/// </summary>
public static class PlanPinning
{
    private const string Section = "compensation";

    /// <summary>A value of the section: where it stands in the text.</summary>
    private readonly record struct Span(int Start, int End);

    /// <summary>What was found of the section.</summary>
    /// <param name="Values">The values by key.</param>
    /// <param name="InsideBraces">Whether it is written in braces on its line.</param>
    /// <param name="End">Behind its last value.</param>
    /// <param name="Indent">The column of its first key, counted from 0.</param>
    private sealed record Found(Dictionary<string, Span> Values, bool InsideBraces, int End, int Indent);

    /// <summary>The requirement with a plan pinned.</summary>
    /// <param name="requirement">Its bytes, those of a requirement without findings.</param>
    /// <param name="plan">The plan.</param>
    /// <returns>The new bytes; <see langword="null"/> when the section is written in a way that cannot be changed in place.</returns>
    public static ReadOnlyMemory<byte>? Pin(ReadOnlyMemory<byte> requirement, CompensationPlan plan)
    {
        ArgumentNullException.ThrowIfNull(plan);
        bool isMarked = requirement.Span.StartsWith(Encoding.UTF8.Preamble);
        string text = Encoding.UTF8.GetString(requirement.Span[(isMarked ? Encoding.UTF8.Preamble.Length : 0)..]);
        if (SectionOf(text) is not { } found)
            return null;
        (string Key, string Value)[] wanted =
        [
            ("plan", $"[{string.Join(", ", plan.Temperatures.Select(Written))}]"),
            ("zero-degree", plan.ZeroDegree.ToString(CultureInfo.InvariantCulture)),
            ("span-degree", plan.SpanDegree.ToString(CultureInfo.InvariantCulture)),
        ];
        string added = string.Concat(wanted.Where(w => !found.Values.ContainsKey(w.Key)).Select(w => Line(w.Key, w.Value, found, text)));
        StringBuilder changed = new(text);
        changed.Insert(found.End, added);
        // From the end to the beginning, so that places before a change stay where they are.
        foreach ((string key, string value) in wanted.Where(w => found.Values.ContainsKey(w.Key)).OrderByDescending(w => found.Values[w.Key].Start))
            changed.Remove(found.Values[key].Start, found.Values[key].End - found.Values[key].Start).Insert(found.Values[key].Start, value);
        byte[] bytes = [.. isMarked ? Encoding.UTF8.Preamble : [], .. Encoding.UTF8.GetBytes(changed.ToString())];
        return SaysSo(bytes, plan) ? bytes : null;
    }

    private static string Written(Temperature temperature) => string.Create(CultureInfo.InvariantCulture, $"{temperature.Celsius} °C");

    private static string Line(string key, string value, Found found, string text) => found.InsideBraces
        ? $", {key}: {value}"
        : $"{(text.Contains("\r\n", StringComparison.Ordinal) ? "\r\n" : "\n")}{new string(' ', found.Indent)}{key}: {value}";

    /// <summary>Whether the new text says what it is meant to: read back, it pins the plan.</summary>
    private static bool SaysSo(byte[] bytes, CompensationPlan plan)
    {
        OpenedFile file = OpenedFile.Open(InputFile.Requirement, InputContent.Of(Section, bytes));
        return file.Find(RequirementForm.Compensation)?.Pinned is { } pinned && pinned.Temperatures.SequenceEqual(plan.Temperatures)
            && (pinned.ZeroDegree, pinned.SpanDegree) == (plan.ZeroDegree, plan.SpanDegree) && !file.PlacedFindings().Any();
    }

    private static Found? SectionOf(string text)
    {
        Parser parser = new(new StringReader(text));
        while (parser.MoveNext() && parser.Current is not MappingStart)
        {
            // What comes before the keys of the file.
        }

        parser.MoveNext();
        while (parser.Current is Scalar key)
        {
            parser.MoveNext();
            if (key.Value == Section)
                return parser.Current is MappingStart map ? Values(parser, map, text) : null;
            parser.SkipThisAndNestedEvents();
        }

        return null;
    }

    private static Found Values(Parser parser, MappingStart map, string text)
    {
        Dictionary<string, Span> values = [];
        int indent = 0, end = (int)map.Start.Index;
        while (parser.MoveNext() && parser.Current is Scalar key)
        {
            if (values.Count == 0)
                indent = (int)key.Start.Column - 1;
            parser.MoveNext();
            Span value = ValueOf(parser, text);
            values[key.Value] = value;
            end = value.End;
        }

        return new Found(values, map.Style == MappingStyle.Flow, map.Style == MappingStyle.Flow ? end : EndOfLine(text, end), indent);
    }

    /// <summary>From the first character of a value to behind its last; a list below its key ends with its last item, one in brackets with them.</summary>
    private static Span ValueOf(Parser parser, string text)
    {
        ParsingEvent first = parser.Current!;
        int end = (int)first.End.Index;
        if (first is not SequenceStart list)
            return new Span((int)first.Start.Index, end);
        while (parser.MoveNext() && parser.Current is Scalar item)
            end = (int)item.End.Index;
        return new Span((int)first.Start.Index, list.Style == SequenceStyle.Flow ? text.IndexOf(']', end) + 1 : end);
    }

    /// <summary>Behind a remark that stands after the last value.</summary>
    private static int EndOfLine(string text, int from)
    {
        int end = text.AsSpan(from).IndexOfAny('\r', '\n');
        return end < 0 ? text.Length : from + end;
    }
}
