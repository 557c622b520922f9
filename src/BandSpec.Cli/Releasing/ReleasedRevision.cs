using BandSpec.Core.Revisions;
using BandSpec.Files.Inputs;
using BandSpec.Files.Releases;

namespace BandSpec.Cli.Releasing;

/// <summary>Holds a requirement against the release record beside it.</summary>
internal static class ReleasedRevision
{
    /// <summary>
    /// The inputs, refused when their number and revision were released with other content, or when the record is not as it was written.
    /// </summary>
    /// <param name="inputs">The inputs as they were read.</param>
    /// <param name="requirement">The requirement as the user named it.</param>
    /// <param name="workingFolder">The folder that relative paths are counted from.</param>
    /// <param name="released">The record up to the release of this revision; null when it was not released.</param>
    public static InputSet Check(InputSet inputs, string requirement, string workingFolder, out ReleaseRecord? released)
    {
        released = null;
        if (inputs.Application is not { } application)
            return inputs;
        if (ReleaseFile.Read(requirement, workingFolder, out PlacedFinding? broken) is not { } record)
            return inputs.Refused([broken!]);
        released = record.Find(application.Requirement.Identity) is { } entry ? record.Through(entry) : null;
        return ReleaseRules.ChangesSince(application.Requirement.Identity, Digests(inputs), record.Releases) is { Count: > 0 } changes
            ? inputs.Refused(changes)
            : inputs;
    }

    /// <summary>The inputs by their content.</summary>
    public static IReadOnlyList<InputDigest> Digests(InputSet inputs) =>
        [.. inputs.Sources.Select(source => new InputDigest(source.Kind, Path.GetFileName(source.Name), source.Digest))];
}
