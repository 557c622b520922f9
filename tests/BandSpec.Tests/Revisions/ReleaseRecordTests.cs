using System.Text;
using BandSpec.Core.Findings;
using BandSpec.Core.Revisions;
using BandSpec.Files.Inputs;
using BandSpec.Files.Releases;
using CsCheck;
using Xunit;

namespace BandSpec.Tests.Revisions;

public sealed class ReleaseRecordTests
{
    private static readonly string Digest = new('a', 64);

    [Fact]
    public void One_line_a_release_in_one_spelling()
    {
        string text = Encoding.UTF8.GetString(ReleaseRecord.Empty.With(Released("A")).Record.ToBytes());
        Assert.Equal(
            $$"""
            {"format":"bandspec/release/1","number":"HV-3107","revision":"A","by":"Ylva Strøm","at":"2026-11-24T09:30:00Z","program":"bandspec 0.1.0","inputs":[{"file":"requirement","name":"brine.yaml","sha256":"{{Digest}}"},{"file":"platform","name":"p.yaml","sha256":"{{Digest}}"},{"file":"station","name":"s.yaml","sha256":"{{Digest}}"}],"limits":"{{Digest}}","previous":"{{new string('0', 64)}}","digest":"e"}

            """.Replace("\"digest\":\"e\"", text[text.IndexOf("\"digest\"", StringComparison.Ordinal)..text.LastIndexOf('}')], StringComparison.Ordinal),
            text);
    }

    [Fact]
    public void What_was_written_reads_back_and_each_line_holds_the_one_before()
    {
        ReleaseRecord record = Three();
        ReleaseRecord read = ReleaseRecord.Read(Content(record.ToBytes()), out PlacedFinding? finding)!;
        Assert.Null(finding);
        Assert.Equal(["A", "B", "C"], read.Releases.Select(r => r.Revision));
        Assert.Equal(record.Entries.Select(e => e.Digest), read.Entries.Select(e => e.Digest));
        Assert.Equal(record.ToBytes(), read.ToBytes());
    }

    [Fact]
    public void Any_changed_byte_breaks_the_chain_at_or_before_the_next_line() => Gen.Select(Gen.Int[0, Three().ToBytes().Length - 1], Gen.Byte[1, 255]).Sample(
        (at, flip) =>
        {
            byte[] bytes = Three().ToBytes();
            bytes[at] ^= flip;
            return ReleaseRecord.Read(Content(bytes), out PlacedFinding? finding) is null && finding is not null;
        },
        iter: 2000);

    [Theory]
    [InlineData("0", "a line taken out of the middle", 1, 2)]
    [InlineData("1 0", "two lines exchanged", 1, 0, 2)]
    [InlineData("2", "a line repeated", 0, 1, 1)]
    public void Lines_taken_out_moved_or_repeated_show(string id, string what, params int[] order)
    {
        string[] lines = Encoding.UTF8.GetString(Three().ToBytes()).Split('\n');
        string changed = string.Concat(order.Select(i => lines[i] + "\n"));
        Assert.Null(ReleaseRecord.Read(Content(Encoding.UTF8.GetBytes(changed)), out PlacedFinding? finding));
        Assert.True(finding!.Finding.Rule == "release-chain", $"{id}: {what}");
    }

    [Fact]
    public void Lines_missing_at_the_end_leave_a_whole_record_without_the_digest_that_a_document_names()
    {
        ReleaseRecord three = Three();
        byte[] bytes = three.ToBytes();
        int secondEnd = Array.IndexOf(bytes, (byte)'\n', Array.IndexOf(bytes, (byte)'\n') + 1) + 1;
        ReleaseRecord two = ReleaseRecord.Read(Content(bytes[..secondEnd]), out _)!;
        Assert.Equal(2, two.Entries.Count);
        Assert.Null(two.Find(three.Entries[2].Digest));
    }

    private static ReleaseRecord Three() => "ABC".Aggregate(ReleaseRecord.Empty, (record, letter) => record.With(Released(letter.ToString())).Record);

    private static Release Released(string revision) => new()
    {
        Number = "HV-3107",
        Revision = revision,
        By = "Ylva Strøm",
        At = new DateTimeOffset(2026, 11, 24, 9, 30, 0, TimeSpan.Zero),
        Program = "bandspec 0.1.0",
        Inputs = [new(InputFile.Requirement, "brine.yaml", Digest), new(InputFile.Platform, "p.yaml", Digest), new(InputFile.Station, "s.yaml", Digest)],
        LimitsDigest = Digest,
    };

    private static InputContent Content(byte[] bytes) => InputContent.Of("releases.json", bytes);
}
