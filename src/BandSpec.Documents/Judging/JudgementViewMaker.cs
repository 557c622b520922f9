using System.Globalization;
using BandSpec.Core.LotJudging;
using BandSpec.Core.TestLimits;
using BandSpec.Documents.Charts;
using BandSpec.Documents.Fonts;
using BandSpec.Documents.Printing;

namespace BandSpec.Documents.Judging;

/// <summary>Rounds a judgement for print: indices and their limits downward, so that none prints as reached that is not.</summary>
internal sealed class JudgementViewMaker(LotJudgement judged, IReadOnlyList<JudgedFile> files, string decimalSign)
{
    private const int UnitsShown = 40, PlacesShown = 5, Decimals = 4;

    public JudgementView Make() => new(
        Printable(judged.Limits.Specification), Printable(judged.Limits.Title), judged.IsProven ? "proven" : judged.IsMet ? "met" : "missed",
        Demand(judged.Limits.SampleCriterion, judged.Sample, c => c.Sample), Demand(judged.Limits.LongRunCriterion, judged.LongRun, c => c.LongRun),
        Units(), Whole(judged.Readings), judged.LotNames.Count == 0 ? "" : Whole(judged.LotNames.Count),
        [.. judged.Characteristics.Select(Of)],
        [.. judged.Units.Where(u => u.Verdict != UnitVerdict.Pass).Take(UnitsShown).Select(Of)],
        [.. files.Select(f => new ReadFileView(Printable(f.Name), Whole(f.Lines), Printable(f.Layout)))], [.. judged.Faults.All.Select(Of)],
        judged.Characteristics.Any(c => c.Values.Count < c.Count));

    private DemandView Demand(double demanded, Standing? worst, Func<CharacteristicJudgement, CriterionJudgement?> criterion)
    {
        CharacteristicJudgement? least = judged.Characteristics.Where(c => criterion(c) is not null).MinBy(c => criterion(c)!.Observed);
        return new(
            Given(demanded), worst is { } known ? Key(known) : "unknown", least is null ? "–" : Index(criterion(least)!.Observed), Printable(least?.Name ?? ""),
            least?.IsDerived ?? false);
    }

    private UnitCountView Units()
    {
        (long pass, long fail, long incomplete) = judged.UnitCounts;
        return new(Whole(pass + fail + incomplete), Whole(pass), Whole(fail), Whole(incomplete));
    }

    private CharacteristicView Of(CharacteristicJudgement c, int index)
    {
        bool canJudge = c is { Within: not null, Sample: not null };
        return new(
            Printable(c.Name), c.IsDerived, Place(c, index), Shown(Rounded.Nearest(c.Tolerance, 3)), Whole(c.Count),
            c.Count > 0 ? Error(c.Mean) : "–", Whole(c.OutsideCount), Shown(Rounded.Up(100 * c.OutsideFraction.Upper, 0.01)),
            canJudge ? Of(c.Within!, c.NormalityWithin, c.Sample!) : null,
            canJudge ? Of(c.Overall!, c.NormalityOverall, c.LongRun!) : null,
            c.ByPercentiles is { } free ? Of(free) : null,
            string.Join(", ", c.Outliers.Select(o => $"{(o.Serial.Length > 0 ? Printable(o.Serial) + " " : "")}({Error(o.Value)})")),
            c.Count > 1 ? ValuesOf(c, index) : null);
    }

    private PlaceView Place(CharacteristicJudgement c, int index)
    {
        if (c.IsDerived)
            return new(Unbroken(c.Place).Replace(".", decimalSign, StringComparison.Ordinal), "", "");
        LotPoint point = judged.Limits.Points[index];
        return new(
            Given(point.Temperature.Celsius) + " °C", $"{Given(Math.Round(point.Pressure.Value, Decimals))} {point.Pressure.Unit}",
            point.Direction switch { PressureDirection.Rising => "rising", PressureDirection.Falling => "falling", _ => "" });
    }

    private static string Unbroken(string place) =>
        place.Replace(" °C", "\u00a0°C", StringComparison.Ordinal).Replace(" = ", "\u00a0=\u00a0", StringComparison.Ordinal).Replace('-', '\u2212');

    private CapabilityView Of(CapabilityFigures figures, Normality? normality, CriterionJudgement criterion) => new(
        Error(figures.Deviation), Index(figures.Spread), Index(figures.SpreadLower), Index(figures.Nearer), Index(figures.NearerLower),
        normality is null ? "unknown" : normality.IsPlausible ? "yes" : "no", Key(criterion.Standing), criterion.ByPercentiles,
        criterion is { Standing: not Standing.Proven, MoreUnits: > 0 and var more } ? Whole(more) : "");

    private PercentileView Of(PercentileFigures free) => new(
        Error(free.Low), Error(free.Median), Error(free.High), Index(free.Spread), Index(free.Nearer),
        free.NearerLower is { } lower ? Index(lower) : "–", free.ExtremesStand);

    private LotValues ValuesOf(CharacteristicJudgement c, int index)
    {
        List<RunSpan> run = [];
        long from = 1;
        foreach (RunStretch stretch in c.Run)
        {
            run.Add(new(from, from + stretch.Count - 1, stretch.Mean, stretch.Smallest, stretch.Largest));
            from += stretch.Count;
        }

        LotValues values = new(c.Tolerance, c.IsDerived ? [] : Acceptance(index), run, [], [], c.Mean);
        double reach = new LotChart(new("", "", "", "", "", "", "", ""), values).Reach;
        IReadOnlyList<ValueBin> bins = ValueBins.Of(c.Values, reach);
        return values with { Bins = bins, Normal = Normal(c, bins[0].To - bins[0].From, reach) };
    }

    private double[] Acceptance(int index)
    {
        LotPoint point = judged.Limits.Points[index];
        double[] limits = [.. new[] { judged.Limits.ErrorOf(index, point.Lower), judged.Limits.ErrorOf(index, point.Upper) }.Order()];
        return point.Lower <= point.Upper ? limits : [];
    }

    /// <summary>The normal law over lots, as the share that a bin would hold.</summary>
    private static Spot[] Normal(CharacteristicJudgement c, double width, double reach)
    {
        if (c.Overall is not { Deviation: > 0 and var sigma })
            return [];
        double from = Math.Max(-reach, c.Mean - (4 * sigma)), to = Math.Min(reach, c.Mean + (4 * sigma));
        return [.. Enumerable.Range(0, 81).Select(i =>
        {
            double at = from + ((to - from) * i / 80), z = (at - c.Mean) / sigma;
            return new Spot(100 * width * Math.Exp(-z * z / 2) / (sigma * Math.Sqrt(2 * Math.PI)), at);
        })];
    }

    private UnitView Of(UnitJudgement unit) => new(
        Printable(unit.Serial), unit.Verdict == UnitVerdict.Fail ? "fail" : "incomplete",
        string.Join(", ", unit.Reasons.Take(6).Select(r => $"{r.Name} {Error(r.Error)}")) + (unit.Reasons.Count > 6 ? " …" : ""),
        string.Join(", ", unit.Missing.Take(8)) + (unit.Missing.Count > 8 ? " …" : ""));

    private FaultView Of((ReadingFault Kind, long Count, IReadOnlyList<FaultPlace> Places) fault) => new(
        Key(fault.Kind), Whole(fault.Count),
        string.Join(", ", fault.Places.Take(PlacesShown).Select(p => string.Create(CultureInfo.InvariantCulture, $"{Printable(Path.GetFileName(p.File))}:{p.Line}")))
        + (fault.Count > PlacesShown ? " …" : ""));

    /// <summary>Serials, names and headings come from files: what no font has, or no page can show, becomes a question mark.</summary>
    private static string Printable(string text)
    {
        IReadOnlyList<string> missing = Letters.Missing(text);
        string shown = missing.Aggregate(text, (some, letter) => some.Replace(letter, "?", StringComparison.Ordinal));
        return string.Concat(shown.Select(c => char.IsControl(c) ? ' ' : c));
    }

    private string Error(double percent) => Shown(Rounded.Nearest(percent, Decimals));

    private string Index(double index) => double.IsFinite(index) ? Shown(Rounded.Below(index, 0.01)) : index > 0 ? "∞" : "−∞";

    private string Given(double value) => Shown(Rounded.Given(value));

    private string Whole(long value) => Shown(new Rounded(value.ToString(CultureInfo.InvariantCulture)));

    private string Shown(Rounded figure) => figure.Shown(decimalSign);

    private static string Key<T>(T value)
        where T : struct, Enum =>
        string.Concat(value.ToString().Select((c, i) => char.IsUpper(c) ? $"{(i > 0 ? "-" : "")}{char.ToLowerInvariant(c)}" : $"{c}"));
}
