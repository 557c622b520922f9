using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Planning;

/// <summary>What a search needs of an application, worked out once and never changed.</summary>
internal sealed class SearchTables
{
    private readonly OperatingTemperature range;
    private readonly TemperatureScale scale;
    private readonly Dictionary<CorrectionForm, LeftoverRows> rowsOf;

    public SearchTables(Application application)
    {
        (Platform platform, Station station) = (application.Platform, application.Station);
        Application = application;
        Families = new PlanFamilies(application);
        range = application.Requirement.Temperature;
        Raw = new RawError(platform);
        scale = new TemperatureScale(range, Raw);
        Reference = [.. station.PressurePoints.Reference.Select(ReadingPressure.At)];
        Others = [.. station.PressurePoints.Others.Select(ReadingPressure.At)];
        Candidates = [.. Families.Candidates.Select(t => CandidateOf(t, platform, station))];
        IEnumerable<CorrectionForm> forms = Families.All.SelectMany(f => Families.DegreesOf[f.Count]).Distinct()
            .Select(d => CorrectionForm.For(station, d.Zero, d.Span));
        rowsOf = forms.Select((f, i) => new LeftoverRows(i, f, Raw)).ToDictionary(r => r.Form);
    }

    /// <summary>The application.</summary>
    public Application Application { get; }

    /// <summary>The candidate plans.</summary>
    public PlanFamilies Families { get; }

    /// <summary>The raw error.</summary>
    public RawError Raw { get; }

    /// <summary>The pressures read at the temperature nearest the reference temperature.</summary>
    public ReadingPressure[] Reference { get; }

    /// <summary>The pressures read at the other temperatures.</summary>
    public ReadingPressure[] Others { get; }

    /// <summary>The candidate temperatures, rising.</summary>
    public CandidateReadings[] Candidates { get; }

    /// <summary>The forms of all candidate plans, each with what it cannot follow.</summary>
    public IEnumerable<LeftoverRows> Forms => rowsOf.Values;

    /// <summary>What the form with these degrees cannot follow.</summary>
    public LeftoverRows RowsOf(int zeroDegree, int spanDegree) => rowsOf[CorrectionForm.For(Application.Station, zeroDegree, spanDegree)];

    /// <summary>The place of a temperature in the two scales.</summary>
    public ScaledTemperature PlaceOf(Temperature temperature) => new(scale.Scaled(temperature), Raw.Reduced(temperature));

    /// <summary>The place in a list that is nearest the requirement's reference temperature, the colder one on a tie.</summary>
    public int NearestIn(ReadOnlySpan<int> list)
    {
        int nearest = 0;
        for (int i = 1; i < list.Length; i++)
            if (Candidates[list[i]].Distance < Candidates[list[nearest]].Distance)
                nearest = i;
        return nearest;
    }

    /// <summary>The plan of a list of candidates.</summary>
    public CompensationPlan PlanOf(IEnumerable<int> list, int zeroDegree, int spanDegree) => CompensationPlan.Of(
        [.. list.Select(i => Families.Candidates[i])], zeroDegree, spanDegree,
        Application.Requirement.Temperature.Reference, Application.Station.PressurePoints);

    /// <summary>The plan of a contender.</summary>
    public CompensationPlan PlanOf(Contender contender) => PlanOf(contender.List, contender.Zero, contender.Span);

    private CandidateReadings CandidateOf(Temperature temperature, Platform platform, Station station)
    {
        ScaledTemperature place = PlaceOf(temperature);
        double noise = ReadingNoise.VarianceOf(platform, station);
        double Sigma(ReadingPressure p) => Math.Sqrt(noise + Correction.SoakVariance(Raw, station, p.Fraction, place.Tau));
        double distance = Math.Abs((temperature - range.Reference).Kelvin);
        return new CandidateReadings(place, distance, [.. Reference.Select(Sigma)], [.. Others.Select(Sigma)]);
    }
}

/// <summary>A temperature in the scale of the fit and in that of the raw error.</summary>
/// <param name="Scaled">
/// The operating range mapped to −1 … 1: corrections are fitted in powers of this number, which are far less alike than those of <c>τ</c>.
/// The fit is the same, only its rounding is smaller.
/// </param>
/// <param name="Tau">Reduced temperature <c>τ</c>.</param>
internal readonly record struct ScaledTemperature(double Scaled, double Tau);

/// <summary>One pressure of a reading list.</summary>
/// <param name="Fraction">Pressure fraction, the value of <c>ψ1</c>.</param>
/// <param name="Bow">Value of <c>ψ2</c>.</param>
/// <param name="SShape">Value of <c>ψ3</c>.</param>
internal readonly record struct ReadingPressure(double Fraction, double Bow, double SShape)
{
    /// <summary>The pressure of a fraction.</summary>
    public static ReadingPressure At(double x) => new(x, PressureShapes.At(PressureShape.Bow, x), PressureShapes.At(PressureShape.SShape, x));
}

/// <summary>One candidate temperature: where it lies and how noisy a reading is there.</summary>
/// <param name="Place">Its place.</param>
/// <param name="Distance">How far from the requirement's reference temperature, K.</param>
/// <param name="ReferenceSigmas">Standard deviation of a reading at each pressure of the reference list, settling included, %FS.</param>
/// <param name="OtherSigmas">The same for the other list.</param>
internal sealed record CandidateReadings(ScaledTemperature Place, double Distance, double[] ReferenceSigmas, double[] OtherSigmas);
