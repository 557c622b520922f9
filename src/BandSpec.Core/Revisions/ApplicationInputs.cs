using BandSpec.Core.Findings;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Revisions;

/// <summary>A requirement, a platform and a station that, unlike those of an <see cref="Application"/>, need not fit each other.</summary>
internal sealed record ApplicationInputs(Requirement Requirement, Platform Platform, Station Station)
{
    /// <summary>The inputs of an application.</summary>
    public static ApplicationInputs Of(Application application) => new(application.Requirement, application.Platform, application.Station);

    /// <summary>The application, or why the inputs do not fit each other.</summary>
    public Checked<Application> Check() => Application.Check(Requirement, Platform, Station);
}
