using BandSpec.Documents.Model;
using Xunit;

namespace BandSpec.Tests.Documents;

public sealed class MarkupTests
{
    [Fact]
    public void Marks_set_letters_whatever_stands_beside_them() => Assert.Equal(
        [
            new("|d"), new("T", Lettering.Italic), new("/d"), new("t", Lettering.Italic), new("| "),
            new("E", Lettering.Bold), new("TEB", Lettering.Bold, Shift.Lowered), new(" 10"), new("\u22125", Shift: Shift.Raised),
            new(" a*b", Lettering.Code),
        ],
        Markup.Parse("|d*T*/d*t*| **E_{TEB}** 10^{\u22125}` a*b`").Runs);

    [Theory]
    [InlineData("*open")]
    [InlineData("**bold*")]
    [InlineData("x_{low")]
    [InlineData("`code")]
    public void A_mark_left_open_is_an_error(string text) => Assert.Throws<FormatException>(() => Markup.Parse(text));

    [Theory]
    [InlineData("5 * 4 * 3")]
    [InlineData("a_{b} ^{c} `d` \\ **")]
    [InlineData("Müller & Söhne_2")]
    public void An_escaped_value_comes_back_letter_by_letter(string value) => Assert.Equal(value, Markup.Parse(Markup.Escape(value)).Plain);
}
