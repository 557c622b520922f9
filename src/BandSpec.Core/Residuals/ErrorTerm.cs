using BandSpec.Core.Requirements;

namespace BandSpec.Core.Residuals;

/// <summary>To whom a multiplier of a term belongs when the allowed error is allocated.</summary>
public enum TermScope
{
    /// <summary>Each temperature region has its own.</summary>
    Region,

    /// <summary>All regions share one.</summary>
    Shared,

    /// <summary>None: the term is what it is.</summary>
    Fixed,
}

/// <summary>One of the sources that a band is made of. Equality is that of key and scope.</summary>
/// <param name="Key">Its name in files, such as <c>zero-residue</c>; a further term's own name.</param>
/// <param name="Scope">To whom its multiplier belongs.</param>
public sealed record ErrorTerm(string Key, TermScope Scope)
{
    /// <summary>What compensation leaves of the zero: the shape <c>ψ0</c>.</summary>
    public static ErrorTerm ZeroResidue { get; } = new("zero-residue", TermScope.Region);

    /// <summary>What compensation leaves of the span: the shape <c>ψ1</c>.</summary>
    public static ErrorTerm SpanResidue { get; } = new("span-residue", TermScope.Region);

    /// <summary>What compensation leaves of bow and s-shape: the shapes <c>ψ2</c> and <c>ψ3</c>.</summary>
    public static ErrorTerm LinearityResidue { get; } = new("linearity-residue", TermScope.Region);

    /// <summary>Reading noise and unsettled temperature carried into the stored coefficients.</summary>
    public static ErrorTerm CarriedNoise { get; } = new("carried-noise", TermScope.Region);

    /// <summary>The pressure standard, common to all points of a run.</summary>
    public static ErrorTerm PressureStandard { get; } = new("pressure-standard", TermScope.Fixed);

    /// <summary>Pressure hysteresis.</summary>
    public static ErrorTerm PressureHysteresis { get; } = new("pressure-hysteresis", TermScope.Shared);

    /// <summary>Thermal hysteresis.</summary>
    public static ErrorTerm ThermalHysteresis { get; } = new("thermal-hysteresis", TermScope.Shared);

    /// <summary>Repeatability.</summary>
    public static ErrorTerm Repeatability { get; } = new("repeatability", TermScope.Shared);

    /// <summary>Resolution of the output.</summary>
    public static ErrorTerm Resolution { get; } = new("resolution", TermScope.Fixed);

    /// <summary>Drift over the service life.</summary>
    public static ErrorTerm Ageing { get; } = new("ageing", TermScope.Region);

    /// <summary>The terms every specification has, in the order in which they are listed.</summary>
    public static IReadOnlyList<ErrorTerm> Usual { get; } =
    [
        ZeroResidue, SpanResidue, LinearityResidue, CarriedNoise, PressureStandard,
        PressureHysteresis, ThermalHysteresis, Repeatability, Resolution, Ageing,
    ];

    /// <summary>The term of an error source outside the platform.</summary>
    public static ErrorTerm Of(FurtherTerm further)
    {
        ArgumentNullException.ThrowIfNull(further);
        return new ErrorTerm(further.Name, TermScope.Shared);
    }
}
