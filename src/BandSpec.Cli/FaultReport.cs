using System.Globalization;

namespace BandSpec.Cli;

/// <summary>
/// Reports a fault of the program itself: one line for the user, and a file with the details for whoever mends it. The file goes to the system's
/// folder for temporary files, since a fault may have come before it was known where to write.
/// </summary>
internal static class FaultReport
{
    private static int count;

    /// <summary>Writes the report.</summary>
    public static void Write(Exception fault, IReadOnlyList<string> arguments, Terminal terminal) =>
        terminal.Error.WriteLine($"bandspec: {Describe(fault, arguments, terminal)}");

    /// <summary>Writes the details and says the rest in one line.</summary>
    public static string Describe(Exception fault, IReadOnlyList<string> arguments, Terminal terminal)
    {
        string message = fault.Message.ReplaceLineEndings(" ");
        string where = TryWriteDetails(fault, arguments, terminal) is { } path ? $"details are in {path}" : "the details could not be written";
        return $"a fault of the program, not of your files: {message} ({fault.GetType().Name}); {where}";
    }

    private static string? TryWriteDetails(Exception fault, IReadOnlyList<string> arguments, Terminal terminal)
    {
        string time = terminal.Clock.GetUtcNow().ToString("yyyyMMdd-HHmmss", CultureInfo.InvariantCulture);
        string path = Path.Combine(Path.GetTempPath(), $"bandspec-fault-{time}-{Environment.ProcessId}-{Interlocked.Increment(ref count)}.txt");
        try
        {
            using StreamWriter file = new(new FileStream(path, FileMode.CreateNew));
            file.WriteLine($"{CommandLine.Program} on {Environment.OSVersion}, {Environment.Version}");
            file.WriteLine($"arguments: {string.Join(' ', arguments)}");
            file.WriteLine(fault.ToString());
            return path;
        }
        catch (Exception again) when (again is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }
}
