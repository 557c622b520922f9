using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The form of <c>specification</c> in a requirement.</summary>
internal static class IdentityForm
{
    private static readonly Key<string> ChangeRevision = new(
        "revision", new TextForm("a revision"), "The revision that the line describes.");
    private static readonly Key<DateOnly> ChangeDate = new("date", new DateForm(), "When.");
    private static readonly Key<string> ChangeText = new("text", new TextForm("a sentence"), "What changed.");

    private static readonly MapForm<RevisionNote> Change = new(
        "a line of the revision history", [ChangeRevision, ChangeDate, ChangeText],
        v => new RevisionNote(v.Of(ChangeRevision), v.Of(ChangeDate), v.Of(ChangeText)));

    private static readonly Key<string> Number = new(
        "number", new TextForm("a document number"), "Document number: letters, digits, points, hyphens, underscores. Names the output folder.");

    private static readonly Key<string> Revision = new("revision", new TextForm("a revision"), "Revision letter or number.");
    private static readonly Key<string> Title = new("title", new TextForm("a title"), "What the application is.");
    private static readonly Key<string> Customer = new("customer", new TextForm("a name"), "For whom.");
    private static readonly Key<string> PreparedBy = new("prepared-by", new TextForm("a name"), "Who prepared it.");
    private static readonly Key<DateOnly> Date = new("date", new DateForm(), "Date of this revision, the only date that a document shows.");

    private static readonly Key<IReadOnlyList<RevisionNote>> Changes = new(
        "changes", new ListForm<RevisionNote>("revision history", Change, 1, 200), "Revision history, newest last.");

    /// <summary>The form.</summary>
    internal static MapForm<SpecificationIdentity> Form { get; } = new(
        "the specification's identity", [Number, Revision, Title, Customer, PreparedBy, Date, Changes],
        v => new SpecificationIdentity(
            v.Of(Number), v.Of(Revision), v.Of(Title), v.Of(Customer), v.Of(PreparedBy), v.Of(Date), v.Of(Changes)));
}
