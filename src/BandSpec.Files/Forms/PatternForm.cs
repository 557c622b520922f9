using System.Diagnostics.CodeAnalysis;
using System.Text.Json;
using System.Text.RegularExpressions;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Forms;

/// <summary>A short text that follows a pattern, such as <c>3..6</c> or <c>95 EUR/h</c>.</summary>
/// <param name="accepted">What is accepted, in words.</param>
/// <param name="pattern">The pattern of the whole text, for the reader and for the schema.</param>
/// <param name="read">Makes the value of the pattern's groups.</param>
internal sealed class PatternForm<T>(string accepted, string pattern, Func<GroupCollection, T> read) : ScalarForm<T>
    where T : notnull
{
    // No pattern here can run long: each is anchored and none repeats a repetition.
    private readonly Regex regex = new($@"\A(?:{pattern})\z", RegexOptions.CultureInvariant);

    internal override string Accepted => accepted;

    internal override void Describe(Utf8JsonWriter schema)
    {
        schema.WriteStartArray("type");
        schema.WriteStringValue("string");
        schema.WriteStringValue("number");
        schema.WriteEndArray();
        schema.WriteString("pattern", $"^({pattern})$");
    }

    private protected override bool TryRead(
        ScalarNode scalar, Reading reading, [NotNullWhen(true)] out T? value, [NotNullWhen(false)] out Misreading? why)
    {
        Match match = regex.Match(scalar.Text);
        why = match.Success ? null : new Misreading("kind", $"`{Shorten(scalar.Text)}`", accepted);
        value = match.Success ? read(match.Groups) : default;
        return why is null && value is not null;
    }
}
