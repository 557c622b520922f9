using System.Text.Json;
using BandSpec.Core.Allocating;
using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Core.TestLimits;

namespace BandSpec.Files.Json;

/// <summary>
/// Writes <c>result.json</c>: everything that was found, not rounded. Temperatures are in °C, errors in %FS, times in hours but for the chamber's
/// minutes. A capability or margin without scatter is infinite, which JSON cannot say: it is <c>null</c>.
/// </summary>
public static class ResultJson
{
    /// <summary>The format's name; it changes when a member is renamed or removed.</summary>
    public const string Format = "bandspec/result/1";

    /// <summary>The bytes of the file.</summary>
    public static ReadOnlyMemory<byte> Write(Specification specification)
    {
        ArgumentNullException.ThrowIfNull(specification);
        return JsonFile.Of(json =>
        {
            json.WriteString("format", Format);
            json.Identity(specification.Application.Requirement.Identity);
            json.WriteBoolean("feasible", specification.Feasible);
            json.Figure("margin", specification.Bands.Margin);
            json.Figure("margin-continuous", specification.Choice.ContinuousMargin);
            json.Figure("floor-margin", specification.Floor.Margin);
            json.Figure("margin-bound", specification.Floor.Bound);
            if (specification is { Bound: { } bound, Application.Platform.Sample: { } sample })
                json.Object("claim", claim => WriteClaim(claim, bound, sample));
            json.Object("worst", worst => WritePlace(worst, specification.Bands.Worst));
            json.Object("plan", plan => WritePlan(plan, specification.Choice));
            if (specification.Application.Requirement.Compensation.Pinned is not null)
                json.Object("optimum", optimum => WriteOptimum(optimum, specification.Optimum));
            json.WriteNumber("exchange-rounds", specification.Optimum.ExchangeRounds);
            json.Objects("added-nodes", specification.Choice.AddedNodes, WritePlace);
            json.Objects("regions", specification.Bands.Regions, WriteRegion);
            json.Objects("allocation", specification.Allocation.Terms, WriteShare);
            json.Objects("derived-limits", specification.DerivedLimits, WriteLimit);
            json.Object("profile", profile => WriteProfile(profile, specification.Profile));
            if (specification.Decisions is { } decisions)
                DecisionJson.Members(json, decisions);
            json.Diagnosis(specification);
            if (specification.LeftOut != DraftExtras.None)
                json.Strings("left-out", Enum.GetValues<DraftExtras>().Where(one => one != DraftExtras.None && specification.LeftOut.HasFlag(one)).Select(JudgementJson.Word));
            json.Objects("nodes", specification.Bands.Nodes, WriteNode);
        });
    }

    private static void WriteClaim(Utf8JsonWriter json, MarginBound bound, PlatformSample sample)
    {
        json.Figure("margin", bound.Lower);
        json.Figure("confidence", bound.Confidence);
        json.WriteNumber("units", sample.Units);
        json.WriteNumber("lots", sample.Lots);
        json.WriteNumber("readings", sample.Readings);
    }

    private static void WritePlace(Utf8JsonWriter json, BandNode node)
    {
        json.Figure("pressure-fraction", node.PressureFraction);
        json.Figure("temperature", node.Temperature.Celsius);
        json.WriteNumber("region", node.Region);
    }

    private static void WritePlan(Utf8JsonWriter json, PlanChoice choice)
    {
        json.PlanMembers(choice.Plan);
        json.Objects("points", choice.Plan.Points, (point, read) =>
        {
            point.Figure("temperature", read.Temperature.Celsius);
            point.Figure("pressure-fraction", read.PressureFraction);
        });
        json.Figure("chamber-minutes", choice.Run.Length.Minutes);
        json.Figure("cost-per-unit", choice.Run.CostPerUnit);
        json.WriteNumber("plans-considered", choice.PlansConsidered);
        json.WriteBoolean("proven", choice.Proven);
    }

    private static void WriteOptimum(Utf8JsonWriter json, PlanChoice optimum)
    {
        json.PlanMembers(optimum.Plan);
        json.Figure("chamber-minutes", optimum.Run.Length.Minutes);
        json.Figure("cost-per-unit", optimum.Run.CostPerUnit);
        json.Figure("margin-continuous", optimum.ContinuousMargin);
        json.WriteBoolean("proven", optimum.Proven);
    }

    private static void WritePlace(Utf8JsonWriter json, NodePlace place)
    {
        json.Figure("pressure-fraction", place.PressureFraction);
        json.Figure("temperature", place.Temperature.Celsius);
        json.WriteNumber("region", place.Region);
    }

    private static void WriteRegion(Utf8JsonWriter json, RegionBand region)
    {
        json.Figure("from", region.From.Celsius);
        json.Figure("to", region.To.Celsius);
        json.Figure("allowed-tightest", region.AllowedTightest.Percent);
        json.Figure("maximum", region.Maximum.Percent);
        json.Figure("stated", region.Stated.Percent);
        json.Figure("typical", region.Typical.Percent);
        json.Object("worst", worst => WritePlace(worst, region.Worst));
        json.Figure("margin", region.Margin);
    }

    private static void WriteShare(Utf8JsonWriter json, TermAllocation share)
    {
        json.WriteString("term", share.Term.Key);
        if (share.Region is { } region)
            json.WriteNumber("region", region);
        json.Figure("multiplier", share.Multiplier);
        json.Figure("capability", share.Capability);
        json.Figure("limit", share.Limit.Percent);
        json.WriteBoolean("held", share.Held);
        json.Figure("outside-fraction", share.OutsideFraction);
    }

    private static void WriteLimit(Utf8JsonWriter json, DerivedLimit limit)
    {
        json.WriteString("name", limit.Name);
        if (limit.Region is { } region)
            json.WriteNumber("region", region);
        json.Figure("limit", limit.Limit.Percent);
    }

    private static void WriteProfile(Utf8JsonWriter json, ProfileFigures profile)
    {
        json.Figure("rms-error", profile.RmsError.Percent);
        json.Figure("outside-probability", profile.OutsideProbability);
        json.Figure("equivalent-hours", profile.EquivalentTime.Hours);
        json.Figure("age-factor", profile.AgeFactor);
    }

    private static void WriteNode(Utf8JsonWriter json, BandNode node)
    {
        WritePlace(json, node);
        json.Figure("allowed", node.Allowed.Percent);
        json.Figure("design", node.Design.Percent);
        json.Figure("mean", node.Mean.Percent);
        json.Figure("added", node.Added.Percent);
        json.Figure("sigma-sample", node.SigmaSample.Percent);
        json.Figure("sigma-long-run", node.SigmaLongRun.Percent);
        json.Figure("maximum", node.Maximum.Percent);
        json.Figure("typical", node.Typical.Percent);
        json.Figure("cpk-sample", node.CpkSample);
        json.Figure("cpk-long-run", node.CpkLongRun);
        json.Object("terms", terms =>
        {
            foreach (TermShare share in node.Terms)
                terms.Figure(share.Term.Key, share.SigmaSample.Percent);
        });
    }
}
