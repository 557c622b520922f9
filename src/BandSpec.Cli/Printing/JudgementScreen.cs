using System.Globalization;
using System.Text;
using BandSpec.Core.LotJudging;
using BandSpec.Files.Json;
using BandSpec.Files.LotReadings;

namespace BandSpec.Cli.Printing;

/// <summary>A judgement on one screen: verdict, what was read, one line for each characteristic, what does not pass and why.</summary>
internal static class JudgementScreen
{
    private const int UnitsShown = 10;
    private static readonly CultureInfo Plain = CultureInfo.InvariantCulture;

    /// <summary>The whole screen.</summary>
    public static string Of(LotJudgement judged, IReadOnlyList<ReadingReport> reports, string folder, IReadOnlyList<string> files, Ink ink)
    {
        StringBuilder screen = new();
        screen.Append(Plain, $"\n{ink.Bold(judged.Limits.Specification)}  {judged.Limits.Title}\n\n");
        AppendVerdict(screen, judged, ink);
        AppendReading(screen, judged, reports);
        AppendCharacteristics(screen, judged, ink);
        AppendNotes(screen, judged, ink);
        AppendUnits(screen, judged, ink);
        screen.Append(FaultsOf(judged.Faults, isWritten: true, ink));
        return screen.Append(Plain, $"{ink.Bold("Written")}   {ink.Blue(folder)}: {string.Join(", ", files)}\n\n").ToString();
    }

    /// <summary>Lines that took no part, by kind, with the first places; empty when there are none.</summary>
    /// <param name="faults">The lines.</param>
    /// <param name="isWritten">Whether a judgement was written, which names more of them.</param>
    /// <param name="ink">Colours.</param>
    public static string FaultsOf(ReadingFaults faults, bool isWritten, Ink ink)
    {
        StringBuilder screen = new();
        foreach ((ReadingFault kind, long count, IReadOnlyList<FaultPlace> places) in faults.All)
        {
            screen.Append(Plain, $"{ink.Yellow($"{count:N0} line{(count == 1 ? "" : "s")}")} {Meaning(kind)}\n");
            foreach (FaultPlace place in places.Take(5))
                screen.Append(Plain, $"          {place.File}:{place.Line}: {(place.Text.Length == 0 ? "(empty)" : Printable(place.Text))}\n");
            if (count > 5)
                screen.Append(Plain, $"          and {count - 5:N0} more{(isWritten ? $"; judgement.json names the first {ReadingFaults.PlacesNamed}" : "")}\n");
        }

        return screen.Length > 0 ? screen.Append('\n').ToString() : "";
    }

    private static void AppendVerdict(StringBuilder screen, LotJudgement judged, Ink ink)
    {
        string verdict = judged.IsProven ? ink.Green("PROVEN") : judged.IsMet ? ink.Yellow("MET, NOT PROVEN") : ink.Red("NOT MET");
        screen.Append(Plain, $"{verdict}   within a lot {judged.Limits.SampleCriterion}: {Told(judged.Sample)}; ")
            .Append(Plain, $"over lots {judged.Limits.LongRunCriterion}: {Told(judged.LongRun)}\n");
        (long pass, long fail, long incomplete) = judged.UnitCounts;
        screen.Append(Plain, $"{pass:N0} unit{(pass == 1 ? "" : "s")} pass, {fail:N0} fail, {incomplete:N0} incomplete\n\n");
    }

    private static void AppendReading(StringBuilder screen, LotJudgement judged, IReadOnlyList<ReadingReport> reports)
    {
        foreach (ReadingReport report in reports)
        {
            screen.Append(Plain, $"{report.File}: {report.Lines:N0} lines; {report.Layout!.Description}\n");
            if (report.Layout.UnusedColumns.Count > 0)
                screen.Append(Plain, $"  not read: {string.Join(", ", report.Layout.UnusedColumns.Select(c => $"`{c}`"))}\n");
            if (report.Converted > 0)
                screen.Append(Plain, $"  {report.Converted:N0} readings named another unit and were converted to {judged.Limits.OutputUnit}\n");
        }

        string lots = judged.LotNames.Count == 0 ? "no lot or date named: taken as one lot" : $"{judged.LotNames.Count:N0} lots";
        screen.Append(Plain, $"{judged.Readings:N0} readings taken; {lots}\n\n");
    }

    private static void AppendCharacteristics(StringBuilder screen, LotJudgement judged, Ink ink)
    {
        int width = Math.Max(5, judged.Characteristics.Max(c => CellWidth.Of(NameOf(c))));
        screen.Append(ink.Faint($"{"".PadRight(width)}        n     mean   s within     Cp    Cpk  lower     Pp    Ppk  lower  outside  normal   within a lot   over lots"))
            .Append(ink.Faint("   %FS, lower limits 95 %")).Append('\n');
        foreach (CharacteristicJudgement c in judged.Characteristics)
        {
            string name = NameOf(c);
            screen.Append(name).Append(' ', width - CellWidth.Of(name));
            if (c is not { Within: { } within, Overall: { } overall, Sample: { } sample, LongRun: { } longRun })
            {
                screen.Append(Plain, $"{c.Count,9:N0}  too few to judge\n");
                continue;
            }

            string normal = (c.NormalityWithin?.IsPlausible, c.NormalityOverall?.IsPlausible) switch
            {
                (false, _) => "no", (_, false) => "lots", (null, _) => "-", _ => "yes",
            };
            screen.Append(Plain, $"{c.Count,9:N0} {c.Mean,8:0.0000} {within.Deviation,10:0.00000} {Index(within.Spread)} {Index(within.Nearer)} {Index(within.NearerLower)}")
                .Append(Plain, $" {Index(overall.Spread)} {Index(overall.Nearer)} {Index(overall.NearerLower)} {c.OutsideCount,8:N0}  {normal,-6}   {Painted(sample, ink)}   {Painted(longRun, ink)}\n");
        }

        screen.Append('\n');
    }

    private static void AppendNotes(StringBuilder screen, LotJudgement judged, Ink ink)
    {
        foreach (CharacteristicJudgement c in judged.Characteristics)
        {
            if (c.Sample is { } sample)
                AppendNote(screen, NameOf(c), "within a lot", sample, c.Within!.Nearer, ink);
            if (c.LongRun is { } longRun)
                AppendNote(screen, NameOf(c), "over lots", longRun, c.Overall!.Nearer, ink);
            if (c.Outliers.Count > 0)
                screen.Append(Plain, $"{NameOf(c)}: stands out: {string.Join(", ", c.Outliers.Select(o => string.Create(Plain, $"{o.Serial} ({o.Value:0.000})")))}\n");
        }

        screen.Append('\n');
    }

    private static void AppendNote(StringBuilder screen, string name, string criterion, CriterionJudgement judged, double byNormalLaw, Ink ink)
    {
        if (judged.ByPercentiles)
        {
            string lower = judged.Lower is { } limit ? string.Create(Plain, $", lower limit {Cut(limit)}") : "";
            screen.Append(Plain, $"{name}, {criterion}: not normal, so percentiles decide (ISO 22514-2): {Cut(judged.Observed)}{lower}; the normal formula would say {Cut(byNormalLaw)}\n");
        }

        if (judged is { Standing: Standing.Met, MoreUnits: { } more })
            screen.Append(Plain, $"{name}, {criterion}: {ink.Yellow($"{more:N0} more unit{(more == 1 ? "" : "s")}")} would prove {judged.Demanded} at this index\n");
    }

    private static void AppendUnits(StringBuilder screen, LotJudgement judged, Ink ink)
    {
        long bad = judged.UnitCounts.Fail + judged.UnitCounts.Incomplete;
        foreach (UnitJudgement unit in judged.Units.Where(unit => unit.Verdict != UnitVerdict.Pass).Take(UnitsShown))
        {
            IEnumerable<string> why = unit.Reasons.Select(r => string.Create(Plain, $"{r.Name} {r.Error:0.000}"));
            string missing = unit.Missing.Count == 0 ? "" : $"{(unit.Reasons.Count > 0 ? "; " : "")}not read: {string.Join(", ", unit.Missing)}";
            screen.Append(Plain, $"{(unit.Verdict == UnitVerdict.Fail ? ink.Red("fail") : ink.Yellow("incomplete"))}  {Printable(unit.Serial)}  {string.Join(", ", why)}{missing}\n");
        }

        if (bad > UnitsShown)
            screen.Append(Plain, $"and {bad - UnitsShown:N0} more; units.csv has every unit\n");
        if (bad > 0)
            screen.Append('\n');
    }

    private static string NameOf(CharacteristicJudgement c) => c.Place.Length > 0 ? $"{c.Name} at {c.Place}" : c.Name;

    private static string Told(Standing? standing) => standing is { } known ? JudgementJson.Word(known) : "not judged";

    private static string Painted(CriterionJudgement judged, Ink ink)
    {
        string word = JudgementJson.Word(judged.Standing).PadRight(12);
        return judged.Standing switch { Standing.Proven => ink.Green(word), Standing.Met => ink.Yellow(word), _ => ink.Red(word) };
    }

    /// <summary>Cut, not rounded: an index of 1.6699 does not reach 1.67.</summary>
    private static string Cut(double index) => double.IsFinite(index) ? (Math.Floor((index * 1000) + 1e-7) / 1000).ToString("0.000", Plain) : index > 0 ? "\u221e" : "-\u221e";

    private static string Index(double index) => Cut(index).PadLeft(6);

    private static string Printable(string text) => string.Concat(text.Select(c => char.IsControl(c) ? '\uFFFD' : c));

    private static string Meaning(ReadingFault kind) => kind switch
    {
        ReadingFault.MissingCell => "with too few cells",
        ReadingFault.NoSerial => "without a serial number",
        ReadingFault.UnknownPoint => "of a point that is not in the limits",
        ReadingFault.AmbiguousPoint => "whose direction is not said where both are tested",
        ReadingFault.NotANumber => "with text where the reading belongs",
        ReadingFault.OtherUnit => "in another unit, or a thousandfold off as if it were",
        ReadingFault.BeyondMeasure => "more than ten thousand spans off, which no instrument shows",
        ReadingFault.Duplicate => "with a point that its unit has already; the first stands",
        _ => "counted at their point only: too many units to follow each",
    };
}
