using BandSpec.Documents.Markdown;
using BandSpec.Documents.Model;
using Snapshooter.Xunit3;
using Xunit;

namespace BandSpec.Tests.Documents;

public sealed class MarkdownWriterTests
{
    [Fact]
    public void The_sample_reads_well() => Snapshot.Match(MarkdownWriter.Write(SampleDocument.Brief()));

    [Theory]
    [InlineData("a*b_c|d<e>[f]#g & `h`~", @"a\*b\_c\|d\<e\>\[f\]#g &amp; \`h\`\~")]
    [InlineData("# not a heading", @"\# not a heading")]
    public void Text_stays_text(string text, string expected) => Assert.Equal(expected, MarkdownText.Escape(text));

    [Fact]
    public void Emphasis_beside_signs_is_written_so_that_every_reader_sees_it() =>
        Assert.Equal(
            "**bold** **±1** a<i>(x)</i>b C<sub>pk</sub> 10<sup>−5</sup>",
            MarkdownText.OneLine(Markup.Parse("**bold** **±1** a*(x)*b C_{pk} 10^{−5}")));
}
