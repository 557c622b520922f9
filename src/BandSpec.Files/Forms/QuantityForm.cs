using System.Diagnostics.CodeAnalysis;
using System.Text.Json;
using System.Text.RegularExpressions;
using BandSpec.Core.Findings;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Forms;

/// <summary>A number with its unit, such as <c>25 bar</c>.</summary>
/// <param name="what">What it is, with an article: <c>a temperature</c>.</param>
/// <param name="range">What its range is, for a number out of it: <c>-273.15 °C and up</c>.</param>
/// <param name="example">An example in the first unit.</param>
/// <param name="units">The accepted units.</param>
/// <typeparam name="T">What it is read as.</typeparam>
internal sealed class QuantityForm<T>(string what, string range, string example, params IReadOnlyList<Unit<T>> units) : ScalarForm<T>
    where T : notnull
{
    internal override string Accepted => $"{what} with its unit, such as `{example}`";

    private string UnitNames => (units.Count == 1 ? "unit: " : "units: ") + string.Join(", ", units.Select(unit => unit.Symbol));

    internal override void Describe(Utf8JsonWriter schema)
    {
        schema.WriteString("type", "string");
        string spellings = string.Join('|', units.SelectMany(unit => unit.Spellings).Select(Regex.Escape));
        schema.WriteString("pattern", $"^{Numbers.Pattern} *({spellings})$");
        schema.WriteStartArray("examples");
        schema.WriteStringValue(example);
        schema.WriteEndArray();
    }

    private protected override bool TryRead(
        ScalarNode scalar, Reading reading, [NotNullWhen(true)] out T? value, [NotNullWhen(false)] out Misreading? why)
    {
        value = default;
        if (!TrySplit(scalar.Text, out double number, out string symbol, out why))
            return false;
        Unit<T>? unit = units.FirstOrDefault(candidate => candidate.Spellings.Contains(symbol));
        if (unit is null)
            why = WrongUnit(scalar.Text, symbol);
        else if (!unit.Make(number, reading, out value))
            why = new Misreading("out-of-range", $"`{Shorten(scalar.Text)}`", $"{what}: {range}");
        return why is null && value is not null;
    }

    private bool TrySplit(string text, out double number, out string unit, [NotNullWhen(false)] out Misreading? why)
    {
        int length = Numbers.LengthOf(text);
        string rest = text[length..];
        unit = rest.TrimStart(' ');
        number = 0;
        if (unit.Length > 0 && length > 0 && (unit.Length < rest.Length || !IsNumberLike(unit[0])))
            return Numbers.TryRead(text[..length], out number, out why);
        // Not a number followed by a unit: say what is wrong with the first word if that is to be a number, else show what is wanted.
        string first = text.Split(' ', 2)[0];
        why = length == text.Length ? new Misreading("unit", $"`{Shorten(text)}` without a unit", $"{Accepted}; {UnitNames}")
            : length > 0 || first.Length < text.Length ? BadNumber(first)
            : new Misreading("kind", $"`{Shorten(text)}`", Accepted);
        return false;
    }

    /// <summary>Characters that go on with a number that was written in a way that is not accepted, such as <c>1,5</c> or <c>1_000</c>.</summary>
    private static bool IsNumberLike(char first) => first is ',' or '.' or '_' or '\'' || char.IsAsciiDigit(first);

    private Misreading BadNumber(string first) =>
        Numbers.TryRead(first, out _, out Misreading? why) ? new Misreading("kind", $"`{Shorten(first)}`", Accepted) : why;

    private Misreading WrongUnit(string text, string symbol) =>
        new("unit", $"`{Shorten(text)}` is not {what}: unit `{Shorten(symbol)}`", UnitNames,
            Spelling.Nearest(symbol, units.SelectMany(unit => unit.Spellings)));
}
