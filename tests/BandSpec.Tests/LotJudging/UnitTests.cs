using BandSpec.Core.LotJudging;

using Xunit;

namespace BandSpec.Tests.LotJudging;

public sealed class UnitTests
{
    private static readonly double[] Errors = [0.1, 0.5, 0.3, 0.7, 0.2, -0.2, 0.4];

    [Fact]
    public void Derived_figures_of_one_unit()
    {
        var collector = new LotCollector(Lots.Whole);
        for (int point = 0; point < Errors.Length; point++)
            Lots.Add(collector, "A", point, Errors[point]);
        LotJudgement judged = LotJudgement.Of(collector);
        Dictionary<string, double> figures = judged.Characteristics.Where(c => c.IsDerived).ToDictionary(c => $"{c.Name} at {c.Place}", c => c.Mean);
        // Zero is the mean of 0.1 and 0.2, span 0.3 − 0.15; the middle 0.6 lies 0.375 above the terminal line.
        Assert.Equal(6, figures.Count);
        Assert.Equal(0.15, figures["zero at 25 °C"], 1e-7);
        Assert.Equal(0.15, figures["span at 25 °C"], 1e-7);
        Assert.Equal(0.375, figures["non-linearity at 25 °C, x = 0.5"], 1e-7);
        Assert.Equal(0.2, figures["hysteresis at 25 °C, x = 0.5"], 1e-7);
        Assert.Equal(-0.35, figures["thermal-zero-shift at 85 °C"], 1e-7);
        Assert.Equal(0.45, figures["thermal-span-shift at 85 °C"], 1e-7);
        Assert.Equal((1, 0, 0), judged.UnitCounts);
    }

    [Fact]
    public void A_unit_fails_with_every_reason_and_is_incomplete_without_a_reading()
    {
        var collector = new LotCollector(Lots.Whole);
        foreach ((string serial, int missing, double zeroHot) in new[] { ("good", -1, 0.2), ("hot", -1, 1.0), ("short", 3, 0.2) })
            for (int point = 0; point < Errors.Length; point++)
                if (point != missing)
                    Lots.Add(collector, serial, point, point == 5 ? zeroHot : point == 6 ? 0.4 : 0);
        LotJudgement judged = LotJudgement.Of(collector);
        Assert.Equal((1, 1, 1), judged.UnitCounts);
        UnitJudgement[] units = [.. judged.Units];
        Assert.Equal([UnitVerdict.Pass, UnitVerdict.Fail, UnitVerdict.Incomplete], units.Select(u => u.Verdict));
        Assert.Equal(["V06", "thermal-zero-shift at 85 °C"], units[1].Reasons.Select(r => r.Name));
        Assert.Equal(["V04"], units[2].Missing);
    }

    [Fact]
    public void A_reading_on_the_limit_passes()
    {
        var collector = new LotCollector(Lots.OnePoint);
        double upper = Lots.OnePoint.Points[0].Upper;
        collector.Add(new LotReading { Serial = "on", Point = 0, Value = upper }, "test");
        collector.Add(new LotReading { Serial = "off", Point = 0, Value = Math.BitIncrement(upper) }, "test");
        Assert.Equal((1, 1, 0), LotJudgement.Of(collector).UnitCounts);
    }

    [Fact]
    public void The_first_of_two_readings_stands()
    {
        var collector = new LotCollector(Lots.OnePoint);
        Lots.Add(collector, "A", 0, 0.1);
        Lots.Add(collector, "A", 0, 0.8);
        Assert.Equal((1, 1), (collector.Readings, collector.Faults.Count(ReadingFault.Duplicate)));
        Assert.Equal(0.1, LotJudgement.Of(collector).Characteristics[0].Mean, 1e-12);
    }

    [Fact]
    public void Units_come_in_any_order_and_beyond_the_room_are_refused()
    {
        var table = new UnitTable(2, room: 3 * (88 + 8 + 8));
        Assert.Equal([0, 1, 0, 2, -1, 1], new[] { "a", "b", "a", "c", "d", "b" }.Select(serial => table.IndexOf(serial)));
        table.MarkFailed(1, 1);
        Assert.Equal((false, true), (table.HasFailed(0, 1), table.HasFailed(1, 1)));
    }

    [Fact]
    public void No_readings_at_all_are_judged_as_nothing()
    {
        LotJudgement judged = LotJudgement.Of(new LotCollector(Lots.Whole));
        Assert.Null(judged.Sample);
        Assert.False(judged.IsMet);
        Assert.Equal((0, 0, 0), judged.UnitCounts);
    }
}
