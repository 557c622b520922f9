using BandSpec.Core.Numerics.NestedModels;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Characterizing;

/// <summary>The measured units by lot, in the order in which lots and units first appear.</summary>
internal sealed class MeasuredFamily(IReadOnlyList<IReadOnlyList<MeasuredUnit>> lots)
{
    public IReadOnlyList<IReadOnlyList<MeasuredUnit>> Lots { get; } = lots;

    public IEnumerable<MeasuredUnit> Units => Lots.SelectMany(lot => lot);

    public IEnumerable<UnitReading> Readings => Units.SelectMany(unit => unit.Readings);

    public static MeasuredFamily Of(IEnumerable<UnitReading> readings, Temperature reference) => new(
        [.. readings.GroupBy(r => r.Lot).Select(lot => lot.GroupBy(r => r.Unit)
            .Select(unit => new MeasuredUnit(lot.Key, unit.Key, [.. unit.OrderBy(r => r.Cycle)], reference)).ToList())]);

    /// <summary>The readings of all units reduced to what the likelihood needs.</summary>
    public NestedSample Sample(IReadOnlyList<ReadingColumn> columns) => new(
        columns.Count, [.. Lots.Select(lot => lot.Select(unit => unit.Summary(columns)).ToList())]);

    /// <summary>The family without some units; a lot without units is gone.</summary>
    public MeasuredFamily Without(Func<MeasuredUnit, bool> excluded) =>
        new([.. Lots.Select(lot => lot.Where(unit => !excluded(unit)).ToList()).Where(lot => lot.Count > 0)]);

    /// <summary>The family without some readings; a unit without readings is gone.</summary>
    public MeasuredFamily Without(IReadOnlySet<UnitReading> excluded) => new MeasuredFamily(
        [.. Lots.Select(lot => lot.Select(unit => unit.Without(excluded)).ToList())]).Without(unit => unit.Readings.Count == 0);
}
