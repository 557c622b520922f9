using BandSpec.Core.Planning;
using BandSpec.Core.Specifying;

namespace BandSpec.Documents.Printing;

/// <summary>What fills the band, what would make a plan fit, and what an improvement buys, as it is shown.</summary>
internal sealed class DiagnosisViews(Specification specification, IReadOnlyList<RegionView> regions, string sign)
{
    private const double LeastGain = 0.0005;

    /// <summary>A page's worth: what moves the margin less is in the record of figures.</summary>
    private const int MostGains = 24;

    public DiagnosisView? Diagnosis => specification.Diagnosis is { } found
        ? new DiagnosisView(
            [.. Parts(found)], [.. found.Changes.OrderByDescending(c => c.Suffices).Select(Remedy)], [.. Gains()],
            found.Floor.Bound < 1, found.Changes.Any(c => c.Suffices), found.IsComplete)
        : null;

    private IEnumerable<PartView> Parts(Diagnosis found)
    {
        foreach (var term in found.BindingTerms.Concat(found.FloorTerms).Select(p => p.Term).Distinct())
        {
            TermPart? plan = found.BindingTerms.FirstOrDefault(p => p.Term == term), floor = found.FloorTerms.FirstOrDefault(p => p.Term == term);
            yield return new PartView(
                term.Key, TermGroups.Of(term.Key) == TermGroups.Further ? term.Key : "", Part(plan), Share(plan), Part(floor), Share(floor));
        }
    }

    private string Part(TermPart? part) => part is null ? "" : Rounded.Nearest(part.Part, 3).Shown(sign);

    private string Share(TermPart? part) => part is null ? "" : Rounded.Nearest(100 * part.Share, 1).Shown(sign);

    private RemedyView Remedy(SingleChange change) => new(
        change.Key, change.Region is { } r ? regions[r] : null, Value(change, change.Before), change.After is { } after ? Value(change, after) : "",
        Value(change, change.Furthest), change.Suffices, change.Before == change.Furthest,
        change.Plan is { } plan ? string.Join("; ", plan.Temperatures.Select(t => Given(t.Celsius))) : "");

    /// <summary>A figure with its unit; what is scaled as a whole in percent of what it is.</summary>
    private string Value(SingleChange change, double value) => change.Key is "pressure-standard" or "ageing"
        ? $"{Given(Math.Round(100 * value, 6))} %"
        : change.Unit.Length > 0 ? $"{Given(value)} {change.Unit}" : Given(value);

    private IEnumerable<GainView> Gains() => (specification.Gains ?? [])
        .Where(g => Math.Abs(g.Gain) >= LeastGain).OrderByDescending(g => Math.Abs(g.Gain)).Take(MostGains)
        .Select(g => new GainView(
            g.Key, g.Unit.Length > 0 ? $"{Given(g.Step)} {g.Unit}" : Given(g.Step), (g.Gain > 0 ? "+" : "") + Rounded.Nearest(g.Gain, 3).Shown(sign)));

    private string Given(double value) => Rounded.Given(value).Shown(sign);
}
