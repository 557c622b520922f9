using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Numerics.NestedModels;
using BandSpec.Core.Quantities;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Characterizing;

/// <summary>One unit with its readings in the order of time, and from which side each temperature was reached.</summary>
internal sealed class MeasuredUnit
{
    private readonly int[] thermalSides;
    private readonly double referenceCelsius;

    public MeasuredUnit(string lot, string name, IReadOnlyList<UnitReading> readings, Temperature reference)
    {
        (Lot, Name, Readings) = (lot, name, readings);
        referenceCelsius = reference.Celsius;
        thermalSides = ThermalHistory.Sides(readings, reference);
    }

    public string Lot { get; }

    public string Name { get; }

    public IReadOnlyList<UnitReading> Readings { get; }

    /// <summary>Whether some temperature was reached from both sides.</summary>
    public bool ShowsThermalHysteresis => thermalSides.Contains(1) && thermalSides.Contains(-1);

    /// <summary>Whether some pressure was approached from both sides.</summary>
    public bool ShowsPressureHysteresis =>
        Readings.Any(r => r.Direction == PressureDirection.Rising) && Readings.Any(r => r.Direction == PressureDirection.Falling);

    /// <summary>The same unit without some of its readings.</summary>
    public MeasuredUnit Without(IReadOnlySet<UnitReading> excluded) => Readings.Any(excluded.Contains)
        ? new MeasuredUnit(Lot, Name, [.. Readings.Where(r => !excluded.Contains(r))], Temperature.FromCelsius(referenceCelsius))
        : this;

    /// <summary>One row a reading: the regressors of the columns, then the error in %FS.</summary>
    public Grid Rows(IReadOnlyList<ReadingColumn> columns)
    {
        Grid rows = new(Readings.Count, columns.Count + 1);
        for (int i = 0; i < Readings.Count; i++)
        {
            UnitReading reading = Readings[i];
            double tau = (reading.Temperature.Celsius - referenceCelsius) / 100;
            int pressureSide = reading.Direction switch
            {
                PressureDirection.Falling => 1,
                PressureDirection.Rising => -1,
                _ => 0,
            };
            for (int j = 0; j < columns.Count; j++)
                rows[i, j] = columns[j].At(reading.PressureFraction, tau, pressureSide, thermalSides[i]);
            rows[i, columns.Count] = reading.Error.Percent;
        }

        return rows;
    }

    /// <summary>The readings reduced to what the likelihood needs.</summary>
    public UnitSummary Summary(IReadOnlyList<ReadingColumn> columns) => UnitSummary.From(Rows(columns));
}
