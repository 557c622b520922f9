using BandSpec.Core.LotJudging;

namespace BandSpec.Files.Json;

/// <summary>Writes sampling plans for programs.</summary>
public static class SampleJson
{
    /// <summary>The format's name; it changes when a member is renamed or removed.</summary>
    public const string Format = "bandspec/sample/1";

    /// <summary>The bytes of the document.</summary>
    /// <param name="specification">Number and revision.</param>
    /// <param name="confidence">Confidence of the proof.</param>
    /// <param name="plans">For each criterion its name, what it demands, the steps, and the smallest sample if one was asked for and found.</param>
    public static ReadOnlyMemory<byte> Write(
        string specification, double confidence, IReadOnlyList<(string Name, double Demanded, IReadOnlyList<SamplingStep> Steps, SamplingStep? Smallest)> plans) =>
        JsonFile.Of(json =>
        {
            json.WriteString("format", Format);
            json.WriteString("specification", specification);
            json.Figure("confidence", confidence);
            json.Objects("criteria", plans, (one, plan) =>
            {
                one.WriteString("name", plan.Name);
                one.Figure("demanded", plan.Demanded);
                one.Objects("steps", plan.Steps, (row, step) => Step(row, step));
                if (plan.Smallest is { } smallest)
                    one.Object("smallest", row => Step(row, smallest));
            });
        });

    private static void Step(System.Text.Json.Utf8JsonWriter json, SamplingStep step)
    {
        json.WriteNumber("units", step.Units);
        json.Figure("observe", step.Observe);
        if (step.Chance is { } chance)
            json.Figure("chance", chance);
    }
}
