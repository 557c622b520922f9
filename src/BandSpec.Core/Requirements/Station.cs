using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>What a production line can do: its standard, its readings, its chamber and what they cost.</summary>
public sealed record Station
{
    /// <summary>The line's name.</summary>
    public required string Name { get; init; }

    /// <summary>Standard uncertainty of the pressure standard that does not depend on pressure, <c>u_0</c>.</summary>
    public required PercentOfSpan StandardZero { get; init; }

    /// <summary>Standard uncertainty of the pressure standard in proportion to the pressure fraction, <c>u_1</c>.</summary>
    public required PercentOfSpan StandardProportional { get; init; }

    /// <summary>Standard deviation of one reading that comes from the station, <c>σ_read</c>.</summary>
    public required PercentOfSpan ReadingNoise { get; init; }

    /// <summary>How many readings are averaged at a point, <c>N ≥ 1</c>.</summary>
    public required int ReadingsAveraged { get; init; }

    /// <summary>Standard uncertainty of the unit's temperature at the end of the soak, <c>u_T</c>.</summary>
    public required TemperatureDifference SoakGradient { get; init; }

    /// <summary>Pressure fractions read for compensation.</summary>
    public required PressureLists PressurePoints { get; init; }

    /// <summary>Pressure fractions read in the verification test.</summary>
    public required PressureLists TestPoints { get; init; }

    /// <summary>The chamber.</summary>
    public required Chamber Chamber { get; init; }

    /// <summary>What one rejected unit costs.</summary>
    public required Money RejectCost { get; init; }
}

/// <summary>Pressure fractions, rising, each 0 … 1.</summary>
/// <param name="Reference">At the temperature nearest the reference temperature.</param>
/// <param name="Others">At the other temperatures.</param>
public sealed record PressureLists(IReadOnlyList<double> Reference, IReadOnlyList<double> Others)
{
    /// <summary>The list that is used at a temperature.</summary>
    /// <param name="isReference">Whether it is the one nearest the reference temperature.</param>
    public IReadOnlyList<double> At(bool isReference) => isReference ? Reference : Others;
}

/// <summary>A sum of money.</summary>
/// <param name="Amount">The amount.</param>
/// <param name="Currency">The currency's code of three letters (ISO 4217).</param>
public sealed record Money(double Amount, string Currency);

/// <summary>A temperature chamber and the times and costs of a run.</summary>
/// <param name="Ambient">Temperature at which a run begins and ends.</param>
/// <param name="HeatingPerMinute">Heating rate per minute, above 0.</param>
/// <param name="CoolingPerMinute">Cooling rate per minute, above 0.</param>
/// <param name="Soak">Time to settle at each temperature.</param>
/// <param name="PressurePoint">Time for each pressure point.</param>
/// <param name="Batch">Units in one run, at least 1.</param>
/// <param name="HourlyRate">Cost of an hour of chamber time.</param>
public sealed record Chamber(
    Temperature Ambient, TemperatureDifference HeatingPerMinute, TemperatureDifference CoolingPerMinute,
    Duration Soak, Duration PressurePoint, int Batch, Money HourlyRate);
