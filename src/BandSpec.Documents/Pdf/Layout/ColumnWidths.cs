using BandSpec.Documents.Model;

namespace BandSpec.Documents.Pdf.Layout;

/// <summary>
/// The column widths of a table, and where in a column the decimal points stand. Widths are without the gaps between columns.
/// </summary>
internal sealed class ColumnWidths
{
    private const double MostSpare = 40;

    private readonly Table _table;

    public ColumnWidths(Table table, double width)
    {
        _table = table;
        var room = width - Look.ColumnGap * (table.Columns.Count - 1);
        Fractions = [.. table.Columns.Select((c, i) => c.Align == Align.Decimal ? Cells(i).Max(FractionWidth) : 0)];
        Widths = WithRest(
            Share([.. table.Columns.Select((_, i) => Narrowest(i))], [.. table.Columns.Select((_, i) => Natural(i))], room), room);
        Lefts = [.. Enumerable.Range(0, Widths.Count).Select(i => Widths.Take(i).Sum() + i * Look.ColumnGap)];
    }

    public IReadOnlyList<double> Widths { get; }

    /// <summary>Width of the whole table: narrower than the text where its columns need no more.</summary>
    public double Total => Lefts[^1] + Widths[^1];

    public IReadOnlyList<double> Lefts { get; }

    /// <summary>Width of the widest fraction in a decimal column, its point included.</summary>
    public IReadOnlyList<double> Fractions { get; }

    public static double FractionWidth(Phrase cell)
    {
        var text = cell.Plain;
        var point = text.LastIndexOfAny(['.', ',']);
        return point < 0 ? 0 : Fonts.Typeface.Of(Look.Cell.Face).Width(text[point..], Look.Cell.Size);
    }

    // Totals are set in stronger letters, which are wider.
    private bool HasTotals => _table.Rows.Any(r => r.Kind == RowKind.Total);

    private IEnumerable<Phrase> Cells(int column) =>
        _table.Rows.Where(r => r.Kind != RowKind.Section).Select(r => r.Cells[column]).DefaultIfEmpty(Phrase.Empty);

    private double Narrowest(int i) => Measure(i, LineBreaker.WidestWord);

    private double Natural(int i) => Measure(i, LineBreaker.NaturalWidth);

    private double Measure(int i, Func<Phrase, TextStyle, double> measure)
    {
        var column = _table.Columns[i];
        var head = Math.Max(measure(column.Title, Look.HeadCell), measure(column.Unit, Look.UnitCell));
        var body = column.Align == Align.Decimal
            ? Cells(i).Max(c => LineBreaker.NaturalWidth(c, Look.Cell) - FractionWidth(c)) + Fractions[i]
            : Cells(i).Max(c => measure(c, HasTotals ? Look.HeadCell with { Size = Look.Cell.Size } : Look.Cell));
        return Math.Max(head, body);
    }

    // A last column of text takes what is left; a table of figures stays as narrow as it reads best.
    private double[] WithRest(double[] widths, double room)
    {
        if (_table.Columns[^1].Align == Align.Left) widths[^1] += Math.Max(0, room - widths.Sum());
        return widths;
    }

    // Room to spare goes to all columns alike, up to what the eye bridges; lack of room is taken from the columns that can be broken.
    private static double[] Share(double[] narrowest, double[] natural, double room)
    {
        double least = narrowest.Sum(), most = natural.Sum();
        if (most <= room) return [.. natural.Select(w => w + Math.Min(MostSpare, (room - most) / natural.Length))];
        if (least >= room) return [.. narrowest.Select(w => w * room / least)];
        var share = (room - least) / (most - least);
        return [.. narrowest.Zip(natural, (few, many) => few + share * (many - few))];
    }
}
