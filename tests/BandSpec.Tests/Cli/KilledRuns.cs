using System.Diagnostics;
using System.Security.Cryptography;
using System.Text.Json;
using BandSpec.Cli;
using BandSpec.Tests.Revising;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>The program killed at any moment leaves the older package or the new one, never a part of one.</summary>
public sealed class KilledRuns : IDisposable
{
    /// <summary>So many layouts of the limits make the writing long enough to be met.</summary>
    private const int Layouts = 90;

    private readonly Workshop shop = new();
    private readonly Random moments = new(20261201);
    private readonly Tally tally = new();

    public void Dispose() => shop.Dispose();

    /// <summary>BANDSPEC_KILLS makes the run a long one.</summary>
    private static int Kills => int.TryParse(Environment.GetEnvironmentVariable("BANDSPEC_KILLS"), out int kills) ? kills : 20;

    [Fact]
    public void A_package_is_whole_whenever_the_program_is_killed()
    {
        for (int i = 0; i < Layouts; i++)
            shop.Write($"templates/limits/layout-{i:000}.txt.scriban", "{{ for p in points }}{{ p.id }} {{ p.lower }} {{ p.upper }}\n{{ end }}");
        DraftWhole("as it was");
        TimeSpan whole = TimeToRun();
        string older = DigestOf("HV-3107-A");
        for (int kill = 0; kill < Kills; kill++)
        {
            Retitle($"killed run {kill}");
            // One moment in five is anywhere in a run; the others are in the writing, which is a small part of it: after so many of its files.
            if (kill % 5 == 0)
                Kill(run => run.WaitForExit(whole * moments.NextDouble()));
            else
                Kill(run => WaitForFiles(run, moments.Next(shop.Names("out/HV-3107-A").Length + 10), 4 * moments.NextDouble()));
            tally.Kills++;
            string now = DigestOf("HV-3107-A");
            Assert.True(now == older || File.ReadAllText(shop.PathOf("out/HV-3107-A/specification.md")).Contains($"killed run {kill}", StringComparison.Ordinal));
            AssertWhole();
            tally.New += now == older ? 0 : 1;
            tally.Met += shop.Names("out").Contains(".HV-3107-A.new") ? 1 : 0;
            DraftWhole($"after kill {kill}");
            Assert.Equal([".bandspec.lock", "HV-3107-A"], shop.Names("out"));
            older = DigestOf("HV-3107-A");
        }

        TestContext.Current.TestOutputHelper?.WriteLine(
            $"{tally.Kills} kills; {tally.Met} met the writing, as its unfinished folder shows; {tally.New} came after the new package had taken its place");
        Assert.True(tally.Met >= Kills / 4, $"{tally.Met} of {Kills} kills met the writing");
    }

    private TimeSpan TimeToRun()
    {
        Retitle("to measure again");
        long begin = Stopwatch.GetTimestamp();
        using Process run = Start();
        run.WaitForExit();
        Assert.Equal(0, run.ExitCode);
        return Stopwatch.GetElapsedTime(begin);
    }

    private void Kill(Action<Process> wait)
    {
        using Process run = Start();
        wait(run);
        run.Kill();
        run.WaitForExit();
    }

    /// <summary>Waits until a run has begun to write so many files of its unfinished package, or has none any more, and then some milliseconds.</summary>
    private void WaitForFiles(Process run, int files, double milliseconds)
    {
        bool hasBegun = false;
        while (!run.WaitForExit(0))
        {
            int written = FilesOfUnfinished();
            if (written >= files || (hasBegun && written < 0))
                break;
            hasBegun |= written >= 0;
        }

        long begin = Stopwatch.GetTimestamp();
        while (Stopwatch.GetElapsedTime(begin).TotalMilliseconds < milliseconds)
            Thread.SpinWait(50);
    }

    private int FilesOfUnfinished()
    {
        try
        {
            return Directory.EnumerateFiles(shop.PathOf("out/.HV-3107-A.new")).Count();
        }
        catch (DirectoryNotFoundException)
        {
            return -1;
        }
    }

    private void Retitle(string title) => shop.Write(
        Workshop.Brine, string.Concat(shop.Read(Workshop.Brine).Split('\n').Select(line => (line.StartsWith("  title:", StringComparison.Ordinal) ? $"  title: {title}" : line) + "\n")).TrimEnd() + "\n");

    /// <summary>The next run, which nobody kills: it cleans up and writes its own package.</summary>
    private void DraftWhole(string title)
    {
        Retitle(title);
        Screen screen = shop.Run("draft", Workshop.Brine, "--quiet");
        Assert.True(screen.ExitCode == 0, $"{title}: {screen.Output}{screen.Error}");
        AssertWhole();
    }

    private string DigestOf(string package) => Convert.ToHexStringLower(SHA256.HashData(File.ReadAllBytes(shop.PathOf($"out/{package}/manifest.json"))));

    private void AssertWhole()
    {
        string folder = shop.PathOf("out/HV-3107-A");
        JsonElement outputs = JsonDocument.Parse(File.ReadAllText(Path.Combine(folder, "manifest.json"))).RootElement.GetProperty("outputs");
        foreach (JsonElement file in outputs.EnumerateArray())
            Assert.Equal(
                file.GetProperty("sha256").GetString(),
                Convert.ToHexStringLower(SHA256.HashData(File.ReadAllBytes(Path.Combine(folder, file.GetProperty("name").GetString()!)))));
        Assert.Equal(outputs.GetArrayLength() + 1, Directory.EnumerateFileSystemEntries(folder).Count());
    }

    private Process Start() => Process.Start(new ProcessStartInfo("dotnet", [typeof(CommandLine).Assembly.Location, "draft", Workshop.Brine, "--quiet"])
    {
        WorkingDirectory = shop.Folder,
    }) ?? throw new InvalidOperationException("a process was started");

    private sealed class Tally
    {
        public int Kills { get; set; }

        public int Met { get; set; }

        public int New { get; set; }
    }
}
