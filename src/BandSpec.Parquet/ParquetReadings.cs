using System.Data.Common;
using BandSpec.Core.Findings;
using BandSpec.Core.LotJudging;
using BandSpec.Files.Inputs;
using BandSpec.Files.LotReadings;
using BandSpec.Files.Yaml;
using DuckDB.NET.Data;

namespace BandSpec.Parquet;

/// <summary>
/// Reads Parquet files of readings with an embedded database, which streams them in bounded memory. The database is loaded by the first call, so
/// that a program without its library still does everything else.
/// </summary>
public static class ParquetReadings
{
    /// <summary>The four letters that a Parquet file begins with.</summary>
    public static ReadOnlySpan<byte> Magic => "PAR1"u8;

    /// <summary>Reads a file into the collector; columns are found by the same headings as in a text table.</summary>
    /// <param name="path">The file.</param>
    /// <param name="name">Its name, for faults.</param>
    /// <param name="collector">Where the readings go.</param>
    public static ReadingReport Read(string path, string name, LotCollector collector)
    {
        ArgumentNullException.ThrowIfNull(collector);
        try
        {
            using DuckDBConnection database = Open();
            (ReadingLayout? layout, IReadOnlyList<Finding> findings) = ReadingLayout.OfTable(Headings(database, path), collector.Limits);
            if (layout is null)
                return new(name, null, 0, 0, [.. findings.Select(finding => new PlacedFinding(finding, new Place(name, 1, 1, 1, "")))]);
            var taker = new ReadingTaker(collector, layout, name);
            return new(name, layout, Rows(database, path, layout, taker), taker.Converted, []);
        }
        catch (DuckDBException fault)
        {
            return Refused(name, fault.Message.Split('\n')[0]);
        }
        catch (DllNotFoundException)
        {
            return Refused(name, "the library that reads Parquet files is not beside the program");
        }
    }

    private static ReadingReport Refused(string name, string why) => new(name, null, 0, 0,
        [new PlacedFinding(new Finding(FieldPath.InReadings(""), "parquet", why, "a Parquet file, or a text table"), new Place(name, 1, 1, 1, ""))]);

    /// <summary>An empty database in memory that takes no more than it needs and fetches nothing from anywhere.</summary>
    private static DuckDBConnection Open()
    {
        DuckDBConnection database = new("DataSource=:memory:");
        database.Open();
        Command(database, "SET memory_limit='100MB'; SET threads=1; SET autoinstall_known_extensions=false; SET autoload_known_extensions=false")
            .ExecuteNonQuery();
        return database;
    }

    private static List<string> Headings(DuckDBConnection database, string path)
    {
        using DuckDBCommand command = Command(database, $"SELECT * FROM read_parquet({Text(path)}) LIMIT 0");
        using DbDataReader reader = command.ExecuteReader();
        return [.. Enumerable.Range(0, reader.FieldCount).Select(reader.GetName)];
    }

    private static long Rows(DuckDBConnection database, string path, ReadingLayout layout, ReadingTaker taker)
    {
        using DuckDBCommand command = Command(database, Query(path, layout));
        command.UseStreamingMode = true;
        using DbDataReader reader = command.ExecuteReader();
        long rows = 0;
        while (reader.Read())
        {
            string point = Cell(reader, 2), reading = Cell(reader, 4);
            double number = reader.IsDBNull(3) ? double.NaN : reader.GetDouble(3);
            int found = layout.HasPoint ? taker.PointById(point) : taker.PointAt(point, Cell(reader, 5), Cell(reader, 6));
            string place = layout.HasPoint ? point : $"{point}, {Cell(reader, 5)}, {Cell(reader, 6)}";
            taker.Take(++rows, Cell(reader, 0), Cell(reader, 1), found, place, number, reading);
        }

        return rows;
    }

    /// <summary>
    /// Serial, lot (or day), point (or temperature), reading as a number, reading as text where it is none, and pressure and direction where points
    /// are found by place.
    /// </summary>
    private static string Query(string path, ReadingLayout layout)
    {
        string reading = Name(layout.HeadingOf(LotColumn.Reading)!);
        string lot = layout.LotHeading is not { } heading ? "''" : layout.LotIsDay ? $"left(CAST({Name(heading)} AS VARCHAR), 10)" : Cast(heading);
        string place = layout.HasPoint
            ? $"{Cast(layout.HeadingOf(LotColumn.Point)!)}, "
            : $"{Cast(layout.HeadingOf(LotColumn.Temperature)!)}, ";
        string rest = layout.HasPoint ? "" : $", {Cast(layout.HeadingOf(LotColumn.Pressure)!)}"
            + (layout.HeadingOf(LotColumn.Direction) is { } direction ? $", {Cast(direction)}" : ", ''");
        return $"SELECT {Cast(layout.HeadingOf(LotColumn.Serial)!)}, {lot}, {place}TRY_CAST({reading} AS DOUBLE), "
            + $"CASE WHEN TRY_CAST({reading} AS DOUBLE) IS NULL THEN CAST({reading} AS VARCHAR) END{rest} FROM read_parquet({Text(path)})";
    }

    private static string Cast(string heading) => $"CAST({Name(heading)} AS VARCHAR)";

    private static string Name(string heading) => $"\"{heading.Replace("\"", "\"\"", StringComparison.Ordinal)}\"";

    private static string Text(string text) => $"'{text.Replace("'", "''", StringComparison.Ordinal)}'";

    private static string Cell(DbDataReader reader, int index) => reader.IsDBNull(index) ? "" : reader.GetString(index);

    private static DuckDBCommand Command(DuckDBConnection database, string text)
    {
        DuckDBCommand command = database.CreateCommand();
        command.CommandText = text;
        return command;
    }
}
