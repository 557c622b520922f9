using System.Text.Json;
using BandSpec.Tests.House;
using Snapshooter.Xunit3;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>The commands that make statistics, run on the demo readings as a user would.</summary>
public sealed class CharacterizeTests : IDisposable
{
    private static readonly string[] Range = ["--range", "0 bar..25 bar"];
    private readonly Desk desk = new();

    public CharacterizeTests()
    {
        foreach (string name in new[] { "steel-cell-40.csv", "steel-cell-40-storage.csv" })
            File.Copy(Path.Combine(Tree.Root, "requirements-demo", "readings", name), desk.At(name));
    }

    public void Dispose() => desk.Dispose();

    [Fact]
    public void Characterize_shows_the_statistics_and_writes_platform_and_report()
    {
        (int code, string output, string error) = desk.Run(
            ["characterize", "steel-cell-40.csv", .. Range, "--platform", "cell.yaml", "--report", "report", "--name", "SK-40 steel cell"]);

        Assert.Equal((0, ""), (code, error));
        Snapshot.Match(output + "\n" + desk.Text("cell.yaml"));
        Assert.Equal(
            ["characterization.json", "characterization.md", "characterization.pdf", "raw-span.svg", "raw-zero.svg", "residuals-pressure.svg", "residuals.svg"],
            Directory.EnumerateFiles(desk.At("report")).Select(Path.GetFileName).Order(StringComparer.Ordinal));
    }

    [Fact]
    public void A_platform_keeps_its_name_and_ratings_and_age_touches_nothing_but_ageing()
    {
        desk.Run(["characterize", "steel-cell-40.csv", .. Range, "--platform", "platforms/steel-cell-40.yaml", "--quiet"]);
        string characterized = desk.Text("platforms/steel-cell-40.yaml");
        Assert.Contains("platform: { name: SK-40 welded steel cell, revision: 4 }", characterized, StringComparison.Ordinal);
        Assert.Contains("burst-factor: 5", characterized, StringComparison.Ordinal);

        (int code, string output, string error) = desk.Run(
            ["age", "steel-cell-40-storage.csv", .. Range, "--platform", "platforms/steel-cell-40.yaml", "--plan-units", "12", "--plan-storage", "85 °C", "--plan-times", "1000 h", "3000 h"]);

        Assert.Equal((0, ""), (code, error));
        Snapshot.Match(output);
        string aged = desk.Text("platforms/steel-cell-40.yaml");
        Assert.Equal(Before(characterized, "ageing:"), Before(aged, "# Drift of 60 units"));
        Assert.Contains("    activation-energy-error: ", aged, StringComparison.Ordinal);
        Assert.Equal((0, ""), (desk.Run("check", "brine-reinjection.yaml", "--quiet").ExitCode, desk.Run("check", "brine-reinjection.yaml", "--quiet").Out));
    }

    [Fact]
    public void New_statistics_leave_what_a_person_wrote_about_the_rest()
    {
        string file = "platforms/steel-cell-40.yaml";
        desk.Change(file, "platform:", "# yaml-language-server: $schema=platform.schema.json\nplatform:");
        desk.Change(file, "pressure: {", "pressure: # as rated by the design office\n  {");
        desk.Change(file, "ageing:", "# Drift from the tests of two years.\nageing:   # taken over from the older cell");
        string before = desk.Text(file);
        desk.Run(["characterize", "steel-cell-40.csv", .. Range, "--platform", file, "--quiet"]);
        string after = desk.Text(file);
        Assert.StartsWith("# yaml-language-server: $schema=platform.schema.json\n# Statistics of 46 units", after, StringComparison.Ordinal);
        Assert.Contains("pressure: # as rated by the design office\n  {", after, StringComparison.Ordinal);
        Assert.Contains(before[before.IndexOf("# Drift from", StringComparison.Ordinal)..].TrimEnd(), after, StringComparison.Ordinal);
        Assert.Equal((0, ""), (desk.Run("check", "brine-reinjection.yaml", "--quiet").ExitCode, desk.Run("check", "brine-reinjection.yaml", "--quiet").Out));
    }

    [Fact]
    public void Ageing_that_stood_in_for_a_test_does_not_say_at_what_temperature_the_drift_is_stated()
    {
        desk.Run(["characterize", "steel-cell-40.csv", .. Range, "--platform", "cell.yaml", "--quiet"]);
        Assert.Contains("test: { temperature: 25 °C", desk.Text("cell.yaml"), StringComparison.Ordinal);
        desk.Run(["age", "steel-cell-40-storage.csv", .. Range, "--platform", "cell.yaml", "--quiet"]);
        Assert.Contains("test: { temperature: 105 °C, duration: 1000 h }", desk.Text("cell.yaml"), StringComparison.Ordinal);
    }

    [Fact]
    public void Age_draws_the_region_and_the_drift()
    {
        (int code, _, string error) = desk.Run(["age", "steel-cell-40-storage.csv", .. Range, "--report", "report", "--quiet"]);
        Assert.Equal((0, ""), (code, error));
        Assert.Equal(
            ["ageing.json", "ageing.md", "ageing.pdf", "drift-high.svg", "drift-low.svg", "region.svg"],
            Directory.EnumerateFiles(desk.At("report")).Select(Path.GetFileName).Order(StringComparer.Ordinal));
        string drift = desk.Text("report/drift-low.svg");
        Assert.All(new[] { "105 °C", "125 °C", "150 °C" }, storage => Assert.Contains(storage, drift, StringComparison.Ordinal));
    }

    [Fact]
    public void A_draft_says_what_can_be_claimed_from_the_sample()
    {
        desk.Run(["characterize", "steel-cell-40.csv", .. Range, "--platform", "platforms/steel-cell-40.yaml", "--quiet"]);
        string output = desk.Run("draft", "brine-reinjection.yaml").Out;
        Assert.Contains("with 95 % confidence: the statistics rest on 46 units of 3 lots", output, StringComparison.Ordinal);
        string text = File.ReadAllText(desk.At("out/HV-3107-A/specification.md")).Replace('\u00a0', ' ');
        Assert.Contains("rest on 3860 readings of 46 units of 3 lots", text, StringComparison.Ordinal);
    }

    /// <summary>The same statistics and the same confidence: with the tighter requirement only the sample is missing, with the wider one nothing is.</summary>
    [Theory]
    [InlineData("1.96", 1, "NOT FEASIBLE with 95 % confidence", "keeps the allowed error with a margin of", "The sample does not make the allowed error certain")]
    [InlineData("1.94", 0, "FEASIBLE  margin", "the error stays within", "is certain with a confidence of 95 %")]
    public void A_confidence_decides_whether_a_plan_holds(string safety, int exitCode, string screen, string promise, string answer)
    {
        desk.Run(["characterize", "steel-cell-40.csv", .. Range, "--platform", "platforms/steel-cell-40.yaml", "--quiet"]);
        desk.Change("brine-reinjection.yaml", "safety-factor: 1.15", $"safety-factor: {safety}");
        desk.Change("brine-reinjection.yaml", "long-run: 1.33 }", "long-run: 1.33, confidence: 0.95 }");
        (int code, string output, _) = desk.Run("draft", "brine-reinjection.yaml");
        Assert.Equal(exitCode, code);
        Assert.Contains(screen, output, StringComparison.Ordinal);
        string text = desk.Text("out/HV-3107-A/specification.md").Replace('\u00a0', ' ');
        Assert.Contains(promise, text, StringComparison.Ordinal);
        Assert.Contains(answer, text, StringComparison.Ordinal);
        double claimed = JsonDocument.Parse(desk.Text("out/HV-3107-A/result.json")).RootElement.GetProperty("claim").GetProperty("margin").GetDouble();
        Assert.Equal(exitCode == 0, claimed >= 1);
    }

    [Fact]
    public void A_confidence_without_a_sample_is_a_finding()
    {
        desk.Change("brine-reinjection.yaml", "long-run: 1.33 }", "long-run: 1.33, confidence: 0.95 }");
        (int code, string output, _) = desk.Run("check", "brine-reinjection.yaml");
        Assert.Equal(2, code);
        Assert.Contains("[no-sample]", output, StringComparison.Ordinal);
    }

    [Fact]
    public void Findings_name_what_is_wrong_and_nothing_is_written()
    {
        (int code, string output, _) = desk.Run("characterize", "steel-cell-40.csv", "--platform", "cell.yaml");
        Assert.Equal(2, code);
        Assert.Contains("[no-range]", output, StringComparison.Ordinal);
        Assert.False(File.Exists(desk.At("cell.yaml")));

        (code, output, _) = desk.Run(["characterize", "steel-cell-40.csv", .. Range, "--exclude", "999"]);
        Assert.Equal(2, code);
        Assert.Contains("`999` is to be left out and not among the readings", output, StringComparison.Ordinal);

        (code, _, string error) = desk.Run(["age", "steel-cell-40-storage.csv", .. Range, "--plan-units", "12"]);
        Assert.Equal(2, code);
        Assert.Contains("a planned test takes all of --plan-units, --plan-storage and --plan-times", error, StringComparison.Ordinal);

        Assert.Equal((2, "bandspec: `zero=12`: accepted are zero, span, bow or s-shape with a degree 0 to 8 or `none`, such as zero=3\nbandspec: see `bandspec characterize --help`\n"),
            (desk.Run("characterize", "steel-cell-40.csv", "--degree", "zero=12").ExitCode, desk.Run("characterize", "steel-cell-40.csv", "--degree", "zero=12").Error));
    }

    private static string Before(string text, string mark) => text[..text.IndexOf(mark, StringComparison.Ordinal)];
}
