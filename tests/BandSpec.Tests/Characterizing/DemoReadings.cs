using System.Globalization;
using System.Text;
using BandSpec.Core.Characterizing;
using BandSpec.Core.TestLimits;

namespace BandSpec.Tests.Characterizing;

/// <summary>The readings in requirements-demo/readings: how they were made, so that their truth is known.</summary>
internal static class DemoReadings
{
    public const int FamilySeed = 20260412;
    public const int StorageSeed = 20260607;

    /// <summary>Which units are spoiled, and how: one bends over temperature, one has an unsteady contact.</summary>
    public static IReadOnlyList<string> Spoiled { get; } = ["017", "038"];

    /// <summary>The family: that of platforms/steel-cell-40.yaml.</summary>
    public static IReadOnlyList<UnitReading> Family() => new SimulatedFamily(Given.Platform, FamilySeed)
    {
        Gaps = 0.07,
        Visits = [25, -40, -15, 25, 50, 75, 100, 125, 150, 25],
        Pressures = [0, 0.25, 0.5, 0.75, 1],
        Spoiling = (unit, tau) => unit == "017" ? 1.8 * tau * tau : 0,
        Scatter = unit => unit == "038" ? 6 : 1,
    }.Readings(3, 16);

    /// <summary>The storage test: 20 units at each of three temperatures, drifting as the platform file says.</summary>
    public static IReadOnlyList<DriftReading> Storage() =>
        new SimulatedStorage(Given.Platform.Ageing, Given.Platform.Repeatability.Percent, StorageSeed).Readings(20, 105, 125, 150);

    public static string FamilyCsv()
    {
        StringBuilder text = new();
        text.Append(CultureInfo.InvariantCulture, $"# Simulated readings of an invented family, seed {FamilySeed}. Truth: platforms/steel-cell-40.yaml, range 0 to 25 bar.\n");
        text.Append("# 3 lots of 16 units; 7 % of the readings are missing at random. Unit 017 bends by 1.8 %FS per (100 K)², unit 038 scatters six times as much.\n");
        text.Append("lot,unit,cycle,temperature [°C],pressure [bar],direction,error [%FS]\n");
        foreach (UnitReading r in Family())
            text.Append(
                CultureInfo.InvariantCulture,
                $"{r.Lot},{r.Unit},{r.Cycle},{r.Temperature.Celsius},{25 * r.PressureFraction},{(r.Direction == PressureDirection.Rising ? "rising" : "falling")},{r.Error.Percent:F4}\n");
        return text.ToString();
    }

    public static string StorageCsv()
    {
        StringBuilder text = new();
        text.Append(CultureInfo.InvariantCulture, $"# Simulated readings of an invented family in storage, seed {StorageSeed}, range 0 to 25 bar.\n");
        text.Append("# Truth: zero 0.02 ± 0.018, span -0.015 ± 0.012 %FS after 1000 h at 125 °C, 0.6 eV, exponent 0.5; repeatability 0.012 %FS.\n");
        text.Append("unit,storage [°C],stored [h],pressure [bar],error [%FS]\n");
        foreach (DriftReading r in Storage())
            text.Append(CultureInfo.InvariantCulture, $"{r.Unit},{r.Storage.Celsius},{r.Stored.Hours},{25 * r.PressureFraction},{r.Error.Percent:F4}\n");
        return text.ToString();
    }
}
