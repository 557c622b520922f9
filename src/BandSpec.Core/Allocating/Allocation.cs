using BandSpec.Core.Bands;
using BandSpec.Core.Numerics;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Allocating;

/// <summary>How the allowed error was shared out among the terms.</summary>
/// <param name="Terms">Each term's share: region terms once for each region, shared terms once. Terms without scatter are absent.</param>
public sealed record Allocation(IReadOnlyList<TermAllocation> Terms)
{
    /// <summary>
    /// The lexicographic max-min allocation of a plan: every term receives the same multiple of its own spread as far as that goes, and room
    /// left in a mild region flows to that region's own terms.
    /// </summary>
    /// <param name="application">The application.</param>
    /// <param name="plan">The compensation plan.</param>
    /// <param name="bands">The plan's band.</param>
    public static Allocation Of(Application application, CompensationPlan plan, BandMap bands)
    {
        ArgumentNullException.ThrowIfNull(application);
        ArgumentNullException.ThrowIfNull(bands);
        Requirement requirement = application.Requirement;
        var budgets = new Budgets(requirement, bands, BandFormulas.Of(application, plan));
        List<SlotReach> reaches = [.. budgets.Slots.Select(s => new SlotReach(s, bands, requirement.Capability))];
        List<double?> held = [.. reaches.Select(r => r.HeldMultiplier(requirement.HeldTerms))];
        double[] multipliers = ProgressiveFilling.Fill(budgets.All, held);
        IEnumerable<TermAllocation> terms = reaches.Select((r, i) => r.Allocate(multipliers[i], held[i] is not null));
        return new Allocation([.. terms.OrderBy(t => t.Region ?? int.MaxValue)]);
    }
}

/// <summary>The share of one term.</summary>
/// <param name="Term">The term.</param>
/// <param name="Region">Index of the region, counted from the coldest; <see langword="null"/> for a term that all regions share.</param>
/// <param name="Multiplier">The multiple <c>m ≥ 0</c> of its own design spread that the term may take.</param>
/// <param name="Capability">
/// The capability index that the term reaches against its limit: <c>m·C</c> of the criterion that governs where the limit is largest.
/// </param>
/// <param name="Limit">The limit, <c>added + m·max(3C_s s_w, 3C_l s_t)</c>, largest in the region; pressure hysteresis as full width.</param>
/// <param name="Held">Whether the customer fixed the limit.</param>
/// <param name="OutsideFraction">The fraction of units beyond the limit over lots, 0 … 1; units to screen out when the multiplier is below 1.</param>
public sealed record TermAllocation(
    ErrorTerm Term, int? Region, double Multiplier, double Capability, PercentOfSpan Limit, bool Held, double OutsideFraction);

/// <summary>How far a slot's term reaches at each node where it acts: what it adds, and how much limit one multiple of it takes.</summary>
internal sealed class SlotReach
{
    private readonly Slot slot;
    private readonly CapabilityTarget target;
    private readonly List<TermShare> shares;

    public SlotReach(Slot slot, BandMap bands, CapabilityTarget target)
    {
        (this.slot, this.target) = (slot, target);
        shares =
        [
            .. bands.Nodes.Where(n => slot.Region is null || n.Region == slot.Region)
                .Select(n => n.Terms.First(t => t.Term == slot.Term))
                .Where(t => t.SigmaLongRun.Percent > 0),
        ];
    }

    /// <summary>Pressure hysteresis is stated as full width, twice what it adds to an error.</summary>
    private double Widths => slot.Term == ErrorTerm.PressureHysteresis ? 2 : 1;

    /// <summary>The multiplier that follows from the customer's limit, or nothing when the term is not held.</summary>
    public double? HeldMultiplier(IReadOnlyList<HeldTerm> held)
    {
        HeldTerm? mine = held.FirstOrDefault(h => h.Term == slot.Term.Key);
        return mine is null
            ? null
            : Math.Max(0, shares.Min(s => ((mine.Limit.Percent / Widths) - s.Added.Percent) / ReachOf(s)));
    }

    /// <summary>The term's share with a multiplier.</summary>
    public TermAllocation Allocate(double multiplier, bool held)
    {
        TermShare widest = shares.MaxBy(s => s.Added.Percent + (multiplier * ReachOf(s)))!;
        double limit = widest.Added.Percent + (multiplier * ReachOf(widest));
        bool sampleGoverns = target.Sample * widest.SigmaSample.Percent >= target.LongRun * widest.SigmaLongRun.Percent;
        double sigma = widest.SigmaLongRun.Percent;
        double outside = NormalDistribution.UpperTail((limit - widest.Added.Percent) / sigma)
            + NormalDistribution.UpperTail((limit + widest.Added.Percent) / sigma);
        return new TermAllocation(
            slot.Term, slot.Region, multiplier, multiplier * (sampleGoverns ? target.Sample : target.LongRun),
            PercentOfSpan.FromPercent(Widths * limit), held, outside);
    }

    /// <summary><c>max(3C_s s_w, 3C_l s_t)</c>.</summary>
    private double ReachOf(TermShare share) =>
        Math.Max(3 * target.Sample * share.SigmaSample.Percent, 3 * target.LongRun * share.SigmaLongRun.Percent);
}
