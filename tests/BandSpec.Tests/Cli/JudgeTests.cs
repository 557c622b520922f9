using System.Globalization;
using System.Text;
using System.Text.Json;
using System.Xml.Linq;
using BandSpec.Tests.Numerics;
using Json.Schema;
using Snapshooter.Xunit3;
using UglyToad.PdfPig;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>Judging and sampling as a user runs them.</summary>
public sealed class JudgeTests : IDisposable
{
    private readonly Desk desk = new();

    public JudgeTests()
    {
        string[] points =
        [
            .. new[] { (25, 0.0, "rising"), (25, 0.5, "rising"), (25, 1, "rising"), (25, 0.5, "falling"), (85, 0, "rising"), (85, 1, "rising") }.Select((p, i) =>
                string.Create(CultureInfo.InvariantCulture, $$"""
                    { "id": "V{{i + 1}}", "temperature": {{p.Item1}}, "pressure": {{10 * p.Item2}}, "pressure-unit": "bar", "pressure-fraction": {{p.Item2}},
                      "direction": "{{p.Item3}}", "nominal": {{1 + (4 * p.Item2)}}, "lower": {{0.964 + (4 * p.Item2)}}, "upper": {{1.036 + (4 * p.Item2)}},
                      "output-unit": "V", "tolerance": 1 }
                    """)),
        ];
        desk.Write("limits.json", $$"""
            { "format": "bandspec/limits/1", "specification": { "number": "T-7", "revision": "B", "title": "Test lot" },
              "sample-criterion": 1.67, "long-run-criterion": 1.33, "reference-temperature": 25,
              "derived-limits": [ { "name": "zero", "limit": 1 }, { "name": "hysteresis", "limit": 1 }, { "name": "thermal-zero-shift", "from": 25, "to": 85, "limit": 1.2 } ],
              "points": [ {{string.Join(", ", points)}} ] }
            """);
    }

    public void Dispose() => desk.Dispose();

    [Fact]
    public void A_good_lot_is_proven()
    {
        desk.Write("lot.csv", Lot(units: 240, sigma: 0.1));
        (int code, string screen, string error) = desk.Run("judge", "limits.json", "lot.csv", "--proven");
        Assert.Equal((0, ""), (code, error));
        Assert.Contains("PROVEN   within a lot 1.67: proven; over lots 1.33: proven\n240 units pass, 0 fail, 0 incomplete", screen, StringComparison.Ordinal);
        JsonElement json = JsonDocument.Parse(File.ReadAllBytes(desk.At("out/T-7-B-judgement/judgement.json"))).RootElement;
        Assert.Equal((true, 240, 9), (json.GetProperty("proven").GetBoolean(), json.GetProperty("units").GetProperty("pass").GetInt32(), json.GetProperty("characteristics").GetArrayLength()));
        Assert.Equal(241, File.ReadAllLines(desk.At("out/T-7-B-judgement/units.csv")).Length);
    }

    [Fact]
    public void The_whole_screen_of_a_lot_with_every_kind_of_trouble()
    {
        desk.Write("lot.csv", Lot(units: 60, sigma: 0.17) + """
            U001;L1;V1;1,001
            U900;L1;V1;1100
            U900;L1;V2;n/a
            U900;L1;V9;1,0
            U901;L1;V1;1,05

            """);
        (int code, string screen, _) = desk.Run("judge", "limits.json", "lot.csv");
        Assert.Equal(1, code);
        Snapshot.Match(screen);
        Assert.Contains("U901,fail,V1 1.25 %FS; zero at 25 °C 1.25 %FS,V2; V3; V4; V5; V6\n", File.ReadAllText(desk.At("out/T-7-B-judgement/units.csv")), StringComparison.Ordinal);
    }

    [Fact]
    public void A_poor_lot_gets_no_for_an_answer()
    {
        desk.Write("lot.csv", Lot(units: 50, sigma: 0.3));
        Assert.Equal(1, desk.Run("judge", "limits.json", "lot.csv", "--quiet").ExitCode);
    }

    [Fact]
    public void A_lot_that_meets_without_proof_gets_no_only_when_proof_is_asked_for()
    {
        desk.Write("lot.csv", Lot(units: 12, sigma: 0.1));
        Assert.Equal(0, desk.Run("judge", "limits.json", "lot.csv", "--quiet").ExitCode);
        Assert.Equal(1, desk.Run("judge", "limits.json", "lot.csv", "--quiet", "--proven").ExitCode);
    }

    [Fact]
    public void Strict_refuses_a_lot_with_one_bad_line()
    {
        desk.Write("lot.csv", Lot(units: 20, sigma: 0.1) + "U001;L1;V99;1,0\n");
        (int code, string screen, _) = desk.Run("judge", "limits.json", "lot.csv", "--strict");
        Assert.Equal((2, "1 line of a point that is not in the limits\n          lot.csv:122: V99\n\n"), (code, screen));
        Assert.False(Directory.Exists(desk.At("out")));
    }

    [Fact]
    public void Limits_of_another_specification_are_told_from_a_poor_lot()
    {
        desk.Write("lot.csv", Lot(units: 1, sigma: 0.1).Replace(";V", ";W", StringComparison.Ordinal));
        (int code, string output, string error) = desk.Run("judge", "limits.json", "lot.csv");
        Assert.Equal(2, code);
        Assert.StartsWith("6 lines of a point that is not in the limits\n          lot.csv:2: W1\n", output, StringComparison.Ordinal);
        Assert.EndsWith("          and 1 more\n\n", output, StringComparison.Ordinal);
        Assert.Equal("bandspec: no reading is one of T-7-B, whose limits these are; its points are V1, V2, V3, V4, V5 and 1 more; nothing was written\n", error);
        Assert.False(Directory.Exists(desk.At("out")));
    }

    [Theory]
    [InlineData("limits.json", "folder", "folder: it is a folder [file]")]
    [InlineData("folder", "limits.json", "folder: it is a folder [file]")]
    [InlineData("nothing.json", "limits.json", "nothing.json: there is no such file [file]")]
    public void A_folder_or_nothing_in_the_place_of_a_file_is_told_as_that(string limits, string readings, string told)
    {
        Directory.CreateDirectory(desk.At("folder"));
        (int code, string output, string error) = desk.Run("judge", limits, readings);
        Assert.Equal((2, ""), (code, error));
        Assert.StartsWith(told, output, StringComparison.Ordinal);
    }

    [Fact]
    public void Json_is_the_judgement_file()
    {
        desk.Write("lot.csv", Lot(units: 20, sigma: 0.1));
        (_, string output, _) = desk.Run("judge", "limits.json", "lot.csv", "--json", "--out", "here");
        Assert.Equal(File.ReadAllText(desk.At("here/judgement.json")), output);
    }

    [Fact]
    public void A_folder_used_again_keeps_only_the_charts_of_its_judgement_and_what_is_not_ours()
    {
        desk.Write("lot.csv", Lot(units: 20, sigma: 0.1));
        desk.Run("judge", "limits.json", "lot.csv", "--out", "j", "--quiet");
        desk.Write("j/04-V4-photo.svg", "somebody's");
        desk.Write("j/90-V9.svg", "somebody's");
        desk.Write("fewer.csv", string.Join('\n', File.ReadLines(desk.At("lot.csv")).Where(line => !line.Contains(";V6;", StringComparison.Ordinal))));
        string limits = File.ReadAllText(desk.At("limits.json"));
        int sixth = limits.LastIndexOf("{ \"id\"", StringComparison.Ordinal);
        desk.Write("fewer.json", limits[..limits.LastIndexOf(',', sixth)] + limits[limits.IndexOf('}', sixth)..].Replace("} ]", " ]", StringComparison.Ordinal));
        Assert.Equal((0, "", ""), desk.Run("judge", "fewer.json", "fewer.csv", "--out", "j", "--quiet"));
        Assert.Equal(
            ["01-V1.svg", "02-V2.svg", "03-V3.svg", "04-V4-photo.svg", "04-V4.svg", "05-V5.svg", "06-zero-25_C.svg", "07-hysteresis-25_C_x_0_5.svg", "08-thermal-zero-shift-85_C.svg", "90-V9.svg",
                "judgement.json", "judgement.md", "judgement.pdf", "units.csv"],
            Directory.EnumerateFileSystemEntries(desk.At("j")).Select(f => Path.GetFileName(f)!).Order(StringComparer.Ordinal));
    }

    [Theory]
    [InlineData(50, 0.3, "en", "not met")]
    [InlineData(12, 0.1, "en", "met** at every point")]
    [InlineData(240, 0.1, "de", "nachgewiesen")]
    public void The_documents_say_the_verdict_and_show_every_characteristic(int units, double sigma, string language, string verdict)
    {
        desk.Write("lot.csv", Lot(units, sigma));
        desk.Run("judge", "limits.json", "lot.csv", "--out", "j", "--quiet", "--language", language, "--paper", "Letter");
        string markdown = File.ReadAllText(desk.At("j/judgement.md"));
        Assert.Contains(verdict, markdown, StringComparison.Ordinal);
        string[] charts = [.. Directory.EnumerateFiles(desk.At("j"), "*.svg").Select(f => Path.GetFileName(f)!).Order(StringComparer.Ordinal)];
        Assert.Equal(["01-V1.svg", "02-V2.svg", "03-V3.svg", "04-V4.svg", "05-V5.svg", "06-V6.svg", "07-zero-25_C.svg", "08-hysteresis-25_C_x_0_5.svg", "09-thermal-zero-shift-85_C.svg"], charts);
        Assert.All(charts, chart => Assert.Contains(chart, markdown, StringComparison.Ordinal));
        Assert.All(charts, chart => XDocument.Load(desk.At($"j/{chart}")));
        using PdfDocument pdf = PdfDocument.Open(desk.At("j/judgement.pdf"));
        Assert.True(pdf.Advanced.TryGetEmbeddedFiles(out var attached));
        Assert.Equal(File.ReadAllBytes(desk.At("j/judgement.json")), attached.Single().Bytes.ToArray());
        Assert.Contains("T-7-B", pdf.GetPage(1).Text, StringComparison.Ordinal);
    }

    [Fact]
    public void An_unknown_language_is_refused_and_nothing_is_written()
    {
        desk.Write("lot.csv", Lot(units: 12, sigma: 0.1));
        (int code, _, string error) = desk.Run("judge", "limits.json", "lot.csv", "--language", "tlh");
        Assert.Equal(2, code);
        Assert.Contains("the language 'tlh' is not known", error, StringComparison.Ordinal);
        Assert.False(Directory.Exists(desk.At("out")));
    }

    [Fact]
    public void The_judgement_follows_its_schema_to_the_last_member()
    {
        JsonSchema schema = JsonSchema.FromText(desk.Run("schema", "judgement").Out);
        foreach (string lot in new[] { Lot(60, 0.17) + "U900;L1;V1;1100\nU901;L1;V1;1,05\n", Lot(1, 0.1), Lot(9, 0) })
        {
            desk.Write("lot.csv", lot);
            using JsonDocument json = JsonDocument.Parse(desk.Run("judge", "limits.json", "lot.csv", "--json").Out);
            EvaluationResults results = schema.Evaluate(json.RootElement, new EvaluationOptions { OutputFormat = OutputFormat.List });
            Assert.True(results.IsValid, string.Join('\n', (results.Details ?? []).Where(d => d.Errors is not null).SelectMany(d => d.Errors!.Select(e => $"{d.InstanceLocation}: {e.Value}"))));
        }
    }

    /// <summary>Reading, tallying and judging share work between threads; a figure that depends on who comes first shows sooner or later.</summary>
    [Fact]
    public void Twenty_runs_over_a_file_give_every_figure_the_same()
    {
        desk.Write("lot.csv", Lot(units: 4000, sigma: 0.17));
        string first = desk.Run("judge", "limits.json", "lot.csv", "--json").Out;
        for (int run = 2; run <= 20; run++)
            Assert.Equal(first, desk.Run("judge", "limits.json", "lot.csv", "--json").Out);
    }

    [Fact]
    public void Tables_and_limits_that_cannot_be_read_are_findings()
    {
        desk.Write("lot.csv", "serial;point;volts\n");
        Assert.Equal((2, """
            lot.csv:1:1: no column for the reading among `serial`, `point`, `volts` [missing-column]
                1 | serial;point;volts
                  | ^^^^^^^^^^^^^^^^^^
                    accepted: a column `reading`, `output`, `value`, `measured`

            nowhere.csv: there is no such file [file]
                    accepted: a file that can be read

            2 findings in 2 files

            """, ""), desk.Run("judge", "limits.json", "lot.csv", "nowhere.csv"));
        Assert.Equal(2, desk.Run("judge", "lot.csv", "lot.csv").ExitCode);
        Assert.Equal(2, desk.Run("sample", "nowhere.json").ExitCode);
    }

    [Fact]
    public void Sample_shows_what_to_observe()
    {
        (int code, string screen, _) = desk.Run("sample", "limits.json", "--expected", "2.2");
        Assert.Equal(0, code);
        Snapshot.Match(screen);
        JsonElement json = JsonDocument.Parse(desk.Run("sample", "limits.json", "--json").Out).RootElement;
        Assert.Equal(16, json.GetProperty("criteria")[0].GetProperty("steps").GetArrayLength());
        Assert.Equal(2, desk.Run("sample", "limits.json", "--confidence", "2").ExitCode);
    }

    /// <summary>A lot with a German head: semicolons, decimal commas, two lots; the same every time.</summary>
    private static string Lot(int units, double sigma)
    {
        var random = new Random(1);
        StringBuilder text = new("Serial;Lot;Point;Reading [V]\n");
        for (int unit = 1; unit <= units; unit++)
        {
            double own = 0.8 * sigma * Draws.Normal(random);
            for (int point = 0; point < 6; point++)
            {
                double nominal = point switch { 0 or 4 => 1, 2 or 5 => 5, _ => 3 }, error = own + (0.6 * sigma * Draws.Normal(random));
                string reading = (nominal + (0.04 * error)).ToString("0.0000", CultureInfo.InvariantCulture).Replace('.', ',');
                text.Append(CultureInfo.InvariantCulture, $"U{unit:000};L{1 + (unit % 2)};V{point + 1};{reading}\n");
            }
        }

        return text.ToString();
    }
}
