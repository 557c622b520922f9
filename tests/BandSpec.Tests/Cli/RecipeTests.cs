using System.Diagnostics;
using BandSpec.Cli;
using BandSpec.Tests.House;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>The recipes that make virtual lots on many machines, with the programs of others that drive them; skipped where one is missing.</summary>
public sealed class RecipeTests : IDisposable
{
    private readonly Desk desk = new();

    public void Dispose() => desk.Dispose();

    [Fact]
    public void Gnu_parallel_makes_the_parts_and_they_are_one_run()
    {
        string recipe = Recipe("parallel.sh");
        (int code, string screen, string errors) = Run("parallel", "bash", recipe, "brine-reinjection.yaml", "3200", "4", "parts");
        Assert.True(code == 0, screen + errors);
        Assert.Equal(4, Directory.EnumerateFiles(desk.At("parts")).Count());
        Assert.Equal(desk.Run("try", "brine-reinjection.yaml", "--units", "3200").Out, screen);
    }

    [Fact]
    public void A_part_that_is_there_is_not_made_again()
    {
        string recipe = Recipe("parallel.sh");
        Run("parallel", "bash", recipe, "brine-reinjection.yaml", "1600", "2", "parts");
        DateTime before = File.GetLastWriteTimeUtc(desk.At("parts/part-1.json"));
        File.Delete(desk.At("parts/part-2.json"));
        Assert.Equal(0, Run("parallel", "bash", recipe, "brine-reinjection.yaml", "1600", "2", "parts").ExitCode);
        Assert.Equal(before, File.GetLastWriteTimeUtc(desk.At("parts/part-1.json")));
    }

    [Fact]
    public void Snakemake_plans_every_part_and_the_whole()
    {
        (int code, string screen, string errors) = Run(
            "snakemake", "snakemake", "--dry-run", "--cores", "1", "--snakefile", Recipe("Snakefile"), "--config", "requirement=brine-reinjection.yaml",
            "units=3200", "parts=4");
        Assert.True(code == 0, screen + errors);
        Assert.Matches(@"part\s+4", screen + errors);
        Assert.Matches(@"whole\s+1", screen + errors);
    }

    private static string Recipe(string name) => Path.Combine(Tree.Root, "requirements-demo", "many-machines", name);

    /// <summary>Runs a program on the desk with <c>bandspec</c> on its path.</summary>
    private (int ExitCode, string Out, string Error) Run(string needed, string program, params string[] arguments)
    {
        string path = Environment.GetEnvironmentVariable("PATH") ?? "";
        Assert.SkipUnless(
            !OperatingSystem.IsWindows() && path.Split(Path.PathSeparator).Any(folder => File.Exists(Path.Combine(folder, needed))), $"{needed} is not installed");
        string own = desk.At("bin/bandspec");
        desk.Write("bin/bandspec", $"#!/bin/sh\nexec dotnet '{typeof(CommandLine).Assembly.Location}' \"$@\"\n");
        if (!OperatingSystem.IsWindows())
            File.SetUnixFileMode(own, UnixFileMode.UserRead | UnixFileMode.UserExecute | UnixFileMode.UserWrite);
        ProcessStartInfo start = new(program) { WorkingDirectory = desk.Folder, RedirectStandardOutput = true, RedirectStandardError = true };
        start.Environment["PATH"] = desk.At("bin") + Path.PathSeparator + path;
        foreach (string argument in arguments)
            start.ArgumentList.Add(argument);
        using Process run = Process.Start(start) ?? throw new InvalidOperationException("a process was started");
        Task<string> errors = run.StandardError.ReadToEndAsync();
        string screen = run.StandardOutput.ReadToEnd();
        run.WaitForExit();
        return (run.ExitCode, screen, errors.Result);
    }
}
