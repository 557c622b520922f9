using System.Globalization;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Trying;

/// <summary>A value that is tried over a range: <c>safety-factor=1.0..1.5:0.1</c>.</summary>
/// <param name="Path">The path of the value.</param>
/// <param name="Values">What is tried, as it would be written in the file.</param>
internal sealed record Sweep(string Path, IReadOnlyList<string> Values)
{
    private const int Most = 200;

    /// <summary>A sweep from <c>PATH=FROM..TO:STEP</c>; both ends are tried.</summary>
    /// <exception cref="FormatException">It is not written like that, or has more than 200 values.</exception>
    public static Sweep Parse(string text)
    {
        InputChange change = InputChange.Parse(text);
        string[] parts = change.Value.Split("..", 2);
        string[] upper = parts.Length == 2 ? parts[1].Split(':', 2) : [];
        if (upper.Length != 2 || !Try(parts[0], out decimal from) || !Try(upper[0], out decimal to) || !Try(upper[1], out decimal step) || step <= 0 || to < from)
            throw new FormatException($"`{text}`: a sweep is written PATH=FROM..TO:STEP, such as safety-factor=1.0..1.5:0.1");
        if ((to - from) / step >= Most)
            throw new FormatException($"`{text}`: a sweep has at most {Most} values");
        List<string> values = [];
        for (decimal value = from; value <= to; value += step)
            values.Add(value.ToString(CultureInfo.InvariantCulture));
        return new Sweep(change.Name, values);
    }

    private static bool Try(string text, out decimal value) =>
        decimal.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out value);
}
