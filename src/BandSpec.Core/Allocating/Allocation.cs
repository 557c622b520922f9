using BandSpec.Core.Quantities;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Allocating;

/// <summary>How the allowed error was shared out among the terms.</summary>
/// <param name="Terms">Each term's share: region terms once for each region, then the shared terms. Terms without scatter are absent.</param>
public sealed record Allocation(IReadOnlyList<TermAllocation> Terms);

/// <summary>The share of one term.</summary>
/// <param name="Term">The term.</param>
/// <param name="Region">Index of the region, counted from the coldest; <see langword="null"/> for a term that all regions share.</param>
/// <param name="Multiplier">The multiple <c>m ≥ 0</c> of its own design spread that the term may take.</param>
/// <param name="Capability">
/// The capability index that the term reaches against its limit: <c>m·C</c> of the criterion that governs where the limit is largest.
/// </param>
/// <param name="Limit">The limit, <c>added + m·max(3C_s s_w, 3C_l s_t)</c>, largest in the region; pressure hysteresis as full width.</param>
/// <param name="Held">Whether the customer fixed the limit.</param>
/// <param name="OutsideFraction">The fraction of units beyond the limit over lots, 0 … 1; units to screen out when the multiplier is below 1.</param>
public sealed record TermAllocation(
    ErrorTerm Term, int? Region, double Multiplier, double Capability, PercentOfSpan Limit, bool Held, double OutsideFraction);
