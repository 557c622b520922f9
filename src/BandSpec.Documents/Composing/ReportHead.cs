using BandSpec.Documents.Model;

namespace BandSpec.Documents.Composing;

/// <summary>What identifies a report: the family, the files it rests on, the day.</summary>
internal sealed record ReportHead(string Family, IReadOnlyList<string> Files, DateOnly Date, string Program)
{
    public IReadOnlyList<Fact> Identity =>
        [new("Readings", string.Join(", ", Files)), new("Date", Date.ToString("yyyy-MM-dd", null)), new("Program", Program)];

    public Frame Frame(string subject) => new(
        $"{Family}: {subject}", Program, subject, "en", Date, Family, subject, Program, "{page} of {pages}", "continued", new Stamp(Standing.Plain, "", ""));
}
