using System.Globalization;
using BandSpec.Documents.Charts;
using BandSpec.Documents.Model;
using BandSpec.Documents.Templates;

namespace BandSpec.Documents.Judging;

/// <summary>The judgement of a lot as blocks: the answer first, then the tables, the charts, and what it rests on.</summary>
internal sealed class JudgementComposer
{
    private const string Percent = "%FS";
    private readonly JudgementView view;
    private readonly Words words;
    private int tables, figures;

    private JudgementComposer(JudgementView view, Words words) => (this.view, this.words) = (view, words);

    public static Document Compose(JudgementView view, Words words, DateOnly date, DocumentOptions options)
    {
        JudgementComposer composer = new(view, words);
        return new Document(
            composer.Frame(date, options),
            [
                .. composer.Front(date), .. composer.Capability(), .. composer.Charts(), .. composer.NotPassed(), .. composer.Reading(),
                composer.Chapter(5, "judge.method"), .. words.Paragraphs("judge.method-text").Select(p => new Paragraph(p)),
                composer.Chapter(6, "cautions.heading"), new Bullets(words.Paragraphs("judge.cautions")),
            ]);
    }

    private Frame Frame(DateOnly date, DocumentOptions options) => new(
        words.Plain("judge.subject"), options.Program, words.Plain("judge.subject"), options.Language, date,
        view.Specification, view.Title, words.Plain("judge.footer", ("date", Written(date))), words.Plain("page-of"), words.Plain("continued"),
        new Stamp(Standing.Plain, "", ""));

    private IEnumerable<Block> Front(DateOnly date)
    {
        yield return new TitleBlock(words["judge.kind"], view.Title.Length > 0 ? view.Title : view.Specification, words["judge.subtitle"],
        [
            Fact("specification", view.Specification), Fact("date", Written(date)), Fact("units", view.Units.All), Fact("readings", view.Readings),
            Fact("lots", view.Lots.Length > 0 ? view.Lots : words["judge.no-lots"]), Fact("files", string.Join(", ", view.Files.Select(f => f.Name))),
        ]);
        yield return new Paragraph(words["judge.promise"], Voice.Lead);
        yield return new Headline([Key("verdict"), Key("pass"), Key("sample"), Key("long-run")]);
        yield return new Callout(
            view.Verdict == "missed" ? Tone.Refusal : view.Verdict == "met" ? Tone.Caution : Tone.Assurance, words["judge.answer-title"],
            words.Paragraphs("judge.answer"));
    }

    private IEnumerable<Block> Capability()
    {
        yield return Chapter(1, "judge.capability");
        yield return new Paragraph(words["judge.capability-text"]);
        yield return Table("judge.within-table",
            [
                Column("characteristic"), Column("tolerance", Align.Decimal, "±" + Percent), Column("count", Align.Decimal), Column("mean", Align.Decimal, Percent),
                Column("deviation", Align.Decimal, Percent), Column("cp", Align.Decimal), Column("lower-limit", Align.Decimal), Column("cpk", Align.Decimal),
                Column("lower-limit", Align.Decimal), Column("normal"), Column("standing"), Column("more", Align.Decimal),
            ],
            view.Characteristics.Select(c => new Row([
                Name(c), c.Tolerance, c.Count, c.Mean, .. Figures(c.Within), Normal(c.Within), Verdict(c.Within), c.Within?.More ?? ""])),
            words["judge.within-remark"]);
        yield return Table("judge.overall-table",
            [
                Column("characteristic"), Column("deviation", Align.Decimal, Percent), Column("pp", Align.Decimal), Column("lower-limit", Align.Decimal),
                Column("ppk", Align.Decimal), Column("lower-limit", Align.Decimal), Column("outside-count", Align.Decimal),
                Column("outside-up-to", Align.Decimal, "%"), Column("normal"), Column("standing"), Column("more", Align.Decimal),
            ],
            view.Characteristics.Select(c => new Row([
                Name(c), .. Figures(c.Overall), c.Outside, c.OutsideUpTo, Normal(c.Overall), Verdict(c.Overall), c.Overall?.More ?? ""])),
            words["judge.overall-remark"]);
        CharacteristicView[] free = [.. view.Characteristics.Where(c => c.Within is { ByPercentiles: true } || c.Overall is { ByPercentiles: true })];
        if (free.Length > 0)
            yield return Percentiles(free);
        CharacteristicView[] odd = [.. view.Characteristics.Where(c => c.Outliers.Length > 0)];
        if (odd.Length == 0)
            yield break;
        yield return new Heading(2, "", words["judge.outliers"]);
        yield return new Paragraph(words["judge.outliers-text"]);
        yield return new Bullets([.. odd.Select(c => Name(c) + ": " + c.Outliers)]);
    }

    private Table Percentiles(CharacteristicView[] free) => Table("judge.percentile-table",
        [
            Column("characteristic"), new Column("0.135 %", Align.Decimal, Percent), Column("median", Align.Decimal, Percent),
            new Column("99.865 %", Align.Decimal, Percent), Column("pp", Align.Decimal), Column("ppk", Align.Decimal), Column("lower-limit", Align.Decimal),
            Column("by-normal-law", Align.Decimal),
        ],
        free.Select(c => new Row([
            Name(c), c.Percentiles!.Low, c.Percentiles.Median, c.Percentiles.High, c.Percentiles.Spread,
            c.Percentiles.Nearer + (c.Percentiles.Few ? "\u00a0*" : ""), c.Percentiles.NearerLower, c.Overall!.Nearer])),
        words.Say("judge.percentile-remark", ("few", free.Any(c => c.Percentiles!.Few))));

    private IEnumerable<Block> Charts()
    {
        yield return Chapter(2, "judge.charts");
        yield return new Paragraph(words["judge.charts-text"]);
        LotWords axis = new(
            Word("axis-order"), Word("axis-share"), words.Plain("axis.error"), Word("key-tolerance"), Word("key-acceptance"), Word("key-values"),
            Word("key-mean"), Word("key-normal"));
        foreach ((CharacteristicView c, int index) in view.Characteristics.Select((c, i) => (c, i)).Where(pair => pair.c.Values is not null))
        {
            (string, object)[] about =
            [
                ("name", Name(c).Plain), ("place", Place(c)), ("tolerance", c.Tolerance), ("count", c.Count), ("mean", c.Mean), ("outside", c.Outside),
            ];
            yield return new Figure(
                words.Plain("figure-label", ("number", ++figures)), words.Say("judge.figure", about), words.Plain("judge.figure-text", about),
                new LotChart(axis, c.Values!) { DecimalSign = words.Plain("decimal-sign") }, FileName(c, index));
        }
    }

    private IEnumerable<Block> NotPassed()
    {
        yield return Chapter(3, "judge.units");
        yield return new Paragraph(words.Say("judge.units-text", ("shown", view.NotPassed.Count)));
        if (view.NotPassed.Count > 0)
            yield return Table("judge.units-table", [Column("serial"), Column("standing"), Column("reasons", Align.Left, Percent), Column("missing")],
                view.NotPassed.Select(u => new Row([u.Serial, words["judge.unit-" + u.Verdict], u.Reasons, u.Missing])));
    }

    private IEnumerable<Block> Reading()
    {
        yield return Chapter(4, "judge.reading");
        yield return Table("judge.files-table", [Column("file"), Column("lines", Align.Decimal), Column("layout")],
            view.Files.Select(f => new Row([f.Name, f.Lines, f.Layout])));
        yield return view.Faults.Count == 0
            ? new Paragraph(words["judge.no-faults"])
            : Table("judge.faults-table", [Column("fault"), Column("lines", Align.Decimal), Column("places")],
                view.Faults.Select(f => new Row([words["judge.fault-" + f.Kind], f.Count, f.Places])), words["judge.faults-remark"]);
    }

    private static Phrase[] Figures(CapabilityView? c) =>
        c is null ? ["–", "–", "–", "–", "–"] : [c.Deviation, c.Spread, c.SpreadLower, c.Nearer, c.NearerLower];

    private Phrase Normal(CapabilityView? c) => words["judge.normal-" + (c?.Normal ?? "unknown")];

    private Phrase Verdict(CapabilityView? c) =>
        c is null ? words["judge.standing-unknown"] : words["judge.standing-" + c.Standing] + (c.ByPercentiles ? "\u00a0*" : "");

    private Phrase Name(CharacteristicView c) => c.Derived ? words["judge.derived-" + c.Name] + $", {c.Place.Temperature}" : c.Name;

    private string Place(CharacteristicView c) => c.Derived ? "" : string.Join(", ", new[]
    {
        c.Place.Temperature, c.Place.Pressure, c.Place.Direction.Length > 0 ? words.Plain("direction." + c.Place.Direction) : "",
    }.Where(part => part.Length > 0));

    /// <summary>A name that is safe on any disk and tells the characteristic, its number first.</summary>
    private static string FileName(CharacteristicView c, int index)
    {
        string name = $"{c.Name}{(c.Derived ? "-" + c.Place.Temperature : "")}";
        string safe = string.Concat(name.Select(letter => char.IsAsciiLetterOrDigit(letter) ? letter : letter == '\u2212' || letter == '-' ? '-' : '_'));
        string joined = string.Join('_', safe.Split('_', StringSplitOptions.RemoveEmptyEntries));
        return string.Create(CultureInfo.InvariantCulture, $"{index + 1:00}-{joined[..Math.Min(60, joined.Length)]}.svg");
    }

    private Heading Chapter(int number, string key) => new(1, $"{number}", words[key]);

    private Table Table(string key, IReadOnlyList<Column> columns, IEnumerable<Row> rows, Phrase? remark = null) =>
        new(words.Plain("table-label", ("number", ++tables)), words[key], columns, [.. rows], remark);

    private Column Column(string key, Align align = Align.Left, string unit = "") => new(words["judge.column-" + key], align, unit);

    private Fact Fact(string key, Phrase value) => new(words["judge.fact-" + key], value);

    private KeyFigure Key(string key) => new(words["judge.key-" + key], words[$"judge.key-{key}-value"], words[$"judge.key-{key}-remark"]);

    private string Word(string key) => words.Plain("judge." + key);

    private static string Written(DateOnly date) => date.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);
}
