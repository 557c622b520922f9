using BandSpec.Core.Numerics.RareEvents;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Deciding;

/// <summary>Works out what rules mean for the units of one law; what does not depend on the rule is worked out once.</summary>
internal sealed class RuleJudging
{
    private readonly Application application;
    private readonly UnitEvents events;
    private readonly UnitLaw law;
    private readonly EstimatedProbability beyondTolerance;
    private readonly CancellationToken cancellation;
    private readonly List<(double[] Limits, EstimatedProbability Rejected, EstimatedProbability Consumer)> known = [];

    /// <param name="application">The application.</param>
    /// <param name="law">The law of its units.</param>
    /// <param name="points">The verification points of any rule: tolerances are the same for all.</param>
    /// <param name="cancellation">Ends the work, here or in <see cref="Judge"/>, by an <see cref="OperationCanceledException"/>.</param>
    public RuleJudging(Application application, UnitLaw law, IReadOnlyList<VerificationPoint> points, CancellationToken cancellation)
    {
        (this.application, this.law, this.cancellation) = (application, law, cancellation);
        events = new UnitEvents(law, application);
        beyondTolerance = Integration.Of(events.BeyondTolerance(points), Readings.None(law.Dimensions), cancellation);
    }

    /// <summary>The outcome of a rule.</summary>
    public RuleOutcome Judge(VerificationRules rules, bool isChosen, IReadOnlyList<VerificationPoint> points)
    {
        int[] impossible = [.. Enumerable.Range(0, points.Count).Where(v => points[v].Upper < points[v].Lower)];
        (EstimatedProbability rejected, EstimatedProbability consumer) = impossible.Length > 0
            ? (new(1, 0), new(0, 0))
            : RisksOf(points);
        // Rejected although within = rejected, less rejected and beyond; and the latter is beyond, less beyond and accepted.
        EstimatedProbability producer = rejected.Plus(beyondTolerance, -1).Plus(consumer, 1);
        Money reject = application.Station.RejectCost;
        return new RuleOutcome
        {
            Rules = rules,
            IsChosen = isChosen,
            Points = points,
            Consumer = consumer,
            Producer = producer,
            Rejected = rejected,
            RejectCostPerUnit = reject with { Amount = reject.Amount * rejected.Value },
            Impossible = [.. impossible.Select(v => points[v].Id)],
            UncertaintyNeeded = impossible.Length > 0 ? Needed(rules, [.. impossible.Select(v => points[v])]) : null,
        };
    }

    /// <summary>Rules often end at the same limits once these are rounded; they are then the same test.</summary>
    private (EstimatedProbability Rejected, EstimatedProbability Consumer) RisksOf(IReadOnlyList<VerificationPoint> points)
    {
        double[] limits = [.. points.SelectMany(p => new[] { p.Lower, p.Upper })];
        if (known.Find(test => test.Limits.AsSpan().SequenceEqual(limits)) is { Limits: not null } same)
            return (same.Rejected, same.Consumer);
        EstimatedProbability rejected = Integration.Of(events.Rejected(points), Readings.None(law.Dimensions + 2), cancellation);
        EstimatedProbability consumer = WrongAcceptance.Of(law, events, points, cancellation);
        known.Add((limits, rejected, consumer));
        return (rejected, consumer);
    }

    private PercentOfSpan? Needed(VerificationRules rules, IReadOnlyList<VerificationPoint> points)
    {
        double needed = points.Min(point =>
        {
            PointDecision decision = new(
                point.ProcessMean.Percent, point.ProcessSigma.Percent, point.Uncertainty.Percent / 2, point.Tolerance.Percent);
            bool accepts(double half) => AcceptanceLimits.Of(application.Requirement, point.PressureFraction, half) is var (lower, upper) && lower <= upper;
            // Where the rule alone would accept something it is the promise that does not, and no better station helps.
            return accepts(decision.Tolerance - decision.GuardBandOf(rules)) ? 0 : decision.LargestUncertainty(rules, accepts);
        });
        return needed > 0 ? PercentOfSpan.FromPercent(2 * needed) : null;
    }
}
