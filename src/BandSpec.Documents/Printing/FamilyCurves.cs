using BandSpec.Core.Characterizing;
using BandSpec.Core.Requirements;
using BandSpec.Documents.Charts;

namespace BandSpec.Documents.Printing;

/// <summary>Curves of one pressure shape over temperature: of each unit, of those left out, of the mean, and three standard deviations over lots about it.</summary>
internal sealed record FamilyCurves(
    IReadOnlyList<IReadOnlyList<Spot>> Units, IReadOnlyList<IReadOnlyList<Spot>> LeftOut, IReadOnlyList<Spot> Mean, IReadOnlyList<Spot> Above, IReadOnlyList<Spot> Below)
{
    private const int Steps = 40;

    public static FamilyCurves Of(Characterization found, PressureShape shape)
    {
        int[] places = [.. Enumerable.Range(0, found.Coefficients.Count).Where(j => found.Coefficients[j].Name.Shape == shape)];
        List<double> celsius = [.. found.Curves.SelectMany(c => c.Residuals).Select(r => r.Reading.Temperature.Celsius)];
        double coldest = celsius.Min(), hottest = celsius.Max(), reference = found.Scope.Reference.Celsius;
        List<double> grid = [.. Enumerable.Range(0, Steps + 1).Select(i => coldest + (i * (hottest - coldest) / Steps))];
        double Tau(double t) => (t - reference) / 100;
        double Sum(double t, Func<int, double> of) => places.Sum(j => of(j) * Math.Pow(Tau(t), found.Coefficients[j].Name.Degree));
        double Spread(double t) => Math.Sqrt(
            places.Sum(j => Covariance(found.Coefficients[j], found.Coefficients[j]) * Math.Pow(Tau(t), 2 * found.Coefficients[j].Name.Degree))
            + found.Correlations.Where(c => c.Pair.First.Shape == shape && c.Pair.Second.Shape == shape).Sum(c => 2 * c.Value.Value
                * Covariance(Of(found, c.Pair.First), Of(found, c.Pair.Second)) * Math.Pow(Tau(t), c.Pair.First.Degree + c.Pair.Second.Degree)));
        IReadOnlyList<Spot> Curve(Func<double, double> at) => [.. grid.Select(t => new Spot(t, at(t)))];
        double Mean(double t) => Sum(t, j => found.Coefficients[j].Units.Mean.Value);
        return new FamilyCurves(
            [.. found.Curves.Select(unit => Curve(t => Sum(t, j => unit.Coefficients[j])))],
            [.. found.SuspectCurves.Select(unit => Curve(t => Sum(t, j => unit.Coefficients[j])))],
            Curve(Mean), Curve(t => Mean(t) + (3 * Spread(t))), Curve(t => Mean(t) - (3 * Spread(t))));
    }

    private static CoefficientEstimate Of(Characterization found, CoefficientName name) => found.Coefficients.Single(c => c.Name == name);

    /// <summary>Of two coefficients that are fully correlated; lots have the correlations of the units.</summary>
    private static double Covariance(CoefficientEstimate a, CoefficientEstimate b) =>
        (a.Units.Sigma.Value * b.Units.Sigma.Value) + (a.LotSigma.Value * b.LotSigma.Value);
}
