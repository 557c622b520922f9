using BandSpec.Benchmarks;
using BandSpec.Tests.Characterizing;

// One process, one run: figures of different runs on a shared machine cannot be compared, ratios within a run can.
string argument = args.Length > 1 ? args[1] : "";
string root = argument.Length > 0 ? argument : ".";
switch (args.FirstOrDefault())
{
    case "lots":
        LotBenchmark.Run(Demos.Draft(root, "brine-reinjection"), root);
        return 0;
    case "plans":
        PlanBenchmark.Run(root);
        return 0;
    case "documents":
        DocumentBenchmark.Run(root);
        return 0;
    case "judging":
        JudgingBenchmark.Run(Demos.Draft(root, "brine-reinjection"));
        return 0;
    case "rare":
        RareBenchmark.Run(Demos.Draft(root, "brine-reinjection"));
        return 0;
    case "characterize":
        return CharacterizingSpeed.Run(int.TryParse(argument, out int seconds) ? seconds : 900);
    case "coverage":
        Coverage.Run(int.TryParse(argument, out int repetitions) ? repetitions : 400);
        return 0;
    case "readings":
        File.WriteAllText(Path.Combine(argument, "steel-cell-40.csv"), DemoReadings.FamilyCsv());
        File.WriteAllText(Path.Combine(argument, "steel-cell-40-storage.csv"), DemoReadings.StorageCsv());
        return 0;
    default:
        Console.Error.WriteLine("""
            usage: BandSpec.Benchmarks lots [ROOT]               units made a second beside a NumPy twin
                   BandSpec.Benchmarks plans [ROOT]              the plan search beside a NumPy loop, and its growth
                   BandSpec.Benchmarks documents [ROOT]          how long the documents take
                   BandSpec.Benchmarks judging [ROOT]            ten million readings read and judged
                   BandSpec.Benchmarks rare [ROOT]               the estimate of a rare event
                   BandSpec.Benchmarks characterize [SECONDS]    the nested model against lme4, which is given so many seconds
                   BandSpec.Benchmarks coverage [REPETITIONS]    how often the intervals of a characterization hold the truth
                   BandSpec.Benchmarks readings FOLDER           writes the demo readings
            """);
        return 2;
}
