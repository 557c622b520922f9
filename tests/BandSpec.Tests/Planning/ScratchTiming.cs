using System.Diagnostics;
using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.Quantities;
using Xunit;

namespace BandSpec.Tests.Planning;

public sealed class ScratchTiming
{
    [Fact]
    public void Exchange()
    {
        foreach (PlanObjective o in Enum.GetValues<PlanObjective>())
        foreach (double s in new[] { 1.15, 2.2, 2.4, 3 })
        {
            var app = Given.Application(Given.Requirement with { SafetyFactor = s, Compensation = Given.Requirement.Compensation with { MostTemperatures = 4, Objective = o } });
            var w = Stopwatch.StartNew();
            var c = PlanChoosing.Choose(app, null, default);
            double t = w.Elapsed.TotalMilliseconds;
            w.Restart();
            var e = ContinuousMargin.AllOf(app, c.Plan);
            double t2 = w.Elapsed.TotalMilliseconds;
            var map = BandMap.Of(app, c.Plan);
            Console.WriteLine($"{o} S {s}: {string.Join(",", c.Plan.Temperatures.Select(i => i.Celsius))} {c.Plan.ZeroDegree},{c.Plan.SpanDegree} node margin {map.Margin:R} everywhere {c.ContinuousMargin:R} rounds {c.ExchangeRounds} added {string.Join(" ", c.AddedNodes.Select(a => $"({a.PressureFraction:F4},{a.Temperature.Celsius:F4},{a.Region})"))} {c.Proven} {t:F0} ms, continuous {t2:F1} ms");
            BandFormulas f = BandFormulas.Of(app, c.Plan);
            double least = double.PositiveInfinity;
            for (int r = 0; r < 3; r++) for (int i = 0; i <= 100; i++) for (int k = 0; k <= 200; k++)
            {
                var reg = app.Requirement.AllowedError[r];
                least = Math.Min(least, f.At(i / 100.0, Temperature.FromCelsius(reg.From.Celsius + (reg.To - reg.From).Kelvin * k / 200), r).Margin);
            }
            Console.WriteLine($"   dense {least:R}  at worst {f.At(e.MinBy(x => x.Margin)!.Worst.PressureFraction, e.MinBy(x => x.Margin)!.Worst.Temperature, e.MinBy(x => x.Margin)!.Region).Margin:R}");
        }
    }
}
