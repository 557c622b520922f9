using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;

namespace BandSpec.Core.Revisions;

/// <summary>The compensation plan as figures.</summary>
internal sealed class PlanFigures(Specification specification)
{
    /// <summary>All figures of the plan.</summary>
    public IReadOnlyList<Figure> All()
    {
        FigureList list = new(FigureSubject.Plan);
        CompensationPlan plan = specification.Choice.Plan;
        ChamberRun run = specification.Choice.Run;
        list.Text("temperatures", string.Join(", ", plan.Temperatures));
        list.Number("zero degree", plan.ZeroDegree, "", Leeway.None);
        list.Number("span degree", plan.SpanDegree, "", Leeway.None);
        list.Number("reading points", plan.Points.Count, "", Leeway.LessForProduction);
        list.Number("chamber time", run.Length.Minutes, "min", Leeway.LessForProduction);
        list.Number("cost per unit", run.CostPerUnit, specification.Application.Station.Chamber.HourlyRate.Currency, Leeway.LessForProduction);
        list.Text("proven", specification.Choice.Proven ? "yes" : "no");
        return list.All;
    }
}
