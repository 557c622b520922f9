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

/// <summary>One run of <c>bandspec characterize</c>.</summary>
internal sealed class CharacterizeRun(Terminal terminal)
{
    private readonly StatisticsFiles files = new(terminal);

    public required IReadOnlyList<string> Files { get; init; }

    public required string? Platform { get; init; }

    public required string? Report { get; init; }

    public required string? Name { get; init; }

    public required string? Revision { get; init; }

    public required bool Json { get; init; }

    public required bool Quiet { get; init; }

    public required ReadingsFormat Format { get; init; }

    /// <summary>Makes the scope; is given the reference temperature that holds when none was asked for.</summary>
    public required Func<Temperature, CharacterizationScope> ScopeAt { get; init; }

    /// <summary>Reads, estimates, writes.</summary>
    public ExitCode Run()
    {
        if (!files.TryPlatform(Platform, out Platform? earlier)
            || files.Read(Files, content => FamilyReadings.Read(content, Format)) is not { } readings)
            return ExitCode.Findings;
        CharacterizationScope scope = ScopeAt(earlier?.Temperature.Reference ?? Temperature.FromCelsius(25));
        Checked<Characterization> found = Characterization.Of(readings, scope);
        if (!found.IsValid)
        {
            files.Show(found.Findings);
            return ExitCode.Findings;
        }

        Write(found.Value, earlier);
        Show(found.Value);
        return ExitCode.Done;
    }

    private void Write(Characterization found, Platform? earlier)
    {
        string family = Name ?? earlier?.Name ?? Path.GetFileNameWithoutExtension(Platform ?? Files[0]);
        if (Platform is not null)
        {
            PlatformFrame frame = earlier is not null ? PlatformFrame.Of(earlier) : NewFrame.For(found, Format.Range);
            frame = frame with { Name = family, Revision = Revision ?? frame.Revision };
            Dictionary<string, IReadOnlyList<string>> remarks = StatisticsRemarks.Of(found, files.Names);
            if (earlier is null)
                NewFrame.Remark(remarks);
            files.Write(Platform, Text(PlatformYaml.Write(frame.With(found), remarks), frame, found, earlier));
        }

        if (Report is null)
            return;
        DateOnly today = DateOnly.FromDateTime(terminal.Clock.GetLocalNow().DateTime);
        DocumentOptions options = new() { Program = CommandLine.Program };
        files.Write(Report, StatisticsReports.Draw(found, family, files.Attachments(), today, options)
            .Append(new DocumentFile("characterization.json", CharacterizationJson.Of(found))));
    }

    private string Text(string written, PlatformFrame frame, Characterization found, Platform? earlier) => earlier is null
        ? written
        : FrameInFile.Keep(
            files.Text(Platform!), written, (frame.Name, frame.Revision) != (earlier.Name, earlier.Revision),
            found.Scope.Reference != earlier.Temperature.Reference);

    private void Show(Characterization found)
    {
        if (Json)
            terminal.Out.Write(Encoding.UTF8.GetString(CharacterizationJson.Of(found).Span));
        else if (!Quiet)
            terminal.Out.Write(CharacterizationScreen.Of(found, [.. new[] { Platform, Report }.OfType<string>()], terminal.Ink));
    }
}
