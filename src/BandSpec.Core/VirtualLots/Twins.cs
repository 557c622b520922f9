using System.Globalization;
using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.VirtualLots;

/// <summary>Puts the closed form's figures beside those of virtual lots.</summary>
internal static class Twins
{
    /// <summary>Every figure that has a twin: at each place of the map, over the profile, at each point of the verification test.</summary>
    public static IReadOnlyList<Twin> Of(Specification specification, LotLaw law, LotResult result) =>
        [
            .. specification.Bands.Nodes.SelectMany(node => OfNode(node, specification.Application.Requirement.Capability, law, result)),
            .. OfProfile(specification.Profile, law, result),
            .. specification.VerificationPoints.SelectMany((point, i) => OfPoint(point, i, result)),
        ];

    private static IEnumerable<Twin> OfNode(BandNode node, CapabilityTarget target, LotLaw law, LotResult result)
    {
        int index = law.Map.IndexOf(node.Region, node.Temperature, node.PressureFraction);
        if (index < 0)
            yield break;
        string place = string.Create(CultureInfo.InvariantCulture, $"x {node.PressureFraction} at {node.Temperature}, region {node.Region + 1}");
        (double fresh, double side, double centre) = law.Map.NominalAt(index);
        NodeFigures found = new(result.Tally, index, result.Order.LotSize);
        (double mean, double variance) = law.Traits.TruncationAt(ShapeValues.At(node.PressureFraction));
        BandSums closed = new(node.Added.Percent, node.SigmaSample.Percent, node.SigmaLongRun.Percent);
        BandSums expected = new(closed.Added + mean, Shifted(closed.Sample, variance), Shifted(closed.LongRun, variance));
        BandSums simulated = new(side * (centre + found.Off), found.SigmaSample, found.SigmaLongRun);

        yield return new Twin("mean", place, node.Mean.Percent, fresh + found.ResidueOff, found.ResidueError);
        foreach (Combination figure in Combinations(node, target, simulated))
            yield return new Twin(
                figure.Name, place, figure.Of(closed), figure.Of(simulated), found.ErrorOf(side * figure.PerAdded, figure.PerSample, figure.PerLongRun),
                figure.Of(expected) - figure.Of(closed));
    }

    private static double Shifted(double sigma, double variance) => Math.Sqrt(Math.Max(0, (sigma * sigma) + variance));

    /// <summary>The figures of a place that are made of what adds and of the two spreads, with their slopes at the simulated values.</summary>
    private static IEnumerable<Combination> Combinations(BandNode node, CapabilityTarget target, BandSums at)
    {
        double sample = 3 * target.Sample;
        double longRun = 3 * target.LongRun;
        double design = node.Design.Percent;
        yield return new Combination("added", s => s.Added, 1, 0, 0);
        yield return new Combination("sigma-sample", s => s.Sample, 0, 1, 0);
        yield return new Combination("sigma-long-run", s => s.LongRun, 0, 0, 1);
        yield return sample * node.SigmaSample.Percent > longRun * node.SigmaLongRun.Percent
            ? new Combination("maximum", s => s.Added + (sample * s.Sample), 1, sample, 0)
            : new Combination("maximum", s => s.Added + (longRun * s.LongRun), 1, 0, longRun);
        yield return new Combination("typical", s => s.Added + (3 * s.LongRun), 1, 0, 3);
        if (at.Sample == 0)
            yield break;
        double room = design - at.Added;
        yield return new Combination(
            "cpk-sample", s => (design - s.Added) / (3 * s.Sample), -1 / (3 * at.Sample), -room / (3 * at.Sample * at.Sample), 0);
        yield return new Combination(
            "cpk-long-run", s => (design - s.Added) / (3 * s.LongRun), -1 / (3 * at.LongRun), 0, -room / (3 * at.LongRun * at.LongRun));
    }

    /// <summary>What adds and the two spreads at a place, in %FS.</summary>
    private readonly record struct BandSums(double Added, double Sample, double LongRun);

    /// <summary>A figure made of them.</summary>
    private sealed record Combination(string Name, Func<BandSums, double> Of, double PerAdded, double PerSample, double PerLongRun);

    private static IEnumerable<Twin> OfProfile(ProfileFigures profile, LotLaw law, LotResult result)
    {
        double lots = result.LotsMade;
        (double sum, double squares) = result.Tally.UseSquare;
        double mean = sum / lots;
        double rms = Math.Sqrt(mean);
        double error = Math.Sqrt(Math.Max(0, (squares / lots) - (mean * mean)) / lots);
        yield return new Twin("rms-error", "", profile.RmsError.Percent, rms, rms > 0 ? error / (2 * rms) : 0);
        yield return OfCount("outside-probability", "", profile.OutsideProbability, (int)Counted.WorstUseOutside, UseWalk.Moments, result);
        yield return new Twin("age-factor", "", profile.AgeFactor, law.Traits.AgeFactor, 1e-6 * law.Traits.AgeFactor);
    }

    private static IEnumerable<Twin> OfPoint(VerificationPoint point, int index, LotResult result)
    {
        TallyPlan plan = result.Tally.Plan;
        yield return OfCount("consumer-risk", point.Id, point.ConsumerRisk, plan.ConsumerAt(index), 1, result);
        yield return OfCount("producer-risk", point.Id, point.ProducerRisk, plan.ProducerAt(index), 1, result);
    }

    /// <summary>
    /// The twin of a probability. The standard error is that of the closed form's value when the scatter of lots shows less, so that no event
    /// where few are expected is not taken for certainty.
    /// </summary>
    private static Twin OfCount(string figure, string place, double probability, int count, int triesPerUnit, LotResult result)
    {
        double lots = result.LotsMade;
        double tries = (double)result.UnitsMade * triesPerUnit;
        double sum = result.Tally.Sum(count);
        double scatter = Math.Sqrt(Math.Max(0, result.Tally.Squares(count) - (sum * sum / lots))) / tries;
        return new Twin(figure, place, probability, sum / tries, Math.Max(scatter, Math.Sqrt(probability * (1 - probability) / tries)));
    }
}
