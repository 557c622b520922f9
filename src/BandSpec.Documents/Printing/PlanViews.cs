using System.Globalization;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;

namespace BandSpec.Documents.Printing;

/// <summary>The compensation plan as it is shown.</summary>
internal sealed class PlanViews(Specification specification, string sign)
{
    private readonly Requirement _requirement = specification.Application.Requirement;

    public PlanView Plan
    {
        get
        {
            var (choice, chamber) = (specification.Choice, specification.Application.Station.Chamber);
            var objective = _requirement.Compensation.Objective switch
            {
                PlanObjective.LeastCost => "least-cost", PlanObjective.MostMargin => "most-margin", _ => "least-error"
            };
            return new PlanView(
                [.. choice.Plan.Temperatures.Select(Stay)], choice.Plan.Points.Count,
                Whole(choice.Plan.ZeroDegree), Whole(choice.Plan.SpanDegree),
                Rounded.Nearest(choice.Run.Length.Minutes, 0).Shown(sign), Rounded.Nearest(choice.Run.CostPerUnit, 2).Shown(sign),
                chamber.HourlyRate.Currency,
                Whole(chamber.Batch), Whole(choice.PlansConsidered), specification.Optimum.Proven, objective);
        }
    }

    public OptimumView? Optimum => _requirement.Compensation.Pinned is null
        ? null
        : new OptimumView(
            string.Join("; ", specification.Optimum.Plan.Temperatures.Select(t => Rounded.Given(t.Celsius).Shown(sign))),
            Rounded.Down(specification.Optimum.ContinuousMargin, 0.001).Shown(sign), Rounded.Nearest(specification.Optimum.Run.CostPerUnit, 2).Shown(sign),
            specification.Optimum.Plan.IsLike(specification.Choice.Plan), specification.Optimum.HoldsEverywhere);

    private StayView Stay(Temperature temperature)
    {
        var points = specification.Choice.Plan.Points.Where(p => p.Temperature == temperature).ToList();
        var pressures = points.Select(p => Rounded.Given(Math.Round(_requirement.Pressure.At(p.PressureFraction).Value, 6)).Shown(sign));
        return new StayView(Rounded.Given(temperature.Celsius).Shown(sign), string.Join("; ", pressures), points.Count);
    }

    private string Whole(long value) => new Rounded(value.ToString(CultureInfo.InvariantCulture)).Shown(sign);
}
