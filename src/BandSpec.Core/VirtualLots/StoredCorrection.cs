using System.Runtime.Intrinsics;
using BandSpec.Core.Requirements;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// The correction that a station fits to its readings and stores in the unit: which powers it has and, since the points are the same for
/// every unit, the matrix that turns readings into coefficients. The least squares are this room's own (Householder reflections, Golub and
/// Van Loan, "Matrix Computations", 5.2 and 5.3), so that a fault of the closed form's cannot hide here.
/// </summary>
internal sealed class StoredCorrection
{
    private readonly int[] places;
    private readonly double[] fit;
    private readonly int points;

    private StoredCorrection(int[] places, double[] fit, int points) => (this.places, this.fit, this.points) = (places, fit, points);

    /// <summary>How many coefficients are stored.</summary>
    public int Count => places.Length;

    /// <summary>Every number of the correction, to tell one from another.</summary>
    public IEnumerable<double> Numbers => places.Select(p => (double)p).Concat(fit);

    /// <summary>The correction of a plan.</summary>
    /// <param name="plan">Points and degrees.</param>
    /// <param name="referencePressures">How many pressures the station reads at the reference temperature: 3 add a bow, 4 an s-shape.</param>
    /// <param name="reducedTemperature">The reduced temperature of a point.</param>
    /// <param name="where">Where the coefficients of an error stand.</param>
    /// <exception cref="ArgumentException">The points do not determine the coefficients.</exception>
    public static StoredCorrection For(
        CompensationPlan plan, int referencePressures, Func<PlanPoint, double> reducedTemperature, ShapePlaces where)
    {
        List<CoefficientName> names = Names(plan, referencePressures);
        double[][] columns = [.. names.Select(name => plan.Points.Select(point => Value(name, point, reducedTemperature(point))).ToArray())];
        return new StoredCorrection(
            [.. names.Select(name => where.Of(name.Shape, name.Degree))], HouseholderFit.Solver(columns, plan.Points.Count), plan.Points.Count);
    }

    /// <summary>The coefficients that the correction of a plan has.</summary>
    public static List<CoefficientName> Names(CompensationPlan plan, int referencePressures)
    {
        List<CoefficientName> names = [];
        names.AddRange(Enumerable.Range(0, plan.ZeroDegree + 1).Select(k => new CoefficientName(PressureShape.Zero, k)));
        names.AddRange(Enumerable.Range(0, plan.SpanDegree + 1).Select(k => new CoefficientName(PressureShape.Span, k)));
        if (referencePressures >= 3)
            names.Add(new CoefficientName(PressureShape.Bow, 0));
        if (referencePressures >= 4)
            names.Add(new CoefficientName(PressureShape.SShape, 0));
        return names;
    }

    /// <summary>Subtracts the fitted correction of eight units from their raw error; what stays is what compensation leaves over.</summary>
    /// <param name="readings">What the station read at each point.</param>
    /// <param name="error">The raw error on entry, the error left over on return.</param>
    public void Subtract(ReadOnlySpan<Lanes> readings, Span<Lanes> error)
    {
        for (int row = 0; row < places.Length; row++)
        {
            ReadOnlySpan<double> weights = fit.AsSpan(row * points, points);
            Lanes coefficient = Lanes.Zero;
            for (int i = 0; i < weights.Length; i++)
                coefficient = Vector512.FusedMultiplyAdd(Vector512.Create(weights[i]), readings[i], coefficient);
            error[places[row]] -= coefficient;
        }
    }

    private static double Value(CoefficientName name, PlanPoint point, double tau)
    {
        ShapeValues shapes = ShapeValues.At(point.PressureFraction);
        double shape = name.Shape switch
        {
            PressureShape.Zero => 1,
            PressureShape.Span => shapes.Span,
            PressureShape.Bow => shapes.Bow,
            _ => shapes.SShape,
        };
        for (int k = 0; k < name.Degree; k++)
            shape *= tau;
        return shape;
    }
}
