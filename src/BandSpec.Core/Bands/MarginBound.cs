using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Bands;

/// <summary>
/// What can be claimed of a margin when the platform's statistics come from a sample: a lower confidence bound, one-sided. Unlike the margin
/// it grows with every further unit measured, up to the margin itself.
/// </summary>
/// <param name="Confidence">The one-sided confidence, such as 0.95.</param>
/// <param name="Lower">The bound on the margin.</param>
/// <param name="Worst">The node where the bound is lowest, which need not be the node of least margin.</param>
public sealed record MarginBound(double Confidence, double Lower, BandNode Worst)
{
    /// <summary>The confidence of the bound that is shown beside a margin when none is asked for.</summary>
    public const double UsualConfidence = 0.95;

    /// <summary>
    /// How many nodes are worked out in full: those that a first guess by normal quantiles ranks lowest. The guess errs by a few percent, but
    /// alike at nodes that are close to each other.
    /// </summary>
    private const int Candidates = 2;

    /// <summary>The bound of a plan; <see langword="null"/> when the platform does not say what it rests on.</summary>
    /// <param name="application">The application.</param>
    /// <param name="plan">The compensation plan.</param>
    /// <param name="bands">The plan's band.</param>
    /// <param name="confidence">One-sided confidence, 0.5 to 0.999.</param>
    public static MarginBound? Of(Application application, CompensationPlan plan, BandMap bands, double confidence)
    {
        ArgumentNullException.ThrowIfNull(application);
        ArgumentNullException.ThrowIfNull(bands);
        if (application.Platform.Sample is not { } sample)
            return null;
        StatisticsAccuracy accuracy = new(application, sample, BandFormulas.Of(application, plan));
        CapabilityTarget target = application.Requirement.Capability;
        List<(BandNode Node, NodeAccuracy Accuracy)> nodes = [.. bands.Nodes.Select(node => (node, accuracy.At(node)))];
        double quantile = NormalDistribution.Quantile(confidence);
        return nodes.OrderBy(n => n.Accuracy.RoughMargin(n.Node, target, quantile)).Take(Candidates)
            .Select(n => new MarginBound(confidence, n.Accuracy.Margin(n.Node, target, confidence), n.Node))
            .MinBy(bound => bound.Lower);
    }

    /// <summary>
    /// How many more units have to be measured, in lots as large as those measured, until the bound of this plan reaches 1;
    /// <see langword="null"/> when no number would do, because the margin itself is below 1, or when nothing is known of the sample.
    /// </summary>
    /// <param name="application">The application.</param>
    /// <param name="plan">The compensation plan.</param>
    /// <param name="bands">The plan's band.</param>
    /// <param name="confidence">One-sided confidence, 0.5 to 0.999.</param>
    public static int? FurtherUnits(Application application, CompensationPlan plan, BandMap bands, double confidence)
    {
        const int Most = 100_000;
        ArgumentNullException.ThrowIfNull(application);
        ArgumentNullException.ThrowIfNull(bands);
        if (application.Platform.Sample is not { } sample || bands.Margin < 1)
            return null;
        bool Suffices(int more) => Of(
            application.With(application.Platform with { Sample = sample.With(more) }), plan, bands, confidence)!.Lower >= 1;
        if (Suffices(0))
            return 0;
        int high = 1;
        while (high < Most && !Suffices(high))
            high *= 2;
        if (!Suffices(high))
            return null;
        int low = high / 2;
        while (high - low > 1)
            (low, high) = Suffices((low + high) / 2) ? (low, (low + high) / 2) : ((low + high) / 2, high);
        return high;
    }
}
