using System.Diagnostics;
using System.Globalization;
using BandSpec.Cli.Storing;
using BandSpec.Files.Releases;

namespace BandSpec.Cli.Releasing;

/// <summary>
/// Keeps two runs from adding to one release record at once: a file beside it that only one of them can make, with the holder's process and
/// the time in it. Unlike the lock of the output folder it leaves nothing behind, since it stands among files that people keep in version
/// control; so a run that was killed leaves it, and the next run on the same machine sees that its process is gone and takes it over.
/// </summary>
internal sealed class ReleaseHold : IDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(30);
    private static readonly TimeSpan Pause = TimeSpan.FromMilliseconds(50);

    /// <summary>The note is written right after the file is made; without one for this long, its run was killed between the two.</summary>
    private static readonly TimeSpan TimeToSign = TimeSpan.FromSeconds(5);

    /// <summary>The system tells the start of a process from its own clock, which may be set while it runs: seconds by which it may differ.</summary>
    private const long ClockSlip = 2;

    private readonly string path;

    private ReleaseHold(string path) => this.path = path;

    /// <summary>Takes the hold of a folder's record, after waiting for another run to end.</summary>
    /// <exception cref="RefusalException">Another run holds it for longer than anyone waits, or the folder cannot be written to.</exception>
    public static ReleaseHold Take(string folder, TimeProvider clock)
    {
        string path = Path.Combine(folder, $".{ReleaseRecord.FileName}.lock");
        long begin = clock.GetTimestamp();
        while (!TryMake(path, clock))
        {
            if (IsStale(path, clock))
                WholeFile.TryDelete(path);
            else if (clock.GetElapsedTime(begin) < Patience)
                Thread.Sleep(Pause);
            else
                throw new RefusalException(
                    $"{Path.Combine(folder, ReleaseRecord.FileName)} is being added to by another run ({Describe(path, clock)}); nothing was released. If that run is gone, delete {path}");
        }

        return new ReleaseHold(path);
    }

    /// <summary>Gives the hold back.</summary>
    public void Dispose() => WholeFile.TryDelete(path);

    private static bool TryMake(string path, TimeProvider clock)
    {
        try
        {
            using StreamWriter note = new(new FileStream(path, FileMode.CreateNew, FileAccess.Write, FileShare.Read));
            note.Write(new HoldNote(Environment.ProcessId, Environment.MachineName, StartOf(Environment.ProcessId) ?? 0, clock.GetUtcNow()));
            return true;
        }
        catch (IOException) when (File.Exists(path))
        {
            return false;
        }
        catch (Exception refused) when (refused is IOException or UnauthorizedAccessException)
        {
            throw WritingFault.Refuse(path, refused);
        }
    }

    private static bool IsStale(string path, TimeProvider clock)
    {
        if (HoldNote.Read(path) is not { } note)
            return File.Exists(path) && clock.GetUtcNow() - File.GetLastWriteTimeUtc(path) > TimeToSign;
        return note.Machine == Environment.MachineName && StartOf(note.Process) is var started && (started is null || Math.Abs(started.Value - note.Started) > ClockSlip);
    }

    /// <summary>When a process began, so that another with the same number is not taken for it; null when there is none.</summary>
    private static long? StartOf(int process)
    {
        try
        {
            using Process running = Process.GetProcessById(process);
            return new DateTimeOffset(running.StartTime).ToUnixTimeSeconds();
        }
        catch (Exception gone) when (gone is ArgumentException or InvalidOperationException or System.ComponentModel.Win32Exception)
        {
            return null;
        }
    }

    private static string Describe(string path, TimeProvider clock) => HoldNote.Read(path) is { } note
        ? string.Create(
            CultureInfo.InvariantCulture, $"process {note.Process} on {note.Machine}, for {(clock.GetUtcNow() - note.Since).TotalSeconds:0} s")
        : "it does not say which";
}

/// <summary>What a hold says about its holder.</summary>
/// <param name="Process">The number of its process.</param>
/// <param name="Machine">The machine that it runs on.</param>
/// <param name="Started">When it began, in seconds since 1970.</param>
/// <param name="Since">When the hold was taken.</param>
internal sealed record HoldNote(int Process, string Machine, long Started, DateTimeOffset Since)
{
    /// <summary>The note in a file; null when it is not there, or not a note.</summary>
    public static HoldNote? Read(string path)
    {
        try
        {
            string[] parts = File.ReadAllText(path).Split('\n');
            return parts.Length == 4 && int.TryParse(parts[0], CultureInfo.InvariantCulture, out int process)
                && long.TryParse(parts[2], CultureInfo.InvariantCulture, out long started)
                && DateTimeOffset.TryParse(parts[3], CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal, out DateTimeOffset since)
                ? new HoldNote(process, parts[1], started, since) : null;
        }
        catch (Exception unreadable) when (unreadable is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    /// <summary>The note as it is written.</summary>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{Process}\n{Machine}\n{Started}\n{Since:O}");
}
