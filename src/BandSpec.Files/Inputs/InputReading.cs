using BandSpec.Core.Findings;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>Reads a requirement with its platform and station, and finds everything that is wrong with them in one go.</summary>
public static class InputReading
{
    /// <summary>Reads the three files and checks all their rules.</summary>
    /// <param name="requirement">The requirement's file.</param>
    /// <param name="open">Opens a file by its path as it is written in the requirement, relative to it.</param>
    /// <param name="missing">
    /// The letters of a text that no document can show; <see langword="null"/> when none is going to be written.
    /// </param>
    /// <param name="changes">Values to be read as if they were written otherwise; <see langword="null"/> for none.</param>
    /// <exception cref="FormatException">A change has no value to replace.</exception>
    public static InputSet Read(
        InputContent requirement, Func<string, InputContent> open, Func<string, IReadOnlyList<string>>? missing = null,
        IReadOnlyList<InputChange>? changes = null)
    {
        ArgumentNullException.ThrowIfNull(open);
        InputContent Changed(InputFile kind, InputContent content) =>
            (changes ?? []).Where(change => change.File == kind).Aggregate(content, (before, change) => change.In(before));
        return Read(
            Changed(InputFile.Requirement, requirement), (kind, path) => Changed(kind, open(path)), missing);
    }

    /// <summary>Reads the three files and checks all their rules; which file is asked for is told by its kind too.</summary>
    /// <param name="requirement">The requirement's file.</param>
    /// <param name="open">Opens the platform or the station by its path as it is written in the requirement.</param>
    /// <param name="missing">The letters of a text that no document can show; <see langword="null"/> when none is going to be written.</param>
    internal static InputSet Read(
        InputContent requirement, Func<InputFile, string, InputContent> open, Func<string, IReadOnlyList<string>>? missing)
    {
        ArgumentNullException.ThrowIfNull(requirement);
        OpenedFile asked = OpenedFile.Open(InputFile.Requirement, requirement);
        double? span = asked.Find(RequirementForm.Pressure)?.SpanInPascals;
        OpenedFile? family = Follow(asked, RequirementForm.PlatformFile, InputFile.Platform, open);
        OpenedFile? line = Follow(asked, RequirementForm.StationFile, InputFile.Station, open);
        RequirementParts wanted = asked.Read(RequirementForm.Form, span) ?? new RequirementParts();
        PlatformParts platform = family?.Read(PlatformForm.Form, span) ?? new PlatformParts();
        StationParts station = line?.Read(StationForm.Form, span) ?? new StationParts();

        OpenedFile[] files = [.. new[] { asked, family, line }.OfType<OpenedFile>()];
        foreach (Finding finding in Application.FindingsIn(wanted, platform, station))
            files.First(file => file.Kind == finding.Field.File).Place(finding);
        foreach (Finding finding in missing is null ? [] : LetterRules.Judge(wanted, platform, station, missing))
            files.First(file => file.Kind == finding.Field.File).Place(finding);
        PlacedFinding[] findings = [.. files.SelectMany(file => file.PlacedFindings())];
        InputSource[] sources = [.. files.Select(file => file.Source).OfType<InputSource>()];
        return new InputSet(findings.Length == 0 ? Whole(asked, wanted, platform, station) : null, sources, findings) { Placing = asked.Placed };
    }

    /// <summary>The application of three inputs without a finding.</summary>
    private static Application Whole(OpenedFile asked, RequirementParts wanted, PlatformParts platform, StationParts station)
    {
        Requirement requirement = RequirementForm.Whole(
            wanted, asked.Find(RequirementForm.PlatformFile)!, asked.Find(RequirementForm.StationFile)!);
        return Application.Check(requirement, PlatformForm.Whole(platform), StationForm.Whole(station)).Value
            ?? throw new InvalidOperationException("the rules judge a whole input and its parts alike");
    }

    /// <summary>Opens the file that a key of the requirement names; a file that cannot be had is a finding at that key.</summary>
    private static OpenedFile? Follow(OpenedFile asked, Key<string> key, InputFile kind, Func<InputFile, string, InputContent> open)
    {
        if (asked.Find(key) is not { } path)
            return null;
        InputContent content = open(kind, path);
        if (content.Refusal is not { } why)
            return OpenedFile.Open(kind, content);
        asked.Place(new Finding(new FieldPath(InputFile.Requirement, key.Name), "file", $"`{Form.Shorten(path)}`: {why}", key.Form.Accepted));
        return null;
    }
}
