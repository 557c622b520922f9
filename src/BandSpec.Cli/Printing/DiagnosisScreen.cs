using System.Globalization;
using System.Text;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using Spectre.Console;

namespace BandSpec.Cli.Printing;

/// <summary>Why the answer is what it is, on the screen: what fills the band, what would make a plan fit, what an improvement buys.</summary>
internal static class DiagnosisScreen
{
    private const int MostParts = 4, MostGains = 12;
    private static readonly CultureInfo Plain = CultureInfo.InvariantCulture;

    /// <summary>The part of a draft's screen; empty when nothing was worked out.</summary>
    public static string Of(Specification specification, Ink ink)
    {
        if (specification.Diagnosis is not { } found)
            return "";
        StringBuilder screen = new();
        screen.Append(Plain, $"{ink.Bold("Held by")}   {Parts(found.BindingTerms)} of the design band with the plan;\n");
        screen.Append(Plain, $"          {Parts(found.FloorTerms)} with a perfect correction\n\n");
        if (found.Changes.Count > 0)
            screen.Append(Changes(specification.Application.Requirement, found, ink));
        if (specification.Gains is { Count: > 0 } gains)
            screen.Append(Gains(gains, ink));
        return screen.ToString();
    }

    private static string Parts(IReadOnlyList<TermPart> parts) => string.Join(
        ", ", parts.Take(MostParts).Select(part => string.Create(Plain, $"{part.Term.Key.Replace('-', ' ')} {100 * part.Share:0.#} %")));

    private static string Changes(Requirement requirement, Diagnosis found, Ink ink)
    {
        Table table = new Table().SimpleBorder().AddColumns("Single change", "now", "needed", "");
        table.Columns[1].RightAligned();
        table.Columns[2].RightAligned();
        foreach (SingleChange change in found.Changes.OrderByDescending(change => change.Suffices))
            table.AddRow(
                new Text(Name(change, requirement)), Tables.Figure(Value(change, change.Before)),
                Tables.Figure(change.After is { } after ? Value(change, after) : "\u2013", change.Suffices ? Color.Green : null),
                new Text(Remark(change)));
        string said = found.Changes.Any(change => change.Suffices)
            ? "each was verified by solving again; with one step less no plan fits" : "each was verified by solving again; several together are needed";
        return $"{Tables.Of(table, ink)}{ink.Faint($"  {said}{(found.IsComplete ? "" : "; the search was stopped, there may be more")}")}\n\n";
    }

    private static string Remark(SingleChange change) => change switch
    {
        { Plan: { } plan } => $"fits with {PlanWords.Temperatures(plan)} °C",
        _ when change.Before == change.Furthest => "cannot go further",
        _ => $"alone never, looked at to {Value(change, change.Furthest)}",
    };

    private static string Name(SingleChange change, Requirement requirement) => change.Key switch
    {
        "allowed-error" => string.Create(
            Plain, $"allowed error, {requirement.AllowedError[change.Region!.Value].From.Celsius} to {requirement.AllowedError[change.Region.Value].To.Celsius} °C"),
        "operating-limit-lower" => "lowest operating temperature",
        "operating-limit-upper" => "highest operating temperature",
        "temperatures" => "most plan temperatures",
        "pressure-standard" => "pressure standard's uncertainty",
        "ageing" => "drift by ageing",
        _ => change.Key.Replace('-', ' '),
    };

    /// <summary>A figure with its unit; what is scaled as a whole in percent of what it is.</summary>
    private static string Value(SingleChange change, double value) => change.Key is "pressure-standard" or "ageing"
        ? string.Create(Plain, $"{100 * value:0.##} %")
        : string.Create(Plain, $"{value:0.####} {change.Unit}").TrimEnd();

    private static string Gains(IReadOnlyList<MarginGain> gains, Ink ink)
    {
        Table table = new Table().SimpleBorder().AddColumns("Input, one step upwards", "step", "margin");
        table.Columns[1].RightAligned();
        table.Columns[2].RightAligned();
        foreach (MarginGain gain in gains.OrderByDescending(gain => Math.Abs(gain.Gain)).Take(MostGains))
            table.AddRow(
                new Text(gain.Key), Tables.Figure(string.Create(Plain, $"{gain.Step:0.###} {gain.Unit}").TrimEnd()),
                Tables.Figure(gain.Gain.ToString("+0.0000;-0.0000", Plain)));
        return $"{Tables.Of(table, ink)}\n";
    }
}
