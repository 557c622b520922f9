using System.Runtime.InteropServices;

namespace BandSpec.Cli;

/// <summary>
/// Ctrl-C, or the signal by which a batch system ends a job: the first asks a command to stop where it is and show what it has, a second ends the
/// process at once. A command that cannot stop half-way never listens, and ends at the first.
/// </summary>
internal static class Interruption
{
    private static readonly CancellationTokenSource Asked = new();
    private static readonly List<PosixSignalRegistration> Listening = [];

    /// <summary>Begins to listen.</summary>
    /// <returns>A token that is cancelled by the first signal.</returns>
    public static CancellationToken Listen()
    {
        if (Listening.Count == 0)
            foreach (PosixSignal signal in new[] { PosixSignal.SIGINT, PosixSignal.SIGTERM })
                Listening.Add(PosixSignalRegistration.Create(signal, Stop));
        return Asked.Token;
    }

    private static void Stop(PosixSignalContext context)
    {
        if (Asked.IsCancellationRequested)
            return;
        context.Cancel = true;
        Asked.Cancel();
    }
}
