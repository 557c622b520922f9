using System.Text;
using BandSpec.Documents.Model;

namespace BandSpec.Documents.Markdown;

/// <summary>Tables as pipe tables, padded so that they read as tables in plain text too.</summary>
internal static class MarkdownTable
{
    public static string Of(Table table)
    {
        var head = table.Columns.Select(Title).ToList();
        var rows = table.Rows.Select(r => Cells(r, table.Columns.Count)).ToList();
        return Rows([.. table.Columns.Select(c => c.Align)], [head, .. rows]);
    }

    public static string Of(Headline headline) => Rows(
        [.. headline.Figures.Select(_ => Align.Left)],
        [
            [.. headline.Figures.Select(f => MarkdownText.OneLine(f.Name))],
            [.. headline.Figures.Select(f => MarkdownText.OneLine(f.Value.In(Lettering.Bold)))],
            [.. headline.Figures.Select(f => MarkdownText.OneLine(f.Remark))],
        ]);

    private static string Title(Column column) =>
        (column.Group.Length == 0 ? "" : MarkdownText.Escape(column.Group) + ": ")
        + MarkdownText.OneLine(column.Title)
        + (column.Unit.Length == 0 ? "" : ", " + MarkdownText.Escape(column.Unit));

    private static List<string> Cells(Row row, int count)
    {
        if (row.Kind == RowKind.Section) return [
            MarkdownText.OneLine(row.Cells[0].In(Lettering.Bold)), .. Enumerable.Repeat("", count - 1)];
        return [.. row.Cells.Select(c => MarkdownText.OneLine(row.Kind == RowKind.Total ? c.In(Lettering.Bold) : c))];
    }

    private static string Rows(IReadOnlyList<Align> aligns, IReadOnlyList<IReadOnlyList<string>> rows)
    {
        var widths = aligns.Select((_, i) => Math.Max(3, rows.Max(r => r[i].Length))).ToList();
        var text = new StringBuilder();
        for (int r = 0; r < rows.Count; r++)
        {
            text.Append("| ").AppendJoin(" | ", rows[r].Select((cell, i) => Pad(cell, widths[i], aligns[i]))).Append(" |\n");
            if (r == 0) text.Append("| ").AppendJoin(" | ", aligns.Select((a, i) => Rule(a, widths[i]))).Append(" |\n");
        }
        return text.ToString().TrimEnd('\n');
    }

    private static string Pad(string cell, int width, Align align) =>
        align is Align.Right or Align.Decimal ? cell.PadLeft(width) : cell.PadRight(width);

    private static string Rule(Align align, int width) => align switch
    {
        Align.Left => new string('-', width),
        Align.Centre => ":" + new string('-', width - 2) + ":",
        _ => new string('-', width - 1) + ":",
    };
}
