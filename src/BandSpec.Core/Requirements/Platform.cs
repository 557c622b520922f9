using System.Globalization;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>What a sensor family can do before compensation, as statistics over production; comes from characterization readings.</summary>
public sealed record Platform
{
    /// <summary>The family's name.</summary>
    public required string Name { get; init; }

    /// <summary>The revision of its statistics.</summary>
    public required string Revision { get; init; }

    /// <summary>Temperatures for which the statistics hold, and <c>T_ref</c>, from which <c>τ = (T − T_ref)/100 K</c> is counted.</summary>
    public required OperatingTemperature Temperature { get; init; }

    /// <summary>Pressures the family is rated for.</summary>
    public required PressureRating Pressure { get; init; }

    /// <summary>Coefficients of the raw error, at least one; each pair of shape and degree once.</summary>
    public required IReadOnlyList<RawErrorCoefficient> RawError { get; init; }

    /// <summary>Correlations between coefficients; a pair not listed is uncorrelated.</summary>
    public required IReadOnlyList<CoefficientCorrelation> Correlations { get; init; }

    /// <summary>Highest degree in temperature that the stored correction has for zero, <c>zero-degree</c>.</summary>
    public required int ZeroDegree { get; init; }

    /// <summary>Highest degree in temperature that the stored correction has for span, <c>span-degree</c>.</summary>
    public required int SpanDegree { get; init; }

    /// <summary>Pressure hysteresis, full width.</summary>
    public required Spread PressureHysteresis { get; init; }

    /// <summary>Thermal hysteresis, half width.</summary>
    public required Spread ThermalHysteresis { get; init; }

    /// <summary>Standard deviation of a reading repeated under the same conditions.</summary>
    public required PercentOfSpan Repeatability { get; init; }

    /// <summary>Drift with time and temperature.</summary>
    public required Ageing Ageing { get; init; }

    /// <summary>What the statistics rest on; <see langword="null"/> when nobody wrote it down, and then they are taken as exact.</summary>
    public PlatformSample? Sample { get; init; }
}

/// <summary>A mean and a standard deviation over production.</summary>
/// <param name="Mean">Mean.</param>
/// <param name="Sigma">Standard deviation, not negative.</param>
public sealed record Spread(PercentOfSpan Mean, PercentOfSpan Sigma);

/// <summary>Pressures a family is rated for.</summary>
/// <param name="SmallestSpan">The smallest span it may be calibrated to.</param>
/// <param name="LargestUpper">The largest upper range value.</param>
/// <param name="ProofFactor">Proof pressure as a multiple of the upper range value, at least 1.</param>
/// <param name="BurstFactor">Burst pressure as a multiple of the upper range value, at least the proof factor.</param>
public sealed record PressureRating(Pressure SmallestSpan, Pressure LargestUpper, double ProofFactor, double BurstFactor);

/// <summary>Pressure shapes <c>ψ_j(x)</c> of the raw error.</summary>
public enum PressureShape
{
    /// <summary><c>ψ0 = 1</c>.</summary>
    Zero,

    /// <summary><c>ψ1 = x</c>.</summary>
    Span,

    /// <summary><c>ψ2 = 4x(1 − x)</c>: vanishes at both terminals, peaks at 1.</summary>
    Bow,

    /// <summary><c>ψ3 = 6√3·x(1 − x)(1 − 2x)</c>: vanishes at both terminals, peaks at ±1.</summary>
    SShape,
}

/// <summary>The name of a coefficient of <c>ψ_j(x)·τ^k</c>, written <c>zero.1</c> in files.</summary>
/// <param name="Shape">The pressure shape <c>j</c>.</param>
/// <param name="Degree">The power <c>k</c> of reduced temperature, 0 to 8.</param>
public readonly record struct CoefficientName(PressureShape Shape, int Degree)
{
    /// <summary>The shape's word in files: <c>zero</c>, <c>span</c>, <c>bow</c> or <c>s-shape</c>.</summary>
    public string Word => Shape switch
    {
        PressureShape.Zero => "zero",
        PressureShape.Span => "span",
        PressureShape.Bow => "bow",
        _ => "s-shape",
    };

    /// <summary>The name as it is written in files: <c>zero.1</c>.</summary>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{Word}.{Degree}");
}

/// <summary>Statistics of one coefficient of the raw error, in %FS.</summary>
/// <param name="Name">Which coefficient.</param>
/// <param name="Mean">Mean over production, %FS.</param>
/// <param name="Sigma">Standard deviation between units of one lot, %FS, not negative.</param>
/// <param name="LotSigma">Standard deviation of the lots about the mean, %FS, not negative.</param>
public sealed record RawErrorCoefficient(CoefficientName Name, double Mean, double Sigma, double LotSigma);

/// <summary>A correlation between two coefficients, the same within and between lots.</summary>
/// <param name="First">One coefficient.</param>
/// <param name="Second">The other.</param>
/// <param name="Value">The correlation coefficient, −1 … 1.</param>
public sealed record CoefficientCorrelation(CoefficientName First, CoefficientName Second, double Value);

/// <summary>Drift of zero and span at the end of an ageing test, and how it carries over to other times and temperatures.</summary>
/// <param name="Zero">Drift of zero at the end of the test.</param>
/// <param name="Span">Drift of span at the end of the test.</param>
/// <param name="TestTemperature">Temperature of the test.</param>
/// <param name="TestDuration">Length of the test, above 0.</param>
/// <param name="ActivationEnergy">Activation energy in electronvolts, not negative (Arrhenius).</param>
/// <param name="TimeExponent">Exponent <c>n</c> of the time law, 0 to 2.</param>
public sealed record Ageing(
    Spread Zero, Spread Span, Temperature TestTemperature, Duration TestDuration, double ActivationEnergy, double TimeExponent);
