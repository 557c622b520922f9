using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>The plan that the search settled on, and how sure it is.</summary>
/// <param name="Plan">The best plan; the one of largest margin when none is feasible.</param>
/// <param name="Run">Its chamber run.</param>
/// <param name="PlansConsidered">How many candidate plans the answer holds against.</param>
/// <param name="Proven">Whether the answer is proven over all candidates.</param>
public sealed record PlanChoice(CompensationPlan Plan, ChamberRun Run, long PlansConsidered, bool Proven);
