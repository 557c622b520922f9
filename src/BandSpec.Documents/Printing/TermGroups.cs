namespace BandSpec.Documents.Printing;

/// <summary>The groups in which an error budget is read, in the order of the page.</summary>
internal static class TermGroups
{
    public const string Reference = "reference", Accuracy = "accuracy", Thermal = "thermal";
    public const string Ageing = "ageing", Production = "production", Further = "further";

    public static readonly IReadOnlyList<string> All = [Reference, Accuracy, Thermal, Ageing, Production, Further];

    public static string Of(string term) => term switch
    {
        "linearity-residue" or "pressure-hysteresis" or "repeatability" or "resolution" => Accuracy,
        "zero-residue" or "span-residue" or "thermal-hysteresis" => Thermal,
        "ageing" => Ageing,
        "carried-noise" or "pressure-standard" => Production,
        _ => Further,
    };

    public static string OfDerived(string name) => name.StartsWith("thermal", StringComparison.Ordinal) ? Thermal : Reference;
}
