using BandSpec.Core.Numerics;
using BandSpec.Core.Numerics.RareEvents;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Deciding;

/// <summary>What can happen to a unit in its test and in use, as events about the numbers of its law.</summary>
internal sealed class UnitEvents(UnitLaw law, Application application)
{
    /// <summary>The two numbers of the standard follow those of the unit where readings are events themselves.</summary>
    private const int Standards = 2;

    /// <summary>That what a unit truly shows is beyond the tolerance at some test place; the output's step there is a number of its own.</summary>
    public HalfSpaces BeyondTolerance(IReadOnlyList<VerificationPoint> points)
    {
        HalfSpaces events = new(law.Dimensions, points.Count);
        for (int v = 0; v < points.Count; v++)
            foreach (int side in new[] { -1, 1 })
                Add(events, law.Shown(v), side, points[v].Tolerance.Percent, v);
        return events;
    }

    /// <summary>That a reading lies outside its acceptance limits at some test place.</summary>
    public HalfSpaces Rejected(IReadOnlyList<VerificationPoint> points)
    {
        HalfSpaces events = new(law.Dimensions + Standards, points.Count);
        for (int v = 0; v < points.Count; v++)
        {
            LinearError shown = law.Shown(v);
            (double own, double zero, double common) = law.ReadingErrors(v);
            Interval accepted = AcceptedAt(points[v]);
            LinearError read = new(shown.Mean, [.. shown.Weights, zero, common], Math.Sqrt((own * own) + (shown.Own * shown.Own)));
            Add(events, read, 1, accepted.Upper, v);
            Add(events, read, -1, -accepted.Lower, v);
        }

        return events;
    }

    /// <summary>That a unit leaves the allowed error somewhere in use, new or at the end of life.</summary>
    /// <param name="nodes">How many places of use there are, and what is allowed at each, %FS.</param>
    /// <param name="given">Changes each error as far as something is known of the unit.</param>
    public HalfSpaces Leaving(IReadOnlyList<double> nodes, Func<LinearError, LinearError>? given = null)
    {
        HalfSpaces events = new(law.Dimensions, nodes.Count);
        for (int node = 0; node < nodes.Count; node++)
            foreach ((int side, int age) in UnitLaw.Sides)
            {
                LinearError error = law.Used(node, side, age);
                Add(events, given is null ? error : given(error), 1, nodes[node], node);
            }

        return events;
    }

    /// <summary>The test readings by which a unit is accepted, about the numbers of the unit alone: all that the test adds is noise then.</summary>
    public Readings Readings(IReadOnlyList<VerificationPoint> points)
    {
        Readings readings = new(law.Dimensions, law.ReadingErrors(0).CommonZero);
        for (int v = 0; v < points.Count; v++)
        {
            LinearError shown = law.Shown(v);
            (double own, _, double common) = law.ReadingErrors(v);
            Interval accepted = AcceptedAt(points[v]);
            readings.Add(
                shown.Weights, new Reading(shown.Mean, accepted.Lower, accepted.Upper, Math.Sqrt((own * own) + (shown.Own * shown.Own)), common));
        }

        return readings;
    }

    /// <summary>The acceptance limits of a point as errors, %FS.</summary>
    public Interval AcceptedAt(VerificationPoint point) => AcceptanceLimits.InPercent(
        application.Requirement.Output, point.PressureFraction, (decimal)point.Lower, (decimal)point.Upper);

    /// <summary><c>side·error ≥ threshold</c>; what cannot scatter and does not happen is left out, for it has no law to be drawn from.</summary>
    private static void Add(HalfSpaces events, LinearError error, int side, double threshold, int group)
    {
        double room = threshold - (side * error.Mean);
        if (error.Sigma == 0 && room > 0)
            return;
        events.Add([.. error.Weights.Select(w => side * w)], room, error.Own, group);
    }
}
