using BandSpec.Core.Specifying;
using BandSpec.Core.VirtualLots;
using Xunit;

namespace BandSpec.Tests.VirtualLots;

public sealed class LotRunTests
{
    private static readonly Lazy<Specification> Demo = new(() => SpecificationDraft.Draft(Given.Application()));

    private static LotSubject Subject => LotSubject.Of(Demo.Value);

    [Fact]
    public void The_result_does_not_depend_on_the_number_of_threads()
    {
        LotOrder order = LotOrder.For(4_000, 400, 1);
        LotResult one = LotRun.Make(Subject, order, 1);
        Assert.Equal(one.Figures, LotRun.Make(Subject, order, 2).Figures);
        Assert.Equal(one.Figures, LotRun.Make(Subject, order, 5).Figures);
    }

    // Own value, kept so that a change of any stream, of any order of operations or of the machine's arithmetic shows; no outside source.
    // The same with AVX-512, with AVX2 and with neither (DOTNET_EnableAVX512=0, DOTNET_EnableAVX2=0, DOTNET_EnableHWIntrinsic=0).
    [Fact]
    public void The_bits_of_a_lot_stay_what_they_are()
    {
        LotResult result = LotRun.Make(Subject, LotOrder.For(1_600, 400, 20261124), 2);
        ulong folded = 0;
        foreach (Int128 figure in result.Figures)
            folded = (folded * 0x9E37_79B9_7F4A_7C15) ^ (ulong)figure ^ (ulong)(figure >> 64);
        Assert.Equal(12236404681123247731UL, folded);
    }

    [Fact]
    public void A_cancelled_run_equals_a_run_of_the_lots_it_got_to()
    {
        using CancellationTokenSource source = new();
        LotOrder order = LotOrder.For(40_000, 400, 1);
        LotResult stopped = LotRun.Make(Subject, order, 2, new StopAfter(20, source), source.Token);
        Assert.False(stopped.IsComplete);
        Assert.InRange(stopped.LotsMade, 20, 99);
        LotResult same = LotRun.Make(Subject, LotOrder.For(stopped.UnitsMade, 400, 1), 1);
        Assert.Equal(same.Figures, stopped.Figures);
    }

    private sealed class StopAfter(long lots, CancellationTokenSource source) : IProgress<LotProgress>
    {
        public void Report(LotProgress value)
        {
            if (value.Made >= lots)
                source.Cancel();
        }
    }
}
