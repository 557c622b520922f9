using System.Text.Json;
using Snapshooter.Xunit3;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>The diagnosis as a user meets it: with every "no", and on request.</summary>
public sealed class DiagnosisCommandTests : IDisposable
{
    private const string File = "brine-reinjection.yaml";

    private readonly Desk desk = new();

    public DiagnosisCommandTests() => desk.Change(File, "candidate-step: 5 K", "candidate-step: 10 K");

    public void Dispose() => desk.Dispose();

    [Fact]
    public void A_no_tells_what_would_have_to_change()
    {
        desk.Change(File, "safety-factor: 1.15", "safety-factor: 2.6");
        (int code, string output, string error) = desk.Run("draft", File);

        Assert.Equal((1, ""), (code, error));
        Snapshot.Match(output);
        Assert.Contains("## 6 What would have to change\n", Read("specification.md"), StringComparison.Ordinal);
        Assert.Equal(0, desk.Run("verify", "out/HV-3107-A").ExitCode);
    }

    [Fact]
    public void A_change_that_is_told_is_enough_when_it_is_made()
    {
        desk.Change(File, "safety-factor: 1.15", "safety-factor: 2.6");
        desk.Run("draft", File);
        JsonElement change = Result().GetProperty("diagnosis").EnumerateArray().First(c => c.GetProperty("change").GetString() == "safety-factor");
        double needed = change.GetProperty("after").GetDouble();

        desk.Change(File, "safety-factor: 2.6", FormattableString.Invariant($"safety-factor: {needed + 0.01:0.00}"));
        Assert.Equal(1, desk.Run("draft", File).ExitCode);
        desk.Change(File, FormattableString.Invariant($"safety-factor: {needed + 0.01:0.00}"), FormattableString.Invariant($"safety-factor: {needed:0.00}"));
        Assert.Equal(0, desk.Run("draft", File).ExitCode);
    }

    [Fact]
    public void Asked_for_it_is_there_for_a_plan_that_fits_and_the_manifest_says_so()
    {
        Assert.Equal(0, desk.Run("draft", File, "--quiet").ExitCode);
        Assert.False(Result().TryGetProperty("held-by", out _));
        (int code, string output, string error) = desk.Run("draft", File, "--diagnose");

        Assert.Equal((0, ""), (code, error));
        Assert.Contains("Held by   ", output, StringComparison.Ordinal);
        Assert.Contains("Input, one step upwards", output, StringComparison.Ordinal);
        Assert.Contains("## 6 What holds the margin\n", Read("specification.md"), StringComparison.Ordinal);
        Assert.Equal(0, Result().GetProperty("diagnosis").GetArrayLength());
        Assert.True(JsonDocument.Parse(Read("manifest.json")).RootElement.GetProperty("diagnosed").GetBoolean());
        Assert.Equal(0, desk.Run("verify", "out/HV-3107-A").ExitCode);
        Assert.Contains("up to date", desk.Run("draft", File, "--diagnose").Out, StringComparison.Ordinal);
        Assert.DoesNotContain("up to date", desk.Run("draft", File).Out, StringComparison.Ordinal);
    }

    private string Read(string file) => System.IO.File.ReadAllText(desk.At(Path.Combine("out/HV-3107-A", file)));

    private JsonElement Result() => JsonDocument.Parse(Read("result.json")).RootElement;
}
