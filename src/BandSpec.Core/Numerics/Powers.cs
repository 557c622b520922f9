namespace BandSpec.Core.Numerics;

/// <summary>Whole powers by repeated multiplication: the same bits on every machine, which the C library's <c>pow</c> does not promise.</summary>
internal static class Powers
{
    /// <summary><c>t^k</c> for <c>k ≥ 0</c>; <c>0^0 = 1</c>.</summary>
    public static double Of(double t, int k)
    {
        double power = 1;
        for (int i = 0; i < k; i++)
            power *= t;
        return power;
    }
}
