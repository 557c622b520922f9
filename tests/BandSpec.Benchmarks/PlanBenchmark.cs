using System.Diagnostics;
using System.Text.Json;
using BandSpec.Core.Planning;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;
using BandSpec.Tests;

namespace BandSpec.Benchmarks;

/// <summary>The plan search beside a NumPy loop over the same plans, and what it costs as spaces grow.</summary>
internal static class PlanBenchmark
{
    private const int Plans = 400;
    private const int Rounds = 7;

    public static void Run(string root)
    {
        var tables = new SearchTables(ApplicationOf(5, 6, PlanObjective.MostMargin));
        List<CompensationPlan> plans = PlansOf(tables);
        (double own, long bytes) = Evaluate(tables);
        (double numpy, double[] margins) = Numpy(root, PlanExport.Of(tables, plans, Rounds));
        own = Math.Min(own, Evaluate(tables).Seconds);
        double worst = plans.Zip(margins, (p, m) => Math.Abs(Core.Bands.BandMap.Of(tables.Application, p).Margin - m)).Max();
        Console.WriteLine($"NumPy loop {numpy * 1e6:F0} µs a plan; margins agree to {worst:E1}");
        Console.WriteLine($"every plan to the end, one core: {own * 1e9:F0} ns a plan, {bytes} bytes allocated a plan; {numpy / own:F0} times the NumPy loop");
        LeastCost(numpy);
        Growth();
    }

    /// <summary>The least-cost search of the shared example with 3 to 5 temperatures, everything it needs included.</summary>
    private static void LeastCost(double numpy)
    {
        Application application = ApplicationOf(5, 5, PlanObjective.LeastCost);
        double seconds = Best(() => PlanChoosing.Choose(application, null, default), 60);
        long plans = new PlanSearch(application).PlanCount;
        Console.WriteLine($"least-cost over {plans} plans, proven, also between the nodes: {seconds * 1e3:F1} ms; the NumPy loop would need {plans * numpy:F0} s: {plans * numpy / seconds:F0} times");
    }

    private static void Growth()
    {
        Console.WriteLine("| candidates | n to | objective | plans | decided | discarded | s |");
        Console.WriteLine("| --- | --- | --- | --- | --- | --- | --- |");
        foreach ((double step, int most) in new[] { (10.0, 6), (5, 3), (5, 4), (5, 5), (5, 6), (2.5, 4), (2.5, 5) })
            foreach (PlanObjective objective in Enum.GetValues<PlanObjective>())
            {
                var search = new PlanSearch(ApplicationOf(step, most, objective));
                SearchAnswer answer = search.Run(objective, []);
                double seconds = Best(() => search.Run(objective, []), 3);
                Console.WriteLine($"| {search.Tables.Candidates.Length} | {most} | {objective} | {search.PlanCount} | {answer.Count.Decided} | {answer.Count.Discarded} | {seconds:F3} |");
            }
    }

    /// <summary>Load, fit and margin over all nodes of full batches; the best of several rounds.</summary>
    private static (double Seconds, long Bytes) Evaluate(SearchTables tables)
    {
        PlanFit fit = new(tables);
        MarginScore score = new(tables, []);
        (PlanBatch Batch, LeftoverRows Rows)[] work = [.. BatchesOf(tables)];
        long bytes = 0;
        double seconds = Best(() =>
        {
            long before = GC.GetAllocatedBytesForCurrentThread();
            int row = 0;
            foreach ((PlanBatch batch, LeftoverRows rows) in work)
            {
                fit.Load(batch);
                fit.To(rows);
                score.Of(fit, double.NegativeInfinity, ref row);
            }

            bytes = GC.GetAllocatedBytesForCurrentThread() - before;
        }, 60);
        int plans = work.Sum(w => w.Batch.Count);
        return (seconds / plans, bytes / plans);
    }

    private static IEnumerable<(PlanBatch Batch, LeftoverRows Rows)> BatchesOf(SearchTables tables)
    {
        foreach (IGrouping<(int, int), int[]> alike in ListsOf(tables).GroupBy(l => (l.Length, tables.NearestIn(l))))
            foreach (int[][] chunk in alike.Chunk(PlanBatch.Lanes).Where(c => c.Length == PlanBatch.Lanes))
                foreach ((int zero, int span) in tables.Families.DegreesOf[chunk[0].Length])
                {
                    var batch = new PlanBatch(chunk[0].Length, alike.Key.Item2);
                    foreach (int[] list in chunk)
                        batch.Add(list);
                    yield return (batch, tables.RowsOf(zero, span));
                }
    }

    private static List<CompensationPlan> PlansOf(SearchTables tables)
    {
        int[][] lists = [.. ListsOf(tables)];
        return
        [
            .. from i in Enumerable.Range(0, Plans)
               let list = lists[(long)i * lists.Length / Plans]
               let degrees = tables.Families.DegreesOf[list.Length]
               let d = degrees[i % degrees.Count]
               select tables.PlanOf(list, d.Zero, d.Span),
        ];
    }

    /// <summary>Every twentieth list of 3 to 6 temperatures.</summary>
    private static List<int[]> ListsOf(SearchTables tables)
    {
        List<int[]> lists = [];
        int number = 0;
        foreach (PlanFamily family in tables.Families.All)
            foreach (int second in tables.Families.SecondsOf(family))
                tables.Families.ForEachList(family, second, list =>
                {
                    if (number++ % 20 == 0)
                        lists.Add([.. list]);
                });
        return lists;
    }

    private static (double SecondsAPlan, double[] Margins) Numpy(string root, string problem)
    {
        string script = Path.Combine(root, "tests", "BandSpec.Benchmarks", "plans_numpy.py");
        ProcessStartInfo start = new("/usr/bin/python3", script) { RedirectStandardInput = true, RedirectStandardOutput = true };
        start.Environment.Remove("OPENBLAS_CORETYPE");
        start.Environment.Remove("OPENBLAS_L2_SIZE");
        start.Environment["OPENBLAS_NUM_THREADS"] = "1";
        using Process python = Process.Start(start)!;
        python.StandardInput.Write(problem);
        python.StandardInput.Close();
        using JsonDocument answer = JsonDocument.Parse(python.StandardOutput.ReadToEnd());
        python.WaitForExit();
        return (
            answer.RootElement.GetProperty("seconds-a-plan").GetDouble(),
            [.. answer.RootElement.GetProperty("margins").EnumerateArray().Select(m => m.GetDouble())]);
    }

    private static double Best(Action work, int rounds = Rounds)
    {
        double best = double.PositiveInfinity;
        for (int i = 0; i < rounds; i++)
        {
            long start = Stopwatch.GetTimestamp();
            work();
            best = Math.Min(best, Stopwatch.GetElapsedTime(start).TotalSeconds);
        }

        return best;
    }

    private static Application ApplicationOf(double step, int most, PlanObjective objective) => Given.Application(Given.Requirement with
    {
        Compensation = Given.Requirement.Compensation with
        {
            CandidateStep = TemperatureDifference.FromKelvin(step), MostTemperatures = most, Objective = objective,
        },
    });
}
