using System.Globalization;

namespace BandSpec.Core.Requirements;

/// <summary>
/// The numbers that make sense for a field: wide enough for anything built today, narrow enough to stop a slipped decimal point. Both ends are
/// accepted unless <see cref="IsAbove"/> excludes the lower.
/// </summary>
/// <param name="Least">The smallest number accepted, or what every accepted number is above.</param>
/// <param name="Most">The largest number accepted.</param>
/// <param name="Unit">The unit of both as it is written in files, empty for plain numbers.</param>
public sealed record AcceptedRange(double Least, double Most, string Unit)
{
    /// <summary>Whether <see cref="Least"/> itself is not accepted.</summary>
    public bool IsAbove { get; init; }

    /// <summary>Whether a number is accepted; never true of NaN.</summary>
    public bool Holds(double number) => number <= Most && (IsAbove ? number > Least : number >= Least);

    /// <summary>The range in words: <c>0.01 %FS to 50 %FS</c>, <c>above 0 K, at most 50 K</c>.</summary>
    public override string ToString() => IsAbove ? $"above {Written(Least)}, at most {Written(Most)}" : $"{Written(Least)} to {Written(Most)}";

    private string Written(double number) => string.Create(CultureInfo.InvariantCulture, $"{number} {Unit}").TrimEnd();
}
