using BandSpec.Benchmarks;

// One process, one run: figures of different runs on a shared machine cannot be compared, ratios within a run can.
string root = args.Length > 1 ? args[1] : ".";
switch (args.FirstOrDefault())
{
    case "lots":
        LotBenchmark.Run(Demos.Draft(root, "brine-reinjection"), root);
        return 0;
    case "rare":
        RareBenchmark.Run(Demos.Draft(root, "brine-reinjection"));
        return 0;
    default:
        Console.Error.WriteLine("usage: BandSpec.Benchmarks lots|rare [ROOT]");
        return 2;
}
