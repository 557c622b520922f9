using System.Globalization;

namespace BandSpec.Core.Revisions;

/// <summary>What a figure of a specification belongs to: one of the three inputs, or one part of what was found.</summary>
public enum FigureSubject
{
    /// <summary>A field of the requirement.</summary>
    Requirement,

    /// <summary>A field of the platform.</summary>
    Platform,

    /// <summary>A field of the station.</summary>
    Station,

    /// <summary>Allowed error and band, by temperature.</summary>
    Band,

    /// <summary>Margins and what a unit does over the profile.</summary>
    Margin,

    /// <summary>The compensation plan and what it costs.</summary>
    Plan,

    /// <summary>What each term was given of the allowed error.</summary>
    Allocation,

    /// <summary>Limits of derived figures.</summary>
    DerivedLimits,

    /// <summary>Acceptance limits and tolerances of the verification test.</summary>
    Verification,
}

/// <summary>
/// One figure of a specification as it is compared with that of another: what it is, where it holds, and its value. Two figures are of the
/// same thing when subject, name and place are equal; unlike a value in a file it has no position of its own.
/// </summary>
public sealed record Figure
{
    private Figure(FigureSubject subject, string name, string place, string text) => (Subject, Name, Place, Text) = (subject, name, place, text);

    /// <summary>What it belongs to.</summary>
    public FigureSubject Subject { get; }

    /// <summary>Its name: the path of an input's field, otherwise words such as <c>stated band</c>.</summary>
    public string Name { get; }

    /// <summary>Where it holds: a temperature range, a test point, a term; empty when there is only one.</summary>
    public string Place { get; }

    /// <summary>The value with its unit, to the last digit.</summary>
    public string Text { get; }

    /// <summary>The value in <see cref="Unit"/>; <see langword="null"/> when it is not a number.</summary>
    public double? Number { get; private init; }

    /// <summary>The unit of <see cref="Number"/>; empty for a plain number.</summary>
    public string Unit { get; private init; } = "";

    /// <summary>How much room the figure leaves each side.</summary>
    public Leeway Leeway { get; private init; }

    /// <summary>A figure that is a word or a list.</summary>
    internal static Figure OfText(FigureSubject subject, string name, string place, string text) => new(subject, name, place, text);

    /// <summary>A figure that is a number.</summary>
    internal static Figure OfNumber(FigureSubject subject, string name, string place, double number, string unit, Leeway leeway) =>
        new(subject, name, place, string.Create(CultureInfo.InvariantCulture, $"{number} {unit}").TrimEnd())
        {
            Number = number,
            Unit = unit,
            Leeway = leeway,
        };

    /// <summary>
    /// Whether both have the same value. Numbers closer than <see cref="Same"/>, relative, are the same: the order in which a sum was taken is
    /// no change. Of what was found, numbers below <see cref="Nothing"/> are the same: what a fit leaves of a term that it follows is rounding.
    /// </summary>
    internal bool HasTheSameValue(Figure other) => Number is { } mine && other.Number is { } theirs && Unit == other.Unit
        ? AreSame(mine, theirs) || (Subject > FigureSubject.Station && Math.Abs(mine) < Nothing && Math.Abs(theirs) < Nothing)
        : Text == other.Text;

    /// <summary>No error in %FS, no probability and no part of a span is ever told from zero at this size.</summary>
    internal const double Nothing = 1e-12;

    /// <summary>Relative difference of numbers that count as the same.</summary>
    internal const double Same = 1e-9;

    /// <summary>Whether two numbers are the same but for rounding; a number is the same as itself, infinity too.</summary>
    internal static bool AreSame(double a, double b) => a.Equals(b) || Math.Abs(a - b) <= Same * Math.Max(Math.Abs(a), Math.Abs(b));
}
