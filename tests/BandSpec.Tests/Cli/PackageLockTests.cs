using System.Diagnostics;
using BandSpec.Cli;
using BandSpec.Cli.Storing;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>Two runs that meet at one folder of packages.</summary>
public sealed class PackageLockTests : IDisposable
{
    private readonly string parent = Directory.CreateTempSubdirectory("bandspec-test-").FullName;

    public void Dispose() => Directory.Delete(parent, recursive: true);

    [Fact]
    public void Whoever_waited_in_vain_is_told_who_holds_the_folder_and_since_when()
    {
        using PackageLock held = PackageLock.Take(parent, TimeProvider.System);
        HurriedClock clock = new();

        RefusalException refusal = Assert.Throws<RefusalException>(() => PackageLock.Take(parent, clock));

        Assert.Equal(ExitCode.Fault, refusal.Code);
        Assert.Matches($"is being written to by another run \\(process {Environment.ProcessId} on .+, since [0-9:]+\\); nothing was written$", refusal.Message);
        Assert.InRange(clock.Asked, 3, 10);
    }

    [Fact]
    public void A_lock_given_back_is_free_at_once()
    {
        PackageLock.Take(parent, TimeProvider.System).Dispose();
        using PackageLock held = PackageLock.Take(parent, TimeProvider.System);
        Assert.True(File.Exists(Path.Combine(parent, ".bandspec.owner")));
    }

    [Fact]
    public void A_killed_run_leaves_its_note_but_no_lock()
    {
        using Process other = Flock();
        Assert.Throws<RefusalException>(() => PackageLock.Take(parent, new HurriedClock()));
        other.Kill();
        other.WaitForExit();
        File.WriteAllText(Path.Combine(parent, ".bandspec.owner"), "process 1 on a machine, since 00:00:00");

        using PackageLock held = PackageLock.Take(parent, new HurriedClock());

        Assert.StartsWith($"process {Environment.ProcessId} on ", File.ReadAllText(Path.Combine(parent, ".bandspec.owner")), StringComparison.Ordinal);
    }

    /// <summary>Another process with the lock: util-linux' <c>flock</c>, which asks the operating system for the same thing.</summary>
    private Process Flock()
    {
        string path = Path.Combine(parent, ".bandspec.lock");
        try
        {
            Process other = Process.Start(new ProcessStartInfo("flock", ["--no-fork", path, "sh", "-c", "echo held; exec sleep 60"]) { RedirectStandardOutput = true })!;
            Assert.Equal("held", other.StandardOutput.ReadLine());
            return other;
        }
        catch (System.ComponentModel.Win32Exception)
        {
            Assert.Skip("there is no flock on this machine");
            throw;
        }
    }

    /// <summary>A clock by which a quarter of a minute passes each time it is asked.</summary>
    private sealed class HurriedClock : TimeProvider
    {
        public int Asked { get; private set; }

        public override long TimestampFrequency => 1;

        public override long GetTimestamp() => 15 * Asked++;
    }
}
