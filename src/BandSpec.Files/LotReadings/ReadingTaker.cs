using System.Globalization;
using BandSpec.Core.LotJudging;
using BandSpec.Core.TestLimits;
using BandSpec.Files.Csv;

namespace BandSpec.Files.LotReadings;

/// <summary>
/// Takes readings as text, finds their point, turns them into numbers of the right unit, and hands them to the collector; what is wrong with
/// a line is noted there.
/// </summary>
internal sealed class ReadingTaker(LotCollector collector, ReadingLayout layout, string file)
{
    /// <summary>An error that large makes a mixed-up unit worth asking for, %FS.</summary>
    private const double Absurd = 100;

    /// <summary>Error in percent of span that no instrument shows.</summary>
    private const double BeyondMeasure = 1e6;

    private readonly PointFinder points = new(collector.Limits);
    private readonly CultureInfo culture = layout.Culture;

    /// <summary>Readings whose cell named another unit and were converted.</summary>
    public long Converted { get; private set; }

    /// <summary>Takes one line.</summary>
    /// <param name="line">Line in the file, from 1.</param>
    /// <param name="serial">Serial number.</param>
    /// <param name="lot">Lot or day; empty without either.</param>
    /// <param name="point">Index of the point, or the negative answer of <see cref="PointFinder"/>.</param>
    /// <param name="pointText">What the point was found by, for faults.</param>
    /// <param name="number">The reading, when it is a plain number; else NaN.</param>
    /// <param name="text">The reading as it stands.</param>
    public void Take(
        long line, ReadOnlySpan<char> serial, ReadOnlySpan<char> lot, int point, ReadOnlySpan<char> pointText, double number, ReadOnlySpan<char> text)
    {
        if (serial.IsEmpty)
            Note(ReadingFault.NoSerial, line, pointText);
        else if (point < 0)
            Note(point == -2 ? ReadingFault.AmbiguousPoint : ReadingFault.UnknownPoint, line, pointText);
        else if (Number(number, text, line) is { } value)
            Add(line, serial, lot, point, value, text);
    }

    /// <summary>The index of the point with an id.</summary>
    public int PointById(ReadOnlySpan<char> id) => points.ById(id);

    /// <summary>The index of the point at a place, each given as text; −1 when one is not a number.</summary>
    public int PointAt(ReadOnlySpan<char> temperature, ReadOnlySpan<char> pressure, ReadOnlySpan<char> direction)
    {
        bool numbers = double.TryParse(temperature, NumberStyles.Float, culture, out double celsius)
            & double.TryParse(pressure, NumberStyles.Float, culture, out double value);
        return numbers && DirectionWords.TryRead(direction, out PressureDirection? side)
            ? points.ByPlace(celsius, value * layout.PressureUnit.Pascals, side)
            : -1;
    }

    /// <summary>Notes a fault of a line.</summary>
    public void Note(ReadingFault fault, long line, ReadOnlySpan<char> text) => collector.Faults.Add(fault, file, line, text);

    private void Add(long line, ReadOnlySpan<char> serial, ReadOnlySpan<char> lot, int point, double value, ReadOnlySpan<char> text)
    {
        double error = Math.Abs(collector.Limits.ErrorOf(point, value));
        if (error > Absurd && (LooksThousandfold(point, value) || !(error <= BeyondMeasure)))
        {
            Note(error <= BeyondMeasure ? ReadingFault.OtherUnit : ReadingFault.BeyondMeasure, line, text);
            return;
        }

        collector.Add(new LotReading { Serial = serial, Lot = lot, Point = point, Value = value, Line = line }, file);
    }

    /// <summary>Whether a thousandth or the thousandfold would be near the nominal output: millivolts among volts or the other way round.</summary>
    private bool LooksThousandfold(int point, double value) =>
        Math.Abs(collector.Limits.ErrorOf(point, value / 1000)) < 20 || Math.Abs(collector.Limits.ErrorOf(point, value * 1000)) < 20;

    /// <summary>A plain number in the unit of its column, or one with its own unit after it; otherwise a fault.</summary>
    private double? Number(double number, ReadOnlySpan<char> text, long line)
    {
        if (double.IsFinite(number))
            return number * layout.ReadingFactor;
        int end = text.Length;
        while (end > 0 && !char.IsAsciiDigit(text[end - 1]))
            end--;
        ReadOnlySpan<char> unit = text[end..].Trim();
        if (unit.IsEmpty || !double.TryParse(text[..end], NumberStyles.Float, culture, out double value) || !double.IsFinite(value))
        {
            Note(ReadingFault.NotANumber, line, text);
            return null;
        }

        if (OutputUnits.Factor(unit, collector.Limits.OutputUnit) is not { } factor)
        {
            Note(ReadingFault.OtherUnit, line, text);
            return null;
        }

        Converted += factor == 1 ? 0 : 1;
        return value * factor;
    }
}
