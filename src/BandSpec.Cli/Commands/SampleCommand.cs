using System.CommandLine;
using System.Globalization;
using System.Text;
using BandSpec.Cli.Printing;
using BandSpec.Core.LotJudging;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec sample LIMITS</c>: how many units to measure, and what they must show.</summary>
internal static class SampleCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string> limits = new("LIMITS") { Description = "The limits.json of a specification package." };
        Option<double> confidence = Probability("--confidence", "Confidence of the proof, between 0 and 1.", 0.95);
        Option<double?> expected = NumberOption.Create<double>(
            "--expected", "The capability that the process is thought to have; shows how likely it is to pass.", "INDEX", "a capability index above 0, at most 100",
            number => number is > 0 and <= 100);
        Option<double> chance = Probability("--chance", "How likely such a process should be to pass, between 0 and 1.", 0.9);
        Option<bool> json = CommonOptions.Json();
        TaughtCommand command = new(
            "sample", "Tells for each sample size what index must be observed to prove the capability that the limits demand.",
            ("bandspec sample out/HV-3107-A/limits.json", "the table at 95 % confidence"),
            ("bandspec sample limits.json --confidence 0.9 --expected 2", "also how likely a process with capability 2 passes, and the smallest sample"))
        {
            limits, confidence, expected, chance, json,
        };
        command.SetAction(parsed => (int)Run(
            parsed.GetRequiredValue(limits), new Wishes(parsed.GetValue(confidence), parsed.GetValue(expected), parsed.GetValue(chance)), parsed.GetValue(json), terminal));
        return command;
    }

    private sealed record Wishes(double Confidence, double? Expected, double Chance);

    private sealed record Plan(string Name, double Demanded, IReadOnlyList<SamplingStep> Steps, SamplingStep? Smallest);

    private static ExitCode Run(string file, Wishes wishes, bool json, Terminal terminal)
    {
        (LotLimits? limits, IReadOnlyList<Files.Inputs.PlacedFinding> findings) = Judging.JudgeRun.ReadLimits(file, terminal);
        if (limits is null)
        {
            terminal.Out.Write(FindingScreen.Of(findings, terminal.Ink));
            return ExitCode.Findings;
        }

        Plan[] plans = [PlanOf("within a lot", limits.SampleCriterion, wishes), PlanOf("over lots", limits.LongRunCriterion, wishes)];
        terminal.Out.Write(json ? Json(limits, plans, wishes) : Screen(limits, plans, wishes, terminal.Ink));
        return ExitCode.Done;
    }

    private static Plan PlanOf(string name, double demanded, Wishes wishes) => new(
        name, demanded, [.. SamplingStep.UsualSizes.Select(units => SamplingStep.Of(units, demanded, wishes.Confidence, wishes.Expected))],
        wishes.Expected is { } expected ? SamplingStep.Smallest(demanded, wishes.Confidence, expected, wishes.Chance) : null);

    private static string Screen(LotLimits limits, Plan[] plans, Wishes wishes, Ink ink)
    {
        CultureInfo plain = CultureInfo.InvariantCulture;
        StringBuilder screen = new();
        screen.Append(plain, $"\n{ink.Bold(limits.Specification)}  index to observe so that the capability is proven at {wishes.Confidence:P0} confidence\n\n");
        string chance = wishes.Expected is { } expected ? string.Create(plain, $"  chance at {expected}") : "";
        screen.Append(ink.Faint(string.Concat(["   units", .. plans.Select(plan => string.Create(plain, $"   {plan.Name} {plan.Demanded}{chance}"))]))).Append('\n');
        for (int i = 0; i < SamplingStep.UsualSizes.Count; i++)
        {
            screen.Append(plain, $"{SamplingStep.UsualSizes[i],8}");
            foreach (Plan plan in plans)
            {
                string title = string.Create(plain, $"   {plan.Name} {plan.Demanded}");
                screen.Append(RoundedUp(plan.Steps[i].Observe).PadLeft(title.Length));
                if (plan.Steps[i].Chance is { } likely)
                    screen.Append(likely.ToString("P1", plain).PadLeft(chance.Length));
            }

            screen.Append('\n');
        }

        foreach (Plan plan in plans.Where(_ => wishes.Expected is not null))
            screen.Append(plain, $"\n{plan.Name} {plan.Demanded}: ").Append(plan.Smallest is { } step
                ? string.Create(plain, $"{ink.Bold($"{step.Units:N0} units")} pass with a chance of {wishes.Chance:P0}; observe {RoundedUp(step.Observe)}")
                : "no sample of a million units would do: the expected capability hardly exceeds what is demanded");
        return screen.Append("\n\nOver lots the units have to come from several lots, and what is demanded of them is the index over all.\n\n").ToString();
    }

    private static string Json(LotLimits limits, Plan[] plans, Wishes wishes) => Encoding.UTF8.GetString(SampleJson.Write(
        limits.Specification, wishes.Confidence, [.. plans.Select(plan => (plan.Name, plan.Demanded, plan.Steps, plan.Smallest))]).Span);

    /// <summary>Rounded up: an index observed as printed proves the capability.</summary>
    private static string RoundedUp(double index) => (Math.Ceiling(index * 1000 - 1e-7) / 1000).ToString("0.000", CultureInfo.InvariantCulture);

    private static Option<double> Probability(string name, string description, double usual) =>
        NumberOption.Create(name, description, "P", "a number between 0 and 1", number => number is > 0 and < 1, usual);
}
