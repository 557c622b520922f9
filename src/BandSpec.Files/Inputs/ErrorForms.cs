using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The forms of allowed errors, held terms and further terms in a requirement.</summary>
internal static class ErrorForms
{
    private static readonly Key<Temperature> From = new("from", QuantityForms.Temperature, "Colder end of the region.");
    private static readonly Key<Temperature> To = new("to", QuantityForms.Temperature, "Hotter end of the region.");
    private static readonly Key<PercentOfSpan> Limit = new(
        "limit", QuantityForms.Error, "Allowed error, at the colder end when limit-at-end is given.");
    private static readonly Key<PercentOfSpan> LimitAtEnd = Key.Optional<PercentOfSpan>(
        "limit-at-end", QuantityForms.Error, "Allowed error at the hotter end; between the ends it runs linearly.");

    private static readonly Key<Ratio> OfReading = Key.Optional<Ratio>(
        "of-reading", QuantityForms.Percentage, "Percent of the reading that is allowed where it is more than the limit.");

    private static readonly MapForm<AllowedErrorRegion> Region = new(
        "an allowed error", [From, To, Limit, LimitAtEnd, OfReading],
        v => new AllowedErrorRegion(
            v.Of(From), v.Of(To), v.Of(Limit), v.Has(LimitAtEnd) ? v.Of(LimitAtEnd) : null, v.Has(OfReading) ? v.Of(OfReading).Value : 0));

    private static readonly Key<string> Name = new("name", new TextForm("a name"), "Name of the error source.");
    private static readonly Key<PercentOfSpan> Bound = new("bound", QuantityForms.Error, "Magnitude that adds to the band.");
    private static readonly Key<PercentOfSpan> Sigma = new("sigma", QuantityForms.Error, "Standard deviation.");

    private static readonly Key<FurtherTermShape> Shape = new(
        "shape", new ChoiceForm<FurtherTermShape>(("constant", FurtherTermShape.Constant), ("proportional", FurtherTermShape.Proportional)),
        "How both depend on pressure.");

    private static readonly MapForm<FurtherTerm> Further = new(
        "an error source", [Name, Bound, Sigma, Shape], v => new FurtherTerm(v.Of(Name), v.Of(Bound), v.Of(Sigma), v.Of(Shape)));

    /// <summary>The form of <c>allowed-error</c>.</summary>
    internal static ListForm<AllowedErrorRegion> Regions { get; } = new("allowed errors by temperature region, cold to hot", Region, 1, 40);

    /// <summary>The form of <c>held-terms</c>.</summary>
    internal static FreeMapForm<PercentOfSpan, HeldTerm> Held { get; } = new(
        "names of error terms and their limits", QuantityForms.Error, (term, limit) => new HeldTerm(term, limit));

    /// <summary>The form of <c>further-terms</c>.</summary>
    internal static ListForm<FurtherTerm> FurtherTerms { get; } = new("error sources outside the platform", Further, 0, 20);
}
