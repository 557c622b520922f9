using BandSpec.Documents.Templates;
using Xunit;

namespace BandSpec.Tests.Documents;

/// <summary>A company changes words, language and layouts by putting its own files before the built-in ones.</summary>
public sealed class TemplateFolderTests
{
    [Fact]
    public void A_word_file_of_one_s_own_goes_before_the_built_in_one()
    {
        var cautions = new Folder(("words/en/cautions.scriban", ":: cautions\nAsk {{ specification.prepared_by }} *first*."));
        Assert.Contains("- Ask Application engineering *first*.", Markdown(cautions));
    }

    [Theory]
    [InlineData("words/en/cautions.scriban", ":: cautions\nfirst\n{{ specification.price }}", "own/words/en/cautions.scriban:3:18: ")]
    [InlineData("words/en/cautions.scriban", ":: cautions\n{{ if feasible }}never closed", "own/words/en/cautions.scriban:2:")]
    [InlineData("words/en/cautions.scriban", "no entry", "own/words/en/cautions.scriban:1:1: A word file begins with")]
    [InlineData("words/en/cautions.scriban", ":: cautions\none\n:: cautions\ntwo", "own/words/en/cautions.scriban:3:1: The entry 'cautions' stands here a second time.")]
    [InlineData("words/en/cautions.scriban", ":: caution\none", "words/en:1:1: The entry 'cautions' is missing.")]
    [InlineData("words/en/cautions.scriban", ":: cautions\na *mark left open", "own/words/en/cautions.scriban:1:1: A mark is opened and not closed")]
    public void A_mistake_is_told_with_file_line_and_column(string path, string text, string expected) =>
        Assert.StartsWith(expected, Assert.Throws<TemplateException>(() => Markdown(new Folder((path, text)))).Message);

    [Fact]
    public void A_language_that_nobody_wrote_is_told_so() =>
        Assert.Contains(
            "the language 'fr' is not known",
            Assert.Throws<TemplateException>(() => Drafts.Draw(Drafts.Feasible, Drafts.Options with { Language = "fr" })).Message);

    [Fact]
    public void The_built_in_languages_have_the_same_entries()
    {
        static IEnumerable<string> Keys(string language) => BuiltInTemplates.Instance.Files($"words/{language}")
            .SelectMany(path => WordSection.Cut(path, BuiltInTemplates.Instance.Read(path)!).Select(s => $"{Path.GetFileName(path)} {s.Key}")).Order(StringComparer.Ordinal);
        Assert.Equal(Keys("en"), Keys("de"));
    }

    [Theory]
    [InlineData("{{ for p in points }}{{ p.id }} {{ p.lower }} {{ p.nominal }} {{ p.upper }}\n{{ end }}", null)]
    [InlineData("{{ for p in points limit:5 }}{{ p.id }} {{ p.lower }} {{ p.upper }}\n{{ end }}", "the point V06 is missing")]
    [InlineData("{{ for p in points reversed }}{{ p.id }} {{ p.lower }} {{ p.upper }}\n{{ end }}", "the point V02 stands out of order")]
    [InlineData("{{ for p in points }}{{ p.id }} {{ p.lower | string.replace '.' ',' }} {{ p.upper }}\n{{ end }}", "the point V01 lacks its lower limit")]
    [InlineData("{{ for p in points }}{{ p.id }} {{ p.lower }} {{ (p.upper | string.to_double) + 0.001 }}\n{{ end }}", "the point V01 lacks its upper limit")]
    [InlineData("{{ for p in points }}{{ p.id }} {{ p.lower }}\n{{ end }}", "the point V01 lacks its upper limit")]
    public void A_layout_that_drops_a_point_or_changes_a_figure_is_caught(string layout, string? expected)
    {
        var folder = new Folder(("limits/mine.txt.scriban", layout));
        if (expected is null)
            Assert.Contains("mine.txt", Drafts.Draw(Drafts.Feasible, Drafts.Options with { Templates = folder }).Keys);
        else
            Assert.Contains(
                $"In mine.txt, which this layout writes, {expected}", Assert.Throws<TemplateException>(() => Markdown(folder)).Message);
    }

    [Fact]
    public void A_layout_that_writes_broken_xml_is_caught()
    {
        var folder = new Folder(("limits/mine.xml.scriban", "<p>{{ for p in points }}{{ p.id }} {{ p.lower }} {{ p.upper }}\n{{ end }}</q>"));
        Assert.Contains("does not write well-formed XML", Assert.Throws<TemplateException>(() => Markdown(folder)).Message);
    }

    private static string Markdown(Folder folder) =>
        System.Text.Encoding.UTF8.GetString(Drafts.Draw(Drafts.Feasible, Drafts.Options with { Templates = folder })["specification.md"]);

    private sealed class Folder(params (string Path, string Text)[] files) : ITemplateFolder
    {
        public string Name => "own";

        public string? Read(string path) => files.Where(f => f.Path == path).Select(f => f.Text).FirstOrDefault();

        public IReadOnlyList<string> Files(string folder) =>
            [.. files.Select(f => f.Path).Where(p => p.StartsWith(folder + "/", StringComparison.Ordinal))];
    }
}
