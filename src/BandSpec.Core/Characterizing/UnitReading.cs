using BandSpec.Core.Quantities;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Characterizing;

/// <summary>
/// One reading of a unit that has not been compensated: its error at a temperature and an applied pressure. Unlike the reading of a lot in
/// test it is judged by nothing; it is what statistics are made of.
/// </summary>
public sealed record UnitReading
{
    /// <summary>Name of the lot; empty when lots were not noted, which makes all units one lot.</summary>
    public required string Lot { get; init; }

    /// <summary>Name of the unit, unique within its lot.</summary>
    public required string Unit { get; init; }

    /// <summary>Temperature of the unit.</summary>
    public required Temperature Temperature { get; init; }

    /// <summary>Applied pressure as a fraction of the span, about 0 … 1.</summary>
    public required double PressureFraction { get; init; }

    /// <summary>From which side the pressure was approached; <see langword="null"/> when it was not noted.</summary>
    public required PressureDirection? Direction { get; init; }

    /// <summary>Number of the temperature cycle; readings of one unit are in the order of time within and over cycles.</summary>
    public required int Cycle { get; init; }

    /// <summary>What was read less what a perfect unit would show.</summary>
    public required PercentOfSpan Error { get; init; }

    /// <summary>Where it stands in its source: the line of the file, counted from 1.</summary>
    public required int Line { get; init; }
}
