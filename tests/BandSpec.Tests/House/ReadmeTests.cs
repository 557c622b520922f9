using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Documents;
using BandSpec.Files.Inputs;
using Xunit;

namespace BandSpec.Tests.House;

/// <summary>What README.md says holds for the tree it stands in.</summary>
public sealed class ReadmeTests
{
    private static readonly string Demos = Path.Combine(Tree.Root, "requirements-demo");
    private static readonly string Readme = File.ReadAllText(Path.Combine(Tree.Root, "README.md"));

    [Fact]
    public void The_picture_is_the_one_the_program_draws()
    {
        Specification specification = Draft("brine-reinjection.yaml");
        DocumentFile drawn = SpecificationPackage.Draw(specification, [], new DocumentOptions { Program = "BandSpec" })
            .Single(f => f.Name == "band-over-temperature.svg");
        Assert.Equal(File.ReadAllText(Path.Combine(Demos, "pictures", "brine-reinjection-band.svg")), System.Text.Encoding.UTF8.GetString(drawn.Bytes.Span));
    }

    [Fact]
    public void The_picture_of_what_more_money_buys_is_the_one_the_program_draws()
    {
        ReadOnlyMemory<byte> drawn = TradeoffDrawing.Draw(PlanAlternatives.Of(Read("brine-reinjection.yaml")), new DocumentOptions { Program = "BandSpec" });
        Assert.Equal(File.ReadAllText(Path.Combine(Demos, "pictures", "brine-reinjection-tradeoff.svg")), System.Text.Encoding.UTF8.GetString(drawn.Span));
    }

    [Fact]
    public void The_figures_of_the_first_demo_are_those_of_the_program()
    {
        Specification specification = Draft("brine-reinjection.yaml");
        Assert.Contains($"{specification.Choice.PlansConsidered:N0} candidate plans", Readme, StringComparison.Ordinal);
        Assert.Contains($"margin of {Math.Floor(specification.Bands.Margin * 1000) / 1000:0.000}", Readme, StringComparison.Ordinal);
        Assert.Contains($"no more than {Math.Floor(specification.Floor.Margin * 1000) / 1000:0.000}", Readme, StringComparison.Ordinal);
        Assert.Equal(4, specification.Choice.Plan.Temperatures.Count);
    }

    [Theory]
    [InlineData("brine-reinjection.yaml", true)]
    [InlineData("cold-store-suction.yaml", true)]
    [InlineData("hydrogen-dryer.yaml", false)]
    public void The_demos_show_what_they_are_said_to_show(string file, bool feasible)
    {
        Specification specification = Draft(file);
        Assert.Equal(feasible, specification.Feasible);
        if (feasible)
            Assert.InRange(specification.Bands.Margin, 1, 1.2);
        else
            Assert.True(specification.Floor.Bound < 1);
    }

    [Fact]
    public void Everything_at_the_top_is_told_of()
    {
        string[] known = ["README.md", "DEVELOPERS.md", "LICENSE", "BandSpec.sln", "Directory.Build.props", "Directory.Packages.props", "src", "tests", "requirements-demo", "templates", "out"];
        Assert.Empty(Directory.EnumerateFileSystemEntries(Tree.Root).Select(Path.GetFileName).Where(n => n![0] != '.').Except(known));
    }

    private static Specification Draft(string file) => SpecificationDraft.Draft(Read(file));

    private static Application Read(string file)
    {
        InputSet set = InputReading.Read(Content(file), Content);
        Assert.Empty(set.Findings);
        return set.Application!;
    }

    private static InputContent Content(string file) => InputContent.Of(file, File.ReadAllBytes(Path.Combine(Demos, file)));
}
