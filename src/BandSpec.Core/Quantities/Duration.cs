using System.Globalization;

namespace BandSpec.Core.Quantities;

/// <summary>
/// A length of time as dwell, test or chamber time: never negative, unlike <see cref="TimeSpan"/>, and not limited to its 29,000 years.
/// A year counts 8760 h. The default value is no time at all.
/// </summary>
public readonly record struct Duration : IComparable<Duration>
{
    private Duration(double hours) => Hours = hours;

    /// <summary>The time in hours.</summary>
    public double Hours { get; }

    /// <summary>The time in minutes.</summary>
    public double Minutes => Hours * 60;

    /// <summary>A duration from hours.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The number is negative or not finite.</exception>
    public static Duration FromHours(double hours) =>
        double.IsFinite(hours) && hours >= 0
            ? new Duration(hours)
            : throw new ArgumentOutOfRangeException(nameof(hours), hours, "a duration is finite and not negative");

    /// <summary>A duration from minutes.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The number is negative or not finite.</exception>
    public static Duration FromMinutes(double minutes) => FromHours(minutes / 60);

    /// <inheritdoc/>
    public int CompareTo(Duration other) => Hours.CompareTo(other.Hours);

    /// <summary>The time both take one after the other.</summary>
    public static Duration operator +(Duration a, Duration b) => FromHours(a.Hours + b.Hours);

    /// <summary>Shorter than.</summary>
    public static bool operator <(Duration a, Duration b) => a.Hours < b.Hours;

    /// <summary>Longer than.</summary>
    public static bool operator >(Duration a, Duration b) => a.Hours > b.Hours;

    /// <summary>Shorter than or equal to.</summary>
    public static bool operator <=(Duration a, Duration b) => a.Hours <= b.Hours;

    /// <summary>Longer than or equal to.</summary>
    public static bool operator >=(Duration a, Duration b) => a.Hours >= b.Hours;

    /// <summary>The hours with their unit in the invariant culture: <c>1500 h</c>.</summary>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{Hours} h");
}
