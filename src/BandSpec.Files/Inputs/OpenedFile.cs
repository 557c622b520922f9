using System.Security.Cryptography;
using BandSpec.Core.Findings;
using BandSpec.Files.Forms;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Inputs;

/// <summary>One file while it is read: its text, its tree and what was found in it so far.</summary>
internal sealed class OpenedFile
{
    private readonly string name;
    private readonly SourceText text;
    private readonly YamlNode? root;
    private readonly FoundFaults faults;

    private OpenedFile(InputFile kind, InputContent content)
    {
        (Kind, name, faults) = (kind, content.Name, new FoundFaults(kind));
        if (content.Refusal is { } why)
            faults.Add(Extent.Start, "", "file", why, "a file that can be read");
        else
            Source = new InputSource(kind, name, content.Bytes, Convert.ToHexStringLower(SHA256.HashData(content.Bytes.Span)));
        text = SourceText.Decode(content.Bytes.Span, faults);
        root = faults.Count == 0 ? TreeReading.Read(text, faults) : null;
    }

    /// <summary>Which input it is.</summary>
    internal InputFile Kind { get; }

    /// <summary>The file for the record of inputs; null when it could not be had.</summary>
    internal InputSource? Source { get; }

    /// <summary>Opens a file.</summary>
    internal static OpenedFile Open(InputFile kind, InputContent content) => new(kind, content);

    /// <summary>The value of one key of the file ahead of the rest, without a finding when it is not there or not right.</summary>
    internal T? Find<T>(Key<T> key)
        where T : class =>
        root is MapNode map && map.Find(key.Name) is { } entry
            ? key.Form.Read(entry.Value, key.Name, new Reading(new FoundFaults(Kind), null)) as T
            : null;

    /// <summary>What could be read of the file; null when it is no YAML, or has errors that are parts of an unknown span.</summary>
    internal T? Read<T>(MapForm<T> form, double? spanInPascals)
        where T : class
    {
        if (root is null)
            return null;
        Reading reading = new(faults, spanInPascals);
        T? value = (T?)form.Read(root, "", reading);
        return reading.SpanIsMissed ? null : value;
    }

    /// <summary>Adds a finding of a rule at the place of its field.</summary>
    internal void Place(Finding finding) => faults.Add(
        ExtentOf(finding), finding.Field.Path, finding.Rule, finding.Found, finding.Accepted, finding.Nearest, finding.AtKey);

    /// <summary>A finding at the place of its field, without it being added.</summary>
    internal PlacedFinding Placed(Finding finding) => new(finding, PlaceOf(ExtentOf(finding)));

    /// <summary>Everything found, by line and column.</summary>
    internal IEnumerable<PlacedFinding> PlacedFindings() =>
        from located in faults.All
        let at = located.Extent
        orderby at.Line, at.Column
        select new PlacedFinding(located.Finding, PlaceOf(at));

    private Extent ExtentOf(Finding finding) => root is null ? Extent.Start : Locating.Find(root, finding.Field.Path, finding.AtKey);

    private Place PlaceOf(Extent at) => new(name, at.Line, at.Column, at.Length, text.Line(at.Line));
}
