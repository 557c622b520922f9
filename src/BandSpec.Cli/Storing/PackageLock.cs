using System.Globalization;

namespace BandSpec.Cli.Storing;

/// <summary>
/// Keeps two runs from writing packages into one folder at once. The lock is the operating system's, on an open file, so that it ends with its process
/// however that ends: no lock is ever stale. Who holds it and since when stands in a file beside it, for the message to whoever has to wait.
/// </summary>
internal sealed class PackageLock : IDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(30);
    private static readonly TimeSpan Pause = TimeSpan.FromMilliseconds(50);

    /// <summary>What .NET gives as <see cref="Exception.HResult"/> of a file that somebody else has: the number of the operating system's error.</summary>
    private const int LinuxWouldBlock = 11, MacWouldBlock = 35, WindowsSharingViolation = unchecked((int)0x80070020);

    private readonly FileStream held;
    private readonly string owner;

    private PackageLock(FileStream held, string owner) => (this.held, this.owner) = (held, owner);

    /// <summary>Takes the lock of a folder of packages, after waiting for another run to end.</summary>
    /// <exception cref="RefusalException">Another run holds it for longer than anyone waits.</exception>
    public static PackageLock Take(string parent, TimeProvider clock)
    {
        string path = Path.Combine(parent, ".bandspec.lock"), owner = Path.Combine(parent, ".bandspec.owner");
        long begin = clock.GetTimestamp();
        while (true)
        {
            try
            {
                FileStream held = new(path, FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.None);
                Sign(owner, clock);
                return new PackageLock(held, owner);
            }
            catch (IOException refused) when (IsHeld(refused) && clock.GetElapsedTime(begin) < Patience)
            {
                Thread.Sleep(Pause);
            }
            catch (IOException refused) when (IsHeld(refused))
            {
                throw new RefusalException($"{parent} is being written to by another run ({Describe(owner)}); nothing was written");
            }
        }
    }

    /// <summary>Gives the lock back.</summary>
    public void Dispose()
    {
        // The lock's file stays: to remove it would let a third run take a new one while a second still waits for the old.
        TryDelete(owner);
        held.Dispose();
    }

    /// <summary>Whether another run has the file; a full or read-only disk, where waiting would not help, is told at once.</summary>
    private static bool IsHeld(IOException refused) => refused.HResult is LinuxWouldBlock or MacWouldBlock or WindowsSharingViolation;

    private static void Sign(string owner, TimeProvider clock)
    {
        string since = clock.GetLocalNow().ToString("HH:mm:ss", CultureInfo.InvariantCulture);
        try
        {
            File.WriteAllText(owner, $"process {Environment.ProcessId} on {Environment.MachineName}, since {since}");
        }
        catch (Exception unsigned) when (unsigned is IOException or UnauthorizedAccessException)
        {
            // The lock holds without its note.
        }
    }

    private static string Describe(string owner)
    {
        try
        {
            return File.ReadAllText(owner).Trim();
        }
        catch (IOException)
        {
            return "it does not say which";
        }
    }

    private static void TryDelete(string path)
    {
        try
        {
            File.Delete(path);
        }
        catch (Exception kept) when (kept is IOException or UnauthorizedAccessException)
        {
            // The note only serves a message; the next holder writes it anew.
        }
    }
}
