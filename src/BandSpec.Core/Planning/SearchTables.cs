using BandSpec.Core.Numerics;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Planning;

/// <summary>
/// What a search needs of an application, worked out once. The covariances come in factored form: with <c>Σ_w = L_w L_wᵀ</c> and
/// <c>Σ_l = L_l L_lᵀ</c> the rows of <c>L_wᵀ</c>, of <c>L_lᵀ</c> and of <c>āᵀ</c> stand below each other, so that one linear map of what is
/// left over gives the spread within a lot, the spread of the lots and the mean.
/// </summary>
internal sealed class SearchTables
{
    private readonly RawError raw;

    public SearchTables(Application application)
    {
        (Platform platform, Station station) = (application.Platform, application.Station);
        Application = application;
        Families = new PlanFamilies(application);
        raw = new RawError(platform);
        double[][] within = SemidefiniteFactor.RowsOf(raw.Within), lots = SemidefiniteFactor.RowsOf(raw.Lots);
        Rows = [.. within, .. lots, raw.Mean];
        (WithinRows, LotRows) = (within.Length, lots.Length);

        double noise = ReadingNoise.VarianceOf(platform, station);
        Reference = PointsOf(station.PressurePoints.Reference, noise, station);
        Others = PointsOf(station.PressurePoints.Others, noise, station);
        Taus = [.. Families.Candidates.Select(raw.Reduced)];
    }

    /// <summary>The application.</summary>
    public Application Application { get; }

    /// <summary>The candidate plans.</summary>
    public PlanFamilies Families { get; }

    /// <summary>The rows <c>L_wᵀ</c>, <c>L_lᵀ</c>, <c>āᵀ</c>, each as long as the raw error has coefficients.</summary>
    public double[][] Rows { get; }

    /// <summary>How many of <see cref="Rows"/> belong to the spread within a lot; they come first.</summary>
    public int WithinRows { get; }

    /// <summary>How many of <see cref="Rows"/> belong to the spread of the lots; they follow.</summary>
    public int LotRows { get; }

    /// <summary>The points at the temperature nearest the reference temperature, by candidate, then pressure.</summary>
    public ReadingPoint[][] Reference { get; }

    /// <summary>The points at the other temperatures, by candidate, then pressure.</summary>
    public ReadingPoint[][] Others { get; }

    /// <summary>Reduced temperature of each candidate.</summary>
    public double[] Taus { get; }

    /// <summary>Reduced temperature.</summary>
    public double Reduced(Temperature temperature) => raw.Reduced(temperature);

    /// <summary>
    /// What a row of <see cref="Rows"/> makes of one pressure shape of the raw error at a reduced temperature: <c>Σ_k row_jk τ^k</c>.
    /// </summary>
    public double RowAt(int row, PressureShape shape, double tau)
    {
        double sum = 0;
        for (int k = 0; k < raw.Names.Length; k++)
            if (raw.Names[k].Shape == shape)
                sum += Rows[row][k] * Powers.Of(tau, raw.Names[k].Degree);
        return sum;
    }

    /// <summary>The plan of a list of candidates.</summary>
    public CompensationPlan PlanOf(IEnumerable<int> list, int zeroDegree, int spanDegree) => CompensationPlan.Of(
        [.. list.Select(i => Families.Candidates[i])], zeroDegree, spanDegree,
        Application.Requirement.Temperature.Reference, Application.Station.PressurePoints);

    private ReadingPoint[][] PointsOf(IReadOnlyList<double> fractions, double noise, Station station) =>
    [
        .. Families.Candidates.Select(t => fractions.Select(x => PointAt(x, raw.Reduced(t), noise, station)).ToArray()),
    ];

    private ReadingPoint PointAt(double x, double tau, double noise, Station station)
    {
        double[] basis = raw.Basis(x, tau);
        double soak = Correction.SoakVariance(raw, station, x, tau);
        return new ReadingPoint(x, [.. Rows.Select(r => Vectors.Dot(r, basis))], Math.Sqrt(noise + soak));
    }
}

/// <summary>One place where a plan may read: its pressure, what the rows make of the raw error there, and the reading's noise.</summary>
/// <param name="Fraction">Pressure fraction.</param>
/// <param name="Rows">The rows of <see cref="SearchTables"/> times <c>b(x,T)</c>.</param>
/// <param name="Noise">Standard deviation of a reading, settling of the temperature included, %FS.</param>
internal sealed record ReadingPoint(double Fraction, double[] Rows, double Noise);
