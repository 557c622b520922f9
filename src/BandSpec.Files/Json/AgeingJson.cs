using System.Text.Json;
using BandSpec.Core.Characterizing;

namespace BandSpec.Files.Json;

/// <summary>Writes ageing statistics for programs; format <c>bandspec/ageing/1</c>.</summary>
public static class AgeingJson
{
    /// <summary>The document's bytes.</summary>
    public static ReadOnlyMemory<byte> Of(AgeingStatistics found)
    {
        ArgumentNullException.ThrowIfNull(found);
        return JsonFile.Of(json =>
        {
            json.WriteString("format", "bandspec/ageing/1");
            json.WriteNumber("units", found.Units);
            json.WriteNumber("readings", found.Readings);
            json.WriteNumber("confidence", found.Scope.Confidence);
            json.WriteNumber("test-celsius", found.Scope.TestTemperature.Celsius);
            json.WriteNumber("test-hours", found.Scope.TestDuration.Hours);
            json.Object("zero", item => item.Spread(found.Zero));
            json.Object("span", item => item.Spread(found.Span));
            json.Estimate("activation-energy", found.ActivationEnergy);
            json.Estimate("time-exponent", found.TimeExponent);
            json.Objects("region", found.Region, (item, place) =>
            {
                item.Figure("activation-energy", place.ActivationEnergy);
                item.Figure("time-exponent", place.TimeExponent);
            });
            json.Estimate("repeatability", found.Repeatability);
            json.Object("errors", item => Write(item, found.Errors));
            if (found.ErrorsWithPlannedTest is { } then)
                json.Object("errors-with-planned-test", item => Write(item, then));
            json.Objects("assumed", found.LeftOut, (item, term) =>
            {
                item.WriteString("term", term.Term);
                item.WriteString("reason", term.Reason);
            });
        });
    }

    private static void Write(Utf8JsonWriter json, DriftErrors errors)
    {
        json.Figure("activation-energy", errors.ActivationEnergy);
        json.Figure("time-exponent", errors.TimeExponent);
        json.Figure("zero-mean", errors.ZeroMean);
        json.Figure("span-mean", errors.SpanMean);
        json.Figure("zero-sigma", errors.ZeroSigma);
        json.Figure("span-sigma", errors.SpanSigma);
    }
}
