using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The form of a platform file.</summary>
internal static class PlatformForm
{
    private static readonly Key<string> Name = new("name", new TextForm("a name"), "Name of the sensor family.");
    private static readonly Key<string> Revision = new("revision", new TextForm("a revision"), "Revision of its statistics.");
    private static readonly MapForm<FamilyName> NameForm = new(
        "the family's name", [Name, Revision], v => new FamilyName(v.Of(Name), v.Of(Revision)));
    private static readonly Key<FamilyName> Family = new("platform", NameForm, "The sensor family.");

    private static readonly Key<Temperature> Lower = new(
        "lower", QuantityForms.Temperature, "Coldest temperature for which the statistics hold.");
    private static readonly Key<Temperature> Upper = new(
        "upper", QuantityForms.Temperature, "Hottest temperature for which the statistics hold.");
    private static readonly Key<Temperature> Reference = new(
        "reference", QuantityForms.Temperature, "Temperature from which reduced temperature is counted.");
    private static readonly MapForm<OperatingTemperature> RangeForm = new(
        "the rated temperatures", [Lower, Upper, Reference], v => new OperatingTemperature(v.Of(Lower), v.Of(Upper), v.Of(Reference)));
    private static readonly Key<OperatingTemperature> Range = new("temperature", RangeForm, "Rated temperatures.");

    private static readonly Key<Pressure> SmallestSpan = new(
        "smallest-span", QuantityForms.Pressure, "Smallest span that a unit may be calibrated to.");
    private static readonly Key<Pressure> LargestUpper = new("largest-upper", QuantityForms.Pressure, "Largest upper range value.");
    private static readonly Key<double> ProofFactor = new(
        "proof-factor", new NumberForm(AcceptedRanges.PressureFactor), "Proof pressure as a multiple of the upper range value.");
    private static readonly Key<double> BurstFactor = new(
        "burst-factor", new NumberForm(AcceptedRanges.PressureFactor), "Burst pressure as a multiple of the upper range value.");
    private static readonly MapForm<PressureRating> RatingForm = new(
        "the rated pressures", [SmallestSpan, LargestUpper, ProofFactor, BurstFactor],
        v => new PressureRating(v.Of(SmallestSpan), v.Of(LargestUpper), v.Of(ProofFactor), v.Of(BurstFactor)));
    private static readonly Key<PressureRating> Rating = new("pressure", RatingForm, "Rated pressures.");

    private static readonly Key<RawError> Raw = new(
        "raw-error", RawErrorForm.Form, 
        "Error before compensation: coefficients, in %FS, of pressure shapes times powers of (T - reference)/100 K.");

    private static readonly Key<int> ZeroDegree = new(
        "zero-degree", new CountForm(AcceptedRanges.CorrectionDegree), "Highest degree in temperature of the zero correction.");
    private static readonly Key<int> SpanDegree = new(
        "span-degree", new CountForm(AcceptedRanges.CorrectionDegree), "Highest degree in temperature of the span correction.");
    private static readonly MapForm<CorrectionDegrees> CorrectionForm = new(
        "the stored correction", [ZeroDegree, SpanDegree], v => new CorrectionDegrees(v.Of(ZeroDegree), v.Of(SpanDegree)));
    private static readonly Key<CorrectionDegrees> Correction = new("correction", CorrectionForm, "What the stored correction can do.");

    private static readonly Key<Spread> PressureHysteresis = new(
        "pressure-hysteresis", AgeingForm.Spread, "Pressure hysteresis, full width.");
    private static readonly Key<Spread> ThermalHysteresis = new("thermal-hysteresis", AgeingForm.Spread, "Thermal hysteresis, half width.");
    private static readonly Key<PercentOfSpan> Repeatability = new(
        "repeatability", QuantityForms.Error, "Standard deviation of a reading repeated under the same conditions.");
    private static readonly Key<Ageing> Ageing = new("ageing", AgeingForm.Form, "Drift with time and temperature.");
    private static readonly Key<PlatformSample> Sample = Key.Optional<PlatformSample>(
        "sample", SampleForm.Form, "What the statistics rest on; without it they are taken as exact.");

    /// <summary>The form.</summary>
    internal static MapForm<PlatformParts> Form { get; } = new(
        "a platform", [Family, Range, Rating, Raw, Correction, PressureHysteresis, ThermalHysteresis, Repeatability, Ageing, Sample],
        v => new PlatformParts
        {
            Name = v.Find(Family)?.Name, Revision = v.Find(Family)?.Revision, Temperature = v.Find(Range), Pressure = v.Find(Rating),
            RawError = v.Find(Raw)?.Coefficients, Correlations = v.Find(Raw)?.Correlations,
            ZeroDegree = v.Find(Correction)?.Zero, SpanDegree = v.Find(Correction)?.Span,
            PressureHysteresis = v.Find(PressureHysteresis), ThermalHysteresis = v.Find(ThermalHysteresis),
            Repeatability = v.FindValue(Repeatability), Ageing = v.Find(Ageing), Sample = v.Find(Sample),
        },
        isLenient: true);

    /// <summary>The platform whose parts were all read.</summary>
    internal static Platform Whole(PlatformParts parts) => new()
    {
        Name = parts.Name!, Revision = parts.Revision!, Temperature = parts.Temperature!, Pressure = parts.Pressure!,
        RawError = parts.RawError!, Correlations = parts.Correlations!, ZeroDegree = parts.ZeroDegree!.Value, SpanDegree = parts.SpanDegree!.Value,
        PressureHysteresis = parts.PressureHysteresis!, ThermalHysteresis = parts.ThermalHysteresis!,
        Repeatability = parts.Repeatability!.Value, Ageing = parts.Ageing!, Sample = parts.Sample,
    };
}

/// <summary>A family's name and the revision of its statistics.</summary>
internal sealed record FamilyName(string Name, string Revision);

/// <summary>The highest degrees of the stored correction.</summary>
internal sealed record CorrectionDegrees(int Zero, int Span);
