using System.Diagnostics;
using System.Security.Cryptography;
using System.Text.Json;
using BandSpec.Cli;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>The program killed at any moment leaves the older package or the new one, never a part of one.</summary>
public sealed class KilledRuns : IDisposable
{
    private readonly Desk desk = new();

    public void Dispose() => desk.Dispose();

    /// <summary>BANDSPEC_KILLS makes the run a long one.</summary>
    private static int Kills => int.TryParse(Environment.GetEnvironmentVariable("BANDSPEC_KILLS"), out int kills) ? kills : 6;

    [Fact]
    public void A_package_is_whole_whenever_the_program_is_killed()
    {
        Random moments = new(20261201);
        int whole = 0;
        for (int kill = 0; kill < Kills; kill++)
        {
            // Each run writes other bytes than the one before.
            desk.Change("brine-reinjection.yaml", kill % 2 == 0 ? "title: Brine" : "title: Hot brine", kill % 2 == 0 ? "title: Hot brine" : "title: Brine");
            using Process run = Start("draft", "brine-reinjection.yaml", "--quiet");
            // The package is written in the last tenth of a run: most moments are late ones.
            if (run.WaitForExit(moments.Next(200, 2500)))
                whole++;
            else
                run.Kill(entireProcessTree: true);
            run.WaitForExit();
            AssertWhole();
        }

        Assert.Equal(0, Start("draft", "brine-reinjection.yaml", "--quiet") is var last && last.WaitForExit(60_000) ? last.ExitCode : -1);
        AssertWhole();
        Assert.Equal([".bandspec.lock", "HV-3107-A"], Directory.EnumerateFileSystemEntries(desk.At("out")).Select(path => Path.GetFileName(path)).Order(StringComparer.Ordinal));
        TestContext.Current.TestOutputHelper?.WriteLine($"{whole} of {Kills} runs ended before they were killed");
    }

    private void AssertWhole()
    {
        string folder = desk.At("out/HV-3107-A");
        if (!Directory.Exists(folder))
            return;
        JsonElement outputs = JsonDocument.Parse(File.ReadAllBytes(Path.Combine(folder, "manifest.json"))).RootElement.GetProperty("outputs");
        foreach (JsonElement file in outputs.EnumerateArray())
            Assert.Equal(
                file.GetProperty("sha256").GetString(),
                Convert.ToHexStringLower(SHA256.HashData(File.ReadAllBytes(Path.Combine(folder, file.GetProperty("name").GetString()!)))));
        Assert.Equal(outputs.GetArrayLength() + 1, Directory.EnumerateFileSystemEntries(folder).Count());
    }

    private Process Start(params string[] arguments)
    {
        ProcessStartInfo start = new("dotnet") { WorkingDirectory = desk.Folder, RedirectStandardOutput = true, RedirectStandardError = true };
        start.ArgumentList.Add(typeof(CommandLine).Assembly.Location);
        foreach (string argument in arguments)
            start.ArgumentList.Add(argument);
        return Process.Start(start) ?? throw new InvalidOperationException("a process was started");
    }
}
