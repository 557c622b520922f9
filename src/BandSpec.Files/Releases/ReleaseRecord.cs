using System.Text;
using System.Text.Unicode;
using BandSpec.Core.Findings;
using BandSpec.Core.Requirements;
using BandSpec.Core.Revisions;
using BandSpec.Files.Inputs;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Releases;

/// <summary>A release and the digest of its line, which holds every line before it too.</summary>
/// <param name="Release">The release.</param>
/// <param name="Digest">The digest of its line, 64 lower-case hexadecimal digits.</param>
public sealed record ChainedRelease(Release Release, string Digest);

/// <summary>
/// Everything that was released from one folder: <c>releases.json</c>, one line a release, only ever longer. Each line holds the digest of
/// the one before it, so that a line that was changed, taken out, put in or moved shows; that the last lines are missing shows where a
/// released document names one of them.
/// </summary>
public sealed class ReleaseRecord
{
    /// <summary>The file's name, beside the requirement.</summary>
    public const string FileName = "releases.json";

    /// <summary>The largest record that is read, in bytes: some twenty thousand releases.</summary>
    public const int LargestFile = 16 << 20;

    private readonly string text;

    private ReleaseRecord(string text, IReadOnlyList<ChainedRelease> entries) => (this.text, Entries) = (text, entries);

    /// <summary>A record without a release: the file is not there yet.</summary>
    public static ReleaseRecord Empty { get; } = new("", []);

    /// <summary>The releases, oldest first.</summary>
    public IReadOnlyList<ChainedRelease> Entries { get; }

    /// <summary>The releases without their digests.</summary>
    public IEnumerable<Release> Releases => Entries.Select(entry => entry.Release);

    /// <summary>The release of a number and revision, if there was one.</summary>
    public ChainedRelease? Find(SpecificationIdentity identity)
    {
        Release? release = ReleaseRules.Find(identity, Releases);
        return release is null ? null : Entries.First(entry => entry.Release == release);
    }

    /// <summary>The release with a digest, if there is one.</summary>
    public ChainedRelease? Find(string digest) => Entries.FirstOrDefault(entry => entry.Digest == digest);

    /// <summary>The record as it was when one of its releases was made.</summary>
    public ReleaseRecord Through(ChainedRelease entry)
    {
        int count = 1 + Entries.TakeWhile(other => other != entry).Count();
        return new ReleaseRecord(string.Concat(text.Split('\n').Take(count).Select(line => line + "\n")), [.. Entries.Take(count)]);
    }

    /// <summary>Reads a record, or finds where its chain is broken.</summary>
    /// <param name="content">The file.</param>
    /// <param name="finding">What is wrong with it; <see langword="null"/> exactly when there is a record.</param>
    public static ReleaseRecord? Read(InputContent content, out PlacedFinding? finding)
    {
        ArgumentNullException.ThrowIfNull(content);
        finding = Unreadable(content);
        if (finding is not null)
            return null;
        string text = Encoding.UTF8.GetString(content.Bytes.Span);
        List<ChainedRelease> entries = [];
        string previous = ReleaseLine.NoDigest;
        foreach (string line in text.Split('\n')[..^1])
        {
            if (ReleaseLine.Read(line, previous) is not { } entry)
            {
                finding = Broken(content.Name, entries.Count + 1, line);
                return null;
            }

            entries.Add(entry);
            previous = entry.Digest;
        }

        finding = text.Length == 0 || text.EndsWith('\n') ? null : Broken(content.Name, entries.Count + 1, text.Split('\n')[^1]);
        return finding is null ? new ReleaseRecord(text, entries) : null;
    }

    /// <summary>The record with one more release at its end, and that release with its digest.</summary>
    public (ReleaseRecord Record, ChainedRelease Entry) With(Release release)
    {
        ArgumentNullException.ThrowIfNull(release);
        string previous = Entries.Count == 0 ? ReleaseLine.NoDigest : Entries[^1].Digest;
        string line = ReleaseLine.Write(release, previous);
        ChainedRelease entry = ReleaseLine.Read(line, previous) ?? throw new ArgumentException("a release that does not read back as it was written", nameof(release));
        return (new ReleaseRecord(text + line + "\n", [.. Entries, entry]), entry);
    }

    /// <summary>The file's bytes.</summary>
    public byte[] ToBytes() => Encoding.UTF8.GetBytes(text);

    private static PlacedFinding? Unreadable(InputContent content) => content switch
    {
        { Refusal: { } why } => Find(content.Name, 1, "", "file", why, "a file that can be read"),
        { Bytes.Length: > LargestFile } => Find(content.Name, 1, "", "file-size", $"the file has more than {LargestFile} bytes", $"at most {LargestFile} bytes"),
        { Bytes.Span: var bytes } when !Utf8.IsValid(bytes) => Find(content.Name, 1, "", "encoding", "the file has bytes that are not UTF-8", "the record as it is in version control"),
        _ => null,
    };

    private static PlacedFinding Broken(string name, int line, string text) => Find(
        name, line, text, "release-chain", $"release {line} is not as it was written, or not in its place",
        "the record as it is in version control: lines are only ever added, and only by `bandspec release`");

    private static PlacedFinding Find(string name, int line, string text, string rule, string found, string accepted) => new(
        new Finding(new FieldPath(InputFile.Releases, ""), rule, found, accepted), new Place(name, line, 1, Math.Max(1, text.Length), text));
}
