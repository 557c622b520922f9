using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.TestLimits;

/// <summary>Acceptance limits in the output's unit. All rounding goes inward, so that it never turns a reject into a pass.</summary>
internal static class AcceptanceLimits
{
    /// <summary>
    /// The lowest and highest accepted reading around the nominal output: the half width rounded down to the limit step, both ends then
    /// inward to whole steps of the output. The lower end is above the upper when nothing can be accepted.
    /// </summary>
    /// <param name="requirement">The requirement with its output and its limit step.</param>
    /// <param name="fraction">Pressure fraction.</param>
    /// <param name="halfWidth">Half width of the acceptance interval, %FS; may be negative.</param>
    public static (decimal Lower, decimal Upper) Of(Requirement requirement, double fraction, double halfWidth)
    {
        OutputSignal output = requirement.Output;
        decimal half = StepRounding.Down((decimal)halfWidth, (decimal)requirement.Rounding.Limit.Percent);
        decimal nominal = (decimal)output.NominalAt(fraction), width = half * (decimal)Math.Abs(output.Span) / 100;
        decimal lower = nominal - width, upper = nominal + width;
        return output.Step is { } step
            ? (StepRounding.UpStrictly(lower, (decimal)step), StepRounding.Down(upper, (decimal)step))
            : (lower, upper);
    }

    /// <summary>An interval of readings as errors in %FS; a falling output changes its ends over.</summary>
    public static Interval InPercent(OutputSignal output, double fraction, decimal lower, decimal upper)
    {
        double nominal = output.NominalAt(fraction);
        double first = 100 * ((double)lower - nominal) / output.Span, second = 100 * ((double)upper - nominal) / output.Span;
        return output.Span > 0 ? new Interval(first, second) : new Interval(second, first);
    }
}
