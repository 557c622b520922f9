using BandSpec.Files.Json;

namespace BandSpec.Cli.Storing;

/// <summary>
/// The folder of a package. It is either the old one or the new one, complete, whenever the process is killed: a new package is written beside
/// it under a hidden name and then takes its place in one step. What a killed run left behind, the next one removes.
/// </summary>
internal sealed class PackageFolder
{
    private readonly string parent;
    private readonly string name;

    /// <param name="parent">The folder that packages are in, a full path; it is made when it is not there.</param>
    /// <param name="name">The package's folder name.</param>
    public PackageFolder(string parent, string name) => (this.parent, this.name) = (parent, name);

    /// <summary>The folder's full path.</summary>
    public string FullPath => Path.Combine(parent, name);

    /// <summary>Writes the package in the place of any older one.</summary>
    /// <param name="files">Its files.</param>
    /// <param name="clock">The clock.</param>
    /// <param name="whenComplete">
    /// What is done once every byte of the package is on the disk and before it takes its place; when that fails, the older package stays.
    /// </param>
    /// <exception cref="RefusalException">The disk, the rights or another run keep it from being written; the older package is untouched.</exception>
    public void Replace(IReadOnlyList<PackageFile> files, TimeProvider clock, Action? whenComplete = null)
    {
        try
        {
            Directory.CreateDirectory(parent);
            using PackageLock held = PackageLock.Take(parent, clock);
            RemoveLeftovers();
            RefuseStrangers();
            string fresh = Path.Combine(parent, $".{name}.new");
            WriteAll(fresh, files);
            whenComplete?.Invoke();
            Swap(fresh);
        }
        catch (RefusalException)
        {
            TryRemove(Path.Combine(parent, $".{name}.new"));
            throw;
        }
        catch (Exception refused) when (WritingFault.Is(refused))
        {
            TryRemove(Path.Combine(parent, $".{name}.new"));
            throw WritingFault.Refuse(FullPath, refused);
        }
    }

    private static void WriteAll(string folder, IReadOnlyList<PackageFile> files)
    {
        Directory.CreateDirectory(folder);
        foreach (PackageFile file in files)
        {
            using FileStream stream = new(Path.Combine(folder, file.Name), FileMode.CreateNew);
            stream.Write(file.Bytes.Span);
            // On the disk before the folder gets its name, so that not even a loss of power leaves an empty file under it.
            stream.Flush(flushToDisk: true);
        }
    }

    private void Swap(string fresh)
    {
        if (!Directory.Exists(FullPath))
            Directory.Move(fresh, FullPath);
        else if (FolderExchange.TryExchange(fresh, FullPath))
            TryRemove(fresh);
        else
        {
            // Between these two steps there is no package; the older one, under its hidden name, is put back by the next run.
            string old = Path.Combine(parent, $".{name}.old");
            Directory.Move(FullPath, old);
            Directory.Move(fresh, FullPath);
            TryRemove(old);
        }
    }

    private void RemoveLeftovers()
    {
        string old = Path.Combine(parent, $".{name}.old");
        if (Directory.Exists(old) && !Directory.Exists(FullPath))
            Directory.Move(old, FullPath);
        TryRemove(old);
        TryRemove(Path.Combine(parent, $".{name}.new"));
    }

    /// <summary>Nothing that somebody else put there is removed: a folder that is no package, or has more in it, is refused.</summary>
    private void RefuseStrangers()
    {
        if (!Directory.Exists(FullPath))
            return;
        HashSet<string> known = ManifestNames.In(Path.Combine(FullPath, "manifest.json"));
        string? stranger = Directory.EnumerateFileSystemEntries(FullPath).Select(entry => Path.GetFileName(entry)).Order().FirstOrDefault(entry => !known.Contains(entry));
        if (stranger is not null)
            throw new RefusalException($"{FullPath} has a file that is not of a package, {stranger}; move it away, nothing was written");
    }

    private static void TryRemove(string folder)
    {
        try
        {
            if (Directory.Exists(folder))
                Directory.Delete(folder, recursive: true);
        }
        catch (Exception kept) when (kept is IOException or UnauthorizedAccessException)
        {
            // A leftover under a hidden name does no harm; the next run tries again.
        }
    }
}
