using System.Text.Json;
using Xunit;

namespace BandSpec.Tests.Revising;

public sealed class CompareTests
{
    [Fact]
    public void The_same_file_twice_differs_in_nothing()
    {
        using Workshop shop = new();
        Screen screen = shop.Run("compare", Workshop.Brine, Workshop.Brine);
        Assert.Equal((0, "\nHV-3107 revision A → HV-3107 revision A\n\nnothing differs\n", ""), (screen.ExitCode, screen.Output, screen.Error));
    }

    [Fact]
    public void Since_a_revision_in_git_the_screen_says_what_changed_and_what_that_did()
    {
        using Workshop shop = new();
        shop.Commit("rev-a");
        shop.Edit(Workshop.Station, "test-points: { reference: [0, 0.5, 1]", "test-points: { reference: [0, 1]");
        shop.Edit(Workshop.Brine, "guard-band: 1.0", "guard-band: 0");
        Screen screen = shop.Run("compare", $"rev-a:{Workshop.Brine}", Workshop.Brine);
        Assert.Equal(1, screen.ExitCode);
        Assert.Equal("", screen.Error);
        Snapshooter.Xunit3.Snapshot.Match(screen.Output, "compare since a revision in git");
    }

    [Fact]
    public void A_change_that_moves_no_limit_ends_with_exit_code_0()
    {
        using Workshop shop = new();
        shop.Commit("rev-a");
        shop.Edit(Workshop.Brine, "title: Brine reinjection line", "title: Brine line");
        Screen screen = shop.Run("compare", $"rev-a:{Workshop.Brine}", Workshop.Brine);
        Assert.Equal(0, screen.ExitCode);
        Assert.EndsWith("no limit differs\n", screen.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void Json_holds_every_changed_figure()
    {
        using Workshop shop = new();
        shop.Write("old.yaml", shop.Read(Workshop.Brine));
        shop.Edit(Workshop.Brine, "limit: 2.0 %FS", "limit: 2.2 %FS");
        using JsonDocument json = JsonDocument.Parse(shop.Run("compare", "old.yaml", Workshop.Brine, "--json").Output);
        JsonElement root = json.RootElement;
        Assert.True(root.GetProperty("limits-differ").GetBoolean());
        JsonElement input = Assert.Single(root.GetProperty("inputs").EnumerateArray());
        Assert.Equal(
            ("allowed-error[1].limit", 2.0, 2.2, "looser", "looser"),
            (input.GetProperty("name").GetString(), input.GetProperty("old").GetProperty("number").GetDouble(),
                input.GetProperty("new").GetProperty("number").GetDouble(), input.GetProperty("production").GetString(), input.GetProperty("customer").GetString()));
        Assert.Equal("requirement:allowed-error", root.GetProperty("causes")[0].GetProperty("keys")[0].GetString());
        Assert.True(root.GetProperty("outcome").GetArrayLength() > 10);
    }

    [Theory]
    [InlineData("no-such-tag:brine.yaml", "git has no such file")]
    [InlineData("rev-a:../brine.yaml", "it is outside the repository")]
    [InlineData("--upload-pack=x:brine.yaml", "git has no such file")]
    [InlineData("nothing.yaml", "there is no such file")]
    public void A_side_that_cannot_be_had_is_a_finding(string side, string found)
    {
        using Workshop shop = new();
        shop.Commit("rev-a");
        Screen screen = shop.Run("compare", "--", side, Workshop.Brine);
        Assert.Equal(2, screen.ExitCode);
        Assert.Contains(found, screen.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void A_folder_that_is_no_package_is_a_finding()
    {
        using Workshop shop = new();
        Screen screen = shop.Run("compare", "platforms", Workshop.Brine);
        Assert.Equal(2, screen.ExitCode);
        Assert.Contains("no specification's PDF is in this folder", screen.Output, StringComparison.Ordinal);
    }
}
