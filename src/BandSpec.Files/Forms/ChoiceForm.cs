using System.Diagnostics.CodeAnalysis;
using System.Text.Json;
using BandSpec.Core.Findings;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Forms;

/// <summary>One of a few words.</summary>
/// <param name="choices">The words and what each means.</param>
internal sealed class ChoiceForm<T>(params IReadOnlyList<(string Word, T Meaning)> choices) : ScalarForm<T>
    where T : struct
{
    internal override string Accepted => string.Join(", ", choices.Select(choice => $"`{choice.Word}`"));

    internal override void Describe(Utf8JsonWriter schema)
    {
        schema.WriteStartArray("enum");
        foreach ((string word, _) in choices)
            schema.WriteStringValue(word);
        schema.WriteEndArray();
    }

    private protected override bool TryRead(ScalarNode scalar, Reading reading, out T value, [NotNullWhen(false)] out Misreading? why)
    {
        int index = choices.ToList().FindIndex(choice => choice.Word == scalar.Text);
        value = index < 0 ? default : choices[index].Meaning;
        why = index >= 0 ? null
            : new Misreading("choice", $"`{Shorten(scalar.Text)}`", Accepted, Spelling.Nearest(scalar.Text, choices.Select(choice => choice.Word)));
        return why is null;
    }
}
