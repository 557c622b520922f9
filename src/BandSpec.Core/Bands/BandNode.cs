using BandSpec.Core.Quantities;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Bands;

/// <summary>The band at one pressure and temperature, seen from one region: what is allowed, what a unit does, how capable that is.</summary>
public sealed record BandNode
{
    /// <summary>Pressure fraction, 0 … 1.</summary>
    public required double PressureFraction { get; init; }

    /// <summary>Temperature.</summary>
    public required Temperature Temperature { get; init; }

    /// <summary>Index of the region whose allowance holds, counted from the coldest; an edge appears once for each neighbour.</summary>
    public required int Region { get; init; }

    /// <summary>Allowed error <c>A</c>.</summary>
    public required PercentOfSpan Allowed { get; init; }

    /// <summary>Design band <c>D = A/S</c>.</summary>
    public required PercentOfSpan Design { get; init; }

    /// <summary>Mean left over by compensation, <c>μ</c>, signed, before ageing.</summary>
    public required PercentOfSpan Mean { get; init; }

    /// <summary><c>M = max(|μ|, |μ + drift mean|) + H̄/2·η + Θ̄ + further bounds</c>: all that adds and does not scatter.</summary>
    public required PercentOfSpan Added { get; init; }

    /// <summary>Standard deviation within a lot, <c>σ_w</c>.</summary>
    public required PercentOfSpan SigmaSample { get; init; }

    /// <summary>Standard deviation over lots, <c>σ_t ≥ σ_w</c>.</summary>
    public required PercentOfSpan SigmaLongRun { get; init; }

    /// <summary>Maximum band, <c>M + max(3C_s σ_w, 3C_l σ_t)</c>.</summary>
    public required PercentOfSpan Maximum { get; init; }

    /// <summary>Typical band, <c>M + 3σ_t</c>.</summary>
    public required PercentOfSpan Typical { get; init; }

    /// <summary><c>(D − M)/(3σ_w)</c>; infinite without scatter.</summary>
    public required double CpkSample { get; init; }

    /// <summary><c>(D − M)/(3σ_t)</c>; infinite without scatter.</summary>
    public required double CpkLongRun { get; init; }

    /// <summary>The smaller of the two <c>Cpk/C</c>; at least 1 when the node holds.</summary>
    public required double Margin { get; init; }

    /// <summary>What each term adds and scatters here, in the order of <see cref="ErrorTerm.Usual"/>, then the further terms.</summary>
    public required IReadOnlyList<TermShare> Terms { get; init; }
}

/// <summary>What one term contributes at a node.</summary>
/// <param name="Term">The term.</param>
/// <param name="Added">Its own mean magnitude, not negative.</param>
/// <param name="SigmaSample">Its standard deviation within a lot.</param>
/// <param name="SigmaLongRun">Its standard deviation over lots.</param>
public sealed record TermShare(ErrorTerm Term, PercentOfSpan Added, PercentOfSpan SigmaSample, PercentOfSpan SigmaLongRun);
