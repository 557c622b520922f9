namespace BandSpec.Cli.Storing;

/// <summary>Writes a file beside its place and renames it there, so that whoever looks finds the old file or the new one, whole.</summary>
internal static class WholeFile
{
    /// <summary>Writes a file; its folder has to be there.</summary>
    /// <exception cref="RefusalException">It cannot be written.</exception>
    public static void Write(string path, ReadOnlyMemory<byte> bytes)
    {
        string beside = $"{path}.{Environment.ProcessId}.new";
        try
        {
            File.WriteAllBytes(beside, bytes.Span);
            File.Move(beside, path, overwrite: true);
        }
        catch (Exception refused) when (refused is IOException or UnauthorizedAccessException)
        {
            File.Delete(beside);
            throw new RefusalException($"{path} cannot be written: {refused.Message}");
        }
    }
}
