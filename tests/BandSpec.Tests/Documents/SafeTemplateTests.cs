using BandSpec.Documents.Templates;
using Scriban.Runtime;
using Xunit;

namespace BandSpec.Tests.Documents;

/// <summary>A template writes text and can do nothing else; what it tries beyond that ends in an error that names the place.</summary>
public sealed class SafeTemplateTests
{
    private static readonly ScriptObject View = MakeView();

    [Theory]
    [InlineData("a value", "{{ title }}", "Brine")]
    [InlineData("a loop", "{{ for p in points }}{{ p.id }};{{ end }}", "V01;V02;")]
    [InlineData("a variable of its own", "{{ n = 0 }}{{ for p in points }}{{ n = n + 1 }}{{ end }}{{ n }}", "2")]
    [InlineData("a condition", "{{ if feasible }}yes{{ else }}no{{ end }}", "yes")]
    public void Writes(string what, string text, string expected) =>
        Assert.True(Render(text) == expected, what);

    [Theory]
    [InlineData("{{ while true }}{{ end }}")]
    [InlineData("{{ for i in 1..2000000000 }}{{ end }}")]
    [InlineData("{{ for i in 1..500 }}{{ for k in 1..500 }}{{ end }}{{ end }}")]
    [InlineData("{{ func f(x) }}{{ f x }}{{ end }}{{ f 1 }}")]
    [InlineData("{{ s = 'x' }}{{ for i in 1..40 }}{{ s = s + s }}{{ end }}")]
    [InlineData("{{ 'x' | string.pad_left 2000000000 }}")]
    [InlineData("{{ include 'other.txt' }}")]
    [InlineData("{{ unknown }}")]
    [InlineData("{{ title.nothing.more }}")]
    [InlineData("{{ title.get_type }}")]
    [InlineData("{{ date.now }}")]
    [InlineData("{{ math.random 1 5 }}")]
    [InlineData("{{ math.uuid }}")]
    [InlineData("{{ object.eval '1 + 1' }}")]
    [InlineData("{{ object.eval_template '{{ 1 }}' }}")]
    [InlineData("{{ points[0].id = 'V99' }}")]
    [InlineData("{{ math.pi = 3 }}")]
    [InlineData("{{ if feasible }}never closed")]
    [InlineData("{{ end }}")]
    [InlineData("{{ title }} \0 the rest")]
    [InlineData("{{ ('a' | string.repeat 30) + '!' | regex.match '^(a+)+$' }}")]
    public void Refuses_with_file_line_and_column(string hostile)
    {
        var fault = Assert.Throws<TemplateException>(() => Render("first line\n" + hostile));
        Assert.Matches(@"^layout\.txt:\d+:\d+: .+\.$", fault.Message);
        Assert.Equal(2, fault.Line);
    }

    [Fact]
    public void Says_in_plain_words_that_one_template_cannot_include_another() => Assert.Equal(
        "layout.txt:1:4: a template cannot include another, `/etc/hostname`.", Assert.Throws<TemplateException>(() => Render("{{ include '/etc/hostname' }}")).Message);

    [Fact]
    public void Leaves_its_own_text_alone_and_escapes_values() =>
        Assert.Equal(
            "<b>&lt;Brine&gt;</b>", new SafeTemplate("t", "<b>{{ '<Brine>' }}</b>").Render(View, System.Security.SecurityElement.Escape));

    [Fact]
    public void Stops_at_more_letters_than_a_document_can_need() =>
        Assert.Throws<TemplateException>(() => Render("{{ for i in 1..90000 }}aaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaa{{ end }}"));

    private static string Render(string text) => new SafeTemplate("layout.txt", text).Render(View);

    private static ScriptObject MakeView()
    {
        var view = new ScriptObject { ["title"] = "Brine", ["feasible"] = true };
        view["points"] = new ScriptArray(new[] { "V01", "V02" }.Select(id => new ScriptObject { ["id"] = id, IsReadOnly = true })) { IsReadOnly = true };
        view.IsReadOnly = true;
        return view;
    }
}
