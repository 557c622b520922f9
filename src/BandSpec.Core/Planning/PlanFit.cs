using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Planning;

/// <summary>
/// The corrections of one batch of plans after another, in memory that is used again: nothing is allocated for a plan. A fit gives the
/// coefficients of the correction for each row of <see cref="LeftoverRows"/>, and the noise of the coefficients.
/// </summary>
internal sealed class PlanFit
{
    private const int Lanes = PlanBatch.Lanes;
    private readonly SearchTables tables;
    private readonly FittedPoint[] points;
    private readonly Vector512<double>[] sigmas;
    private readonly Vector512<double>[] scaledPowers;
    private readonly Vector512<double>[] tauPowers;
    private readonly Vector512<double>[] design;
    private readonly Vector512<double>[] triangle;
    private readonly Vector512<double>[] inverse;
    private readonly Vector512<double>[] coefficients;
    private readonly Vector512<double>[] seen;
    private readonly int powers;

    public PlanFit(SearchTables tables)
    {
        this.tables = tables;
        int temperatures = tables.Application.Requirement.Compensation.MostTemperatures;
        int most = tables.Reference.Length + (temperatures * tables.Others.Length);
        int columns = tables.Forms.Max(f => f.Form.Columns);
        powers = 1 + Math.Max(tables.Raw.Names.Max(n => n.Degree), tables.Forms.Max(f => Math.Max(f.Form.ZeroDegree, f.Form.SpanDegree)));
        points = new FittedPoint[most];
        sigmas = new Vector512<double>[most];
        seen = new Vector512<double>[most];
        scaledPowers = new Vector512<double>[temperatures * powers];
        tauPowers = new Vector512<double>[temperatures * powers];
        design = new Vector512<double>[most * columns];
        inverse = new Vector512<double>[most * columns];
        triangle = new Vector512<double>[columns * (columns + 1)];
        coefficients = new Vector512<double>[columns * tables.Forms.Max(f => f.Count)];
        Noise = new CoefficientNoise(powers, columns * most);
    }

    /// <summary>How many readings each plan has.</summary>
    public int Readings { get; private set; }

    /// <summary>What the form of the last fit cannot follow.</summary>
    public LeftoverRows Rows { get; private set; } = null!;

    /// <summary>The noise that the readings carry into the coefficients.</summary>
    public CoefficientNoise Noise { get; }

    /// <summary>The correction's coefficients for a row, in the order of the form.</summary>
    public ReadOnlySpan<Vector512<double>> Coefficients(int row) => coefficients.AsSpan(row * Rows.Form.Columns, Rows.Form.Columns);

    /// <summary>Takes up the readings of a batch; any number of forms can then be fitted to them.</summary>
    public void Load(PlanBatch batch)
    {
        Readings = 0;
        for (int place = 0; place < batch.Temperatures; place++)
        {
            FillPowers(batch, place);
            bool isReference = place == batch.Nearest;
            ReadingPressure[] pressures = isReference ? tables.Reference : tables.Others;
            for (int i = 0; i < pressures.Length; i++)
            {
                points[Readings] = new FittedPoint(place, pressures[i]);
                sigmas[Readings++] = SigmasOf(batch, place, isReference, i);
            }
        }
    }

    /// <summary>Fits a form to the readings taken up.</summary>
    /// <returns>All bits set in the lanes whose readings determine all coefficients.</returns>
    public Vector512<double> To(LeftoverRows rows)
    {
        Rows = rows;
        if (rows.Form.Columns > Readings)
            return Vector512<double>.Zero;
        FillDesign(rows.Form);
        Vector512<double> determined = LanewiseLeastSquares.PseudoInverse(design, Readings, rows.Form.Columns, triangle, inverse);
        for (int row = 0; row < rows.Count; row++)
            FillCoefficients(row);
        Noise.Fill(rows.Form, inverse, sigmas, Readings);
        return determined;
    }

    private void FillPowers(PlanBatch batch, int place)
    {
        Span<double> scaled = stackalloc double[Lanes], tau = stackalloc double[Lanes];
        for (int lane = 0; lane < Lanes; lane++)
            (scaled[lane], tau[lane]) = tables.Candidates[batch[lane][place]].Place;
        Vector512<double> s = Vector512.Create<double>(scaled), t = Vector512.Create<double>(tau);
        Span<Vector512<double>> ofScaled = scaledPowers.AsSpan(place * powers, powers), ofTau = tauPowers.AsSpan(place * powers, powers);
        ofScaled[0] = ofTau[0] = Vector512<double>.One;
        for (int k = 1; k < powers; k++)
            (ofScaled[k], ofTau[k]) = (ofScaled[k - 1] * s, ofTau[k - 1] * t);
    }

    private Vector512<double> SigmasOf(PlanBatch batch, int place, bool isReference, int pressure)
    {
        Span<double> sigma = stackalloc double[Lanes];
        for (int lane = 0; lane < Lanes; lane++)
        {
            CandidateReadings candidate = tables.Candidates[batch[lane][place]];
            sigma[lane] = (isReference ? candidate.ReferenceSigmas : candidate.OtherSigmas)[pressure];
        }

        return Vector512.Create<double>(sigma);
    }

    /// <summary>The rows <c>q</c> of the points, stored column by column.</summary>
    private void FillDesign(CorrectionForm form)
    {
        for (int i = 0; i < Readings; i++)
        {
            FittedPoint point = points[i];
            ReadOnlySpan<Vector512<double>> power = scaledPowers.AsSpan(point.Place * powers, powers);
            int at = i;
            for (int k = 0; k <= form.ZeroDegree; k++, at += Readings)
                design[at] = power[k];
            for (int k = 0; k <= form.SpanDegree; k++, at += Readings)
                design[at] = power[k] * point.Pressure.Fraction;
            if (form.HasBow)
                design[at] = Vector512.Create(point.Pressure.Bow);
            if (form.HasSShape)
                design[at + Readings] = Vector512.Create(point.Pressure.SShape);
        }
    }

    /// <summary><c>Q⁺y</c> for what the readings see of a row.</summary>
    private void FillCoefficients(int row)
    {
        int place = -1;
        ShapeVector shapes = default;
        for (int i = 0; i < Readings; i++)
        {
            if (points[i].Place != place)
                shapes = SeenAt(row, place = points[i].Place);
            seen[i] = shapes.At(points[i].Pressure);
        }

        int columns = Rows.Form.Columns;
        ReadOnlySpan<Vector512<double>> readings = seen.AsSpan(0, Readings);
        for (int c = 0; c < columns; c++)
            coefficients[(row * columns) + c] = LanewiseLeastSquares.Dot(inverse.AsSpan(c * Readings, Readings), readings);
    }

    private ShapeVector SeenAt(int row, int place)
    {
        ReadOnlySpan<Vector512<double>> power = tauPowers.AsSpan(place * powers, powers);
        return new ShapeVector(
            Sum(Rows.Polynomial(row, PressureShape.Zero), power), Sum(Rows.Polynomial(row, PressureShape.Span), power),
            Sum(Rows.Polynomial(row, PressureShape.Bow), power), Sum(Rows.Polynomial(row, PressureShape.SShape), power));
    }

    private static Vector512<double> Sum(ReadOnlySpan<double> polynomial, ReadOnlySpan<Vector512<double>> power)
    {
        Vector512<double> sum = Vector512<double>.Zero;
        for (int k = 0; k < polynomial.Length; k++)
            if (polynomial[k] != 0)
                sum = Vector512.FusedMultiplyAdd(Vector512.Create(polynomial[k]), power[k], sum);
        return sum;
    }

    /// <summary>One reading of the plans in a batch: at which of their temperatures, and the pressure.</summary>
    private readonly record struct FittedPoint(int Place, ReadingPressure Pressure);
}
