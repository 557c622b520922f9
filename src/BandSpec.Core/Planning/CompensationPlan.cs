using BandSpec.Core.Quantities;

namespace BandSpec.Core.Planning;

/// <summary>Where a unit is read for compensation, and the degrees of the correction fitted to those readings.</summary>
/// <param name="Temperatures">Plan temperatures, rising, at least two.</param>
/// <param name="ZeroDegree">Degree in temperature of the zero correction, <c>d_z</c>.</param>
/// <param name="SpanDegree">Degree in temperature of the span correction, <c>d_s</c>.</param>
/// <param name="Points">Every reading point, in the order of the chamber run: coldest first, pressures rising.</param>
public sealed record CompensationPlan(
    IReadOnlyList<Temperature> Temperatures, int ZeroDegree, int SpanDegree, IReadOnlyList<PlanPoint> Points);

/// <summary>One reading point of a plan.</summary>
/// <param name="Temperature">Chamber temperature.</param>
/// <param name="PressureFraction">Applied pressure as a fraction of the span.</param>
public sealed record PlanPoint(Temperature Temperature, double PressureFraction);

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

/// <summary>A chamber run of a plan, from ambient back to ambient.</summary>
/// <param name="Steps">The steps in order; steps that take no time are left out.</param>
/// <param name="Length">The whole time.</param>
/// <param name="CostPerUnit">Cost of the chamber time for one unit of the batch, in the currency of the station's hourly rate.</param>
public sealed record ChamberRun(IReadOnlyList<ChamberStep> Steps, Duration Length, double CostPerUnit);

/// <summary>The plan that the search settled on, and how sure it is.</summary>
/// <param name="Plan">The best plan; the one of largest margin when none is feasible.</param>
/// <param name="Run">Its chamber run.</param>
/// <param name="PlansConsidered">How many candidate plans the answer holds against.</param>
/// <param name="Proven">Whether the answer is proven over all candidates.</param>
public sealed record PlanChoice(CompensationPlan Plan, ChamberRun Run, long PlansConsidered, bool Proven);
