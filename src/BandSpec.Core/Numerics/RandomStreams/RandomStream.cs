using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.Numerics.RandomStreams;

/// <summary>
/// A stream of random numbers with a name: draw number <c>d</c> of unit <c>u</c> is a function of root seed, name, <c>u</c> and <c>d</c> and
/// of nothing else. A source that is added, or drawn more often, therefore leaves all others as they were, and two runs that differ in one
/// input share their chance. The default value is the stream with key 0.
/// </summary>
internal readonly record struct RandomStream
{
    private readonly ulong key;

    private RandomStream(ulong key) => this.key = key;

    /// <summary>The stream of that name under a root seed.</summary>
    public static RandomStream Named(string name, ulong rootSeed)
    {
        // FNV-1a (Fowler, Noll, Vo; offset and prime of the 64-bit form) spells the name, SplitMix64's finaliser spreads it together with the seed.
        ulong hash = 0xCBF2_9CE4_8422_2325;
        foreach (char letter in name)
            hash = (hash ^ letter) * 0x0000_0100_0000_01B3;
        return new RandomStream(Spread(hash ^ Spread(rootSeed)));
    }

    /// <summary>Lane numbers 0 … 7, to make eight neighbouring units from the first.</summary>
    public static Vector512<ulong> LaneNumbers => Vector512.Create(0UL, 1, 2, 3, 4, 5, 6, 7);

    /// <summary>Two independent uniform numbers of each of eight units, multiples of 2⁻⁵² in [0, 1).</summary>
    /// <param name="units">The units' numbers.</param>
    /// <param name="draw">Which draw of the unit, counted in pairs.</param>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public (Lanes First, Lanes Second) Uniforms(Vector512<ulong> units, uint draw)
    {
        Philox.Words words = Turn(units, draw);
        return (FromOneToTwo(words.A, words.B) - Lanes.One, FromOneToTwo(words.C, words.D) - Lanes.One);
    }

    /// <summary>
    /// Two independent standard normal numbers of each of eight units (Box and Muller 1958): radius <c>√(−2 ln v)</c> with <c>v</c> a multiple
    /// of 2⁻⁵² in (0, 1], so that no number exceeds 8.49.
    /// </summary>
    /// <param name="units">The units' numbers.</param>
    /// <param name="draw">Which draw of the unit, counted in pairs.</param>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public (Lanes First, Lanes Second) Normals(Vector512<ulong> units, uint draw)
    {
        Philox.Words words = Turn(units, draw);
        Lanes v = Vector512.Create(2.0) - FromOneToTwo(words.A, words.B);
        Lanes radius = Vector512.Sqrt(Vector512.Create(-2.0) * LaneFunctions.Log(v));
        (Lanes sine, Lanes cosine) = LaneFunctions.SineAndCosineOfTurns(FromOneToTwo(words.C, words.D) - Lanes.One);
        return (radius * cosine, radius * sine);
    }

    /// <summary>
    /// Fills a list with standard normal numbers, one vector of eight units for each place; place <c>i</c> is half of draw <c>first + i/2</c>,
    /// whatever the length of the list.
    /// </summary>
    public void FillNormals(Vector512<ulong> units, uint first, Span<Lanes> target)
    {
        int pairs = target.Length / 2;
        for (int i = 0; i < pairs; i++)
            (target[2 * i], target[(2 * i) + 1]) = Normals(units, first + (uint)i);
        if ((target.Length & 1) == 1)
            target[^1] = Normals(units, first + (uint)pairs).First;
    }

    /// <summary>
    /// Normal numbers of mean <paramref name="mean"/> and standard deviation <paramref name="sigma"/> before truncation, none negative:
    /// what falls below zero is drawn again. With a mean that is not negative at least half of the draws stand, so that the 64 that are made
    /// miss with probability below 2⁻⁶⁴; a lane that still missed is 0.
    /// </summary>
    public Lanes TruncatedNormals(Vector512<ulong> units, uint first, double mean, double sigma)
    {
        const uint Attempts = 64;
        Lanes result = Lanes.Zero;
        Lanes open = Lanes.AllBitsSet;
        for (uint attempt = 0; attempt < Attempts && Vector512.LessThanAny(open.AsInt64(), Vector512<long>.Zero); attempt++)
        {
            Lanes value = Vector512.FusedMultiplyAdd(Vector512.Create(sigma), Normals(units, first + attempt).First, Vector512.Create(mean));
            Lanes stands = Vector512.GreaterThanOrEqual(value, Lanes.Zero) & open;
            result = Vector512.ConditionalSelect(stands, value, result);
            open = Vector512.AndNot(open, stands);
        }
        return result;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private Philox.Words Turn(Vector512<ulong> units, uint draw) =>
        Philox.Turn(new(Vector512.Create((ulong)draw), Vector512<ulong>.Zero, units & Vector512.Create(0xFFFF_FFFFUL), units >>> 32), key);

    /// <summary>The upper 52 of 64 bits as the fraction of a number in [1, 2).</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Lanes FromOneToTwo(Vector512<ulong> upper, Vector512<ulong> lower) =>
        ((((upper << 32) | lower) >>> 12) | Vector512.Create(0x3FF0_0000_0000_0000UL)).AsDouble();

    private static ulong Spread(ulong value)
    {
        value += 0x9E37_79B9_7F4A_7C15;
        value = (value ^ (value >> 30)) * 0xBF58_476D_1CE4_E5B9;
        value = (value ^ (value >> 27)) * 0x94D0_49BB_1331_11EB;
        return value ^ (value >> 31);
    }
}
