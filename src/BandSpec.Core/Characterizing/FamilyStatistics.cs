using BandSpec.Core.Requirements;

namespace BandSpec.Core.Characterizing;

/// <summary>
/// From readings to statistics, the story in one place: which terms the readings support, which single readings are slips, which degrees are
/// worth having, which units do not belong, which coefficients go together, and what all that was estimated from.
/// </summary>
internal sealed class FamilyStatistics(MeasuredFamily family, CharacterizationScope scope)
{
    /// <summary>The highest degrees that are tried for zero, span, bow and s-shape when nothing is pinned.</summary>
    private static readonly int[] MostDegrees = [5, 5, 2, 1];

    public Characterization Estimate()
    {
        Support support = new(family, Wanted());
        IReadOnlyList<SuspectReading> slips = new ReadingScreen(support.Columns).Find(family);
        MeasuredFamily clean = family.Without(slips.Select(slip => slip.Reading).ToHashSet());
        DegreeSelection selection = Selection(clean, support);
        IReadOnlyList<ReadingColumn> columns = selection.Choose();
        (IReadOnlyList<SuspectUnit> strangers, SpreadFit fit) = new UnitScreen(columns).Find(clean);
        bool IsStrange(MeasuredUnit unit) => strangers.Any(s => s.Lot == unit.Lot && s.Unit == unit.Name);
        List<MeasuredUnit> strange = [.. clean.Units.Where(IsStrange)];
        if (strangers.Count > 0)
        {
            clean = clean.Without(IsStrange);
            selection = Selection(clean, support);
            columns = selection.Choose();
        }

        bool found = strangers.Count + slips.Count > 0;
        MeasuredFamily used = scope.KeepSuspects ? family : clean;
        if (found)
            fit = SpreadFit.Of(used.Sample(columns), columns, restricted: true);
        return new StatisticsReport(used, columns, Correlated(fit, columns), scope)
            .With([.. support.LeftOut, .. selection.LeftOut], selection.Steps, strangers, slips, scope.KeepSuspects ? [] : strange);
    }

    private DegreeSelection Selection(MeasuredFamily clean, Support support) => new(clean, support.Columns, scope.PinnedDegrees);

    private SpreadFit Correlated(SpreadFit fit, IReadOnlyList<ReadingColumn> columns) => scope.PinnedCorrelations is { } pinned
        ? CorrelationSelection.Pin(fit, columns, pinned)
        : CorrelationSelection.Choose(fit, columns);

    private IEnumerable<ReadingColumn> Wanted() =>
    [
        .. from shape in Enum.GetValues<PressureShape>()
           from degree in Enumerable.Range(0, scope.PinnedDegrees.GetValueOrDefault(shape, MostDegrees[(int)shape]) + 1)
           select ReadingColumn.Of(shape, degree),
        ReadingColumn.PressureHysteresis,
        ReadingColumn.ThermalHysteresis,
    ];
}
