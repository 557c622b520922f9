using BandSpec.Core.Characterizing;
using BandSpec.Core.Quantities;
using BandSpec.Files.Forms;
using BandSpec.Files.Inputs;

namespace BandSpec.Files.Readings;

/// <summary>
/// Files of readings of units in an ageing test. Columns: <c>unit</c>, <c>storage</c> (temperature), <c>stored</c> (time), <c>pressure</c> or
/// <c>pressure-fraction</c>, <c>error</c> or <c>reading</c>; in any order, others are passed over.
/// </summary>
public static class StorageReadings
{
    /// <summary>Reads a file.</summary>
    /// <param name="content">The file.</param>
    /// <param name="format">What its header does not say.</param>
    public static ReadingsSet<DriftReading> Read(InputContent content, ReadingsFormat format)
    {
        ArgumentNullException.ThrowIfNull(content);
        ArgumentNullException.ThrowIfNull(format);
        return ReadingTable.Read(
            content, format, [[ReadingField.Unit], [ReadingField.Storage], [ReadingField.Stored], .. MeasuredError.Columns],
            (table, row) => Make(table, row, format));
    }

    private static DriftReading? Make(ReadingTable table, ReadingRow row, ReadingsFormat format)
    {
        if (row.Quantity<Temperature>(table, ReadingField.Storage, QuantityForms.Temperature) is not { } storage
            || row.Quantity<Duration>(table, ReadingField.Stored, QuantityForms.Time) is not { } stored
            || MeasuredError.Read(table, row, format) is not { } measured)
            return null;
        return new DriftReading
        {
            Unit = row.TextOf(table.IndexOf(ReadingField.Unit)),
            Storage = storage,
            Stored = stored,
            PressureFraction = measured.Fraction,
            Error = measured.Error,
            Line = row.Line,
        };
    }
}
