namespace BandSpec.Files.Csv;

/// <summary>The heading of a column of readings, such as <c>Applied pressure [bar]</c> or <c>reading (mV)</c>.</summary>
/// <param name="Name">What stands before the unit.</param>
/// <param name="Unit">The unit in brackets, round or square; empty when there is none.</param>
internal readonly record struct ColumnHeading(string Name, string Unit)
{
    /// <summary>The name as columns are told apart by: lower case, blanks and underscores as hyphens.</summary>
    public string Key => Name.ToLowerInvariant().Replace(' ', '-').Replace('_', '-');

    /// <summary>Reads a heading; one in quotes loses them.</summary>
    public static ColumnHeading Of(string text)
    {
        string plain = text.Trim().Trim('"').Trim();
        int open = plain.AsSpan().IndexOfAny('[', '(');
        return open <= 0
            ? new ColumnHeading(plain, "")
            : new ColumnHeading(plain[..open].Trim(), plain[(open + 1)..].TrimEnd(']', ')', ' ').Trim());
    }
}
