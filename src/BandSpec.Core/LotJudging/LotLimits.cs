using BandSpec.Core.Quantities;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.LotJudging;

/// <summary>The limits a lot is held against: what a limits file says, whoever made it.</summary>
public sealed record LotLimits
{
    /// <summary>Number and revision of the specification.</summary>
    public required string Specification { get; init; }

    /// <summary>Its title; empty when the file gives none.</summary>
    public string Title { get; init; } = "";

    /// <summary>Unit of every reading, nominal and acceptance limit: <c>V</c>, <c>mA</c>, <c>code</c>…</summary>
    public required string OutputUnit { get; init; }

    /// <summary>Output units per 100 %FS; negative for an output that falls with pressure, never 0.</summary>
    public required double OutputSpan { get; init; }

    /// <summary>Capability index demanded within a lot, above 0: usually 1.67.</summary>
    public required double SampleCriterion { get; init; }

    /// <summary>Capability index demanded over lots, above 0: usually 1.33.</summary>
    public required double LongRunCriterion { get; init; }

    /// <summary>The points of the verification test, at least one, ids distinct.</summary>
    public required IReadOnlyList<LotPoint> Points { get; init; }

    /// <summary>Limits of derived figures; empty when the file gives none.</summary>
    public IReadOnlyList<LotDerivedLimit> DerivedLimits { get; init; } = [];

    /// <summary>Where zero, span and non-linearity are counted; <see langword="null"/> for the temperature with the most points.</summary>
    public Temperature? ReferenceTemperature { get; init; }

    /// <summary>The error of a reading at a point, in %FS of the calibrated span, with the sign of the pressure it would pass for.</summary>
    public double ErrorOf(int point, double reading) => 100 * (reading - Points[point].Nominal) / OutputSpan;
}

/// <summary>One point of the verification test with its limits.</summary>
/// <param name="Id">Its name in the specification.</param>
/// <param name="Temperature">Chamber temperature.</param>
/// <param name="Pressure">Applied pressure.</param>
/// <param name="PressureFraction">The same as a fraction of the span.</param>
/// <param name="Direction">From which side the pressure is approached; <see langword="null"/> when the limits do not say.</param>
/// <param name="Nominal">Nominal output.</param>
/// <param name="Lower">Lowest accepted reading.</param>
/// <param name="Upper">Highest accepted reading.</param>
/// <param name="Tolerance">Half width of the tolerance that capability is counted against.</param>
public sealed record LotPoint(
    string Id, Temperature Temperature, Pressure Pressure, double PressureFraction, PressureDirection? Direction,
    double Nominal, double Lower, double Upper, PercentOfSpan Tolerance)
{
    /// <summary>Whether a reading passes; the limits themselves do.</summary>
    public bool Accepts(double reading) => reading >= Lower && reading <= Upper;
}

/// <summary>The limit of a figure derived from several readings of one unit.</summary>
/// <param name="Name">
/// <c>zero</c>, <c>span</c>, <c>non-linearity</c> (terminal-based) or <c>hysteresis</c> (full width), or <c>thermal-zero-shift</c> or
/// <c>thermal-span-shift</c> of a region. Other names are not judged.
/// </param>
/// <param name="From">Lower end of the region for a thermal shift; otherwise <see langword="null"/>.</param>
/// <param name="To">Upper end of the region for a thermal shift; otherwise <see langword="null"/>.</param>
/// <param name="Limit">The magnitude that may not be exceeded.</param>
public sealed record LotDerivedLimit(string Name, Temperature? From, Temperature? To, PercentOfSpan Limit);
