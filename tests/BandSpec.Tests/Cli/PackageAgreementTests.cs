using System.Globalization;
using System.Text.Json;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>
/// The files of a package on disk say the same: limits as JSON, as CSV and in the document, margin and bands as JSON and in the document. That
/// the page shows the figures of its Markdown twin is tested beside the documents.
/// </summary>
public sealed class PackageAgreementTests : IDisposable
{
    private readonly Desk desk = new();

    public PackageAgreementTests() => desk.Run("draft", "brine-reinjection.yaml", "--quiet");

    public void Dispose() => desk.Dispose();

    [Fact]
    public void Limits_are_the_same_as_JSON_and_as_CSV()
    {
        string[] lines = Text("limits.csv").Split('\n', StringSplitOptions.RemoveEmptyEntries);
        string[] names = lines[0].Split(',');
        JsonElement[] points = [.. Json("limits.json").GetProperty("points").EnumerateArray()];
        Assert.Equal(points.Length, lines.Length - 1);
        foreach ((JsonElement point, string line) in points.Zip(lines.Skip(1)))
            foreach ((string name, string cell) in names.Zip(line.Split(',')))
                Assert.Equal(point.GetProperty(name).ToString(), cell);
    }

    [Fact]
    public void The_document_shows_the_limits_rounded_inward_by_less_than_its_last_digit()
    {
        foreach (JsonElement point in Json("limits.json").GetProperty("points").EnumerateArray())
        {
            string[] cells = Row($"| {point.GetProperty("id").GetString()} ");
            Assert.Equal(point.GetProperty("temperature").GetDouble(), Number(cells[1]));
            Assert.Equal(point.GetProperty("pressure").GetDouble(), Number(cells[2]), 1e-9);
            Assert.Equal(point.GetProperty("direction").GetString(), cells[3]);
            Assert.InRange(Number(cells[4]) - point.GetProperty("lower").GetDouble(), -1e-9, 1e-4);
            Assert.InRange(point.GetProperty("upper").GetDouble() - Number(cells[6]), -1e-9, 1e-4);
        }
    }

    [Fact]
    public void The_document_shows_the_margin_and_the_bands_of_the_result()
    {
        JsonElement result = Json("result.json");
        double margin = result.GetProperty("margin").GetDouble();
        Assert.Contains($"{Math.Floor(margin * 1000) / 1000:0.000}", Text("specification.md"), StringComparison.Ordinal);
        foreach (JsonElement region in result.GetProperty("regions").EnumerateArray())
        {
            string[] cells = Row($"| {region.GetProperty("from").GetDouble():0.#} °C to ".Replace('-', '−'));
            Assert.InRange(Number(cells[2]) - region.GetProperty("maximum").GetDouble(), -1e-6, 0.05);
            Assert.InRange(Number(cells[3]) - region.GetProperty("typical").GetDouble(), -1e-6, 0.05);
            Assert.InRange(region.GetProperty("margin").GetDouble() - Number(cells[4]), -1e-6, 1e-3);
        }
    }

    /// <summary>The cells of the one table row that begins so and has a number in its second cell.</summary>
    private string[] Row(string begin) => Text("specification.md").Replace('\u00a0', ' ').Replace('\u202f', ' ').Split('\n')
        .Where(line => line.StartsWith(begin, StringComparison.Ordinal))
        .Select(line => line.Split('|', StringSplitOptions.TrimEntries)[1..^1])
        .First(cells => cells.Length > 6);

    private string Text(string file) => File.ReadAllText(desk.At($"out/HV-3107-A/{file}"));

    private JsonElement Json(string file) => JsonDocument.Parse(Text(file)).RootElement;

    private static double Number(string cell) => double.Parse(cell.Replace('−', '-'), CultureInfo.InvariantCulture);
}
