using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics.RandomStreams;

namespace BandSpec.Core.VirtualLots;

/// <summary>The random streams of an order, one for each source of scatter.</summary>
/// <param name="seed">The root seed.</param>
internal sealed class LotStreams(ulong seed)
{
    /// <summary>Shift of a lot.</summary>
    public RandomStream Lot { get; } = RandomStream.Named(StreamNames.Lot, seed);

    /// <summary>Raw error of a unit.</summary>
    public RandomStream RawError { get; } = RandomStream.Named(StreamNames.RawError, seed);

    /// <summary>Pressure hysteresis of a unit.</summary>
    public RandomStream PressureHysteresis { get; } = RandomStream.Named(StreamNames.PressureHysteresis, seed);

    /// <summary>Thermal hysteresis of a unit.</summary>
    public RandomStream ThermalHysteresis { get; } = RandomStream.Named(StreamNames.ThermalHysteresis, seed);

    /// <summary>Drift of a unit.</summary>
    public RandomStream Ageing { get; } = RandomStream.Named(StreamNames.Ageing, seed);

    /// <summary>Further terms.</summary>
    public RandomStream Further { get; } = RandomStream.Named(StreamNames.Further, seed);

    /// <summary>Temperature not settled.</summary>
    public RandomStream Soak { get; } = RandomStream.Named(StreamNames.Soak, seed);

    /// <summary>Noise of compensation readings.</summary>
    public RandomStream Reading { get; } = RandomStream.Named(StreamNames.Reading, seed);

    /// <summary>Pressure standard in the compensation run.</summary>
    public RandomStream Standard { get; } = RandomStream.Named(StreamNames.Standard, seed);

    /// <summary>Repeatability of the unit in the verification test.</summary>
    public RandomStream TestRepeatability { get; } = RandomStream.Named(StreamNames.TestRepeatability, seed);

    /// <summary>Noise of the station in the verification test.</summary>
    public RandomStream TestReading { get; } = RandomStream.Named(StreamNames.TestReading, seed);

    /// <summary>Pressure standard in the verification test.</summary>
    public RandomStream TestStandard { get; } = RandomStream.Named(StreamNames.TestStandard, seed);

    /// <summary>Repeatability over the map.</summary>
    public RandomStream Map { get; } = RandomStream.Named(StreamNames.Map, seed);

    /// <summary>Temperature and pressure in use.</summary>
    public RandomStream Use { get; } = RandomStream.Named(StreamNames.Use, seed);

    /// <summary>From which side, in use.</summary>
    public RandomStream UseSide { get; } = RandomStream.Named(StreamNames.UseSide, seed);

    /// <summary>Repeatability in use.</summary>
    public RandomStream UseRepeatability { get; } = RandomStream.Named(StreamNames.UseRepeatability, seed);

    /// <summary>The numbers of the eight units of a group.</summary>
    public static Vector512<ulong> Group(ulong firstUnit, int group) =>
        Vector512.Create(firstUnit + ((ulong)group * LotOrder.UnitsSideBySide)) + RandomStream.LaneNumbers;
}
