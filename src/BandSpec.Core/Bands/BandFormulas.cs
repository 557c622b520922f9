using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Bands;

/// <summary>
/// The band at any pressure and temperature: margin, capability and maximum, each defined here once. With a correction it is the band of
/// its plan; without one, of a perfect correction.
/// </summary>
internal sealed class BandFormulas
{
    private readonly Application application;
    private readonly SteadyTerms steady;
    private readonly Correction? correction;

    public BandFormulas(Application application, Correction? correction)
    {
        (this.application, this.correction) = (application, correction);
        steady = new SteadyTerms(application);
    }

    /// <summary>The band of a plan.</summary>
    public static BandFormulas Of(Application application, CompensationPlan plan) =>
        new(application, new Correction(new RawError(application.Platform), application.Platform, application.Station, plan));

    /// <summary>Mean drift at the end of life at a pressure.</summary>
    public double DriftMean(double x) => steady.DriftMean(x);

    /// <summary>The terms that no plan can change, at a pressure.</summary>
    public IEnumerable<SteadyTerm> SteadyAt(double x) => steady.At(x);

    /// <summary>The correction's residue at a place; not to be asked of a perfect correction.</summary>
    public Residue ResidueAt(double x, Temperature temperature) => correction!.At(x, temperature);

    /// <summary>The band at a place, held against one region's allowance.</summary>
    public BandNode At(double x, Temperature temperature, int region)
    {
        AllowedErrorRegion allowance = application.Requirement.AllowedError[region];
        double allowed = allowance.At(temperature, application.Requirement.Pressure.MagnitudeAt(x));
        ResidueShares residue = SharesAt(x, temperature);
        List<SteadyTerm> fixedTerms = [.. steady.At(x)];
        double added = AddedAt(x, residue.Mean, fixedTerms);
        double others = fixedTerms.Sum(t => t.Sigma * t.Sigma);
        return Judge(new NodeSums(x, temperature, region, allowed, added, residue, fixedTerms,
            Math.Sqrt(residue.VarianceWithin + others), Math.Sqrt(residue.VarianceLongRun + others)));
    }

    /// <summary>What compensation leaves at a place, term by term.</summary>
    public ResidueShares SharesAt(double x, Temperature temperature) => correction is null
        ? ResidueShares.Perfect(application.Station, x)
        : SharesOf(correction.At(x, temperature));

    /// <summary>The shares of a residue, or of a sum of residues at several places.</summary>
    public ResidueShares SharesOf(Residue residue) => ResidueShares.Of(correction!, residue, application.Station);

    /// <summary><c>M = max(|μ|, |μ + drift mean|) + H̄/2·η + Θ̄ + further bounds</c>.</summary>
    private double AddedAt(double x, double mean, List<SteadyTerm> terms) =>
        Math.Max(Math.Abs(mean), Math.Abs(mean + steady.DriftMean(x)))
        + terms.Where(t => t.Term != ErrorTerm.Ageing).Sum(t => t.Added);

    private BandNode Judge(NodeSums sums)
    {
        CapabilityTarget target = application.Requirement.Capability;
        double design = sums.Allowed / application.Requirement.SafetyFactor;
        double sample = Cpk(design - sums.Added, sums.SigmaSample), longRun = Cpk(design - sums.Added, sums.SigmaLongRun);
        double reach = Math.Max(3 * target.Sample * sums.SigmaSample, 3 * target.LongRun * sums.SigmaLongRun);
        return new BandNode
        {
            PressureFraction = sums.X,
            Temperature = sums.Temperature,
            Region = sums.Region,
            Allowed = PercentOfSpan.FromPercent(sums.Allowed),
            Design = PercentOfSpan.FromPercent(design),
            Mean = PercentOfSpan.FromPercent(sums.Residue.Mean),
            Added = PercentOfSpan.FromPercent(sums.Added),
            SigmaSample = PercentOfSpan.FromPercent(sums.SigmaSample),
            SigmaLongRun = PercentOfSpan.FromPercent(sums.SigmaLongRun),
            Maximum = PercentOfSpan.FromPercent(sums.Added + reach),
            Typical = PercentOfSpan.FromPercent(sums.Added + (3 * sums.SigmaLongRun)),
            CpkSample = sample,
            CpkLongRun = longRun,
            Margin = Math.Min(sample / target.Sample, longRun / target.LongRun),
            Terms = [.. sums.Residue.Terms(), .. sums.Steady.Select(t => TermShareOf(t))],
        };
    }

    /// <summary><c>room/(3σ)</c>; without scatter infinite when there is room, minus infinite when there is not.</summary>
    private static double Cpk(double room, double sigma) =>
        sigma > 0 ? room / (3 * sigma) : room >= 0 ? double.PositiveInfinity : double.NegativeInfinity;

    private static TermShare TermShareOf(SteadyTerm t)
    {
        var sigma = PercentOfSpan.FromPercent(t.Sigma);
        return new TermShare(t.Term, PercentOfSpan.FromPercent(t.Added), sigma, sigma);
    }

    /// <summary>What a node is judged by, in %FS.</summary>
    private sealed record NodeSums(
        double X, Temperature Temperature, int Region, double Allowed, double Added, ResidueShares Residue, List<SteadyTerm> Steady,
        double SigmaSample, double SigmaLongRun);
}
