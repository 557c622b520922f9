using BandSpec.Core.Numerics;
using BandSpec.Core.Numerics.Dense;
using MathNet.Numerics.Statistics;

namespace BandSpec.Core.Characterizing;

/// <summary>A reading that its own unit's other readings contradict.</summary>
/// <param name="Reading">The reading.</param>
/// <param name="Residual">How far it lies from what the others predict, %FS.</param>
/// <param name="Multiple">That distance over its standard deviation.</param>
/// <param name="Shift">By how much it would move the unit's curve at its own place, %FS.</param>
public sealed record SuspectReading(UnitReading Reading, double Residual, double Multiple, double Shift);

/// <summary>
/// Finds single readings that do not fit the rest of their unit, before anything else is estimated: one slip of the pen bends a unit's whole
/// curve. The deletion residual (Cook &amp; Weisberg, Residuals and Influence in Regression, 1982, section 2.2) with the spread of a reading
/// taken as the median over units, which spoiled units cannot lift; worst first, one at a time. The level is 1 % for all readings together.
/// </summary>
/// <param name="columns">The columns, at least as many as are kept later, so that a curve is not taken for a slip.</param>
internal sealed class ReadingScreen(IReadOnlyList<ReadingColumn> columns)
{
    private const double FamilyLevel = 0.01;

    /// <summary>A unit with more slips than this part of its readings is not a unit with slips.</summary>
    private const double MostSlips = 0.1;

    private const int FewestSpare = 4;

    /// <summary>The suspect readings of all units, in the order of the units.</summary>
    public IReadOnlyList<SuspectReading> Find(MeasuredFamily family)
    {
        List<UnitResiduals> units = [.. family.Units.Select(unit => new UnitResiduals(unit, columns))];
        double[] spreads = [.. units.Where(unit => unit.Spare >= FewestSpare).Select(unit => unit.Spread)];
        if (spreads.Length == 0)
            return [];
        double sigma = spreads.Median();
        double limit = -NormalDistribution.Quantile(FamilyLevel / 2 / Math.Max(1, family.Readings.Count()));
        return [.. units.SelectMany(unit => Slips(unit, sigma, limit))];
    }

    private List<SuspectReading> Slips(UnitResiduals unit, double sigma, double limit)
    {
        List<SuspectReading> found = [];
        int most = (int)(MostSlips * unit.Unit.Readings.Count);
        while (unit.Spare >= FewestSpare && unit.Worst(sigma) is { } worst && worst.Multiple > limit)
        {
            if (found.Count == most)
                return [];
            found.Add(worst);
            unit = new UnitResiduals(unit.Unit.Without(new HashSet<UnitReading>([worst.Reading])), columns);
        }

        return found;
    }

    /// <summary>A unit's residuals about its own best curve, with what each reading contributes to it.</summary>
    private sealed class UnitResiduals
    {
        private readonly double[] residuals;
        private readonly double[] leverages;

        public UnitResiduals(MeasuredUnit unit, IReadOnlyList<ReadingColumn> columns)
        {
            Unit = unit;
            Grid rows = unit.Rows(columns);
            (residuals, leverages, int rank) = OrthogonalColumns.Project(rows);
            Spare = rows.Rows - rank;
            Spread = Spare > 0 ? Math.Sqrt(residuals.Sum(r => r * r) / Spare) : 0;
        }

        public MeasuredUnit Unit { get; }

        /// <summary>Readings beyond those that the curve uses up.</summary>
        public int Spare { get; }

        public double Spread { get; }

        public SuspectReading? Worst(double sigma)
        {
            const double OwnCurve = 1e-6;
            IEnumerable<SuspectReading> readings =
                from i in Enumerable.Range(0, residuals.Length)
                let rest = 1 - leverages[i]
                where rest > OwnCurve
                let residual = residuals[i] / rest
                select new SuspectReading(Unit.Readings[i], residual, Math.Abs(residuals[i]) / (sigma * Math.Sqrt(rest)), residual * leverages[i]);
            return readings.MaxBy(reading => reading.Multiple);
        }
    }
}
