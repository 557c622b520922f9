namespace BandSpec.Cli.Opening;

/// <summary>Reads files whose size is bounded, and nothing that might never end.</summary>
internal static class BoundedFile
{
    /// <summary>No PDF and no record of a specification is larger; those of the demos have a few hundred kilobytes.</summary>
    public const int LargestDocument = 64 << 20;

    /// <summary>The bytes of a file.</summary>
    /// <param name="path">Its full path.</param>
    /// <param name="most">How many bytes it may have.</param>
    /// <exception cref="IOException">It cannot be had, is a folder, or is larger; the message says so without its path.</exception>
    /// <exception cref="UnauthorizedAccessException">It may not be read.</exception>
    public static byte[] Read(string path, int most = LargestDocument)
    {
        if (Directory.Exists(path))
            throw new IOException("it is a folder");
        if (!File.Exists(path))
            throw new FileNotFoundException("there is no such file");
        long length = new FileInfo(path).Length;
        if (length > most)
            throw new IOException($"it has more than {most} bytes");
        // What has no length is empty, or a pipe or a device: to open one of those could wait for ever.
        return length == 0 ? [] : File.ReadAllBytes(path);
    }
}
