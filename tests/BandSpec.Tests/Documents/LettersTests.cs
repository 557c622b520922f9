using BandSpec.Documents.Fonts;
using Xunit;

namespace BandSpec.Tests.Documents;

public sealed class LettersTests
{
    [Theory]
    [InlineData("Holmvik Geothermal, −20 °C … 150 °C, ±1.6 %FS ≥ ∞ µA ² ₂ – ×")]
    [InlineData("Ωμέγα αβγδεζηθικλμνξοπρστυφχψω ΔΣΦ")]
    [InlineData("Давление в скважине ЙЩЪЁ йщъё")]
    [InlineData("Łódź, Übergröße, Čeština, Ærø, Iğdır, naïve\nsecond line\ttab")]
    public void These_can_be_set(string text) => Assert.Empty(Letters.Missing(text));

    [Fact]
    public void What_no_face_has_is_told_once_each_in_order() =>
        Assert.Equal(["圧", "力", "\U0001F600"], Letters.Missing("圧力 圧 \U0001F600 bar"));

    [Fact]
    public void A_letter_that_the_wanted_face_lacks_is_set_in_one_that_has_it() =>
        Assert.Equal([(Face.Mono, "10"), (Face.Regular, "⁻"), (Face.Mono, "⁵ x")], Letters.InFaces("10⁻⁵ x", Face.Mono));

    [Fact]
    public void A_missing_letter_is_an_error_and_never_a_box()
    {
        var fault = Assert.Throws<MissingLetterException>(() => Letters.InFaces("圧 bar", Face.Regular).ToList());
        Assert.Equal("No embedded font has the letter '圧' (U+5727) of \"圧 bar\".", fault.Message);
    }

    [Fact]
    public void Figures_are_of_one_width_in_the_faces_of_tables() => Assert.All(
        [Face.Regular, Face.SemiBold, Face.Mono],
        face => Assert.Single("0123456789".Select(digit => Typeface.Of(face).Width(digit.ToString(), 1000)).Distinct()));
}
