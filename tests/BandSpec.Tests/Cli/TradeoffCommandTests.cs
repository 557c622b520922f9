using System.Text.Json;
using System.Xml.Linq;
using Snapshooter.Xunit3;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>What more money buys, as a user asks for it.</summary>
public sealed class TradeoffCommandTests : IDisposable
{
    private const string File = "brine-reinjection.yaml";

    private const string Sample = """
        sample:
          units: 46
          lots: 3
          readings: 3860
          coefficients:
            - { of: zero.0, variance-error: 1.214, lot-variance-error: 0.6894, mean-covariance: [0.2283] }
            - { of: zero.1, variance-error: 0.3837, lot-variance-error: 0.1187, mean-covariance: [-2.0e-07, 0.03868] }
            - { of: zero.2, variance-error: 0.01, mean-covariance: [0, 0, 0.0012] }
            - { of: zero.3, variance-error: 0.001, mean-covariance: [0, 0, 0, 0.0002] }
            - { of: zero.4, variance-error: 0.0002, mean-covariance: [0, 0, 0, 0, 0.00002] }
            - { of: span.0, variance-error: 3.0, lot-variance-error: 1.0, mean-covariance: [0, 0, 0, 0, 0, 0.6] }
            - { of: span.1, variance-error: 0.2, lot-variance-error: 0.1, mean-covariance: [0, 0, 0, 0, 0, 0, 0.05] }
            - { of: span.2, variance-error: 0.02, mean-covariance: [0, 0, 0, 0, 0, 0, 0, 0.004] }
            - { of: span.3, variance-error: 0.002, mean-covariance: [0, 0, 0, 0, 0, 0, 0, 0, 0.0004] }
            - { of: span.4, variance-error: 0.0003, mean-covariance: [0, 0, 0, 0, 0, 0, 0, 0, 0, 0.00004] }
            - { of: bow.0, variance-error: 0.001, mean-covariance: [0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0.0003] }
            - { of: bow.1, variance-error: 0.0001, mean-covariance: [0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0.00004] }
            - { of: s-shape.0, variance-error: 0.0001, mean-covariance: [0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0.00002] }
          pressure-hysteresis: { mean-error: 0.00182 %FS, variance-error: 3.212e-05 }
          thermal-hysteresis: { mean-error: 0.002308 %FS, variance-error: 5.167e-05 }
          repeatability-variance-error: 3.731e-06
        """;

    private readonly Desk desk = new();

    public TradeoffCommandTests() => desk.Change(File, "candidate-step: 5 K, temperatures: 3", "candidate-step: 10 K, temperatures: 3..4");

    public void Dispose() => desk.Dispose();

    [Fact]
    public void The_screen_shows_both_fronts_and_marks_what_a_draft_takes()
    {
        (int code, string output, string error) = desk.Run("tradeoff", File);

        Assert.Equal((0, ""), (code, error));
        Snapshot.Match(output);
    }

    [Fact]
    public void Programs_are_told_the_same_and_the_optimum_is_that_of_a_draft()
    {
        JsonElement root = Json("tradeoff", File, "--json");
        desk.Run("draft", File);
        JsonElement plan = JsonDocument.Parse(System.IO.File.ReadAllText(desk.At("out/HV-3107-A/result.json"))).RootElement.GetProperty("plan");

        Assert.True(root.GetProperty("proven").GetBoolean());
        JsonElement optimum = Assert.Single(root.GetProperty("by-margin").EnumerateArray(), p => p.GetProperty("optimum").GetBoolean());
        Assert.Equal(Temperatures(plan), Temperatures(optimum));
        Assert.Equal(plan.GetProperty("cost-per-unit").GetDouble(), optimum.GetProperty("cost-per-unit").GetDouble(), 9);
        double[] costs = [.. root.GetProperty("by-margin").EnumerateArray().Select(p => p.GetProperty("cost-per-unit").GetDouble())];
        Assert.Equal(costs.Order(), costs);
    }

    [Fact]
    public void A_chosen_plan_is_pinned_drafted_and_held_against_the_optimum()
    {
        string before = System.IO.File.ReadAllText(desk.At(File));
        JsonElement last = Json("tradeoff", File, "--json").GetProperty("by-margin").EnumerateArray().Last();
        int number = last.GetProperty("number").GetInt32();
        (int code, string output, string error) = desk.Run("tradeoff", File, "--choose", $"{number}");

        Assert.Equal((0, ""), (code, error));
        Assert.Contains($"{File} now pins plan {number}: ", output, StringComparison.Ordinal);
        string[] changed = [.. System.IO.File.ReadAllLines(desk.At(File)).Except(before.Split('\n'))];
        Assert.StartsWith("compensation: { candidate-step: 10 K", Assert.Single(changed), StringComparison.Ordinal);
        Assert.Contains($"+ {changed[0]}\n", output, StringComparison.Ordinal);

        (code, output, _) = desk.Run("draft", File);
        Assert.Equal(0, code);
        Assert.Contains("a plan that the requirement pins", output, StringComparison.Ordinal);
        JsonElement plan = JsonDocument.Parse(System.IO.File.ReadAllText(desk.At("out/HV-3107-A/result.json"))).RootElement.GetProperty("plan");
        Assert.Equal(Temperatures(last), Temperatures(plan));
        Assert.Contains("up to date", desk.Run("draft", File).Out, StringComparison.Ordinal);
        Assert.Contains($"{File} pins plan {number} already", desk.Run("tradeoff", File, "--choose", $"{number}").Out, StringComparison.Ordinal);
    }

    [Fact]
    public void A_number_that_is_not_there_is_refused_and_nothing_is_written()
    {
        string before = System.IO.File.ReadAllText(desk.At(File));
        (int code, _, string error) = desk.Run("tradeoff", File, "--choose", "99", "--quiet");

        Assert.Equal(2, code);
        Assert.Matches("^bandspec: there is no plan 99; there are 1 to [0-9]+\n$", error);
        Assert.Equal(before, System.IO.File.ReadAllText(desk.At(File)));
    }

    [Fact]
    public void A_released_revision_keeps_its_plan()
    {
        Assert.Equal(0, desk.Run("release", File, "--by", "N. Aas").ExitCode);

        Assert.Equal(
            (2, "", $"bandspec: HV-3107-A is released and stays as it is; give {File} a new revision first\n"),
            desk.Run("tradeoff", File, "--choose", "1", "--quiet"));
    }

    [Theory]
    [InlineData("charts", "charts/HV-3107-A-tradeoff.svg")]
    [InlineData("front.svg", "front.svg")]
    public void The_chart_goes_to_the_folder_or_the_file_that_was_named(string named, string file)
    {
        Assert.Contains($"Chart     {file}\n", desk.Run("tradeoff", File, "--out", named).Out, StringComparison.Ordinal);

        XElement chart = XDocument.Load(desk.At(file)).Root!;
        Assert.All(["title", "desc"], name => Assert.NotEmpty(chart.Element(chart.Name.Namespace + name)!.Value));
    }

    [Fact]
    public void A_sample_tells_how_many_more_units_would_make_a_plan_safe()
    {
        string platform = System.IO.File.ReadAllText(desk.At("platforms/steel-cell-40.yaml"));
        desk.Write("platforms/steel-cell-40.yaml", platform + Sample);
        desk.Change(File, "safety-factor: 1.15", "safety-factor: 1.86");
        string output = desk.Run("tradeoff", File).Out;
        JsonElement[] points = [.. Json("tradeoff", File, "--json").GetProperty("by-margin").EnumerateArray()];

        Assert.Contains("at 95 %", output, StringComparison.Ordinal);
        Assert.Matches("Sample    [0-9]+ more units measured, in lots of the same size, would make plan 1 safe with 95 % confidence\n", output);
        Assert.All(points, p => Assert.True(p.GetProperty("claim").GetProperty("margin").GetDouble() < p.GetProperty("margin").GetDouble()));
        Assert.All(points, p => Assert.Equal(
            p.GetProperty("claim").GetProperty("margin").GetDouble() >= 1, p.GetProperty("claim").GetProperty("further-units") is { ValueKind: JsonValueKind.Number } units && units.GetInt32() == 0));
    }

    [Fact]
    public void When_no_plan_fits_the_answer_is_no()
    {
        desk.Change(File, "safety-factor: 1.15", "safety-factor: 3");
        (int code, string output, string error) = desk.Run("tradeoff", File);

        Assert.Equal((1, ""), (code, error));
        Assert.Contains("no plan fits", output, StringComparison.Ordinal);
    }

    [Fact]
    public void Stopped_it_says_how_far_it_got()
    {
        (int code, string output, string error) = desk.RunStopped("tradeoff", File, "--json");

        Assert.Equal(1, code);
        Assert.Equal("bandspec: HV-3107-A: stopped; margins are not begun, rms errors are not begun\n", error);
        Assert.False(JsonDocument.Parse(output).RootElement.GetProperty("proven").GetBoolean());
    }

    private static double[] Temperatures(JsonElement plan) => [.. plan.GetProperty("temperatures").EnumerateArray().Select(t => t.GetDouble())];

    private JsonElement Json(params string[] arguments) => JsonDocument.Parse(desk.Run(arguments).Out).RootElement;
}
