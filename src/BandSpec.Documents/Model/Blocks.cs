using BandSpec.Documents.Charts;

namespace BandSpec.Documents.Model;

/// <summary>One thing after another down the document. The blocks are all that a writer knows.</summary>
internal abstract record Block;

/// <summary>Opens the document: what kind it is, what it is called, and the facts that identify it.</summary>
internal sealed record TitleBlock(Phrase Kind, Phrase Title, Phrase Subtitle, IReadOnlyList<Fact> Identity) : Block;

/// <summary>A heading of level 1 to 3; the number is set before it and may be empty.</summary>
internal sealed record Heading(int Level, string Number, Phrase Text) : Block;

internal enum Voice
{
    Body,

    /// <summary>The one sentence a reader must not miss.</summary>
    Lead,

    /// <summary>Small print: sources, remarks to a table.</summary>
    Fine,
}

internal sealed record Paragraph(Phrase Text, Voice Voice = Voice.Body) : Block;

internal sealed record Bullets(IReadOnlyList<Phrase> Items, bool Numbered = false) : Block;

internal enum Tone
{
    Note,
    Caution,
    Assurance,
    Refusal,
}

/// <summary>A box that stands out from the text; its tone is told by words and shape, colour only helps.</summary>
internal sealed record Callout(Tone Tone, Phrase Title, IReadOnlyList<Phrase> Paragraphs) : Block;

internal readonly record struct Fact(Phrase Name, Phrase Value);

/// <summary>Names with their values, set in one or more columns.</summary>
internal sealed record Facts(IReadOnlyList<Fact> Items, int Columns = 1) : Block;

/// <summary>One figure of a headline: what it is, the figure with its unit, and a word of explanation.</summary>
internal readonly record struct KeyFigure(Phrase Name, Phrase Value, Phrase Remark);

/// <summary>The few figures that sum the document up, side by side.</summary>
internal sealed record Headline(IReadOnlyList<KeyFigure> Figures) : Block;

/// <summary>A chart with its label ("Figure 2"), its caption, and words for those who cannot see it; the file is its SVG.</summary>
internal sealed record Figure(string Label, Phrase Caption, string Alternative, Chart Chart, string FileName) : Block;

internal sealed record PageBreak : Block;
