using BandSpec.Core.Numerics.NestedModels;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Characterizing;

/// <summary>One decision on a degree in temperature.</summary>
/// <param name="Shape">The pressure shape.</param>
/// <param name="Degree">The degree up to which coefficients were taken in.</param>
/// <param name="Gain">By how much the criterion fell; negative when the coefficients were not worth it.</param>
/// <param name="Kept">Whether they were kept.</param>
public sealed record DegreeStep(PressureShape Shape, int Degree, double Gain, bool Kept);

/// <summary>
/// Chooses the degrees in temperature. The criterion is Schwarz' (1978, Ann. Statist. 6, 461-464): minus twice the logarithm of the full
/// likelihood plus <c>ln(units)</c> for each mean and spread; units are what is counted because means and spreads are statistics of units
/// (Pauler 1998, Biometrika 85, 13-27). From constants in zero and span upwards, the step that lowers it most is taken until none does;
/// where no single degree does, two at once are tried, since a curve can be odd.
/// </summary>
/// <param name="family">The readings.</param>
/// <param name="supported">The columns that the readings support.</param>
/// <param name="pinned">Shapes whose degree is fixed.</param>
internal sealed class DegreeSelection(
    MeasuredFamily family, IReadOnlyList<ReadingColumn> supported, IReadOnlyDictionary<PressureShape, int> pinned)
{
    private readonly NestedSample sample = family.Sample(supported);
    private readonly Dictionary<PressureShape, int> degrees = [];
    private readonly List<DegreeStep> steps = [];

    /// <summary>The decisions in order.</summary>
    public IReadOnlyList<DegreeStep> Steps => steps;

    /// <summary>The coefficients that were not worth it, with the reason.</summary>
    public IEnumerable<LeftOutTerm> LeftOut =>
        from step in steps
        where !step.Kept && step.Degree == degrees[step.Shape] + 1
        select new LeftOutTerm(
            new CoefficientName(step.Shape, step.Degree).ToString(),
            "too little in the readings to pay for another mean and spread by Schwarz' criterion");

    /// <summary>The columns that are kept, in the order of those supported.</summary>
    public IReadOnlyList<ReadingColumn> Choose()
    {
        foreach (PressureShape shape in Enum.GetValues<PressureShape>())
            degrees[shape] = Math.Min(HighestOf(shape), pinned.GetValueOrDefault(shape, shape <= PressureShape.Span ? 0 : -1));
        double best = Trials(1).Any() ? Criterion(degrees) : 0;
        while (true)
        {
            List<(DegreeStep Step, double Criterion)> trials = [.. Trials(1).Select(trial => Try(trial, best))];
            if (trials.All(trial => trial.Criterion >= best))
                trials.AddRange(Trials(2).Select(trial => Try(trial, best)));
            if (trials.Count == 0 || trials.MinBy(trial => trial.Criterion) is var lowest && lowest.Criterion >= best)
            {
                steps.AddRange(trials.Select(trial => trial.Step));
                return Kept(degrees);
            }

            (degrees[lowest.Step.Shape], best) = (lowest.Step.Degree, lowest.Criterion);
            steps.Add(lowest.Step with { Kept = true });
        }
    }

    private IEnumerable<(PressureShape Shape, int Degree)> Trials(int further) =>
        from shape in degrees.Keys.Order()
        where !pinned.ContainsKey(shape)
        where degrees[shape] + further <= HighestOf(shape)
        select (shape, degrees[shape] + further);

    private (DegreeStep Step, double Criterion) Try((PressureShape Shape, int Degree) trial, double best)
    {
        double criterion = Criterion(new Dictionary<PressureShape, int>(degrees) { [trial.Shape] = trial.Degree });
        return (new DegreeStep(trial.Shape, trial.Degree, best - criterion, Kept: false), criterion);
    }

    private int HighestOf(PressureShape shape) =>
        supported.Where(c => c.Kind == ColumnKind.Coefficient && c.Name.Shape == shape).Select(c => c.Name.Degree).DefaultIfEmpty(-1).Max();

    private IReadOnlyList<ReadingColumn> Kept(Dictionary<PressureShape, int> upTo) =>
        [.. supported.Where(c => c.Kind != ColumnKind.Coefficient || c.Name.Degree <= upTo[c.Name.Shape])];

    private double Criterion(Dictionary<PressureShape, int> upTo)
    {
        IReadOnlyList<ReadingColumn> columns = Kept(upTo);
        int[] chosen = [.. columns.Select(c => supported.ToList().IndexOf(c))];
        SpreadFit fit = SpreadFit.Of(sample.WithColumns(chosen), columns, restricted: false);
        return fit.Fit.Deviance + (Math.Log(sample.Units) * fit.Parameters);
    }
}
