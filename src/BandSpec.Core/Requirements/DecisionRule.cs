namespace BandSpec.Core.Requirements;

/// <summary>Of whom the design band and its capability are promised when limits are set.</summary>
public enum Promise
{
    /// <summary>Of the population: limits follow from what the process does.</summary>
    Population,

    /// <summary>
    /// Of every accepted unit: no limit lies so far out that a unit which reads exactly on it would have less than the capability over lots, anywhere in use.
    /// </summary>
    EveryUnit,
}

/// <summary>How acceptance limits are drawn from tolerances when readings are uncertain.</summary>
public enum DecisionRule
{
    /// <summary>Inside the tolerance by a multiple of the expanded uncertainty <c>U</c> (ISO 14253-1, ILAC-G8:09/2019).</summary>
    Guarded,

    /// <summary>The tolerance itself (simple acceptance, JCGM 106:2012, 8.2).</summary>
    Simple,

    /// <summary>
    /// So far inside that a unit that reads exactly on a limit is beyond the tolerance with a stated probability, nothing else being known of
    /// it (JCGM 106:2012, 8.3; ILAC-G8:09/2019).
    /// </summary>
    SpecificRisk,

    /// <summary>
    /// So far inside that of all units made no more than a stated fraction is accepted at a point although beyond the tolerance there (global
    /// consumer's risk, JCGM 106:2012, 9.5).
    /// </summary>
    GlobalRisk,
}
