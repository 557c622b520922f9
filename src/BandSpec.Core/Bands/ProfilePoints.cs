using BandSpec.Core.Numerics;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Bands;

/// <summary>One place of the profile with its weight; the weights of all places sum to 1.</summary>
/// <param name="Fraction">Pressure fraction.</param>
/// <param name="Temperature">Temperature.</param>
/// <param name="Region">Index of the region that the temperature is in.</param>
/// <param name="Weight">Share of the service life.</param>
internal readonly record struct ProfilePoint(double Fraction, Temperature Temperature, int Region, double Weight);

/// <summary>
/// The places at which the temperature profile is averaged: the eleven pressure nodes with trapezoid weights, and in temperature three
/// Gauss-Legendre points on every step of at most 5 K of a bin, bins cut at region edges so that nothing jumps inside a step.
/// </summary>
internal static class ProfilePoints
{
    private const int Order = 3;

    /// <summary>All places of a requirement's profile.</summary>
    public static IEnumerable<ProfilePoint> Of(Requirement requirement) =>
        from place in TemperaturesOf(requirement)
        from i in Enumerable.Range(0, DesignNodes.Fractions.Count)
        select new ProfilePoint(
            DesignNodes.Fractions[i], place.Temperature, place.Region, place.Weight * PressureWeight(i));

    /// <summary>The temperatures of a profile with their regions and weights.</summary>
    public static IEnumerable<(Temperature Temperature, int Region, double Weight)> TemperaturesOf(Requirement requirement)
    {
        double total = requirement.Profile.Sum(b => b.Dwell.Hours);
        foreach (DwellBin bin in requirement.Profile)
        {
            if (bin.From == bin.To)
                yield return (bin.From, RegionOf(requirement, bin.From), bin.Dwell.Hours / total);
            for (int r = 0; r < requirement.AllowedError.Count; r++)
                foreach ((double celsius, double weight) in PointsOf(bin, requirement.AllowedError[r]))
                    yield return (Temperature.FromCelsius(celsius), r, weight * bin.Dwell.Hours / total);
        }
    }

    /// <summary>Trapezoid weight of a pressure node; the eleven sum to 1.</summary>
    public static double PressureWeight(int node) => node == 0 || node == DesignNodes.Fractions.Count - 1 ? 0.05 : 0.1;

    /// <summary>The Gauss-Legendre points of the part of a bin inside a region; weights relative to the whole bin.</summary>
    private static IEnumerable<(double Celsius, double Weight)> PointsOf(DwellBin bin, AllowedErrorRegion region)
    {
        double from = Math.Max(bin.From.Celsius, region.From.Celsius), to = Math.Min(bin.To.Celsius, region.To.Celsius);
        double width = (bin.To - bin.From).Kelvin;
        if (from >= to)
            yield break;
        int steps = DesignNodes.StepsBetween(from, to);
        GaussRule rule = GaussLegendre.Rule(Order);
        for (int s = 0; s < steps; s++)
        {
            double a = DesignNodes.Along(from, to, s, steps), b = DesignNodes.Along(from, to, s + 1, steps);
            for (int i = 0; i < Order; i++)
                yield return ((a + b + ((b - a) * rule.Nodes[i])) / 2, (b - a) / 2 * rule.Weights[i] / width);
        }
    }

    private static int RegionOf(Requirement requirement, Temperature temperature)
    {
        int r = 0;
        while (r < requirement.AllowedError.Count - 1 && temperature > requirement.AllowedError[r].To)
            r++;
        return r;
    }
}
