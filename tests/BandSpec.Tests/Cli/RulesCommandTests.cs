using System.Text.Json;
using Snapshooter.Xunit3;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>Decision rules compared, as a user asks for it.</summary>
public sealed class RulesCommandTests : IDisposable
{
    private const string File = "brine-reinjection.yaml";

    private readonly Desk desk = new();

    public RulesCommandTests() => desk.Change(File, "candidate-step: 5 K", "candidate-step: 15 K");

    public void Dispose() => desk.Dispose();

    [Fact]
    public void The_screen_shows_every_rule_and_marks_the_requirement_s()
    {
        // A station so noisy that the rules differ by more than millionths.
        desk.Change("stations/chamber-line-2.yaml", "reading-noise: 0.015 %FS", "reading-noise: 0.12 %FS");
        (int code, string output, string error) = desk.Run("rules", File);
        Assert.Equal((0, ""), (code, error));
        Snapshot.Match(output);
    }

    [Fact]
    public void Programs_are_told_the_same_as_the_package_tells()
    {
        desk.Change(File, "guard-band: 1.0", "decision-rule: specific-risk, risk: 0.01");
        JsonElement shown = JsonDocument.Parse(desk.Run("rules", File, "--json").Out).RootElement;
        Assert.Equal(0, desk.Run("draft", File, "--quiet").ExitCode);
        JsonElement result = Json("result.json"), limits = Json("limits.json");
        foreach (string member in new[] { "decision-rules", "field" })
            Assert.Equal(result.GetProperty(member).GetRawText(), shown.GetProperty(member).GetRawText());
        JsonElement chosen = Assert.Single(shown.GetProperty("decision-rules").EnumerateArray(), r => r.GetProperty("chosen").GetBoolean());
        Assert.Equal(("specific-risk", 0.01), (chosen.GetProperty("rule").GetString(), chosen.GetProperty("risk").GetDouble()));
        Assert.Equal(("specific-risk", 0.01), (limits.GetProperty("decision-rule").GetProperty("rule").GetString(), limits.GetProperty("decision-rule").GetProperty("risk").GetDouble()));
        Assert.Equal(
            limits.GetProperty("points").EnumerateArray().Select(p => (p.GetProperty("lower").GetDouble(), p.GetProperty("upper").GetDouble())),
            chosen.GetProperty("points").EnumerateArray().Select(p => (p.GetProperty("lower").GetDouble(), p.GetProperty("upper").GetDouble())));
        Assert.Contains("with a probability of 1 %", System.IO.File.ReadAllText(desk.At("out/HV-3107-A/specification.md")).Replace('\u00a0', ' '), StringComparison.Ordinal);
    }

    [Fact]
    public void A_rule_that_cannot_be_met_says_what_would_do()
    {
        desk.Change(File, "guard-band: 1.0", "guard-band: 3");
        desk.Change("stations/chamber-line-2.yaml", "reading-noise: 0.015 %FS", "reading-noise: 0.25 %FS");
        (int code, string output, _) = desk.Run("rules", File);
        Assert.Equal(1, code);
        Assert.Contains("guarded 3 U cannot be met: it accepts nothing at ", output, StringComparison.Ordinal);
        Assert.Contains("no unit is accepted", output, StringComparison.Ordinal);
        Assert.Contains("; an expanded uncertainty of 0.1", output, StringComparison.Ordinal);
    }

    private JsonElement Json(string name) => JsonDocument.Parse(System.IO.File.ReadAllText(desk.At($"out/HV-3107-A/{name}"))).RootElement;
}
