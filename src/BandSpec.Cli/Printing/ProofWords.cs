using System.Globalization;
using BandSpec.Core.Planning;
using BandSpec.Core.Specifying;

namespace BandSpec.Cli.Printing;

/// <summary>How far the proof of a choice got, in words.</summary>
internal static class ProofWords
{
    private static readonly CultureInfo Plain = CultureInfo.InvariantCulture;

    /// <summary>What a choice holds against.</summary>
    public static string Of(Specification specification) => specification.Optimum switch
    {
        { Proven: false } stopped => string.Create(Plain, $"not proven: the search was stopped when {Settled(stopped)} plans were decided or discarded"),
        var proven when specification.Application.Requirement.Compensation.Pinned is not null =>
            string.Create(Plain, $"a plan that the requirement pins; held against {proven.PlansConsidered:N0} plans"),
        var proven => string.Create(Plain, $"proven over {proven.PlansConsidered:N0} plans"),
    };

    /// <summary>The message about a draft that was stopped.</summary>
    public static string Stopped(Specification specification) => $"{specification.Application.Requirement.Identity.FolderName}: " + specification switch
    {
        { Optimum.Proven: false } =>
            $"stopped when {Settled(specification.Optimum)} plans were decided or discarded; its package holds the best plan so far, marked as not proven",
        { Diagnosis.IsComplete: false } => "stopped while changes were looked for that would make a plan fit; its package has those that were found",
        { Decisions: null } => "stopped when its plan was proven; its package leaves out the decision rules",
        _ => "stopped when its plan was proven; its package leaves out what an improvement buys",
    };

    private static string Settled(PlanChoice choice)
    {
        long settled = Math.Min(choice.PlansDecided + choice.PlansDiscarded, choice.PlansConsidered);
        return string.Create(Plain, $"{settled:N0} of {choice.PlansConsidered:N0}");
    }
}
