using System.Diagnostics;
using BandSpec.Cli;
using BandSpec.Cli.Printing;
using Xunit;

namespace BandSpec.Tests.Revising;

/// <summary>A folder of its own with a small project in it, and the program run there as a user would; removed at the end.</summary>
internal sealed class Workshop : IDisposable
{
    public const string Brine = "brine.yaml", Platform = "platforms/cell.yaml", Station = "stations/line.yaml";

    /// <summary>An application close to the first demo, with few candidate plans, so that a draft takes a moment.</summary>
    public Workshop()
    {
        Folder = Directory.CreateTempSubdirectory("bandspec-shop-").FullName;
        foreach ((string name, string text) in Sample.Files)
            Write(name, text);
    }

    public string Folder { get; }

    public string PathOf(string name) => Path.Combine(Folder, name);

    public string Read(string name) => File.ReadAllText(PathOf(name));

    public void Write(string name, string text)
    {
        Directory.CreateDirectory(Path.GetDirectoryName(PathOf(name))!);
        File.WriteAllText(PathOf(name), text);
    }

    /// <summary>Replaces a text that stands in a file exactly once.</summary>
    public void Edit(string name, string old, string now)
    {
        string text = Read(name);
        Assert.Equal(2, text.Split(old).Length);
        Write(name, text.Replace(old, now, StringComparison.Ordinal));
    }

    /// <summary>Runs the program in the folder, without colours.</summary>
    public Screen Run(params string[] arguments) => RunAt(TimeProvider.System, arguments);

    /// <summary>Releases the sample at half past nine on 25 November 2026.</summary>
    public Screen Release(string by) => RunAt(new FixedClock(new DateTimeOffset(2026, 11, 25, 9, 30, 15, 700, TimeSpan.Zero)), "release", Brine, "--by", by);

    /// <summary>What is in a folder, hidden entries too, but for the repository.</summary>
    public string[] Names(string folder = "") =>
        [.. Directory.EnumerateFileSystemEntries(PathOf(folder)).Select(path => Path.GetFileName(path)).Where(name => name != ".git").Order(StringComparer.Ordinal)];

    public Screen RunAt(TimeProvider clock, params string[] arguments)
    {
        using StringWriter output = new() { NewLine = "\n" }, error = new() { NewLine = "\n" };
        int code = CommandLine.Run(arguments, new Terminal
        {
            Out = output, Error = error, Ink = Ink.None, IsWatched = false, Folder = Folder, Clock = clock,
        });
        return new Screen(code, output.ToString(), error.ToString());
    }

    /// <summary>Makes a repository of the folder and commits everything in it under a tag; the test is skipped where there is no git.</summary>
    public void Commit(string tag)
    {
        Git("init", "--quiet", ".");
        Git("add", "--all");
        Git("-c", "user.name=Test", "-c", "user.email=test@invalid", "-c", "commit.gpgsign=false", "commit", "--quiet", "--message", tag);
        Git("tag", tag);
    }

    public void Dispose() => Directory.Delete(Folder, recursive: true);

    private void Git(params string[] arguments)
    {
        try
        {
            using Process git = Process.Start(new ProcessStartInfo("git", arguments) { WorkingDirectory = Folder })!;
            git.WaitForExit();
            Assert.Equal(0, git.ExitCode);
        }
        catch (System.ComponentModel.Win32Exception)
        {
            Assert.Skip("there is no git on this machine");
        }
    }
}

/// <summary>What a run of the program left on the screen.</summary>
internal sealed record Screen(int ExitCode, string Output, string Error);

/// <summary>A clock that stands still on the wall, but lets time be waited for.</summary>
internal sealed class FixedClock(DateTimeOffset now) : TimeProvider
{
    public override DateTimeOffset GetUtcNow() => now;
}
