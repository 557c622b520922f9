using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Opening;

/// <summary>Brings a file's bytes, or says in words why it cannot be had.</summary>
internal static class OpenedContent
{
    /// <summary>Opens a file.</summary>
    /// <param name="path">Its full path.</param>
    /// <param name="shown">Its name as the user knows it.</param>
    /// <param name="mostBytes">How many bytes are read at most.</param>
    public static InputContent Open(string path, string shown, int mostBytes)
    {
        if (Directory.Exists(path))
            return InputContent.Refused(shown, "it is a folder");
        try
        {
            // What has no length is empty, or a pipe or a device: to open one of those could wait for ever.
            if (new FileInfo(path).Length == 0)
                return InputContent.Of(shown, Array.Empty<byte>());
            using FileStream stream = new(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite);
            byte[] bytes = new byte[Math.Min(mostBytes, stream.Length + 1)];
            int length = stream.ReadAtLeast(bytes, bytes.Length, throwOnEndOfStream: false);
            return InputContent.Of(shown, bytes.AsMemory(0, length));
        }
        catch (Exception refused) when (refused is FileNotFoundException or DirectoryNotFoundException)
        {
            return InputContent.Refused(shown, "there is no such file");
        }
        catch (Exception refused) when (refused is IOException or UnauthorizedAccessException or NotSupportedException)
        {
            return InputContent.Refused(shown, "it cannot be read");
        }
    }
}
