using BandSpec.Core.Numerics;

namespace BandSpec.Core.LotJudging;

/// <summary>A value that lies where normal values would not, with the unit it belongs to.</summary>
/// <param name="Serial">The unit; empty when it was not followed.</param>
/// <param name="Value">The value, %FS.</param>
public sealed record Outlier(string Serial, double Value);

/// <summary>
/// What a lot shows at one characteristic: a point of the verification test, or a derived figure at one place. All values are errors in %FS.
/// </summary>
public sealed record CharacteristicJudgement
{
    /// <summary>Id of the point, or name of the derived figure.</summary>
    public required string Name { get; init; }

    /// <summary>Where it is taken, in words; empty for a point, whose limits say it.</summary>
    public required string Place { get; init; }

    /// <summary>Whether it is derived from several readings.</summary>
    public required bool IsDerived { get; init; }

    /// <summary>Half width of the tolerance.</summary>
    public required double Tolerance { get; init; }

    /// <summary>How many values there are.</summary>
    public required long Count { get; init; }

    /// <summary>How many lots they are from; 1 when lots are not named.</summary>
    public required int Lots { get; init; }

    /// <summary>Their mean; NaN without values.</summary>
    public required double Mean { get; init; }

    /// <summary>The smallest.</summary>
    public required double Smallest { get; init; }

    /// <summary>The largest.</summary>
    public required double Largest { get; init; }

    /// <summary>Capability within lots, Cp and Cpk; <see langword="null"/> below two values, like all that follows from it.</summary>
    public CapabilityFigures? Within { get; init; }

    /// <summary>
    /// Capability over lots, Pp and Ppk, from the scatter within lots and between them together. It differs from the plain standard deviation of
    /// all values, which is too small by about one part in twice the number of lots when they differ.
    /// </summary>
    public CapabilityFigures? Overall { get; init; }

    /// <summary>Capability over all values by percentiles.</summary>
    public PercentileFigures? ByPercentiles { get; init; }

    /// <summary>Whether values look normal once the lots' differences are taken out; <see langword="null"/> when that cannot be said.</summary>
    public Normality? NormalityWithin { get; init; }

    /// <summary>Whether all values together look normal.</summary>
    public Normality? NormalityOverall { get; init; }

    /// <summary>Values that stand out (generalized extreme studentized deviates, level 5 %, at most ten); they were not taken out.</summary>
    public required IReadOnlyList<Outlier> Outliers { get; init; }

    /// <summary>How many values lie outside the tolerance.</summary>
    public required long OutsideCount { get; init; }

    /// <summary>95 % limits of the fraction outside, from that count (Clopper and Pearson).</summary>
    public required (double Lower, double Upper) OutsideFraction { get; init; }

    /// <summary>Against the criterion within a lot; <see langword="null"/> below two values.</summary>
    public CriterionJudgement? Sample { get; init; }

    /// <summary>Against the criterion over lots; <see langword="null"/> below two values.</summary>
    public CriterionJudgement? LongRun { get; init; }

    /// <summary>Values in their order, condensed.</summary>
    public required IReadOnlyList<RunStretch> Run { get; init; }

    /// <summary>Values for a histogram: all, or a random sample of 20 000.</summary>
    public required IReadOnlyList<double> Values { get; init; }
}

/// <summary>Judges one characteristic from what was kept of it.</summary>
internal static class CharacteristicJudging
{
    public static CharacteristicJudgement Judge(string name, string place, bool derived, Tally tally, LotLimits limits, UnitTable units)
    {
        Moments all = tally.All;
        Interval outside = all.Count > 0 ? BinomialInterval.Of(tally.Outside, all.Count, CapabilityFigures.Confidence) : new(0, 1);
        var judgement = new CharacteristicJudgement
        {
            Name = name,
            Place = place,
            IsDerived = derived,
            Tolerance = tally.Tolerance.Upper,
            Count = all.Count,
            Lots = tally.Lots.Count(),
            Mean = all.Mean,
            Smallest = all.Minimum,
            Largest = all.Maximum,
            Outliers = all.Count > 0 ? Outliers(tally, units) : [],
            OutsideCount = tally.Outside,
            OutsideFraction = (outside.Lower, outside.Upper),
            Run = tally.Run.Stretches,
            Values = tally.Kept.Values,
        };
        return all.Count < 2 ? judgement : WithCapability(judgement, tally, limits);
    }

    private static CharacteristicJudgement WithCapability(CharacteristicJudgement judgement, Tally tally, LotLimits limits)
    {
        VarianceSplit split = VarianceSplit.Of([.. tally.Lots]);
        CapabilityFigures within = CapabilityFigures.Of(
            tally.All.Mean, Math.Sqrt(split.Within), split.WithinFreedom, split.WithinCount, tally.Tolerance);
        CapabilityFigures overall = CapabilityFigures.Of(
            tally.All.Mean, Math.Sqrt(split.LongRun), split.LongRunFreedom, split.LongRunCount, tally.Tolerance);
        double[] sorted = [.. tally.Kept.Values.Order()], alike = judgement.Lots > 1 ? Alike(tally, sorted) : sorted;
        Normality? normalAlike = Normality.Of(alike), normalAll = Normality.Of(sorted);
        PercentileFigures free = PercentileFigures.Of(sorted, tally.Tolerance);
        CriterionJudgement longRun = CriterionJudgement.Of(
            limits.LongRunCriterion, judgement.Count, overall, free, normalAll?.IsPlausible ?? true);
        return judgement with
        {
            Within = within,
            Overall = overall,
            ByPercentiles = free,
            NormalityWithin = normalAlike,
            NormalityOverall = normalAll,
            Sample = CriterionJudgement.Of(limits.SampleCriterion, judgement.Count, within,
                PercentileFigures.Of(alike, tally.Tolerance), normalAlike?.IsPlausible ?? true),
            LongRun = judgement.Lots > 1 ? longRun : longRun.WithoutLots(),
        };
    }

    /// <summary>
    /// Sorted values as they would be if every lot had the overall mean. Ties are parted first, since the shift would part them lot by lot.
    /// </summary>
    private static double[] Alike(Tally tally, double[] sorted)
    {
        double mean = tally.All.Mean;
        int[] order = [.. Enumerable.Range(0, sorted.Length).OrderBy(i => tally.Kept.Values[i])];
        double[] untied = Normality.Untied(sorted);
        return [.. untied.Select((value, rank) => value - tally.MeanOf(tally.Kept.Lots[order[rank]]) + mean).Order()];
    }

    private static List<Outlier> Outliers(Tally tally, UnitTable units)
    {
        double[] smallest = [.. tally.Extremes.Smallest.Select(e => e.Value)], largest = [.. tally.Extremes.Largest.Select(e => e.Value)];
        (int low, int high) = ExtremeDeviates.Of(tally.All, smallest, largest, level: 0.05);
        return [.. tally.Extremes.Smallest.Take(low).Concat(tally.Extremes.Largest.Take(high))
            .Select(e => new Outlier(e.Unit >= 0 ? units.SerialOf(e.Unit) : "", e.Value))];
    }
}
