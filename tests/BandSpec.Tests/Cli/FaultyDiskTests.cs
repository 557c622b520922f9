using System.Diagnostics;
using BandSpec.Cli;
using BandSpec.Tests.Revising;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>
/// A disk that is full or read-only, made of memory in a room of mounts of its own (<c>unshare</c>): nothing stays mounted, whatever becomes of the test.
/// </summary>
public sealed class FaultyDiskTests : IDisposable
{
    /// <summary>Arguments: the size of the disk, whether it becomes read-only, the program. The disk begins with the files of <c>before</c> and is copied to <c>after</c>.</summary>
    private const string Script = """
        set -e
        mkdir disk after
        mount -t tmpfs -o size=$1 none disk
        cp -a before/. disk/
        if [ $2 = yes ]; then mount -o remount,ro disk; fi
        dotnet "$3" draft brine.yaml --out disk && code=0 || code=$?
        cp -a disk/. after/
        exit $code
        """;

    private readonly Workshop shop = new();

    public void Dispose() => shop.Dispose();

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void A_full_disk_leaves_what_was_there(bool hasOlder)
    {
        long older = hasOlder ? Draft() : Empty();
        shop.Edit(Workshop.Brine, "title: Brine", "title: Hot brine");

        (Screen screen, _) = OnDisk($"{older + (64 << 10)}", isReadOnly: false);

        Assert.Equal((3, ""), (screen.ExitCode, screen.Output));
        Assert.Equal("bandspec: DESK/disk/HV-3107-A cannot be written: the disk is full\n", screen.Error);
        AssertUntouched();
    }

    [Fact]
    public void A_read_only_disk_is_told_at_once()
    {
        Draft();
        shop.Edit(Workshop.Brine, "title: Brine", "title: Hot brine");

        (Screen screen, TimeSpan time) = OnDisk("8m", isReadOnly: true);

        Assert.Equal((3, ""), (screen.ExitCode, screen.Output));
        Assert.Equal("bandspec: DESK/disk/HV-3107-A cannot be written: the disk is read-only\n", screen.Error);
        Assert.True(time < TimeSpan.FromSeconds(25), "two seconds on a machine of its own; waiting for another run would take thirty");
        AssertUntouched();
    }

    /// <summary>Drafts the older package; its size on a disk of whole pages.</summary>
    private long Draft()
    {
        Assert.Equal(0, shop.Run("draft", Workshop.Brine, "--out", "before", "--quiet").ExitCode);
        const long page = 4096;
        return new DirectoryInfo(shop.PathOf("before")).EnumerateFiles("*", SearchOption.AllDirectories).Sum(file => (file.Length + page - 1) / page * page);
    }

    private long Empty()
    {
        Directory.CreateDirectory(shop.PathOf("before"));
        return 0;
    }

    private void AssertUntouched()
    {
        string[] before = Everything("before");
        Assert.Equal(before, Everything("after"));
        Assert.All(before, name => Assert.Equal(File.ReadAllBytes(shop.PathOf($"before/{name}")), File.ReadAllBytes(shop.PathOf($"after/{name}"))));
    }

    /// <summary>The files below a folder, but for the lock, which stays and is empty.</summary>
    private string[] Everything(string folder) =>
    [
        .. Directory.EnumerateFileSystemEntries(shop.PathOf(folder), "*", SearchOption.AllDirectories)
            .Select(path => Path.GetRelativePath(shop.PathOf(folder), path))
            .Where(name => name != ".bandspec.lock" && !Directory.Exists(shop.PathOf($"{folder}/{name}"))).Order(StringComparer.Ordinal),
    ];

    private (Screen Screen, TimeSpan Time) OnDisk(string size, bool isReadOnly)
    {
        if (Run("true").ExitCode != 0)
            Assert.Skip("this machine does not let a user mount a disk (unshare --user --mount)");
        shop.Write("script.sh", Script);
        long begin = Stopwatch.GetTimestamp();
        Screen screen = Run("sh", "script.sh", size, isReadOnly ? "yes" : "no", typeof(CommandLine).Assembly.Location);
        return (screen with { Error = screen.Error.Replace(shop.Folder, "DESK", StringComparison.Ordinal) }, Stopwatch.GetElapsedTime(begin));
    }

    private Screen Run(params string[] command)
    {
        ProcessStartInfo start = new("unshare", ["--user", "--map-root-user", "--mount", .. command])
        {
            WorkingDirectory = shop.Folder, RedirectStandardOutput = true, RedirectStandardError = true,
        };
        try
        {
            using Process run = Process.Start(start)!;
            Task<string> error = run.StandardError.ReadToEndAsync();
            string output = run.StandardOutput.ReadToEnd();
            run.WaitForExit();
            return new Screen(run.ExitCode, output, error.Result);
        }
        catch (System.ComponentModel.Win32Exception)
        {
            return new Screen(127, "", "there is no unshare");
        }
    }
}
