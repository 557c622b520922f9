using BandSpec.Core.Characterizing;
using BandSpec.Core.Quantities;
using BandSpec.Core.TestLimits;
using BandSpec.Files.Csv;
using BandSpec.Files.Forms;
using BandSpec.Files.Inputs;

namespace BandSpec.Files.Readings;

/// <summary>
/// Files of readings of uncompensated units. Columns: <c>unit</c>, <c>temperature</c>, <c>pressure</c> or <c>pressure-fraction</c>,
/// <c>error</c> or <c>reading</c>, and if noted <c>lot</c>, <c>direction</c> (rising, falling) and <c>cycle</c>; in any order, others are passed over.
/// </summary>
public static class FamilyReadings
{
    /// <summary>Reads a file.</summary>
    /// <param name="content">The file.</param>
    /// <param name="format">What its header does not say.</param>
    public static ReadingsSet<UnitReading> Read(InputContent content, ReadingsFormat format)
    {
        ArgumentNullException.ThrowIfNull(content);
        ArgumentNullException.ThrowIfNull(format);
        return ReadingTable.Read(
            content, format, [[ReadingField.Unit], [ReadingField.Temperature], .. MeasuredError.Columns], (table, row) => Make(table, row, format));
    }

    private static UnitReading? Make(ReadingTable table, ReadingRow row, ReadingsFormat format)
    {
        if (row.Quantity<Temperature>(table, ReadingField.Temperature, QuantityForms.Temperature) is not { } temperature
            || MeasuredError.Read(table, row, format) is not { } measured
            || Cycle(table, row) is not { } cycle
            || !TryDirection(table, row, out PressureDirection? direction))
            return null;
        return new UnitReading
        {
            Lot = table.Has(ReadingField.Lot) ? row.TextOf(table.IndexOf(ReadingField.Lot)) : "",
            Unit = row.TextOf(table.IndexOf(ReadingField.Unit)),
            Temperature = temperature,
            PressureFraction = measured.Fraction,
            Direction = direction,
            Cycle = cycle,
            Error = measured.Error,
            Line = row.Line,
        };
    }

    private static int? Cycle(ReadingTable table, ReadingRow row) =>
        !table.Has(ReadingField.Cycle) ? 1 : row.Number(table, ReadingField.Cycle) is { } cycle ? (int)Math.Clamp(cycle, 0, int.MaxValue) : null;

    private static bool TryDirection(ReadingTable table, ReadingRow row, out PressureDirection? direction)
    {
        direction = null;
        if (!table.Has(ReadingField.Direction) || row.TextOf(table.IndexOf(ReadingField.Direction)) is not { Length: > 0 } word
            || DirectionWords.TryRead(word, out direction))
            return true;
        table.Complain(row, ReadingField.Direction, "direction", $"`{Form.Shorten(word)}`", "rising or falling, or nothing when it was not noted");
        return false;
    }
}
