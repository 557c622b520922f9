using BandSpec.Core.Quantities;

namespace BandSpec.Core.Characterizing;

/// <summary>
/// One reading of a unit in an ageing test: its error at reference temperature after some time in storage. Unlike a
/// <see cref="UnitReading"/> its temperature is that of the storage, not that of the reading.
/// </summary>
public sealed record DriftReading
{
    /// <summary>Name of the unit.</summary>
    public required string Unit { get; init; }

    /// <summary>Temperature at which the unit is stored; the same for all readings of a unit.</summary>
    public required Temperature Storage { get; init; }

    /// <summary>Time in storage before this reading; none for the reading at the beginning.</summary>
    public required Duration Stored { get; init; }

    /// <summary>Applied pressure as a fraction of the span.</summary>
    public required double PressureFraction { get; init; }

    /// <summary>What was read less what a perfect unit would show; only its change with time counts.</summary>
    public required PercentOfSpan Error { get; init; }

    /// <summary>Where it stands in its source: the line of the file, counted from 1.</summary>
    public required int Line { get; init; }
}
