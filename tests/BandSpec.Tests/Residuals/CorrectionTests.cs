using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;
using BandSpec.Tests.Reference;
using Xunit;

namespace BandSpec.Tests.Residuals;

/// <summary>The weights of the least-squares correction against NumPy's pseudo-inverse (weights.csv, made by make_weights.py).</summary>
public sealed class CorrectionTests
{
    private static readonly (int[] Celsius, int Zero, int Span)[] Plans =
        [([-20, 60, 150], 2, 2), ([-15, 25, 90, 145], 3, 2), ([-20, 10, 50, 95, 150], 4, 3)];

    [Fact]
    public void Weights_are_those_of_the_pseudo_inverse()
    {
        var raw = new RawError(Given.Platform);
        foreach (double[] row in ReferenceTable.Numbers("weights.csv"))
        {
            Correction correction = CorrectionOf(raw, Plans[(int)row[0]]);
            double[] weights = correction.Weights(row[1], raw.Reduced(Given.C(row[2])));
            Assert.Equal(row.Length - 3, weights.Length);
            for (int i = 0; i < weights.Length; i++)
                Assert.Equal(row[3 + i], weights[i], 1e-11);
        }
    }

    [Fact]
    public void A_correction_reproduces_every_polynomial_it_can_store()
    {
        var raw = new RawError(Given.Platform);
        Residue residue = CorrectionOf(raw, Plans[2]).At(0.3, Given.C(72));
        for (int k = 0; k < raw.Names.Length; k++)
            if (raw.Names[k] is { Shape: PressureShape.Zero, Degree: <= 4 } or { Shape: PressureShape.Span, Degree: <= 3 })
                Assert.Equal(0, residue.Coefficients[k], 1e-12);
    }

    private static Correction CorrectionOf(RawError raw, (int[] Celsius, int Zero, int Span) plan) => new(
        raw, Given.Platform, Given.Station,
        CompensationPlan.Of([.. plan.Celsius.Select(t => Given.C(t))], plan.Zero, plan.Span, Given.C(25), Given.Station.PressurePoints));
}
