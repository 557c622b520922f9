using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Characterizing;

/// <summary>What a platform says besides the statistics of a characterization: no reading of an uncompensated unit tells it.</summary>
/// <param name="Name">The family's name.</param>
/// <param name="Revision">The revision of its statistics.</param>
/// <param name="Temperature">Temperatures for which the statistics are to hold, with the reference of the characterization.</param>
/// <param name="Pressure">Pressures the family is rated for.</param>
/// <param name="ZeroDegree">Highest degree of the stored zero correction.</param>
/// <param name="SpanDegree">Highest degree of the stored span correction.</param>
/// <param name="Ageing">Drift.</param>
/// <param name="AgeingAccuracy">How uncertain the drift is; <see langword="null"/> when it was not estimated.</param>
public sealed record PlatformFrame(
    string Name, string Revision, OperatingTemperature Temperature, PressureRating Pressure, int ZeroDegree, int SpanDegree,
    Ageing Ageing, AgeingAccuracy? AgeingAccuracy)
{
    /// <summary>The frame of a platform that exists.</summary>
    public static PlatformFrame Of(Platform platform)
    {
        ArgumentNullException.ThrowIfNull(platform);
        return new PlatformFrame(
            platform.Name, platform.Revision, platform.Temperature, platform.Pressure, platform.ZeroDegree, platform.SpanDegree,
            platform.Ageing, platform.Sample?.Ageing);
    }

    /// <summary>A platform with new statistics in this frame; every figure rounded to what its uncertainty leaves of it.</summary>
    public Platform With(Characterization statistics)
    {
        ArgumentNullException.ThrowIfNull(statistics);
        return new Platform
        {
            Name = Name,
            Revision = Revision,
            Temperature = Temperature with { Reference = statistics.Scope.Reference },
            Pressure = Pressure,
            RawError = [.. statistics.Coefficients.Select(Coefficient)],
            Correlations = [.. statistics.Correlations.Select(c => new CoefficientCorrelation(c.Pair.First, c.Pair.Second, Math.Round(c.Value.Value, 2)))],
            ZeroDegree = ZeroDegree,
            SpanDegree = SpanDegree,
            PressureHysteresis = Rounded(statistics.PressureHysteresis),
            ThermalHysteresis = Rounded(statistics.ThermalHysteresis),
            Repeatability = Percent(MeaningfulRounding.Spread(statistics.Repeatability.Value, statistics.RepeatabilityVarianceError)),
            Ageing = Ageing,
            Sample = SampleOf(statistics),
        };
    }

    private static RawErrorCoefficient Coefficient(CoefficientEstimate estimate) => new(
        estimate.Name,
        MeaningfulRounding.Of(estimate.Units.Mean.Value, estimate.Units.MeanError),
        MeaningfulRounding.Spread(estimate.Units.Sigma.Value, estimate.Units.VarianceError),
        MeaningfulRounding.Spread(estimate.LotSigma.Value, estimate.LotVarianceError));

    /// <summary>A hysteresis adds as a magnitude whichever way it goes.</summary>
    private static Spread Rounded(SpreadEstimate? estimate) => estimate is null
        ? new Spread(Percent(0), Percent(0))
        : new Spread(
            Percent(Math.Abs(MeaningfulRounding.Of(estimate.Mean.Value, estimate.MeanError))),
            Percent(MeaningfulRounding.Spread(estimate.Sigma.Value, estimate.VarianceError)));

    private PlatformSample SampleOf(Characterization statistics) => new()
    {
        Units = statistics.Units,
        Lots = statistics.Lots,
        Readings = statistics.Readings,
        Coefficients = [.. statistics.Coefficients.Select((c, i) => new CoefficientAccuracy(
            c.Name, Short(c.Units.VarianceError), Short(c.LotVarianceError), [.. statistics.MeanCovariance[i].Select(Short)]))],
        PressureHysteresis = Accuracy(statistics.PressureHysteresis),
        ThermalHysteresis = Accuracy(statistics.ThermalHysteresis),
        RepeatabilityVarianceError = Short(statistics.RepeatabilityVarianceError),
        Ageing = AgeingAccuracy,
    };

    private static SpreadAccuracy? Accuracy(SpreadEstimate? estimate) =>
        estimate is null ? null : new SpreadAccuracy(Percent(Short(estimate.MeanError)), Short(estimate.VarianceError));

    private static double Short(double value) => double.IsFinite(value) ? MeaningfulRounding.ToDigits(value, 4) : 0;

    private static PercentOfSpan Percent(double value) => PercentOfSpan.FromPercent(value);
}
