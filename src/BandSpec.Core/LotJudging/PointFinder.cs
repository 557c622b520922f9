using BandSpec.Core.Quantities;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.LotJudging;

/// <summary>Finds the point that a line of readings means, by id or by place. Not for several threads at once.</summary>
public sealed class PointFinder
{
    /// <summary>A chamber may be this far from the temperature of the point.</summary>
    public static TemperatureDifference TemperatureReach { get; } = TemperatureDifference.FromKelvin(5);

    /// <summary>A pressure may be this far from that of the point, as a fraction of the span.</summary>
    public const double PressureReach = 0.02;

    private readonly LotLimits limits;
    private readonly Dictionary<string, int> ids;
    private readonly Dictionary<string, int>.AlternateLookup<ReadOnlySpan<char>> byId;
    private readonly (double Slope, double Zero) fractionOfPascals;
    private int last;

    /// <summary>A finder among the points of these limits.</summary>
    public PointFinder(LotLimits limits)
    {
        ArgumentNullException.ThrowIfNull(limits);
        this.limits = limits;
        ids = limits.Points.Select((point, i) => (point.Id, i)).ToDictionary(p => p.Id, p => p.i, StringComparer.OrdinalIgnoreCase);
        byId = ids.GetAlternateLookup<ReadOnlySpan<char>>();
        fractionOfPascals = FractionOfPascals(limits);
    }

    /// <summary>The index of the point with this id, in upper or lower case; −1 when there is none.</summary>
    public int ById(ReadOnlySpan<char> id)
    {
        // Readings mostly come in the order of the test.
        int next = last + 1 < limits.Points.Count ? last + 1 : 0;
        if (id.SequenceEqual(limits.Points[next].Id))
            return last = next;
        return byId.TryGetValue(id, out int found) ? last = found : -1;
    }

    /// <summary>
    /// The index of the nearest point within <see cref="TemperatureReach"/> and <see cref="PressureReach"/> that has the direction; −1 when there is
    /// none, −2 when the direction is not said and both fit.
    /// </summary>
    /// <param name="celsius">Chamber temperature, °C.</param>
    /// <param name="pascals">Applied pressure, Pa.</param>
    /// <param name="direction">From which side; may be <see langword="null"/>.</param>
    public int ByPlace(double celsius, double pascals, PressureDirection? direction)
    {
        double fraction = fractionOfPascals.Zero + fractionOfPascals.Slope * pascals, nearest = double.PositiveInfinity;
        int found = -1;
        for (int i = 0; i < limits.Points.Count; i++)
        {
            LotPoint point = limits.Points[i];
            double far = Math.Abs(point.Temperature.Celsius - celsius) / TemperatureReach.Kelvin;
            double off = Math.Abs(point.PressureFraction - fraction) / PressureReach;
            if (far > 1 || off > 1 || (direction is { } wanted && point.Direction is { } side && side != wanted))
                continue;
            double distance = far + off;
            if (distance == nearest)
                found = -2;
            else if (distance < nearest)
                (found, nearest) = (i, distance);
        }

        return found;
    }

    /// <summary>The straight line from pressures to fractions, through the two points farthest apart; level when all points share a pressure.</summary>
    private static (double Slope, double Zero) FractionOfPascals(LotLimits limits)
    {
        LotPoint low = limits.Points.MinBy(p => p.PressureFraction)!, high = limits.Points.MaxBy(p => p.PressureFraction)!;
        double width = high.Pressure.Pascals - low.Pressure.Pascals;
        double slope = width == 0 ? 0 : (high.PressureFraction - low.PressureFraction) / width;
        return (slope, low.PressureFraction - slope * low.Pressure.Pascals);
    }
}
