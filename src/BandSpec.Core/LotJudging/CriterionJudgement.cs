using BandSpec.Core.Numerics;

namespace BandSpec.Core.LotJudging;

/// <summary>How an observed capability stands to the one demanded, from best to worst.</summary>
public enum Standing
{
    /// <summary>The 95 % lower limit reaches the demand.</summary>
    Proven,

    /// <summary>The observed index reaches the demand, its lower limit does not.</summary>
    Met,

    /// <summary>The observed index falls short, by no more than chance explains.</summary>
    Missed,

    /// <summary>The 95 % upper limit falls short.</summary>
    Refuted,
}

/// <summary>One characteristic held against one capability criterion.</summary>
/// <param name="Demanded">The index demanded.</param>
/// <param name="Observed">The index observed: by the normal law when values look normal, else by percentiles.</param>
/// <param name="Lower">Its 95 % lower limit; <see langword="null"/> when there is none.</param>
/// <param name="Standing">How they stand to each other.</param>
/// <param name="ByPercentiles">Whether the values are non-normal, so that percentiles decide.</param>
/// <param name="MoreUnits">
/// Units to add, at the same index, to prove the demand; 0 when proven, <see langword="null"/> when no number would: the index is too low, or lots
/// are missing.
/// </param>
public sealed record CriterionJudgement(
    double Demanded, double Observed, double? Lower, Standing Standing, bool ByPercentiles, long? MoreUnits)
{
    /// <summary>
    /// Judges figures. Without normality the order statistics' limit decides; it can prove, but it never refutes.
    /// </summary>
    internal static CriterionJudgement Of(double demanded, long units, CapabilityFigures normal, PercentileFigures free, bool plausible)
    {
        if (plausible)
        {
            Standing standing = normal.NearerLower >= demanded ? Standing.Proven
                : normal.Nearer >= demanded ? Standing.Met
                : normal.NearerUpper >= demanded ? Standing.Missed : Standing.Refuted;
            return new(demanded, normal.Nearer, normal.NearerLower, standing, false, UnitsToAdd(demanded, units, normal));
        }

        bool proven = free.NearerLower >= demanded;
        Standing byRank = proven ? Standing.Proven : free.Nearer >= demanded ? Standing.Met : Standing.Missed;
        bool tooFew = byRank == Standing.Met && free.Values == units && units < PercentileFigures.SmallestForLimit;
        return new(demanded, free.Nearer, free.NearerLower, byRank, true,
            proven ? 0 : tooFew ? PercentileFigures.SmallestForLimit - units : null);
    }

    /// <summary>The same judgement where lots were not told apart: nothing can be proven about their scatter.</summary>
    internal CriterionJudgement WithoutLots() =>
        Standing == Standing.Proven ? this with { Standing = Standing.Met, MoreUnits = null } : this with { MoreUnits = null };

    /// <summary>
    /// The fewest units to add so that the lower limit reaches the demand, if the index stays and degrees of freedom grow in proportion. Found by
    /// doubling and halving; an index that exceeds the demand by less than 1 in 1000 would take millions and counts as none.
    /// </summary>
    private static long? UnitsToAdd(double demanded, long units, CapabilityFigures normal)
    {
        bool proves(double factor) => CapabilityLaw.OneSidedLimit(
            normal.Nearer, factor * normal.EffectiveReadings, factor * normal.DegreesOfFreedom, CapabilityFigures.Confidence) >= demanded;
        if (normal.NearerLower >= demanded)
            return 0;
        if (!(normal.Nearer > 1.001 * demanded))
            return null;
        double fails = 1, holds = 2;
        while (!proves(holds))
            (fails, holds) = (holds, 2 * holds);
        while ((holds - fails) * units > 0.5)
            (fails, holds) = proves((fails + holds) / 2) ? (fails, (fails + holds) / 2) : ((fails + holds) / 2, holds);
        return (long)Math.Ceiling((holds - 1) * units);
    }
}
