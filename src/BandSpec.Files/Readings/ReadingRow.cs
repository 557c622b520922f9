using BandSpec.Files.Forms;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Readings;

/// <summary>One row of a file of readings.</summary>
/// <param name="line">Its line in the file, counted from 1.</param>
/// <param name="cells">Its cells as they were written.</param>
internal sealed class ReadingRow(int line, string[] cells)
{
    /// <summary>Its line in the file, counted from 1.</summary>
    internal int Line => line;

    /// <summary>How many cells it has.</summary>
    internal int Count => cells.Length;

    /// <summary>The text of a cell, without quotes and blanks around it.</summary>
    internal string TextOf(int index) => cells[index].Trim().Trim('"').Trim();

    /// <summary>Where a cell stands.</summary>
    internal Extent ExtentOf(int index)
    {
        int column = 1 + cells.Take(index).Sum(cell => cell.Length + 1);
        return new Extent(line, column, Math.Max(1, cells[index].Length));
    }

    /// <summary>
    /// A cell as a quantity, by the same rules as in an input file; a plain number gets the unit of its column. Null when it was at fault, and
    /// then that is among the findings.
    /// </summary>
    internal T? Quantity<T>(ReadingTable table, ReadingField field, Form form)
        where T : struct
    {
        int index = table.IndexOf(field);
        string text = TextOf(index), unit = table.UnitOf(field);
        bool isPlain = text.Length > 0 && Numbers.LengthOf(text) == text.Length;
        return (T?)form.Read(new ScalarNode(ExtentOf(index), isPlain && unit.Length > 0 ? $"{text} {unit}" : text, false), field.Name, table.Reading);
    }

    /// <summary>A cell as a number without a unit; null when it was at fault, and then that is among the findings.</summary>
    internal double? Number(ReadingTable table, ReadingField field)
    {
        if (Numbers.TryRead(TextOf(table.IndexOf(field)), out double number, out Misreading? why))
            return number;
        table.Complain(this, field, why.Rule, why.Found, why.Accepted);
        return null;
    }
}
