namespace BandSpec.Core.Characterizing;

/// <summary>Rounds figures to what their uncertainty leaves of them: the second digit of the standard error (JCGM 100:2008, 7.2.6).</summary>
internal static class MeaningfulRounding
{
    /// <summary>A figure with its standard error; as it is when the error is zero or not known.</summary>
    public static double Of(double value, double error)
    {
        if (!(error > 0) || !double.IsFinite(error))
            return value == 0 ? 0 : ToDigits(value, 4);
        return Round(value, 1 - (int)Math.Floor(Math.Log10(error)));
    }

    /// <summary>
    /// A standard deviation with the standard error of its square, <c>u(σ) = u(σ²)/(2σ)</c>. One that the readings cannot tell from zero, being
    /// less than a hundredth of the root of that error, is zero.
    /// </summary>
    public static double Spread(double sigma, double varianceError)
    {
        if (!double.IsFinite(varianceError) || sigma < 0.01 * Math.Sqrt(varianceError))
            return 0;
        return Of(sigma, Math.Min(sigma, varianceError / (2 * sigma)));
    }

    /// <summary>A figure with so many significant digits.</summary>
    public static double ToDigits(double value, int digits) =>
        value == 0 ? 0 : Round(value, digits - 1 - (int)Math.Floor(Math.Log10(Math.Abs(value))));

    /// <summary>Through the decimal text, so that what is written is what is meant: 0.3 and not 0.30000000000000004.</summary>
    private static double Round(double value, int decimals)
    {
        if (decimals is >= 0 and <= 15)
            return Math.Round(value, decimals) + 0.0;
        double unit = Math.Pow(10, Math.Abs(decimals));
        return decimals < 0 ? Math.Round(value / unit) * unit : Math.Round(value * unit) / unit;
    }
}
