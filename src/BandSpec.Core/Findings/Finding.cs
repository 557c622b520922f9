namespace BandSpec.Core.Findings;

/// <summary>Which file a field is in: one of the inputs, or another file that a package depends on.</summary>
public enum InputFile
{
    /// <summary>The customer's application and what is promised for it.</summary>
    Requirement,

    /// <summary>The statistics of the sensor family.</summary>
    Platform,

    /// <summary>What the production equipment can do.</summary>
    Station,

    /// <summary>The record of released revisions beside the requirement.</summary>
    Releases,

    /// <summary>Readings that statistics are made of.</summary>
    Readings,

    /// <summary>A template of the user's for documents or limits.</summary>
    Template,
}

/// <summary>Where a field stands in an input: keys joined by points, list items counted from zero, such as <c>temperature.profile[2].to</c>.</summary>
/// <param name="File">The file that the field is in.</param>
/// <param name="Path">The field's path; empty for the file as a whole.</param>
public readonly record struct FieldPath(InputFile File, string Path)
{
    /// <summary>A field of the requirement.</summary>
    public static FieldPath InRequirement(string path) => new(InputFile.Requirement, path);

    /// <summary>A field of the platform.</summary>
    public static FieldPath InPlatform(string path) => new(InputFile.Platform, path);

    /// <summary>A field of the station.</summary>
    public static FieldPath InStation(string path) => new(InputFile.Station, path);

    /// <summary>A column of the readings, or the readings as a whole.</summary>
    public static FieldPath InReadings(string path) => new(InputFile.Readings, path);
}

/// <summary>
/// One thing that is wrong with an input, as facts: where, which rule, what was found, what is accepted. How it is worded on a screen, with
/// the line and a caret, is a renderer's business. Never an exception: an input with findings is an answer.
/// </summary>
/// <param name="Field">The field that has to change.</param>
/// <param name="Rule">A stable name of the rule that was broken, in lower-case words joined by hyphens, for machines to filter by.</param>
/// <param name="Found">What was found, a sentence without a full stop, with the figures.</param>
/// <param name="Accepted">What is accepted instead, or what to do, a sentence without a full stop.</param>
public sealed record Finding(FieldPath Field, string Rule, string Found, string Accepted)
{
    /// <summary>The accepted word nearest to a misspelt one; <see langword="null"/> when there is none near enough or nothing is misspelt.</summary>
    public string? Nearest { get; init; }

    /// <summary>Whether the field's key is at fault, not its value: a caret belongs under the key.</summary>
    public bool AtKey { get; init; }
}
