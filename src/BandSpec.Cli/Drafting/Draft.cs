using BandSpec.Core.Specifying;
using BandSpec.Files.Inputs;
using BandSpec.Files.Releases;

namespace BandSpec.Cli.Drafting;

/// <summary>What became of one file of a draft.</summary>
internal enum DraftState
{
    /// <summary>Its package was written.</summary>
    Drafted,

    /// <summary>Its package is there already, from the same inputs, whole.</summary>
    UpToDate,

    /// <summary>It was not asked for: not a requirement, or not changed.</summary>
    LeftOut,

    /// <summary>The user stopped the run before it was begun.</summary>
    Stopped,

    /// <summary>There are findings.</summary>
    Refused,

    /// <summary>The disk or the program kept it from being drafted.</summary>
    Failed,
}

/// <summary>What came of one requirement.</summary>
/// <param name="File">The file as the user named it.</param>
/// <param name="State">What became of it.</param>
/// <param name="Inputs">What was read, and the findings; null when it was not read.</param>
internal sealed record Draft(string File, DraftState State, InputSet? Inputs)
{
    /// <summary>The finished record; null when it was not made in this run.</summary>
    public Specification? Specification { get; init; }

    /// <summary>Whether a plan fits, and by how much; null when there is no package.</summary>
    public Verdict? Verdict { get; init; }

    /// <summary>The package on the disk; null when there is none.</summary>
    public WrittenPackage? Package { get; init; }

    /// <summary>The release of its revision; null for a draft.</summary>
    public ChainedRelease? Release { get; init; }

    /// <summary>Why it was left out or failed.</summary>
    public string? Note { get; init; }

    /// <summary>What was found.</summary>
    public IReadOnlyList<PlacedFinding> Findings => Inputs?.Findings ?? [];

    /// <summary>What the exit code says about this file.</summary>
    public ExitCode ExitCode => State switch
    {
        DraftState.Failed => ExitCode.Fault,
        DraftState.Refused => ExitCode.Findings,
        DraftState.LeftOut => ExitCode.Done,
        DraftState.Stopped => ExitCode.AnswerIsNo,
        _ => Verdict is { Feasible: true, Proven: true } ? ExitCode.Done : ExitCode.AnswerIsNo,
    };
}

/// <summary>A package on the disk.</summary>
/// <param name="Folder">Its folder as the user would name it.</param>
/// <param name="Files">The names of its files, in order.</param>
internal sealed record WrittenPackage(string Folder, IReadOnlyList<string> Files);
