using BandSpec.Core.Requirements;

namespace BandSpec.Files.Readings;

/// <summary>How a file of readings is to be understood where its header does not say it.</summary>
public sealed record ReadingsFormat
{
    /// <summary>The calibrated range when pressures are given as pressures and not as fractions of the span.</summary>
    public PressureRange? Range { get; init; }

    /// <summary>The nominal output when readings are given in its unit and not as errors.</summary>
    public NominalOutput? Output { get; init; }

    /// <summary>Columns with other names than usual: the usual name and the name in the header, without a unit.</summary>
    public IReadOnlyDictionary<string, string> ColumnNames { get; init; } = new Dictionary<string, string>();
}

/// <summary>The output that a perfect unit has at the ends of the range.</summary>
/// <param name="AtLower">At the lower range value.</param>
/// <param name="AtUpper">At the upper range value; another number.</param>
/// <param name="Unit">The unit of both, such as <c>mV</c>.</param>
public sealed record NominalOutput(double AtLower, double AtUpper, string Unit)
{
    /// <summary>What a reading is off, in percent of the output's span.</summary>
    /// <param name="reading">The reading in <see cref="Unit"/>.</param>
    /// <param name="fraction">The pressure fraction.</param>
    public double ErrorOf(double reading, double fraction) =>
        100 * (reading - (((1 - fraction) * AtLower) + (fraction * AtUpper))) / (AtUpper - AtLower);
}
