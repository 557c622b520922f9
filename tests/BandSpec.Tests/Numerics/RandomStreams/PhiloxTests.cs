using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics.RandomStreams;
using Xunit;

namespace BandSpec.Tests.Numerics.RandomStreams;

public sealed class PhiloxTests
{
    // Random123, file tests/kat_vectors, lines philox4x32 with 10 rounds (D. E. Shaw Research); status: found, copied in many public test suites.
    [Theory]
    [InlineData(new uint[] { 0, 0, 0, 0 }, 0u, 0u, new uint[] { 0x6627e8d5, 0xe169c58d, 0xbc57ac4c, 0x9b00dbd8 })]
    [InlineData(
        new uint[] { 0xffffffff, 0xffffffff, 0xffffffff, 0xffffffff }, 0xffffffff, 0xffffffff,
        new uint[] { 0x408f276d, 0x41c83b0e, 0xa20bc7c6, 0x6d5451fd })]
    [InlineData(
        new uint[] { 0x243f6a88, 0x85a308d3, 0x13198a2e, 0x03707344 }, 0xa4093822, 0x299f31d0,
        new uint[] { 0xd16cfe09, 0x94fdcceb, 0x5001e420, 0x24126ea1 })]
    public void Philox_gives_the_published_known_answers(uint[] counter, uint keyEven, uint keyOdd, uint[] expected)
    {
        Philox.Words words = Philox.Turn(
            new(Vector512.Create((ulong)counter[0]), Vector512.Create((ulong)counter[1]),
                Vector512.Create((ulong)counter[2]), Vector512.Create((ulong)counter[3])),
            keyEven | ((ulong)keyOdd << 32));
        Assert.Equal(expected, new[] { words.A, words.B, words.C, words.D }.Select(w => (uint)w[0]));
        Assert.All(new[] { words.A, words.B, words.C, words.D }, w => Assert.Equal(Vector512.Create(w[0]), w));
    }

    [Fact]
    public void Eight_lanes_equal_a_plain_scalar_rendering_of_the_paper()
    {
        for (uint i = 0; i < 200; i++)
        {
            Vector512<ulong> units = Vector512.Create((ulong)i * 8) + RandomStream.LaneNumbers;
            Philox.Words words = Philox.Turn(new(Vector512.Create((ulong)i), Vector512.Create(5UL), units, Vector512.Create(9UL)), 0x1234_5678_9ABC_DEF0);
            for (int lane = 0; lane < 8; lane++)
            {
                uint[] plain = Plain([i, 5, (i * 8) + (uint)lane, 9], 0x9ABC_DEF0, 0x1234_5678);
                Assert.Equal(plain, new[] { (uint)words.A[lane], (uint)words.B[lane], (uint)words.C[lane], (uint)words.D[lane] });
            }
        }
    }

    private static uint[] Plain(uint[] c, uint k0, uint k1)
    {
        for (int round = 0; round < 10; round++, k0 += 0x9E3779B9, k1 += 0xBB67AE85)
        {
            ulong first = 0xD2511F53UL * c[0];
            ulong second = 0xCD9E8D57UL * c[2];
            c = [(uint)(second >> 32) ^ c[1] ^ k0, (uint)second, (uint)(first >> 32) ^ c[3] ^ k1, (uint)first];
        }
        return c;
    }
}
