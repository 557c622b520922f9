using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Characterizing;

/// <summary>A term that the readings cannot speak of.</summary>
/// <param name="Term">Its name as in files: a coefficient such as <c>span.4</c>, or <c>thermal-hysteresis</c>.</param>
/// <param name="Reason">Why, a sentence without a full stop.</param>
public sealed record LeftOutTerm(string Term, string Reason)
{
    /// <summary>For reading: terms with the same reason as one, their names in a row.</summary>
    /// <param name="terms">The terms.</param>
    public static IEnumerable<LeftOutTerm> Grouped(IReadOnlyList<LeftOutTerm> terms) => terms
        .GroupBy(term => term.Reason)
        .Select(alike => new LeftOutTerm(string.Join(", ", alike.Select(term => term.Term)), alike.Key));
}

/// <summary>
/// Which columns the readings determine. A coefficient <c>ψ_j τ^k</c> needs units that were read at more than <c>k</c> temperatures with more
/// than <c>j</c> pressures each; three such units, since a spread is asked for. What a polynomial of higher degree would do between and
/// beyond the temperatures that were read, nobody has seen.
/// </summary>
internal sealed class Support
{
    private const int FewestUnits = 3;

    /// <summary>A column that keeps less than this of its length beside the others is their combination.</summary>
    private const double Independent = 1e-5;

    private readonly MeasuredFamily family;
    private readonly List<LeftOutTerm> leftOut = [];

    /// <summary>Judges the columns that are wanted.</summary>
    /// <param name="family">The readings.</param>
    /// <param name="wanted">The columns, the degrees of each shape rising.</param>
    public Support(MeasuredFamily family, IEnumerable<ReadingColumn> wanted)
    {
        this.family = family;
        List<ReadingColumn> columns = [.. wanted.Where(HasReadings)];
        Columns = [.. Independents(columns)];
    }

    /// <summary>The columns that are determined, in the order wanted.</summary>
    public IReadOnlyList<ReadingColumn> Columns { get; }

    /// <summary>The others, with the reason; of each shape only the lowest degree that fails.</summary>
    public IReadOnlyList<LeftOutTerm> LeftOut => leftOut;

    private bool HasReadings(ReadingColumn column)
    {
        (int units, string reason) = column.Kind switch
        {
            ColumnKind.PressureHysteresis => (
                family.Units.Count(unit => unit.ShowsPressureHysteresis), "read with rising and with falling pressure"),
            ColumnKind.ThermalHysteresis => (
                family.Units.Count(unit => unit.ShowsThermalHysteresis), "read at a temperature reached once from colder and once from hotter"),
            _ => (family.Units.Count(unit => Determines(unit, column.Name)), Needs(column.Name)),
        };
        if (units >= FewestUnits)
            return true;
        if (column.Kind != ColumnKind.Coefficient || !AlreadyLeftOut(column.Name))
            leftOut.Add(new LeftOutTerm(column.Key, $"{Counted(units)} {reason}, and a spread needs at least {FewestUnits}"));
        return false;
    }

    private bool AlreadyLeftOut(CoefficientName name) =>
        leftOut.Any(term => term.Term.StartsWith(name.Word + ".", StringComparison.Ordinal));

    private static string Counted(int units) => units switch
    {
        0 => "no unit was",
        1 => "only 1 unit was",
        _ => $"only {units} units were",
    };

    private static string Needs(CoefficientName name)
    {
        string temperatures = name.Degree == 0 ? "read" : $"read at {name.Degree + 1} temperatures or more";
        string pressures = $"at {(int)name.Shape + 1} pressures or more";
        return name.Shape == PressureShape.Zero ? temperatures : name.Degree == 0 ? $"read {pressures}" : $"{temperatures}, each {pressures}";
    }

    private static bool Determines(MeasuredUnit unit, CoefficientName name)
    {
        IReadOnlyList<double> settings = ThermalHistory.Settings(unit.Readings.Select(r => r.Temperature.Celsius));
        return settings.Count(setting => unit.Readings
            .Where(r => Math.Abs(r.Temperature.Celsius - setting) <= ThermalHistory.SameSetting)
            .Select(r => Math.Round(r.PressureFraction, 2)).Distinct().Count() > (int)name.Shape) > name.Degree;
    }

    /// <summary>Drops columns that all readings together cannot tell from earlier ones.</summary>
    private IEnumerable<ReadingColumn> Independents(List<ReadingColumn> columns)
    {
        OrthogonalStack stack = new(columns.Count);
        foreach (MeasuredUnit unit in family.Units)
            stack.Add(unit.Rows(columns));
        Grid triangle = stack.Triangle;
        for (int j = 0; j < columns.Count; j++)
        {
            double length = Math.Sqrt(Enumerable.Range(0, j + 1).Sum(i => triangle[i, j] * triangle[i, j]));
            if (Math.Abs(triangle[j, j]) > Independent * length)
                yield return columns[j];
            else
                leftOut.Add(new LeftOutTerm(columns[j].Key, "the readings cannot tell it from the terms before it"));
        }
    }
}
