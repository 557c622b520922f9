namespace BandSpec.Cli;

/// <summary>Names in a package folder that the program itself looks for.</summary>
internal static class PackageNames
{
    /// <summary>The specification, with its inputs attached.</summary>
    public const string Document = "specification.pdf";

    /// <summary>The digests of inputs and outputs.</summary>
    public const string Manifest = "manifest.json";

    /// <summary>Everything that was found.</summary>
    public const string Result = "result.json";

    /// <summary>The limits that production tests against.</summary>
    public const string Limits = "limits.json";
}
