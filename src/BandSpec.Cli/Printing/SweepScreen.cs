using System.Globalization;
using System.Text;
using BandSpec.Cli.Trying;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Printing;

/// <summary>What a sweep led to: a line a value, and the margins as bars.</summary>
internal static class SweepScreen
{
    private static readonly CultureInfo Plain = CultureInfo.InvariantCulture;

    /// <summary>The table, and where the chart is when there is one.</summary>
    public static string Of(Sweep sweep, IReadOnlyList<SweepStep> steps, string? chart, Ink ink)
    {
        StringBuilder screen = new("\n");
        int width = Math.Max(sweep.Path.Length, steps.Count > 0 ? steps.Max(step => step.Value.Length) : 0) + 2;
        screen.Append(Plain, $"{ink.Bold(sweep.Path.PadRight(width))}{ink.Faint("margin     cost     yield     good rejected   chance of leaving  if accepted")}\n");
        double longest = steps.Where(step => double.IsFinite(step.Margin)).Select(step => step.Margin).Append(1).Max();
        foreach (SweepStep step in steps)
            screen.Append(Plain, $"{step.Value.PadRight(width)}{Line(step)}{Bar(step.Margin, longest, ink)}\n");
        screen.Append("\nEvery value was specified and tried anew with the same chance, so that the differences are not noise.\n");
        return (chart is null ? screen : screen.Append(Plain, $"Chart     {chart}\n")).ToString();
    }

    /// <summary>The table for programs.</summary>
    public static string Json(Sweep sweep, IReadOnlyList<SweepStep> steps) => Encoding.UTF8.GetString(JsonFile.Of(json =>
    {
        json.WriteString("format", "bandspec/sweep/1");
        json.WriteString("path", sweep.Path);
        json.Objects("steps", steps, (item, step) =>
        {
            item.WriteString("value", step.Value);
            item.WriteNumber("findings", step.Findings);
            if (step is not { Report: { } report, Leaving: { } leaving })
                return;
            item.Figure("margin", step.Margin);
            item.Figure("cost-per-unit", step.CostPerUnit);
            item.Figure("yield", step.Yield!.Value);
            item.Figure("good-rejected", report.GoodRejected.Value);
            item.Figure("accepted-leaving", report.AcceptedLeaving.Value);
            item.Figure("leaving-probability", leaving.AnyUnit.Value);
            item.Figure("leaving-probability-accepted", leaving.AcceptedUnit.Value);
        });
    }).Span);

    private static string Line(SweepStep step) => step is not { Report: { } report, Leaving: { } leaving }
        ? step.Findings > 0 ? $"{step.Findings} finding{(step.Findings == 1 ? "" : "s")}; `bandspec check` shows them" : "stopped"
        : string.Create(
            Plain,
            $"{step.Margin,6:0.000}{step.CostPerUnit,9:0.00}{100 * step.Yield,10:0.000} %{100 * report.GoodRejected.Value,14:0.000} %{LotFigures.Probability(leaving.AnyUnit.Value),19}{LotFigures.Probability(leaving.AcceptedUnit.Value),14}  ");

    private static string Bar(double margin, double longest, Ink ink)
    {
        const int Width = 24;
        if (!double.IsFinite(margin))
            return "";
        string bar = new('\u2588', Math.Max(1, (int)Math.Round(Width * Math.Max(0, margin) / longest)));
        return margin >= 1 ? ink.Green(bar) : ink.Red(bar);
    }
}
