using System.Globalization;
using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>Rules of how a requirement, a platform and a station fit each other. Each finding is shown where the requirement asks too much.</summary>
internal static class CrossRules
{
    /// <summary>Beyond this multiple of the drift in the ageing test, the test says nothing about the drift in use.</summary>
    private const double LargestAgeFactor = 100;

    /// <summary>Judges a requirement against a platform.</summary>
    public static void Judge(Requirement requirement, Platform platform, FileFindings findings)
    {
        JudgeTemperature(requirement.Temperature, platform.Temperature, findings);
        JudgePressure(requirement.Pressure, platform.Pressure, findings);
        double factor = AgeingLaw.AgeFactor(platform.Ageing, requirement.Profile);
        string times = factor.ToString(factor < 1e6 ? "0" : "0.#E+0", CultureInfo.InvariantCulture);
        findings.Require(
            factor <= LargestAgeFactor, "temperature.profile", "ageing-far",
            $"over the service life a unit drifts {times} times as far as in the platform's ageing test",
            $"at most {LargestAgeFactor} times: a longer or hotter ageing test, or a milder profile");
        foreach (HeldTerm held in requirement.HeldTerms)
            JudgeHeld(held, requirement, platform, factor, findings);
    }

    /// <summary>Judges a requirement against a platform measured on a station.</summary>
    public static void Judge(Requirement requirement, Platform platform, Station station, FileFindings findings)
    {
        JudgePoints(requirement, platform, station, findings);
        foreach (double x in station.TestPoints.Reference.Concat(station.TestPoints.Others).Distinct().Order())
        {
            double uncertainty = ExpandedUncertainty(platform, station, x);
            double band = DesignBandAt(requirement, x);
            double guarded = Math.Max(1, requirement.Test.GuardBand) * uncertainty;
            if (guarded < band)
                continue;
            findings.Add("station", "station-uncertain", string.Create(
                CultureInfo.InvariantCulture,
                $"at pressure fraction {x} the expanded uncertainty of the test, {uncertainty:0.####} %FS, leaves nothing of a design band of {band:0.####} %FS"),
                "a better station, a smaller guard band or a larger allowed error");
            break;
        }
    }

    private static void JudgeTemperature(OperatingTemperature wanted, OperatingTemperature rated, FileFindings findings)
    {
        findings.Require(
            wanted.Lower >= rated.Lower, "temperature.lower", "platform-temperature",
            $"{wanted.Lower} is below the platform's rating", $"{rated.Lower} or more");
        findings.Require(
            wanted.Upper <= rated.Upper, "temperature.upper", "platform-temperature",
            $"{wanted.Upper} is above the platform's rating", $"{rated.Upper} or less");
    }

    private static void JudgePressure(PressureRange wanted, PressureRating rated, FileFindings findings)
    {
        Pressure span = Pressure.From(wanted.Upper.Value - wanted.Lower.In(wanted.Upper.Unit).Value, wanted.Upper.Unit);
        findings.Require(
            wanted.SpanInPascals >= rated.SmallestSpan.Pascals * (1 - 1e-12), "pressure.upper", "platform-span",
            $"a span of {span} is smaller than the platform can be calibrated to", $"a span of {rated.SmallestSpan} or more");
        foreach ((string key, Pressure end) in new[] { ("lower", wanted.Lower), ("upper", wanted.Upper) })
            findings.Require(
                Math.Abs(end.Pascals) <= rated.LargestUpper.Pascals * (1 + 1e-12), $"pressure.{key}", "platform-pressure",
                $"{end} is beyond the platform's largest range value", $"at most {rated.LargestUpper}");
    }

    /// <summary>A limit that does not even hold the term's own mean leaves nothing for its scatter.</summary>
    private static void JudgeHeld(HeldTerm held, Requirement requirement, Platform platform, double ageFactor, FileFindings findings)
    {
        Ageing ageing = platform.Ageing;
        double atLower = ageing.Zero.Mean.Percent, atUpper = atLower + ageing.Span.Mean.Percent;
        double own = held.Term switch
        {
            "pressure-hysteresis" => platform.PressureHysteresis.Mean.Percent,
            "thermal-hysteresis" => platform.ThermalHysteresis.Mean.Percent,
            "ageing" => ageFactor * Math.Max(Math.Abs(atLower), Math.Abs(atUpper)),
            _ => requirement.FurtherTerms.FirstOrDefault(term => term.Name == held.Term)?.Bound.Percent ?? 0,
        };
        findings.Require(
            held.Limit.Percent > own, $"held-terms.{held.Term}", "held-below-mean",
            string.Create(CultureInfo.InvariantCulture, $"{held.Limit} is not above the term's own mean, {own:0.####} %FS"),
            string.Create(CultureInfo.InvariantCulture, $"more than {own:0.####} %FS"));
    }

    /// <summary>The correction has to be determined by the readings for one number of temperatures at least.</summary>
    private static void JudgePoints(Requirement requirement, Platform platform, Station station, FileFindings findings)
    {
        (int reference, int others) = (station.PressurePoints.Reference.Count, station.PressurePoints.Others.Count);
        int linearity = reference >= 4 ? 2 : reference >= 3 ? 1 : 0;
        int most = requirement.Compensation.MostTemperatures;
        int points = reference + ((most - 1) * others);
        int coefficients = LowestDegree(most, platform.ZeroDegree) + 1 + LowestDegree(most, platform.SpanDegree) + 1 + linearity;
        findings.Require(
            coefficients <= points, "compensation.temperatures", "plan-points",
            $"{coefficients} correction coefficients and only {points} readings with {most} temperatures",
            "more pressure points at the station, or a lower degree of correction on the platform");
    }

    private static int LowestDegree(int temperatures, int highest) => Math.Max(1, Math.Min(temperatures - 1, highest) - 1);

    private static double ExpandedUncertainty(Platform platform, Station station, double x)
    {
        (double repeated, double read) = (platform.Repeatability.Percent, station.ReadingNoise.Percent);
        (double zero, double proportional) = (station.StandardZero.Percent, station.StandardProportional.Percent * x);
        double variance = (((repeated * repeated) + (read * read)) / station.ReadingsAveraged) + (zero * zero) + (proportional * proportional);
        return 2 * Math.Sqrt(variance);
    }

    private static double DesignBandAt(Requirement requirement, double x)
    {
        double magnitude = requirement.Pressure.MagnitudeAt(x);
        return requirement.AllowedError.Min(region => Math.Min(region.At(region.From, magnitude), region.At(region.To, magnitude))) / requirement.SafetyFactor;
    }
}
