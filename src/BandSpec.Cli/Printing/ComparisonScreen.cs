using System.Text;
using BandSpec.Core.Revisions;
using BandSpec.Documents.Printing;

namespace BandSpec.Cli.Printing;

/// <summary>A comparison on a screen: what changed, which of it moved most, and what it did, for whom tighter or looser.</summary>
internal static class ComparisonScreen
{
    private const int WidestName = 46, WidestValue = 38;

    /// <summary>The screen.</summary>
    public static string Of(Comparison comparison, IReadOnlyList<Cause> causes, IReadOnlyList<string> written, Ink ink)
    {
        StringBuilder screen = new();
        screen.Append('\n').Append($"{ink.Bold(ComparisonWords.NameOf(comparison.Old))} \u2192 {ink.Bold(ComparisonWords.NameOf(comparison.New))}\n\n");
        if (comparison.IsEmpty)
            return screen.Append(ink.Green(ComparisonWords.AnswerOf(comparison))).Append('\n').Append(Written(written, ink)).ToString();
        AppendTable(screen, "Changed", comparison.Inputs.Select(Row), ink);
        AppendCauses(screen, causes, ink);
        foreach (IGrouping<FigureSubject, FigureChange> changes in ComparisonWords.OutcomeOf(comparison))
            AppendTable(screen, ComparisonWords.HeadingOf(changes.Key), changes.Select(Row), ink);
        AppendTable(screen, ComparisonWords.HeadingOf(FigureSubject.Verification), ComparisonWords.PointsOf(comparison).Select(RowOf), ink);
        string answer = ComparisonWords.AnswerOf(comparison);
        screen.Append(comparison.LimitsDiffer ? ink.Yellow(answer) : ink.Green(answer)).Append('\n');
        return screen.Append(Written(written, ink)).ToString();
    }

    private static string Written(IReadOnlyList<string> files, Ink ink) => string.Concat(files.Select(file => $"{ink.Blue(file)} is written\n"));

    private static void AppendCauses(StringBuilder screen, IReadOnlyList<Cause> causes, Ink ink)
    {
        if (causes.Count > 0)
            screen.Append(ink.Bold("Moved most")).Append('\n');
        foreach (Cause cause in causes)
        {
            string did = cause.Largest is { } largest
                ? $"alone: {ComparisonWords.NameOf(largest)} {largest.Shown.Old} \u2192 {largest.Shown.New}" : ComparisonWords.EffectOf(cause)!;
            screen.Append($"  {ink.Blue(ComparisonWords.NameOf(cause))}  {did}\n");
        }

        screen.Append(causes.Count > 0 ? "\n" : "");
    }

    private static ChangeRow Row(FigureChange change)
    {
        string name = change.Subject <= FigureSubject.Station ? $"{change.Subject.ToString().ToLowerInvariant()}: {change.Name}" : ComparisonWords.NameOf(change);
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
        return told.Length == 0 ? "neutral" : string.Join(", ", told);
    }

    private static string Padded(string text, int width) => text + new string(' ', Math.Max(0, width - CellWidth.Of(text)));

    private sealed record ChangeRow(string Name, string? Old, string? New, Bearing ForProduction, Bearing ForCustomer);
}
