using BandSpec.Files.Csv;

namespace BandSpec.Files.Readings;

/// <summary>A column that files of readings may have.</summary>
/// <param name="Name">Its usual name.</param>
/// <param name="DefaultUnit">The unit of its numbers when neither header nor cell has one; empty when one has to be given.</param>
/// <param name="Others">Other names that are understood.</param>
internal sealed record ReadingField(string Name, string DefaultUnit, params string[] Others)
{
    public static ReadingField Unit { get; } = new("unit", "", "serial", "serial-number");

    public static ReadingField Lot { get; } = new("lot", "", "batch");

    public static ReadingField Temperature { get; } = new("temperature", "°C", "temp");

    public static ReadingField Storage { get; } = new("storage", "°C", "storage-temperature");

    public static ReadingField Stored { get; } = new("stored", "h", "time", "storage-time");

    public static ReadingField Pressure { get; } = new("pressure", "", "applied-pressure");

    public static ReadingField PressureFraction { get; } = new("pressure-fraction", "");

    public static ReadingField Direction { get; } = new("direction", "");

    public static ReadingField Cycle { get; } = new("cycle", "");

    public static ReadingField Error { get; } = new("error", "%FS");

    public static ReadingField Reading { get; } = new("reading", "", "output");

    /// <summary>Whether a heading means this column.</summary>
    /// <param name="heading">The heading.</param>
    /// <param name="given">The name that the user gave for the column, if any.</param>
    public bool Matches(ColumnHeading heading, string? given) => given is not null
        ? string.Equals(heading.Name, given, StringComparison.OrdinalIgnoreCase)
        : heading.Key == Name || Others.Contains(heading.Key);

    /// <summary>The names in words, for a finding.</summary>
    public string Names => string.Join(" or ", Others.Prepend(Name).Select(name => $"`{name}`"));
}
