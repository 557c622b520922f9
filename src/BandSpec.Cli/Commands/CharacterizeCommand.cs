using System.CommandLine;
using BandSpec.Cli.Characterizing;
using BandSpec.Cli.Printing;
using BandSpec.Core.Characterizing;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;
using BandSpec.Files.Readings;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec characterize READINGS…</c>: from readings of uncompensated units to platform statistics.</summary>
internal static class CharacterizeCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string[]> files = new("READINGS") { Description = "CSV files of readings of uncompensated units.", Arity = ArgumentArity.OneOrMore };
        Option<string?> platform = new("--platform")
        {
            Description = "Platform file to write; when it exists, its name, ratings and ageing stay and its statistics are replaced.", HelpName = "FILE",
        };
        Option<string?> report = new("--report") { Description = "Folder for the report: PDF, Markdown, JSON and charts.", HelpName = "DIR" };
        Option<string?> name = new("--name") { Description = "Name of the family; otherwise that of the platform file.", HelpName = "TEXT" };
        Option<string?> revision = new("--revision") { Description = "Revision of the statistics.", HelpName = "TEXT" };
        Option<Temperature?> reference = ValueOptions.Quantity(
            "--reference", "Temperature from which reduced temperature is counted; 25 °C, or that of the platform file.", QuantityForms.Temperature, "TEMPERATURE");
        Option<PressureRange?> range = ValueOptions.Range();
        Option<NominalOutput?> output = ValueOptions.Output();
        Option<string[]> columns = ValueOptions.Columns();
        Option<KeyValuePair<PressureShape, int>[]> degrees = ValueOptions.Degrees();
        Option<string[]> exclude = new("--exclude") { Description = "A unit to leave out.", HelpName = "UNIT" };
        Option<bool> keep = new("--keep-suspects") { Description = "Keep suspect units and readings in the statistics; they are named either way." };
        (Option<bool> json, Option<bool> quiet) = (CommonOptions.Json(), CommonOptions.Quiet());
        TaughtCommand command = new(
            "characterize", "Estimates a sensor family's statistics from readings of uncompensated units, and writes them as a platform file.",
            ("bandspec characterize lots.csv", "the statistics with their intervals"),
            ("bandspec characterize lot1.csv lot2.csv --platform cell.yaml --report out/cell", "platform file and report"),
            ("bandspec characterize lots.csv --range \"0 bar..25 bar\" --output \"0 mV..100 mV\"", "readings as they came from the test bench"))
        {
            files, platform, report, name, revision, reference, range, output, columns, degrees, exclude, keep, json, quiet,
        };
        command.SetAction(parsed => (int)new CharacterizeRun(terminal)
        {
            Files = parsed.GetRequiredValue(files),
            Platform = parsed.GetValue(platform),
            Report = parsed.GetValue(report),
            Name = parsed.GetValue(name),
            Revision = parsed.GetValue(revision),
            Json = parsed.GetValue(json),
            Quiet = parsed.GetValue(quiet),
            Format = new ReadingsFormat
            {
                Range = parsed.GetValue(range), Output = parsed.GetValue(output), ColumnNames = ValueOptions.Mapping(parsed.GetValue(columns) ?? []),
            },
            ScopeAt = fallback => new CharacterizationScope
            {
                Reference = parsed.GetValue(reference) ?? fallback,
                PinnedDegrees = (parsed.GetValue(degrees) ?? []).GroupBy(d => d.Key).ToDictionary(d => d.Key, d => d.Last().Value),
                ExcludedUnits = parsed.GetValue(exclude) ?? [],
                KeepSuspects = parsed.GetValue(keep),
            },
        }.Run());
        return command;
    }
}
