using BandSpec.Core.Requirements;

namespace BandSpec.Core.Residuals;

/// <summary>The shape groups into which what is left over is told apart.</summary>
internal enum ResidueGroup
{
    /// <summary>Coefficients of the zero, <c>j = 0</c>.</summary>
    Zero,

    /// <summary>Coefficients of the span, <c>j = 1</c>.</summary>
    Span,

    /// <summary>Coefficients of bow and s-shape, <c>j ≥ 2</c>.</summary>
    Linearity,
}

/// <summary>
/// What compensation leaves, as a linear map: <c>ρ = gᵀa − wᵀε</c>. Adding or subtracting two residues gives the map of the sum or
/// difference of the errors at two places, such as a span or a thermal shift.
/// </summary>
internal sealed class Residue(double[] g, double[] weights)
{
    /// <summary><c>g</c>, one number for each coefficient of the raw error.</summary>
    public double[] Coefficients { get; } = g;

    /// <summary><c>w</c>, one number for each reading.</summary>
    public double[] Weights { get; } = weights;

    /// <summary>The map of <c>Σ factor·ρ</c>.</summary>
    public static Residue Sum(params ReadOnlySpan<(double Factor, Residue Residue)> parts)
    {
        var g = new double[parts[0].Residue.Coefficients.Length];
        var w = new double[parts[0].Residue.Weights.Length];
        foreach ((double factor, Residue residue) in parts)
        {
            for (int k = 0; k < g.Length; k++)
                g[k] += factor * residue.Coefficients[k];
            for (int i = 0; i < w.Length; i++)
                w[i] += factor * residue.Weights[i];
        }

        return new Residue(g, w);
    }

    /// <summary>The part of <c>g</c> that belongs to a group; zero elsewhere.</summary>
    public double[] PartOf(ResidueGroup group, CoefficientName[] names)
    {
        var part = new double[Coefficients.Length];
        for (int k = 0; k < part.Length; k++)
            part[k] = GroupOf(names[k].Shape) == group ? Coefficients[k] : 0;
        return part;
    }

    private static ResidueGroup GroupOf(PressureShape shape) => shape switch
    {
        PressureShape.Zero => ResidueGroup.Zero,
        PressureShape.Span => ResidueGroup.Span,
        _ => ResidueGroup.Linearity,
    };
}

/// <summary>The noise of one averaged reading.</summary>
internal static class ReadingNoise
{
    /// <summary><c>(σ_rep² + σ_read²)/N</c>, in (%FS)².</summary>
    public static double VarianceOf(Platform platform, Station station)
    {
        double repeatability = platform.Repeatability.Percent, noise = station.ReadingNoise.Percent;
        return ((repeatability * repeatability) + (noise * noise)) / station.ReadingsAveraged;
    }
}
