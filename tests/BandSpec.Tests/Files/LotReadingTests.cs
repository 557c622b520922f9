using System.Text;
using BandSpec.Core.LotJudging;
using BandSpec.Files.LotReadings;
using BandSpec.Tests.LotJudging;

using Xunit;

namespace BandSpec.Tests.Files;

public sealed class LotReadingTests
{
    private const string Limits = """
        { "format": "bandspec/limits/1", "specification": { "number": "T-1", "revision": "A" }, "sample-criterion": 1.67, "long-run-criterion": 1.33,
          "points": [
            { "id": "V01", "temperature": 25, "pressure": 0, "pressure-unit": "bar", "pressure-fraction": 0, "direction": "rising",
              "nominal": 1, "lower": 0.96, "upper": 1.04, "output-unit": "V", "tolerance": 1.1 },
            { "id": "V02", "temperature": 25, "pressure": 10, "pressure-unit": "bar", "pressure-fraction": 1, "direction": "rising",
              "nominal": 5, "lower": 4.96, "upper": 5.04, "output-unit": "V", "tolerance": 1.1 } ],
          "derived-limits": [ { "name": "zero", "limit": 0.5 }, { "name": "thermal-zero-shift", "from": -20, "to": 40, "limit": 0.4 } ],
          "reference-temperature": 25 }
        """;

    [Fact]
    public void A_limits_file_is_read()
    {
        (LotLimits? limits, _) = LimitsFile.Read("limits.json", Encoding.UTF8.GetBytes(Limits));
        Assert.Equal(("T-1-A", "V", 4.0, 2, 2), (limits!.Specification, limits.OutputUnit, limits.OutputSpan, limits.Points.Count, limits.DerivedLimits.Count));
        Assert.Equal(1.0, limits.ErrorOf(1, 5.04), 1e-12);
    }

    [Theory]
    [InlineData("bandspec/limits/1", "bandspec/limits/9", "`format` is `bandspec/limits/9`")]
    [InlineData("\"nominal\": 5,", "", "`points[1].nominal` is missing or of another kind")]
    [InlineData("\"V02\"", "\"V01\"", "two points are called `V01`")]
    [InlineData("\"pressure-unit\": \"bar\", \"pressure-fraction\": 1", "\"pressure-unit\": \"furlong\", \"pressure-fraction\": 1", "`points[1].pressure-unit` is `furlong`")]
    [InlineData("\"nominal\": 5", "\"nominal\": 1", "all `points` share one pressure or one nominal output")]
    [InlineData("\"temperature\": 25, \"pressure\": 10", "\"temperature\": -300, \"pressure\": 10", "`points[1].temperature` is missing or of another kind")]
    [InlineData("{ \"format\"", "{ format", "not valid JSON")]
    public void What_is_wrong_with_a_limits_file_is_said(string old, string replacement, string found) =>
        Assert.Equal(found, LimitsFile.Read("limits.json", Encoding.UTF8.GetBytes(Limits.Replace(old, replacement))).Findings.Single().Finding.Found);

    [Theory]
    [InlineData("serial,point,reading\nA,V01,1.02\nA,V04,3.01\n", ',', '.')]
    [InlineData("serial;point;reading\r\nA;V01;1,02\r\nA;V04;3,01\r\n", ';', ',')]
    [InlineData("Reading [mV]\tPoint ID\tSerial Number\tOperator\n1020\tv01\tA\tzz\n3010\tV04\tA\tzz\n", '\t', '.')]
    [InlineData("\uFEFF\"sn\";\"output\";\"id\"\n\"A\";\"1.02\";\"V01\"\n\n A ; 3.01 ;V04", ';', '.')]
    [InlineData("serial;temperature;pressure;direction;reading\nA;24,6;0,01;up;1,02\nA;25,2;5,03;down;3,01\n", ';', ',')]
    [InlineData("serial;temperature;pressure (kPa);direction;reading\nA;24.6;1;rising;1.02\nA;25.2;503;falling;3.01\n", ';', '.')]
    public void Layouts_are_detected_and_stated(string text, char separator, char sign)
    {
        (LotCollector collector, ReadingReport report) = Read(text);
        Assert.Equal((separator, sign), (report.Layout!.Separator, report.Layout.DecimalSign));
        Assert.Equal((2, 2, 0), (collector.Readings, report.Lines, collector.Faults.Total));
        LotJudgement judged = LotJudgement.Of(collector);
        Assert.Equal(0.5, judged.Characteristics[0].Mean, 1e-9);
        Assert.Equal(0.25, judged.Characteristics[3].Mean, 1e-9);
    }

    [Fact]
    public void The_layout_is_told_in_words() => Assert.Equal(
        "cells parted by semicolons, decimal comma; serial from `SN`, point from `point`, reading from `Reading [V]`, date from `date`",
        Read("SN;point;Reading [V];date\nA;V01;1,02;2026-01-05\n").Report.Layout!.Description);

    [Fact]
    public void Every_bad_line_is_counted_and_named()
    {
        (LotCollector collector, ReadingReport report) = Read("""
            serial,point,reading
            A,V01,1.02
            A,V01,1.03
            A,V99,1.02
            A,V02,n/a
            ,V02,3.01
            A,V02,3010
            A,V02,3.01 mV
            A,V02
            B,V02,3.01 bar
            B,V02,3010 mV
            B,V03,
            C,V01,1e308
            C,V02,-1e9
            """);
        Assert.Equal(
            [
                "MissingCell 9 A,V02", "NoSerial 6 ", "UnknownPoint 4 V99", "NotANumber 5 n/a", "NotANumber 12 ", "OtherUnit 7 3010", "OtherUnit 10 3.01 bar",
                "BeyondMeasure 13 1e308", "BeyondMeasure 14 -1e9",
                "Duplicate 3 A, V01",
            ],
            collector.Faults.All.SelectMany(f => f.Places.Select(p => $"{f.Kind} {p.Line} {p.Text}")));
        // `3.01 mV` says its unit, so it is taken at its word: 0.00301 V, far off and a failure.
        Assert.Equal((3, 13, 2), (collector.Readings, report.Lines, report.Converted));
    }

    [Fact]
    public void Only_the_first_places_are_named_and_all_are_counted()
    {
        (LotCollector collector, _) = Read("serial,point,reading\n" + string.Concat(Enumerable.Repeat("A,X,1\n", 500)));
        (ReadingFault kind, long count, IReadOnlyList<FaultPlace> places) = collector.Faults.All.Single();
        Assert.Equal((ReadingFault.UnknownPoint, 500, ReadingFaults.PlacesNamed), (kind, count, places.Count));
    }

    [Fact]
    public void A_place_without_direction_is_ambiguous_where_both_are_tested()
    {
        (LotCollector collector, _) = Read("serial;temperature;pressure;reading\nA;25;10;5.0\nA;25;5;3.0\nA;60;5;3.0\nA;85;0;1.0\n");
        Assert.Equal((2, 1, 1), (collector.Readings, collector.Faults.Count(ReadingFault.AmbiguousPoint), collector.Faults.Count(ReadingFault.UnknownPoint)));
    }

    [Fact]
    public void Lots_come_from_their_column_or_from_the_day()
    {
        Assert.Equal(["L1", "L2"], Read("serial,lot,date,point,reading\nA,L1,2026-01-05,V01,1\nB,L2,2026-01-05,V01,1\n").Collector.LotNames);
        Assert.Equal(["2026-01-05", "2026-01-06"],
            Read("serial,date,point,reading\nA,2026-01-05T08:00,V01,1\nB,2026-01-05 09:00,V01,1\nC,2026-01-06,V01,1\n").Collector.LotNames);
        Assert.Empty(Read("serial,point,reading\nA,V01,1\n").Collector.LotNames);
    }

    [Theory]
    [InlineData("", "the file is empty")]
    [InlineData("seriel,point,reading\n", "no column for the serial number among `seriel`, `point`, `reading`")]
    [InlineData("serial,reading\n", "no column for the point among `serial`, `reading`")]
    [InlineData("serial,point,reading,value\n", "two columns for the reading: `reading` and `value`")]
    [InlineData("serial,point,reading [bar]\n", "readings in `bar`")]
    [InlineData("serial,temperature,pressure [ft],reading\n", "pressures in `ft`")]
    public void A_table_that_cannot_be_read_says_why(string text, string found)
    {
        ReadingReport report = Read(text).Report;
        Assert.Equal(found, report.Findings.Single().Finding.Found);
        Assert.Equal(text.StartsWith("seriel", StringComparison.Ordinal) ? "serial" : null, report.Findings[0].Finding.Nearest);
    }

    private static (LotCollector Collector, ReadingReport Report) Read(string text)
    {
        var collector = new LotCollector(Lots.Whole);
        return (collector, CsvReadings.Read(new MemoryStream(Encoding.UTF8.GetBytes(text)), "lot.csv", collector));
    }
}
