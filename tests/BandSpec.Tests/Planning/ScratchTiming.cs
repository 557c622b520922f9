using System.Diagnostics;
using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.Quantities;
using Xunit;

namespace BandSpec.Tests.Planning;

public sealed class ScratchTiming
{
    [Fact]
    public void Time()
    {
        foreach (PlanObjective o in Enum.GetValues<PlanObjective>())
        foreach (double step in new[] { 5.0 })
        foreach (int most in new[] { 4, 5, 6 })
        {
            if (step == 2.5 && most == 6) continue;
            var app = Given.Application(Given.Requirement with { Compensation = Given.Requirement.Compensation with { CandidateStep = Given.K(step), MostTemperatures = most, Objective = o } });
            for (int k = 0; k < 2; k++)
            {
                var c0 = Process.GetCurrentProcess().TotalProcessorTime;
                var s = new PlanSearch(app, null, 1);
                double t0 = (Process.GetCurrentProcess().TotalProcessorTime - c0).TotalMilliseconds;
                var a = s.Run(o, []);
                double t = (Process.GetCurrentProcess().TotalProcessorTime - c0).TotalMilliseconds;
                Console.WriteLine($"{o} step {step} n<={most}: plans {s.PlanCount} decided {a.Decided} setup {t0:F1} ms total {t:F1} ms cpu  {1e6*(t-t0)/a.Decided:F0} ns/plan  {string.Join(",", a.Winner.List.Select(i => s.Tables.Families.Candidates[i].Celsius))} {a.Winner.Zero},{a.Winner.Span} margin {a.Winner.Margin:R} rms {a.Winner.Rms:R}");
            }
        }
        var app2 = Given.Application();
        var tables = new SearchTables(app2);
        var margin = new MarginScore(tables, []);
        var rms = new RmsScore(tables);
        var fit = new PlanFit(tables);
        foreach (int n in new[] { 3, 4, 5, 6 })
        {
            int[] list = tables.Families.SpreadList(n)!;
            var batch = new PlanBatch(n, tables.NearestIn(list));
            for (int i = 0; i < 8; i++) batch.Add(list);
            var (z, p) = tables.Families.DegreesOf[n][0];
            var rows = tables.RowsOf(z, p);
            int row = 0;
            double acc = 0;
            foreach (string what in new[] { "load", "fit", "margin", "rms" })
            {
                double best = double.MaxValue;
                fit.Load(batch); fit.To(rows);
                for (int rep = 0; rep < 30; rep++)
                {
                    var w = Stopwatch.StartNew();
                    for (int i = 0; i < 2000; i++)
                        switch (what)
                        {
                            case "load": fit.Load(batch); break;
                            case "fit": fit.To(rows); break;
                            case "margin": acc += margin.Of(fit, double.NegativeInfinity, ref row)[0]; break;
                            case "rms": acc += rms.Of(fit, double.PositiveInfinity)[0]; break;
                        }
                    best = Math.Min(best, w.Elapsed.TotalMilliseconds / 2000 * 1e6);
                }
                Console.WriteLine($"n {n} {what}: {best:F0} ns a batch, {best/8:F0} ns a plan; rows {rows.Count} columns {rows.Form.Columns}");
            }
        }
    }
}
