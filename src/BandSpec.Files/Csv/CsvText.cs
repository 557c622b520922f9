using System.Globalization;
using System.Text;

namespace BandSpec.Files.Csv;

/// <summary>
/// Writes rows of comma-separated values (RFC 4180), with a line feed at their end. A text that a spreadsheet would run as a formula, because it
/// begins with <c>=</c>, <c>+</c>, <c>-</c>, <c>@</c> or a tab, gets an apostrophe before it; numbers are not texts.
/// </summary>
internal sealed class CsvText
{
    private readonly StringBuilder text = new();
    private bool isFirst = true;

    /// <summary>Ends the row.</summary>
    internal CsvText End()
    {
        text.Append('\n');
        isFirst = true;
        return this;
    }

    /// <summary>Adds a text.</summary>
    internal CsvText Add(string value) => AddPlain(Cell(value));

    /// <summary>A text as it stands in a cell.</summary>
    internal static string Cell(string value)
    {
        string safe = value.Length > 0 && "=+-@\t\r".Contains(value[0], StringComparison.Ordinal) ? $"'{value}" : value;
        return safe.AsSpan().IndexOfAny("\",\r\n") >= 0 ? $"\"{safe.Replace("\"", "\"\"", StringComparison.Ordinal)}\"" : safe;
    }

    /// <summary>Adds a number in the shortest form that reads back the same.</summary>
    internal CsvText Add(double value) => AddPlain((value == 0 ? 0 : value).ToString(CultureInfo.InvariantCulture));

    /// <summary>The bytes of all rows.</summary>
    internal ReadOnlyMemory<byte> ToBytes() => Encoding.UTF8.GetBytes(text.ToString());

    private CsvText AddPlain(string field)
    {
        text.Append(isFirst ? "" : ",").Append(field);
        isFirst = false;
        return this;
    }
}
