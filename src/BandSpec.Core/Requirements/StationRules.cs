using System.Globalization;
using BandSpec.Core.Findings;

namespace BandSpec.Core.Requirements;

/// <summary>Rules that a station has to follow whatever the requirement.</summary>
internal static class StationRules
{
    /// <summary>Judges all of them.</summary>
    public static void Judge(StationParts station, FileFindings findings)
    {
        findings.FitsLine("station.name", station.Name);
        findings.InRange("pressure-standard.zero", station.StandardZero, AcceptedRanges.Spread);
        findings.InRange("pressure-standard.proportional", station.StandardProportional, AcceptedRanges.Spread);
        findings.InRange("reading-noise", station.ReadingNoise, AcceptedRanges.Spread);
        findings.InRange("readings-averaged", station.ReadingsAveraged, AcceptedRanges.ReadingsAveraged);
        findings.InRange("soak-gradient", station.SoakGradient, AcceptedRanges.SoakGradient);
        if (station.PressurePoints is { } read)
        {
            JudgeLists("pressure-points", read, findings);
            JudgeFewest(read, findings);
        }
        if (station.TestPoints is { } tested)
            JudgeLists("test-points", tested, findings);
        if (station.Chamber is { } chamber)
            JudgeChamber(chamber, findings);
        JudgeMoney(station.Chamber?.HourlyRate, station.RejectCost, findings);
    }

    private static void JudgeLists(string path, PressureLists lists, FileFindings findings)
    {
        foreach ((string key, IReadOnlyList<double> list) in new[] { ("reference", lists.Reference), ("others", lists.Others) })
        {
            for (int i = 0; i < list.Count; i++)
            {
                findings.InRange($"{path}.{key}[{i}]", list[i], AcceptedRanges.PressureFraction);
                findings.Require(
                    i == 0 || list[i] > list[i - 1], $"{path}.{key}[{i}]", "pressure-points-order",
                    string.Create(CultureInfo.InvariantCulture, $"{list[i]} after {list[Math.Max(0, i - 1)]}"), "each pressure once, low to high");
            }
        }
    }

    /// <summary>With a single pressure at a temperature, zero and span cannot be told apart there.</summary>
    private static void JudgeFewest(PressureLists lists, FileFindings findings)
    {
        foreach ((string key, IReadOnlyList<double> list) in new[] { ("reference", lists.Reference), ("others", lists.Others) })
            findings.Require(
                list.Count >= 2, $"pressure-points.{key}", "pressure-points-few", "a single pressure: zero and span cannot be told apart",
                "at least two pressures");
    }

    private static void JudgeChamber(Chamber chamber, FileFindings findings)
    {
        findings.InRange("chamber.ambient", chamber.Ambient, AcceptedRanges.Temperature);
        findings.InRange("chamber.heating", chamber.HeatingPerMinute, AcceptedRanges.ChamberRate);
        findings.InRange("chamber.cooling", chamber.CoolingPerMinute, AcceptedRanges.ChamberRate);
        findings.InRange("chamber.soak", chamber.Soak.Minutes, AcceptedRanges.ChamberTime);
        findings.InRange("chamber.pressure-point", chamber.PressurePoint.Minutes, AcceptedRanges.ChamberTime);
        findings.InRange("chamber.batch", chamber.Batch, AcceptedRanges.Batch);
    }

    private static void JudgeMoney(Money? rate, Money? rejectCost, FileFindings findings)
    {
        findings.InRange("chamber.rate", rate?.Amount, AcceptedRanges.Money);
        findings.InRange("reject-cost", rejectCost?.Amount, AcceptedRanges.Money);
        findings.Require(
            rate is null || rejectCost is null || rejectCost.Currency == rate.Currency, "reject-cost", "currency",
            $"{rejectCost?.Currency} beside {rate?.Currency} for the chamber", "one currency");
    }
}
