using System.Text.Json;
using BandSpec.Cli.Releasing;
using Xunit;

namespace BandSpec.Tests.Revising;

/// <summary>Releasing a revision, and what can no longer be done to it.</summary>
public sealed class ReleaseTests
{
    [Fact]
    public void A_release_is_on_record_on_every_page_and_proven_by_verify()
    {
        using Workshop shop = new();
        Screen screen = shop.Release("Ylva Strøm");
        Assert.Equal((0, ""), (screen.ExitCode, screen.Error));
        Assert.Contains("RELEASED by Ylva Strøm; commit releases.json with the requirement", screen.Output, StringComparison.Ordinal);
        Assert.Equal(["brine.yaml", "out", "platforms", "releases.json", "stations"], shop.Names());
        using JsonDocument line = JsonDocument.Parse(shop.Read("releases.json"));
        Assert.Equal("2026-11-25T09:30:15Z", line.RootElement.GetProperty("at").GetString());
        Assert.StartsWith("**RELEASED** – by Ylva Strøm on 2026-11-25\n", shop.Read("out/HV-3107-A/specification.md"), StringComparison.Ordinal);
        Screen verified = shop.Run("verify", "out/HV-3107-A", "--record", "releases.json");
        Assert.Equal(0, verified.ExitCode);
        Assert.EndsWith("verified: out/HV-3107-A is a release, and what its inputs give\n", verified.Output, StringComparison.Ordinal);
        Assert.Equal(0, shop.Run("verify", "out/HV-3107-A/specification.pdf", "--record", "releases.json").ExitCode);
    }

    [Fact]
    public void A_draft_of_a_released_revision_with_other_content_is_refused_and_says_which_input_changed()
    {
        using Workshop shop = new();
        shop.Release("Ylva Strøm");
        string package = shop.Read("out/HV-3107-A/manifest.json");
        shop.Edit(Workshop.Platform, "activation-energy: 0.6 eV", "activation-energy: 0.7 eV");
        Screen screen = shop.Run("draft", Workshop.Brine);
        Assert.Equal((2, """
            brine.yaml:3:13: HV-3107 revision A was released by Ylva Strøm on 2026-11-25; since then the platform has changed, cell.yaml [released]
                3 |   revision: A
                  |             ^
                    accepted: a new revision with its line in `changes`, or the inputs as they were released

            1 finding in 1 file

            """), (screen.ExitCode, screen.Output));
        Assert.Equal(package, shop.Read("out/HV-3107-A/manifest.json"));
        Assert.Equal(2, shop.Release("Another").ExitCode);
        // The revision is one of its inputs: with the next letter it is another draft.
        shop.Edit(Workshop.Brine, "  revision: A\n", "  revision: B\n");
        shop.Edit(Workshop.Brine, "text: First issue }", "text: First issue }\n    - { revision: B, date: 2026-11-24, text: Other cell }");
        Assert.Equal(0, shop.Run("draft", Workshop.Brine).ExitCode);
        Assert.StartsWith("**DRAFT**", shop.Read("out/HV-3107-B/specification.md"), StringComparison.Ordinal);
    }

    [Fact]
    public void Released_inputs_drafted_again_give_the_released_package_to_the_last_byte()
    {
        using Workshop shop = new();
        shop.Release("Ylva Strøm");
        byte[] pdf = File.ReadAllBytes(shop.PathOf("out/HV-3107-A/specification.pdf"));
        Directory.Delete(shop.PathOf("out"), recursive: true);
        Assert.Equal(0, shop.Run("draft", Workshop.Brine).ExitCode);
        Assert.Equal(pdf, File.ReadAllBytes(shop.PathOf("out/HV-3107-A/specification.pdf")));
    }

    [Fact]
    public void A_revision_is_released_once()
    {
        using Workshop shop = new();
        shop.Release("Ylva Strøm");
        string record = shop.Read("releases.json");
        Screen again = shop.Release("Ylva Strøm");
        Assert.Equal(2, again.ExitCode);
        Assert.Contains("HV-3107 revision A was released by Ylva Strøm on 2026-11-25 [release-new]", again.Output, StringComparison.Ordinal);
        Assert.Equal(record, shop.Read("releases.json"));
    }

    [Fact]
    public void What_does_not_fit_is_not_released()
    {
        using Workshop shop = new();
        shop.Edit(Workshop.Brine, "limit: 2.0 %FS", "limit: 0.2 %FS");
        Screen screen = shop.Release("Ylva Strøm");
        Assert.Equal(2, screen.ExitCode);
        Assert.Contains("[release-feasible]", screen.Output, StringComparison.Ordinal);
        Assert.Equal(["brine.yaml", "platforms", "stations"], shop.Names());
    }

    [Fact]
    public void An_edited_record_stops_everything_that_relies_on_it()
    {
        using Workshop shop = new();
        shop.Release("Ylva Strøm");
        shop.Edit("releases.json", "Ylva Strøm", "Somebody else");
        foreach (Screen screen in new[] { shop.Run("draft", Workshop.Brine), shop.Release("Ylva Strøm") })
        {
            Assert.Equal(2, screen.ExitCode);
            Assert.Contains("releases.json:1:1: release 1 is not as it was written, or not in its place [release-chain]", screen.Output, StringComparison.Ordinal);
        }

        Screen verified = shop.Run("verify", "out/HV-3107-A", "--record", "releases.json");
        Assert.Equal(1, verified.ExitCode);
        Assert.Contains("DIFFERS releases.json: release 1 is not as it was written", verified.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void A_record_from_which_the_release_was_taken_away_does_not_verify_it()
    {
        using Workshop shop = new();
        shop.Release("Ylva Strøm");
        shop.Write("releases.json", "");
        Assert.Contains("DIFFERS releases.json: it does not know this release", shop.Run("verify", "out/HV-3107-A", "--record", "releases.json").Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("", "--by takes a name on one line")]
    [InlineData("two\nlines", "--by takes a name on one line")]
    [InlineData("名前", "no font of the documents has")]
    public void A_release_needs_a_name_that_a_document_can_show(string by, string message)
    {
        using Workshop shop = new();
        Screen screen = shop.Release(by);
        Assert.Equal(2, screen.ExitCode);
        Assert.Contains(message, screen.Error, StringComparison.Ordinal);
    }

    [Fact]
    public void A_hold_that_a_killed_run_left_is_taken_over_and_one_of_a_living_run_is_waited_for()
    {
        using Workshop shop = new();
        string path = shop.PathOf(".releases.json.lock");
        File.WriteAllText(path, new HoldNote(int.MaxValue, Environment.MachineName, 1, DateTimeOffset.UtcNow).ToString());
        Assert.Equal(0, shop.Release("Ylva Strøm").ExitCode);
        Assert.False(File.Exists(path));
        File.WriteAllText(path, new HoldNote(1, "another machine", 1, new DateTimeOffset(2026, 11, 25, 9, 30, 0, TimeSpan.Zero)).ToString());
        Screen waited = shop.RunAt(new HastyClock(), "release", Workshop.Brine, "--by", "Ylva Strøm");
        Assert.Equal(3, waited.ExitCode);
        Assert.Contains("is being added to by another run (process 1 on another machine, for ", waited.Error, StringComparison.Ordinal);
        Assert.Contains("nothing was released", waited.Error, StringComparison.Ordinal);
    }

    /// <summary>A clock by which every look takes ten seconds, so that patience ends soon.</summary>
    private sealed class HastyClock : TimeProvider
    {
        private long looks;

        public override DateTimeOffset GetUtcNow() => new(2026, 11, 25, 9, 30, 40, TimeSpan.Zero);

        public override long GetTimestamp() => Interlocked.Increment(ref looks) * 10 * TimestampFrequency;
    }
}
