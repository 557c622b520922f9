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
        double added = side * (centre + found.Off);
        double sample = 3 * target.Sample;
        double longRun = 3 * target.LongRun;
        bool sampleGoverns = sample * node.SigmaSample.Percent > longRun * node.SigmaLongRun.Percent;
        double maximum = added + (sampleGoverns ? sample * found.SigmaSample : longRun * found.SigmaLongRun);
        double room = node.Design.Percent - added;

        yield return new Twin("mean", place, node.Mean.Percent, fresh + found.ResidueOff, found.ResidueError);
        yield return new Twin("added", place, node.Added.Percent, added, found.ErrorOf(side, 0, 0));
        yield return new Twin("sigma-sample", place, node.SigmaSample.Percent, found.SigmaSample, found.ErrorOf(0, 1, 0));
        yield return new Twin("sigma-long-run", place, node.SigmaLongRun.Percent, found.SigmaLongRun, found.ErrorOf(0, 0, 1));
        yield return new Twin(
            "maximum", place, node.Maximum.Percent, maximum,
            sampleGoverns ? found.ErrorOf(side, sample, 0) : found.ErrorOf(side, 0, longRun));
        yield return new Twin("typical", place, node.Typical.Percent, added + (3 * found.SigmaLongRun), found.ErrorOf(side, 0, 3));
        if (found.SigmaSample == 0)
            yield break;
        double cpkSample = room / (3 * found.SigmaSample);
        double cpkLongRun = room / (3 * found.SigmaLongRun);
        yield return new Twin(
            "cpk-sample", place, node.CpkSample, cpkSample, found.ErrorOf(-side / (3 * found.SigmaSample), -cpkSample / found.SigmaSample, 0));
        yield return new Twin(
            "cpk-long-run", place, node.CpkLongRun, cpkLongRun,
            found.ErrorOf(-side / (3 * found.SigmaLongRun), 0, -cpkLongRun / found.SigmaLongRun));
    }

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
