using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>
/// A station as far as it could be read: what is missing or cannot be read is <see langword="null"/>. Unlike a <see cref="Station"/> it is of
/// no use to anything but the rules.
/// </summary>
public sealed record StationParts
{
    /// <summary>See <see cref="Station.Name"/>.</summary>
    public string? Name { get; init; }

    /// <summary>See <see cref="Station.StandardZero"/>.</summary>
    public PercentOfSpan? StandardZero { get; init; }

    /// <summary>See <see cref="Station.StandardProportional"/>.</summary>
    public PercentOfSpan? StandardProportional { get; init; }

    /// <summary>See <see cref="Station.ReadingNoise"/>.</summary>
    public PercentOfSpan? ReadingNoise { get; init; }

    /// <summary>See <see cref="Station.ReadingsAveraged"/>.</summary>
    public int? ReadingsAveraged { get; init; }

    /// <summary>See <see cref="Station.SoakGradient"/>.</summary>
    public TemperatureDifference? SoakGradient { get; init; }

    /// <summary>See <see cref="Station.PressurePoints"/>.</summary>
    public PressureLists? PressurePoints { get; init; }

    /// <summary>See <see cref="Station.TestPoints"/>.</summary>
    public PressureLists? TestPoints { get; init; }

    /// <summary>See <see cref="Station.Chamber"/>.</summary>
    public Chamber? Chamber { get; init; }

    /// <summary>See <see cref="Station.RejectCost"/>.</summary>
    public Money? RejectCost { get; init; }

    /// <summary>All parts of a whole station.</summary>
    internal static StationParts Of(Station whole) => new()
    {
        Name = whole.Name, StandardZero = whole.StandardZero, StandardProportional = whole.StandardProportional, ReadingNoise = whole.ReadingNoise,
        ReadingsAveraged = whole.ReadingsAveraged, SoakGradient = whole.SoakGradient, PressurePoints = whole.PressurePoints,
        TestPoints = whole.TestPoints, Chamber = whole.Chamber, RejectCost = whole.RejectCost,
    };
}
