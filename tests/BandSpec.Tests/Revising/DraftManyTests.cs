using System.Text.Json;
using System.Xml.Linq;
using Xunit;

namespace BandSpec.Tests.Revising;

/// <summary>Many requirements in one run.</summary>
public sealed class DraftManyTests
{
    [Fact]
    public void One_bad_file_never_stops_the_others_and_inputs_that_are_no_requirements_are_left_out()
    {
        using Workshop shop = Three();
        shop.Edit("b.yaml", "safety-factor: 1.1", "safety-factor: a little");
        Screen screen = shop.Run("draft", "a.yaml", "b.yaml", "c.yaml", Workshop.Platform);
        Assert.Equal(2, screen.ExitCode);
        Assert.EndsWith("""

            a.yaml               FEASIBLE      margin 7.212  out/A-1-A
            b.yaml               1 finding
            c.yaml               FEASIBLE      margin 7.212  out/C-1-A
            platforms/cell.yaml  a platform, not a requirement

            2 drafted, 1 left out, 1 with findings

            """, screen.Output, StringComparison.Ordinal);
        Assert.Equal([".bandspec.lock", "A-1-A", "C-1-A"], shop.Names("out"));
    }

    [Fact]
    public void A_folder_stands_for_the_requirements_below_it()
    {
        using Workshop shop = Three();
        Directory.CreateDirectory(shop.PathOf("deep/er"));
        File.Move(shop.PathOf("c.yaml"), shop.PathOf("deep/er/c.yaml"));
        shop.Edit("deep/er/c.yaml", "platform: platforms", "platform: ../../platforms");
        shop.Edit("deep/er/c.yaml", "station: stations", "station: ../../stations");
        Directory.CreateDirectory(shop.PathOf(".git"));
        using JsonDocument json = JsonDocument.Parse(shop.Run("draft", ".", "--json").Output);
        Assert.Equal(
            ["a.yaml drafted", "b.yaml drafted", "brine.yaml drafted", "deep/er/c.yaml drafted"],
            json.RootElement.GetProperty("files").EnumerateArray().Select(f => $"{f.GetProperty("file").GetString()} {f.GetProperty("state").GetString()}"));
        Assert.Equal((2, "", "bandspec: there is no requirement in platforms\n"), Parts(shop.Run("draft", "platforms")));
    }

    [Fact]
    public void Only_what_changed_is_computed_again()
    {
        using Workshop shop = Three();
        shop.Run("draft", "a.yaml", "b.yaml", "c.yaml");
        DateTime[] before = Written(shop);
        shop.Edit("b.yaml", "guard-band: 1.0", "guard-band: 0.5");
        File.AppendAllText(shop.PathOf("out/C-1-A/limits.csv"), "V99,25,0,bar,0,rising,0,0,5,V,0,0,0,0,0\n");
        Assert.EndsWith("""

            a.yaml  FEASIBLE      margin 7.212  out/A-1-A  up to date
            b.yaml  FEASIBLE      margin 7.212  out/B-1-A
            c.yaml  FEASIBLE      margin 7.212  out/C-1-A

            2 drafted, 1 up to date

            """, shop.Run("draft", "a.yaml", "b.yaml", "c.yaml").Output, StringComparison.Ordinal);
        DateTime[] after = Written(shop);
        Assert.Equal([true, false, false], before.Zip(after, (b, a) => b == a));
        Assert.DoesNotContain("V99", shop.Read("out/C-1-A/limits.csv"), StringComparison.Ordinal);
        shop.Write("templates/limits/card.txt.scriban", "{{ for p in points }}{{ p.id }} {{ p.lower }} {{ p.upper }}\n{{ end }}");
        Assert.Contains("3 drafted", shop.Run("draft", "a.yaml", "b.yaml", "c.yaml").Output, StringComparison.Ordinal);
        Assert.Contains("3 up to date", shop.Run("draft", "a.yaml", "b.yaml", "c.yaml").Output, StringComparison.Ordinal);
    }

    [Fact]
    public void Two_requirements_cannot_share_a_package()
    {
        using Workshop shop = new();
        shop.Write("again.yaml", shop.Read(Workshop.Brine));
        Screen screen = shop.Run("draft", Workshop.Brine, "again.yaml");
        Assert.Equal(2, screen.ExitCode);
        Assert.Contains("again.yaml:2:11: HV-3107-A is already the specification of brine.yaml [same-specification]", screen.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void Changed_since_a_revision_takes_inputs_and_record_into_account()
    {
        using Workshop shop = Three();
        shop.Write("platforms/other.yaml", shop.Read(Workshop.Platform));
        shop.Edit("b.yaml", "platforms/cell.yaml", "platforms/other.yaml");
        shop.Commit("base");
        Screen none = shop.Run("draft", "a.yaml", "b.yaml", "c.yaml", "--changed-since", "base");
        Assert.Equal((0, "3 left out"), (none.ExitCode, none.Output.TrimEnd().Split('\n')[^1]));
        shop.Edit("platforms/other.yaml", "repeatability: 0.012 %FS", "repeatability: 0.013 %FS");
        shop.Edit("c.yaml", "title: Brine reinjection line", "title: Another line");
        Screen some = shop.Run("draft", "a.yaml", "b.yaml", "c.yaml", "--changed-since", "base");
        Assert.Contains("a.yaml  not changed\n", some.Output, StringComparison.Ordinal);
        Assert.Contains("2 drafted, 1 left out", some.Output, StringComparison.Ordinal);
        Assert.Equal((2, "", "bandspec: git knows no revision --output=x\n"), Parts(shop.Run("draft", "a.yaml", "--changed-since=--output=x")));
        Assert.Equal([".bandspec.lock", "B-1-A", "C-1-A"], shop.Names("out"));
    }

    [Fact]
    public void Findings_for_a_merge_request_name_file_line_and_column()
    {
        using Workshop shop = Three();
        shop.Edit("b.yaml", "safety-factor: 1.1", "safety-factor: a < b");
        Assert.Equal(2, shop.Run("check", "a.yaml", "b.yaml", "--sarif", "f.sarif", "--junit", "f.xml").ExitCode);
        using JsonDocument sarif = JsonDocument.Parse(shop.Read("f.sarif"));
        JsonElement run = sarif.RootElement.GetProperty("runs")[0], result = Assert.Single(run.GetProperty("results").EnumerateArray());
        JsonElement physical = result.GetProperty("locations")[0].GetProperty("physicalLocation"), region = physical.GetProperty("region");
        Assert.Equal("2.1.0", sarif.RootElement.GetProperty("version").GetString());
        Assert.Equal(
            ("b.yaml", 24, 16, 21, "number"),
            (physical.GetProperty("artifactLocation").GetProperty("uri").GetString(), region.GetProperty("startLine").GetInt32(), region.GetProperty("startColumn").GetInt32(),
                region.GetProperty("endColumn").GetInt32(), result.GetProperty("ruleId").GetString()));
        Assert.Equal("number", run.GetProperty("tool").GetProperty("driver").GetProperty("rules")[result.GetProperty("ruleIndex").GetInt32()].GetProperty("id").GetString());
        XElement suite = XDocument.Parse(shop.Read("f.xml")).Root!.Element("testsuite")!;
        Assert.Equal(("2", "1", "0"), ((string?)suite.Attribute("tests"), (string?)suite.Attribute("failures"), (string?)suite.Attribute("errors")));
        Assert.StartsWith("b.yaml:24:16: `a < b`", suite.Elements("testcase").Single(c => (string?)c.Attribute("name") == "b.yaml").Element("failure")!.Value, StringComparison.Ordinal);
    }

    [Fact]
    public void One_worker_and_eight_write_a_hundred_packages_of_the_same_bytes()
    {
        using Workshop shop = new();
        string[] files = [.. Enumerable.Range(0, Many).Select(i =>
        {
            string name = $"r{i:000}.yaml";
            shop.Write(name, Variant(shop.Read(Workshop.Brine), $"R-{i}", i));
            return name;
        })];
        Assert.Equal(0, shop.Run(["draft", .. files, "--out", "one", "--workers", "1", "--quiet"]).ExitCode);
        Assert.Equal(0, shop.Run(["draft", .. files, "--out", "eight", "--workers", "8", "--quiet"]).ExitCode);
        string[] one = Everything(shop, "one"), eight = Everything(shop, "eight");
        Assert.Equal(one, eight);
        Assert.Equal(Many, one.Count(name => name.EndsWith("manifest.json", StringComparison.Ordinal)));
        Assert.All(one, name => Assert.Equal(File.ReadAllBytes(shop.PathOf($"one/{name}")), File.ReadAllBytes(shop.PathOf($"eight/{name}"))));
    }

    private const int Many = 100;

    private static string Variant(string text, string number, int step) => text
        .Replace("HV-3107", number, StringComparison.Ordinal)
        .Replace("limit: 2.4 %FS", FormattableString.Invariant($"limit: {2.4 + (step * 0.01):0.00} %FS"), StringComparison.Ordinal);

    private static Workshop Three()
    {
        Workshop shop = new();
        foreach (string letter in new[] { "A", "B", "C" })
            shop.Write($"{letter.ToLowerInvariant()}.yaml", shop.Read(Workshop.Brine).Replace("HV-3107", $"{letter}-1", StringComparison.Ordinal));
        return shop;
    }

    private static (int, string, string) Parts(Screen screen) => (screen.ExitCode, screen.Output, screen.Error);

    private static DateTime[] Written(Workshop shop) =>
        [.. new[] { "A", "B", "C" }.Select(letter => File.GetLastWriteTimeUtc(shop.PathOf($"out/{letter}-1-A/specification.pdf")))];

    private static string[] Everything(Workshop shop, string folder) =>
    [
        .. Directory.EnumerateFiles(shop.PathOf(folder), "*", SearchOption.AllDirectories)
            .Select(path => Path.GetRelativePath(shop.PathOf(folder), path)).Where(name => name[0] != '.').Order(StringComparer.Ordinal),
    ];
}
