namespace BandSpec.Cli.Storing;

/// <summary>Says in plain words what kept something from being written.</summary>
internal static class WritingFault
{
    /// <summary>
    /// What .NET gives as <see cref="Exception.HResult"/>: the number of the error on Linux and macOS, <c>0x8007</c> and the number on Windows.
    /// </summary>
    private const int ClosedPipe = 32, DiskFull = 28, ReadOnlyDisk = 30, LinuxQuota = 122, MacQuota = 69;

    private const int WindowsDiskFull = unchecked((int)0x80070070), WindowsHandleDiskFull = unchecked((int)0x80070027),
        WindowsWriteProtected = unchecked((int)0x80070013), WindowsClosedPipe = unchecked((int)0x800700E8), WindowsEndedPipe = unchecked((int)0x8007006D);

    /// <summary>Whether an exception is the disk's or the rights', not the program's.</summary>
    public static bool Is(Exception fault) => fault is IOException or UnauthorizedAccessException;

    /// <summary>Whether the disk is at fault beyond doubt.</summary>
    public static bool IsOfDisk(Exception fault) => fault is IOException && fault.HResult is (DiskFull or WindowsDiskFull or WindowsHandleDiskFull or ReadOnlyDisk or LinuxQuota);

    /// <summary>Whether what the output was piped into has ended.</summary>
    public static bool IsClosedPipe(IOException fault) => fault.HResult is ClosedPipe or WindowsClosedPipe or WindowsEndedPipe;

    /// <summary>The refusal of a command whose file or folder cannot be written.</summary>
    /// <param name="what">The file or folder.</param>
    /// <param name="fault">What the operating system said.</param>
    public static RefusalException Refuse(string what, Exception fault) => new($"{what} cannot be written: {Describe(fault)}");

    private static string Describe(Exception fault) => fault.HResult switch
    {
        DiskFull or WindowsDiskFull or WindowsHandleDiskFull => "the disk is full",
        LinuxQuota or MacQuota => "the quota of the disk is used up",
        ReadOnlyDisk or WindowsWriteProtected => "the disk is read-only",
        _ when fault is UnauthorizedAccessException => "you have no right to write there",
        _ => fault.Message.TrimEnd('.'),
    };
}
