using BandSpec.Core.Bands;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>The nodes at one temperature with the tightest design band that any region sets there.</summary>
/// <param name="Temperature">The temperature.</param>
/// <param name="Pressures">The pressures that are judged.</param>
/// <param name="Design">Design band <c>D</c> at each, %FS.</param>
internal sealed record NodeRow(Temperature Temperature, PressureNode[] Pressures, double[] Design)
{
    /// <summary>
    /// The rows of an application: one for each design temperature, edges once with the tighter allowance, then one for each node that
    /// was added between them.
    /// </summary>
    public static IReadOnlyList<NodeRow> AllOf(Application application, IReadOnlyList<NodePlace> added)
    {
        Requirement requirement = application.Requirement;
        PressureNode[] pressures = PressureNode.AllOf(application);
        IEnumerable<Temperature> temperatures = requirement.AllowedError.SelectMany(DesignNodes.TemperaturesOf).Distinct().Order();
        return
        [
            .. temperatures.Select(t => new NodeRow(t, pressures, [.. DesignNodes.Fractions.Select(x => TightestAt(requirement, x, t))])),
            .. added.Select(a => new NodeRow(
                a.Temperature, [PressureNode.Of(application, a.PressureFraction)],
                [DesignAt(requirement, a.PressureFraction, a.Temperature, a.Region)])),
        ];
    }

    private static double TightestAt(Requirement requirement, double fraction, Temperature temperature) =>
        requirement.RegionsAt(temperature).Min(r => DesignAt(requirement, fraction, temperature, r));

    private static double DesignAt(Requirement requirement, double fraction, Temperature temperature, int region) =>
        requirement.AllowedError[region].At(temperature, requirement.Pressure.MagnitudeAt(fraction)) / requirement.SafetyFactor;
}
