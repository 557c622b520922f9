namespace BandSpec.Core.VirtualLots;

/// <summary>The names of the random streams of a virtual lot, one for each source of scatter, so that no source disturbs another.</summary>
internal static class StreamNames
{
    /// <summary>Shift of a lot's raw error; the stream's unit is the lot.</summary>
    public const string Lot = "lot";

    /// <summary>A unit's raw error within its lot.</summary>
    public const string RawError = "raw-error";

    /// <summary>A unit's pressure hysteresis.</summary>
    public const string PressureHysteresis = "pressure-hysteresis";

    /// <summary>A unit's thermal hysteresis.</summary>
    public const string ThermalHysteresis = "thermal-hysteresis";

    /// <summary>A unit's drift of zero and span.</summary>
    public const string Ageing = "ageing";

    /// <summary>Error sources outside the platform.</summary>
    public const string Further = "further";

    /// <summary>Temperature not settled at each compensation point.</summary>
    public const string Soak = "soak";

    /// <summary>Noise of each compensation reading.</summary>
    public const string Reading = "reading";

    /// <summary>The pressure standard in the compensation run.</summary>
    public const string Standard = "standard";

    /// <summary>The unit's own repeatability at each verification point.</summary>
    public const string TestRepeatability = "test-repeatability";

    /// <summary>The station's noise at each verification point.</summary>
    public const string TestReading = "test-reading";

    /// <summary>The pressure standard in the verification test.</summary>
    public const string TestStandard = "test-standard";

    /// <summary>Repeatability at each place of the map.</summary>
    public const string Map = "map";

    /// <summary>Where in the profile a unit is used.</summary>
    public const string Use = "use";

    /// <summary>From which side pressure and temperature were reached in use.</summary>
    public const string UseSide = "use-side";

    /// <summary>Repeatability in use.</summary>
    public const string UseRepeatability = "use-repeatability";

    /// <summary>Every name, for tests of every stream.</summary>
    public static IReadOnlyList<string> All { get; } =
    [
        Lot, RawError, PressureHysteresis, ThermalHysteresis, Ageing, Further, Soak, Reading, Standard,
        TestRepeatability, TestReading, TestStandard, Map, Use, UseSide, UseRepeatability,
    ];
}
