using BandSpec.Core.LotJudging;
using BandSpec.Files.LotReadings;
using BandSpec.Parquet;
using BandSpec.Tests.LotJudging;
using DuckDB.NET.Data;

using Xunit;

namespace BandSpec.Tests.Files;

public sealed class ParquetReadingTests : IDisposable
{
    private readonly string folder = Directory.CreateTempSubdirectory("bandspec-parquet-").FullName;

    public void Dispose() => Directory.Delete(folder, recursive: true);

    [Fact]
    public void Typed_columns_are_read_like_a_text_table()
    {
        string path = Make("SELECT * FROM (VALUES ('A', 'L1', 'V01', 1.02), ('A', 'L1', 'V04', 3.01), ('B', 'L2', 'V99', 1.0)) AS t(serial, lot, point, reading)");
        var collector = new LotCollector(Lots.Whole);
        ReadingReport report = ParquetReadings.Read(path, "lot.parquet", collector);
        Assert.Empty(report.Findings);
        Assert.Equal("columns of a database; serial from `serial`, point from `point`, reading from `reading`, lot from `lot`", report.Layout!.Description);
        Assert.Equal((3, 2, 1), (report.Lines, collector.Readings, collector.Faults.Count(ReadingFault.UnknownPoint)));
        Assert.Equal("lot.parquet 3 V99", collector.Faults.All.Single().Places.Select(p => $"{p.File} {p.Line} {p.Text}").Single());
        Assert.Equal(0.5, LotJudgement.Of(collector).Characteristics[0].Mean, 1e-9);
    }

    [Fact]
    public void Points_are_found_by_place_lots_by_day_and_text_where_numbers_belong_is_named()
    {
        string path = Make("""
            SELECT * FROM (VALUES ('A', TIMESTAMP '2026-01-05 08:00:00', 25.2, 503.0, 'falling', '3010 mV'), ('B', TIMESTAMP '2026-01-06 08:00:00', 85, 1000, 'up', 'open'))
            AS t("Serial Number", "time", "temperature", "pressure [kPa]", "direction", "Reading")
            """);
        var collector = new LotCollector(Lots.Whole);
        ReadingReport report = ParquetReadings.Read(path, "lot.parquet", collector);
        Assert.Equal((2, 1, 1, 1), (report.Lines, report.Converted, collector.Readings, collector.Faults.Count(ReadingFault.NotANumber)));
        Assert.Equal(["2026-01-05"], collector.LotNames);
        Assert.Equal(0.25, LotJudgement.Of(collector).Characteristics[3].Mean, 1e-9);
    }

    [Fact]
    public void A_file_that_only_begins_like_parquet_is_a_finding()
    {
        string path = Path.Combine(folder, "broken.parquet");
        File.WriteAllText(path, "PAR1 and nothing more");
        Assert.Equal("parquet", ParquetReadings.Read(path, "broken.parquet", new LotCollector(Lots.Whole)).Findings.Single().Finding.Rule);
    }

    [Fact]
    public void Missing_columns_are_findings()
    {
        string path = Make("SELECT 'A' AS serial, 1.0 AS volts");
        Assert.Equal(["missing-column", "missing-column"], ParquetReadings.Read(path, "lot.parquet", new LotCollector(Lots.Whole)).Findings.Select(f => f.Finding.Rule));
    }

    private string Make(string query)
    {
        string path = Path.Combine(folder, "it's a lot.parquet");
        using DuckDBConnection database = new("DataSource=:memory:");
        database.Open();
        using DuckDBCommand command = database.CreateCommand();
        command.CommandText = $"COPY ({query}) TO '{path.Replace("'", "''")}' (FORMAT parquet)";
        command.ExecuteNonQuery();
        return path;
    }
}
