using System.Globalization;
using System.Text;
using BandSpec.Core.Characterizing;

namespace BandSpec.Cli.Printing;

/// <summary>Ageing statistics on one screen.</summary>
internal static class AgeingScreen
{
    private static readonly CultureInfo Plain = CultureInfo.InvariantCulture;

    /// <summary>The screen.</summary>
    public static string Of(AgeingStatistics found, IReadOnlyList<string> written, Ink ink)
    {
        StringBuilder screen = new();
        screen.Append(Plain, $"\n{ink.Bold($"{found.Units} units")}  {found.Readings} readings; drift after {found.Scope.TestDuration} at {found.Scope.TestTemperature}; ")
            .Append(Plain, $"{100 * found.Scope.Confidence:0.#} % intervals\n\n");
        screen.Append(ink.Faint($"{"",-20}{"mean",-34}spread")).Append('\n');
        Append(screen, "zero, %FS", found.Zero);
        Append(screen, "span, %FS", found.Span);
        screen.Append(Plain, $"{"activation energy",-20}{CharacterizationScreen.Range(found.ActivationEnergy)} eV\n");
        screen.Append(Plain, $"{"time exponent",-20}{CharacterizationScreen.Range(found.TimeExponent)}\n");
        if (found.Region.Count > 0)
            screen.Append(Plain, $"{"both jointly",-20}{CharacterizationScreen.Figure(found.Region.Min(p => p.ActivationEnergy))} to {CharacterizationScreen.Figure(found.Region.Max(p => p.ActivationEnergy))} eV, ")
                .Append(Plain, $"exponent {CharacterizationScreen.Figure(found.Region.Min(p => p.TimeExponent))} to {CharacterizationScreen.Figure(found.Region.Max(p => p.TimeExponent))}\n");
        foreach (LeftOutTerm term in found.LeftOut)
            screen.Append(Plain, $"{ink.Yellow("assumed")} {term.Term}: {term.Reason}\n");
        if (found is { Scope.PlannedTest: { } planned, ErrorsWithPlannedTest: { } then })
            AppendPlanned(screen, planned, found.Errors, then, ink);
        screen.Append('\n');
        foreach (string file in written)
            screen.Append(Plain, $"{ink.Bold("written")} {ink.Blue(file)}\n");
        return screen.ToString();
    }

    private static void Append(StringBuilder screen, string name, SpreadEstimate estimate) =>
        screen.Append(Plain, $"{name,-20}{CharacterizationScreen.Range(estimate.Mean),-34}{CharacterizationScreen.Range(estimate.Sigma)}\n");

    private static void AppendPlanned(StringBuilder screen, PlannedAgeingTest planned, DriftErrors now, DriftErrors then, Ink ink)
    {
        screen.Append(Plain, $"\n{ink.Bold("planned test")} {planned.Units} units at {planned.Storage}, read after {string.Join(", ", planned.Times)}: standard errors\n");
        foreach ((string name, double before, double after) in new[]
        {
            ("activation energy", now.ActivationEnergy, then.ActivationEnergy), ("time exponent", now.TimeExponent, then.TimeExponent),
            ("mean drift of zero", now.ZeroMean, then.ZeroMean), ("mean drift of span", now.SpanMean, then.SpanMean),
        })
            screen.Append(Plain, $"{name,-20}{CharacterizationScreen.Figure(before),10} now {CharacterizationScreen.Figure(after),10} then\n");
    }
}
