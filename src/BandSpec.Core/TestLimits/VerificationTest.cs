using BandSpec.Core.Allocating;
using BandSpec.Core.Bands;
using BandSpec.Core.Numerics;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.TestLimits;

/// <summary>The verification test of a plan: where a unit is tested, and what it may show there.</summary>
internal sealed class VerificationTest
{
    private readonly Application application;
    private readonly CompensationPlan plan;
    private readonly BandMap bands;
    private readonly BandFormulas formulas;
    private readonly Multipliers multipliers;
    private readonly VerificationRules rules;

    public VerificationTest(Application application, CompensationPlan plan, BandMap bands, Multipliers multipliers, VerificationRules rules)
    {
        (this.application, this.plan, this.bands, this.multipliers, this.rules) = (application, plan, bands, multipliers, rules);
        formulas = BandFormulas.Of(application, plan);
    }

    /// <summary>All points in the order of the test: coldest first, at each temperature rising, then falling.</summary>
    public IReadOnlyList<VerificationPoint> Points()
    {
        TestPlace[] places = [.. Places()];
        double[]? widest = rules.Promise == Promise.EveryUnit
            ? EveryUnitLimits.Of(new UnitLaw(application, plan, places, bands.Nodes), bands.Nodes, application.Requirement.Capability.LongRun)
            : null;
        return [.. places.Select((place, v) => PointAt($"V{v + 1:00}", place, widest?[v] ?? double.PositiveInfinity))];
    }

    private IEnumerable<TestPlace> Places()
    {
        Temperature[] temperatures = [.. Temperatures()];
        Temperature nearest = CompensationPlan.NearestTo(application.Requirement.Temperature.Reference, temperatures);
        foreach (Temperature t in temperatures)
        {
            IReadOnlyList<double> fractions = application.Station.TestPoints.At(t == nearest);
            foreach (double x in fractions)
                yield return new(t, x, PressureDirection.Rising);
            foreach (double x in fractions.Reverse().Skip(1))
                yield return new(t, x, PressureDirection.Falling);
        }
    }

    /// <summary>
    /// As the requirement says; otherwise the reference temperature, both ends of the range and the temperature of least margin, in whole
    /// degrees as a chamber is set.
    /// </summary>
    private IEnumerable<Temperature> Temperatures()
    {
        OperatingTemperature range = application.Requirement.Temperature;
        return (rules.Temperatures ?? [range.Lower, range.Reference, range.Upper, WholeDegrees(bands.Worst.Temperature, range)])
            .Distinct().Order();
    }

    private static Temperature WholeDegrees(Temperature temperature, OperatingTemperature range)
    {
        var rounded = Temperature.FromCelsius(Math.Round(temperature.Celsius));
        return Temperature.Min(Temperature.Max(rounded, range.Lower), range.Upper);
    }

    private VerificationPoint PointAt(string id, TestPlace place, double widest)
    {
        (Temperature temperature, double fraction, PressureDirection direction) = place;
        Requirement requirement = application.Requirement;
        double tolerance = requirement.RegionsAt(temperature).Min(r => ToleranceAt(fraction, temperature, r));
        (double mean, double sigma) = ProcessAt(fraction, temperature, direction);
        double standard = StandardUncertainty(fraction);
        double guardBand = Math.Max(new PointDecision(mean, sigma, standard, tolerance).GuardBandOf(rules), tolerance - widest);
        (decimal lower, decimal upper) = AcceptanceLimits.Of(requirement, fraction, tolerance - guardBand);
        ConformityRisks risks = ConformityRisk.Of(
            mean, sigma, standard, Interval.Symmetric(tolerance), AcceptanceLimits.InPercent(requirement.Output, fraction, lower, upper));
        return new VerificationPoint
        {
            Id = id,
            Temperature = temperature,
            PressureFraction = fraction,
            Pressure = requirement.Pressure.At(fraction),
            Direction = direction,
            Nominal = requirement.Output.NominalAt(fraction),
            Lower = (double)lower,
            Upper = (double)upper,
            Tolerance = PercentOfSpan.FromPercent(tolerance),
            GuardBand = PercentOfSpan.FromPercent(guardBand),
            Uncertainty = PercentOfSpan.FromPercent(2 * standard),
            ProcessMean = PercentOfSpan.FromPercent(mean),
            ProcessSigma = PercentOfSpan.FromPercent(sigma),
            ConsumerRisk = risks.Consumer,
            ProducerRisk = risks.Producer,
        };
    }

    /// <summary>
    /// <c>L_v = |μ| + H̄/2·η + 3C·√(Σ seen m_i² s_i² + …)</c>, the larger of the two criteria. Seen are the residues, carried noise, the
    /// standard, pressure hysteresis, repeatability and resolution; not thermal hysteresis, ageing or further terms.
    /// </summary>
    private double ToleranceAt(double fraction, Temperature temperature, int region)
    {
        ResidueShares shares = formulas.SharesAt(fraction, temperature);
        List<SteadyTerm> seen = [.. SeenAt(fraction)];
        double others = seen.Sum(t => Square(multipliers.Of(t.Term, region) * t.Sigma));
        CapabilityTarget target = application.Requirement.Capability;
        double sample = AllocatedVariance.Of(shares, shares.Within, multipliers, region) + others;
        double longRun = AllocatedVariance.Of(shares, shares.LongRun, multipliers, region) + others;
        return Math.Abs(shares.Mean) + seen.Sum(t => t.Added)
            + Math.Max(3 * target.Sample * Math.Sqrt(sample), 3 * target.LongRun * Math.Sqrt(longRun));
    }

    /// <summary>
    /// What the process does at a point, over lots: its mean with the direction's half of hysteresis, and its spread. Repeatability is left
    /// out, since it counts as measurement uncertainty.
    /// </summary>
    private (double Mean, double Sigma) ProcessAt(double fraction, Temperature temperature, PressureDirection direction)
    {
        ResidueShares shares = formulas.SharesAt(fraction, temperature);
        List<SteadyTerm> seen = [.. SeenAt(fraction).Where(t => t.Term != ErrorTerm.Repeatability)];
        double hysteresis = seen.Sum(t => t.Added);
        double mean = shares.Mean + (direction == PressureDirection.Rising ? -hysteresis : hysteresis);
        return (mean, Math.Sqrt(shares.VarianceLongRun + seen.Sum(t => Square(t.Sigma))));
    }

    private IEnumerable<SteadyTerm> SeenAt(double fraction) => formulas.SteadyAt(fraction).Where(t =>
        t.Term == ErrorTerm.PressureHysteresis || t.Term == ErrorTerm.Repeatability || t.Term == ErrorTerm.Resolution);

    /// <summary><c>u_v</c> with <c>u_v² = (σ_rep² + σ_read²)/N + u_0² + u_1²x²</c>.</summary>
    private double StandardUncertainty(double fraction)
    {
        Station station = application.Station;
        return Math.Sqrt(
            ReadingNoise.VarianceOf(application.Platform, station)
            + Square(station.StandardZero.Percent) + Square(station.StandardProportional.Percent * fraction));
    }

    private static double Square(double value) => value * value;
}
