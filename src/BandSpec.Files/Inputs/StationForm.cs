using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The form of a station file.</summary>
internal static class StationForm
{
    private static readonly Key<string> Name = new("name", new TextForm("a name"), "Name of the line.");
    private static readonly MapForm<string> NameForm = new("the line's name", [Name], v => v.Of(Name));
    private static readonly Key<string> Line = new("station", NameForm, "The production line.");

    private static readonly Key<PercentOfSpan> Zero = new(
        "zero", QuantityForms.Error, "Standard uncertainty that does not depend on pressure.");
    private static readonly Key<PercentOfSpan> Proportional = new(
        "proportional", QuantityForms.Error, "Standard uncertainty in proportion to the pressure fraction, at the upper range value.");
    private static readonly MapForm<StandardUncertainty> StandardForm = new(
        "the pressure standard", [Zero, Proportional], v => new StandardUncertainty(v.Of(Zero), v.Of(Proportional)));
    private static readonly Key<StandardUncertainty> Standard = new(
        "pressure-standard", StandardForm, "The pressure standard, common to all readings of a run.");

    private static readonly Key<PercentOfSpan> ReadingNoise = new(
        "reading-noise", QuantityForms.Error, "Standard deviation of one reading that comes from the station.");
    private static readonly Key<int> ReadingsAveraged = new(
        "readings-averaged", new CountForm(AcceptedRanges.ReadingsAveraged), "Readings averaged at a point.");
    private static readonly Key<TemperatureDifference> SoakGradient = new(
        "soak-gradient", QuantityForms.Difference, "Standard uncertainty of the unit's temperature at the end of the soak.");

    private static readonly ListForm<double> Fractions = new("pressure fractions", new NumberForm(AcceptedRanges.PressureFraction), 1, 50);
    private static readonly Key<IReadOnlyList<double>> Reference = new(
        "reference", Fractions, "At the temperature nearest the reference temperature.");
    private static readonly Key<IReadOnlyList<double>> Others = new("others", Fractions, "At the other temperatures.");
    private static readonly MapForm<PressureLists> ListsForm = new(
        "pressure fractions", [Reference, Others], v => new PressureLists(v.Of(Reference), v.Of(Others)));
    private static readonly Key<PressureLists> PressurePoints = new(
        "pressure-points", ListsForm, "Pressure fractions read for compensation.");
    private static readonly Key<PressureLists> TestPoints = new(
        "test-points", ListsForm, "Pressure fractions read in the verification test.");

    private static readonly Key<Chamber> Chamber = new("chamber", ChamberForm.Form, "The chamber: times and costs of a run.");
    private static readonly Key<Money> RejectCost = new("reject-cost", ChamberForm.Sum, "What one rejected unit costs.");

    /// <summary>The form.</summary>
    internal static MapForm<StationParts> Form { get; } = new(
        "a station",
        [Line, Standard, ReadingNoise, ReadingsAveraged, SoakGradient, PressurePoints, TestPoints, Chamber, RejectCost],
        v => new StationParts
        {
            Name = v.Find(Line), StandardZero = v.Find(Standard)?.Zero, StandardProportional = v.Find(Standard)?.Proportional,
            ReadingNoise = v.FindValue(ReadingNoise), ReadingsAveraged = v.FindValue(ReadingsAveraged), SoakGradient = v.FindValue(SoakGradient),
            PressurePoints = v.Find(PressurePoints), TestPoints = v.Find(TestPoints), Chamber = v.Find(Chamber), RejectCost = v.Find(RejectCost),
        },
        isLenient: true);

    /// <summary>The station whose parts were all read.</summary>
    internal static Station Whole(StationParts parts) => new()
    {
        Name = parts.Name!, StandardZero = parts.StandardZero!.Value, StandardProportional = parts.StandardProportional!.Value,
        ReadingNoise = parts.ReadingNoise!.Value, ReadingsAveraged = parts.ReadingsAveraged!.Value, SoakGradient = parts.SoakGradient!.Value,
        PressurePoints = parts.PressurePoints!, TestPoints = parts.TestPoints!, Chamber = parts.Chamber!, RejectCost = parts.RejectCost!,
    };
}

/// <summary>Standard uncertainties of a pressure standard.</summary>
internal sealed record StandardUncertainty(PercentOfSpan Zero, PercentOfSpan Proportional);
