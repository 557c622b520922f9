using System.Text.RegularExpressions;
using BandSpec.Tests.House;
using Xunit;

namespace BandSpec.Tests.Documents;

/// <summary>Who may use what inside the documents, read from the sources.</summary>
public sealed partial class RoomRules
{
    private static readonly string Room = Path.Combine(Tree.Root, "src", "BandSpec.Documents");

    [Fact]
    public void No_file_system_clock_console_or_chance() => Assert.Empty(Offenders(OutsideWorld(), []));

    [Fact]
    public void Only_one_folder_knows_the_pdf_library() => Assert.Empty(Offenders(PdfLibrary(), ["Pdf/Sharp/"]));

    [Fact]
    public void Only_charts_and_the_pen_on_paper_know_the_chart_library() =>
        Assert.Empty(Offenders(ChartLibrary(), ["Charts/", "Pdf/SheetPen.cs", "Pdf/Drawing.cs"]));

    [Fact]
    public void Writers_see_no_specification_but_only_what_is_printed() =>
        Assert.Empty(Offenders(Core(),
        [
            "Printing/", "Composing/SpecificationCharts.cs", "Charts/BandCurves.cs", "SpecificationPackage.cs", "TradeoffDrawing.cs",
            "JudgementPackage.cs", "Judging/JudgementViewMaker.cs", .. Reports,
        ]));

    /// <summary>Reports of readings have no template and no second writer of their figures: they go through Printing.Figures without a view.</summary>
    private static readonly string[] Reports =
    [
        "Composing/AgeingComposer.cs", "Composing/CharacterizationComposer.cs", "StatisticsReports.cs", "ComparisonReport.cs", "Composing/ComparisonComposer.cs",
    ];

    private static List<string> Offenders(Regex forbidden, string[] allowed) =>
        [.. Directory.EnumerateFiles(Room, "*.cs", SearchOption.AllDirectories)
            .Select(file => (Name: Path.GetRelativePath(Room, file).Replace('\\', '/'), Text: File.ReadAllText(file)))
            .Where(file => !allowed.Any(a => file.Name.StartsWith(a, StringComparison.Ordinal)) && forbidden.IsMatch(file.Text))
            .Select(file => file.Name)];

    [GeneratedRegex(@"\b(File\.(Read|Write|Open|Exists)|Directory\.|Console\.|Environment\.|DateTime\.(Utc)?Now|Stopwatch|Guid\.NewGuid|new Random\()")]
    private static partial Regex OutsideWorld();

    [GeneratedRegex(@"^using PdfSharp", RegexOptions.Multiline)]
    private static partial Regex PdfLibrary();

    [GeneratedRegex(@"^using OxyPlot", RegexOptions.Multiline)]
    private static partial Regex ChartLibrary();

    [GeneratedRegex(@"^using BandSpec\.Core", RegexOptions.Multiline)]
    private static partial Regex Core();
}
