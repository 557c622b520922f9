using BandSpec.Documents.Model;
using BandSpec.Documents.Pdf;
using static System.FormattableString;

namespace BandSpec.Tests.Documents;

/// <summary>A made-up document that uses every block, mark and chart there is.</summary>
internal static class SampleDocument
{
    public static readonly Attachment Note = new(
        "note.txt", "text/plain", "A note", Relationship.Supplement, "attached, byte for byte\n"u8.ToArray());

    public static PdfFacts Facts(params Attachment[] attachments) =>
        new(
            "Brine <reinjection> & line", "Application engineering", "Error-band specification HV-3107", "en", new DateOnly(2026, 11, 24),
            "BandSpec test", attachments, false);

    public static Frame Frame(Standing standing = Standing.Draft) => new(
        "Brine <reinjection> & line", "Application engineering", "Error-band specification HV-3107", "en", new DateOnly(2026, 11, 24),
        "HV-3107 · revision A", "Brine reinjection line, wellhead skid", "Holmvik Geothermal · 2026-11-24", "Page {page} of {pages}",
        "(continued)",
        new Stamp(
            standing, standing == Standing.Refused ? "NOT FEASIBLE" : "DRAFT",
            standing == Standing.Refused ? "No compensation plan keeps the allowed error." : "Not released for delivery."));

    public static Document Full(Standing standing = Standing.Draft) =>
        new(Frame(standing), [.. Front(), .. Tables(), .. Charts(), .. Texts()]);

    /// <summary>One of every block, short enough to read whole.</summary>
    public static Document Brief() => new(Frame(),
    [
        .. Front(),
        .. Tables().Take(4),
        .. Texts().Where(b => b is not Paragraph).Take(9),
    ]);

    private static IEnumerable<Block> Front() =>
    [
        new TitleBlock("Custom error-band specification", "Brine reinjection line, wellhead skid", "Pressure transmitter, 0 bar to 25 bar gauge, ratiometric 0.5 V to 4.5 V",
        [
            new("Number", "HV-3107"), new("Revision", "A"), new("Date", "2026-11-24"), new("Customer", "Holmvik Geothermal"),
            new("Prepared by", "Application engineering"), new("Platform", "SK-40 welded steel cell, revision 4"),
        ]),
        new Paragraph(Markup.Parse("Between −20 °C and 150 °C, over 15 years of the stated profile, the error stays within **±1.0 %FS** from 40 °C to 130 °C and within **±1.6 %FS** below."), Voice.Lead),
        new Headline([new("Margin", "1.08", "at least 1 is needed"), new("Tightest allowed", "±1.0 %FS", "40 °C to 130 °C"), new("Compensation", "4 points", "proven over 1 482 plans"), new("Verdict", "Feasible", "both criteria met")]),
        SampleCharts.BandFigure(),
    ];

    private static IEnumerable<Block> Tables() =>
    [
        new PageBreak(),
        new Heading(1, "1", "Error band by region"),
        new Paragraph(Markup.Parse("All errors are in percent of the calibrated span (%FS). *Maximum* holds at both capability criteria, C_{pk} ≥ 1.67 within a lot and C_{pk} ≥ 1.33 in the long run; `M` is the mean error, 10^{−5} a probability.")),
        new Table("Table 1", "Band by temperature region", [new("Region", Unit: "°C"), new("Allowed", Align.Decimal, "%FS", "Error band"), new("Maximum", Align.Decimal, "%FS", "Error band"), new("Typical", Align.Decimal, "%FS", "Error band"), new("Margin", Align.Decimal), new("Worst point")],
        [
            new(["−20 to 40", "1.6", "1.25", "0.85", "1.18", "25 bar, −20 °C"]),
            new(["40 to 130", "1.0", "0.95", "0.6", "1.08", "25 bar, 130 °C"]),
            new(["130 to 150", "1.0", "0.95", "0.65", "1.09", "0 bar, 130 °C"]),
            new(["All", "1.0", "0.95", "0.65", "1.08", "25 bar, 130 °C"], RowKind.Total),
        ], "Maximum and typical are rounded up to 0.05 %FS."),
        new Heading(2, "1.1", "A long table"),
        new Table("Table 2", "Verification limits", [new("Point"), new("Temperature", Align.Decimal, "°C"), new("Pressure", Align.Decimal, "bar"), new("Direction", Align.Centre), new("Lower", Align.Decimal, "V"), new("Nominal", Align.Decimal, "V"), new("Upper", Align.Decimal, "V")],
            [new(["At the reference temperature"], RowKind.Section), .. Enumerable.Range(1, 60).Select(i => new Row([$"V{i:00}", i % 7 == 0 ? "—" : Invariant($"{i * 2.5:0.0}"), $"{i % 6 * 5}", i % 2 == 0 ? "rising" : "falling", Invariant($"{i * 0.07:0.000}"), Invariant($"{i * 0.07 + 0.01:0.000}"), Invariant($"{i * 0.07 + 0.02:0.000}")])), new(["Second part"], RowKind.Section), new(["", "1", "2", "rising", "0.1", "10.25", "100.375"])]),
        new Table(
            "Table 3", "A row taller than a page", [new("Name"), new("Story")],
            [new(["Short", "one line"]), new(["Tall", string.Join(' ', Enumerable.Range(1, 1500).Select(i => $"word{i}"))]), new(["After", "the tall row"])]),
    ];

    private static IEnumerable<Block> Charts() =>
    [
        new Heading(1, "2", "Charts"),
        .. SampleCharts.Figures(),
    ];

    private static IEnumerable<Block> Texts() =>
    [
        new Heading(1, "3", "Words"),
        new Callout(Tone.Note, "Note", ["A note of one sentence that is long enough to run over the end of its line and to show how the second line stands under the first."]),
        new Callout(Tone.Caution, "Caution", ["Pressure equipment: local codes govern.", "A second paragraph."]),
        new Callout(Tone.Assurance, "Feasible", ["The margin is 1.08."]),
        new Callout(Tone.Refusal, "Not feasible", ["Ageing alone fills the band."]),
        new Heading(2, "3.1", "Lists and facts"),
        new Bullets(["First", "Second, which is longer: " + string.Join(' ', Enumerable.Repeat("and so on", 25)), "Third"]),
        new Bullets(["One", "Two"], Numbered: true),
        new Heading(3, "", "Facts in one column"),
        new Facts([new("Requirement", Markup.Parse("`9f86d081884c7d659a2feaa0c55ad015a3bf4f1b2b0b822cd15d6c15b0f00a08`")), new("Greek and Cyrillic", "Ωμέγα, Давление, Übergröße, Łódź")]),
        .. Enumerable.Range(1, 6).Select(_ => new Paragraph(string.Join(' ', Enumerable.Repeat("A paragraph with enough words to fill several lines of the page, so that its breaking can be seen.", 6)))),
        new Paragraph("Small print at the end.", Voice.Fine),
    ];
}
