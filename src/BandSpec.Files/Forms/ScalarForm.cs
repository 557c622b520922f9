using System.Diagnostics.CodeAnalysis;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Forms;

/// <summary>A form of a single value.</summary>
/// <typeparam name="T">What the value is read as.</typeparam>
internal abstract class ScalarForm<T> : Form
    where T : notnull
{
    internal sealed override object? Read(YamlNode node, string path, Reading reading)
    {
        if (node is not ScalarNode scalar || (scalar.Text.Length == 0 && !scalar.IsQuoted))
            return RefuseKind(node, path, reading);
        if (TryRead(scalar, reading, out T? value, out Misreading? why))
            return value;
        reading.Faults.Add(scalar.Extent, path, why.Rule, why.Found, why.Accepted, why.Nearest);
        return null;
    }

    /// <summary>Reads the text, or says why not.</summary>
    private protected abstract bool TryRead(
        ScalarNode scalar, Reading reading, [NotNullWhen(true)] out T? value, [NotNullWhen(false)] out Misreading? why);
}

/// <summary>Why a text could not be read, the facts of a finding without its place.</summary>
/// <param name="Rule">The rule's name.</param>
/// <param name="Found">What was found.</param>
/// <param name="Accepted">What is accepted.</param>
/// <param name="Nearest">The accepted word nearest to what was written.</param>
internal sealed record Misreading(string Rule, string Found, string Accepted, string? Nearest = null);
