using BandSpec.Core.Residuals;

namespace BandSpec.Core.Allocating;

/// <summary>The multipliers of an allocation, to be asked by term and region.</summary>
internal sealed class Multipliers
{
    private readonly Dictionary<(string Term, int? Region), double> values;

    private Multipliers(Dictionary<(string Term, int? Region), double> values) => this.values = values;

    /// <summary>The multipliers of a finished allocation.</summary>
    public static Multipliers Of(Allocation allocation) =>
        new(allocation.Terms.ToDictionary(t => (t.Term.Key, t.Region), t => t.Multiplier));

    /// <summary>The multiplier of a term in a region; 1 for a fixed term and for one without scatter.</summary>
    public double Of(ErrorTerm term, int region) =>
        values.GetValueOrDefault((term.Key, term.Scope == TermScope.Region ? region : null), 1);
}
