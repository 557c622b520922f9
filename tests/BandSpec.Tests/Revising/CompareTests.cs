using System.Text.Json;
using System.Xml.Linq;
using UglyToad.PdfPig;
using Xunit;

namespace BandSpec.Tests.Revising;

public sealed class CompareTests
{
    [Fact]
    public void The_same_file_twice_differs_in_nothing()
    {
        using Workshop shop = new();
        Screen screen = shop.Run("compare", Workshop.Brine, Workshop.Brine);
        Assert.Equal((0, "\nHV-3107 revision A → HV-3107 revision A\n\nNothing differs.\n", ""), (screen.ExitCode, screen.Output, screen.Error));
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
        Assert.EndsWith("No limit differs.\n", screen.Output, StringComparison.Ordinal);
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

    [Fact]
    public void Files_folders_pdfs_and_revisions_can_be_compared_with_one_another()
    {
        using Workshop shop = new();
        shop.Commit("rev-a");
        Assert.Equal(0, shop.Run("draft", Workshop.Brine, "--out", "first").ExitCode);
        shop.Write("loose/second.pdf", "");
        shop.Edit(Workshop.Brine, "guard-band: 1.0", "guard-band: 0.5");
        Assert.Equal(0, shop.Run("draft", Workshop.Brine, "--out", "second").ExitCode);
        File.Copy(shop.PathOf("second/HV-3107-A/specification.pdf"), shop.PathOf("loose/second.pdf"), overwrite: true);
        string[] old = [$"rev-a:{Workshop.Brine}", "first/HV-3107-A", "first/HV-3107-A/specification.pdf"], now = [Workshop.Brine, "second/HV-3107-A", "loose/second.pdf"];
        string[] screens = [.. old.SelectMany(_ => now, (a, b) => (a, b)).Select(pair => shop.Run("compare", pair.a, pair.b) is { ExitCode: 1, Error: "" } screen ? screen.Output : "")];
        Assert.Contains("requirement: test.guard-band", Assert.Single(screens.Distinct()), StringComparison.Ordinal);
        Assert.Equal([0, 0], new[] { (old[0], old[1]), (now[2], now[0]) }.Select(pair => shop.Run("compare", pair.Item1, pair.Item2).ExitCode));
    }

    [Fact]
    public void Markdown_is_fit_for_a_merge_request()
    {
        using Workshop shop = Revised();
        Screen screen = shop.Run("compare", "old.yaml", Workshop.Brine, "--markdown");
        Assert.Equal((1, ""), (screen.ExitCode, screen.Error));
        Snapshooter.Xunit3.Snapshot.Match(screen.Output, "compare as Markdown");
    }

    [Fact]
    public void The_report_has_both_bands_in_one_chart()
    {
        using Workshop shop = Revised();
        Assert.Equal(1, shop.Run("compare", "old.yaml", Workshop.Brine, "--report", "changes", "--quiet").ExitCode);
        Assert.Equal(["comparison-band.svg", "comparison.json", "comparison.md", "comparison.pdf"], shop.Names("changes"));
        using PdfDocument pdf = PdfDocument.Open(shop.PathOf("changes/comparison.pdf"));
        string text = string.Join(' ', pdf.GetPages().SelectMany(page => page.GetWords()).Select(word => word.Text));
        Assert.Contains("HV-3107 revision A \u2192 HV-3107 revision B", text, StringComparison.Ordinal);
        Assert.Contains("allowed error, old allowed error, new maximum band, old maximum band, new", text, StringComparison.Ordinal);
        string chart = XDocument.Parse(shop.Read("changes/comparison-band.svg")).ToString();
        Assert.Contains("stroke-dasharray", chart, StringComparison.Ordinal);
        Assert.Contains("](comparison-band.svg)", shop.Read("changes/comparison.md"), StringComparison.Ordinal);
        byte[] first = File.ReadAllBytes(shop.PathOf("changes/comparison.pdf"));
        shop.Run("compare", "old.yaml", Workshop.Brine, "--report", "changes", "--quiet");
        Assert.Equal(first, File.ReadAllBytes(shop.PathOf("changes/comparison.pdf")));
    }

    [Fact]
    public void Two_answers_cannot_share_standard_output()
    {
        using Workshop shop = new();
        Screen screen = shop.Run("compare", Workshop.Brine, Workshop.Brine, "--json", "--markdown");
        Assert.Equal(2, screen.ExitCode);
        Assert.StartsWith("bandspec: --json and --markdown cannot both be written to standard output\n", screen.Error, StringComparison.Ordinal);
    }

    private static Workshop Revised()
    {
        Workshop shop = new();
        shop.Write("old.yaml", shop.Read(Workshop.Brine));
        shop.Edit(Workshop.Brine, "revision: A\n", "revision: B\n");
        shop.Edit(Workshop.Brine, "text: First issue }\n", "text: First issue }\n    - { revision: B, date: 2026-11-24, text: Hot end | as *measured* }\n");
        shop.Edit(Workshop.Brine, "limit: 2.0 %FS", "limit: 1.9 %FS");
        shop.Edit(Workshop.Brine, "safety-factor: 1.1", "safety-factor: 1.2");
        return shop;
    }
}
