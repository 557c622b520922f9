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

    /// <summary>The main story: judges everything that was collected.</summary>
    public static LotJudgement Of(LotCollector collected)
    {
        ArgumentNullException.ThrowIfNull(collected);
        LotLimits limits = collected.Limits;
        IReadOnlyList<DerivedFigure> figures = DerivedFigure.AllOf(limits);
        var judging = new UnitJudging(limits, collected.Units, figures);
        long[] verdicts = new long[Enum.GetValues<UnitVerdict>().Length];
        for (int unit = 0; unit < collected.Units.Count; unit++)
            verdicts[(int)judging.VerdictOf(unit)]++;
        IEnumerable<CharacteristicJudgement> points = limits.Points.Select((point, i) =>
            CharacteristicJudging.Judge(point.Id, "", false, collected.Tallies[i], limits, collected.Units));
        IEnumerable<CharacteristicJudgement> derived = figures.Zip(Tallied(collected, figures), (figure, tally) =>
            CharacteristicJudging.Judge(figure.Name, figure.Place, true, tally, limits, collected.Units));
        return new LotJudgement
        {
            Limits = limits,
            Characteristics = [.. points, .. derived],
            Readings = collected.Readings,
            LotNames = collected.LotNames,
            UnitCounts = (verdicts[(int)UnitVerdict.Pass], verdicts[(int)UnitVerdict.Fail], verdicts[(int)UnitVerdict.Incomplete]),
            Units = Enumerable.Range(0, collected.Units.Count).Select(judging.Judge),
            Faults = collected.Faults,
        };
    }

    /// <summary>The derived figures of every unit that has the readings for them, taken in like readings.</summary>
    private static Tally[] Tallied(LotCollector collected, IReadOnlyList<DerivedFigure> figures)
    {
        Tally[] tallies = [.. figures.Select(figure => new Tally(Numerics.Interval.Symmetric(figure.Limit.Percent)))];
        for (int unit = 0; unit < collected.Units.Count; unit++)
            for (int k = 0; k < tallies.Length; k++)
                if (figures[k].Of(collected.Units.ErrorsOf(unit)) is var value && !double.IsNaN(value))
                    tallies[k].Add(value, collected.LotOf(unit), unit);
        return tallies;
    }

    private static Standing? Worst(IEnumerable<CriterionJudgement?> judgements) => judgements.Max(j => j?.Standing);
}
