namespace BandSpec.Core.Requirements;

/// <summary>What a specification is called and who stands behind it; number and revision name its package.</summary>
/// <param name="Number">The document number, fit for a folder name: letters, digits, points, hyphens and underscores.</param>
/// <param name="Revision">The revision letter or number, fit for a folder name.</param>
/// <param name="Title">What the application is.</param>
/// <param name="Customer">For whom.</param>
/// <param name="PreparedBy">Who prepared it.</param>
/// <param name="Date">The date of this revision; the only date that a document shows.</param>
/// <param name="Changes">The revision history, newest last.</param>
public sealed record SpecificationIdentity(
    string Number, string Revision, string Title, string Customer, string PreparedBy, DateOnly Date, IReadOnlyList<RevisionNote> Changes)
{
    /// <summary>Number and revision in one word, <c>HV-3107-A</c>: the name of the package folder.</summary>
    public string FolderName => $"{Number}-{Revision}";
}

/// <summary>One line of the revision history.</summary>
/// <param name="Revision">The revision it describes.</param>
/// <param name="Date">When.</param>
/// <param name="Text">What changed.</param>
public sealed record RevisionNote(string Revision, DateOnly Date, string Text);
