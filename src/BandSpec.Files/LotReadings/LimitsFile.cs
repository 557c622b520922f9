using System.Text.Json;
using BandSpec.Core.Findings;
using BandSpec.Core.LotJudging;
using BandSpec.Core.Quantities;
using BandSpec.Core.TestLimits;
using BandSpec.Files.Inputs;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.LotReadings;

/// <summary>Reads a limits file (<c>limits.json</c>, format <c>bandspec/limits/1</c>) as what a lot is held against.</summary>
public static class LimitsFile
{
    /// <summary>The format that is read.</summary>
    public const string Format = "bandspec/limits/1";

    /// <summary>Reads the file; what is wrong with it comes back as a finding, and then there are no limits.</summary>
    /// <param name="name">Its name, for the finding.</param>
    /// <param name="json">Its bytes, UTF-8.</param>
    public static (LotLimits? Limits, IReadOnlyList<PlacedFinding> Findings) Read(string name, ReadOnlyMemory<byte> json)
    {
        try
        {
            using JsonDocument document = JsonDocument.Parse(json);
            return (Limits(new JsonPart(document.RootElement, "")), []);
        }
        catch (JsonException fault)
        {
            return (null, [Refused(name, "json", "not valid JSON", "a limits file as this program writes it", (int)(fault.LineNumber ?? 0) + 1)]);
        }
        catch (JsonPartException fault)
        {
            return (null, [Refused(name, "limits", fault.Message, fault.Accepted, 1)]);
        }
    }

    private static LotLimits Limits(JsonPart root)
    {
        if (root.Text("format") is var format && format != Format)
            throw new JsonPartException($"`format` is `{format}`", Format);
        LotPoint[] points = [.. root.List("points").Select(Point)];
        if (points.Length == 0)
            throw new JsonPartException("`points` is empty", "at least one point");
        if (points.GroupBy(p => p.Id).FirstOrDefault(group => group.Count() > 1) is { } twice)
            throw new JsonPartException($"two points are called `{twice.Key}`", "ids that differ");
        JsonPart identity = root.Part("specification");
        return new LotLimits
        {
            Specification = $"{identity.Text("number")}-{identity.Text("revision")}",
            Title = identity.OptionalText("title") ?? "",
            OutputUnit = root.List("points").First().Text("output-unit"),
            OutputSpan = OutputSpan(points),
            SampleCriterion = root.Positive("sample-criterion"),
            LongRunCriterion = root.Positive("long-run-criterion"),
            Points = points,
            DerivedLimits = [.. root.OptionalList("derived-limits").Select(DerivedLimit)],
            ReferenceTemperature = Celsius(root, "reference-temperature"),
        };
    }

    private static LotPoint Point(JsonPart part)
    {
        string unit = part.Text("pressure-unit");
        return new LotPoint(
            part.Text("id"),
            Celsius(part, "temperature") ?? throw part.Lacking("temperature", "a number"),
            Pressure.From(part.Number("pressure"), PressureUnit.All.FirstOrDefault(known => known.Symbol == unit)
                ?? throw new JsonPartException($"`{part.Path}.pressure-unit` is `{unit}`", string.Join(", ", PressureUnit.All))),
            part.Number("pressure-fraction"),
            part.OptionalText("direction") switch { "rising" => PressureDirection.Rising, "falling" => PressureDirection.Falling, _ => null },
            part.Number("nominal"), part.Number("lower"), part.Number("upper"),
            PercentOfSpan.FromPercent(part.Positive("tolerance")));
    }

    private static LotDerivedLimit DerivedLimit(JsonPart part) => new(
        part.Text("name"),
        Celsius(part, "from"),
        Celsius(part, "to"),
        PercentOfSpan.FromPercent(part.Positive("limit")));

    private static Temperature? Celsius(JsonPart part, string key) =>
        part.OptionalNumber(key) is not { } celsius ? null
        : Temperature.IsValid(celsius) ? Temperature.FromCelsius(celsius)
        : throw part.Lacking(key, "a temperature above absolute zero, °C");

    /// <summary>From the two points farthest apart in pressure: the nominal output is a straight line.</summary>
    private static double OutputSpan(LotPoint[] points)
    {
        LotPoint low = points.MinBy(p => p.PressureFraction)!, high = points.MaxBy(p => p.PressureFraction)!;
        double span = (high.Nominal - low.Nominal) / (high.PressureFraction - low.PressureFraction);
        return double.IsFinite(span) && span != 0
            ? span
            : throw new JsonPartException("all `points` share one pressure or one nominal output", "points that tell the output's span");
    }

    private static PlacedFinding Refused(string name, string rule, string found, string accepted, int line) =>
        new(new Finding(FieldPath.InReadings(""), rule, found, accepted), new Place(name, line, 1, 1, ""));
}
