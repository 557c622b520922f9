using BandSpec.Core.Findings;

namespace BandSpec.Core.Requirements;

/// <summary>
/// A requirement together with the platform and the station that are to meet it, known to be free of contradictions: each follows its own
/// rules and they fit each other. Everything behind the input files works on an application; whether a plan fits is still open.
/// </summary>
public sealed class Application
{
    private Application(Requirement requirement, Platform platform, Station station) =>
        (Requirement, Platform, Station) = (requirement, platform, station);

    /// <summary>The customer's application and what is to be promised.</summary>
    public Requirement Requirement { get; }

    /// <summary>The sensor family.</summary>
    public Platform Platform { get; }

    /// <summary>The production line.</summary>
    public Station Station { get; }

    /// <summary>Checks all rules of all three inputs and of how they fit; every finding at once.</summary>
    public static Checked<Application> Check(Requirement requirement, Platform platform, Station station)
    {
        ArgumentNullException.ThrowIfNull(requirement);
        ArgumentNullException.ThrowIfNull(platform);
        ArgumentNullException.ThrowIfNull(station);
        IReadOnlyList<Finding> findings =
            FindingsIn(RequirementParts.Of(requirement), PlatformParts.Of(platform), StationParts.Of(station));
        return Checked<Application>.Of(findings, () => new Application(requirement, platform, station));
    }

    /// <summary>The same application with another platform, known to fit as the first one did.</summary>
    internal Application With(Platform platform) => new(Requirement, platform, Station);

    /// <summary>The same application with another requirement, known to fit as the first one did.</summary>
    internal Application With(Requirement requirement) => new(requirement, Platform, Station);

    /// <summary>The findings of every rule that can be judged of what was read.</summary>
    /// <param name="requirement">The requirement as far as it was read.</param>
    /// <param name="platform">The platform as far as it was read.</param>
    /// <param name="station">The station as far as it was read.</param>
    public static IReadOnlyList<Finding> FindingsIn(RequirementParts requirement, PlatformParts platform, StationParts station)
    {
        ArgumentNullException.ThrowIfNull(requirement);
        ArgumentNullException.ThrowIfNull(platform);
        ArgumentNullException.ThrowIfNull(station);
        List<Finding> findings = [];
        FileFindings ofRequirement = new(InputFile.Requirement, findings);
        RequirementRules.Judge(requirement, ofRequirement);
        PlatformRules.Judge(platform, new FileFindings(InputFile.Platform, findings));
        StationRules.Judge(station, new FileFindings(InputFile.Station, findings));
        // How inputs fit is only worth saying of figures that make sense in themselves.
        if (!findings.Any(finding => finding.Rule == "out-of-range"))
            CrossRules.Judge(requirement, platform, station, ofRequirement);
        return findings;
    }
}
