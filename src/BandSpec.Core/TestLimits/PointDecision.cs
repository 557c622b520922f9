using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.TestLimits;

/// <summary>One point about which a decision rule decides; everything in %FS.</summary>
/// <param name="Mean">Mean of the process, <c>μ_v</c>.</param>
/// <param name="Sigma">Standard deviation of the process over lots, <c>σ_v</c>, without what counts as measurement.</param>
/// <param name="Uncertainty">Standard uncertainty of the test reading, <c>u_v</c>.</param>
/// <param name="Tolerance">Half width of the tolerance, <c>L_v</c>.</param>
internal readonly record struct PointDecision(double Mean, double Sigma, double Uncertainty, double Tolerance)
{
    /// <summary>
    /// The guard band of a rule. It is as wide as the tolerance when the rule can accept nothing, as when even a reading in the middle leaves more
    /// than the specific risk.
    /// <list type="bullet">
    /// <item>simple: 0.</item>
    /// <item>guarded: <c>g·2u_v</c>.</item>
    /// <item>specific risk r: <c>Q(w/u_v) + Q((2L_v − w)/u_v) = r</c>.</item>
    /// <item>global risk r: the smallest for which the consumer's risk of <see cref="ConformityRisk"/> is at most r.</item>
    /// </list>
    /// </summary>
    public double GuardBandOf(VerificationRules rules) => rules.Rule switch
    {
        DecisionRule.Simple => 0,
        DecisionRule.SpecificRisk => Math.Max(0, GuardBand.ForSpecificRisk(Uncertainty, 2 * Tolerance, rules.Risk!.Value) ?? Tolerance),
        DecisionRule.GlobalRisk => GuardBand.ForConsumerRisk(Mean, Sigma, Uncertainty, Interval.Symmetric(Tolerance), rules.Risk!.Value),
        _ => rules.GuardBand * 2 * Uncertainty,
    };

    /// <summary>
    /// The largest standard uncertainty with which a rule accepts something here, the process staying as it is; to one part in a million.
    /// </summary>
    /// <param name="rules">The rule.</param>
    /// <param name="accepts">Whether an acceptance limit, a half width in %FS, accepts anything once it is rounded.</param>
    public double LargestUncertainty(VerificationRules rules, Func<double, bool> accepts)
    {
        double enough = 0, tooMuch = Uncertainty;
        while (tooMuch - enough > 1e-6 * Uncertainty)
        {
            PointDecision tried = this with { Uncertainty = (enough + tooMuch) / 2 };
            if (accepts(Tolerance - tried.GuardBandOf(rules)))
                enough = tried.Uncertainty;
            else
                tooMuch = tried.Uncertainty;
        }

        return enough;
    }
}
