using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using BandSpec.Core.Requirements;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// The steps of an output: an error is carried to the output, rounded to the step there, ties to even, and carried back, so that where the
/// nominal output lies between two steps plays its part.
/// </summary>
internal sealed class OutputSteps
{
    private readonly double nominalAtLower;
    private readonly double stepsPerPercent;
    private readonly double percentPerStep;

    /// <summary>The steps of an output; a continuous one has none.</summary>
    public OutputSteps(OutputSignal output)
    {
        if (output.Step is not { } step)
            return;
        stepsPerPercent = output.Span / 100 / step;
        percentPerStep = 1 / stepsPerPercent;
        nominalAtLower = output.AtLower / step;
    }

    /// <summary>One step in %FS; 0 for a continuous output.</summary>
    public double Step => Math.Abs(percentPerStep);

    /// <summary>Every number of the steps, to tell one output from another.</summary>
    public IEnumerable<double> Numbers => [nominalAtLower, stepsPerPercent];

    /// <summary>The nominal output in steps at a pressure fraction.</summary>
    public double NominalAt(double x) => nominalAtLower + (100 * stepsPerPercent * x);

    /// <summary>The nominal outputs in steps at eight pressure fractions.</summary>
    public Lanes NominalAt(Lanes x) =>
        Vector512.FusedMultiplyAdd(Vector512.Create(100 * stepsPerPercent), x, Vector512.Create(nominalAtLower));

    /// <summary>The errors of eight units as the output shows them, in %FS.</summary>
    /// <param name="error">The errors, in %FS.</param>
    /// <param name="nominal">The nominal outputs in steps.</param>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public Lanes Show(Lanes error, Lanes nominal)
    {
        if (stepsPerPercent == 0)
            return error;
        Lanes steps = Vector512.Round(Vector512.FusedMultiplyAdd(error, Vector512.Create(stepsPerPercent), nominal));
        return (steps - nominal) * Vector512.Create(percentPerStep);
    }
}
