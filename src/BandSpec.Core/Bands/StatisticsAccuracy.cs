using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Bands;

/// <summary>Carries the accuracy of the platform's statistics to the nodes of a band.</summary>
internal sealed class StatisticsAccuracy
{
    private readonly Platform platform;
    private readonly PlatformSample sample;
    private readonly BandFormulas formulas;
    private readonly int readingsAveraged;
    private readonly double[,] meanCovariance;
    private readonly CoefficientAccuracy[] coefficients;
    private readonly DriftAccuracyAtEndOfLife drift;

    public StatisticsAccuracy(Application application, PlatformSample sample, BandFormulas formulas)
    {
        (platform, this.sample, this.formulas) = (application.Platform, sample, formulas);
        readingsAveraged = application.Station.ReadingsAveraged;
        List<CoefficientName> order = [.. sample.Coefficients.Select(c => c.Name)];
        int[] places = [.. platform.RawError.Select(c => order.IndexOf(c.Name))];
        coefficients = [.. places.Select(place => sample.Coefficients[place])];
        meanCovariance = new double[places.Length, places.Length];
        for (int i = 0; i < places.Length; i++)
            for (int j = 0; j < places.Length; j++)
                meanCovariance[i, j] = sample.Coefficients[Math.Max(places[i], places[j])].MeanCovariance[Math.Min(places[i], places[j])];
        drift = new DriftAccuracyAtEndOfLife(application, sample.Ageing);
    }

    /// <summary>The accuracy of a node's figures.</summary>
    public NodeAccuracy At(BandNode node)
    {
        double x = node.PressureFraction, hysteresis = PressureShapes.Hysteresis(x) / 2;
        Residue residue = formulas.ResidueAt(x, node.Temperature);
        (double meanOfDrift, double varianceOfDrift) = drift.At(x, Math.Abs(node.Mean.Percent + formulas.DriftMean(x)) > Math.Abs(node.Mean.Percent));
        double mean = Vectors.Form(residue.Coefficients, meanCovariance, residue.Coefficients)
            + Square(hysteresis * MeanError(sample.PressureHysteresis)) + Square(MeanError(sample.ThermalHysteresis)) + meanOfDrift;
        double repeated = 1 + (residue.Weights.Sum(w => w * w) / readingsAveraged);
        double steady = Square(Square(hysteresis) * VarianceError(sample.PressureHysteresis)) + Square(VarianceError(sample.ThermalHysteresis))
            + Square(repeated * sample.RepeatabilityVarianceError) + varianceOfDrift;
        double within = steady + Square(Error(residue.Coefficients, c => c.VarianceError));
        double longRun = within + Square(Error(residue.Coefficients, c => c.LotVarianceError));
        return new NodeAccuracy(mean, Math.Sqrt(within), Math.Sqrt(longRun));
    }

    /// <summary>
    /// Standard error of <c>gᵀΣ̂g</c>, cautiously <c>Σ g_j² se(σ̂_j²)</c>: exact for a covariance estimated as a whole (Wishart), too wide when
    /// the coefficients' variances are estimated independently of each other.
    /// </summary>
    private double Error(double[] g, Func<CoefficientAccuracy, double> error) =>
        coefficients.Select((c, j) => g[j] * g[j] * error(c)).Sum();

    private static double MeanError(SpreadAccuracy? accuracy) => accuracy?.MeanError.Percent ?? 0;

    private static double VarianceError(SpreadAccuracy? accuracy) => accuracy?.VarianceError ?? 0;

    private static double Square(double value) => value * value;
}
