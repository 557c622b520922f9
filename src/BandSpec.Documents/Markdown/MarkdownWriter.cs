using System.Text;
using BandSpec.Documents.Model;

namespace BandSpec.Documents.Markdown;

/// <summary>
/// The document as Markdown, the readable twin that shows in version control what changed from revision to revision: tables as pipe
/// tables, figures as links to their SVG files with their words, callouts as quotations. Page breaks and running headers fall away.
/// </summary>
internal sealed class MarkdownWriter
{
    private readonly StringBuilder _text = new();

    public static string Write(Document document)
    {
        var writer = new MarkdownWriter();
        if (document.Frame.Stamp is { Standing: not Standing.Plain } stamp) writer.Block(Stamped(stamp));
        foreach (var block in document.Blocks) writer.Write(block);
        return writer._text.ToString();
    }

    private static string Stamped(Stamp stamp) =>
        $"**{MarkdownText.Escape(stamp.Word)}**" + (stamp.Sentence.Length == 0 ? "" : " – " + MarkdownText.Escape(stamp.Sentence));

    private void Write(Block block)
    {
        switch (block)
        {
            case TitleBlock title: Write(title); break;
            case Heading heading: Block(new string('#', heading.Level + 1) + " " + Numbered(heading)); break;
            case Paragraph paragraph: Block(MarkdownText.Of(paragraph.Text)); break;
            case Bullets bullets: Block(Lines(bullets.Items.Select((item, i) => Mark(bullets, i) + MarkdownText.OneLine(item)))); break;
            case Facts facts: Write(facts.Items); break;
            case Headline headline: Block(MarkdownTable.Of(headline)); break;
            case Callout callout: Block(Quote(callout)); break;
            case Figure figure: Write(figure); break;
            case Table table: Write(table); break;
        }
    }

    private void Write(TitleBlock title)
    {
        Block("# " + MarkdownText.OneLine(title.Title));
        Block(MarkdownText.Of(title.Kind.In(Lettering.Bold)));
        if (!title.Subtitle.IsEmpty) Block(MarkdownText.Of(title.Subtitle));
        if (title.Identity.Count > 0) Write(title.Identity);
    }

    private void Write(IReadOnlyList<Fact> facts) =>
        Block(Lines(facts.Select(f => $"- {MarkdownText.OneLine(f.Name)}: {MarkdownText.OneLine(f.Value)}")));

    private void Write(Figure figure)
    {
        Block($"![{MarkdownText.Escape(figure.Alternative).ReplaceLineEndings(" ")}]({figure.FileName})");
        Block(Label(figure.Label, figure.Caption));
    }

    private void Write(Table table)
    {
        Block(Label(table.Label, table.Caption));
        Block(MarkdownTable.Of(table));
        if (!table.Remark.IsEmpty) Block(MarkdownText.Of(table.Remark));
    }

    private static string Label(string label, Phrase caption) =>
        $"**{MarkdownText.Escape(label)}** {MarkdownText.OneLine(caption)}".TrimStart();

    private static string Numbered(Heading heading) =>
        (MarkdownText.Escape(heading.Number) + " " + MarkdownText.OneLine(heading.Text)).TrimStart();

    private static string Quote(Callout callout) =>
        "> " + string.Join(
            "\n>\n> ", callout.Paragraphs.Prepend(callout.Title.In(Lettering.Bold)).Where(p => !p.IsEmpty).Select(MarkdownText.OneLine));

    private static string Mark(Bullets bullets, int index) => bullets.Numbered ? $"{index + 1}. " : "- ";

    private static string Lines(IEnumerable<string> lines) => string.Join('\n', lines);

    private void Block(string text)
    {
        if (_text.Length > 0) _text.Append('\n');
        _text.Append(text).Append('\n');
    }
}
