using System.Text.Json;
using BandSpec.Core.Specifying;
using BandSpec.Core.VirtualLots;

namespace BandSpec.Files.Json;

/// <summary>Writes what virtual lots showed, for programs.</summary>
public static class LotReportJson
{
    /// <summary>The format's name; it changes when a member is renamed or removed.</summary>
    public const string Format = "bandspec/lots/1";

    /// <summary>The bytes of the document.</summary>
    /// <param name="specification">The specification that was tried.</param>
    /// <param name="report">What the lots showed.</param>
    /// <param name="leaving">The probability of leaving anywhere.</param>
    public static ReadOnlyMemory<byte> Write(Specification specification, LotReport report, LeavingProbability leaving)
    {
        ArgumentNullException.ThrowIfNull(specification);
        ArgumentNullException.ThrowIfNull(report);
        ArgumentNullException.ThrowIfNull(leaving);
        return JsonFile.Of(json =>
        {
            json.WriteString("format", Format);
            json.Identity(specification.Application.Requirement.Identity);
            json.WriteNumber("units", report.Units);
            json.WriteNumber("lots", report.Lots);
            json.WriteNumber("lot-size", report.LotSize);
            json.WriteBoolean("complete", report.IsComplete);
            json.Objects("steps", report.Steps, (item, step) =>
            {
                item.WriteString("name", step.Name);
                WriteRate(item, step.Through);
            });
            json.Object("good", item => WriteRate(item, report.Good));
            json.Object("good-rejected", item => WriteRate(item, report.GoodRejected));
            json.Object("accepted-leaving", item => WriteRate(item, report.AcceptedLeaving));
            json.Objects("accepted-leaving-by-region", report.AcceptedLeavingByRegion, WriteRate);
            json.Object("use-outside", item => WriteRate(item, report.UseOutside));
            json.Object("leaving-probability", item => WriteLeaving(item, leaving));
            json.Object("histogram", item => WriteHistogram(item, report.Histogram));
            json.Objects("twins", report.Twins, WriteTwin);
        });
    }

    private static void WriteRate(Utf8JsonWriter json, Rate rate)
    {
        json.WriteNumber("count", rate.Count);
        json.WriteNumber("of", rate.Of);
        json.Figure("value", rate.Value);
        json.Figures("interval-95", [rate.Lower, rate.Upper]);
        json.Figure("design-effect", rate.DesignEffect);
    }

    private static void WriteLeaving(Utf8JsonWriter json, LeavingProbability leaving)
    {
        foreach ((string name, SampledProbability probability) in new[]
            { ("any-unit", leaving.AnyUnit), ("accepted-unit", leaving.AcceptedUnit), ("accepted", leaving.Accepted) })
            json.Object(name, item =>
            {
                item.Figure("value", probability.Value);
                item.Figure("standard-error", probability.StandardError);
                item.WriteNumber("draws", probability.Draws);
            });
        json.Figure("largest-pointwise", leaving.LargestPointwise);
        json.Figure("sum-pointwise", leaving.SumPointwise);
    }

    private static void WriteHistogram(Utf8JsonWriter json, ErrorHistogram histogram)
    {
        json.Figure("end", histogram.End);
        json.Figures("bins", histogram.Bins.Select(bin => (double)bin));
        json.WriteNumber("below", histogram.Below);
        json.WriteNumber("above", histogram.Above);
    }

    private static void WriteTwin(Utf8JsonWriter json, Twin twin)
    {
        json.WriteString("figure", twin.Figure);
        json.WriteString("place", twin.Place);
        json.Figure("closed-form", twin.ClosedForm);
        json.Figure("simulated", twin.Simulated);
        json.Figure("standard-error", twin.StandardError);
        json.Figure("known", twin.Known);
        json.Figure("difference", twin.Difference);
    }
}
