namespace BandSpec.Core.Revisions;

/// <summary>
/// How much room a figure leaves to production and to the customer's error, each on a scale of its own that is larger the looser the figure
/// is; <see langword="null"/> where the figure alone says nothing about that side. Only its order counts, not its size or sign.
/// <para>
/// <b>Production</b> has more room when more of what it makes passes, when more scatter is allowed for, or when the work is less: a wider
/// acceptance interval, a larger limit, a larger margin, a cheaper chamber run.
/// </para>
/// <para>
/// <b>The customer</b> is promised less when there is more room for error: a larger allowed error, stated band or tolerance, or a smaller
/// margin that it is kept.
/// </para>
/// The default value says nothing about either side.
/// </summary>
/// <param name="Production">Room for production.</param>
/// <param name="Customer">Room for the error that the customer may see.</param>
public readonly record struct Leeway(double? Production, double? Customer)
{
    /// <summary>The figure says nothing about either side.</summary>
    internal static Leeway None(double number) => default;

    /// <summary>The larger the number, the looser for both.</summary>
    internal static Leeway ForBoth(double number) => new(number, number);

    /// <summary>The larger the number, the tighter for both.</summary>
    internal static Leeway LessForBoth(double number) => new(-number, -number);

    /// <summary>The larger the number, the looser for production; the customer's side is not told.</summary>
    internal static Leeway ForProduction(double number) => new(number, null);

    /// <summary>The larger the number, the tighter for production; the customer's side is not told.</summary>
    internal static Leeway LessForProduction(double number) => new(-number, null);

    /// <summary>The larger the number, the looser for the customer; production's side is not told.</summary>
    internal static Leeway ForCustomer(double number) => new(null, number);

    /// <summary>The larger the number, the more room for production and the surer the customer: a margin.</summary>
    internal static Leeway OfMargin(double number) => new(number, -number);
}
