using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Allocating;

/// <summary>A multiplier to be found: a term, and the region it belongs to when regions do not share it.</summary>
/// <param name="Term">The term.</param>
/// <param name="Region">Index of the region; <see langword="null"/> when all regions share the multiplier.</param>
internal sealed record Slot(ErrorTerm Term, int? Region);

/// <summary>
/// One inequality <c>M + 3C·√(fixed + Σ m_i² s_i² + Σ 2 m_i m_j max(0, c_ij)) ≤ D</c>: a node under one of the two criteria.
/// </summary>
/// <param name="Room"><c>((D − M)/(3C))²</c>, or less than 0 when <c>M &gt; D</c>, in (%FS)².</param>
/// <param name="Fixed">Variance of the fixed terms.</param>
/// <param name="Variances">For each acting slot its index and <c>s_i² &gt; 0</c>.</param>
/// <param name="Covariances">For pairs of acting slots their indices and <c>c_ij &gt; 0</c>.</param>
internal sealed record Budget(
    double Room, double Fixed, IReadOnlyList<(int Slot, double Variance)> Variances,
    IReadOnlyList<(int First, int Second, double Covariance)> Covariances);

/// <summary>The slots and budgets of an application's band.</summary>
internal sealed class Budgets
{
    private static readonly ErrorTerm[] Residues = [ErrorTerm.ZeroResidue, ErrorTerm.SpanResidue, ErrorTerm.LinearityResidue];
    private readonly List<Slot> slots = [];
    private readonly Dictionary<Slot, int> indices = [];

    public Budgets(Requirement requirement, BandMap bands, BandFormulas formulas)
    {
        foreach (BandNode node in bands.Nodes)
            foreach (TermShare share in node.Terms)
                if (share.Term.Scope != TermScope.Fixed && share.SigmaLongRun.Percent > 0)
                    SlotOf(share.Term, node.Region);
        All = [.. bands.Nodes.SelectMany(n => BudgetsOf(n, requirement.Capability, formulas))];
    }

    /// <summary>Every slot that has scatter somewhere.</summary>
    public IReadOnlyList<Slot> Slots => slots;

    /// <summary>Two budgets a node: sample criterion, then long-run criterion.</summary>
    public IReadOnlyList<Budget> All { get; }

    private int SlotOf(ErrorTerm term, int region)
    {
        var slot = new Slot(term, term.Scope == TermScope.Region ? region : null);
        if (!indices.TryGetValue(slot, out int index))
        {
            indices.Add(slot, index = slots.Count);
            slots.Add(slot);
        }

        return index;
    }

    private IEnumerable<Budget> BudgetsOf(BandNode node, CapabilityTarget target, BandFormulas formulas)
    {
        ResidueShares shares = formulas.SharesAt(node.PressureFraction, node.Temperature);
        yield return BudgetOf(node, target.Sample, shares.Within, s => s.SigmaSample.Percent);
        yield return BudgetOf(node, target.LongRun, shares.LongRun, s => s.SigmaLongRun.Percent);
    }

    private Budget BudgetOf(BandNode node, double capability, double[,] residue, Func<TermShare, double> sigma)
    {
        double room = (node.Design.Percent - node.Added.Percent) / (3 * capability);
        List<(int, double)> variances = [];
        double fixedVariance = 0;
        foreach (TermShare share in node.Terms)
        {
            double variance = sigma(share) * sigma(share);
            if (share.Term.Scope == TermScope.Fixed)
                fixedVariance += variance;
            else if (variance > 0)
                variances.Add((SlotOf(share.Term, node.Region), variance));
        }

        return new Budget(room < 0 ? -1 : room * room, fixedVariance, variances, CovariancesOf(node.Region, residue));
    }

    /// <summary>Covariances between residues; a helpful, negative one gets no credit.</summary>
    private List<(int, int, double)> CovariancesOf(int region, double[,] residue)
    {
        List<(int, int, double)> pairs = [];
        for (int i = 0; i < Residues.Length; i++)
            for (int j = i + 1; j < Residues.Length; j++)
                if (residue[i, j] > 0)
                    pairs.Add((SlotOf(Residues[i], region), SlotOf(Residues[j], region), residue[i, j]));
        return pairs;
    }
}
