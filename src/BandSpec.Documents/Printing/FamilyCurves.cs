using BandSpec.Core.Characterizing;
using BandSpec.Core.Requirements;
using BandSpec.Documents.Charts;

namespace BandSpec.Documents.Printing;

/// <summary>Curves of one pressure shape over temperature: of each unit, of the mean, and three standard deviations over lots about it.</summary>
internal sealed record FamilyCurves(
    IReadOnlyList<IReadOnlyList<Spot>> Units, IReadOnlyList<Spot> Mean, IReadOnlyList<Spot> Above, IReadOnlyList<Spot> Below)
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
        double Spread(double t) => Math.Sqrt(places.Sum(j => Variance(found.Coefficients[j]) * Math.Pow(Tau(t), 2 * found.Coefficients[j].Name.Degree)));
        IReadOnlyList<Spot> Curve(Func<double, double> at) => [.. grid.Select(t => new Spot(t, at(t)))];
        double Mean(double t) => Sum(t, j => found.Coefficients[j].Units.Mean.Value);
        return new FamilyCurves(
            [.. found.Curves.Select(unit => Curve(t => Sum(t, j => unit.Coefficients[j])))],
            Curve(Mean), Curve(t => Mean(t) + (3 * Spread(t))), Curve(t => Mean(t) - (3 * Spread(t))));
    }

    private static double Variance(CoefficientEstimate c) =>
        (c.Units.Sigma.Value * c.Units.Sigma.Value) + (c.LotSigma.Value * c.LotSigma.Value);
}
