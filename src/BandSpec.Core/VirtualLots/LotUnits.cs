using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// The units of the lot at hand, in groups of eight side by side. One instance serves a thread from lot to lot, so that memory does not
/// grow with the number of units.
/// </summary>
/// <param name="groups">Groups of eight in a lot.</param>
/// <param name="places">Coefficients of an error.</param>
internal sealed class LotUnits(int groups, int places)
{
    /// <summary>Groups of eight units.</summary>
    public int Groups => groups;

    /// <summary>What compensation left over: the place's vectors lie side by side, place after place, <see cref="Groups"/> each.</summary>
    public Lanes[] Error { get; } = new Lanes[places * groups];

    /// <summary>Half the width of pressure hysteresis at its peak.</summary>
    public Lanes[] PressureHysteresis { get; } = new Lanes[groups];

    /// <summary>Half the width of thermal hysteresis.</summary>
    public Lanes[] ThermalHysteresis { get; } = new Lanes[groups];

    /// <summary>Drift of zero at the end of life, further constant terms apart.</summary>
    public Lanes[] ZeroDrift { get; } = new Lanes[groups];

    /// <summary>Drift of span at the end of life.</summary>
    public Lanes[] SpanDrift { get; } = new Lanes[groups];

    /// <summary>Scatter of the further terms that are the same at every pressure.</summary>
    public Lanes[] FurtherConstant { get; } = new Lanes[groups];

    /// <summary>Scatter of the further terms in proportion to pressure, at the upper range value.</summary>
    public Lanes[] FurtherProportional { get; } = new Lanes[groups];

    /// <summary>All bits set in the lanes of accepted units.</summary>
    public Lanes[] Accepted { get; } = new Lanes[groups];

    /// <summary>All bits set in the lanes of units that leave the allowed error somewhere, at some time.</summary>
    public Lanes[] Leaves { get; } = new Lanes[groups];

    /// <summary>All bits set in the lanes of units that leave the allowed error somewhere when new.</summary>
    public Lanes[] LeavesNew { get; } = new Lanes[groups];

    /// <summary>All bits set in the lanes of units that leave the allowed error in the region at hand.</summary>
    public Lanes[] LeavesRegion { get; } = new Lanes[groups];
}
