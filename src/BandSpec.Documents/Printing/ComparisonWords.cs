using BandSpec.Core.Requirements;
using BandSpec.Core.Revisions;
using BandSpec.Core.Specifying;

namespace BandSpec.Documents.Printing;

/// <summary>How a comparison is put into words, the same on a screen and in documents.</summary>
public static class ComparisonWords
{
    /// <summary>A specification's number and revision.</summary>
    public static string NameOf(Specification specification)
    {
        ArgumentNullException.ThrowIfNull(specification);
        SpecificationIdentity identity = specification.Application.Requirement.Identity;
        return $"{identity.Number} revision {identity.Revision}";
    }

    /// <summary>The heading over changes of a subject.</summary>
    public static string HeadingOf(FigureSubject subject) => subject switch
    {
        FigureSubject.DerivedLimits => "Derived limits",
        FigureSubject.Plan => "Compensation plan",
        FigureSubject.Verification => "Acceptance limits",
        _ => subject.ToString(),
    };

    /// <summary>A figure and where it holds.</summary>
    public static string NameOf(FigureChange change)
    {
        ArgumentNullException.ThrowIfNull(change);
        string joint = change.Subject == FigureSubject.Allocation ? "of" : "at";
        return change.Place.Length == 0 ? change.Name : $"{change.Name} {joint} {change.Place}";
    }

    /// <summary>The keys of a cause, with their file.</summary>
    public static string NameOf(Cause cause)
    {
        ArgumentNullException.ThrowIfNull(cause);
        return string.Join(" + ", cause.Names.Select(n => $"{n.File.ToString().ToLowerInvariant()}: {n.Key}"));
    }

    /// <summary>What a cause does alone, without the arrow of the figure that it moves most; null where it moves one.</summary>
    public static string? EffectOf(Cause cause) => cause switch
    {
        { Outcome: null } => "cannot be told alone: it contradicts the older inputs",
        { Largest: not null } => null,
        { Outcome: { } outcome } when outcome.Any(c => c.Old is null || c.New is null) => "alone: adds or takes away points, moves no limit",
        _ => "alone: moves no band, margin or acceptance limit",
    };

    /// <summary>What a change means for one side.</summary>
    public static string Of(Bearing bearing) => bearing.ToString().ToLowerInvariant();

    /// <summary>
    /// What changed but for the test points, by subject: a term whose limit changed is told by that alone, its multiplier changed with it.
    /// </summary>
    public static IReadOnlyList<IGrouping<FigureSubject, FigureChange>> OutcomeOf(Comparison comparison)
    {
        ArgumentNullException.ThrowIfNull(comparison);
        HashSet<string> told = [.. comparison.Outcome.Where(c => c is { Subject: FigureSubject.Allocation, Name: "limit" }).Select(c => c.Place)];
        return
        [
            .. comparison.Outcome.Where(c => c.Subject != FigureSubject.Verification && !(c is { Subject: FigureSubject.Allocation, Name: "multiplier" } && told.Contains(c.Place)))
                .GroupBy(c => c.Subject),
        ];
    }

    /// <summary>The points whose acceptance interval or tolerance differs as it is shown.</summary>
    public static IReadOnlyList<PointChange> PointsOf(Comparison comparison)
    {
        ArgumentNullException.ThrowIfNull(comparison);
        return [.. comparison.Points.Where(p => p.Shown.Old != p.Shown.New || p.ForCustomer != Bearing.Neutral)];
    }

    /// <summary>The answer in a sentence: whether limits differ, and for how many acceptance limits which way.</summary>
    public static string AnswerOf(Comparison comparison)
    {
        ArgumentNullException.ThrowIfNull(comparison);
        IReadOnlyList<PointChange> points = PointsOf(comparison);
        if (!comparison.LimitsDiffer)
            return comparison.IsEmpty ? "Nothing differs." : "No limit differs.";
        if (points.Count == 0)
            return "Stated limits differ; the acceptance limits are the same.";
        int added = points.Count(p => p.Old is null), gone = points.Count(p => p.New is null);
        string[] told =
        [
            .. Told(points.Count(p => p.ForProduction == Bearing.Tighter), "tighter for production"),
            .. Told(points.Count(p => p.ForProduction == Bearing.Looser), "looser for production"),
            .. Told(points.Count(p => p.ForCustomer == Bearing.Tighter), "tighter for the customer"),
            .. Told(points.Count(p => p.ForCustomer == Bearing.Looser), "looser for the customer"),
            .. Told(added, "new"), .. Told(gone, "no longer tested"),
        ];
        string of = points.Count == 1 ? "One test point differs" : $"{points.Count} test points differ";
        return told.Length == 0 ? $"{of}." : $"{of}: {string.Join(", ", told)}.";
    }

    private static string[] Told(int count, string what) => count == 0 ? [] : [$"{count} {what}"];
}
