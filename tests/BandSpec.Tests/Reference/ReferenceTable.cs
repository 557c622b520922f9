using System.Globalization;
using System.Reflection;

namespace BandSpec.Tests.Reference;

/// <summary>
/// A table of outside figures kept beside the script that made it: lines starting with # are its birth certificate, then a header,
/// then rows of numbers (or words) parted by commas.
/// </summary>
internal static class ReferenceTable
{
    /// <summary>The rows of a table, each as its cells.</summary>
    public static IReadOnlyList<string[]> Rows(string name)
    {
        using Stream stream = Assembly.GetExecutingAssembly().GetManifestResourceStream($"Reference/{name}")
            ?? throw new FileNotFoundException($"No reference table {name}.");
        using var reader = new StreamReader(stream);
        string[] lines = reader.ReadToEnd().Split('\n', StringSplitOptions.RemoveEmptyEntries);
        return [.. lines.Where(line => !line.StartsWith('#')).Skip(1).Select(line => line.Split(','))];
    }

    /// <summary>The rows of a table that holds nothing but numbers.</summary>
    public static IReadOnlyList<double[]> Numbers(string name) =>
        [.. Rows(name).Select(row => row.Select(cell => double.Parse(cell, CultureInfo.InvariantCulture)).ToArray())];
}
