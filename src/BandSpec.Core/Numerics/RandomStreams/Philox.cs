using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using System.Runtime.Intrinsics.X86;

namespace BandSpec.Core.Numerics.RandomStreams;

/// <summary>
/// Philox4x32-10, a bijection of 128-bit counters chosen by a 64-bit key: Salmon, Moraes, Dror and Shaw, "Parallel random numbers: as easy
/// as 1, 2, 3" (SC 2011). Being a function of the counter, any draw of any unit can be made at any time on any thread. Eight counters are
/// turned at once; each 32-bit word sits in the lower half of a 64-bit lane, and the upper half is left dirty until the end because the
/// widening product does not read it.
/// </summary>
internal static class Philox
{
    private const int Rounds = 10;
    private const ulong LowerHalf = 0xFFFF_FFFF;
    private const ulong MultiplierEven = 0xD251_1F53;
    private const ulong MultiplierOdd = 0xCD9E_8D57;
    private const ulong WeylEven = 0x9E37_79B9;
    private const ulong WeylOdd = 0xBB67_AE85;

    /// <summary>The four 32-bit words of eight counters under one key.</summary>
    /// <param name="counter">Four words of eight counters, each in the lower half of its lane.</param>
    /// <param name="key">The key, its even word in the lower half.</param>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Words Turn(in Words counter, ulong key)
    {
        Vector512<ulong> keyEven = Vector512.Create(key & LowerHalf);
        Vector512<ulong> keyOdd = Vector512.Create(key >> 32);
        Vector512<ulong> stepEven = Vector512.Create(WeylEven);
        Vector512<ulong> stepOdd = Vector512.Create(WeylOdd);
        Vector512<ulong> even = Vector512.Create(MultiplierEven);
        Vector512<ulong> odd = Vector512.Create(MultiplierOdd);
        (Vector512<ulong> a, Vector512<ulong> b, Vector512<ulong> c, Vector512<ulong> d) = (counter.A, counter.B, counter.C, counter.D);
        for (int round = 0; round < Rounds; round++)
        {
            Vector512<ulong> first = WideningProduct(even, a);
            Vector512<ulong> second = WideningProduct(odd, c);
            a = (second >>> 32) ^ b ^ keyEven;
            b = second;
            c = (first >>> 32) ^ d ^ keyOdd;
            d = first;
            keyEven += stepEven;
            keyOdd += stepOdd;
        }
        Vector512<ulong> half = Vector512.Create(LowerHalf);
        return new Words(a & half, b & half, c & half, d & half);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector512<ulong> WideningProduct(Vector512<ulong> multiplier, Vector512<ulong> word) =>
        Avx512F.IsSupported
            ? Avx512F.Multiply(multiplier.AsUInt32(), word.AsUInt32())
            : multiplier * (word & Vector512.Create(LowerHalf));

    /// <summary>Four words of eight counters or of eight results.</summary>
    /// <param name="A">Word 0, in the lower half of each lane.</param>
    /// <param name="B">Word 1.</param>
    /// <param name="C">Word 2.</param>
    /// <param name="D">Word 3.</param>
    internal readonly record struct Words(Vector512<ulong> A, Vector512<ulong> B, Vector512<ulong> C, Vector512<ulong> D);
}
