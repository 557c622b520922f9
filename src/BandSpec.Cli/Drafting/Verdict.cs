using System.Text.Json;

namespace BandSpec.Cli.Drafting;

/// <summary>The answer of a package in short.</summary>
/// <param name="Feasible">Whether a plan fits.</param>
/// <param name="Margin">The margin.</param>
/// <param name="Proven">Whether the best plan is proven and everything was worked out to its end; not when the draft was stopped.</param>
internal sealed record Verdict(bool Feasible, double Margin, bool Proven)
{
    /// <summary>The verdict that a <c>result.json</c> tells; null when it is not one.</summary>
    public static Verdict? Read(ReadOnlyMemory<byte> result)
    {
        try
        {
            using JsonDocument document = JsonDocument.Parse(result);
            JsonElement root = document.RootElement, margin = root.GetProperty("margin");
            // A plan that the requirement pins is not proven best itself: whether the search came to its end stands with what it found instead.
            JsonElement searched = root.TryGetProperty("optimum", out JsonElement optimum) ? optimum : root.GetProperty("plan");
            bool isCut = (root.TryGetProperty("diagnosis-complete", out JsonElement complete) && !complete.GetBoolean()) || root.TryGetProperty("left-out", out _);
            return new Verdict(
                root.GetProperty("feasible").GetBoolean(), margin.ValueKind == JsonValueKind.Null ? double.PositiveInfinity : margin.GetDouble(),
                searched.GetProperty("proven").GetBoolean() && !isCut);
        }
        catch (Exception unreadable) when (unreadable is JsonException or InvalidOperationException or KeyNotFoundException or FormatException)
        {
            return null;
        }
    }
}
