using System.Globalization;
using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Numerics.NestedModels;
using BandSpec.Tests.Reference;

namespace BandSpec.Tests.Characterizing;

/// <summary>Published data sets, each with its source in its first line; made by Reference/make_nested_models.R.</summary>
internal static class ReferenceData
{
    /// <summary>One row: lot, unit, regressor, reading.</summary>
    public sealed record Row(string Lot, string Unit, double X, double Reading);

    public static IReadOnlyList<Row> Load(string name) =>
        [.. from cells in ReferenceTable.Rows(name + ".csv")
            select new Row(cells[0], cells[1], Number(cells[2]), Number(cells[3]))];

    /// <summary>The rows reduced unit by unit on the regressors that <paramref name="regressors"/> makes of <c>x</c>.</summary>
    public static NestedSample Sample(string name, Func<double, double[]> regressors)
    {
        List<IReadOnlyList<UnitSummary>> lots = [];
        foreach (IGrouping<string, Row> lot in Load(name).GroupBy(row => row.Lot))
            lots.Add([.. lot.GroupBy(row => row.Unit).Select(unit => UnitSummary.From(Rows([.. unit], regressors)))]);
        return new NestedSample(regressors(0).Length, lots);
    }

    private static Grid Rows(List<Row> readings, Func<double, double[]> regressors)
    {
        double[][] design = [.. readings.Select(reading => regressors(reading.X))];
        Grid rows = new(readings.Count, design[0].Length + 1);
        for (int i = 0; i < readings.Count; i++)
        {
            design[i].CopyTo(rows.Row(i));
            rows[i, design[i].Length] = readings[i].Reading;
        }

        return rows;
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
