using System.Text;
using BandSpec.Cli.Drafting;

namespace BandSpec.Cli.Printing;

/// <summary>
/// What became of several drafts: one line each, and how many of each kind there are. Lines are as long as file names make them, since a name
/// that was cut cannot be copied.
/// </summary>
internal static class DraftSummary
{
    /// <summary>The screen.</summary>
    public static string Of(IReadOnlyList<Draft> drafts, Ink ink)
    {
        int width = drafts.Max(draft => CellWidth.Of(draft.File));
        StringBuilder screen = new("\n");
        foreach (Draft draft in drafts)
            screen.Append($"{draft.File}{new string(' ', width - CellWidth.Of(draft.File))}  {Outcome(draft, ink)}\n");
        string[] counts =
        [
            .. from state in Enum.GetValues<DraftState>()
               let count = drafts.Count(draft => draft.State == state)
               where count > 0
               select $"{count} {Word(state)}",
        ];
        return screen.Append($"\n{ink.Bold(string.Join(", ", counts))}\n").ToString();
    }

    private static string Outcome(Draft draft, Ink ink) => draft switch
    {
        { Verdict: { } verdict, Package: { } package } =>
            $"{(verdict.Feasible ? ink.Green("FEASIBLE    ") : ink.Red("NOT FEASIBLE"))}  margin {DraftScreen.Margin(verdict.Margin)}  {ink.Blue(package.Folder)}"
            + (draft.State == DraftState.UpToDate ? "  up to date" : "") + (verdict.Proven ? "" : $"  {ink.Yellow("not proven")}") + (draft.Release is null ? "" : $"  {ink.Green("RELEASED")}"),
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
}
