using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Planning;

/// <summary>
/// The correction of one plan after another, in memory that is used again: nothing is allocated for a plan. The result is the map
/// from the correction's coefficients to the rows of <see cref="SearchTables"/>, followed by one row for the noise of each reading.
/// </summary>
internal sealed class PlanFit
{
    private readonly SearchTables tables;
    private readonly double[] design;
    private readonly double[] triangle;
    private readonly double[] inverse;
    private readonly double[] map;
    private readonly ReadingPoint[] points;
    private readonly double[] taus;

    public PlanFit(SearchTables tables)
    {
        this.tables = tables;
        Station station = tables.Application.Station;
        int temperatures = tables.Application.Requirement.Compensation.MostTemperatures;
        int most = station.PressurePoints.Reference.Count + (temperatures * station.PressurePoints.Others.Count);
        int columns = (2 * temperatures) + 4;
        points = new ReadingPoint[most];
        taus = new double[most];
        design = new double[most * columns];
        inverse = new double[most * columns];
        triangle = new double[columns * columns];
        map = new double[columns * (tables.Rows.Length + most)];
    }

    /// <summary>The form of the fitted correction.</summary>
    public CorrectionForm Form { get; private set; }

    /// <summary>How many readings the plan has.</summary>
    public int Readings { get; private set; }

    /// <summary>How many rows the map has: those of <see cref="SearchTables"/>, then one a reading.</summary>
    public int RowCount => tables.Rows.Length + Readings;

    /// <summary>
    /// The map, row by row: what a row sees of coefficient <c>c</c> is at <c>row·Columns + c</c>, coefficients in the order of the form.
    /// </summary>
    public ReadOnlySpan<double> Map => map.AsSpan(0, RowCount * Form.Columns);

    /// <summary>Fits a plan.</summary>
    /// <param name="list">Indices of its candidate temperatures, rising.</param>
    /// <param name="form">The form of the correction.</param>
    /// <returns>Whether the readings determine all coefficients.</returns>
    public bool To(ReadOnlySpan<int> list, CorrectionForm form)
    {
        Form = form;
        CollectPoints(list);
        if (form.Columns > Readings)
            return false;
        FillDesign();
        if (!LeastSquares.PseudoInverse(design, Readings, form.Columns, triangle, inverse))
            return false;
        FillMap();
        return true;
    }

    private void CollectPoints(ReadOnlySpan<int> list)
    {
        int nearest = NearestReference(list);
        Readings = 0;
        foreach (int candidate in list)
            foreach (ReadingPoint point in (candidate == nearest ? tables.Reference : tables.Others)[candidate])
            {
                points[Readings] = point;
                taus[Readings++] = tables.Taus[candidate];
            }
    }

    /// <summary>The candidate nearest the reference temperature, the colder one on a tie.</summary>
    private int NearestReference(ReadOnlySpan<int> list)
    {
        double reference = tables.Application.Requirement.Temperature.Reference.Celsius;
        int nearest = list[0];
        foreach (int candidate in list)
            if (Distance(candidate) < Distance(nearest))
                nearest = candidate;
        return nearest;

        double Distance(int candidate) => Math.Abs(tables.Families.Candidates[candidate].Celsius - reference);
    }

    /// <summary>The rows <c>q</c> of the points, stored column by column.</summary>
    private void FillDesign()
    {
        for (int i = 0; i < Readings; i++)
        {
            double x = points[i].Fraction;
            int at = FillPowers(i, 0, 1, Form.ZeroDegree);
            at = FillPowers(i, at, x, Form.SpanDegree);
            if (Form.HasBow)
                design[(at++ * Readings) + i] = PressureShapes.At(PressureShape.Bow, x);
            if (Form.HasSShape)
                design[(at * Readings) + i] = PressureShapes.At(PressureShape.SShape, x);
        }
    }

    private int FillPowers(int i, int column, double shape, int degree)
    {
        double power = shape;
        for (int k = 0; k <= degree; k++, power *= taus[i])
            design[((column + k) * Readings) + i] = power;
        return column + degree + 1;
    }

    private void FillMap()
    {
        int columns = Form.Columns, rows = tables.Rows.Length;
        Array.Clear(map, 0, rows * columns);
        for (int c = 0; c < columns; c++)
            for (int i = 0; i < Readings; i++)
            {
                double weight = inverse[(c * Readings) + i];
                double[] seen = points[i].Rows;
                for (int r = 0; r < rows; r++)
                    map[(r * columns) + c] += weight * seen[r];
                map[((rows + i) * columns) + c] = weight * points[i].Noise;
            }
    }
}
