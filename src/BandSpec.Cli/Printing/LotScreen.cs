using System.Globalization;
using System.Text;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Core.VirtualLots;

namespace BandSpec.Cli.Printing;

/// <summary>What virtual lots showed, for a person.</summary>
internal static class LotScreen
{
    private static readonly CultureInfo Plain = CultureInfo.InvariantCulture;

    /// <summary>The whole screen.</summary>
    /// <param name="specification">The specification that was tried.</param>
    /// <param name="report">What the lots showed.</param>
    /// <param name="leaving">The probability of leaving anywhere; null when it was not asked for.</param>
    /// <param name="ink">Colours.</param>
    public static string Of(Specification specification, LotReport report, LeavingProbability? leaving, Ink ink)
    {
        SpecificationIdentity identity = specification.Application.Requirement.Identity;
        StringBuilder screen = new("\n");
        screen.Append(Plain, $"{ink.Bold($"{identity.Number} {identity.Revision}")}  {identity.Title}\n");
        string made = $"{report.Units:N0} units in {report.Lots:N0} lots of {report.LotSize}";
        screen.Append(Plain, $"{made}{(report.IsComplete ? "" : ink.Yellow("  not all that were ordered"))}\n\n");
        AppendSteps(screen, report, ink);
        AppendLeaving(screen, specification, report, ink);
        if (leaving is not null)
            AppendProbability(screen, leaving, ink);
        AppendHistogram(screen, report.Histogram, ink);
        AppendTwins(screen, report.Twins, ink);
        return screen.ToString();
    }

    private static void AppendSteps(StringBuilder screen, LotReport report, Ink ink)
    {
        screen.Append(Plain, $"{ink.Bold("Yield"),-9} {ink.Faint("step by step, share of all units made, 95 % interval")}\n");
        int width = report.Steps.Max(step => step.Name.Length) + 2;
        foreach (LotStep step in report.Steps)
            screen.Append(Plain, $"          {step.Name.PadRight(width)}{LotFigures.Share(step.Through)}\n");
        screen.Append(Plain, $"          {"good units that were rejected".PadRight(width)}{LotFigures.Share(report.GoodRejected)}\n\n");
    }

    private static void AppendLeaving(StringBuilder screen, Specification specification, LotReport report, Ink ink)
    {
        screen.Append(Plain, $"{ink.Bold("Leaving")}   {ink.Faint("accepted units that leave the allowed error somewhere, new or at the end of life")}\n");
        screen.Append(Plain, $"          {"anywhere",-20}{LotFigures.Counted(report.AcceptedLeaving)}\n");
        for (int i = 0; i < report.AcceptedLeavingByRegion.Count; i++)
        {
            AllowedErrorRegion region = specification.Application.Requirement.AllowedError[i];
            string range = string.Create(Plain, $"{region.From.Celsius} to {region.To.Celsius} °C");
            screen.Append(Plain, $"          {range,-20}{LotFigures.Counted(report.AcceptedLeavingByRegion[i])}\n");
        }
        screen.Append(Plain, $"          {"of the time in use",-20}{LotFigures.Counted(report.UseOutside)}\n\n");
    }

    private static void AppendProbability(StringBuilder screen, LeavingProbability leaving, Ink ink)
    {
        screen.Append(Plain, $"{ink.Bold("Chance")}    {ink.Faint("that a unit leaves the allowed error anywhere, by importance sampling, 95 % interval")}\n");
        screen.Append(Plain, $"          {"any unit",-20}{LotFigures.Sampled(leaving.AnyUnit)}\n");
        screen.Append(Plain, $"          {"an accepted unit",-20}{LotFigures.Sampled(leaving.AcceptedUnit)}\n");
        screen.Append(Plain, $"          {"at one place at most",-20} {LotFigures.Probability(leaving.LargestPointwise)}\n");
        screen.Append("          The pointwise figure asks about one place, the others about every place of the map at once.\n\n");
    }

    private static void AppendHistogram(StringBuilder screen, ErrorHistogram histogram, Ink ink)
    {
        screen.Append(Plain, $"{ink.Bold("Errors")}    {ink.Faint("of accepted units over the temperature profile, %FS, weighted by dwell")}\n");
        long all = histogram.Bins.Sum() + histogram.Below + histogram.Above;
        long most = Math.Max(1, histogram.Bins.Max());
        double width = 2 * histogram.End / histogram.Bins.Count;
        for (int i = 0; i < histogram.Bins.Count; i++)
        {
            if (histogram.Bins[i] == 0)
                continue;
            string bar = new('\u2588', (int)Math.Ceiling(40.0 * histogram.Bins[i] / most));
            double middle = -histogram.End + ((i + 0.5) * width);
            screen.Append(Plain, $"          {middle,7:0.000}  {ink.Blue(bar)} {100.0 * histogram.Bins[i] / Math.Max(1, all):0.####} %\n");
        }
        if (histogram.Below + histogram.Above > 0)
            screen.Append(Plain, $"          beyond ±{histogram.End:0.###}: {histogram.Below:N0} below, {histogram.Above:N0} above\n");
        screen.Append('\n');
    }

    private static void AppendTwins(StringBuilder screen, IReadOnlyList<Twin> twins, Ink ink)
    {
        const double Far = 4;
        int far = twins.Count(twin => Math.Abs(twin.Difference) > Far);
        screen.Append(Plain, $"{ink.Bold("Witness")}   {twins.Count:N0} figures of the closed form beside their simulated twins: ")
            .Append(Plain, $"{(far == 0 ? ink.Green("none") : ink.Yellow(far.ToString(Plain)))} more than {Far} standard errors apart")
            .Append(Plain, $" (by chance {twins.Count * 6.334e-5:0.0} if they were independent). The furthest:\n");
        foreach (Twin twin in twins.OrderByDescending(twin => Math.Abs(twin.Difference)).Take(5))
            screen.Append(Plain, $"          {twin.Figure,-20}{twin.ClosedForm,12:G5}{twin.Simulated,12:G5}  {twin.Difference,6:+0.0;-0.0;0.0}  {twin.Place}\n");
        screen.Append('\n');
    }
}
