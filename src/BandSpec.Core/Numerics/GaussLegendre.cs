using System.Collections.Concurrent;
using System.Collections.Immutable;

namespace BandSpec.Core.Numerics;

/// <summary>
/// Gauss-Legendre quadrature: with n nodes exact for polynomials up to degree 2n − 1. Rules are kept per order and never change.
/// Own nodes, because the library tabulates some orders within 1.1e-16 but computes the others only to 3e-12 (48 nodes) or 5e-11 (150).
/// </summary>
internal static class GaussLegendre
{
    private static readonly ConcurrentDictionary<int, GaussRule> Rules = new();

    /// <summary>The rule on [−1, 1] with <paramref name="order"/> ≥ 1 nodes.</summary>
    public static GaussRule Rule(int order)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(order, 1);
        return Rules.GetOrAdd(order, Make);
    }

    /// <summary><c>∫ f dx</c> from <paramref name="lower"/> to <paramref name="upper"/> with one rule.</summary>
    public static double Integrate(Func<double, double> f, double lower, double upper, int order)
    {
        GaussRule rule = Rule(order);
        double middle = (lower + upper) / 2, half = (upper - lower) / 2, sum = 0;
        for (int i = 0; i < rule.Nodes.Length; i++)
            sum += rule.Weights[i] * f(middle + half * rule.Nodes[i]);
        return half * sum;
    }

    /// <summary><c>∫ f dx</c> with one rule between each two neighbours of the rising <paramref name="cuts"/>.</summary>
    public static double IntegrateBetween(Func<double, double> f, IReadOnlyList<double> cuts, int order)
    {
        double sum = 0;
        for (int k = 1; k < cuts.Count; k++)
            sum += Integrate(f, cuts[k - 1], cuts[k], order);
        return sum;
    }

    /// <summary>The zeros of the Legendre polynomial by Newton's method; the weight of a zero x is <c>2/((1 − x²)·P'(x)²)</c>.</summary>
    private static GaussRule Make(int order)
    {
        double[] nodes = new double[order], weights = new double[order];
        for (int i = 0; 2 * i < order; i++)
        {
            double x = 2 * i + 1 == order ? 0 : Math.Cos(Math.PI * (i + 0.75) / (order + 0.5));
            for (int step = 0; step < 5; step++)
            {
                (double value, double slope) = Legendre(order, x);
                x -= value / slope;
            }
            double derivative = Legendre(order, x).Slope;
            (nodes[i], nodes[order - 1 - i]) = (-x, x);
            weights[i] = weights[order - 1 - i] = 2 / ((1 - x) * (1 + x) * derivative * derivative);
        }
        return new([.. nodes], [.. weights]);
    }

    /// <summary>Value and slope of the Legendre polynomial by its three-term recurrence, for |x| &lt; 1.</summary>
    private static (double Value, double Slope) Legendre(int degree, double x)
    {
        double before = 1, value = x;
        for (int k = 2; k <= degree; k++)
            (before, value) = (value, ((2 * k - 1) * x * value - (k - 1) * before) / k);
        return (value, degree * (before - x * value) / ((1 - x) * (1 + x)));
    }
}

/// <summary>Nodes, rising, and weights of a quadrature rule on [−1, 1]; the weights add up to 2.</summary>
/// <param name="Nodes">The places where the integrand is taken.</param>
/// <param name="Weights">What each place counts, in the order of <paramref name="Nodes"/>.</param>
internal sealed record GaussRule(ImmutableArray<double> Nodes, ImmutableArray<double> Weights);
