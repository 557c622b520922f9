using System.Globalization;
using BandSpec.Core.Findings;

namespace BandSpec.Core.Requirements;

/// <summary>Rules for names and texts: fit for a folder, fit for one line of a document.</summary>
internal static class NameRules
{
    private const int LongestText = 200;

    /// <summary>Names that Windows keeps for devices, with any extension; a folder of that name cannot be made there.</summary>
    private static readonly string[] Reserved =
        ["CON", "PRN", "AUX", "NUL", .. Enumerable.Range(0, 10).SelectMany(n => new[] { $"COM{n}", $"LPT{n}" })];

    /// <summary>Judges a part of the package folder's name, on every file system that a repository may be checked out to.</summary>
    public static void FitsFolder(this FileFindings findings, string path, string name, int longest)
    {
        bool plain = name.Length > 0 && char.IsAsciiLetterOrDigit(name[0]) && name.All(c => char.IsAsciiLetterOrDigit(c) || c is '.' or '-' or '_')
            && !name.Contains("..", StringComparison.Ordinal) && name[^1] != '.';
        string accepted = $"letters a-z, digits, points, hyphens and underscores, beginning with a letter or digit; at most {longest} characters";
        findings.Require(plain, path, "folder-name", $"`{Cut(name)}` cannot name a folder", accepted);
        findings.Require(name.Length <= longest, path, "folder-name", $"a name of {name.Length} characters", accepted);
        findings.Require(
            !Reserved.Contains(name.Split('.')[0].ToUpperInvariant()), path, "folder-name",
            $"`{Cut(name)}` is the name of a device on Windows", "another name");
    }

    /// <summary>Judges a text that stands on one line of a document.</summary>
    public static void FitsLine(this FileFindings findings, string path, string? written, int longest = LongestText)
    {
        if (written is not { } text)
            return;
        findings.Require(
            text.Length <= longest, path, "text-length", $"a text of {text.Length.ToString(CultureInfo.InvariantCulture)} characters",
            $"at most {longest.ToString(CultureInfo.InvariantCulture)} characters");
        findings.Require(
            !text.Any(char.IsControl) && !string.IsNullOrWhiteSpace(text), path, "text-line", "a text that is not one line of words", "one line of words");
    }

    /// <summary>A name as it is repeated in a finding.</summary>
    public static string Cut(string name) => name.Length <= 40 ? name : string.Concat(name.AsSpan(0, 37), "...");
}
