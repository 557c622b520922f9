using BandSpec.Core.Numerics;

namespace BandSpec.Core.LotJudging;

/// <summary>What a lot is worth: the finished record that screens and documents are written from.</summary>
public sealed record LotJudgement
{
    /// <summary>What it was held against.</summary>
    public required LotLimits Limits { get; init; }

    /// <summary>Every point in the order of the test, then every derived figure.</summary>
    public required IReadOnlyList<CharacteristicJudgement> Characteristics { get; init; }

    /// <summary>Readings that took part.</summary>
    public required long Readings { get; init; }

    /// <summary>The lots by name, in the order they were met; none when no reading named one.</summary>
    public required IReadOnlyCollection<string> LotNames { get; init; }

    /// <summary>Units that pass, fail and are incomplete, in this order.</summary>
    public required (long Pass, long Fail, long Incomplete) UnitCounts { get; init; }

    /// <summary>Every unit in the order they were met, judged as it is asked for.</summary>
    public required IEnumerable<UnitJudgement> Units { get; init; }

    /// <summary>What was wrong with lines that took no part.</summary>
    public required ReadingFaults Faults { get; init; }

    /// <summary>The worst standing of any characteristic within a lot; <see langword="null"/> when none could be judged.</summary>
    public Standing? Sample => Worst(Characteristics.Select(c => c.Sample));

    /// <summary>The worst standing of any characteristic over lots; <see langword="null"/> when none could be judged.</summary>
    public Standing? LongRun => Worst(Characteristics.Select(c => c.LongRun));

    /// <summary>Whether every observed index reaches its demand, proven or not, and every point could be judged.</summary>
    public bool IsMet => Characteristics.All(c => c.Sample?.Standing <= Standing.Met && c.LongRun?.Standing <= Standing.Met);

    /// <summary>Whether every demand is proven. Each at 95 %: that all hold is then proven at 95 % too, since the weakest decides.</summary>
    public bool IsProven => Sample == Standing.Proven && LongRun == Standing.Proven && IsMet;

    /// <summary>The main story: judges everything that was collected. Characteristics are judged side by side; the answer does not depend on it.</summary>
    public static LotJudgement Of(LotCollector collected)
    {
        ArgumentNullException.ThrowIfNull(collected);
        LotLimits limits = collected.Limits;
        IReadOnlyList<DerivedFigure> figures = DerivedFigure.AllOf(limits);
        var judging = new UnitJudging(limits, collected.Units, figures);
        long[] verdicts = new long[Enum.GetValues<UnitVerdict>().Length];
        for (int unit = 0; unit < collected.Units.Count; unit++)
            verdicts[(int)judging.VerdictOf(unit)]++;
        // Asking for the tallies finishes the collection: once, before several threads read them.
        IReadOnlyList<Tally> tallies = collected.Tallies;
        Func<CharacteristicJudgement>[] points = [.. limits.Points.Select((point, i) => (Func<CharacteristicJudgement>)(() =>
            CharacteristicJudging.Judge(point.Id, "", false, tallies[i], limits, collected.Units)))];
        Func<CharacteristicJudgement>[] derived = [.. figures.Select(figure => (Func<CharacteristicJudgement>)(() =>
            CharacteristicJudging.Judge(figure.Name, figure.Place, true, Tallied(collected, figure), limits, collected.Units)))];
        return new LotJudgement
        {
            Limits = limits,
            Characteristics = [.. points.Concat(derived).AsParallel().AsOrdered().Select(judge => judge())],
            Readings = collected.Readings,
            LotNames = collected.LotNames,
            UnitCounts = (verdicts[(int)UnitVerdict.Pass], verdicts[(int)UnitVerdict.Fail], verdicts[(int)UnitVerdict.Incomplete]),
            Units = Enumerable.Range(0, collected.Units.Count).Select(judging.Judge),
            Faults = collected.Faults,
        };
    }

    /// <summary>One derived figure of every unit that has the readings for it, taken in like readings.</summary>
    private static Tally Tallied(LotCollector collected, DerivedFigure figure)
    {
        var tally = new Tally(Interval.Symmetric(figure.Limit.Percent));
        for (int unit = 0; unit < collected.Units.Count; unit++)
            if (figure.Of(collected.Units.ErrorsOf(unit)) is var value && !double.IsNaN(value))
                tally.Add(value, collected.LotOf(unit), unit);
        return tally;
    }

    private static Standing? Worst(IEnumerable<CriterionJudgement?> judgements) => judgements.Max(j => j?.Standing);
}
