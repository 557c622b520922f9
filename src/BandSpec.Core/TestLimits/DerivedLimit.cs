using BandSpec.Core.Allocating;
using BandSpec.Core.Bands;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.TestLimits;

/// <summary>The limit of a figure that is derived from several readings of one unit.</summary>
/// <param name="Name">
/// <c>zero</c>, <c>span</c> and <c>non-linearity</c> (terminal-based) at the reference temperature, <c>thermal-zero-shift</c> and
/// <c>thermal-span-shift</c> of a region.
/// </param>
/// <param name="Region">Index of the region for the thermal shifts; otherwise <see langword="null"/>.</param>
/// <param name="Limit">The magnitude that may not be exceeded.</param>
public sealed record DerivedLimit(string Name, int? Region, PercentOfSpan Limit)
{
    /// <summary>The derived limits of a plan and its allocation.</summary>
    /// <param name="application">The application.</param>
    /// <param name="plan">The compensation plan.</param>
    /// <param name="allocation">How the allowed error was shared out.</param>
    public static IReadOnlyList<DerivedLimit> AllOf(Application application, CompensationPlan plan, Allocation allocation)
    {
        ArgumentNullException.ThrowIfNull(application);
        return new DerivedLimits(application, BandFormulas.Of(application, plan), Multipliers.Of(allocation)).All();
    }
}

/// <summary>
/// Limits of linear functionals <c>f</c> of what is left over: <c>|f(μ)| + √(Σ (m_i·3C s_f,i)² + Σ 2 m_i m_j (3C)² max(0, c_f,ij))</c>, the larger of
/// the two criteria, worst over the region. Nothing is added to the mean: hysteresis and ageing do not enter these figures.
/// </summary>
internal sealed class DerivedLimits(Application application, BandFormulas formulas, Multipliers multipliers)
{
    private readonly Temperature reference = application.Requirement.Temperature.Reference;

    public IReadOnlyList<DerivedLimit> All()
    {
        List<DerivedLimit> limits =
        [
            new("zero", null, AtReference(Zero(reference))),
            new("span", null, AtReference(Span(reference))),
            new("non-linearity", null, DesignNodes.Fractions.Select(x => AtReference(NonLinearity(x))).Max()),
        ];
        for (int r = 0; r < application.Requirement.AllowedError.Count; r++)
        {
            limits.Add(new DerivedLimit("thermal-zero-shift", r, WorstShift(r, Zero)));
            limits.Add(new DerivedLimit("thermal-span-shift", r, WorstShift(r, Span)));
        }

        return limits;
    }

    private Residue Zero(Temperature temperature) => formulas.ResidueAt(0, temperature);

    private Residue Span(Temperature temperature) =>
        Residue.Sum((1, formulas.ResidueAt(1, temperature)), (-1, formulas.ResidueAt(0, temperature)));

    /// <summary>Deviation at a pressure from the line through both terminals (terminal-based, IEC 61298-2).</summary>
    private Residue NonLinearity(double x) => Residue.Sum(
        (1, formulas.ResidueAt(x, reference)), (x - 1, formulas.ResidueAt(0, reference)), (-x, formulas.ResidueAt(1, reference)));

    private PercentOfSpan WorstShift(int region, Func<Temperature, Residue> figure) =>
        DesignNodes.TemperaturesOf(application.Requirement.AllowedError[region])
            .Select(t => LimitOf(Residue.Sum((1, figure(t)), (-1, figure(reference))), region))
            .Max();

    /// <summary>Where the reference temperature lies on an edge, the tighter of the two neighbours holds.</summary>
    private PercentOfSpan AtReference(Residue residue) =>
        application.Requirement.RegionsAt(reference).Select(r => LimitOf(residue, r)).Min();

    private PercentOfSpan LimitOf(Residue residue, int region)
    {
        ResidueShares shares = formulas.SharesOf(residue);
        CapabilityTarget target = application.Requirement.Capability;
        double sample = 3 * target.Sample * Math.Sqrt(AllocatedVariance.Of(shares, shares.Within, multipliers, region));
        double longRun = 3 * target.LongRun * Math.Sqrt(AllocatedVariance.Of(shares, shares.LongRun, multipliers, region));
        return PercentOfSpan.FromPercent(Math.Abs(shares.Mean) + Math.Max(sample, longRun));
    }
}
