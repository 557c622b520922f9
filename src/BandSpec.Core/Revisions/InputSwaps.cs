using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;

namespace BandSpec.Core.Revisions;

/// <summary>Swaps parts of the newer inputs into the older ones.</summary>
internal sealed class InputSwaps(Comparison comparison)
{
    private readonly ApplicationInputs old = ApplicationInputs.Of(comparison.Old.Application);
    private readonly ApplicationInputs now = ApplicationInputs.Of(comparison.New.Application);

    /// <summary>The groups that changed, each with those it does not fit the older inputs without.</summary>
    public IEnumerable<IReadOnlyList<InputGroup>> Groups()
    {
        List<InputGroup> changed = [.. InputGroup.All.Where(group => Comparison.InputsBetween(old, group.Swap(old, now)).Count > 0)];
        HashSet<InputGroup> taken = [];
        foreach (InputGroup group in changed)
        {
            if (taken.Contains(group) && FindingsWith([group]) > 0)
                continue;
            IReadOnlyList<InputGroup> fitting = Fitting(group, changed);
            taken.UnionWith(fitting);
            yield return fitting;
        }
    }

    /// <summary>What the groups' change does alone.</summary>
    public Cause CauseOf(IReadOnlyList<InputGroup> groups, CancellationToken cancellation)
    {
        cancellation.ThrowIfCancellationRequested();
        ApplicationInputs swapped = Swapped(groups);
        Application? application = swapped.Check().Value;
        return new Cause(
            [.. groups.Select(group => (group.Subject, group.Name))],
            Comparison.InputsBetween(old, swapped),
            application is null ? null : Comparison.Of(comparison.Old, SpecificationDraft.Draft(application, null, cancellation: cancellation)).Outcome);
    }

    /// <summary>
    /// A group, and one after the other the group that takes away most of what is still found against the swapped inputs, until nothing is.
    /// </summary>
    private List<InputGroup> Fitting(InputGroup first, List<InputGroup> changed)
    {
        List<InputGroup> set = [first];
        while (FindingsWith(set) is > 0 and var found)
        {
            InputGroup? next = changed.Except(set).Where(group => FindingsWith([.. set, group]) < found).MinBy(group => FindingsWith([.. set, group]));
            if (next is null)
                break;
            set.Add(next);
        }

        return [.. set.OrderBy(changed.IndexOf)];
    }

    private int FindingsWith(IReadOnlyList<InputGroup> groups) => Swapped(groups).Check().Findings.Count;

    private ApplicationInputs Swapped(IReadOnlyList<InputGroup> groups) => groups.Aggregate(old, (inputs, group) => group.Swap(inputs, now));
}
