using System.Text.Json;
using Snapshooter.Xunit3;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>The commands as a user runs them: exit code and the whole screen.</summary>
public sealed class CommandTests : IDisposable
{
    private readonly Desk desk = new();

    public void Dispose() => desk.Dispose();

    [Fact]
    public void Check_says_that_a_requirement_is_in_order() => Assert.Equal(
        (0, "brine-reinjection.yaml: in order, with platforms/steel-cell-40.yaml and stations/chamber-line-2.yaml\n", ""),
        desk.Run("check", "brine-reinjection.yaml"));

    [Fact]
    public void Check_says_nothing_about_what_is_in_order_when_it_is_to_be_quiet() =>
        Assert.Equal((0, "", ""), desk.Run("check", "brine-reinjection.yaml", "--quiet"));

    [Fact]
    public void Check_shows_findings_and_goes_on_with_the_other_files()
    {
        desk.Change("brine-reinjection.yaml", "title:", "titel:");
        desk.Write("second.yaml", File.ReadAllText(desk.At("brine-reinjection.yaml")).Replace("titel:", "title:", StringComparison.Ordinal));

        Assert.Equal((2, """
            brine-reinjection.yaml:4:3: unknown key `titel` [unknown-key]
                4 |   titel: Brine reinjection line, wellhead skid
                  |   ^^^^^
                    accepted: the specification's identity: the keys number, revision, title, customer, prepared-by, date, changes
                    did you mean `title`?

            1 finding in 1 file
            second.yaml: in order, with platforms/steel-cell-40.yaml and stations/chamber-line-2.yaml

            """, ""), desk.Run("check", "brine-reinjection.yaml", "second.yaml"));
    }

    [Fact]
    public void Check_tells_programs_the_facts_of_every_finding()
    {
        desk.Change("brine-reinjection.yaml", "title:", "titel:");

        (int code, string output, _) = desk.Run("check", "brine-reinjection.yaml", "--json");

        Assert.Equal(2, code);
        JsonElement finding = JsonDocument.Parse(output).RootElement.GetProperty("files")[0].GetProperty("findings")[0];
        Assert.Equal((4, 3, 5), (finding.GetProperty("line").GetInt32(), finding.GetProperty("column").GetInt32(), finding.GetProperty("length").GetInt32()));
        Assert.Equal(("unknown-key", "title"), (finding.GetProperty("rule").GetString(), finding.GetProperty("nearest").GetString()));
    }

    [Fact]
    public void A_requirement_that_is_not_there_is_a_finding() => Assert.Equal((2, """
        pump.yaml: there is no such file [file]
                accepted: a file that can be read

        1 finding in 1 file

        """, ""), desk.Run("check", "pump.yaml"));

    [Theory]
    [InlineData("../../outside.yaml")]
    [InlineData("/etc/hostname")]
    [InlineData("link.yaml")]
    public void A_platform_outside_the_project_is_not_read(string platform)
    {
        Directory.CreateDirectory(desk.At("project/requirements"));
        foreach (string file in new[] { "brine-reinjection.yaml", "stations/chamber-line-2.yaml" })
            desk.Write($"project/requirements/{file}", File.ReadAllText(desk.At(file)));
        desk.Write("outside.yaml", File.ReadAllText(desk.At("platforms/steel-cell-40.yaml")));
        File.CreateSymbolicLink(desk.At("project/requirements/link.yaml"), desk.At("outside.yaml"));
        desk.Change("project/requirements/brine-reinjection.yaml", "platforms/steel-cell-40.yaml", platform);

        (int code, string output, _) = desk.Run("check", "project/requirements/brine-reinjection.yaml");

        Assert.Equal(2, code);
        Assert.Contains("it is outside the project, DESK/project/requirements; `--root` gives another [file]", output, StringComparison.Ordinal);
        Assert.Equal(platform[0] == '/' ? 2 : 0, desk.Run("check", "project/requirements/brine-reinjection.yaml", "--root", ".").ExitCode);
    }

    [Fact]
    public void A_project_reaches_to_the_folder_with_git_in_it()
    {
        Directory.CreateDirectory(desk.At(".git"));
        desk.Write("a/b/brine.yaml", File.ReadAllText(desk.At("brine-reinjection.yaml"))
            .Replace("platforms/", "../../platforms/", StringComparison.Ordinal).Replace("stations/", "../../stations/", StringComparison.Ordinal));

        Assert.Equal(0, desk.Run("check", "a/b/brine.yaml").ExitCode);
    }

    [Fact]
    public void New_writes_three_starters_that_go_together()
    {
        Assert.Equal((0, "pump.yaml is written; fill it in, then run bandspec check pump.yaml\n", ""), desk.Run("new", "pump.yaml"));
        Assert.Equal(0, desk.Run("new", "platform.yaml", "--kind", "platform").ExitCode);
        Assert.Equal(0, desk.Run("new", "station.yaml", "--kind", "station").ExitCode);

        Assert.Equal((0, "pump.yaml: in order, with platform.yaml and station.yaml\n", ""), desk.Run("check", "pump.yaml"));
    }

    [Fact]
    public void New_never_overwrites()
    {
        desk.Write("pump.yaml", "mine");

        Assert.Equal((2, "", "bandspec: pump.yaml exists already and was left as it is\n"), desk.Run("new", "pump.yaml"));
        Assert.Equal("mine", File.ReadAllText(desk.At("pump.yaml")));
    }

    [Theory]
    [InlineData("requirement")]
    [InlineData("platform")]
    [InlineData("station")]
    [InlineData("result")]
    [InlineData("limits")]
    public void Schema_writes_json(string kind)
    {
        (int code, string output, _) = desk.Run("schema", kind);

        Assert.Equal(0, code);
        Assert.Equal($"urn:bandspec:{kind}:1", JsonDocument.Parse(output).RootElement.GetProperty("$id").GetString());
    }

    [Fact]
    public void A_wrong_command_line_is_explained_on_standard_error()
    {
        Assert.Equal((2, "", "bandspec: there is no command `chek`; did you mean `check`?\nbandspec: see `bandspec --help`\n"), desk.Run("chek", "pump.yaml"));
        Assert.Equal((2, "", "bandspec: there is no option `--jsn`; did you mean `--json`?\nbandspec: see `bandspec check --help`\n"), desk.Run("check", "pump.yaml", "--jsn"));
    }

    [Theory]
    [InlineData("draft x.yaml --workers many", "`many`: --workers takes a whole number from 1 to 1024", "draft ")]
    [InlineData("draft x.yaml --workers 0", "`0`: --workers takes a whole number from 1 to 1024", "draft ")]
    [InlineData("draft x.yaml --paper A5", "there is no paper `A5`; --paper takes A4 or Letter", "draft ")]
    [InlineData("draft x.yaml --paper 1", "there is no paper `1`; --paper takes A4 or Letter", "draft ")]
    [InlineData("try x.yaml --seed -1", "`-1`: --seed takes a whole number from 0 to 2^64 - 1", "try ")]
    [InlineData("sample x.json --confidence NaN", "`NaN`: --confidence takes a number between 0 and 1", "sample ")]
    public void A_wrong_value_of_an_option_is_refused_in_words(string line, string message, string command) =>
        Assert.Equal((2, "", $"bandspec: {message}\nbandspec: see `bandspec {command}--help`\n"), desk.Run(line.Split(' ')));

    [Fact]
    public void Without_a_command_the_help_is_shown() => Assert.Equal(desk.Run("--help"), desk.Run());

    [Fact]
    public void Help_teaches_with_examples() => Snapshot.Match(desk.Run("--help").Out + desk.Run("draft", "--help").Out);

    [Fact]
    public void Draft_shows_the_answer_on_one_screen() => Snapshot.Match(desk.Run("draft", "brine-reinjection.yaml").Out);

    [Fact]
    public void Draft_writes_the_package_and_its_manifest_lists_every_file()
    {
        Assert.Equal((0, "", ""), desk.Run("draft", "brine-reinjection.yaml", "--quiet"));

        string[] files = [.. Directory.EnumerateFiles(desk.At("out/HV-3107-A")).Select(file => Path.GetFileName(file)).Order(StringComparer.Ordinal)];
        JsonElement manifest = JsonDocument.Parse(File.ReadAllText(desk.At("out/HV-3107-A/manifest.json"))).RootElement;
        Assert.Equal(files.Where(file => file != "manifest.json"), manifest.GetProperty("outputs").EnumerateArray().Select(file => file.GetProperty("name").GetString()));
        Assert.Equal(["requirement", "platform", "station"], manifest.GetProperty("inputs").EnumerateArray().Select(file => file.GetProperty("kind").GetString()));
        Assert.Contains("specification.pdf", files);
    }

    [Fact]
    public void A_draft_is_the_same_to_the_byte_when_it_is_made_again()
    {
        desk.Run("draft", "brine-reinjection.yaml", "--out", "first");
        desk.Run("draft", "brine-reinjection.yaml", "--out", "second");

        foreach (string file in Directory.EnumerateFiles(desk.At("first/HV-3107-A")))
            Assert.Equal(File.ReadAllBytes(file), File.ReadAllBytes(desk.At($"second/HV-3107-A/{Path.GetFileName(file)}")));
    }

    [Fact]
    public void Draft_of_several_files_sums_up_and_ends_with_the_worst()
    {
        desk.Write("bad.yaml", "safety-factor: 1,15");
        desk.Write("tight.yaml", File.ReadAllText(desk.At("brine-reinjection.yaml")).Replace("number: HV-3107", "number: HV-1", StringComparison.Ordinal)
            .Replace("safety-factor: 1.15", "safety-factor: 9", StringComparison.Ordinal));

        (int code, string output, _) = desk.Run("draft", "bad.yaml", "tight.yaml", "brine-reinjection.yaml");

        Assert.Equal(2, code);
        Assert.Contains("""
            bad.yaml                12 findings
            tight.yaml              NOT FEASIBLE  margin -0.
            """.ReplaceLineEndings("\n"), output, StringComparison.Ordinal);
        Assert.True(File.Exists(desk.At("out/HV-1-A/specification.pdf")));
        Assert.True(File.Exists(desk.At("out/HV-3107-A/specification.pdf")));
        Assert.Equal(1, desk.Run("draft", "tight.yaml", "--quiet").ExitCode);
    }

    [Fact]
    public void A_letter_that_no_font_has_is_a_finding()
    {
        desk.Change("brine-reinjection.yaml", "customer: Holmvik Geothermal", "customer: Holmvik 地熱");

        Assert.Equal((2, """
            brine-reinjection.yaml:5:13: no font of the documents has `地` (U+5730), `熱` (U+71B1) [letter]
                5 |   customer: Holmvik 地熱
                  |             ^^^^^^^^^^^^
                    accepted: Latin, Greek and Cyrillic letters

            1 finding in 1 file

            """, ""), desk.Run("draft", "brine-reinjection.yaml"));
    }

    [Fact]
    public void A_broken_template_is_reported_with_its_place()
    {
        desk.Write("mine/limits/broken.txt.scriban", "first line\n{{ for }}");

        (int code, string output, _) = desk.Run("draft", "brine-reinjection.yaml", "--templates", "mine");

        Assert.Equal(2, code);
        Assert.StartsWith("mine/limits/broken.txt.scriban:2:", output, StringComparison.Ordinal);
        Assert.False(Directory.Exists(desk.At("out")));
    }

    [Fact]
    public void Result_limits_and_table_say_the_same()
    {
        desk.Run("draft", "brine-reinjection.yaml", "--quiet");
        JsonElement result = JsonDocument.Parse(File.ReadAllText(desk.At("out/HV-3107-A/result.json"))).RootElement;
        JsonElement limits = JsonDocument.Parse(File.ReadAllText(desk.At("out/HV-3107-A/limits.json"))).RootElement;
        string[][] rows = [.. File.ReadAllLines(desk.At("out/HV-3107-A/limits.csv")).Select(line => line.Split(','))];

        Assert.Equal(result.GetProperty("specification").GetRawText(), limits.GetProperty("specification").GetRawText());
        Assert.Equal(result.GetProperty("feasible").GetBoolean(), limits.GetProperty("feasible").GetBoolean());
        JsonElement[] points = [.. limits.GetProperty("points").EnumerateArray()];
        Assert.Equal(points.Length, rows.Length - 1);
        for (int i = 0; i < points.Length; i++)
            Assert.Equal(points[i].EnumerateObject().Select(member => member.Value.ToString()), rows[i + 1]);
        Assert.Equal(points[0].EnumerateObject().Select(member => member.Name), rows[0]);
    }

    [Fact]
    public void A_folder_that_cannot_be_written_to_is_one_line_on_standard_error()
    {
        desk.Write("taken", "a file");

        (int code, string output, string error) = desk.Run("draft", "brine-reinjection.yaml", "--out", "taken");

        Assert.Equal((3, ""), (code, output));
        Assert.StartsWith("bandspec: DESK/taken/HV-3107-A cannot be written: ", error, StringComparison.Ordinal);
        Assert.Equal(1, error.Count(c => c == '\n'));
    }
}
