using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>
/// A platform as far as it could be read: what is missing or cannot be read is <see langword="null"/>. Unlike a <see cref="Platform"/> it is of
/// no use to anything but the rules.
/// </summary>
public sealed record PlatformParts
{
    /// <summary>See <see cref="Platform.Name"/>.</summary>
    public string? Name { get; init; }

    /// <summary>See <see cref="Platform.Revision"/>.</summary>
    public string? Revision { get; init; }

    /// <summary>See <see cref="Platform.Temperature"/>.</summary>
    public OperatingTemperature? Temperature { get; init; }

    /// <summary>See <see cref="Platform.Pressure"/>.</summary>
    public PressureRating? Pressure { get; init; }

    /// <summary>See <see cref="Platform.RawError"/>.</summary>
    public IReadOnlyList<RawErrorCoefficient>? RawError { get; init; }

    /// <summary>See <see cref="Platform.Correlations"/>.</summary>
    public IReadOnlyList<CoefficientCorrelation>? Correlations { get; init; }

    /// <summary>See <see cref="Platform.ZeroDegree"/>.</summary>
    public int? ZeroDegree { get; init; }

    /// <summary>See <see cref="Platform.SpanDegree"/>.</summary>
    public int? SpanDegree { get; init; }

    /// <summary>See <see cref="Platform.PressureHysteresis"/>.</summary>
    public Spread? PressureHysteresis { get; init; }

    /// <summary>See <see cref="Platform.ThermalHysteresis"/>.</summary>
    public Spread? ThermalHysteresis { get; init; }

    /// <summary>See <see cref="Platform.Repeatability"/>.</summary>
    public PercentOfSpan? Repeatability { get; init; }

    /// <summary>See <see cref="Platform.Ageing"/>.</summary>
    public Ageing? Ageing { get; init; }

    /// <summary>See <see cref="Platform.Sample"/>.</summary>
    public PlatformSample? Sample { get; init; }

    /// <summary>All parts of a whole platform.</summary>
    internal static PlatformParts Of(Platform whole) => new()
    {
        Name = whole.Name, Revision = whole.Revision, Temperature = whole.Temperature, Pressure = whole.Pressure, RawError = whole.RawError,
        Correlations = whole.Correlations, ZeroDegree = whole.ZeroDegree, SpanDegree = whole.SpanDegree,
        PressureHysteresis = whole.PressureHysteresis, ThermalHysteresis = whole.ThermalHysteresis, Repeatability = whole.Repeatability,
        Ageing = whole.Ageing, Sample = whole.Sample,
    };
}
