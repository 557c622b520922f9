using BandSpec.Core.Findings;
using BandSpec.Core.Requirements;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Inputs;

/// <summary>A requirement with its platform and station as they were read: the application, or everything that keeps it from being one.</summary>
/// <param name="Application">The application; <see langword="null"/> exactly when there are findings.</param>
/// <param name="Sources">The files that could be had: the requirement first, then platform and station.</param>
/// <param name="Findings">Everything that was found, by file, line and column.</param>
public sealed record InputSet(Application? Application, IReadOnlyList<InputSource> Sources, IReadOnlyList<PlacedFinding> Findings)
{
    /// <summary>Finds the place of a field of the requirement.</summary>
    internal Func<Finding, PlacedFinding>? Placing { get; init; }

    /// <summary>The same inputs, refused for what was found only after they had been read; the findings stand in the requirement.</summary>
    public InputSet Refused(IReadOnlyList<Finding> found) => Refused([.. found.Select(finding => Placing!(finding))]);

    /// <summary>The same inputs, refused for what was found in another file.</summary>
    public InputSet Refused(IReadOnlyList<PlacedFinding> found) => this with { Application = null, Findings = [.. Findings, .. found] };
}

/// <summary>An input file that was read.</summary>
/// <param name="Kind">Which input it is.</param>
/// <param name="Name">Its name as the user knows it.</param>
/// <param name="Bytes">Its bytes.</param>
/// <param name="Digest">The SHA-256 of its bytes, 64 lower-case hexadecimal digits.</param>
public sealed record InputSource(InputFile Kind, string Name, ReadOnlyMemory<byte> Bytes, string Digest);

/// <summary>A finding and the place that a caret points at.</summary>
/// <param name="Finding">What was found.</param>
/// <param name="Place">Where.</param>
public sealed record PlacedFinding(Finding Finding, Place Place);
