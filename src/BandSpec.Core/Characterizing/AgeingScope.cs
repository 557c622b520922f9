using BandSpec.Core.Quantities;

namespace BandSpec.Core.Characterizing;

/// <summary>What is asked of the readings of an ageing test.</summary>
public sealed record AgeingScope
{
    /// <summary>Temperature of the test that the platform's drift is stated for.</summary>
    public required Temperature TestTemperature { get; init; }

    /// <summary>Its length, above 0.</summary>
    public required Duration TestDuration { get; init; }

    /// <summary>Activation energy to take when the readings cannot tell, in electronvolts; <see langword="null"/> when none is known.</summary>
    public double? AssumedActivationEnergy { get; init; }

    /// <summary>Time exponent to take when the readings cannot tell; <see langword="null"/> when none is known.</summary>
    public double? AssumedTimeExponent { get; init; }

    /// <summary>Two-sided confidence of the intervals, 0.5 to 0.999.</summary>
    public double Confidence { get; init; } = 0.95;

    /// <summary>A further test whose worth is asked for; <see langword="null"/> for none.</summary>
    public PlannedAgeingTest? PlannedTest { get; init; }
}

/// <summary>An ageing test that has not been made.</summary>
/// <param name="Units">How many further units, at least 1.</param>
/// <param name="Storage">Temperature of their storage.</param>
/// <param name="Times">Times at which they are read, besides the reading at the beginning.</param>
/// <param name="PressureFractions">Pressures at each reading.</param>
public sealed record PlannedAgeingTest(
    int Units, Temperature Storage, IReadOnlyList<Duration> Times, IReadOnlyList<double> PressureFractions);
