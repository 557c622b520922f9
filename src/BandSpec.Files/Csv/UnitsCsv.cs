using System.Globalization;
using BandSpec.Core.LotJudging;
using BandSpec.Files.Json;

namespace BandSpec.Files.Csv;

/// <summary>Writes <c>units.csv</c>: what became of every unit of a lot, one line each, as many as there are.</summary>
public static class UnitsCsv
{
    /// <summary>Writes the table, units in the order they were met.</summary>
    public static void Write(IEnumerable<UnitJudgement> units, TextWriter to)
    {
        ArgumentNullException.ThrowIfNull(units);
        ArgumentNullException.ThrowIfNull(to);
        to.Write("serial,verdict,reasons,missing\n");
        foreach (UnitJudgement unit in units)
        {
            if (unit.Verdict == UnitVerdict.Pass)
            {
                to.Write(CsvText.Cell(unit.Serial));
                to.Write(",pass,,\n");
                continue;
            }

            string reasons = string.Join("; ", unit.Reasons.Select(r => string.Create(CultureInfo.InvariantCulture, $"{r.Name} {r.Error:0.####} %FS")));
            to.Write($"{CsvText.Cell(unit.Serial)},{JudgementJson.Word(unit.Verdict)},{CsvText.Cell(reasons)},{CsvText.Cell(string.Join("; ", unit.Missing))}\n");
        }
    }
}
