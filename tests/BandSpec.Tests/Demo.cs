using System.Text;
using BandSpec.Files.Inputs;

namespace BandSpec.Tests;

/// <summary>A wide and easy example, kept apart from the demos that users see, and variants of it made by replacing text.</summary>
internal static class Demo
{
    public static string Folder { get; } = Path.Combine(RootFolder(), "tests", "BandSpec.Tests", "Example");

    public const string Brine = "brine-reinjection.yaml";

    public static InputSet Read(string requirement) =>
        InputReading.Read(Content(requirement), path => Content(path));

    /// <summary>The brine demo with replacements in whichever of its three files holds the text; each has to hit exactly once.</summary>
    public static InputSet With(params (string Old, string New)[] replacements)
    {
        Dictionary<string, string> files = new[] { Brine, "platforms/steel-cell-40.yaml", "stations/chamber-line-2.yaml" }
            .ToDictionary(name => name, name => File.ReadAllText(Path.Combine(Folder, name)));
        foreach ((string old, string replacement) in replacements)
        {
            string name = files.Single(file => file.Value.Contains(old, StringComparison.Ordinal)).Key;
            int at = files[name].IndexOf(old, StringComparison.Ordinal);
            Xunit.Assert.Equal(at, files[name].LastIndexOf(old, StringComparison.Ordinal));
            files[name] = files[name].Replace(old, replacement, StringComparison.Ordinal);
        }
        return InputReading.Read(Text(Brine, files[Brine]), path => files.TryGetValue(path, out string? text) ? Text(path, text) : InputContent.Refused(path, "there is no such file"));
    }

    public static InputContent Text(string name, string text) => InputContent.Of(name, Encoding.UTF8.GetBytes(text));

    private static InputContent Content(string name) => InputContent.Of(name, File.ReadAllBytes(Path.Combine(Folder, name)));

    private static string RootFolder()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "BandSpec.sln")))
            folder = folder.Parent;
        return folder?.FullName ?? throw new DirectoryNotFoundException("no BandSpec.sln above the tests");
    }
}
