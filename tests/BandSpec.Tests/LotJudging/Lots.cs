using BandSpec.Core.LotJudging;
using BandSpec.Core.Quantities;
using BandSpec.Core.TestLimits;

namespace BandSpec.Tests.LotJudging;

/// <summary>Limits and lots made for tests: 1 V to 5 V over 0 to 10 bar, so that 1 %FS is 0.04 V.</summary>
internal static class Lots
{
    public const double VoltsPerPercent = 0.04;

    /// <summary>One point at 25 °C, half span, tolerance ±1 %FS, accepted within ±0.9 %FS.</summary>
    public static LotLimits OnePoint { get; } = Of([Point("V01", 25, 0.5, PressureDirection.Rising)]);

    /// <summary>A whole test: 0, ½ and full span rising and falling at 25 °C, both ends at 85 °C.</summary>
    public static LotLimits Whole { get; } = Of(
        [
            Point("V01", 25, 0, PressureDirection.Rising), Point("V02", 25, 0.5, PressureDirection.Rising), Point("V03", 25, 1, PressureDirection.Rising),
            Point("V04", 25, 0.5, PressureDirection.Falling), Point("V05", 25, 0, PressureDirection.Falling),
            Point("V06", 85, 0, PressureDirection.Rising), Point("V07", 85, 1, PressureDirection.Rising),
        ],
        [
            Limit("zero", 0.5), Limit("span", 0.5), Limit("non-linearity", 0.4), Limit("hysteresis", 0.3),
            Limit("thermal-zero-shift", 0.6, 40, 85), Limit("thermal-span-shift", 0.7, 40, 85), Limit("thermal-zero-shift", 0.6, -40, 40),
        ]);

    public static LotLimits Of(IReadOnlyList<LotPoint> points, IReadOnlyList<LotDerivedLimit>? derived = null) => new()
    {
        Specification = "T-1-A",
        OutputUnit = "V",
        OutputSpan = 4,
        SampleCriterion = 1.67,
        LongRunCriterion = 1.33,
        Points = points,
        DerivedLimits = derived ?? [],
        ReferenceTemperature = Temperature.FromCelsius(25),
    };

    public static LotPoint Point(string id, double celsius, double x, PressureDirection? direction)
    {
        double nominal = 1 + (4 * x), width = 0.9 * VoltsPerPercent;
        return new(id, Temperature.FromCelsius(celsius), Pressure.From(10 * x, PressureUnit.Bar), x, direction,
            nominal, nominal - width, nominal + width, PercentOfSpan.FromPercent(1));
    }

    /// <summary>A collector that took errors in %FS of the one point, each unit in its lot.</summary>
    public static LotCollector Collect(IEnumerable<(double Error, string Lot)> values)
    {
        var collector = new LotCollector(OnePoint);
        int unit = 0;
        foreach ((double error, string lot) in values)
            Add(collector, $"U{++unit}", 0, error, lot);
        return collector;
    }

    public static void Add(LotCollector collector, string serial, int point, double error, string lot = "") => collector.Add(
        new LotReading
        {
            Serial = serial, Lot = lot, Point = point, Line = 1,
            Value = collector.Limits.Points[point].Nominal + (error * VoltsPerPercent),
        },
        "test");

    /// <summary>The judgement of the one point.</summary>
    public static CharacteristicJudgement JudgeOne(IEnumerable<(double, string)> values) =>
        LotJudgement.Of(Collect(values)).Characteristics.Single();

    private static LotDerivedLimit Limit(string name, double limit, double? from = null, double? to = null) => new(
        name, from is { } f ? Temperature.FromCelsius(f) : null, to is { } t ? Temperature.FromCelsius(t) : null, PercentOfSpan.FromPercent(limit));
}
