using System.Text;
using BandSpec.Core.Requirements;
using BandSpec.Files.Inputs;
using Xunit;

namespace BandSpec.Tests.Files;

/// <summary>A plan written into a requirement: the three keys, and not one byte more.</summary>
public sealed class PlanPinningTests
{
    private const string Keys = "plan: [-20 °C, 25 °C, 150 °C], zero-degree: 2, span-degree: 1";
    private const string Written = "compensation: { candidate-step: 5 K, temperatures: 3..6, separation: 15 K, reach: 15 K, objective: least-cost }";

    private static readonly string Text = File.ReadAllText(Path.Combine(Demo.Folder, Demo.Brine));

    private static readonly CompensationPlan Plan = CompensationPlan.Of([Given.C(-20), Given.C(25), Given.C(150)], 2, 1, Given.C(25), Given.Station.PressurePoints);

    [Theory]
    [InlineData("compensation: { candidate-step: 5 K, temperatures: 3..6, separation: 15 K, objective: least-cost }   # as agreed", ", " + Keys, " }   #")]
    [InlineData("compensation: {candidate-step: 5 K,temperatures: 3..6,separation: 15 K,objective: least-cost}", ", " + Keys, "}")]
    [InlineData("compensation: {\n    candidate-step: 5 K, # fine\n    temperatures: 3..6, separation: 15 K,\n    objective: \"least-cost\" # cheap\n  }", ", " + Keys, " # cheap")]
    [InlineData("compensation:\n  # our oven\n  candidate-step: 5 K\n  temperatures: 3..6\n  separation: 15 K\n  objective: least-cost  # cheap", "\n  plan: [-20 °C, 25 °C, 150 °C]\n  zero-degree: 2\n  span-degree: 1", "\n")]
    public void Keys_are_added_behind_the_last(string section, string added, string before)
    {
        string text = Text.Replace(Written, section, StringComparison.Ordinal);
        int at = text.IndexOf(before, text.IndexOf("objective", StringComparison.Ordinal), StringComparison.Ordinal);

        Assert.Equal(text.Insert(at, added), Pinned(text));
    }

    [Theory]
    [InlineData("objective: least-cost, plan: [-10 °C, 140 °C], span-degree: 1, zero-degree: 1 }", "objective: least-cost, plan: [-20 °C, 25 °C, 150 °C], span-degree: 1, zero-degree: 2 }")]
    [InlineData("plan: [-10 °C, 140 °C], objective: least-cost }", "plan: [-20 °C, 25 °C, 150 °C], objective: least-cost, zero-degree: 2, span-degree: 1 }")]
    public void Keys_that_are_there_get_new_values(string old, string expected)
    {
        string text = Text.Replace("objective: least-cost }", old, StringComparison.Ordinal);

        Assert.Equal(text.Replace(old, expected, StringComparison.Ordinal), Pinned(text));
    }

    [Fact]
    public void A_list_below_its_key_is_replaced_to_its_last_item()
    {
        const string Section = "compensation:\n  plan:\n    - -10 °C\n    - 140 °C # hot\n\n  # for all\n  candidate-step: 5 K\n  temperatures: 3..6\n  separation: 15 K\n  objective: least-cost";
        string text = Text.Replace(Written, Section, StringComparison.Ordinal);

        Assert.Equal(
            text.Replace("- -10 °C\n    - 140 °C", "[-20 °C, 25 °C, 150 °C]", StringComparison.Ordinal)
                .Replace("objective: least-cost", "objective: least-cost\n  zero-degree: 2\n  span-degree: 1", StringComparison.Ordinal),
            Pinned(text));
    }

    [Theory]
    [InlineData("\r\n", "")]
    [InlineData("\r\n", "\uFEFF")]
    [InlineData("\n", "\uFEFF")]
    public void Line_ends_and_the_mark_at_the_beginning_stay(string lineEnd, string mark)
    {
        string block = Text.Replace(Written, "compensation:\n  candidate-step: 5 K\n  temperatures: 3..6\n  separation: 15 K\n  objective: least-cost", StringComparison.Ordinal);
        string text = mark + block.ReplaceLineEndings(lineEnd);
        string added = $"{lineEnd}  plan: [-20 °C, 25 °C, 150 °C]{lineEnd}  zero-degree: 2{lineEnd}  span-degree: 1";

        Assert.Equal(text.Replace("objective: least-cost", "objective: least-cost" + added, StringComparison.Ordinal), Pinned(text));
    }

    [Fact]
    public void What_is_read_back_pins_the_plan_and_has_no_finding()
    {
        ReadOnlyMemory<byte> pinned = PlanPinning.Pin(Encoding.UTF8.GetBytes(Text), Plan)!.Value;
        InputSet set = InputReading.Read(InputContent.Of(Demo.Brine, pinned), path => InputContent.Of(path, File.ReadAllBytes(Path.Combine(Demo.Folder, path))));

        Assert.Empty(set.Findings);
        Assert.Equal(Plan.Temperatures, set.Application!.Requirement.Compensation.Pinned!.Temperatures);
    }

    [Fact]
    public void A_section_that_is_no_map_is_left_alone() =>
        Assert.Null(PlanPinning.Pin(Encoding.UTF8.GetBytes(Text.Replace(Written, "compensation: none", StringComparison.Ordinal)), Plan));

    private static string Pinned(string text) => Encoding.UTF8.GetString(PlanPinning.Pin(Encoding.UTF8.GetBytes(text), Plan)!.Value.Span);
}
