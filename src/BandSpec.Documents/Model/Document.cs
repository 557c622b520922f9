namespace BandSpec.Documents.Model;

/// <summary>How far a document binds; shown on every page.</summary>
internal enum Standing
{
    Plain,
    Draft,
    Refused,
    Released,
}

/// <summary>The mark of a document's standing: a word, and a sentence for the band it stands in (may be empty).</summary>
internal sealed record Stamp(Standing Standing, string Word, string Sentence);

/// <summary>What runs along every page and what identifies the file. <see cref="PageOf"/> holds <c>{page}</c> and <c>{pages}</c>.</summary>
internal sealed record Frame(
    string Title,
    string Author,
    string Subject,
    string Language,
    DateOnly Date,
    string Running,
    string RunningRight,
    string Footer,
    string PageOf,
    string Continued,
    Stamp Stamp);

internal sealed record Document(Frame Frame, IReadOnlyList<Block> Blocks);
