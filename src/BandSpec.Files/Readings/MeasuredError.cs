using BandSpec.Core.Quantities;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Readings;

/// <summary>The two figures that every reading has: the pressure fraction and the error.</summary>
internal static class MeasuredError
{
    /// <summary>The columns that they need.</summary>
    public static IReadOnlyList<ReadingField[]> Columns { get; } =
        [[ReadingField.Pressure, ReadingField.PressureFraction], [ReadingField.Error, ReadingField.Reading]];

    /// <summary>Reads both; null when a cell was at fault.</summary>
    public static (double Fraction, PercentOfSpan Error)? Read(ReadingTable table, ReadingRow row, ReadingsFormat format) =>
        Fraction(table, row, format) is { } fraction && Error(table, row, format, fraction) is { } error ? (fraction, error) : null;

    private static double? Fraction(ReadingTable table, ReadingRow row, ReadingsFormat format)
    {
        if (table.Has(ReadingField.PressureFraction))
            return row.Number(table, ReadingField.PressureFraction);
        if (row.Quantity<Pressure>(table, ReadingField.Pressure, QuantityForms.Pressure) is not { } pressure)
            return null;
        if (format.Range is { } range)
            return (pressure.Pascals - range.Lower.Pascals) / range.SpanInPascals;
        table.ComplainOfColumn(
            ReadingField.Pressure, "no-range", "pressures of a range that is not known", "the range of the readings, such as `--range \"0 bar..25 bar\"`");
        return null;
    }

    private static PercentOfSpan? Error(ReadingTable table, ReadingRow row, ReadingsFormat format, double fraction)
    {
        if (table.Has(ReadingField.Error))
            return row.Quantity<PercentOfSpan>(table, ReadingField.Error, QuantityForms.Error);
        if (row.Number(table, ReadingField.Reading) is not { } reading)
            return null;
        string unit = table.UnitOf(ReadingField.Reading);
        if (format.Output is { } output && (unit.Length == 0 || unit == output.Unit))
            return PercentOfSpan.FromPercent(output.ErrorOf(reading, fraction));
        table.ComplainOfColumn(
            ReadingField.Reading, "no-output", format.Output is null ? "readings whose nominal value is not known" : $"readings in {unit}",
            format.Output is { } known ? $"readings in {known.Unit}" : "the nominal output, such as `--output \"0 mV..100 mV\"`, or a column `error [%FS]`");
        return null;
    }
}
