using System.Globalization;
using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>The rule that a station measures finely enough for what is to be decided with it.</summary>
internal static class TestUncertainty
{
    /// <summary>
    /// Judges the expanded uncertainty of a test reading, guarded as the requirement asks, at every test pressure against the tightest design
    /// band there. Even without a guard band, a band no wider than the uncertainty cannot be decided about.
    /// </summary>
    public static void Judge(RequirementParts requirement, PlatformParts platform, StationParts station, FileFindings findings)
    {
        if (platform.Repeatability is not { } repeatability || station.TestPoints is not { } points)
            return;
        foreach (double x in points.Reference.Concat(points.Others).Distinct().Order())
        {
            if (ExpandedAt(x, repeatability, station) is not { } uncertainty || DesignBandAt(x, requirement) is not { } band)
                return;
            if (Math.Max(1, requirement.Test?.GuardBand ?? 1) * uncertainty < band)
                continue;
            findings.Add("station", "station-uncertain", string.Create(
                CultureInfo.InvariantCulture,
                $"at pressure fraction {x} the expanded uncertainty of the test, {uncertainty:0.####} %FS, leaves nothing of a design band of {band:0.####} %FS"),
                "a better station, a smaller guard band or a larger allowed error");
            return;
        }
    }

    /// <summary><c>U = 2u_v</c> with <c>u_v² = (σ_rep² + σ_read²)/N + u_0² + u_1²x²</c>.</summary>
    private static double? ExpandedAt(double x, PercentOfSpan repeatability, StationParts station)
    {
        double? noise = (Square(repeatability) + Square(station.ReadingNoise)) / station.ReadingsAveraged;
        return 2 * Root(noise + Square(station.StandardZero) + (Square(station.StandardProportional) * x * x));
    }

    private static double? DesignBandAt(double x, RequirementParts requirement)
    {
        if (requirement.Pressure is not { SpanInPascals: > 0 } pressure || requirement.AllowedError is not { } regions)
            return null;
        double magnitude = pressure.MagnitudeAt(x);
        return regions.Min(region => Math.Min(region.At(region.From, magnitude), region.At(region.To, magnitude))) / requirement.SafetyFactor;
    }

    private static double? Square(PercentOfSpan? error) => error?.Percent * error?.Percent;

    private static double? Root(double? square) => square is { } number ? Math.Sqrt(number) : null;
}
