using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>What the chamber does during a step.</summary>
public enum ChamberAction
{
    /// <summary>The temperature changes at the chamber's heating or cooling rate.</summary>
    Ramp,

    /// <summary>The units settle.</summary>
    Soak,

    /// <summary>The units are read at one pressure point after the other.</summary>
    Read,
}

/// <summary>One step of a chamber run.</summary>
/// <param name="Action">What happens.</param>
/// <param name="Begin">Time since the start of the run.</param>
/// <param name="End">Time since the start of the run.</param>
/// <param name="From">Temperature at the beginning.</param>
/// <param name="To">Temperature at the end.</param>
public sealed record ChamberStep(ChamberAction Action, Duration Begin, Duration End, Temperature From, Temperature To);

/// <summary>A chamber run of a plan: from ambient to the coldest plan temperature, rising through the others, back to ambient.</summary>
/// <param name="Steps">The steps in order; steps that take no time are left out.</param>
/// <param name="Length">The whole time.</param>
/// <param name="CostPerUnit">Cost of the chamber time for one unit of the batch, in the currency of the station's hourly rate.</param>
public sealed record ChamberRun(IReadOnlyList<ChamberStep> Steps, Duration Length, double CostPerUnit)
{
    /// <summary>The run of a plan in a station's chamber.</summary>
    /// <param name="plan">The plan.</param>
    /// <param name="chamber">The chamber.</param>
    public static ChamberRun Of(CompensationPlan plan, Chamber chamber)
    {
        ArgumentNullException.ThrowIfNull(plan);
        ArgumentNullException.ThrowIfNull(chamber);
        List<ChamberStep> steps = [];
        Temperature now = chamber.Ambient;
        foreach (Temperature next in plan.Temperatures)
        {
            Add(steps, ChamberAction.Ramp, RampMinutes(now, next, chamber), now, next);
            Add(steps, ChamberAction.Soak, chamber.Soak.Minutes, next, next);
            Add(steps, ChamberAction.Read, plan.Points.Count(p => p.Temperature == next) * chamber.PressurePoint.Minutes, next, next);
            now = next;
        }

        Add(steps, ChamberAction.Ramp, RampMinutes(now, chamber.Ambient, chamber), now, chamber.Ambient);
        Duration length = steps.Count > 0 ? steps[^1].End : default;
        return new ChamberRun(steps, length, Cost(length, chamber));
    }

    /// <summary>
    /// Minutes of a run without laying out its steps: only the outermost temperatures, the number of soaks and the number of points count.
    /// </summary>
    internal static double Minutes(Temperature coldest, Temperature hottest, int soaks, int points, Chamber chamber) =>
        RampMinutes(chamber.Ambient, coldest, chamber) + RampMinutes(coldest, hottest, chamber) + RampMinutes(hottest, chamber.Ambient, chamber)
        + (soaks * chamber.Soak.Minutes) + (points * chamber.PressurePoint.Minutes);

    /// <summary>Cost of a run of some length for one unit of the batch.</summary>
    internal static double Cost(Duration length, Chamber chamber) => length.Hours * chamber.HourlyRate.Amount / chamber.Batch;

    private static double RampMinutes(Temperature from, Temperature to, Chamber chamber)
    {
        double change = (to - from).Kelvin;
        return change >= 0 ? change / chamber.HeatingPerMinute.Kelvin : -change / chamber.CoolingPerMinute.Kelvin;
    }

    private static void Add(List<ChamberStep> steps, ChamberAction action, double minutes, Temperature from, Temperature to)
    {
        if (minutes <= 0)
            return;
        Duration begin = steps.Count > 0 ? steps[^1].End : default;
        steps.Add(new ChamberStep(action, begin, begin + Duration.FromMinutes(minutes), from, to));
    }
}
