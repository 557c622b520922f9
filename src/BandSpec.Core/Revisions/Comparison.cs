using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;

namespace BandSpec.Core.Revisions;

/// <summary>
/// What differs between two finished specifications, figure by figure: mostly two revisions of one, but any two will do. Comparing the other
/// way round gives the same changes with tighter and looser exchanged; a specification compared with itself has none.
/// </summary>
public sealed class Comparison
{
    private Comparison(Specification old, Specification now) => (Old, New) = (old, now);

    /// <summary>The older record.</summary>
    public Specification Old { get; }

    /// <summary>The newer record.</summary>
    public Specification New { get; }

    /// <summary>What changed in requirement, platform and station, in the order of the files.</summary>
    public required IReadOnlyList<FigureChange> Inputs { get; init; }

    /// <summary>What that did to band, margin, plan, allocation and limits.</summary>
    public required IReadOnlyList<FigureChange> Outcome { get; init; }

    /// <summary>The verification points among it, each with all its limits.</summary>
    public IReadOnlyList<PointChange> Points => PointChange.Between(Old, New, Outcome);

    /// <summary>Whether nothing differs.</summary>
    public bool IsEmpty => Inputs.Count == 0 && Outcome.Count == 0;

    /// <summary>
    /// Whether a limit differs that somebody may have been told: a stated band or allowed error, a term's or a derived figure's limit, an
    /// acceptance limit, or where it holds.
    /// </summary>
    public bool LimitsDiffer => Outcome.Any(IsLimit);

    /// <summary>The differences between two records.</summary>
    /// <param name="old">The older record.</param>
    /// <param name="now">The newer record.</param>
    public static Comparison Of(Specification old, Specification now)
    {
        ArgumentNullException.ThrowIfNull(old);
        ArgumentNullException.ThrowIfNull(now);
        IReadOnlyList<TemperatureStretch> stretches = TemperatureStretch.Between(old.Bands, now.Bands);
        return new Comparison(old, now)
        {
            Inputs = InputsBetween(old.Application, now.Application),
            Outcome = FigureChange.Between(new OutcomeFigures(old, stretches).All(), new OutcomeFigures(now, stretches).All()),
        };
    }

    /// <summary>What differs between the inputs of two specifications, in the order of the files.</summary>
    /// <param name="old">The older inputs.</param>
    /// <param name="now">The newer inputs.</param>
    public static IReadOnlyList<FigureChange> InputsBetween(Application old, Application now)
    {
        ArgumentNullException.ThrowIfNull(old);
        ArgumentNullException.ThrowIfNull(now);
        return InputsBetween(ApplicationInputs.Of(old), ApplicationInputs.Of(now));
    }

    /// <summary>What differs between inputs that need not fit each other.</summary>
    internal static IReadOnlyList<FigureChange> InputsBetween(ApplicationInputs old, ApplicationInputs now)
    {
        bool regionsByNumber = old.Requirement.AllowedError.Count == now.Requirement.AllowedError.Count;
        bool binsByNumber = old.Requirement.Profile.Count == now.Requirement.Profile.Count;
        return FigureChange.Between(Figures(old), Figures(now));

        IReadOnlyList<Figure> Figures(ApplicationInputs inputs) =>
        [
            .. new RequirementFigures(inputs.Requirement, regionsByNumber, binsByNumber).All(),
            .. new PlatformFigures(inputs.Platform).All(), .. new StationFigures(inputs.Station).All(),
        ];
    }

    private static bool IsLimit(FigureChange change) => change.Subject switch
    {
        FigureSubject.Band => change.Name is "stated band" or "tightest allowed error",
        FigureSubject.Allocation => change.Name == "limit",
        FigureSubject.DerivedLimits => true,
        FigureSubject.Verification => change.Name is VerificationFigures.LowerLimit or VerificationFigures.UpperLimit or "pressure",
        _ => false,
    };
}
