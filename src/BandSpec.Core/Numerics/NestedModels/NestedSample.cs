namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>Readings within units within lots, reduced unit by unit.</summary>
/// <param name="Coefficients">How many coefficients every unit's curve has, <c>q</c>.</param>
/// <param name="Lots">The lots, each with at least one unit.</param>
internal sealed record NestedSample(int Coefficients, IReadOnlyList<IReadOnlyList<UnitSummary>> Lots)
{
    /// <summary>How many readings there are in all, <c>n</c>.</summary>
    public int Readings { get; } = Lots.Sum(lot => lot.Sum(unit => unit.Count));

    /// <summary>How many units there are in all.</summary>
    public int Units { get; } = Lots.Sum(lot => lot.Count);

    /// <summary>The same readings on fewer coefficients.</summary>
    public NestedSample WithColumns(IReadOnlyList<int> chosen) =>
        new(chosen.Count, [.. Lots.Select(lot => lot.Select(unit => unit.WithColumns(chosen)).ToList())]);
}
