using BandSpec.Core.Findings;

namespace BandSpec.Core.Characterizing;

/// <summary>The two figures of the drift law.</summary>
internal enum DriftFigure
{
    /// <summary>Activation energy.</summary>
    Energy,

    /// <summary>Time exponent.</summary>
    Exponent,
}

/// <summary>
/// Which figures of the drift law the readings can tell: the time exponent from two times at one temperature, the activation energy from two
/// temperatures. The search begins at what was assumed, otherwise at 0.7 eV and 0.5, in the middle of what is met.
/// </summary>
internal sealed class DriftSupport
{
    private const double UsualEnergy = 0.7;
    private const double UsualExponent = 0.5;

    /// <summary>Judges the readings.</summary>
    /// <param name="units">The units.</param>
    /// <param name="scope">What is asked for.</param>
    /// <param name="isEnergyOpen">Whether they were found to set no limits to the activation energy.</param>
    public DriftSupport(IReadOnlyList<StoredUnit> units, AgeingScope scope, bool isEnergyOpen = false)
    {
        var conditions = units.SelectMany(unit => unit.Readings).Where(r => r.Stored.Hours > 0)
            .Select(r => (r.Storage.Celsius, r.Stored.Hours)).Distinct().ToList();
        Temperatures = conditions.Select(c => c.Celsius).Distinct().Count();
        TimesAtOne = conditions.GroupBy(c => c.Celsius).Select(group => group.Count()).DefaultIfEmpty(0).Max();
        List<DriftFigure> free = [];
        if (Temperatures > 1 && !isEnergyOpen)
            free.Add(DriftFigure.Energy);
        if (TimesAtOne > 1)
            free.Add(DriftFigure.Exponent);
        Free = free;
        StartEnergy = scope.AssumedActivationEnergy ?? UsualEnergy;
        StartExponent = scope.AssumedTimeExponent ?? UsualExponent;
    }

    /// <summary>The figures that the readings can tell.</summary>
    public IReadOnlyList<DriftFigure> Free { get; }

    /// <summary>How many storage temperatures there are.</summary>
    public int Temperatures { get; }

    /// <summary>The most times at which one storage temperature was read.</summary>
    public int TimesAtOne { get; }

    /// <summary>Activation energy to begin with.</summary>
    public double StartEnergy { get; }

    /// <summary>Time exponent to begin with.</summary>
    public double StartExponent { get; }

    /// <summary>What the readings cannot tell and what was taken instead.</summary>
    public IEnumerable<LeftOutTerm> Assumed()
    {
        if (!Free.Contains(DriftFigure.Energy))
            yield return new LeftOutTerm(
                "activation-energy", FormattableString.Invariant(
                    $"{(Temperatures > 1 ? "the readings set no limits to it" : "all units were stored at one temperature")}; {StartEnergy} eV is assumed"));
        if (!Free.Contains(DriftFigure.Exponent))
            yield return new LeftOutTerm(
                "time-exponent", FormattableString.Invariant($"no storage temperature was read at two times; {StartExponent} is assumed"));
    }

    /// <summary>The drift is so small beside its scatter that every activation energy agrees with it.</summary>
    public static Finding OpenEnergy { get; } = new(
        FieldPath.InReadings("storage"), "open-energy", "the readings set no limits to the activation energy: drift hardly differs between the storage temperatures",
        "more units, longer storage or storage temperatures further apart, or an activation energy to assume");

    /// <summary>What is missing for any answer.</summary>
    public static IReadOnlyList<Finding> FindingsIn(IReadOnlyList<StoredUnit> units, AgeingScope scope)
    {
        DriftSupport support = new(units, scope);
        List<Finding> findings = [];
        if (units.Count(unit => unit.Readings.Select(r => r.Stored.Hours).Distinct().Count() > 1) < 3)
            findings.Add(new Finding(
                FieldPath.InReadings("unit"), "few-units", "fewer than 3 units were read more than once", "at least 3 units read before and after storage"));
        if (units.SelectMany(u => u.Readings).Select(r => Math.Round(r.PressureFraction, 2)).Distinct().Count() < 2)
            findings.Add(new Finding(
                FieldPath.InReadings("pressure"), "one-pressure", "all readings are at one pressure", "readings at two pressures or more, for zero and span"));
        if (support.Temperatures == 1 && scope.AssumedActivationEnergy is null)
            findings.Add(new Finding(
                FieldPath.InReadings("storage"), "one-temperature", "all units were stored at one temperature",
                "two storage temperatures, or an activation energy to assume"));
        if (support is { Temperatures: > 0, TimesAtOne: 1 } && scope.AssumedTimeExponent is null)
            findings.Add(new Finding(
                FieldPath.InReadings("stored"), "one-time", "no storage temperature was read at two times",
                "readings at two times or more, or a time exponent to assume"));
        return findings;
    }
}
