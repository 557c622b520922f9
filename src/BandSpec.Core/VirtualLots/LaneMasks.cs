using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>Eight yes-or-no answers as lanes with all bits set or none, and numbers folded over lanes in one fixed order.</summary>
internal static class LaneMasks
{
    /// <summary>How many lanes say yes.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static int Count(Lanes mask) => BitOperations.PopCount(mask.ExtractMostSignificantBits());

    /// <summary>The sum over lanes; the order of the additions is part of the result and is the same on every machine.</summary>
    public static double Sum(Lanes lanes) =>
        ((lanes[0] + lanes[1]) + (lanes[2] + lanes[3])) + ((lanes[4] + lanes[5]) + (lanes[6] + lanes[7]));

    /// <summary>A magnitude with the signs of other numbers.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes WithSign(Lanes magnitude, Lanes sign) =>
        magnitude | (sign & Vector512.Create(-0.0));
}
