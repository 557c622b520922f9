using System.Text;
using BandSpec.Cli;
using BandSpec.Cli.Storing;
using BandSpec.Files.Json;
using Xunit;

namespace BandSpec.Tests.Cli;

public sealed class PackageFolderTests : IDisposable
{
    private readonly string parent = Directory.CreateTempSubdirectory("bandspec-test-").FullName;

    public void Dispose() => Directory.Delete(parent, recursive: true);

    private PackageFolder Folder => new(parent, "X-A");

    [Fact]
    public void A_package_takes_the_place_of_the_older_one_whole()
    {
        Folder.Replace(Package("first", "old-chart.svg"), TimeProvider.System);
        Folder.Replace(Package("second"), TimeProvider.System);

        Assert.Equal(["limits.csv", "manifest.json"], Names("X-A"));
        Assert.Equal("second", File.ReadAllText(Path.Combine(parent, "X-A", "limits.csv")));
        Assert.Equal([".bandspec.lock"], Names("").Where(name => name.StartsWith('.')));
    }

    [Fact]
    public void What_a_killed_run_left_behind_is_removed()
    {
        Directory.CreateDirectory(Path.Combine(parent, ".X-A.new"));
        File.WriteAllText(Path.Combine(parent, ".X-A.new", "half"), "");

        Folder.Replace(Package("whole"), TimeProvider.System);

        Assert.Equal([".bandspec.lock", "X-A"], Names(""));
    }

    [Fact]
    public void An_older_package_that_a_killed_run_had_put_aside_is_put_back_before_anything_else()
    {
        Folder.Replace(Package("older"), TimeProvider.System);
        Directory.Move(Path.Combine(parent, "X-A"), Path.Combine(parent, ".X-A.old"));
        PackageFile[] unwritable = [new("no/such/folder", default)];

        Assert.Throws<RefusalException>(() => Folder.Replace(unwritable, TimeProvider.System));

        Assert.Equal("older", File.ReadAllText(Path.Combine(parent, "X-A", "limits.csv")));
    }

    [Fact]
    public void A_file_that_somebody_put_into_the_package_is_not_removed()
    {
        Folder.Replace(Package("first"), TimeProvider.System);
        File.WriteAllText(Path.Combine(parent, "X-A", "notes.txt"), "mine");

        RefusalException refusal = Assert.Throws<RefusalException>(() => Folder.Replace(Package("second"), TimeProvider.System));

        Assert.EndsWith("has a file that is not of a package, notes.txt; move it away, nothing was written", refusal.Message, StringComparison.Ordinal);
        Assert.Equal(["limits.csv", "manifest.json", "notes.txt"], Names("X-A"));
        Assert.Equal("first", File.ReadAllText(Path.Combine(parent, "X-A", "limits.csv")));
    }

    [Fact]
    public void Two_runs_at_once_leave_one_of_their_packages_whole()
    {
        Parallel.For(0, 40, run => Folder.Replace(Package($"run {run}", $"chart-{run}.svg"), TimeProvider.System));

        string winner = File.ReadAllText(Path.Combine(parent, "X-A", "limits.csv"))[4..];
        Assert.Equal([$"chart-{winner}.svg", "limits.csv", "manifest.json"], Names("X-A"));
    }

    [Fact]
    public void A_path_that_is_no_folder_is_a_refusal()
    {
        string file = Path.Combine(parent, "file");
        File.WriteAllText(file, "");

        RefusalException refusal = Assert.Throws<RefusalException>(() => new PackageFolder(file, "X-A").Replace(Package("any"), TimeProvider.System));

        Assert.StartsWith($"{Path.Combine(file, "X-A")} cannot be written: ", refusal.Message, StringComparison.Ordinal);
    }

    private string[] Names(string folder) =>
        [.. Directory.EnumerateFileSystemEntries(Path.Combine(parent, folder)).Select(path => Path.GetFileName(path)).Order(StringComparer.Ordinal)];

    private static PackageFile[] Package(string text, params string[] more)
    {
        PackageFile[] files = [new("limits.csv", Encoding.UTF8.GetBytes(text)), .. more.Select(name => new PackageFile(name, default))];
        return [.. files, new("manifest.json", ManifestJson.Write(Given.Requirement.Identity, new PackageMaking("a test", "A4", "en", null), [], files))];
    }
}
