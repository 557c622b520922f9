using System.Runtime.Intrinsics;
using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Planning;

/// <summary>What holds at one pressure whatever the plan: its shapes, what is added there, and the variance no plan can change.</summary>
/// <param name="Shapes">Values of the pressure shapes.</param>
/// <param name="Products">Their products.</param>
/// <param name="Added">Hysteresis means and further bounds, %FS.</param>
/// <param name="Drift">Mean drift at the end of life, signed, %FS.</param>
/// <param name="Variance">Variance of the steady terms and of the pressure standard, (%FS)².</param>
internal readonly record struct PressureNode(ReadingPressure Shapes, ShapeProducts Products, double Added, double Drift, double Variance)
{
    /// <summary>The eleven pressure nodes of an application.</summary>
    public static PressureNode[] AllOf(Application application) => [.. DesignNodes.Fractions.Select(x => Of(application, x))];

    /// <summary>The node at a pressure fraction.</summary>
    public static PressureNode Of(Application application, double x)
    {
        var steady = new SteadyTerms(application);
        List<SteadyTerm> terms = [.. steady.At(x)];
        var shapes = ReadingPressure.At(x);
        Station station = application.Station;
        double zero = station.StandardZero.Percent, proportional = station.StandardProportional.Percent * x;
        return new PressureNode(
            shapes, new ShapeProducts(shapes),
            terms.Where(t => t.Term != ErrorTerm.Ageing).Sum(t => t.Added),
            steady.DriftMean(x),
            terms.Sum(t => t.Sigma * t.Sigma) + (zero * zero) + (proportional * proportional));
    }

    /// <summary><c>M</c> with a mean left over.</summary>
    public Vector512<double> AddedWith(Vector512<double> mean) =>
        Vector512.Max(Vector512.Abs(mean), Vector512.Abs(mean + Vector512.Create(Drift))) + Vector512.Create(Added);
}
