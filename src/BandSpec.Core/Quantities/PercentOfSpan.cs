using System.Globalization;

namespace BandSpec.Core.Quantities;

/// <summary>
/// An error, limit or standard deviation in percent of the calibrated span, <c>%FS</c>: 100 % is upper minus lower range value.
/// Not percent of reading, which is a plain ratio. Range: finite, either sign. The default value is 0 %FS.
/// </summary>
public readonly record struct PercentOfSpan : IComparable<PercentOfSpan>
{
    private PercentOfSpan(double percent) => Percent = percent;

    /// <summary>The number in percent of span.</summary>
    public double Percent { get; }

    /// <summary>An error from percent of span.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The number is not finite.</exception>
    public static PercentOfSpan FromPercent(double percent) =>
        double.IsFinite(percent)
            ? new PercentOfSpan(percent)
            : throw new ArgumentOutOfRangeException(nameof(percent), percent, "an error in percent of span is finite");

    /// <inheritdoc/>
    public int CompareTo(PercentOfSpan other) => Percent.CompareTo(other.Percent);

    /// <summary>Smaller than.</summary>
    public static bool operator <(PercentOfSpan a, PercentOfSpan b) => a.Percent < b.Percent;

    /// <summary>Larger than.</summary>
    public static bool operator >(PercentOfSpan a, PercentOfSpan b) => a.Percent > b.Percent;

    /// <summary>Smaller than or equal to.</summary>
    public static bool operator <=(PercentOfSpan a, PercentOfSpan b) => a.Percent <= b.Percent;

    /// <summary>Larger than or equal to.</summary>
    public static bool operator >=(PercentOfSpan a, PercentOfSpan b) => a.Percent >= b.Percent;

    /// <summary>The number with its unit in the invariant culture: <c>1.6 %FS</c>.</summary>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{Percent} %FS");
}
