using System.Text;
using BandSpec.Cli.Printing;
using BandSpec.Core.Characterizing;
using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Documents;
using BandSpec.Files.Json;
using BandSpec.Files.Readings;
using BandSpec.Files.Writing;

namespace BandSpec.Cli.Characterizing;

/// <summary>One run of <c>bandspec age</c>.</summary>
internal sealed class AgeRun(Terminal terminal)
{
    private readonly StatisticsFiles files = new(terminal);

    public required IReadOnlyList<string> Files { get; init; }

    public required string? Platform { get; init; }

    public required string? Report { get; init; }

    public required bool Json { get; init; }

    public required bool Quiet { get; init; }

    public required ReadingsFormat Format { get; init; }

    /// <summary>Makes the scope; is given the test that holds when none was asked for.</summary>
    public required Func<Temperature, Duration, AgeingScope> ScopeAt { get; init; }

    /// <summary>Reads, estimates, writes.</summary>
    public ExitCode Run()
    {
        if (!files.TryPlatform(Platform, out Platform? earlier)
            || files.Read(Files, content => StorageReadings.Read(content, Format)) is not { } readings)
            return ExitCode.Findings;
        if (Platform is not null && earlier is null)
            throw new RefusalException($"{Platform}: there is no such file; ageing is put into a platform that exists");
        Checked<AgeingStatistics> found = AgeingStatistics.Of(readings, Scope(readings, earlier));
        if (!found.IsValid)
        {
            files.Show(found.Findings);
            return ExitCode.Findings;
        }

        Write(found.Value, earlier);
        Show(found.Value);
        return ExitCode.Done;
    }

    private AgeingScope Scope(IReadOnlyList<DriftReading> readings, Platform? earlier)
    {
        Temperature storage = readings.GroupBy(r => r.Storage).OrderByDescending(g => g.Select(r => r.Unit).Distinct().Count())
            .Select(g => g.Key).FirstOrDefault();
        Duration longest = readings.Select(r => r.Stored).DefaultIfEmpty(Duration.FromHours(1000)).Max();
        // A platform without drift has had no test: its conditions are placeholders.
        Ageing? stated = earlier?.Ageing is { } ageing && (ageing.Zero, ageing.Span) != (NewFrame.None, NewFrame.None) ? ageing : null;
        return ScopeAt(stated?.TestTemperature ?? storage, stated?.TestDuration ?? longest);
    }

    private void Write(AgeingStatistics found, Platform? earlier)
    {
        if (Platform is not null && earlier is not null)
        {
            files.Write(Platform, AgeingInFile.Replace(
                files.Text(Platform), found.ToAgeing(), found.ToAccuracy(), StatisticsRemarks.Of(found, files.Names)));
        }

        if (Report is null)
            return;
        string family = earlier?.Name ?? Path.GetFileNameWithoutExtension(Files[0]);
        DateOnly today = DateOnly.FromDateTime(terminal.Clock.GetLocalNow().DateTime);
        files.Write(Report, StatisticsReports.Draw(found, family, files.Attachments(), today, new DocumentOptions { Program = CommandLine.Program })
            .Append(new DocumentFile("ageing.json", AgeingJson.Of(found))));
    }

    private void Show(AgeingStatistics found)
    {
        if (Json)
            terminal.Out.Write(Encoding.UTF8.GetString(AgeingJson.Of(found).Span));
        else if (!Quiet)
            terminal.Out.Write(AgeingScreen.Of(found, [.. new[] { Platform, Report }.OfType<string>()], terminal.Ink));
    }
}
