using BandSpec.Core.Quantities;

namespace BandSpec.Core.Characterizing;

/// <summary>From which side a unit reached each temperature, as far as that can tell thermal hysteresis from the curve over temperature.</summary>
internal static class ThermalHistory
{
    /// <summary>Temperatures closer than this are one chamber setting: chambers are set in steps of 5 K and more, and hold to about 1 K.</summary>
    public const double SameSetting = 3;

    /// <summary>
    /// +1 for readings at a temperature reached from hotter, −1 from colder, in the order given. Zero for temperatures that the unit did not
    /// reach from both sides: there, hysteresis and the curve over temperature cannot be told apart. A unit's first setting is reached from the
    /// reference temperature, where units wait.
    /// </summary>
    public static int[] Sides(IReadOnlyList<UnitReading> readings, Temperature reference)
    {
        int[] arrivals = new int[readings.Count];
        (double previous, double current) = (reference.Celsius, reference.Celsius);
        for (int i = 0; i < arrivals.Length; i++)
        {
            double celsius = readings[i].Temperature.Celsius;
            if (Math.Abs(celsius - current) > SameSetting)
                (previous, current) = (current, celsius);
            arrivals[i] = Math.Sign(previous - current);
        }

        return [.. readings.Select((r, i) => ReachedFromBothSides(readings, arrivals, r.Temperature.Celsius) ? arrivals[i] : 0)];
    }

    private static bool ReachedFromBothSides(IReadOnlyList<UnitReading> readings, int[] arrivals, double celsius)
    {
        (bool colder, bool hotter) = (false, false);
        for (int i = 0; i < arrivals.Length; i++)
            if (Math.Abs(readings[i].Temperature.Celsius - celsius) <= SameSetting)
            {
                colder |= arrivals[i] < 0;
                hotter |= arrivals[i] > 0;
            }

        return colder && hotter;
    }

    /// <summary>The chamber settings among temperatures: the mean of each group, rising.</summary>
    public static IReadOnlyList<double> Settings(IEnumerable<double> celsius)
    {
        List<List<double>> groups = [];
        foreach (double value in celsius.Order())
        {
            if (groups.Count > 0 && value - groups[^1][0] <= SameSetting)
                groups[^1].Add(value);
            else
                groups.Add([value]);
        }

        return [.. groups.Select(group => group.Average())];
    }
}
