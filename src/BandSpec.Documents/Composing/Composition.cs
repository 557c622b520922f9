using BandSpec.Documents.Model;
using BandSpec.Documents.Printing;
using BandSpec.Documents.Templates;

namespace BandSpec.Documents.Composing;

/// <summary>
/// What every chapter needs: the rounded figures, the words about them, the charts, and the numbering of tables and figures.
/// </summary>
internal sealed class Composition(PrintView view, Words words, SpecificationCharts charts)
{
    private int _tables, _figures;

    public PrintView View { get; } = view;

    public Words Words { get; } = words;

    public SpecificationCharts Charts { get; } = charts;

    public Heading Chapter(int number, string key) => new(1, $"{number}", Words[key]);

    public Heading Section(string key) => new(2, "", Words[key]);

    public Table Table(Phrase caption, IReadOnlyList<Column> columns, IEnumerable<Row> rows, Phrase? remark = null) =>
        new(Words.Plain("table-label", ("number", ++_tables)), caption, columns, [.. rows], remark);

    public Figure Figure(string key, Charts.Chart chart, string file, params (string, object)[] more) =>
        new(Words.Plain("figure-label", ("number", ++_figures)), Words.Say(key, more), Words.Plain(key + "-text", more), chart, file);

    public Column Column(string key, Align align = Align.Left, string unit = "", string group = "") =>
        new(Words["column." + key], align, unit, group.Length == 0 ? "" : Words.Plain("column." + group));

    public Fact Fact(string key) => new(Words["fact." + key], Words[$"fact.{key}-value"]);

    public Fact Fact(string key, string value) => new(Words["fact." + key], value);

    public string Region(RegionView region) => RegionName(Words, region);

    public static string RegionName(Words words, RegionView region) => words.Plain("region-name", ("region", ViewForTemplates.Of(region)));

    public string Shown(Rounded figure) => figure.Shown(View.DecimalSign);
}
