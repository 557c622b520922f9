using System.CommandLine;
using BandSpec.Cli.Trying;
using BandSpec.Core.VirtualLots;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Commands;

/// <summary>Argument and options of <c>bandspec try</c>.</summary>
internal sealed class TryOptions
{
    private readonly Argument<string> file = new("FILE") { Description = "The requirement; platform and station are found from there." };
    private readonly Option<string> units = new("--units") { Description = "Units to make, such as 1e6; rounded up to whole lots.", DefaultValueFactory = _ => "1e6", HelpName = "N" };
    private readonly Option<int> lotSize = NumberOption.Create(
        "--lot-size", "Units in a lot, 16 to 100000.", "N", "a whole number from 16 to 100000", number => number is >= 16 and <= 100_000, 400);

    private readonly Option<ulong> seed = NumberOption.Create("--seed", "Seed of the random numbers; the same seed gives the same units on every machine.", "N", "a whole number from 0 to 2^64 - 1", _ => true, 1UL);
    private readonly Option<string?> part = new("--part") { Description = "Make part K of N only and write it to a file, for `bandspec gather`.", HelpName = "K/N" };
    private readonly Option<string[]> set = new("--set") { Description = "Read a value as if another were written in the requirement, or with `station.` or `platform.` before its path in those files; may be given several times.", HelpName = "PATH=VALUE" };
    private readonly Option<int> threads = NumberOption.Create(
        "--threads", "Threads; one for each processor when left out.", "N", "a whole number from 1 to 1024", number => number is >= 1 and <= 1024, Environment.ProcessorCount);

    private readonly Option<string?> root = CommonOptions.Root();

    /// <summary>A value to be tried over a range.</summary>
    public Option<string?> Sweep { get; } = new("--sweep") { Description = "Try a value over a range, ends included, the same random numbers for each.", HelpName = "PATH=FROM..TO:STEP" };

    /// <summary>Where the chart of a sweep is written.</summary>
    public Option<string?> Chart { get; } = new("--chart") { Description = "File for the chart of a sweep; none when left out.", HelpName = "FILE.svg" };

    /// <summary>Where the result is written for gathering.</summary>
    public Option<string?> Out { get; } = new("--out") { Description = "File for the part; NUMBER-REVISION.part-K-of-N.json when left out.", HelpName = "FILE" };

    /// <summary>Output for machines.</summary>
    public Option<bool> Json { get; } = CommonOptions.Json();

    /// <summary>No output but findings.</summary>
    public Option<bool> Quiet { get; } = CommonOptions.Quiet();

    /// <summary>Adds all of them to the command.</summary>
    public void AddTo(Command command)
    {
        command.Add(file);
        foreach (Option option in new Option[] { units, lotSize, seed, part, Out, set, Sweep, Chart, threads, Json, Quiet, root })
            command.Add(option);
    }

    /// <summary>What a command line asks for.</summary>
    /// <exception cref="FormatException">An option is not written as it should be.</exception>
    public TryRequest RequestOf(ParseResult parsed)
    {
        LotOrder order = LotOrder.For(TryRequest.UnitsOf(parsed.GetValue(units)!), parsed.GetValue(lotSize), parsed.GetValue(seed));
        if (parsed.GetValue(part) is { } text)
            order = TryRequest.PartOf(order, text);
        return new TryRequest(
            parsed.GetRequiredValue(file), parsed.GetValue(root), [.. (parsed.GetValue(set) ?? []).Select(InputChange.Parse)], order,
            parsed.GetValue(threads));
    }
}
