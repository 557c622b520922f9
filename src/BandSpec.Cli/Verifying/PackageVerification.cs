using BandSpec.Cli.Releasing;
using BandSpec.Files.Inputs;
using BandSpec.Files.Releases;

namespace BandSpec.Cli.Verifying;

/// <summary>
/// Proves a package folder or a single PDF: everything is computed and drawn again from the inputs that the PDF carries and compared byte by
/// byte, and the release record is followed from line to line.
/// </summary>
/// <param name="name">The folder or PDF as the user named it.</param>
/// <param name="record">The release record to hold it against, as the user named it; null for only the one that it carries.</param>
/// <param name="workingFolder">The folder that relative paths are counted from.</param>
internal sealed class PackageVerification(string name, string? record, string workingFolder)
{
    private readonly List<VerifiedPart> parts = [];

    /// <summary>What was found.</summary>
    public Verification Run(CancellationToken cancellation)
    {
        string path = Path.GetFullPath(name, workingFolder);
        bool isFolder = Directory.Exists(path);
        string document = isFolder ? Path.Combine(path, PackageNames.Document) : path;
        if (!File.Exists(document))
            return Fail(isFolder ? PackageNames.Document : name, isFolder ? "it is missing, and with it what everything could be computed from" : "there is no such file");
        if (FileComparison.Read(document) is not { } pdf || CarriedPackage.Of(name, pdf) is not { } carried)
            return Fail(Path.GetFileName(document), "it is not the PDF of a specification, or it was damaged");
        if (carried.Provenance.Making.Program != CommandLine.Program)
            return Fail(PackageNames.Document, $"it was made by {carried.Provenance.Making.Program}, and only that can make the same bytes; this is {CommandLine.Program}");
        if (carried.WasStopped)
            return Fail(PackageNames.Document, "its draft was stopped before its end, so that it cannot be made again; draft it once more");
        ReleaseRecord? released = VerifyRelease(carried);
        if (carried.MakeAgain(released, cancellation, out string? reason) is not { } again)
            return Fail(PackageNames.Document, reason!);
        if (isFolder)
            parts.AddRange(FileComparison.OfFolder(path, again));
        else
            parts.Add(FileComparison.Of(Path.GetFileName(document), pdf.Span, again.First(file => file.Name == PackageNames.Document).Bytes.Span));
        return new Verification(name, parts) { Manifest = carried.Provenance };
    }

    private Verification Fail(string what, string fault)
    {
        parts.Add(new VerifiedPart(what, fault));
        return new Verification(name, parts);
    }

    /// <summary>Follows the release that a PDF names: in the record that it carries, and in that of the requirement's folder.</summary>
    private ReleaseRecord? VerifyRelease(CarriedPackage carried)
    {
        if (carried.Provenance.Making.ReleaseDigest is not { } digest)
        {
            if (record is not null)
                parts.Add(new VerifiedPart("release record", "this is a draft, it was never released"));
            return null;
        }

        ReleaseRecord? chain = carried.Record();
        string? fault = chain?.Entries.Count is null or 0 ? "the record that it carries is not there, or its chain is broken"
            : chain.Entries[^1].Digest != digest ? "the record that it carries does not end with its release"
            : carried.FaultOf(chain.Entries[^1]);
        parts.Add(new VerifiedPart("release record", fault));
        if (fault is null && record is not null)
            parts.Add(new VerifiedPart(record, FaultOfRecord(chain!, digest)));
        return fault is null ? chain : null;
    }

    /// <summary>The record in the requirement's folder has to begin with the one that was carried away from it.</summary>
    private string? FaultOfRecord(ReleaseRecord chain, string digest)
    {
        if (!File.Exists(Path.GetFullPath(record!, workingFolder)))
            return "there is no such file";
        if (ReleaseFile.Open(record!, workingFolder, out PlacedFinding? broken) is not { } now)
            return $"{broken!.Finding.Found}";
        return now.Find(digest) is not { } entry ? "it does not know this release"
            : now.Through(entry).ToBytes().AsSpan().SequenceEqual(chain.ToBytes()) ? null : "what came before this release is another history";
    }
}
