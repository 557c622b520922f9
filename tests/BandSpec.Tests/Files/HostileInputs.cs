using System.Diagnostics;
using System.Text;
using BandSpec.Core.Findings;
using BandSpec.Files.Inputs;
using CsCheck;
using Xunit;

namespace BandSpec.Tests.Files;

/// <summary>Inputs that nobody honest writes: each is a finding, in bounded time, and never an exception.</summary>
public sealed class HostileInputs
{
    private static readonly string[] Names = ["brine-reinjection.yaml", "platforms/steel-cell-40.yaml", "stations/chamber-line-2.yaml"];

    private static readonly byte[][] Originals = [.. Names.Select(name => File.ReadAllBytes(Path.Combine(Demo.Folder, name)))];

    /// <summary>Pieces that have broken readers before: limits of numbers, marks of YAML, odd characters, halves of encodings.</summary>
    private static readonly string[] Pieces =
    [
        "NaN", ".inf", "-.inf", "1e308", "1e-320", "-0", "1,5", "0x10", "1_000", "9999999999999999999999", "&a", "*a", "!!str", "<<: *a", "---\n", "...\n",
        "? ", ": ", "- ", "[", "]", "{", "}", "'", "\"", "|\n", ">\n", "#", "%YAML 1.2\n", "\t", "\r", "\r\n", "\n\n", "\u0000", "\u0007", "\u2028", "\u202E", "\uFEFF",
        "~", "null", "true", "°C", "%FS", "bar", "K", "..", "../../x", "CON", "=1+1", "\ud83d\ude00", new string('x', 3000), new string('[', 50), "\\x41", "\"\\u0041\"",
    ];

    /// <summary>A change of a file: at a place, so many bytes are left out and a piece is put in.</summary>
    private static readonly Gen<(int File, double At, int Removed, byte[] Put)> Change = Gen.Select(
        Gen.Int[0, 2], Gen.Double[0, 1], Gen.OneOf(Gen.Const(0), Gen.Int[0, 3], Gen.Int[0, 200]),
        Gen.OneOf(Gen.Int[0, Pieces.Length - 1].Select(i => Encoding.UTF8.GetBytes(Pieces[i])), Gen.Byte.Array[0, 4], Gen.Int[0, 2].SelectMany(i => Slice(Originals[i]))));

    private static Gen<byte[]> Slice(byte[] of) =>
        Gen.Select(Gen.Int[0, of.Length - 1], Gen.Int[0, 120], (begin, length) => of[begin..Math.Min(of.Length, begin + length)]);

    [Fact]
    public void Whatever_is_done_to_the_files_they_are_read_or_refused() => Change.List[1, 6].Sample(
        changes =>
        {
            byte[][] files = [.. Originals];
            foreach ((int file, double at, int removed, byte[] put) in changes)
            {
                int begin = (int)(at * files[file].Length), end = Math.Min(files[file].Length, begin + removed);
                files[file] = [.. files[file][..begin], .. put, .. files[file][end..]];
            }
            InputSet set = Read(files[0], files[1], files[2]);
            return set.Application is null == set.Findings.Count > 0
                && set.Findings.All(finding => finding.Place.Line >= 1 && finding.Place.Column >= 1 && finding.Place.Length >= 1);
        },
        iter: Rounds, print: changes => string.Join("; ", changes.Select(c => $"{c.File} at {c.At}: -{c.Removed} +{Encoding.UTF8.GetString(c.Put)}")));

    [Theory]
    [InlineData("a: &a [x,x,x,x,x,x,x,x,x]\nb: &b [*a,*a,*a,*a,*a,*a,*a,*a,*a]\nc: [*b,*b,*b,*b,*b,*b,*b,*b,*b]", "anchor", "alias")]
    [InlineData("<<: { a: 1 }", "unknown-key")]
    [InlineData("", "empty-file")]
    [InlineData("just words", "kind")]
    [InlineData("- a\n- b", "kind")]
    [InlineData("!!binary aGVsbG8=", "tag")]
    [InlineData("%TAG ! tag:example,2026:\n---\na: 1", "unknown-key")]
    public void A_text_that_is_no_requirement_is_refused(string text, params string[] rules)
    {
        InputSet set = Read(Encoding.UTF8.GetBytes(text), Originals[1], Originals[2]);

        Assert.Null(set.Application);
        Assert.All(rules, rule => Assert.Contains(rule, set.Findings.Select(finding => finding.Finding.Rule)));
    }

    [Fact]
    public void A_byte_order_mark_is_no_fault_and_other_encodings_are_one()
    {
        string text = Encoding.UTF8.GetString(Originals[0]);
        Assert.NotNull(Read([.. Encoding.UTF8.Preamble, .. Originals[0]], Originals[1], Originals[2]).Application);
        foreach (byte[] other in new[]
        {
            Encoding.Unicode.GetBytes(text), [.. Encoding.Unicode.Preamble, .. Encoding.Unicode.GetBytes(text)], Encoding.BigEndianUnicode.GetBytes(text),
            Encoding.UTF32.GetBytes(text), Encoding.Latin1.GetBytes(text),
        })
            Assert.Equal(["encoding"], Read(other, Originals[1], Originals[2]).Findings.Select(finding => finding.Finding.Rule));
    }

    [Fact]
    public void Windows_line_ends_change_nothing()
    {
        byte[] windows = Encoding.UTF8.GetBytes(Encoding.UTF8.GetString(Originals[0]).Replace("\n", "\r\n", StringComparison.Ordinal));

        Assert.NotNull(Read(windows, Originals[1], Originals[2]).Application);
    }

    [Theory]
    [InlineData("file-size", 100_000_000)]
    [InlineData("too-many-values", 500_000)]
    public void A_large_file_is_refused_at_once(string rule, int bytes)
    {
        byte[] large = Encoding.UTF8.GetBytes(string.Concat(Enumerable.Repeat("- 1\n", bytes / 4)));
        long begin = Stopwatch.GetTimestamp();

        InputSet set = Read(large, Originals[1], Originals[2]);

        Assert.Contains(rule, set.Findings.Select(finding => finding.Finding.Rule));
        Assert.True(Stopwatch.GetElapsedTime(begin) < TimeSpan.FromSeconds(20), "half a second on a machine of its own");
    }

    [Fact]
    public void Ten_thousand_regions_are_one_finding()
    {
        string regions = string.Concat(Enumerable.Repeat("  - { from: 1 °C, to: 2 °C, limit: 1 %FS }\n", 10_000));
        string text = Encoding.UTF8.GetString(Originals[0]).Replace("allowed-error:\n", "allowed-error:\n" + regions, StringComparison.Ordinal);

        PlacedFinding finding = Assert.Single(Read(Encoding.UTF8.GetBytes(text), Originals[1], Originals[2]).Findings, f => f.Finding.Rule == "too-many-values");
        Assert.Equal(InputFile.Requirement, finding.Finding.Field.File);
    }

    [Fact]
    public void More_findings_than_anybody_reads_are_counted_and_left_out()
    {
        string keys = string.Concat(Enumerable.Range(0, 5000).Select(i => $"key-{i}: 1\n"));

        InputSet set = Read(Encoding.UTF8.GetBytes(keys), Originals[1], Originals[2]);

        Assert.Equal("too-many-findings", Assert.Single(set.Findings, f => f.Finding.Rule == "too-many-findings").Finding.Rule);
        Assert.Equal(101, set.Findings.Count);
    }

    /// <summary>BANDSPEC_FUZZ_ROUNDS makes the run a long one.</summary>
    private static long Rounds => long.TryParse(Environment.GetEnvironmentVariable("BANDSPEC_FUZZ_ROUNDS"), out long rounds) ? rounds : 400;

    private static InputSet Read(byte[] requirement, byte[] platform, byte[] station) => InputReading.Read(
        InputContent.Of(Names[0], requirement),
        path => path == Names[1] ? InputContent.Of(path, platform) : path == Names[2] ? InputContent.Of(path, station) : InputContent.Refused(path, "there is no such file"));
}
