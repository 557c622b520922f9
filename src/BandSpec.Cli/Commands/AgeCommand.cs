using System.CommandLine;
using BandSpec.Cli.Characterizing;
using BandSpec.Cli.Printing;
using BandSpec.Core.Characterizing;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;
using BandSpec.Files.Readings;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec age READINGS…</c>: from readings of stored units to drift statistics.</summary>
internal static class AgeCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string[]> files = new("READINGS") { Description = "CSV files of readings of units in storage.", Arity = ArgumentArity.OneOrMore };
        Option<string?> platform = new("--platform") { Description = "Platform file whose ageing is replaced.", HelpName = "FILE" };
        Option<string?> report = new("--report") { Description = "Folder for the report: PDF, Markdown, JSON and charts.", HelpName = "DIR" };
        Option<Temperature?> test = ValueOptions.Quantity(
            "--test-temperature", "Temperature that the drift is stated for; otherwise the platform's, or the storage most units had.", QuantityForms.Temperature, "TEMPERATURE");
        Option<Duration?> length = ValueOptions.Quantity(
            "--test-duration", "Time that the drift is stated for; otherwise the platform's, or the longest one.", QuantityForms.Time, "TIME");
        Option<double?> energy = ValueOptions.Quantity(
            "--activation-energy", "Activation energy to assume when the readings cannot tell.", QuantityForms.Energy, "ENERGY");
        Option<double?> exponent = NumberOption.Create<double>(
            "--time-exponent", "Time exponent to assume when the readings cannot tell.", "NUMBER", "a number above 0, at most 2", number => number is > 0 and <= 2);
        Option<int?> planUnits = NumberOption.Create<int>(
            "--plan-units", "Units of a planned further test, to learn what it would add.", "NUMBER", "a whole number from 1 to 1000000", number => number is >= 1 and <= 1_000_000);
        Option<Temperature?> planStorage = ValueOptions.Quantity(
            "--plan-storage", "Storage temperature of the planned test.", QuantityForms.Temperature, "TEMPERATURE");
        Option<Duration[]> planTimes = ValueOptions.Times("--plan-times", "Times at which the planned test is read.");
        Option<PressureRange?> range = ValueOptions.Range();
        Option<NominalOutput?> output = ValueOptions.Output();
        Option<string[]> columns = ValueOptions.Columns();
        (Option<bool> json, Option<bool> quiet) = (CommonOptions.Json(), CommonOptions.Quiet());
        TaughtCommand command = new(
            "age", "Estimates drift, activation energy and time exponent from units stored at several temperatures and times.",
            ("bandspec age storage.csv", "the drift with its intervals"),
            ("bandspec age storage.csv --platform cell.yaml", "the ageing of a platform file"),
            ("bandspec age storage.csv --plan-units 12 --plan-storage \"85 °C\" --plan-times \"1000 h\" \"3000 h\"", "what a further test would add"))
        {
            files, platform, report, test, length, energy, exponent, planUnits, planStorage, planTimes, range, output, columns, json, quiet,
        };
        command.Validators.Add(result =>
        {
            if (new Option[] { planUnits, planStorage, planTimes }.Count(part => result.GetResult(part) is not null) is 1 or 2)
                result.AddError("a planned test takes all of --plan-units, --plan-storage and --plan-times");
        });
        command.SetAction(parsed => (int)new AgeRun(terminal)
        {
            Files = parsed.GetRequiredValue(files),
            Platform = parsed.GetValue(platform),
            Report = parsed.GetValue(report),
            Json = parsed.GetValue(json),
            Quiet = parsed.GetValue(quiet),
            Format = new ReadingsFormat
            {
                Range = parsed.GetValue(range), Output = parsed.GetValue(output), ColumnNames = ValueOptions.Mapping(parsed.GetValue(columns) ?? []),
            },
            ScopeAt = (temperature, duration) => new AgeingScope
            {
                TestTemperature = parsed.GetValue(test) ?? temperature,
                TestDuration = parsed.GetValue(length) ?? duration,
                AssumedActivationEnergy = parsed.GetValue(energy),
                AssumedTimeExponent = parsed.GetValue(exponent),
                PlannedTest = parsed.GetValue(planUnits) is { } units && parsed.GetValue(planStorage) is { } storage && parsed.GetValue(planTimes) is { Length: > 0 } times
                    ? new PlannedAgeingTest(Math.Max(1, units), storage, times, [0, 1])
                    : null,
            },
        }.Run());
        return command;
    }
}
