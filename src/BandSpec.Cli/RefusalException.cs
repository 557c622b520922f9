namespace BandSpec.Cli;

/// <summary>
/// Something outside the program keeps a command from being carried out, such as a full disk, or what was asked for cannot be had; its message
/// is the whole report.
/// </summary>
/// <param name="message">The report, a sentence without a full stop.</param>
/// <param name="code">What the program ends with.</param>
internal sealed class RefusalException(string message, ExitCode code = ExitCode.Fault) : Exception(message)
{
    /// <summary>What the program ends with.</summary>
    public ExitCode Code { get; } = code;
}
