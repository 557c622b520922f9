using BandSpec.Files.Csv;
using BandSpec.Tests.Revising;
using Xunit;

namespace BandSpec.Tests.Files;

/// <summary>No cell of a table that the program writes is run by a spreadsheet.</summary>
public sealed class FormulaCellTests
{
    [Theory]
    [InlineData("A-17", "A-17")]
    [InlineData("=HYPERLINK(\"x\")", "\"'=HYPERLINK(\"\"x\"\")\"")]
    [InlineData("+1", "'+1")]
    [InlineData("-1", "'-1")]
    [InlineData("@SUM(A1)", "'@SUM(A1)")]
    [InlineData("\t=1", "'\t=1")]
    public void A_text_that_begins_like_a_formula_gets_an_apostrophe(string text, string cell) => Assert.Equal(cell, CsvText.Cell(text));

    [Fact]
    public void A_serial_number_of_the_readings_is_such_a_text_too()
    {
        using Workshop shop = new();
        Assert.Equal(0, shop.Run("draft", Workshop.Brine, "--quiet").ExitCode);
        shop.Write("lot.csv", "serial,point,reading\n=cmd|'/c calc'!A0,V01,0.5\n");
        shop.Run("judge", "out/HV-3107-A/limits.json", "lot.csv", "--out", "judged", "--quiet");
        Assert.Contains("\n'=cmd|'/c calc'!A0,", shop.Read("judged/units.csv"), StringComparison.Ordinal);
    }

    [Fact]
    public void A_layout_of_the_users_protects_texts_and_leaves_numbers()
    {
        using Workshop shop = new();
        shop.Edit(Workshop.Brine, "customer: Holmvik Geothermal", "customer: \"=1+1\"");
        shop.Write("templates/limits/mine.csv.scriban", "{{ for p in points }}{{ specification.customer }},{{ p.id }},{{ p.temperature }},{{ p.lower }},{{ p.upper }}\n{{ end }}");
        Screen screen = shop.Run("draft", Workshop.Brine, "--quiet");
        Assert.True(screen.ExitCode == 0, screen.Output + screen.Error);
        Assert.All(shop.Read("out/HV-3107-A/mine.csv").TrimEnd().Split('\n'), line => Assert.StartsWith("'=1+1,V", line, StringComparison.Ordinal));
        Assert.Contains(",-20,", shop.Read("out/HV-3107-A/mine.csv"), StringComparison.Ordinal);
    }
}
