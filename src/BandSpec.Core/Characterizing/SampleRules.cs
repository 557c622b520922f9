using BandSpec.Core.Findings;

namespace BandSpec.Core.Characterizing;

/// <summary>What a characterization asks of its readings before anything is estimated.</summary>
internal static class SampleRules
{
    private const int FewestUnits = 3;

    public static IReadOnlyList<Finding> FindingsIn(MeasuredFamily family, IReadOnlyList<string> missing) =>
        [.. Excluded(missing), .. Units(family), .. Temperatures(family), .. Pressures(family)];

    private static IEnumerable<Finding> Excluded(IReadOnlyList<string> missing) =>
        from name in missing
        select new Finding(
            FieldPath.InReadings("unit"), "excluded-unit", $"`{name}` is to be left out and not among the readings", "the name of a unit that was read");

    private static IEnumerable<Finding> Units(MeasuredFamily family)
    {
        int units = family.Units.Count();
        if (units < FewestUnits)
            yield return new Finding(
                FieldPath.InReadings("unit"), "few-units", $"{units} {(units == 1 ? "unit" : "units")}",
                $"readings of at least {FewestUnits} units, since a spread between units is asked for");
    }

    private static IEnumerable<Finding> Temperatures(MeasuredFamily family)
    {
        int settings = ThermalHistory.Settings(family.Readings.Select(r => r.Temperature.Celsius)).Count;
        if (settings == 1)
            yield return new Finding(
                FieldPath.InReadings("temperature"), "one-temperature", "all readings are at one temperature",
                "readings at two temperatures or more");
    }

    private static IEnumerable<Finding> Pressures(MeasuredFamily family)
    {
        int pressures = family.Readings.Select(r => Math.Round(r.PressureFraction, 2)).Distinct().Count();
        if (pressures == 1)
            yield return new Finding(
                FieldPath.InReadings("pressure"), "one-pressure", "all readings are at one pressure", "readings at two pressures or more");
    }
}
