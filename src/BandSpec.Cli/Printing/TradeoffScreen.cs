using System.Globalization;
using System.Text;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using Spectre.Console;

namespace BandSpec.Cli.Printing;

/// <summary>The plans among which a requirement leaves a choice, as two tables.</summary>
internal static class TradeoffScreen
{
    private static readonly CultureInfo Plain = CultureInfo.InvariantCulture;

    /// <summary>The screen.</summary>
    /// <param name="found">The alternatives.</param>
    /// <param name="chart">The chart's file as the user would name it; null when none was drawn.</param>
    /// <param name="ink">Colours.</param>
    public static string Of(PlanAlternatives found, string? chart, Ink ink)
    {
        SpecificationIdentity identity = found.Application.Requirement.Identity;
        StringBuilder screen = new();
        screen.Append(Plain, $"\n{ink.Bold(identity.FolderName)}  {identity.Title}\n");
        screen.Append(ink.Faint(string.Create(Plain, $"each plan is the best of all that cost no more, of {found.Fronts.PlansConsidered:N0} plans")));
        screen.Append(Plain, $"\n\n{ink.Bold("Cost against margin")}\n{(found.ByMargin.Count > 0 ? TableOf(found, found.ByMargin, ink) : "none found yet\n")}\n");
        screen.Append(Plain, $"{ink.Bold("Cost against rms error")}{ink.Faint(", plans that fit")}\n");
        screen.Append(found.ByRmsError.Count > 0 ? TableOf(found, found.ByRmsError, ink) : $"{ink.Red(found.Proven ? "no plan fits" : "none found yet")}\n");
        screen.Append(Plain, $"\n{OptimumLine(found, ink)}\n");
        foreach (string line in Claims(found, ink))
            screen.Append(Plain, $"{line}\n");
        if (chart is not null)
            screen.Append(Plain, $"{ink.Bold("Chart")}     {ink.Blue(chart)}\n");
        return screen.Append('\n').ToString();
    }

    /// <summary>How far the proof got when the search was stopped.</summary>
    public static string Stopped(PlanAlternatives found)
    {
        string currency = found.Application.Station.Chamber.HourlyRate.Currency;
        string UpTo(double? cost) => cost is { } known ? string.Create(Plain, $"complete up to {known:0.00} {currency} a unit") : "not begun";
        return $"{found.Application.Requirement.Identity.FolderName}: stopped; margins are {UpTo(found.Fronts.MarginCompleteTo)}, rms errors are {UpTo(found.Fronts.RmsErrorCompleteTo)}";
    }

    /// <summary>What was written into the requirement.</summary>
    public static string Pinned(string file, PlanAlternative chosen, IReadOnlyList<string> changes, Ink ink)
    {
        StringBuilder screen = new();
        CompensationPlan plan = chosen.Point.Plan;
        screen.Append(changes.Count == 0
            ? $"{ink.Blue(file)} pins plan {chosen.Number} already\n"
            : $"{ink.Blue(file)} now pins plan {chosen.Number}: {PlanWords.Temperatures(plan)} °C; degrees {plan.ZeroDegree} for zero, {plan.SpanDegree} for span\n");
        foreach (string change in changes)
            screen.Append(Plain, $"{(change[0] == '+' ? ink.Green(change) : ink.Red(change))}\n");
        return screen.ToString();
    }

    private static string TableOf(PlanAlternatives found, IReadOnlyList<PlanAlternative> front, Ink ink)
    {
        bool claims = found.Application.Platform.Sample is not null;
        double confidence = found.Application.Requirement.Capability.Confidence ?? Core.Bands.MarginBound.UsualConfidence;
        Table table = new Table().SimpleBorder().AddColumns("", $"{found.Application.Station.Chamber.HourlyRate.Currency} a unit", "margin");
        if (claims)
            table.AddColumns(string.Create(Plain, $"at {100 * confidence:0.#} %"), "more units");
        table.AddColumns("rms, %FS", "temperatures, °C", "degrees", "proven", "");
        for (int i = 0; i < (claims ? 6 : 4); i++)
            table.Columns[i].RightAligned();
        foreach (PlanAlternative one in front)
            table.AddRow([.. Cells(one, claims, found.Pinned is not null)]);
        return Tables.Of(table, ink);
    }

    private static IEnumerable<Text> Cells(PlanAlternative one, bool claims, bool pins)
    {
        TradeoffPoint point = one.Point;
        bool fits = point.Margin >= 1 - PlanChoice.Shortfall;
        yield return Tables.Figure(one.Number.ToString(Plain));
        yield return Tables.Figure(point.CostPerUnit.ToString("0.00", Plain));
        yield return Tables.Figure(DraftScreen.Margin(point.Margin), fits ? null : Color.Red);
        if (claims)
        {
            yield return Tables.Figure(one.Bound is { } bound ? DraftScreen.Margin(bound.Lower) : "");
            yield return Tables.Figure(one.FurtherUnits?.ToString(Plain) ?? "\u2013");
        }
        yield return Tables.Figure(point.RmsError.ToString("0.0000", Plain));
        yield return new Text(PlanWords.Temperatures(point.Plan));
        yield return new Text(string.Create(Plain, $"{point.Plan.ZeroDegree}, {point.Plan.SpanDegree}"));
        yield return new Text(point.Proven ? "yes" : "no");
        yield return new Text(one switch
        {
            { IsOptimum: true, IsPinned: true } => "\u25c4 pinned, and the best",
            { IsPinned: true } => "\u25c4 pinned",
            { IsOptimum: true } => pins ? "\u25c4 best" : "\u25c4 draft",
            _ => "",
        });
    }

    /// <summary>What a draft takes; said in full where it is not in a table.</summary>
    private static string OptimumLine(PlanAlternatives found, Ink ink)
    {
        PlanChoice taken = found.Pinned ?? found.Optimum;
        string objective = found.Application.Requirement.Compensation.Objective switch
        {
            PlanObjective.LeastCost => "least cost", PlanObjective.MostMargin => "most margin", _ => "least error",
        };
        string why = found.Pinned is not null ? "pinned by the requirement"
            : found.ByRmsError.Count == 0 && found.Proven ? "most margin, since no plan fits"
            : found.Optimum.Proven ? objective : $"{objective}, best so far";
        string instead = found.Pinned is null || found.Pinned.Plan.IsLike(found.Optimum.Plan) ? "" : $"; {objective} would be {NameOf(found, found.Optimum)}";
        return $"{ink.Bold("Draft")}     takes {NameOf(found, taken)}: {why}{instead}\n          {ink.Faint("`--choose K` pins another in the requirement")}";
    }

    /// <summary>A plan by its number; in full where it is on no front.</summary>
    private static string NameOf(PlanAlternatives found, PlanChoice choice) => found.All.FirstOrDefault(one => one.Point.Plan.IsLike(choice.Plan)) is { } known
        ? $"plan {known.Number}"
        : string.Create(
            Plain,
            $"{PlanWords.Temperatures(choice.Plan)} °C, {choice.Run.CostPerUnit:0.00} {found.Application.Station.Chamber.HourlyRate.Currency} a unit, margin {DraftScreen.Margin(choice.ContinuousMargin)}");

    /// <summary>What measuring more units would change.</summary>
    private static IEnumerable<string> Claims(PlanAlternatives found, Ink ink)
    {
        PlanChoice taken = found.Pinned ?? found.Optimum;
        if (found.All.FirstOrDefault(one => one.Point.Plan.IsLike(taken.Plan)) is not { Bound: { } bound } draft)
            yield break;
        string confidence = string.Create(Plain, $"with {100 * bound.Confidence:0.#} % confidence");
        yield return draft.FurtherUnits switch
        {
            0 => $"{ink.Bold("Sample")}    plan {draft.Number} is safe {confidence}: the sample behind the statistics is large enough",
            { } units => $"{ink.Bold("Sample")}    {units} more units measured, in lots of the same size, would make plan {draft.Number} safe {confidence}",
            null when draft.Point.Margin < 1 => $"{ink.Bold("Sample")}    the margin of plan {draft.Number} itself is below 1, whatever is measured",
            null => $"{ink.Bold("Sample")}    measuring units alone would not make plan {draft.Number} safe {confidence}: what the ageing test leaves open is too much",
        };
        if (draft.FurtherUnits != 0 && found.ByMargin.FirstOrDefault(one => one.FurtherUnits == 0) is { } safe)
            yield return string.Create(
                Plain, $"          plan {safe.Number} is safe as it is, for {safe.Point.CostPerUnit - draft.Point.CostPerUnit:0.00} {found.Application.Station.Chamber.HourlyRate.Currency} a unit more");
    }
}
