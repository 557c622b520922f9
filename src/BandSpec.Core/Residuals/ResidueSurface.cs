using BandSpec.Core.Numerics;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Residuals;

/// <summary>
/// What a plan leaves over as polynomials in the pressure fraction <c>x</c> and a temperature scaled to <c>t = −1 … 1</c> over the
/// operating range, so that it is known at every place and not only at nodes: the mean, and the variances within a lot and over lots with
/// the noise that the readings carry in, without the pressure standard and the steady terms.
/// </summary>
internal sealed class ResidueSurface
{
    private static readonly double SShapeScale = 6 * Math.Sqrt(3);

    /// <summary>The shapes <c>ψ_j</c> by powers of <c>x</c>.</summary>
    private static readonly double[][] Shapes = [[1], [0, 1], [0, 4, -4], [0, SShapeScale, -3 * SShapeScale, 2 * SShapeScale]];

    private readonly TemperatureScale scale;
    private readonly CorrectionForm form;
    private readonly PlanPoint[] points;
    private readonly double[] inverse;

    public ResidueSurface(Application application, CompensationPlan plan)
    {
        (Station station, var raw) = (application.Station, new RawError(application.Platform));
        scale = new TemperatureScale(application.Requirement.Temperature, raw);
        form = CorrectionForm.For(station, plan.ZeroDegree, plan.SpanDegree);
        points = [.. plan.Points];
        inverse = PseudoInverse();
        var rows = new LeftoverRows(0, form, raw);
        Mean = Sum(LeftOf(rows, rows.Count - 1));
        Surface within = SumOfSquares(Enumerable.Range(0, rows.WithinCount).Select(r => LeftOf(rows, r)));
        Within = Surface.Add(within, SumOfSquares(NoiseOf(application, raw)));
        LongRun = Surface.Add(Within, SumOfSquares(Enumerable.Range(rows.WithinCount, rows.LotCount).Select(r => LeftOf(rows, r))));
    }

    /// <summary><c>μ</c>, %FS.</summary>
    public Surface Mean { get; }

    /// <summary>Variance within a lot, (%FS)².</summary>
    public Surface Within { get; }

    /// <summary>Variance over lots, (%FS)².</summary>
    public Surface LongRun { get; }

    /// <summary><c>Q⁺</c>, one row a coefficient.</summary>
    private double[] PseudoInverse()
    {
        var design = new double[points.Length * form.Columns];
        for (int i = 0; i < points.Length; i++)
        {
            double[] q = form.At(points[i].PressureFraction, scale.Scaled(points[i].Temperature));
            for (int c = 0; c < q.Length; c++)
                design[(c * points.Length) + i] = q[c];
        }

        var result = new double[design.Length];
        if (!LeastSquares.PseudoInverse(design, points.Length, form.Columns, new double[form.Columns * form.Columns], result))
            throw new InvalidOperationException("the readings of a plan determine all coefficients of its correction");
        return result;
    }

    /// <summary>What the correction leaves of a row, one polynomial a shape.</summary>
    private double[][] LeftOf(LeftoverRows rows, int row)
    {
        double[] seen = [.. points.Select(p => SeenAt(rows, row, p))];
        double[] coefficients = [.. Enumerable.Range(0, form.Columns).Select(c => Vectors.Dot(inverse.AsSpan(c * seen.Length, seen.Length), seen))];
        double[][] taken = ByShape(coefficients);
        return [.. Enum.GetValues<PressureShape>().Select(s =>
            Polynomials.Add(scale.Substitute(rows.Polynomial(row, s).ToArray()), taken[(int)s], -1))];
    }

    private double SeenAt(LeftoverRows rows, int row, PlanPoint point) => Enum.GetValues<PressureShape>()
        .Sum(s => PressureShapes.At(s, point.PressureFraction) * rows.At(row, s, scale.Reduced(point.Temperature)));

    /// <summary>What each reading's noise makes of the correction, one polynomial a shape.</summary>
    private IEnumerable<double[][]> NoiseOf(Application application, RawError raw)
    {
        double noise = ReadingNoise.VarianceOf(application.Platform, application.Station);
        for (int i = 0; i < points.Length; i++)
        {
            double soak = Correction.SoakVariance(raw, application.Station, points[i].PressureFraction, scale.Reduced(points[i].Temperature));
            double sigma = Math.Sqrt(noise + soak);
            yield return ByShape([.. Enumerable.Range(0, form.Columns).Select(c => sigma * inverse[(c * points.Length) + i])]);
        }
    }

    private double[][] ByShape(double[] coefficients)
    {
        int span = form.ZeroDegree + 1, bow = span + form.SpanDegree + 1, sShape = bow + (form.HasBow ? 1 : 0);
        return
        [
            coefficients[..span], coefficients[span..bow],
            form.HasBow ? [coefficients[bow]] : [], form.HasSShape ? [coefficients[sShape]] : [],
        ];
    }

    private static Surface Sum(double[][] byShape) =>
        byShape.Select((p, s) => Surface.Product(Shapes[s], p)).Aggregate((a, b) => Surface.Add(a, b));

    private static Surface SumOfSquares(IEnumerable<double[][]> rows) =>
        rows.Select(Sum).Aggregate(Surface.Product([], []), (sum, row) => Surface.Add(sum, Surface.Multiply(row, row)));
}

/// <summary>The operating range mapped to −1 … 1.</summary>
internal sealed class TemperatureScale(OperatingTemperature range, RawError raw)
{
    private readonly double middle = (range.Lower.Celsius + range.Upper.Celsius) / 2;
    private readonly double half = (range.Upper - range.Lower).Kelvin / 2;

    /// <summary>The scaled temperature <c>t</c>.</summary>
    public double Scaled(Temperature temperature) => (temperature.Celsius - middle) / half;

    /// <summary>The temperature of a scaled one.</summary>
    public Temperature At(double scaled) => Temperature.FromCelsius(middle + (half * scaled));

    /// <summary>Reduced temperature <c>τ</c>.</summary>
    public double Reduced(Temperature temperature) => raw.Reduced(temperature);

    /// <summary>A polynomial in <c>τ</c> as one in <c>t</c>.</summary>
    public double[] Substitute(double[] inTau) => Polynomials.Substitute(inTau, Reduced(At(0)), half / 100);
}
