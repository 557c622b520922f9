namespace BandSpec.Documents.Pdf;

/// <summary>The structure types of tagged PDF that are used here, by their names in the standard (ISO 32000-1, 14.8.4).</summary>
internal enum TagKind
{
    H1,
    H2,
    H3,
    H4,
    P,
    Div,
    Caption,
    Table,
    THead,
    TBody,
    TR,
    TH,
    TD,
    L,
    LI,
    Lbl,
    LBody,
    Figure,
}

internal enum HeaderScope
{
    None,
    Column,
    Row,
}

/// <summary>A node of the structure a reading program walks through. Marks on paper name the node they belong to.</summary>
internal sealed class Tag(TagKind kind, Tag? parent = null)
{
    public TagKind Kind { get; } = kind;

    public Tag? Parent { get; } = parent;

    /// <summary>What a heading cell heads.</summary>
    public HeaderScope Scope { get; init; }

    /// <summary>How many columns a cell spans.</summary>
    public int Columns { get; init; } = 1;

    /// <summary>Words in place of a picture.</summary>
    public string Alternative { get; init; } = "";

    public Tag Child(TagKind kind) => new(kind, this);

    /// <summary>From the outermost node down to this one.</summary>
    public IReadOnlyList<Tag> Path()
    {
        var path = new List<Tag>();
        for (var tag = this; tag is not null; tag = tag.Parent) path.Insert(0, tag);
        return path;
    }
}
