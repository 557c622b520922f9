using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Characterizing;

/// <summary>What is asked of a characterization, beyond what the readings say.</summary>
public sealed record CharacterizationScope
{
    /// <summary><c>T_ref</c>, from which reduced temperature <c>τ = (T − T_ref)/100 K</c> is counted.</summary>
    public required Temperature Reference { get; init; }

    /// <summary>Highest degree in temperature of a shape that is fixed beforehand; −1 for a shape that is to have none. Others are chosen.</summary>
    public IReadOnlyDictionary<PressureShape, int> PinnedDegrees { get; init; } = new Dictionary<PressureShape, int>();

    /// <summary>
    /// The correlated pairs when they are fixed beforehand, possibly none; <see langword="null"/> to have them chosen.
    /// </summary>
    public IReadOnlyList<CoefficientPair>? PinnedCorrelations { get; init; }

    /// <summary>Units that are left out by name.</summary>
    public IReadOnlyList<string> ExcludedUnits { get; init; } = [];

    /// <summary>Whether suspect units and readings stay in; they are named either way.</summary>
    public bool KeepSuspects { get; init; }

    /// <summary>Two-sided confidence of the intervals, 0.5 to 0.999.</summary>
    public double Confidence { get; init; } = 0.95;
}

/// <summary>Two different coefficients of the raw error.</summary>
/// <param name="First">One coefficient.</param>
/// <param name="Second">The other.</param>
public readonly record struct CoefficientPair(CoefficientName First, CoefficientName Second);
