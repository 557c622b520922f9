using System.Text.Json;
using Snapshooter.Xunit3;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>Virtual lots as a user makes them. Small orders: what is tested is the command, not the figures.</summary>
public sealed class TryTests : IDisposable
{
    private readonly Desk desk = new();

    public void Dispose() => desk.Dispose();

    [Fact]
    public void A_try_shows_yield_leaving_chance_errors_and_the_witness()
    {
        (int code, string output, string error) = desk.Run("try", "brine-reinjection.yaml", "--units", "2000", "--lot-size", "40");

        Assert.Equal((0, ""), (code, error));
        Snapshot.Match(output);
    }

    [Fact]
    public void Parts_gathered_say_the_same_as_one_run()
    {
        string[] order = ["--units", "1000", "--lot-size", "40", "--seed", "7"];
        for (int part = 1; part <= 3; part++)
            Assert.Equal(
                (0, $"HV-3107-A.part-{part}-of-3.json: {(part == 1 ? 320 : part == 2 ? 320 : 360)} units, part {part} of 3\n", ""),
                desk.Run(["try", "brine-reinjection.yaml", .. order, "--part", $"{part}/3"]));

        (int code, string gathered, string error) = desk.Run("gather", "HV-3107-A.part-3-of-3.json", "HV-3107-A.part-1-of-3.json", "HV-3107-A.part-2-of-3.json", "--json");

        Assert.Equal((0, ""), (code, error));
        Assert.Equal(desk.Run(["try", "brine-reinjection.yaml", .. order, "--json"]).Out, gathered);
    }

    [Fact]
    public void Missing_double_foreign_and_damaged_parts_are_named()
    {
        desk.Run("try", "brine-reinjection.yaml", "--units", "640", "--lot-size", "40", "--part", "1/2", "--out", "one.json");
        desk.Run("try", "brine-reinjection.yaml", "--units", "640", "--lot-size", "40", "--part", "2/2", "--out", "two.json");
        desk.Run("try", "brine-reinjection.yaml", "--units", "640", "--lot-size", "40", "--part", "2/2", "--out", "warm.json", "--set", "station.soak-gradient=0.3");
        desk.Write("torn.json", File.ReadAllText(desk.At("one.json"))[..2000]);
        desk.Write("other.json", "{}");

        Assert.Equal((1, "", "bandspec: missing: lots 1 to 8 of 16 (320 units) are in no part; the report is of the others\n"), desk.Run("gather", "two.json", "--quiet"));
        Assert.Equal((2, "", "bandspec: two.json: lots 9 to 16 of 16 (320 units) are in another part too\n"), desk.Run("gather", "one.json", "two.json", "two.json"));
        Assert.Equal(
            (2, "", "bandspec: warm.json: it belongs to another specification, another order or another version than one.json\n"),
            desk.Run("gather", "one.json", "warm.json"));
        (int code, _, string error) = desk.Run("gather", "torn.json", "other.json", "gone.json");
        Assert.Equal(2, code);
        Assert.Contains("torn.json: it is damaged", error, StringComparison.Ordinal);
        Assert.Contains("other.json: it is no part of virtual lots", error, StringComparison.Ordinal);
        Assert.Contains("gone.json: it cannot be read", error, StringComparison.Ordinal);
    }

    [Fact]
    public void A_sweep_has_a_line_for_each_value_and_tells_findings()
    {
        (int code, string output, string error) = desk.Run(
            "try", "brine-reinjection.yaml", "--units", "400", "--lot-size", "40", "--sweep", "safety-factor=0.9..1.3:0.2");

        Assert.Equal((2, ""), (code, error));
        Snapshot.Match(output);
    }

    [Fact]
    public void A_sweep_is_drawn_when_a_file_is_named()
    {
        (int code, string output, string error) = desk.Run(
            "try", "brine-reinjection.yaml", "--units", "400", "--lot-size", "40", "--sweep", "safety-factor=1.1..1.3:0.1", "--chart", "charts/safety.svg");

        Assert.Equal((0, ""), (code, error));
        Assert.EndsWith("Chart     charts/safety.svg\n", output, StringComparison.Ordinal);
        string chart = File.ReadAllText(desk.At("charts/safety.svg"));
        Assert.Matches(@"3\svalues of safety-factor from 1\.1\sto\s1\.3: the margin goes from", chart);
        Assert.Equal(
            (2, "", "bandspec: --chart draws a sweep; say what to sweep, such as --sweep safety-factor=1.0..1.5:0.1\n"),
            desk.Run("try", "brine-reinjection.yaml", "--chart", "safety.svg"));
    }

    [Fact]
    public void A_change_shows_and_the_rest_of_the_chance_stays()
    {
        double Yield(params string[] change)
        {
            (_, string output, _) = desk.Run(["try", "brine-reinjection.yaml", "--units", "2000", "--lot-size", "40", "--json", .. change]);
            return JsonDocument.Parse(output).RootElement.GetProperty("good").GetProperty("value").GetDouble();
        }

        Assert.Equal(Yield(), Yield("--set", "station.soak-gradient=0.25"));
        Assert.Equal(Yield("--set", "station.soak-gradient=0.25 K"), Yield("--set", "requirement.safety-factor=1.15"));
    }

    [Theory]
    [InlineData("--set", "soak", "bandspec: `soak`: a change is written PATH=VALUE, such as station.soak-gradient=0.5\n")]
    [InlineData("--set", "station.soke=1", "bandspec: `station.soke`: there is no single value at this path in stations/chamber-line-2.yaml\n")]
    [InlineData("--sweep", "safety-factor=1..2", "bandspec: `safety-factor=1..2`: a sweep is written PATH=FROM..TO:STEP, such as safety-factor=1.0..1.5:0.1\n")]
    [InlineData("--units", "many", "bandspec: `many`: units are a whole number from 1 to 1e12\n")]
    [InlineData("--part", "3/2", "bandspec: `3/2`: a part is written PART/PARTS, such as 3/64, with at most as many parts as lots (2500)\n")]
    [InlineData("--lot-size", "3", "bandspec: `3`: --lot-size takes a whole number from 16 to 100000\nbandspec: see `bandspec try --help`\n")]
    public void What_makes_no_sense_is_refused_with_what_would(string option, string value, string message) =>
        Assert.Equal((2, "", message), desk.Run("try", "brine-reinjection.yaml", option, value));

    [Fact]
    public void Findings_that_a_change_leads_to_are_shown_at_their_place()
    {
        (int code, string output, _) = desk.Run("try", "brine-reinjection.yaml", "--set", "station.readings-averaged=0");

        Assert.Equal(2, code);
        Assert.Contains("readings-averaged: 0", output, StringComparison.Ordinal);
    }
}
