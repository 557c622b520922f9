using System.Text.Json;
using BandSpec.Core.LotJudging;
using BandSpec.Files.LotReadings;

namespace BandSpec.Files.Json;

/// <summary>Writes <c>judgement.json</c>: everything that a lot showed, for programs. All errors in %FS.</summary>
public static class JudgementJson
{
    /// <summary>The format's name; it changes when a member is renamed or removed.</summary>
    public const string Format = "bandspec/judgement/1";

    /// <summary>Units that are listed because they do not pass; <c>units.csv</c> has all.</summary>
    private const int UnitsListed = 1000;

    /// <summary>The bytes of the file.</summary>
    /// <param name="judged">The judgement.</param>
    /// <param name="reports">What was read.</param>
    public static ReadOnlyMemory<byte> Write(LotJudgement judged, IReadOnlyList<ReadingReport> reports)
    {
        ArgumentNullException.ThrowIfNull(judged);
        return JsonFile.Of(json =>
        {
            json.WriteString("format", Format);
            json.WriteString("specification", judged.Limits.Specification);
            json.WriteBoolean("met", judged.IsMet);
            json.WriteBoolean("proven", judged.IsProven);
            json.WriteNumber("readings", judged.Readings);
            json.Object("units", units => Counts(units, judged));
            json.WriteNumber("lots", judged.LotNames.Count);
            json.Figure("confidence", CapabilityFigures.Confidence);
            json.Objects("characteristics", judged.Characteristics, (one, characteristic) => Characteristic(one, characteristic));
            json.Objects("units-not-passed", judged.Units.Where(unit => unit.Verdict != UnitVerdict.Pass).Take(UnitsListed), Unit);
            json.Objects("files", reports, File);
            json.Objects("faults", judged.Faults.All, Fault);
        });
    }

    /// <summary>A word of a closed list as files spell it: <c>UnknownPoint</c> is <c>unknown-point</c>.</summary>
    public static string Word<T>(T value)
        where T : struct, Enum =>
        string.Concat(value.ToString().Select((c, i) => char.IsUpper(c) ? $"{(i > 0 ? "-" : "")}{char.ToLowerInvariant(c)}" : $"{c}"));

    private static void Counts(Utf8JsonWriter json, LotJudgement judged)
    {
        json.WriteNumber("pass", judged.UnitCounts.Pass);
        json.WriteNumber("fail", judged.UnitCounts.Fail);
        json.WriteNumber("incomplete", judged.UnitCounts.Incomplete);
    }

    private static void Characteristic(Utf8JsonWriter json, CharacteristicJudgement judged)
    {
        json.WriteString("name", judged.Name);
        if (judged.Place.Length > 0)
            json.WriteString("place", judged.Place);
        json.WriteBoolean("derived", judged.IsDerived);
        json.Figure("tolerance", judged.Tolerance);
        json.WriteNumber("count", judged.Count);
        json.WriteNumber("lots", judged.Lots);
        json.Figure("mean", judged.Mean);
        json.Figure("smallest", judged.Smallest);
        json.Figure("largest", judged.Largest);
        json.Object("outside", outside =>
        {
            outside.WriteNumber("count", judged.OutsideCount);
            outside.Figure("lower", judged.OutsideFraction.Lower);
            outside.Figure("upper", judged.OutsideFraction.Upper);
        });
        if (judged is { Within: { } within, Overall: { } overall, ByPercentiles: { } free })
        {
            json.Object("within", part => Capability(part, within, judged.NormalityWithin, ("cp", "cpk")));
            json.Object("overall", part => Capability(part, overall, judged.NormalityOverall, ("pp", "ppk")));
            json.Object("percentiles", part => ByPercentiles(part, free));
            json.Object("sample", part => Criterion(part, judged.Sample!));
            json.Object("long-run", part => Criterion(part, judged.LongRun!));
        }

        json.Objects("outliers", judged.Outliers, (one, outlier) =>
        {
            one.WriteString("serial", outlier.Serial);
            one.Figure("value", outlier.Value);
        });
    }

    private static void Capability(Utf8JsonWriter json, CapabilityFigures figures, Normality? normality, (string Spread, string Nearer) names)
    {
        json.Figure("deviation", figures.Deviation);
        json.Figure("degrees-of-freedom", figures.DegreesOfFreedom);
        json.Figure("effective-readings", figures.EffectiveReadings);
        json.Figure(names.Spread, figures.Spread);
        json.Figure($"{names.Spread}-lower", figures.SpreadLower);
        json.Figure(names.Nearer, figures.Nearer);
        json.Figure($"{names.Nearer}-lower", figures.NearerLower);
        json.Figure($"{names.Nearer}-lower-here", figures.NearerLowerHere);
        json.Figure($"{names.Nearer}-upper", figures.NearerUpper);
        json.Figure("outside-expected", figures.Outside);
        if (normality is not null)
        {
            json.Object("normality", test =>
            {
                test.Figure("anderson-darling", normality.Statistic);
                test.Figure("probability", normality.Probability);
                test.WriteNumber("values", normality.Values);
                test.WriteBoolean("plausible", normality.IsPlausible);
            });
        }
    }

    private static void ByPercentiles(Utf8JsonWriter json, PercentileFigures figures)
    {
        json.Figure("low", figures.Low);
        json.Figure("median", figures.Median);
        json.Figure("high", figures.High);
        json.Figure("pp", figures.Spread);
        json.Figure("ppk", figures.Nearer);
        json.Figure("ppk-lower", figures.NearerLower ?? double.NaN);
        json.WriteNumber("values", figures.Values);
        json.WriteBoolean("extremes-stand", figures.ExtremesStand);
    }

    private static void Criterion(Utf8JsonWriter json, CriterionJudgement judged)
    {
        json.Figure("demanded", judged.Demanded);
        json.Figure("observed", judged.Observed);
        json.Figure("lower", judged.Lower ?? double.NaN);
        json.WriteString("standing", Word(judged.Standing));
        json.WriteBoolean("by-percentiles", judged.ByPercentiles);
        if (judged.MoreUnits is { } more)
            json.WriteNumber("more-units", more);
        else
            json.WriteNull("more-units");
    }

    private static void Unit(Utf8JsonWriter json, UnitJudgement unit)
    {
        json.WriteString("serial", unit.Serial);
        json.WriteString("verdict", Word(unit.Verdict));
        json.Objects("reasons", unit.Reasons, (one, reason) =>
        {
            one.WriteString("name", reason.Name);
            one.Figure("error", reason.Error);
        });
        json.Strings("missing", unit.Missing);
    }

    private static void File(Utf8JsonWriter json, ReadingReport report)
    {
        json.WriteString("file", report.File);
        json.WriteNumber("lines", report.Lines);
        json.WriteNumber("converted", report.Converted);
        json.WriteString("layout", report.Layout?.Description ?? "");
    }

    private static void Fault(Utf8JsonWriter json, (ReadingFault Kind, long Count, IReadOnlyList<FaultPlace> Places) fault)
    {
        json.WriteString("kind", Word(fault.Kind));
        json.WriteNumber("count", fault.Count);
        json.Objects("places", fault.Places, (one, place) =>
        {
            one.WriteString("file", place.File);
            one.WriteNumber("line", place.Line);
            one.WriteString("text", place.Text);
        });
    }
}
