using System.Globalization;
using System.Text;
using BandSpec.Core.Characterizing;

namespace BandSpec.Cli.Printing;

/// <summary>A characterization on one screen: the statistics with their intervals, what was left out, who is suspect.</summary>
internal static class CharacterizationScreen
{
    private static readonly CultureInfo Plain = CultureInfo.InvariantCulture;

    /// <summary>The screen.</summary>
    public static string Of(Characterization found, IReadOnlyList<string> written, Ink ink)
    {
        StringBuilder screen = new();
        string lots = found.Lots == 1 ? "1 lot" : $"{found.Lots} lots";
        screen.Append(Plain, $"\n{ink.Bold($"{found.Units} units of {lots}")}  {found.Readings} readings; {100 * found.Scope.Confidence:0.#} % intervals, %FS\n\n");
        screen.Append(ink.Faint($"{"",-20}{"mean",-30}{"spread within a lot",-30}spread of lots")).Append('\n');
        foreach (CoefficientEstimate c in found.Coefficients)
            screen.Append(Plain, $"{c.Name,-20}{Range(c.Units.Mean),-30}{Range(c.Units.Sigma),-30}{Range(c.LotSigma)}\n");
        Append(screen, "pressure-hysteresis", found.PressureHysteresis);
        Append(screen, "thermal-hysteresis", found.ThermalHysteresis);
        screen.Append(Plain, $"{"repeatability",-20}{"",-30}{Range(found.Repeatability)}\n");
        foreach (CorrelationEstimate c in found.Correlations)
            screen.Append(Plain, $"correlation of {c.Pair.First} and {c.Pair.Second}: {Range(c.Value)}\n");
        screen.Append(found.DegreeSteps.Count > 0
            ? "degrees in temperature chosen by Schwarz' criterion, units counted; `--degree` fixes them\n"
            : "degrees in temperature fixed beforehand\n");
        AppendNotes(screen, found, ink);
        foreach (string file in written)
            screen.Append(Plain, $"{ink.Bold("written")} {ink.Blue(file)}\n");
        return screen.ToString();
    }

    /// <summary>An estimate with its interval.</summary>
    public static string Range(Estimate e) => e switch
    {
        { Lower: 0, Upper: 0 } => "-",
        _ when e.Lower == e.Upper => $"{Figure(e.Value)} (assumed)",
        { Upper: double.PositiveInfinity } => $"{Figure(e.Value)} ({Figure(e.Lower)} and up)",
        _ => $"{Figure(e.Value)} ({Figure(e.Lower)} to {Figure(e.Upper)})",
    };

    /// <summary>Three significant digits.</summary>
    public static string Figure(double value) => Math.Abs(value) < 1e-7 ? "0" : value.ToString("G3", Plain);

    private static void Append(StringBuilder screen, string name, SpreadEstimate? estimate)
    {
        if (estimate is not null)
            screen.Append(Plain, $"{name,-20}{Range(estimate.Mean),-30}{Range(estimate.Sigma)}\n");
    }

    private static void AppendNotes(StringBuilder screen, Characterization found, Ink ink)
    {
        screen.Append('\n');
        foreach (LeftOutTerm term in LeftOutTerm.Grouped(found.LeftOut))
            screen.Append(Plain, $"{ink.Yellow("left out")} {term.Term}: {term.Reason}\n");
        string kept = found.Scope.KeepSuspects ? "suspect, kept" : "suspect, left out";
        foreach (SuspectUnit unit in found.SuspectUnits)
            screen.Append(Plain, $"{ink.Yellow(kept)} unit {unit.Unit}{(unit.Lot.Length > 0 ? $" of lot {unit.Lot}" : "")}: {unit.Term} off by {Figure(unit.Multiple)} standard deviations; ")
                .Append(Plain, $"its spread would be {Figure(unit.SpreadWith)} with it, {Figure(unit.SpreadWithout)} without\n");
        foreach (SuspectReading slip in found.SuspectReadings)
            screen.Append(Plain, $"{ink.Yellow(kept)} line {slip.Reading.Line}, unit {slip.Reading.Unit} at {slip.Reading.Temperature}: ")
                .Append(Plain, $"{Figure(slip.Residual)} %FS from what its other readings say, {Figure(slip.Multiple)} standard deviations; ")
                .Append(Plain, $"it would move the unit's curve by {Figure(slip.Shift)} %FS\n");
        screen.Append('\n');
    }
}
