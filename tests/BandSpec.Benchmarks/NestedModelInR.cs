using System.ComponentModel;
using System.Diagnostics;
using System.Globalization;
using System.Text;
using BandSpec.Core.Characterizing;
using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Numerics.NestedModels;

namespace BandSpec.Benchmarks;

/// <summary>What lme4 says of a nested model: its likelihood at our estimates, and its own search.</summary>
/// <param name="Version">lme4's version.</param>
/// <param name="AtOurs">Its deviance at our estimates.</param>
/// <param name="Seconds">Processor time of its own search, or the limit that stopped it.</param>
/// <param name="Evaluations">How often its search asked for the likelihood; <see langword="null"/> when it was stopped.</param>
/// <param name="Deviance">Where its search ended; <see langword="null"/> when it was stopped.</param>
internal sealed record NestedModelInR(string Version, double AtOurs, double Seconds, double? Evaluations, double? Deviance)
{
    /// <summary>Hands readings and estimates to lme4; <see langword="null"/> where R is not installed.</summary>
    public static NestedModelInR? Search(MeasuredFamily family, ReadingColumn[] columns, NestedFit fit, int seconds)
    {
        string folder = Directory.CreateTempSubdirectory("bandspec-").FullName;
        File.WriteAllText(Path.Combine(folder, "readings.csv"), Csv(family, columns));
        File.WriteAllText(Path.Combine(folder, "theta.csv"), Theta(fit));
        try
        {
            using Process process = Process.Start(
                "Rscript", [Path.Combine(AppContext.BaseDirectory, "nested-model.R"), folder, seconds.ToString(CultureInfo.InvariantCulture)]);
            process.WaitForExit();
            string[] lines = File.ReadAllLines(Path.Combine(folder, "lme4.csv"));
            double?[] figures = [.. lines.Skip(1).Select(line => double.TryParse(line, CultureInfo.InvariantCulture, out double figure) && double.IsFinite(figure) ? figure : (double?)null)];
            return new NestedModelInR(lines[0], figures[0]!.Value, figures[1]!.Value, figures[2], figures[3]);
        }
        catch (Win32Exception)
        {
            return null;
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    private static string Csv(MeasuredFamily family, ReadingColumn[] columns)
    {
        StringBuilder text = new("lot,unit");
        for (int j = 0; j < columns.Length; j++)
            text.Append(CultureInfo.InvariantCulture, $",z{j}");
        text.Append(",y\n");
        foreach (MeasuredUnit unit in family.Units)
        {
            Grid rows = unit.Rows(columns);
            for (int i = 0; i < rows.Rows; i++)
                text.Append(unit.Lot).Append(',').Append(unit.Name).Append(',')
                    .AppendJoin(',', rows.Row(i).ToArray().Select(value => value.ToString("R", CultureInfo.InvariantCulture))).Append('\n');
        }

        return text.ToString();
    }

    /// <summary>The spreads over the residual standard deviation, which lme4 calls theta.</summary>
    private static string Theta(NestedFit fit)
    {
        StringBuilder text = new("column,unit,lot\n");
        for (int j = 0; j < fit.Mean.Length; j++)
            text.Append(CultureInfo.InvariantCulture, $"z{j},{Math.Abs(fit.Factors.Within[j, j]):R},{Math.Abs(fit.Factors.Between[j, j]):R}\n");
        return text.ToString();
    }
}
