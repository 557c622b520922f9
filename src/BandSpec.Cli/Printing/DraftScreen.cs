using System.Globalization;
using System.Text;
using BandSpec.Cli.Drafting;
using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;

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
        AppendProfile(screen, specification.Profile, ink);
        screen.Append(Plain, $"{ink.Bold("Package")}   {ink.Blue(package.Folder)}\n");
        foreach (string line in Wrapped(package.Files))
            screen.Append(Plain, $"          {line}\n");
        return screen.Append('\n').ToString();
    }

    /// <summary>One line for each of several drafts, and how many of each kind there are.</summary>
    public static string SummaryOf(IReadOnlyList<Draft> drafts, Ink ink)
    {
        int width = drafts.Max(draft => CellWidth.Of(draft.File));
        StringBuilder screen = new("\n");
        foreach (Draft draft in drafts)
            screen.Append(Plain, $"{draft.File}{new string(' ', width - CellWidth.Of(draft.File))}  {Outcome(draft, ink)}\n");
        string[] counts =
        [
            .. from state in Enum.GetValues<DraftState>()
               let count = drafts.Count(draft => draft.State == state)
               where count > 0
               select $"{count} {Word(state)}",
        ];
        return screen.Append(Plain, $"\n{ink.Bold(string.Join(", ", counts))}\n").ToString();
    }

    private static string Outcome(Draft draft, Ink ink) => draft switch
    {
        { Verdict: { } verdict, Package: { } package } =>
            $"{Verdict(verdict.Feasible, ink)}  margin {Margin(verdict.Margin)}  {ink.Blue(package.Folder)}"
            + (draft.State == DraftState.UpToDate ? "  up to date" : "") + (draft.Release is null ? "" : $"  {ink.Green("RELEASED")}"),
        { State: DraftState.Refused } => ink.Red($"{draft.Findings.Count} finding{(draft.Findings.Count == 1 ? "" : "s")}"),
        { State: DraftState.Failed } => ink.Red("failed"),
        _ => ink.Faint(draft.Note ?? ""),
    };

    private static string Word(DraftState state) => state switch
    {
        DraftState.Refused => "with findings",
        DraftState.UpToDate => "up to date",
        DraftState.LeftOut => "left out",
        _ => state.ToString().ToLowerInvariant(),
    };

    private static string Verdict(bool feasible, Ink ink) =>
        feasible ? ink.Green("FEASIBLE    ") : ink.Red("NOT FEASIBLE");

    private static void AppendVerdict(StringBuilder screen, Specification specification, Ink ink)
    {
        BandNode worst = specification.Bands.Worst;
        Pressure pressure = specification.Application.Requirement.Pressure.At(worst.PressureFraction);
        string place = string.Create(Plain, $"{worst.Temperature.Celsius:0.#} °C and {pressure.Value:G4} {pressure.Unit}");
        screen.Append(Plain, $"{Verdict(specification.Feasible, ink).TrimEnd()}  margin {ink.Bold(Margin(specification.Bands.Margin))}, least at {place}\n");
        string proof = specification.Choice.Proven ? "proven over" : "best found so far among";
        screen.Append(Plain, $"{proof} {specification.Choice.PlansConsidered:N0} plans; a perfect correction would have {Margin(specification.Floor.Margin)}\n");
        if (!specification.Feasible && specification.Floor.Bound < 1)
            screen.Append(Plain, $"{ink.Yellow("no plan can help: what compensation cannot remove fills the band by itself")}\n");
        screen.Append('\n');
    }

    private static void AppendPlan(StringBuilder screen, Specification specification, Ink ink)
    {
        (CompensationPlan plan, ChamberRun run) = (specification.Choice.Plan, specification.Choice.Run);
        string temperatures = string.Join(", ", plan.Temperatures.Select(temperature => temperature.Celsius.ToString(Plain)));
        string currency = specification.Application.Station.Chamber.HourlyRate.Currency;
        screen.Append(Plain, $"{ink.Bold("Plan")}      {temperatures} °C; degrees {plan.ZeroDegree} for zero, {plan.SpanDegree} for span; {plan.Points.Count} readings\n");
        screen.Append(Plain, $"          {Math.Floor(run.Length.Hours):0} h {run.Length.Minutes % 60:00} min in the chamber, {run.CostPerUnit:0.00} {currency} a unit\n\n");
    }

    private static void AppendRegions(StringBuilder screen, Specification specification, Ink ink)
    {
        int decimals = Decimals(specification.Application.Requirement.Rounding.Band.Percent);
        string format = $"F{decimals}";
        screen.Append(Plain, $"{ink.Bold("Band")}      {ink.Faint("°C                  allowed   band  typical   margin")}     %FS\n");
        foreach (RegionBand region in specification.Bands.Regions)
        {
            string range = $"{region.From.Celsius.ToString(Plain),5} to {region.To.Celsius.ToString(Plain),-5}";
            string margin = Margin(region.Margin);
            screen.Append(Plain, $"          {range,-18}")
                .Append(region.AllowedTightest.Percent.ToString(format, Plain).PadLeft(9))
                .Append(region.Stated.Percent.ToString(format, Plain).PadLeft(7))
                .Append(region.Typical.Percent.ToString(format, Plain).PadLeft(9))
                .Append(Plain, $"{new string(' ', 9 - margin.Length)}{(region.Margin >= 1 ? margin : ink.Red(margin))}\n");
        }
        screen.Append('\n');
    }

    private static void AppendProfile(StringBuilder screen, ProfileFigures profile, Ink ink) => screen.Append(
        Plain, $"{ink.Bold("Over life")} rms error {profile.RmsError.Percent:0.000} %FS; outside the allowed error {profile.OutsideProbability * 1e6:0.###} ppm of the time; drift {profile.AgeFactor:0.00} times the ageing test's\n\n");

    /// <summary>Cut, not rounded: a margin of 0.9996 is not 1.</summary>
    private static string Margin(double margin) =>
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
