using BandSpec.Core.Bands;
using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.TestLimits;

/// <summary>
/// Everything about one unit as linear functions of independent standard normal numbers, over all lots: what it shows at each test place and what
/// error it has anywhere in use, so that dependence is told exactly. First come the numbers behind the residue, as many as its covariance over all
/// places has rank; then pressure hysteresis, thermal hysteresis, drift of zero, drift of span and the further terms. Errors in %FS.
/// </summary>
internal sealed class UnitLaw
{
    private const int PressureHysteresis = 0, ThermalHysteresis = 1, ZeroDrift = 2, SpanDrift = 3, Further = 4;

    /// <summary>Both sides, new and at the end of life.</summary>
    public static readonly (int Side, int Age)[] Sides = [(-1, 0), (1, 0), (-1, 1), (1, 1)];

    private readonly Application application;
    private readonly IReadOnlyList<TestPlace> places;
    private readonly IReadOnlyList<BandNode> nodes;
    private readonly double[] means;
    private readonly double[][] rows;
    private readonly SteadyTerms steady;

    public UnitLaw(Application application, CompensationPlan plan, IReadOnlyList<TestPlace> places, IReadOnlyList<BandNode> nodes)
    {
        (this.application, this.places, this.nodes) = (application, places, nodes);
        steady = new SteadyTerms(application);
        RawError raw = new(application.Platform);
        Correction correction = new(raw, application.Platform, application.Station, plan);
        Residue[] residues =
        [
            .. places.Select(p => correction.At(p.Fraction, p.Temperature)), .. nodes.Select(n => correction.At(n.PressureFraction, n.Temperature)),
        ];
        means = [.. residues.Select(r => Vectors.Dot(r.Coefficients, raw.Mean))];
        rows = SemidefiniteFactor.RowsOf(Covariance(residues, raw, correction, application.Station));
        Dimensions = rows.Length + Further + application.Requirement.FurtherTerms.Count;
    }

    /// <summary>How many independent numbers there are.</summary>
    public int Dimensions { get; }

    /// <summary>How many test places there are.</summary>
    public int Places => places.Count;

    /// <summary>How many places of use there are.</summary>
    public int Nodes => nodes.Count;

    /// <summary>
    /// What a unit truly shows at a test place: half its hysteresis behind, without repeatability; the output's step is the place's own number.
    /// </summary>
    public LinearError Shown(int place)
    {
        (double x, double side) = (places[place].Fraction, places[place].Direction == PressureDirection.Rising ? -1 : 1);
        double half = side * PressureShapes.Hysteresis(x) / 2;
        Spread hysteresis = application.Platform.PressureHysteresis;
        double[] weights = ResidueWeights(place, 1);
        weights[rows.Length + PressureHysteresis] = half * hysteresis.Sigma.Percent;
        return new(means[place] + (half * hysteresis.Mean.Percent), weights, application.Requirement.Output.StepInPercent / Math.Sqrt(12));
    }

    /// <summary>
    /// How far a unit's error in use goes to one side at a place, everything that only adds on that side: <c>side·(ρ + age·drift + further) + added</c>,
    /// with repeatability and the output's step as the place's own number.
    /// </summary>
    /// <param name="node">The place.</param>
    /// <param name="side">−1 or 1.</param>
    /// <param name="age">0 for a new unit, 1 at the end of life.</param>
    public LinearError Used(int node, int side, int age)
    {
        double x = nodes[node].PressureFraction, eta = PressureShapes.Hysteresis(x) / 2;
        (Platform platform, IReadOnlyList<FurtherTerm> further) = (application.Platform, application.Requirement.FurtherTerms);
        double[] weights = ResidueWeights(places.Count + node, side);
        Span<double> others = weights.AsSpan(rows.Length);
        others[PressureHysteresis] = eta * platform.PressureHysteresis.Sigma.Percent;
        others[ThermalHysteresis] = platform.ThermalHysteresis.Sigma.Percent;
        others[ZeroDrift] = side * age * steady.AgeFactor * platform.Ageing.Zero.Sigma.Percent;
        others[SpanDrift] = side * age * steady.AgeFactor * platform.Ageing.Span.Sigma.Percent * x;
        double added = (eta * platform.PressureHysteresis.Mean.Percent) + platform.ThermalHysteresis.Mean.Percent;
        for (int i = 0; i < further.Count; i++)
        {
            double along = further[i].Shape == FurtherTermShape.Constant ? 1 : x;
            others[Further + i] = side * along * further[i].Sigma.Percent;
            added += along * further[i].Bound.Percent;
        }

        double repeatability = platform.Repeatability.Percent, step = application.Requirement.Output.StepInPercent;
        double mean = side * (means[places.Count + node] + (age * steady.DriftMean(x)));
        return new(mean + added, weights, Math.Sqrt((repeatability * repeatability) + (step * step / 12)));
    }

    /// <summary>Variance of what a test reading adds to what the unit truly shows: <c>u_v²</c>, told apart into its own and the standard's two parts.</summary>
    public (double Own, double CommonZero, double Common) ReadingErrors(int place)
    {
        Station station = application.Station;
        return (
            Math.Sqrt(ReadingNoise.VarianceOf(application.Platform, station)), station.StandardZero.Percent,
            station.StandardProportional.Percent * places[place].Fraction);
    }

    /// <summary>An error in use given that the test reading at a place is known: mean and weights change, the own number does not.</summary>
    /// <param name="error">An error in use.</param>
    /// <param name="place">The test place.</param>
    /// <param name="reading">The reading, as an error in %FS.</param>
    public LinearError Given(LinearError error, int place, double reading)
    {
        LinearError shown = Shown(place);
        double squared = Vectors.Dot(shown.Weights, shown.Weights), total = (shown.Sigma * shown.Sigma) + ReadingVariance(place);
        if (squared == 0)
            return error;
        double along = Vectors.Dot(error.Weights, shown.Weights);
        double shrink = (1 - Math.Sqrt(1 - (squared / total))) / squared;
        double[] weights = [.. error.Weights.Zip(shown.Weights, (w, a) => w - (shrink * along * a))];
        return new(error.Mean + (along / total * (reading - shown.Mean)), weights, error.Own);
    }

    /// <summary>
    /// The sum over places of use, sides and ages of the probability of being beyond what is allowed, given the test reading at a place: no less than the
    /// probability of leaving anywhere. Quicker than conditioning each error, for only its mean and spread are needed.
    /// </summary>
    public double SumGiven(int place, double reading, IReadOnlyList<double> allowed)
    {
        LinearError shown = Shown(place);
        double total = (shown.Sigma * shown.Sigma) + ReadingVariance(place), sum = 0;
        for (int node = 0; node < nodes.Count; node++)
            foreach ((int side, int age) in Sides)
            {
                LinearError error = Used(node, side, age);
                double along = Vectors.Dot(error.Weights, shown.Weights);
                double mean = error.Mean + (along / total * (reading - shown.Mean));
                double variance = (error.Sigma * error.Sigma) - (along * along / total);
                sum += variance > 0 ? NormalDistribution.UpperTail((allowed[node] - mean) / Math.Sqrt(variance)) : mean > allowed[node] ? 1 : 0;
            }
        return sum;
    }

    /// <summary>The largest probability over places of use, sides and ages of being beyond what is allowed there.</summary>
    public double LargestPointwise(IReadOnlyList<double> allowed) =>
        (from node in Enumerable.Range(0, nodes.Count)
         from at in Sides
         let error = Used(node, at.Side, at.Age)
         select error.Sigma > 0 ? NormalDistribution.UpperTail((allowed[node] - error.Mean) / error.Sigma) : error.Mean > allowed[node] ? 1 : 0).Max();

    /// <summary><c>u_v²</c>.</summary>
    public double ReadingVariance(int place)
    {
        (double own, double zero, double common) = ReadingErrors(place);
        return (own * own) + (zero * zero) + (common * common);
    }

    private double[] ResidueWeights(int index, int side)
    {
        double[] weights = new double[Dimensions];
        for (int r = 0; r < rows.Length; r++)
            weights[r] = side * rows[r][index];
        return weights;
    }

    /// <summary>Covariance of the residues over lots: <c>gᵀ(Σ_w + Σ_l)g' + Σ w_i w_i' v_i</c> and the standard's share.</summary>
    private static double[,] Covariance(Residue[] residues, RawError raw, Correction correction, Station station)
    {
        int count = raw.Mean.Length;
        double[,] both = new double[count, count];
        for (int i = 0; i < count; i++)
            for (int j = 0; j < count; j++)
                both[i, j] = raw.Within[i, j] + raw.Lots[i, j];
        double[][] factor = SemidefiniteFactor.RowsOf(both);
        double[][] sources = [.. residues.Select(r => (double[])[.. factor.Select(row => Vectors.Dot(row, r.Coefficients)), .. correction.RunWeights(r, station)])];
        double[,] covariance = new double[residues.Length, residues.Length];
        for (int i = 0; i < residues.Length; i++)
            for (int j = i; j < residues.Length; j++)
                covariance[i, j] = covariance[j, i] = Vectors.Dot(sources[i], sources[j]);
        return covariance;
    }
}

/// <summary>An error as a linear function of standard normal numbers: <c>mean + weights·x + own·ξ</c>.</summary>
/// <param name="Mean">Its mean, %FS.</param>
/// <param name="Weights">One weight for each number that a unit's errors share.</param>
/// <param name="Own">Standard deviation of a number of its own.</param>
internal sealed record LinearError(double Mean, double[] Weights, double Own)
{
    /// <summary>Its standard deviation.</summary>
    public double Sigma => Math.Sqrt(Vectors.Dot(Weights, Weights) + (Own * Own));
}
