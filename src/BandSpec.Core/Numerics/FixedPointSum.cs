namespace BandSpec.Core.Numerics;

/// <summary>
/// Numbers as whole multiples of 2⁻⁶⁴ in 128 bits. Their sum is exact and does not depend on its order, so that parts added up equal the
/// whole bit for bit; what is lost is the one rounding of each number to the grid, at most 2.7e-20.
/// </summary>
internal static class FixedPointSum
{
    private const int FractionBits = 64;
    private const int LargestPower = 60;

    /// <summary>The nearest multiple of 2⁻⁶⁴.</summary>
    /// <exception cref="OverflowException">The number is not below 2^60 in size, or not a number: four of them would no longer be safe to add.</exception>
    public static Int128 From(double number)
    {
        long bits = BitConverter.DoubleToInt64Bits(number);
        int exponent = (int)((bits >> 52) & 0x7FF);
        if (exponent - 1023 >= LargestPower)
            throw new OverflowException($"an error of this size cannot be summed exactly: {number:R}");
        if (exponent == 0)
            return Int128.Zero;
        long mantissa = (bits & 0xF_FFFF_FFFF_FFFF) | 0x10_0000_0000_0000;
        int shift = exponent - 1023 - 52 + FractionBits;
        Int128 size = shift switch
        {
            >= 0 => (Int128)mantissa << shift,
            > -55 => (mantissa + (1L << (-shift - 1))) >> -shift,
            _ => Int128.Zero,
        };
        return bits < 0 ? -size : size;
    }

    /// <summary>The number that a sum stands for.</summary>
    public static double ToDouble(Int128 sum) => (double)sum * (1.0 / 18446744073709551616.0);
}
