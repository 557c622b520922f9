using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Documents;

namespace BandSpec.Tests.Documents;

/// <summary>Finished specifications for the documents to be drawn from, each solved once.</summary>
internal static class Drafts
{
    private static readonly Lazy<Specification> Done = new(() => SpecificationDraft.Draft(Given.Application(Quick(Given.Requirement))));
    private static readonly Lazy<Specification> Impossible = new(() => SpecificationDraft.Draft(Given.Application(Quick(Given.Requirement) with { SafetyFactor = 3 }), extras: DraftExtras.All));
    private static readonly Lazy<Specification> Large = new(() => SpecificationDraft.Draft(Given.Application(Crowded(20))));
    private static readonly Lazy<Specification> Longest = new(() => SpecificationDraft.Draft(Given.Application(Crowded(280))));

    public static Specification Feasible => Done.Value;

    public static Specification Refused => Impossible.Value;

    /// <summary>40 regions, 30 profile bins, 60 verification points, long names in three scripts.</summary>
    public static Specification Stress => Large.Value;

    /// <summary>The same, tested at so many temperatures that the document has more than forty pages.</summary>
    public static Specification Long => Longest.Value;

    public static readonly SourceFile[] Sources =
    [
        new("requirement.yaml", "application/yaml", "Requirement", true, "specification: {}\n"u8.ToArray()),
        new("result.json", "application/json", "Result", false, "{}"u8.ToArray()),
    ];

    public static DocumentOptions Options { get; } = new() { Program = "BandSpec 0.1.0" };

    public static ReleaseMark Mark { get; } = new("Ylva Strøm", new DateTimeOffset(2026, 11, 25, 9, 30, 0, TimeSpan.Zero), new string('a', 64));

    public static IReadOnlyDictionary<string, byte[]> Draw(Specification specification, DocumentOptions? options = null) =>
        SpecificationPackage.Draw(specification, Sources, options ?? Options).ToDictionary(f => f.Name, f => f.Bytes.ToArray());

    // Few candidates: these tests are about the documents, not about the choice.
    private static Requirement Quick(Requirement requirement) => requirement with
    {
        Compensation = requirement.Compensation with { CandidateStep = Given.K(10), FewestTemperatures = 3, MostTemperatures = 3, Separation = Given.K(40) },
    };

    private static Requirement Crowded(int testTemperatures)
    {
        var given = Quick(Given.Requirement);
        Temperature At(double part) => Given.C(Math.Round(-20 + 170 * part, 1));
        return given with
        {
            Identity = given.Identity with
            {
                Revision = "Y",
                Title = "Закачка рассола в скважину, Ωμέγα 3: " + string.Join(' ', Enumerable.Repeat("brine reinjection line and wellhead skid", 4)),
                Customer = "Общество геотермальной энергетики Хольмвик и сыновья с весьма длинным именем, Holmvik Geothermal Übergröße GmbH & Co <KG>",
                PreparedBy = "Γραφείο εφαρμογών και υπολογισμών",
                Changes = [.. Enumerable.Range(0, 25).Select(i => new RevisionNote($"{(char)('A' + i)}", new DateOnly(2026, 1, 1 + i), string.Join(' ', Enumerable.Repeat("A change told at length", 1 + i % 8))))],
            },
            AllowedError = [.. Enumerable.Range(0, 40).Select(i => new AllowedErrorRegion(At(i / 40.0), At((i + 1) / 40.0), Given.P(1.4 + 0.01 * (i % 7)), i % 3 == 0 ? Given.P(1.6) : null, i % 5 == 0 ? 0.02 : 0))],
            Profile = [.. Enumerable.Range(0, 30).Select(i => new DwellBin(At(i / 30.0), At((i + 1) / 30.0), Duration.FromHours(500 + 37 * i)))],
            Test = given.Test with { Temperatures = [.. Enumerable.Range(0, testTemperatures).Select(i => At(i / (testTemperatures - 1.0)))] },
            FurtherTerms = [.. Enumerable.Range(1, 6).Select(i => new FurtherTerm($"Дополнительная погрешность номер {i}", Given.P(0.002), Given.P(0.001), FurtherTermShape.Constant))],
        };
    }
}
