using System.Diagnostics;
using BandSpec.Cli;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>The program run as a process of its own, in other surroundings: the package is the same to the last byte.</summary>
public sealed class ReproductionTests
{
    [Fact]
    public void A_package_does_not_depend_on_folder_time_zone_language_or_number_of_processors()
    {
        using Desk here = new(), there = new();
        SortedDictionary<string, byte[]> first = Draft(
            here, here.Folder, ("TZ", "Pacific/Kiritimati"), ("LC_ALL", "de_DE.UTF-8"), ("DOTNET_PROCESSOR_COUNT", "1"));
        SortedDictionary<string, byte[]> second = Draft(
            there, Path.GetDirectoryName(there.Folder)!, ("TZ", "America/Anchorage"), ("LC_ALL", "ar_SA.UTF-8"), ("DOTNET_PROCESSOR_COUNT", "7"));
        Assert.Equal(first.Keys, second.Keys);
        Assert.Contains("specification.pdf", first.Keys);
        Assert.All(first, file => Assert.True(file.Value.AsSpan().SequenceEqual(second[file.Key]), file.Key));
    }

    /// <summary>The files of a package that is drafted from a folder, with the requirement named from there.</summary>
    private static SortedDictionary<string, byte[]> Draft(Desk desk, string from, params (string Name, string Value)[] surroundings)
    {
        ProcessStartInfo start = new("dotnet") { WorkingDirectory = from, RedirectStandardOutput = true, RedirectStandardError = true };
        foreach ((string name, string value) in surroundings)
            start.Environment[name] = value;
        string[] arguments =
            [typeof(CommandLine).Assembly.Location, "draft", Path.GetRelativePath(from, desk.At("brine-reinjection.yaml")), "--out", desk.At("out")];
        foreach (string argument in arguments)
            start.ArgumentList.Add(argument);
        using Process run = Process.Start(start) ?? throw new InvalidOperationException("a process was started");
        Task<string> errors = run.StandardError.ReadToEndAsync();
        string screen = run.StandardOutput.ReadToEnd();
        run.WaitForExit();
        Assert.True(run.ExitCode == 0, screen + errors.Result);
        string folder = Assert.Single(Directory.EnumerateDirectories(desk.At("out")));
        return new SortedDictionary<string, byte[]>(
            Directory.EnumerateFiles(folder).ToDictionary(file => Path.GetFileName(file), File.ReadAllBytes), StringComparer.Ordinal);
    }
}
