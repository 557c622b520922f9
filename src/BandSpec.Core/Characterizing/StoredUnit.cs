using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Numerics.NestedModels;

namespace BandSpec.Core.Characterizing;

/// <summary>One unit of an ageing test with its readings.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Readings">Its readings.</param>
internal sealed record StoredUnit(string Name, IReadOnlyList<DriftReading> Readings)
{
    /// <summary>The unit's own zero and span at the beginning, which the drift is counted from.</summary>
    private const int OwnStart = 2;

    public static IReadOnlyList<StoredUnit> Of(IEnumerable<DriftReading> readings) =>
        [.. readings.GroupBy(r => r.Unit).Select(unit => new StoredUnit(unit.Key, [.. unit.OrderBy(r => r.Stored)]))];

    /// <summary>
    /// The readings as <c>c_0 + c_1x + (z + sx)f + ε</c>, cleared of the unit's own <c>c_0</c> and <c>c_1</c>, reduced to what the likelihood
    /// of drift <c>z</c>, <c>s</c> needs.
    /// </summary>
    public UnitSummary Summary(DriftLaw law)
    {
        Grid rows = new(Readings.Count, OwnStart + 3);
        for (int i = 0; i < Readings.Count; i++)
        {
            DriftReading reading = Readings[i];
            double x = reading.PressureFraction, f = law.At(reading.Storage, reading.Stored);
            ((ReadOnlySpan<double>)[1, x, f, x * f, reading.Error.Percent]).CopyTo(rows.Row(i));
        }

        return UnitSummary.From(rows).WithoutLeading(OwnStart);
    }
}
