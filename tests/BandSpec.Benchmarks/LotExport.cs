using System.Text.Json;
using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Core.TestLimits;

namespace BandSpec.Benchmarks;

/// <summary>A specification's units as plain numbers, for the NumPy twin.</summary>
internal static class LotExport
{
    public static string Of(Specification specification)
    {
        Requirement requirement = specification.Application.Requirement;
        Platform platform = specification.Application.Platform;
        Station station = specification.Application.Station;
        CompensationPlan plan = specification.Choice.Plan;
        double Tau(Core.Quantities.Temperature t) => (t - platform.Temperature.Reference).Kelvin / 100;
        double average = Math.Sqrt(station.ReadingsAveraged);
        double repeatability = platform.Repeatability.Percent;
        IReadOnlyList<VerificationPoint> points = specification.VerificationPoints;
        BandNode[] nodes = [.. specification.Bands.Nodes];
        double total = requirement.Profile.Sum(b => b.Dwell.Hours);
        double[] parts = [0, .. requirement.Profile.Select((_, i) => requirement.Profile.Take(i + 1).Sum(b => b.Dwell.Hours) / total)];
        (int Kind, int Degree)[] stored = [
            .. Enumerable.Range(0, plan.ZeroDegree + 1).Select(k => (0, k)), .. Enumerable.Range(0, plan.SpanDegree + 1).Select(k => (1, k)),
            .. station.PressurePoints.Reference.Count >= 3 ? new[] { (2, 0) } : [], .. station.PressurePoints.Reference.Count >= 4 ? new[] { (3, 0) } : []];
        return JsonSerializer.Serialize(new
        {
            kind = platform.RawError.Select(c => (int)c.Name.Shape), degree = platform.RawError.Select(c => c.Name.Degree),
            mean = platform.RawError.Select(c => c.Mean), sigma = platform.RawError.Select(c => c.Sigma), lotSigma = platform.RawError.Select(c => c.LotSigma),
            correlation = Correlation(platform), planX = plan.Points.Select(p => p.PressureFraction), planTau = plan.Points.Select(p => Tau(p.Temperature)),
            storedKind = stored.Select(s => s.Kind), storedDegree = stored.Select(s => s.Degree),
            soak = station.SoakGradient.Kelvin / 100, noise = Math.Sqrt((repeatability * repeatability) + Math.Pow(station.ReadingNoise.Percent, 2)) / average,
            u0 = station.StandardZero.Percent, u1 = station.StandardProportional.Percent,
            hysteresis = Pair(platform.PressureHysteresis), thermal = Pair(platform.ThermalHysteresis),
            zeroDrift = Pair(platform.Ageing.Zero), spanDrift = Pair(platform.Ageing.Span), age = specification.Profile.AgeFactor, exponent = platform.Ageing.TimeExponent,
            furtherSigma = requirement.FurtherTerms.Sum(f => f.Sigma.Percent), furtherBound = requirement.FurtherTerms.Sum(f => f.Bound.Percent),
            step = requirement.Output.Step ?? 0, atLower = requirement.Output.AtLower, span = requirement.Output.Span, repeatability,
            testRepeatability = repeatability / average, testReading = station.ReadingNoise.Percent / average,
            testX = points.Select(p => p.PressureFraction), testTau = points.Select(p => Tau(p.Temperature)),
            testSide = points.Select(p => p.Direction == PressureDirection.Rising ? -1 : 1), testNominal = points.Select(p => p.Nominal),
            testLower = points.Select(p => p.Lower), testUpper = points.Select(p => p.Upper),
            mapX = nodes.Select(n => n.PressureFraction), mapTau = nodes.Select(n => Tau(n.Temperature)), mapAllowed = nodes.Select(n => n.Allowed.Percent),
            dwellPart = parts, dwellTau = requirement.Profile.Select(b => Tau(b.From)).Append(Tau(requirement.Profile[^1].To)),
            limitTau = requirement.AllowedError.SelectMany(r => new[] { Tau(r.From), Tau(r.To) }),
            limit = requirement.AllowedError.SelectMany(r => new[] { r.Limit.Percent, (r.LimitAtEnd ?? r.Limit).Percent }),
        });
    }

    private static double[] Pair(Spread spread) => [spread.Mean.Percent, spread.Sigma.Percent];

    private static double[][] Correlation(Platform platform)
    {
        CoefficientName[] names = [.. platform.RawError.Select(c => c.Name)];
        return [.. names.Select(a => names.Select(b => a == b ? 1 : platform.Correlations
            .FirstOrDefault(c => (c.First == a && c.Second == b) || (c.First == b && c.Second == a))?.Value ?? 0).ToArray())];
    }
}
