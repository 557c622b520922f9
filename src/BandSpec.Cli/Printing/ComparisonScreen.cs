using System.Text;
using BandSpec.Core.Requirements;
using BandSpec.Core.Revisions;
using BandSpec.Core.Specifying;

namespace BandSpec.Cli.Printing;

/// <summary>A comparison on a screen: what changed, which of it moved most, and what it did, for whom tighter or looser.</summary>
internal static class ComparisonScreen
{
    private const int WidestName = 46, WidestValue = 34;

    /// <summary>The screen.</summary>
    public static string Of(Comparison comparison, IReadOnlyList<Cause> causes, Ink ink)
    {
        StringBuilder screen = new();
        screen.Append('\n').Append($"{ink.Bold(NameOf(comparison.Old))} \u2192 {ink.Bold(NameOf(comparison.New))}\n\n");
        if (comparison.IsEmpty)
            return screen.Append(ink.Green("nothing differs")).Append('\n').ToString();
        AppendTable(screen, "Changed", comparison.Inputs.Select(Row), ink);
        AppendCauses(screen, causes, ink);
        foreach (IGrouping<FigureSubject, FigureChange> changes in comparison.Outcome.Where(c => c.Subject != FigureSubject.Verification).GroupBy(c => c.Subject))
            AppendTable(screen, HeadingOf(changes.Key), changes.Select(Row), ink);
        AppendTable(screen, "Acceptance limits", comparison.Points.Where(p => p.Shown.Old != p.Shown.New || p.ForCustomer != Bearing.Neutral).Select(RowOf), ink);
        screen.Append(comparison.LimitsDiffer ? ink.Yellow("limits differ") : ink.Green("no limit differs")).Append('\n');
        return screen.ToString();
    }

    private static string NameOf(Specification specification)
    {
        SpecificationIdentity identity = specification.Application.Requirement.Identity;
        return $"{identity.Number} revision {identity.Revision}";
    }

    private static string HeadingOf(FigureSubject subject) => subject switch
    {
        FigureSubject.DerivedLimits => "Derived limits",
        FigureSubject.Plan => "Compensation plan",
        _ => subject.ToString(),
    };

    private static void AppendCauses(StringBuilder screen, IReadOnlyList<Cause> causes, Ink ink)
    {
        if (causes.Count > 0)
            screen.Append(ink.Bold("Moved most")).Append('\n');
        foreach (Cause cause in causes)
        {
            string keys = string.Join(" + ", cause.Names.Select(n => $"{n.File.ToString().ToLowerInvariant()}: {n.Key}"));
            string did = cause switch
            {
                { Outcome: null } => "cannot be told alone: it contradicts the older inputs",
                { Largest: { } largest } => $"alone: {Name(largest)} {largest.Shown.Old} \u2192 {largest.Shown.New}",
                { Outcome: { } outcome } when outcome.Any(c => c.Old is null || c.New is null) => "alone: adds or takes away points, moves no limit",
                _ => "alone: moves no band, margin or acceptance limit",
            };
            screen.Append($"  {ink.Blue(keys)}  {did}\n");
        }

        screen.Append(causes.Count > 0 ? "\n" : "");
    }

    private static string Name(FigureChange change) => change.Place.Length == 0 ? change.Name : $"{change.Name} at {change.Place}";

    private static ChangeRow Row(FigureChange change)
    {
        string name = change.Subject <= FigureSubject.Station ? $"{change.Subject.ToString().ToLowerInvariant()}: {change.Name}" : Name(change);
        return new ChangeRow(name, change.Shown.Old, change.Shown.New, change.ForProduction, change.ForCustomer);
    }

    private static ChangeRow RowOf(PointChange point) =>
        new(point.Place, point.Shown.Old, point.Shown.New, point.ForProduction, point.ForCustomer);

    private static void AppendTable(StringBuilder screen, string heading, IEnumerable<ChangeRow> rows, Ink ink)
    {
        ChangeRow[] all = [.. rows];
        if (all.Length == 0)
            return;
        int name = Math.Min(WidestName, all.Max(r => CellWidth.Of(r.Name))), old = Math.Min(WidestValue, all.Max(r => CellWidth.Of(r.Old ?? "-")));
        int now = Math.Min(WidestValue, all.Max(r => CellWidth.Of(r.New ?? "-")));
        screen.Append(ink.Bold(heading)).Append('\n');
        foreach (ChangeRow row in all)
        {
            string line = $"  {Padded(row.Name, name)}  {Padded(row.Old ?? "-", old)} \u2192 {Padded(row.New ?? "-", now)}  {BearingOf(row, ink)}";
            screen.Append(line.TrimEnd()).Append('\n');
        }

        screen.Append('\n');
    }

    private static string BearingOf(ChangeRow row, Ink ink)
    {
        string[] told = [.. new[] { (Who: "production", Bearing: row.ForProduction), (Who: "customer", Bearing: row.ForCustomer) }
            .Where(side => side.Bearing != Bearing.Neutral)
            .Select(side => $"{side.Who} {(side.Bearing == Bearing.Tighter ? ink.Yellow("tighter") : ink.Green("looser"))}")];
        return string.Join(", ", told);
    }

    private static string Padded(string text, int width) => text + new string(' ', Math.Max(0, width - CellWidth.Of(text)));

    private sealed record ChangeRow(string Name, string? Old, string? New, Bearing ForProduction, Bearing ForCustomer);
}
