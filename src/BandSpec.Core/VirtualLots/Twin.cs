namespace BandSpec.Core.VirtualLots;

/// <summary>A figure of the closed form beside the same figure of the virtual lots.</summary>
/// <param name="Figure">Its name as in the result file, such as <c>sigma-sample</c>.</param>
/// <param name="Place">Where, such as <c>x 0.3 at 85 °C, region 2</c>; empty for a figure of the whole.</param>
/// <param name="ClosedForm">The closed form's.</param>
/// <param name="Simulated">The virtual lots'.</param>
/// <param name="StandardError">Standard error of the latter, from the scatter of lots.</param>
/// <param name="Known">
/// By how much the virtual lots are expected to show more because no hysteresis of a unit is negative, which the closed form's normal law
/// allows; small, but more units make it visible.
/// </param>
public sealed record Twin(string Figure, string Place, double ClosedForm, double Simulated, double StandardError, double Known = 0)
{
    /// <summary>
    /// The difference in standard errors, less what is known of it, positive when the virtual lots show more; 0 for two equal figures without
    /// any error.
    /// </summary>
    public double Difference => Simulated == ClosedForm ? 0 : (Simulated - ClosedForm - Known) / StandardError;
}
