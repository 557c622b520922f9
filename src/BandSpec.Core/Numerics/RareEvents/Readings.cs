using System.Runtime.Intrinsics;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.Numerics.RareEvents;

/// <summary>
/// Readings <c>m_v + a_vᵀx + noise</c> that have to lie between limits for something to be accepted. The noise is normal, independent from
/// reading to reading but for what a common error adds: <c>s_v·ζ_v + c_0·ζ + c_1v·ζ'</c>.
/// </summary>
/// <param name="dimensions">Length of <c>x</c>.</param>
/// <param name="commonZero">Standard deviation <c>c_0</c> of the common error that is the same in all readings.</param>
internal sealed class Readings(int dimensions, double commonZero)
{
    private readonly List<double> weights = [];
    private readonly List<Reading> readings = [];

    /// <summary>Length of <c>x</c>.</summary>
    public int Dimensions => dimensions;

    /// <summary>How many readings there are; with none, everything is accepted.</summary>
    public int Count => readings.Count;

    /// <summary>No reading at all.</summary>
    public static Readings None(int dimensions) => new(dimensions, 0);

    /// <summary>Adds a reading.</summary>
    public void Add(ReadOnlySpan<double> weight, in Reading reading)
    {
        weights.AddRange(weight);
        readings.Add(reading);
    }

    /// <summary><c>a</c> of a reading.</summary>
    public ReadOnlySpan<double> Weight(int v) => System.Runtime.InteropServices.CollectionsMarshal.AsSpan(weights).Slice(v * dimensions, dimensions);

    /// <summary><c>m</c> of a reading.</summary>
    public double Mean(int v) => readings[v].Mean;

    /// <summary>The larger of the two limits in size: the scale of the reading, never quite 0.</summary>
    public double Limit(int v) => Math.Max(1e-9, Math.Max(Math.Abs(readings[v].Lower), Math.Abs(readings[v].Upper)));

    /// <summary>A reading before its noise, <c>m_v + a_vᵀx</c>, for eight <c>x</c>.</summary>
    public Lanes Exact(int v, ReadOnlySpan<Lanes> x)
    {
        ReadOnlySpan<double> weight = Weight(v);
        Lanes value = Vector512.Create(readings[v].Mean);
        for (int i = 0; i < weight.Length; i++)
            value = Vector512.FusedMultiplyAdd(Vector512.Create(weight[i]), x[i], value);
        return value;
    }

    /// <summary>Whether a reading with its noise lies between its limits, as lanes with all bits set or none.</summary>
    /// <param name="v">Which reading.</param>
    /// <param name="exact">The reading before its noise.</param>
    /// <param name="noise">Standard normal numbers: the two common ones, then one a reading.</param>
    public Lanes Within(int v, Lanes exact, ReadOnlySpan<Lanes> noise)
    {
        Reading reading = readings[v];
        Lanes value = Vector512.FusedMultiplyAdd(Vector512.Create(reading.Noise), noise[v + 2], exact);
        value = Vector512.FusedMultiplyAdd(Vector512.Create(commonZero), noise[0], value);
        value = Vector512.FusedMultiplyAdd(Vector512.Create(reading.Common), noise[1], value);
        return Vector512.GreaterThanOrEqual(value, Vector512.Create(reading.Lower))
            & Vector512.LessThanOrEqual(value, Vector512.Create(reading.Upper));
    }
}

/// <summary>One reading but for its weights.</summary>
/// <param name="Mean"><c>m</c>.</param>
/// <param name="Lower">Lower limit.</param>
/// <param name="Upper">Upper limit.</param>
/// <param name="Noise">Standard deviation <c>s</c> of the noise of its own.</param>
/// <param name="Common">Standard deviation <c>c_1</c> of its share in the second common error.</param>
internal readonly record struct Reading(double Mean, double Lower, double Upper, double Noise, double Common);
