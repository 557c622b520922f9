namespace BandSpec.Core.VirtualLots;

/// <summary>Why parts cannot be put together, or are not the whole.</summary>
public enum PartFault
{
    /// <summary>A part of another specification, or of another order: other units, lot size or seed.</summary>
    Foreign,

    /// <summary>Lots that another part has too.</summary>
    Duplicate,

    /// <summary>Lots that no part has.</summary>
    Missing,
}

/// <summary>One thing that is wrong with a set of parts.</summary>
/// <param name="Fault">What is wrong.</param>
/// <param name="Part">Index of the part at fault in the order they were given; <see langword="null"/> for missing lots.</param>
/// <param name="Lots">The lots concerned: those twice there or not there; of a foreign part, its own.</param>
public sealed record PartFinding(PartFault Fault, int? Part, LotRange Lots);

/// <summary>Parts put together.</summary>
/// <param name="Result">
/// The result, incomplete when lots are missing; <see langword="null"/> when a part is foreign or a duplicate, since then no sum is right.
/// </param>
/// <param name="Findings">What is wrong; empty exactly when the result is the whole order's.</param>
public sealed record GatheredLots(LotResult? Result, IReadOnlyList<PartFinding> Findings);

/// <summary>Puts parts of an order together. Sums are added, nothing is averaged, so that the parts equal one run bit for bit.</summary>
public static class LotGathering
{
    /// <summary>The result of all parts.</summary>
    /// <param name="parts">At least one part, in any order; the first says which order and specification it is about.</param>
    /// <exception cref="ArgumentException">There is no part.</exception>
    public static GatheredLots Gather(IReadOnlyList<LotResult> parts)
    {
        ArgumentNullException.ThrowIfNull(parts);
        if (parts.Count == 0)
            throw new ArgumentException("there is nothing to put together", nameof(parts));
        List<PartFinding> findings = [.. Foreign(parts)];
        List<LotRange> covered = findings.Count == 0 ? Cover(parts, findings) : [];
        if (findings.Count > 0)
            return new GatheredLots(null, findings);
        LotOrder whole = parts[0].Order.InPart(1, 1);
        LotTally tally = new(parts[0].Tally.Plan);
        foreach (LotResult part in parts)
            tally.Add(part.Tally);
        return new GatheredLots(
            new LotResult(whole, parts[0].Fingerprint, covered, tally),
            [.. Gaps(covered, whole).Select(gap => new PartFinding(PartFault.Missing, null, gap))]);
    }

    private static IEnumerable<PartFinding> Foreign(IReadOnlyList<LotResult> parts)
    {
        (ulong fingerprint, LotOrder order) = (parts[0].Fingerprint, parts[0].Order);
        for (int i = 1; i < parts.Count; i++)
        {
            LotOrder other = parts[i].Order;
            if (parts[i].Fingerprint != fingerprint || (other.Lots, other.LotSize, other.Seed) != (order.Lots, order.LotSize, order.Seed))
                yield return new PartFinding(PartFault.Foreign, i, parts[i].Ranges.Count > 0 ? parts[i].Ranges[0] : default);
        }
    }

    private static List<LotRange> Cover(IReadOnlyList<LotResult> parts, List<PartFinding> findings)
    {
        List<LotRange> covered = [];
        foreach ((LotRange range, int part) in parts.SelectMany((p, i) => p.Ranges.Select(r => (r, i))).Where(p => p.r.End > p.r.First).OrderBy(p => p.r.First))
        {
            if (covered.Count == 0 || range.First > covered[^1].End)
                covered.Add(range);
            else if (range.First < covered[^1].End)
                findings.Add(new PartFinding(PartFault.Duplicate, part, new LotRange(range.First, Math.Min(range.End, covered[^1].End))));
            else
                covered[^1] = new LotRange(covered[^1].First, range.End);
        }
        return covered;
    }

    private static IEnumerable<LotRange> Gaps(List<LotRange> covered, LotOrder whole)
    {
        long next = 0;
        foreach (LotRange range in covered)
        {
            if (range.First > next)
                yield return new LotRange(next, range.First);
            next = range.End;
        }
        if (next < whole.Lots)
            yield return new LotRange(next, whole.Lots);
    }
}
