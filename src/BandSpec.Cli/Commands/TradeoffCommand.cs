using System.CommandLine;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Trading;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec tradeoff FILE</c>: what more money buys, and a choice among it.</summary>
internal static class TradeoffCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string> file = new("FILE") { Description = "The requirement; platform and station are found from there." };
        Option<string?> output = new("--out")
        {
            Description = "Folder for the chart, as NUMBER-REVISION-tradeoff.svg, or the name of the .svg file itself.", HelpName = "PATH",
        };
        Option<int?> choose = new("--choose")
        {
            Description = "Writes the plan of this number into the requirement, which `draft` then takes as given. Nothing else in the file changes.",
            HelpName = "K",
        };
        Option<string> language = new("--language")
        {
            Description = "Language of the chart.", DefaultValueFactory = _ => "en", HelpName = "en|de",
        };
        Option<string?> root = CommonOptions.Root();
        (Option<bool> json, Option<bool> quiet) = (CommonOptions.Json(), CommonOptions.Quiet());
        choose.Validators.Add(result =>
        {
            if (result.GetValueOrDefault<int?>() is < 1)
                result.AddError("--choose takes the number of a plan, 1 and up");
        });
        TaughtCommand command = new(
            "tradeoff", "Shows every plan that nothing beats in cost and margin, or in cost and rms error, each proven over all candidate plans.",
            ("bandspec tradeoff pump.yaml", "the table; the plan that `draft` takes is marked"),
            ("bandspec tradeoff pump.yaml --out charts", "also the chart"),
            ("bandspec tradeoff pump.yaml --choose 11", "pins plan 11 in pump.yaml"),
            ("bandspec tradeoff pump.yaml --json", "everything for programs"))
        {
            file, output, choose, language, root, json, quiet,
        };
        command.SetAction((parsed, cancellation) => Task.FromResult((int)new TradeoffRun(
            terminal,
            new TradeoffOrder(parsed.GetRequiredValue(file), parsed.GetValue(root), parsed.GetValue(output), parsed.GetValue(choose), parsed.GetValue(language)!))
            .Run(parsed.GetValue(json), parsed.GetValue(quiet), cancellation)));
        return command;
    }
}
