using System.Globalization;
using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>Rules of how a requirement, a platform and a station fit each other. Each finding is shown where the requirement asks too much.</summary>
internal static class CrossRules
{
    /// <summary>Beyond this multiple of the drift in the ageing test, the test says nothing about the drift in use.</summary>
    private const double LargestAgeFactor = 100;

    /// <summary>Judges everything that can be judged of what was read.</summary>
    public static void Judge(RequirementParts requirement, PlatformParts platform, StationParts station, FileFindings findings)
    {
        if (requirement.Temperature is { } range && platform.Temperature is { } ratedRange)
            JudgeTemperature(range, ratedRange, findings);
        if (requirement.Pressure is { } pressure && platform.Pressure is { } ratedPressure)
            JudgePressure(pressure, ratedPressure, findings);
        if (requirement.Profile is { } profile && platform.Ageing is { } ageing)
            JudgeAgeing(AgeingLaw.AgeFactor(ageing, profile), findings);
        foreach (HeldTerm held in requirement.HeldTerms ?? [])
            JudgeHeld(held, requirement, platform, findings);
        if (requirement.Compensation is { } scope && station.PressurePoints is { } points)
            JudgePoints(scope, platform, points, findings);
        findings.Require(
            requirement.Capability?.Confidence is null || platform.RawError is null || platform.Sample is not null, "capability.confidence", "no-sample",
            "the platform does not say what its statistics rest on", "a platform with `sample`, or no confidence");
        if (requirement.Compensation?.Pinned is { } pinned)
            PinnedPlanRules.JudgeWith(pinned, platform, findings);
        TestUncertainty.Judge(requirement, platform, station, findings);
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

    private static void JudgeAgeing(double factor, FileFindings findings)
    {
        string times = factor.ToString(factor < 1e6 ? "0" : "0.#E+0", CultureInfo.InvariantCulture);
        findings.Require(
            factor <= LargestAgeFactor, "temperature.profile", "ageing-far",
            $"over the service life a unit drifts {times} times as far as in the platform's ageing test",
            $"at most {LargestAgeFactor} times: a longer or hotter ageing test, or a milder profile");
    }

    /// <summary>A limit that does not even hold the term's own mean leaves nothing for its scatter.</summary>
    private static void JudgeHeld(HeldTerm held, RequirementParts requirement, PlatformParts platform, FileFindings findings)
    {
        double own = held.Term switch
        {
            "pressure-hysteresis" => platform.PressureHysteresis?.Mean.Percent ?? 0,
            "thermal-hysteresis" => platform.ThermalHysteresis?.Mean.Percent ?? 0,
            "ageing" => LargestDrift(requirement, platform),
            _ => requirement.FurtherTerms?.FirstOrDefault(term => term.Name == held.Term)?.Bound.Percent ?? 0,
        };
        findings.Require(
            held.Limit.Percent > own, $"held-terms.{held.Term}", "held-below-mean",
            string.Create(CultureInfo.InvariantCulture, $"{held.Limit} is not above the term's own mean, {own:0.####} %FS"),
            string.Create(CultureInfo.InvariantCulture, $"more than {own:0.####} %FS"));
    }

    private static double LargestDrift(RequirementParts requirement, PlatformParts platform)
    {
        if (requirement.Profile is not { } profile || platform.Ageing is not { } ageing)
            return 0;
        double atLower = ageing.Zero.Mean.Percent, atUpper = atLower + ageing.Span.Mean.Percent;
        return AgeingLaw.AgeFactor(ageing, profile) * Math.Max(Math.Abs(atLower), Math.Abs(atUpper));
    }

    /// <summary>The correction has to be determined by the readings for one number of temperatures at least.</summary>
    private static void JudgePoints(CompensationScope scope, PlatformParts platform, PressureLists pressures, FileFindings findings)
    {
        if (platform.ZeroDegree is not { } zeroDegree || platform.SpanDegree is not { } spanDegree)
            return;
        int reference = pressures.Reference.Count, most = scope.MostTemperatures;
        int linearity = reference >= 4 ? 2 : reference >= 3 ? 1 : 0;
        int points = reference + ((most - 1) * pressures.Others.Count);
        int coefficients = LowestDegree(most, zeroDegree) + 1 + LowestDegree(most, spanDegree) + 1 + linearity;
        findings.Require(
            coefficients <= points, "compensation.temperatures", "plan-points",
            $"{coefficients} correction coefficients and only {points} readings with {most} temperatures",
            "more pressure points at the station, or a lower degree of correction on the platform");
    }

    /// <summary>The lowest degree that is tried with a number of temperatures.</summary>
    private static int LowestDegree(int temperatures, int highest) => Math.Max(1, Math.Min(temperatures - 1, highest) - 1);
}
