using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Core.TestLimits;
using BandSpec.Files.Json;

namespace BandSpec.Files.Csv;

/// <summary>Writes <c>limits.csv</c>: the points of <c>limits.json</c>, one a row, under the same names.</summary>
public static class LimitsCsv
{
    private static readonly string[] Columns =
    [
        "id", "temperature", "pressure", "pressure-unit", "pressure-fraction", "direction", "nominal", "lower", "upper", "output-unit",
        "tolerance", "guard-band", "uncertainty", "consumer-risk", "producer-risk",
    ];

    /// <summary>The bytes of the file.</summary>
    public static ReadOnlyMemory<byte> Write(Specification specification)
    {
        ArgumentNullException.ThrowIfNull(specification);
        OutputSignal output = specification.Application.Requirement.Output;
        CsvText csv = new();
        foreach (string column in Columns)
            csv.Add(column);
        csv.End();
        foreach (VerificationPoint point in specification.VerificationPoints)
        {
            csv.Add(point.Id).Add(point.Temperature.Celsius).Add(point.Pressure.Value).Add(point.Pressure.Unit.Symbol)
                .Add(point.PressureFraction).Add(LimitsJson.Word(point.Direction)).Add(point.Nominal).Add(point.Lower).Add(point.Upper)
                .Add(output.Unit).Add(point.Tolerance.Percent).Add(point.GuardBand.Percent).Add(point.Uncertainty.Percent)
                .Add(point.ConsumerRisk).Add(point.ProducerRisk).End();
        }
        return csv.ToBytes();
    }
}
