using BandSpec.Core.Findings;

namespace BandSpec.Core.Revisions;

/// <summary>
/// A revision that was frozen: who released it, when, and from which inputs. From then on number and revision stand for these inputs alone.
/// Unlike a draft it cannot be made again with other content.
/// </summary>
public sealed record Release
{
    /// <summary>The document number.</summary>
    public required string Number { get; init; }

    /// <summary>The revision.</summary>
    public required string Revision { get; init; }

    /// <summary>Who released it: a name on one line.</summary>
    public required string By { get; init; }

    /// <summary>When, in coordinated universal time and whole seconds.</summary>
    public required DateTimeOffset At { get; init; }

    /// <summary>Name and version of the program that released it.</summary>
    public required string Program { get; init; }

    /// <summary>Requirement, platform and station.</summary>
    public required IReadOnlyList<InputDigest> Inputs { get; init; }

    /// <summary>SHA-256 of the limits that production tests against, 64 lower-case hexadecimal digits.</summary>
    public required string LimitsDigest { get; init; }
}

/// <summary>An input file by its content.</summary>
/// <param name="File">Which input it is.</param>
/// <param name="Name">Its name; only for people, two inputs are the same when file and digest are.</param>
/// <param name="Digest">The SHA-256 of its bytes, 64 lower-case hexadecimal digits.</param>
public sealed record InputDigest(InputFile File, string Name, string Digest);
