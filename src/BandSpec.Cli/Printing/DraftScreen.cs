using System.Globalization;
using System.Text;
using BandSpec.Cli.Drafting;
using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using Spectre.Console;

namespace BandSpec.Cli.Printing;

/// <summary>A draft on one screen: verdict, plan, band by region, and where the package is.</summary>
internal static class DraftScreen
{
    private static readonly CultureInfo Plain = CultureInfo.InvariantCulture;

    /// <summary>The screen of one draft.</summary>
    public static string Of(Specification specification, WrittenPackage package, Ink ink)
    {
        (Requirement requirement, Platform platform) = (specification.Application.Requirement, specification.Application.Platform);
        SpecificationIdentity identity = requirement.Identity;
        StringBuilder screen = new();
        screen.Append(Plain, $"\n{ink.Bold(identity.FolderName)}  {identity.Title}\n");
        screen.Append(Plain, $"{ink.Faint($"{identity.Customer}; {platform.Name}, revision {platform.Revision}; {specification.Application.Station.Name}")}\n\n");
        AppendVerdict(screen, specification, ink);
        AppendPlan(screen, specification, ink);
        AppendRegions(screen, specification, ink);
        screen.Append(DiagnosisScreen.Of(specification, ink));
        AppendProfile(screen, specification.Profile, ink);
        screen.Append(Plain, $"{ink.Bold("Package")}   {ink.Blue(package.Folder)}\n");
        foreach (string line in Wrapped(package.Files))
            screen.Append(Plain, $"          {line}\n");
        return screen.Append('\n').ToString();
    }

    private static void AppendVerdict(StringBuilder screen, Specification specification, Ink ink)
    {
        BandNode worst = specification.Bands.Worst;
        Pressure pressure = specification.Application.Requirement.Pressure.At(worst.PressureFraction);
        string place = string.Create(Plain, $"{worst.Temperature.Celsius:0.#} °C and {pressure.Value:0.###} {pressure.Unit}");
        bool isPinned = specification.Application.Requirement.Compensation.Pinned is not null;
        screen.Append(Plain, $"{(specification.Feasible ? ink.Green("FEASIBLE") : ink.Red(specification.Optimum.Proven || isPinned ? "NOT FEASIBLE" : "NO PLAN FOUND"))}{Asked(specification)}  margin {ink.Bold(Margin(specification.Bands.Margin))}, least at {place}\n");
        string proof = specification.Optimum.Proven ? ProofWords.Of(specification) : ink.Yellow(ProofWords.Of(specification));
        screen.Append(Plain, $"{proof}; a perfect correction would have {Margin(specification.Floor.Margin)}\n");
        if (specification is { Bound: { } bound, Application.Platform.Sample: { } sample })
        {
            string lots = sample.Lots == 1 ? "1 lot" : $"{sample.Lots} lots";
            screen.Append(Plain, $"at least {Margin(bound.Lower)} with {100 * bound.Confidence:0.#} % confidence: the statistics rest on {sample.Units} units of {lots}\n");
            if (specification.FurtherUnits is { } further)
                screen.Append(Plain, $"{ink.Yellow($"{further} more units measured, in lots of the same size, would raise that to 1")}\n");
        }
        if (!specification.Feasible && specification.Floor.Bound < 1)
            screen.Append(Plain, $"{ink.Yellow("no plan can help: what compensation cannot remove fills the band by itself")}\n");
        screen.Append('\n');
    }

    /// <summary>The confidence that was asked for, where it is what decides.</summary>
    private static string Asked(Specification specification) =>
        !specification.Feasible && specification is { Bands.Margin: >= 1, Application.Requirement.Capability.Confidence: { } confidence }
            ? string.Create(Plain, $" with {100 * confidence:0.#} % confidence") : "";

    private static void AppendPlan(StringBuilder screen, Specification specification, Ink ink)
    {
        (CompensationPlan plan, ChamberRun run) = (specification.Choice.Plan, specification.Choice.Run);
        string currency = specification.Application.Station.Chamber.HourlyRate.Currency;
        screen.Append(Plain, $"{ink.Bold("Plan")}      {PlanWords.Temperatures(plan)} °C; degrees {plan.ZeroDegree} for zero, {plan.SpanDegree} for span; {plan.Points.Count} readings\n");
        screen.Append(Plain, $"          {Math.Floor(run.Length.Hours):0} h {run.Length.Minutes % 60:00} min in the chamber, {run.CostPerUnit:0.00} {currency} a unit\n");
        if (specification.Application.Requirement.Compensation.Pinned is not null)
            screen.Append(Plain, $"          {Optimum(specification, currency)}\n");
        screen.Append('\n');
    }

    /// <summary>What would have been chosen instead of a pinned plan.</summary>
    private static string Optimum(Specification specification, string currency)
    {
        PlanChoice optimum = specification.Optimum;
        string proof = optimum.Proven ? "the proven optimum" : "the best plan so far";
        if (optimum.Plan.IsLike(specification.Choice.Plan))
            return $"pinned, and {proof} as well";
        double more = specification.Choice.Run.CostPerUnit - optimum.Run.CostPerUnit;
        string than = Math.Abs(more) < 0.005 ? "at the same cost" : string.Create(Plain, $"for {Math.Abs(more):0.00} {currency} a unit {(more > 0 ? "less" : "more")}");
        return $"pinned; {proof} would be {PlanWords.Temperatures(optimum.Plan)} °C; degrees {optimum.Plan.ZeroDegree}, {optimum.Plan.SpanDegree}; "
            + $"margin {Margin(optimum.ContinuousMargin)} {than}";
    }

    private static void AppendRegions(StringBuilder screen, Specification specification, Ink ink)
    {
        string format = $"F{Decimals(specification.Application.Requirement.Rounding.Band.Percent)}";
        Table table = new Table().SimpleBorder().AddColumns("Band, %FS", "allowed", "maximum", "typical", "margin");
        for (int i = 1; i < table.Columns.Count; i++)
            table.Columns[i].RightAligned();
        foreach (RegionBand region in specification.Bands.Regions)
            table.AddRow(
                new Text(string.Create(Plain, $"{region.From.Celsius} to {region.To.Celsius} °C")),
                Tables.Figure(region.AllowedTightest.Percent.ToString(format, Plain)),
                Tables.Figure(region.Stated.Percent.ToString(format, Plain)),
                Tables.Figure(region.Typical.Percent.ToString(format, Plain)),
                Tables.Figure(Margin(region.Margin), region.Margin < 1 ? Color.Red : null));
        screen.Append(Tables.Of(table, ink)).Append('\n');
    }

    private static void AppendProfile(StringBuilder screen, ProfileFigures profile, Ink ink)
    {
        double parts = profile.OutsideProbability * 1e6;
        string outside = parts < 0.001 ? "less than 0.001" : parts.ToString(parts < 1 ? "0.000" : "0.#", Plain);
        screen.Append(Plain, $"{ink.Bold("Over life")} rms error {profile.RmsError.Percent:0.000} %FS; beyond the allowed error {outside} millionths of the time;\n");
        screen.Append(Plain, $"          drift {profile.AgeFactor:0.00} times that of the ageing test\n\n");
    }

    /// <summary>Cut, not rounded: a margin of 0.9996 is not 1.</summary>
    internal static string Margin(double margin) =>
        double.IsFinite(margin) ? (Math.Floor((margin * 1000) + 1e-7) / 1000).ToString("0.000", Plain) : "\u221e";

    private static int Decimals(double step)
    {
        string text = step.ToString("0.#########", Plain);
        return text.Contains('.', StringComparison.Ordinal) ? text.Length - text.IndexOf('.', StringComparison.Ordinal) - 1 : 0;
    }

    private static IEnumerable<string> Wrapped(IReadOnlyList<string> names)
    {
        string line = "";
        foreach (string name in names)
        {
            if (line.Length + name.Length > 90)
            {
                yield return line + ",";
                line = "";
            }
            line += line.Length == 0 ? name : $", {name}";
        }
        yield return line;
    }
}
