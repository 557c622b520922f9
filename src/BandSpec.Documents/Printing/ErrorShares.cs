using BandSpec.Core.Bands;

namespace BandSpec.Documents.Printing;

/// <summary>
/// What the allowed error of a point is spent on, in percent of it. What adds goes to the terms in proportion to their own magnitudes;
/// what scatters is shared in proportion to the variances, since variances add. The rest is the safety factor's part and what is unused.
/// </summary>
internal sealed record ErrorShares(IReadOnlyList<double> Terms, double Safety, double Unused)
{
    public static ErrorShares Of(BandNode node, double sampleCriterion, double longRunCriterion)
    {
        double allowed = node.Allowed.Percent, spread = node.Maximum.Percent - node.Added.Percent;
        // The criterion that makes the band is the one whose variances share it out.
        var sample = sampleCriterion * node.SigmaSample.Percent >= longRunCriterion * node.SigmaLongRun.Percent;
        var variances = node.Terms.Select(t => sample ? t.SigmaSample.Percent : t.SigmaLongRun.Percent).Select(s => s * s).ToList();
        double added = node.Terms.Sum(t => t.Added.Percent), variance = variances.Sum();
        double Taken(TermShare t, int i) => Part(t.Added.Percent, added) * node.Added.Percent + Part(variances[i], variance) * spread;
        var terms = node.Terms.Select((t, i) => 100 / allowed * Taken(t, i)).ToList();
        var design = 100 * node.Design.Percent / allowed;
        return new ErrorShares(terms, 100 - design, Math.Max(0, design - 100 * node.Maximum.Percent / allowed));
    }

    private static double Part(double value, double sum) => sum > 0 ? value / sum : 0;
}
