using BandSpec.Documents;

namespace BandSpec.Cli.Storing;

/// <summary>Writes a file so that it is either the old one or the new one, complete, whenever the process is killed.</summary>
internal static class WholeFile
{
    /// <summary>Writes beside the file under a hidden name, then renames into place.</summary>
    /// <param name="path">The file's full path; its folder has to be there.</param>
    /// <param name="bytes">Its new content.</param>
    /// <exception cref="RefusalException">The disk or the rights keep it from being written; the older file is untouched.</exception>
    public static void Write(string path, ReadOnlyMemory<byte> bytes)
    {
        string fresh = Path.Combine(Path.GetDirectoryName(path)!, $".{Path.GetFileName(path)}.new");
        try
        {
            using (FileStream stream = new(fresh, FileMode.Create))
            {
                // Who may read the file is not changed by writing it anew.
                if (!OperatingSystem.IsWindows() && File.Exists(path))
                    File.SetUnixFileMode(stream.SafeFileHandle, File.GetUnixFileMode(path));
                stream.Write(bytes.Span);
                // On the disk before it gets its name, so that not even a loss of power leaves an empty file under it.
                stream.Flush(flushToDisk: true);
            }

            File.Move(fresh, path, overwrite: true);
        }
        catch (Exception refused) when (WritingFault.Is(refused))
        {
            TryDelete(fresh);
            throw WritingFault.Refuse(path, refused);
        }
    }

    /// <summary>The same, in a folder that is made if it is not there.</summary>
    /// <exception cref="RefusalException">The disk or the rights keep it from being written.</exception>
    public static void WriteInFolder(string path, ReadOnlyMemory<byte> bytes)
    {
        MakeFolder(Path.GetDirectoryName(path)!);
        Write(path, bytes);
    }

    /// <summary>Writes files into a folder, which is made when it is not there.</summary>
    /// <param name="folder">The folder's full path.</param>
    /// <param name="files">The files; one that is there already is replaced.</param>
    /// <exception cref="RefusalException">The disk or the rights keep one from being written; it is as it was.</exception>
    public static void WriteInto(string folder, IEnumerable<DocumentFile> files)
    {
        MakeFolder(folder);
        foreach (DocumentFile file in files)
            Write(Path.Combine(folder, file.Name), file.Bytes);
    }

    /// <summary>Deletes a file that may be gone, or not to be deleted: then it does no harm where it is.</summary>
    public static void TryDelete(string path)
    {
        try
        {
            File.Delete(path);
        }
        catch (Exception kept) when (kept is IOException or UnauthorizedAccessException)
        {
            // A hidden leftover; the next run writes over it.
        }
    }

    private static void MakeFolder(string folder)
    {
        try
        {
            Directory.CreateDirectory(folder);
        }
        catch (Exception refused) when (WritingFault.Is(refused))
        {
            throw WritingFault.Refuse(folder, refused);
        }
    }
}
