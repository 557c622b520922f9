namespace BandSpec.Tests.House;

/// <summary>The folder that the solution stands in.</summary>
internal static class Tree
{
    /// <summary>Its path, found upwards from the test program.</summary>
    public static string Root { get; } = Find(AppContext.BaseDirectory);

    private static string Find(string folder) => File.Exists(Path.Combine(folder, "BandSpec.sln"))
        ? folder
        : Find(Path.GetDirectoryName(folder.TrimEnd(Path.DirectorySeparatorChar))
            ?? throw new InvalidOperationException("the tests run inside the solution's folder"));
}
