using System.Globalization;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The forms of what a requirement says about capability, compensation and rounding.</summary>
internal static class DesignForms
{
    private static readonly Key<double> Sample = new(
        "sample", new NumberForm(AcceptedRanges.Capability), "Cpk judged on the spread within a lot; usually 1.67, five sigma.");

    private static readonly Key<double> LongRun = new(
        "long-run", new NumberForm(AcceptedRanges.Capability), "Cpk judged on the spread over lots; usually 1.33, four sigma.");

    private static readonly Key<double> Confidence = Key.Optional<double>(
        "confidence", new NumberForm(AcceptedRanges.Confidence),
        "Confidence with which the plan has to reach the capability, given the sample that the platform rests on; left out, its figures count as exact.");

    private static readonly Key<TemperatureDifference> CandidateStep = new(
        "candidate-step", QuantityForms.Difference, "Step of the candidate temperatures.");

    private static readonly Key<Counts> Temperatures = new(
        "temperatures",
        new PatternForm<Counts>(
            "a number of plan temperatures, or the fewest and the most, such as `3..6`", "([0-9]{1,2})(\\.\\.([0-9]{1,2}))?",
            groups => new Counts(Count(groups[1].Value), Count(groups[3].Success ? groups[3].Value : groups[1].Value))),
        "How many plan temperatures: fewest..most.");

    private static readonly Key<TemperatureDifference> Separation = new(
        "separation", QuantityForms.Difference, "Least distance of neighbouring plan temperatures.");

    private static readonly Key<TemperatureDifference> Reach = Key.Optional(
        "reach", QuantityForms.Difference, TemperatureDifference.FromKelvin(15),
        "Furthest that the operating range may extend beyond the outermost plan temperatures; 15 K when left out.");

    private static readonly Key<PlanObjective> Objective = new(
        "objective",
        new ChoiceForm<PlanObjective>(
            ("least-cost", PlanObjective.LeastCost), ("most-margin", PlanObjective.MostMargin), ("least-error", PlanObjective.LeastError)),
        "Which of the plans that fit is chosen.");

    private static readonly Key<IReadOnlyList<Temperature>> Plan = Key.Optional<IReadOnlyList<Temperature>>(
        "plan", new ListForm<Temperature>("plan temperatures", QuantityForms.Temperature, 2, 10),
        "A plan to be used as given, cold to hot; the search then only tells what it would have chosen.");

    private static readonly Key<int> ZeroDegree = Key.Optional<int>(
        "zero-degree", new CountForm(AcceptedRanges.CorrectionDegree), "Degree of the zero correction of the plan given; the highest when left out.");

    private static readonly Key<int> SpanDegree = Key.Optional<int>(
        "span-degree", new CountForm(AcceptedRanges.CorrectionDegree), "Degree of the span correction of the plan given; the highest when left out.");

    private static readonly Key<PercentOfSpan> BandStep = new("band", QuantityForms.Error, "Step of band values, rounded up.");
    private static readonly Key<PercentOfSpan> LimitStep = new("limit", QuantityForms.Error, "Step of acceptance limits, rounded inward.");

    /// <summary>The form of <c>capability</c>.</summary>
    internal static MapForm<CapabilityTarget> Capability { get; } = new(
        "the capability to reach", [Sample, LongRun, Confidence],
        v => new CapabilityTarget(v.Of(Sample), v.Of(LongRun)) { Confidence = v.FindValue(Confidence) });

    /// <summary>The form of <c>compensation</c>.</summary>
    internal static MapForm<CompensationScope> Compensation { get; } = new(
        "the compensation plans to consider", [CandidateStep, Temperatures, Separation, Reach, Objective, Plan, ZeroDegree, SpanDegree],
        v => new CompensationScope
        {
            CandidateStep = v.Of(CandidateStep), FewestTemperatures = v.Of(Temperatures).Fewest, MostTemperatures = v.Of(Temperatures).Most,
            Separation = v.Of(Separation), Reach = v.Of(Reach), Objective = v.Of(Objective),
            Pinned = v.Has(Plan) || v.Has(ZeroDegree) || v.Has(SpanDegree)
                ? new PinnedPlan(v.Has(Plan) ? v.Of(Plan) : [], v.FindValue(ZeroDegree), v.FindValue(SpanDegree))
                : null,
        });

    /// <summary>The form of <c>rounding</c>.</summary>
    internal static MapForm<RoundingSteps> Rounding { get; } = new(
        "the steps of rounding", [BandStep, LimitStep], v => new RoundingSteps(v.Of(BandStep), v.Of(LimitStep)));

    private static int Count(string digits) => int.Parse(digits, CultureInfo.InvariantCulture);
}

/// <summary>The fewest and the most of something.</summary>
internal sealed record Counts(int Fewest, int Most);
