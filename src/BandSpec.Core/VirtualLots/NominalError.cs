using System.Runtime.Intrinsics;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// What compensation leaves of the mean unit, read without any chance. It tells which side of the band is the nearer one, and is
/// subtracted before moments are summed, so that nothing cancels.
/// </summary>
internal sealed class NominalError
{
    private readonly ShapePlaces places;
    private readonly Lanes[] error;

    private NominalError(ShapePlaces places, Lanes[] error) => (this.places, this.error) = (places, error);

    /// <summary>Makes the mean unit and compensates it.</summary>
    public static NominalError Of(RawErrorLaw law, CompensationRun run, ShapePlaces places)
    {
        double[] means = new double[law.Count];
        law.Nominal(means);
        Lanes[] error = new Lanes[places.Count];
        law.Unit(means, new Lanes[law.Count], error);
        Lanes[] still = new Lanes[run.Points];
        run.Compensate(new RunChance(still, still, new Lanes[2]), new Lanes[run.Points], error);
        return new NominalError(places, error);
    }

    /// <summary>The error at eight pressures and reduced temperatures.</summary>
    public Lanes At(in LaneShapes shapes, Lanes tau) => places.At(error, 1, shapes, tau);

    /// <summary>The error at one pressure and reduced temperature.</summary>
    public double At(in ShapeValues shapes, double tau) => places.At(error, 1, shapes, Vector512.Create(tau)).ToScalar();
}
