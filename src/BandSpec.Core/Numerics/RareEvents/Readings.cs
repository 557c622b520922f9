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

    /// <summary>Standard deviation of the common error that is the same in all readings.</summary>
    public double CommonZero => commonZero;

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

    /// <summary>A reading.</summary>
    public Reading this[int v] => readings[v];
}

/// <summary>One reading but for its weights.</summary>
/// <param name="Mean"><c>m</c>.</param>
/// <param name="Lower">Lower limit.</param>
/// <param name="Upper">Upper limit.</param>
/// <param name="Noise">Standard deviation <c>s</c> of the noise of its own.</param>
/// <param name="Common">Standard deviation <c>c_1</c> of its share in the second common error.</param>
internal readonly record struct Reading(double Mean, double Lower, double Upper, double Noise, double Common);
