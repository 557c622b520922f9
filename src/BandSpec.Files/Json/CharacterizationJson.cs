using System.Text.Json;
using BandSpec.Core.Characterizing;

namespace BandSpec.Files.Json;

/// <summary>Writes a characterization for programs; format <c>bandspec/characterization/1</c>.</summary>
public static class CharacterizationJson
{
    /// <summary>The document's bytes.</summary>
    public static ReadOnlyMemory<byte> Of(Characterization found)
    {
        ArgumentNullException.ThrowIfNull(found);
        return JsonFile.Of(json => Write(json, found));
    }

    private static void Write(Utf8JsonWriter json, Characterization found)
    {
        json.WriteString("format", "bandspec/characterization/1");
        json.WriteNumber("units", found.Units);
        json.WriteNumber("lots", found.Lots);
        json.WriteNumber("readings", found.Readings);
        json.WriteNumber("confidence", found.Scope.Confidence);
        json.Figure("deviance", found.Deviance);
        json.Objects("coefficients", found.Coefficients, (item, c) =>
        {
            item.WriteString("name", c.Name.ToString());
            item.Spread(c.Units);
            item.Estimate("lot-sigma", c.LotSigma);
            item.Figure("lot-variance-error", c.LotVarianceError);
        });
        json.WriteStartArray("mean-covariance");
        foreach (IReadOnlyList<double> row in found.MeanCovariance)
        {
            json.WriteStartArray();
            foreach (double value in row)
                json.WriteNumberValue(value);
            json.WriteEndArray();
        }

        json.WriteEndArray();
        json.Objects("correlations", found.Correlations, (item, c) =>
        {
            item.WriteString("first", c.Pair.First.ToString());
            item.WriteString("second", c.Pair.Second.ToString());
            item.Estimate("value", c.Value);
        });
        WriteRest(json, found);
    }

    private static void WriteRest(Utf8JsonWriter json, Characterization found)
    {
        if (found.PressureHysteresis is { } pressure)
            json.Object("pressure-hysteresis", item => item.Spread(pressure));
        if (found.ThermalHysteresis is { } thermal)
            json.Object("thermal-hysteresis", item => item.Spread(thermal));
        json.Estimate("repeatability", found.Repeatability);
        json.Objects("left-out", found.LeftOut, (item, term) =>
        {
            item.WriteString("term", term.Term);
            item.WriteString("reason", term.Reason);
        });
        json.Objects("suspect-units", found.SuspectUnits, (item, unit) =>
        {
            item.WriteString("lot", unit.Lot);
            item.WriteString("unit", unit.Unit);
            item.WriteString("term", unit.Term);
            item.Figure("multiple", unit.Multiple);
            item.Figure("spread-without", unit.SpreadWithout);
            item.Figure("spread-with", unit.SpreadWith);
        });
        json.Objects("suspect-readings", found.SuspectReadings, (item, slip) =>
        {
            item.WriteNumber("line", slip.Reading.Line);
            item.WriteString("unit", slip.Reading.Unit);
            item.Figure("residual", slip.Residual);
            item.Figure("multiple", slip.Multiple);
            item.Figure("shift", slip.Shift);
        });
    }
}

/// <summary>Members that documents of statistics have in common.</summary>
internal static class EstimateMembers
{
    /// <summary>An estimate with its interval; an end that the readings do not set is <c>null</c>.</summary>
    internal static void Estimate(this Utf8JsonWriter json, string name, Estimate estimate) => json.Object(name, item =>
    {
        item.Figure("value", estimate.Value);
        item.Figure("lower", estimate.Lower);
        item.Figure("upper", estimate.Upper);
    });

    /// <summary>The members of a mean and its spread.</summary>
    internal static void Spread(this Utf8JsonWriter json, SpreadEstimate estimate)
    {
        json.Estimate("mean", estimate.Mean);
        json.Figure("mean-error", estimate.MeanError);
        json.Estimate("sigma", estimate.Sigma);
        json.Figure("variance-error", estimate.VarianceError);
    }
}
