using System.Diagnostics.CodeAnalysis;
using System.Globalization;
using System.Text.Json;
using BandSpec.Core.Requirements;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Forms;

/// <summary>Words in a line.</summary>
internal sealed class TextForm(string what) : ScalarForm<string>
{
    internal override string Accepted => what;

    /// <summary>A number is accepted too: the revision <c>4</c> is written without quotes.</summary>
    internal override void Describe(Utf8JsonWriter schema)
    {
        schema.WriteStartArray("type");
        schema.WriteStringValue("string");
        schema.WriteStringValue("number");
        schema.WriteEndArray();
    }

    private protected override bool TryRead(
        ScalarNode scalar, Reading reading, [NotNullWhen(true)] out string? value, [NotNullWhen(false)] out Misreading? why)
    {
        value = scalar.Text;
        why = string.IsNullOrWhiteSpace(value) ? new Misreading("kind", "nothing but quotes", what) : null;
        return why is null;
    }
}

/// <summary>A number without a unit; its range is judged by the rules, the schema only shows it.</summary>
internal sealed class NumberForm(AcceptedRange range) : ScalarForm<double>
{
    internal override string Accepted => $"a number, {range}";

    internal override void Describe(Utf8JsonWriter schema)
    {
        schema.WriteString("type", "number");
        DescribeRange(schema, range);
    }

    internal static void DescribeRange(Utf8JsonWriter schema, AcceptedRange range)
    {
        schema.WriteNumber(range.IsAbove ? "exclusiveMinimum" : "minimum", range.Least);
        schema.WriteNumber("maximum", range.Most);
    }

    private protected override bool TryRead(ScalarNode scalar, Reading reading, out double value, [NotNullWhen(false)] out Misreading? why)
    {
        value = 0;
        why = scalar.IsQuoted ? new Misreading("kind", $"`{Shorten(scalar.Text)}` in quotes", "a number without quotes") : null;
        return why is null && Numbers.TryRead(scalar.Text, out value, out why);
    }
}

/// <summary>A whole number; its range is judged by the rules, the schema only shows it.</summary>
internal sealed class CountForm(AcceptedRange range) : ScalarForm<int>
{
    internal override string Accepted => $"a whole number, {range}";

    internal override void Describe(Utf8JsonWriter schema)
    {
        schema.WriteString("type", "integer");
        NumberForm.DescribeRange(schema, range);
    }

    private protected override bool TryRead(ScalarNode scalar, Reading reading, out int value, [NotNullWhen(false)] out Misreading? why)
    {
        bool whole = int.TryParse(scalar.Text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out value);
        why = whole && !scalar.IsQuoted ? null : new Misreading("number", $"`{Shorten(scalar.Text)}`", Accepted);
        return why is null;
    }
}

/// <summary>A day, <c>2026-11-24</c>.</summary>
internal sealed class DateForm : ScalarForm<DateOnly>
{
    internal override string Accepted => "a date: year-month-day, such as 2026-11-24";

    internal override void Describe(Utf8JsonWriter schema)
    {
        schema.WriteString("type", "string");
        schema.WriteString("pattern", "^[0-9]{4}-[0-9]{2}-[0-9]{2}$");
    }

    private protected override bool TryRead(ScalarNode scalar, Reading reading, out DateOnly value, [NotNullWhen(false)] out Misreading? why)
    {
        bool valid = DateOnly.TryParseExact(scalar.Text, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out value);
        why = valid ? null : new Misreading("date", $"`{Shorten(scalar.Text)}`", Accepted);
        return valid;
    }
}
