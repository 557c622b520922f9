using BandSpec.Core.Specifying;

namespace BandSpec.Core.VirtualLots;

/// <summary>What virtual lots show, as figures with intervals.</summary>
public sealed record LotReport
{
    /// <summary>Units made.</summary>
    public required long Units { get; init; }

    /// <summary>Lots made.</summary>
    public required long Lots { get; init; }

    /// <summary>Units in a lot.</summary>
    public required int LotSize { get; init; }

    /// <summary>Whether all lots of the order were made; otherwise the figures are those of the lots made so far.</summary>
    public required bool IsComplete { get; init; }

    /// <summary>What is left after each step, all as shares of the units made: the test temperatures in order, then new, then over life.</summary>
    public required IReadOnlyList<LotStep> Steps { get; init; }

    /// <summary>Units that never leave the allowed error, out of all.</summary>
    public required Rate Good { get; init; }

    /// <summary>Rejected units out of the good ones.</summary>
    public required Rate GoodRejected { get; init; }

    /// <summary>Accepted units that leave the allowed error somewhere on the map, new or at the end of life, out of the accepted.</summary>
    public required Rate AcceptedLeaving { get; init; }

    /// <summary>The same by region, cold to hot; a unit may leave in several.</summary>
    public required IReadOnlyList<Rate> AcceptedLeavingByRegion { get; init; }

    /// <summary>Moments of use with the error beyond the allowed, out of all moments of accepted units.</summary>
    public required Rate UseOutside { get; init; }

    /// <summary>The errors of accepted units over the profile.</summary>
    public required ErrorHistogram Histogram { get; init; }

    /// <summary>Closed form beside simulation.</summary>
    public required IReadOnlyList<Twin> Twins { get; init; }

    /// <summary>Reads the figures of a result.</summary>
    /// <param name="specification">The specification whose units were made, for the closed form's side.</param>
    /// <param name="result">What was made; at least two lots.</param>
    /// <exception cref="ArgumentException">The result is of another subject, or of fewer than two lots.</exception>
    public static LotReport Of(Specification specification, LotResult result)
    {
        ArgumentNullException.ThrowIfNull(specification);
        ArgumentNullException.ThrowIfNull(result);
        LotLaw law = new(LotSubject.Of(specification));
        if (law.Fingerprint != result.Fingerprint)
            throw new ArgumentException("these lots were made for another specification", nameof(result));
        if (result.LotsMade < 2)
            throw new ArgumentException("fewer than two lots say nothing about their scatter", nameof(result));
        LotRates rates = new(result);
        return new LotReport
        {
            Units = result.UnitsMade,
            Lots = result.LotsMade,
            LotSize = result.Order.LotSize,
            IsComplete = result.IsComplete,
            Steps = rates.Steps(law.Test.Temperatures),
            Good = rates.OfUnits((int)Counted.Good),
            GoodRejected = rates.GoodRejected(),
            AcceptedLeaving = rates.OfAccepted((int)Counted.AcceptedLeaving),
            AcceptedLeavingByRegion = [.. Enumerable.Range(0, law.Map.Regions).Select(r => rates.OfAccepted(TallyPlan.LeavingRegion(r)))],
            UseOutside = rates.OfAcceptedMoments((int)Counted.UseOutside),
            Histogram = ErrorHistogram.Of(result.Tally, law.Profile.HistogramEnd),
            Twins = VirtualLots.Twins.Of(specification, law, result),
        };
    }
}

/// <summary>One step of production or life and the share of units that are through it.</summary>
/// <param name="Name">What they are through, such as <c>verified at 25 °C</c>.</param>
/// <param name="Through">The share of all units made.</param>
public sealed record LotStep(string Name, Rate Through);

/// <summary>A histogram of errors in %FS: equal bins from −<see cref="End"/> to <see cref="End"/>, and what lies beyond.</summary>
/// <param name="End">Upper end of the last bin, %FS.</param>
/// <param name="Bins">Moments of use in each bin, rising.</param>
/// <param name="Below">Moments below the first bin.</param>
/// <param name="Above">Moments above the last.</param>
public sealed record ErrorHistogram(double End, IReadOnlyList<long> Bins, long Below, long Above)
{
    internal static ErrorHistogram Of(LotTally tally, double end) =>
        new(end, [.. Enumerable.Range(1, TallyPlan.Bins - 2).Select(tally.Bin)], tally.Bin(0), tally.Bin(TallyPlan.Bins - 1));
}
