using BandSpec.Files.Json;

namespace BandSpec.Cli.Verifying;

/// <summary>What a verification found of one thing that it looked at.</summary>
/// <param name="What">What was looked at: a file, or a word such as <c>release record</c>.</param>
/// <param name="Fault">What is wrong with it, a sentence without a full stop; null when it is as it has to be.</param>
internal sealed record VerifiedPart(string What, string? Fault);

/// <summary>What a verification found.</summary>
/// <param name="Name">The package or PDF as the user named it.</param>
/// <param name="Parts">Everything that was looked at.</param>
internal sealed record Verification(string Name, IReadOnlyList<VerifiedPart> Parts)
{
    /// <summary>How the package was made; null when it does not say so.</summary>
    public Manifest? Manifest { get; init; }

    /// <summary>Whether everything is as it has to be.</summary>
    public bool Holds => Parts.All(part => part.Fault is null);
}
