using BandSpec.Core.Specifying;
using BandSpec.Core.VirtualLots;
using CsCheck;
using Xunit;

namespace BandSpec.Tests.VirtualLots;

public sealed class LotGatheringTests
{
    private static readonly Lazy<LotSubject> Subject = new(() => LotSubject.Of(SpecificationDraft.Draft(Given.Application())));
    private static readonly LotOrder Order = LotOrder.For(1_000, 16, 5);

    private static LotResult Part(int part, int parts) => LotRun.Make(Subject.Value, Order.InPart(part, parts), 1);

    [Fact]
    public void Parts_in_any_order_equal_one_run_bit_for_bit()
    {
        LotResult whole = LotRun.Make(Subject.Value, Order, 2);
        Gen.Int[1, 9].SelectMany(n => Gen.Shuffle(Enumerable.Range(1, n).ToArray())).Sample(
            parts =>
            {
                GatheredLots gathered = LotGathering.Gather([.. parts.Select(p => Part(p, parts.Length))]);
                Assert.Empty(gathered.Findings);
                Assert.Equal(whole.Figures, gathered.Result!.Figures);
                Assert.True(gathered.Result.IsComplete);
            },
            iter: 8, threads: 1);
    }

    [Fact]
    public void A_missing_part_is_named_and_the_rest_still_counts()
    {
        GatheredLots gathered = LotGathering.Gather([Part(1, 4), Part(4, 4), Part(3, 4)]);
        PartFinding finding = Assert.Single(gathered.Findings);
        LotOrder lost = Order.InPart(2, 4);
        Assert.Equal(new PartFinding(PartFault.Missing, null, new LotRange(lost.FirstLot, lost.EndLot)), finding);
        Assert.Equal(Order.Lots - (lost.EndLot - lost.FirstLot), gathered.Result!.LotsMade);
        Assert.False(gathered.Result.IsComplete);
    }

    [Fact]
    public void A_part_given_twice_is_refused()
    {
        GatheredLots gathered = LotGathering.Gather([Part(1, 2), Part(2, 2), Part(1, 2)]);
        Assert.Null(gathered.Result);
        Assert.Equal((PartFault.Duplicate, 2), (gathered.Findings[0].Fault, gathered.Findings[0].Part));
    }

    [Fact]
    public void Parts_cut_differently_may_fit_but_not_overlap()
    {
        Assert.Empty(LotGathering.Gather([Part(1, 2), Part(3, 4), Part(4, 4)]).Findings);
        Assert.Equal(PartFault.Duplicate, LotGathering.Gather([Part(1, 2), Part(2, 3), Part(3, 3)]).Findings[0].Fault);
    }

    [Fact]
    public void Parts_of_another_seed_or_specification_are_foreign()
    {
        LotResult seed = LotRun.Make(Subject.Value, LotOrder.For(1_000, 16, 6).InPart(2, 2), 1);
        LotSubject warmer = Subject.Value with { Station = Given.Station with { SoakGradient = Given.K(0.26) } };
        LotResult other = LotRun.Make(warmer, Order.InPart(2, 2), 1);
        foreach (LotResult foreign in new[] { seed, other })
            Assert.Equal((PartFault.Foreign, 1), (LotGathering.Gather([Part(1, 2), foreign]).Findings[0].Fault, 1));
    }
}
