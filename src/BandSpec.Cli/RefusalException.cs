namespace BandSpec.Cli;

/// <summary>Something outside the program keeps a command from being carried out, such as a full disk; its message is the whole report.</summary>
internal sealed class RefusalException(string message) : Exception(message);
