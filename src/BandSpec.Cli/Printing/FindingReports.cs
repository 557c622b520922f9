using System.CommandLine;
using BandSpec.Cli.Storing;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Printing;

/// <summary>Files with findings for a merge request, written when they were asked for.</summary>
/// <param name="Sarif">The file for SARIF; null for none.</param>
/// <param name="Junit">The file for XML; null for none.</param>
internal sealed record FindingReports(string? Sarif, string? Junit)
{
    /// <summary>The option for SARIF.</summary>
    public static Option<string?> SarifOption() => new("--sarif")
    {
        Description = "Also write the findings to a file as SARIF 2.1.0, which code hosting shows at their lines.", HelpName = "FILE",
    };

    /// <summary>The option for XML.</summary>
    public static Option<string?> JunitOption() => new("--junit")
    {
        Description = "Also write the findings to a file as JUnit-style XML, a case a requirement.", HelpName = "FILE",
    };

    /// <summary>Writes what was asked for.</summary>
    /// <param name="cases">Each requirement with its findings, and what else kept it from being done.</param>
    /// <param name="workingFolder">The folder that relative paths are counted from.</param>
    public void Write(IReadOnlyList<(string File, IReadOnlyList<PlacedFinding> Findings, string? Error)> cases, string workingFolder)
    {
        if (Sarif is not null)
            WholeFile.Write(Path.GetFullPath(Sarif, workingFolder), FindingSarif.Of(cases.SelectMany(one => one.Findings)));
        if (Junit is not null)
            WholeFile.Write(Path.GetFullPath(Junit, workingFolder), FindingJunit.Of(cases));
    }
}
