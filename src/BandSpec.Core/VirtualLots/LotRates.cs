using System.Globalization;

namespace BandSpec.Core.VirtualLots;

/// <summary>Shares of units, read from the counts of a result.</summary>
/// <param name="result">The result.</param>
internal sealed class LotRates(LotResult result)
{
    private const int Accepted = (int)Counted.Accepted;

    private readonly LotTally tally = result.Tally;

    /// <summary>The share in all units made.</summary>
    public Rate OfUnits(int count)
    {
        double sum = tally.Sum(count);
        return Rate.Over(tally.Lots, tally.Sum(count), result.UnitsMade, tally.Squares(count) - (sum * sum / tally.Lots));
    }

    /// <summary>The share in the accepted units.</summary>
    public Rate OfAccepted(int count) => OfAccepted(count, 1);

    /// <summary>The share in all moments of use of the accepted units.</summary>
    public Rate OfAcceptedMoments(int count) => OfAccepted(count, UseWalk.Moments);

    /// <summary>The share of rejected units in the good ones; how their number scatters from lot to lot is taken from the rejected alone.</summary>
    public Rate GoodRejected()
    {
        const int Count = (int)Counted.GoodRejected;
        double sum = tally.Sum(Count);
        return Rate.Over(tally.Lots, tally.Sum(Count), tally.Sum((int)Counted.Good), tally.Squares(Count) - (sum * sum / tally.Lots));
    }

    /// <summary>The steps of production and life.</summary>
    /// <param name="temperatures">The temperatures of the verification test, in its order.</param>
    public IReadOnlyList<LotStep> Steps(IReadOnlyList<double> temperatures) =>
        [
            .. temperatures.Select((celsius, stage) => new LotStep(
                string.Create(CultureInfo.InvariantCulture, $"verified at {celsius} °C"), OfUnits(tally.Plan.PassedStage(stage)))),
            new LotStep("accepted and within the allowed error when new", Staying((int)Counted.AcceptedLeavingNew)),
            new LotStep("accepted and within the allowed error over life", Staying((int)Counted.AcceptedLeaving)),
        ];

    /// <summary>The share in all units of those accepted that do not leave: accepted less leaving, lot by lot.</summary>
    private Rate Staying(int leaving)
    {
        long sum = tally.Sum(Accepted) - tally.Sum(leaving);
        double squares = tally.Squares(Accepted) - (2 * tally.WithAccepted(leaving)) + tally.Squares(leaving);
        return Rate.Over(tally.Lots, sum, result.UnitsMade, squares - ((double)sum * sum / tally.Lots));
    }

    private Rate OfAccepted(int count, int tries)
    {
        long accepted = tally.Sum(Accepted) * tries;
        double share = accepted > 0 ? (double)tally.Sum(count) / accepted : 0;
        double scatter = tally.Squares(count) - (2 * share * tries * tally.WithAccepted(count))
            + (share * share * tries * tries * tally.Squares(Accepted));
        return Rate.Over(tally.Lots, tally.Sum(count), accepted, scatter);
    }
}
