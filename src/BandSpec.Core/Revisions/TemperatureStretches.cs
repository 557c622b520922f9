using BandSpec.Core.Bands;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Revisions;

/// <summary>
/// Temperatures cut at every edge of a region in either of two records. Inside a stretch neither record changes region, so that figures by
/// region can be compared although the regions were cut differently; with the same regions, stretches are regions.
/// </summary>
/// <param name="From">Colder end.</param>
/// <param name="To">Hotter end.</param>
internal readonly record struct TemperatureStretch(Temperature From, Temperature To)
{
    /// <summary>The stretches of two records, cold to hot.</summary>
    public static IReadOnlyList<TemperatureStretch> Between(BandMap old, BandMap now)
    {
        Temperature[] edges = [.. old.Regions.Concat(now.Regions).SelectMany(r => new[] { r.From, r.To }).Distinct().Order()];
        return [.. edges.Zip(edges.Skip(1), (from, to) => new TemperatureStretch(from, to))];
    }

    /// <summary>The region that holds the whole stretch; <see langword="null"/> outside the record's range.</summary>
    public int? RegionIn(BandMap bands)
    {
        for (int r = 0; r < bands.Regions.Count; r++)
            if (bands.Regions[r].From <= From && To <= bands.Regions[r].To)
                return r;
        return null;
    }

    /// <summary>The stretch in words.</summary>
    public override string ToString() => Words.Of(From, To);
}
