namespace BandSpec.Core.Numerics;

/// <summary>
/// A closed interval of the real line; either end may be infinite. It is <see cref="IsEmpty">empty</see> when the lower end lies
/// above the upper one, which is how an acceptance interval looks that its guard bands have eaten. The default is the single point 0.
/// </summary>
/// <param name="Lower">The smallest value inside, or negative infinity.</param>
/// <param name="Upper">The largest value inside, or positive infinity.</param>
internal readonly record struct Interval(double Lower, double Upper)
{
    /// <summary>The interval from minus to plus <paramref name="halfWidth"/>.</summary>
    public static Interval Symmetric(double halfWidth) => new(-halfWidth, halfWidth);

    /// <summary>Whether no value lies inside.</summary>
    public bool IsEmpty => !(Lower <= Upper);

    /// <summary>Upper minus lower end; negative when empty, infinite when an end is.</summary>
    public double Width => Upper - Lower;

    /// <summary>Everything up to the lower end.</summary>
    public Interval Below => new(double.NegativeInfinity, Lower);

    /// <summary>Everything from the upper end on.</summary>
    public Interval Above => new(Upper, double.PositiveInfinity);

    /// <summary>Whether <paramref name="value"/> lies inside or on an end.</summary>
    public bool Contains(double value) => value >= Lower && value <= Upper;

    /// <summary>The values common to both; empty when there are none.</summary>
    public Interval Intersect(Interval other) => new(Math.Max(Lower, other.Lower), Math.Min(Upper, other.Upper));

    /// <summary>Both ends moved inward by <paramref name="distance"/>; outward when it is negative.</summary>
    public Interval Inset(double distance) => new(Lower + distance, Upper - distance);

    /// <summary>The image under <c>z = (value − origin)/scale</c>, for a positive scale.</summary>
    public Interval Standardize(double origin, double scale) => new((Lower - origin) / scale, (Upper - origin) / scale);
}
