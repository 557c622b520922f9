using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics.RandomStreams;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.Numerics.RareEvents;

/// <summary>
/// Draws of the importance sampler for a union of half-spaces: choose a law of the mixture, an event in proportion to its probability under
/// it, a point given that event; count how many events happen there. The weight of a point is the density of the standard normal law over
/// that of the mixture, <c>1/(S·Σ_κ r_κ/(K·μ̄_κ))</c> with <c>r_κ</c> the tilted density over the untilted, times whether the point is
/// accepted. Without tilt this is <c>μ̄/S</c>, the estimator of Owen, Maximov and Chertkov (Electronic Journal of Statistics 13, 2019).
/// One instance belongs to one thread.
/// </summary>
internal sealed class UnionSampler
{
    private readonly HalfSpaces events;
    private readonly Readings readings;
    private readonly TiltedEvents[] laws;
    private readonly RandomStream choices;
    private readonly RandomStream points;
    private readonly RandomStream noises;
    private readonly Lanes[] x;
    private readonly Lanes[] owns;
    private readonly Lanes[] noise;

    /// <summary>A sampler.</summary>
    /// <param name="events">The events.</param>
    /// <param name="readings">What has to lie between limits for a point to be accepted.</param>
    /// <param name="laws">The laws of the mixture, at least one.</param>
    /// <param name="seed">Root seed.</param>
    public UnionSampler(HalfSpaces events, Readings readings, TiltedEvents[] laws, ulong seed)
    {
        (this.events, this.readings, this.laws) = (events, readings, laws);
        choices = RandomStream.Named("union-choice", seed);
        points = RandomStream.Named("union-point", seed);
        noises = RandomStream.Named("union-noise", seed);
        x = new Lanes[events.Dimensions];
        owns = new Lanes[events.Groups];
        noise = new Lanes[readings.Count + 2];
    }

    /// <summary>The weights of eight points.</summary>
    /// <param name="batch">Number of the eight.</param>
    public Lanes Weights(ulong batch)
    {
        Vector512<ulong> numbers = Vector512.Create(batch * 8) + RandomStream.LaneNumbers;
        points.FillNormals(numbers, 0, x);
        points.FillNormals(numbers, 1_000_000, owns);
        Choose(numbers);
        Lanes happen = Vector512.Max(Happening(), Lanes.One);
        if (readings.Count == 0)
            return Vector512.Create(laws[0].Total) / happen;
        noises.FillNormals(numbers, 0, noise);
        return Accepted(out Lanes density) / (happen * density);
    }

    /// <summary>Gives each of eight normal draws its law and its event.</summary>
    private void Choose(Vector512<ulong> numbers)
    {
        (Lanes which, Lanes law) = choices.Uniforms(numbers, 0);
        Lanes tail = choices.Uniforms(numbers, 1).First;
        Span<double> normals = stackalloc double[x.Length];
        Span<double> point = stackalloc double[x.Length];
        for (int lane = 0; lane < 8; lane++)
        {
            TiltedEvents chosen = laws[(int)(law[lane] * laws.Length)];
            int j = chosen.Choose(which[lane]);
            int group = events.GroupOf(j);
            double own = group >= 0 ? owns[group][lane] : 0;
            for (int i = 0; i < x.Length; i++)
                normals[i] = x[i][lane];
            chosen.Tilt.Draw(normals, point);
            chosen.Move(j, tail[lane], point, ref own);
            for (int i = 0; i < x.Length; i++)
                x[i] = x[i].WithElement(lane, point[i]);
            if (group >= 0)
                owns[group] = owns[group].WithElement(lane, own);
        }
    }

    /// <summary>How many events happen at each of the eight points.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private Lanes Happening()
    {
        Lanes happen = Lanes.Zero;
        for (int j = 0; j < events.Count; j++)
        {
            Lanes value = At(events.Weight(j), Lanes.Zero);
            if (events.GroupOf(j) is int group and >= 0)
                value = Vector512.FusedMultiplyAdd(Vector512.Create(events.Own(j)), owns[group], value);
            happen += Vector512.GreaterThanOrEqual(value, Vector512.Create(events.Threshold(j))) & Lanes.One;
        }
        return happen;
    }

    /// <summary>1 where all readings lie between their limits, 0 elsewhere; and the mixture's density over the standard normal.</summary>
    private Lanes Accepted(out Lanes density)
    {
        Lanes accepted = Lanes.One;
        Lanes lean = Lanes.Zero;
        for (int v = 0; v < readings.Count; v++)
        {
            Lanes exact = readings.Exact(v, x);
            Lanes scaled = exact * Vector512.Create(1 / readings.Limit(v));
            lean = Vector512.FusedMultiplyAdd(scaled, scaled, lean);
            accepted &= readings.Within(v, exact, noise);
        }
        density = Lanes.Zero;
        for (int lane = 0; lane < 8; lane++)
            density = density.WithElement(lane, DensityAt(lean[lane]));
        return accepted;
    }

    private double DensityAt(double lean)
    {
        double sum = 0;
        foreach (TiltedEvents law in laws)
        {
            double strength = law.Tilt.Strength;
            if (law.Total > 0)
                sum += PortableFunctions.Exp((-strength * strength * lean / 2) - law.Tilt.LogTotal) / (laws.Length * law.Total);
        }
        return sum;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private Lanes At(ReadOnlySpan<double> weight, Lanes start)
    {
        // Two chains, so that the next product need not wait for the last.
        Lanes even = start;
        Lanes odd = Lanes.Zero;
        int i = 0;
        for (; i + 1 < weight.Length; i += 2)
        {
            even = Vector512.FusedMultiplyAdd(Vector512.Create(weight[i]), x[i], even);
            odd = Vector512.FusedMultiplyAdd(Vector512.Create(weight[i + 1]), x[i + 1], odd);
        }
        return i < weight.Length ? Vector512.FusedMultiplyAdd(Vector512.Create(weight[i]), x[i], even + odd) : even + odd;
    }
}
