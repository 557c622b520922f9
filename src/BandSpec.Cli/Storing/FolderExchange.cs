using System.Runtime.InteropServices;

namespace BandSpec.Cli.Storing;

/// <summary>Exchanges two folders in one step, where the operating system can: Linux 3.15 and macOS 10.12 can, Windows cannot.</summary>
internal static partial class FolderExchange
{
    /// <summary>Paths are counted from the working folder (<c>AT_FDCWD</c> of Linux); full paths do not use it.</summary>
    private const int FromWorkingFolder = -100;

    /// <summary><c>RENAME_EXCHANGE</c> of Linux and <c>RENAME_SWAP</c> of macOS have the same value.</summary>
    private const uint Exchange = 2;

    /// <summary>Whether the exchange was made; otherwise nothing has changed.</summary>
    public static bool TryExchange(string first, string second)
    {
        try
        {
            return OperatingSystem.IsLinux() ? RenameAt(FromWorkingFolder, first, FromWorkingFolder, second, Exchange) == 0
                : OperatingSystem.IsMacOS() && RenameSwap(first, second, Exchange) == 0;
        }
        catch (Exception missing) when (missing is EntryPointNotFoundException or DllNotFoundException)
        {
            return false;
        }
    }

    [LibraryImport("libc", EntryPoint = "renameat2", StringMarshalling = StringMarshalling.Utf8)]
    private static partial int RenameAt(int oldFolder, string oldPath, int newFolder, string newPath, uint flags);

    [LibraryImport("libc", EntryPoint = "renamex_np", StringMarshalling = StringMarshalling.Utf8)]
    private static partial int RenameSwap(string oldPath, string newPath, uint flags);
}
