using System.Text;
using BandSpec.Core.Characterizing;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;
using BandSpec.Files.Inputs;
using BandSpec.Files.Readings;
using Xunit;

namespace BandSpec.Tests.Files;

/// <summary>Readings files as benches write them, and what is said about those that are not right.</summary>
public sealed class ReadingFilesTests
{
    private static readonly ReadingsFormat Format = new()
    {
        Range = new PressureRange(Pressure.From(0, PressureUnit.Bar), Pressure.From(10, PressureUnit.Bar), PressureReference.Gauge),
        Output = new NominalOutput(0, 100, "mV"),
    };

    [Fact]
    public void Columns_are_found_by_their_names_whatever_their_order_and_unit()
    {
        UnitReading reading = Assert.Single(Read("""
            # from the bench
            Serial;Batch;Applied pressure [kPa];T chamber [°F];reading [mV];Direction;remark
            A-7;3;500;77;50.5;down;none
            """, Format with { ColumnNames = new Dictionary<string, string> { ["temperature"] = "T chamber" } }).Readings);
        Assert.Equal(
            ("A-7", "3", 0.5, PressureDirection.Falling, 3),
            (reading.Unit, reading.Lot, reading.PressureFraction, reading.Direction!.Value, reading.Line));
        Assert.Equal(25, reading.Temperature.Celsius, 9);
        Assert.Equal(0.5, reading.Error.Percent, 9);
    }

    [Fact]
    public void An_error_column_needs_neither_range_nor_output()
    {
        UnitReading reading = Assert.Single(Read("unit,temperature,pressure-fraction,error\n1,25 °C,0.25,-0.125\n", new ReadingsFormat()).Readings);
        Assert.Equal((0.25, -0.125, ""), (reading.PressureFraction, reading.Error.Percent, reading.Lot));
        Assert.Null(reading.Direction);
    }

    [Theory]
    [InlineData("unit,temperature,error\n1,25,0\n", 1, 1, "missing-column", "no column `pressure` or `applied-pressure` or `pressure-fraction`")]
    [InlineData("unit,temperature,pressure [bar],error\n1,25,5,0\n2,warm,5,0\n", 3, 3, "kind", "`warm`")]
    [InlineData("unit,temperature,pressure [bar],error\n1,25,5,\"0,1\"\n", 2, 8, "number", "`0,1` has a comma")]
    [InlineData("unit,temperature,pressure [bar],error\n1,25,5\n", 2, 1, "cell-count", "3 cells where the header has 4")]
    [InlineData("unit,temperature,pressure,error\n1,25,5,0\n", 2, 6, "unit", "`5` without a unit")]
    [InlineData("unit,temperature,pressure [bar],direction,error\n1,25,5,sideways,0\n", 2, 8, "direction", "`sideways`")]
    [InlineData("", 1, 1, "no-header", "nothing is written here")]
    public void What_is_wrong_is_found_at_its_cell(string text, int line, int column, string rule, string found)
    {
        PlacedFinding finding = Assert.Single(Read(text, Format).Findings);
        Assert.Equal((line, column, rule, found), (finding.Place.Line, finding.Place.Column, finding.Finding.Rule, finding.Finding.Found));
    }

    /// <summary>However many readings there are, one finding asks for what the header cannot say.</summary>
    [Theory]
    [InlineData("unit,temperature,pressure [bar],error\n1,25,5,0\n1,25,6,0\n1,25,7,0\n", 18, "no-range")]
    [InlineData("unit,temperature,pressure-fraction,reading [mV]\n1,25,0.5,0\n1,25,0.6,0\n", 36, "no-output")]
    public void What_is_missing_for_a_whole_column_is_asked_for_once(string text, int column, string rule)
    {
        PlacedFinding finding = Assert.Single(Read(text, new ReadingsFormat()).Findings);
        Assert.Equal((1, column, rule), (finding.Place.Line, finding.Place.Column, finding.Finding.Rule));
    }

    private static ReadingsSet<UnitReading> Read(string text, ReadingsFormat format) =>
        FamilyReadings.Read(InputContent.Of("readings.csv", Encoding.UTF8.GetBytes(text)), format);
}
