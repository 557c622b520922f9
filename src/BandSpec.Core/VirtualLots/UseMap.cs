using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// The places at which a unit's error is looked at, region by region: its ends and equal steps of at most 5 K between them, at each eleven
/// pressures. Made here from the requirement alone.
/// </summary>
internal sealed class UseMap
{
    /// <summary>Pressures at each temperature.</summary>
    public const int Pressures = 11;

    private const double LargestStep = 5;

    private readonly NominalError nominal;
    private readonly UnitTraits traits;
    private readonly Requirement requirement;
    private readonly double reference;

    /// <summary>The map of a subject.</summary>
    public UseMap(LotSubject subject, ShapePlaces places, NominalError nominal, UnitTraits traits)
    {
        (this.nominal, this.traits, Places, requirement) = (nominal, traits, places, subject.Requirement);
        reference = subject.Platform.Temperature.Reference.Celsius;
        Steps = new OutputSteps(requirement.Output);
        Repeatability = subject.Platform.Repeatability.Percent;
        Shapes = [.. Enumerable.Range(0, Pressures).Select(i => ShapeValues.At(i / 10.0))];
        NominalSteps = [.. Shapes.Select(s => Steps.NominalAt(s.Span))];
        Bounds = [.. Shapes.Select(s => traits.ConstantBound + (traits.ProportionalBound * s.Span))];
        Columns = [.. requirement.AllowedError.SelectMany((region, index) => ColumnsOf(region, index))];
    }

    /// <summary>Where the coefficients of an error stand.</summary>
    public ShapePlaces Places { get; }

    /// <summary>The output's steps.</summary>
    public OutputSteps Steps { get; }

    /// <summary>Standard deviation of the unit's repeatability.</summary>
    public double Repeatability { get; }

    /// <summary>The pressure shapes at each pressure.</summary>
    public ShapeValues[] Shapes { get; }

    /// <summary>The nominal output in steps at each pressure.</summary>
    public double[] NominalSteps { get; }

    /// <summary>The sum of the further bounds at each pressure.</summary>
    public double[] Bounds { get; }

    /// <summary>The temperatures, cold to hot; an edge between regions comes twice.</summary>
    public MapColumn[] Columns { get; }

    /// <summary>How many regions there are.</summary>
    public int Regions => requirement.AllowedError.Count;

    /// <summary>How many places there are; place <c>11·column + pressure</c>.</summary>
    public int Nodes => Columns.Length * Pressures;

    /// <summary>Every number of the map, to tell one from another.</summary>
    public IEnumerable<double> Numbers =>
        Columns.SelectMany(c => c.Allowed.Append(c.Tau).Append(c.Region).Concat(c.Centre)).Concat(Steps.Numbers).Append(Repeatability);

    /// <summary>Index of a place; −1 when the map does not have it.</summary>
    public int IndexOf(int region, Temperature temperature, double x)
    {
        int column = Array.FindIndex(Columns, c => c.Region == region && Math.Abs((c.Temperature - temperature).Kelvin) < 1e-9);
        int pressure = Array.FindIndex(Shapes, s => Math.Abs(s.Span - x) < 1e-9);
        return column < 0 || pressure < 0 ? -1 : (column * Pressures) + pressure;
    }

    /// <summary>The mean unit at a place: what compensation leaves, the side, and the whole error.</summary>
    public (double Fresh, double Side, double Centre) NominalAt(int index)
    {
        MapColumn column = Columns[index / Pressures];
        int pressure = index % Pressures;
        return (column.Fresh[pressure], column.Side[pressure], column.Centre[pressure]);
    }

    private IEnumerable<MapColumn> ColumnsOf(AllowedErrorRegion region, int index)
    {
        double from = region.From.Celsius;
        double width = (region.To - region.From).Kelvin;
        int steps = Math.Max(1, (int)Math.Ceiling(width / LargestStep));
        for (int i = 0; i <= steps; i++)
        {
            double celsius = i == steps ? region.To.Celsius : from + (width * i / steps);
            yield return ColumnAt(Temperature.FromCelsius(celsius), region, index);
        }
    }

    private MapColumn ColumnAt(Temperature temperature, AllowedErrorRegion region, int index)
    {
        MapColumn column = new(temperature, (temperature.Celsius - reference) / 100, index);
        for (int i = 0; i < Pressures; i++)
        {
            double fresh = nominal.At(Shapes[i], column.Tau);
            double drift = traits.MeanDrift(Shapes[i].Span);
            bool freshIsWorse = Math.Abs(fresh) > Math.Abs(fresh + drift);
            double worse = freshIsWorse ? fresh : fresh + drift;
            column.Allowed[i] = region.At(temperature, requirement.Pressure.MagnitudeAt(Shapes[i].Span));
            column.Side[i] = worse < 0 ? -1 : 1;
            column.MeanDriftOff[i] = freshIsWorse ? drift : 0;
            column.Fresh[i] = fresh;
            column.Centre[i] = worse + (column.Side[i] * traits.MeanAdded(Shapes[i]));
        }
        return column;
    }
}

/// <summary>One temperature of the map, with the numbers at each pressure.</summary>
/// <param name="Temperature">The temperature.</param>
/// <param name="Tau">Reduced temperature.</param>
/// <param name="Region">Index of the region whose allowance holds.</param>
internal sealed record MapColumn(Temperature Temperature, double Tau, int Region)
{
    /// <summary>Allowed error.</summary>
    public double[] Allowed { get; } = new double[UseMap.Pressures];

    /// <summary>On which side the band is nearer for the mean unit, −1 or 1.</summary>
    public double[] Side { get; } = new double[UseMap.Pressures];

    /// <summary>The mean drift where the new unit is the worse one, so that it is taken off again; otherwise 0.</summary>
    public double[] MeanDriftOff { get; } = new double[UseMap.Pressures];

    /// <summary>What compensation leaves of the mean unit.</summary>
    public double[] Fresh { get; } = new double[UseMap.Pressures];

    /// <summary>The mean unit's whole error.</summary>
    public double[] Centre { get; } = new double[UseMap.Pressures];
}
