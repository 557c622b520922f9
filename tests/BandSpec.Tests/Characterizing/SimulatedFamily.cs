using BandSpec.Core.Characterizing;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;

namespace BandSpec.Tests.Characterizing;

/// <summary>Readings of units drawn from known statistics, in the plainest way: no formula is shared with what is tested.</summary>
internal sealed class SimulatedFamily(Platform truth, int seed)
{
    private readonly Random random = new(seed);

    /// <summary>The part of readings that were not taken, at random.</summary>
    public double Gaps { get; init; }

    /// <summary>Chamber settings in the order in which they are visited; a unit comes from 25 °C.</summary>
    public IReadOnlyList<double> Visits { get; init; } = [25, -40, -10, 25, 60, 95, 125, 25];

    /// <summary>Pressures of a stroke, rising; the falling ones are the same without the last.</summary>
    public IReadOnlyList<double> Pressures { get; init; } = [0, 0.5, 1];

    /// <summary>What is added to a unit's error at a reduced temperature: a spoiled unit.</summary>
    public Func<string, double, double> Spoiling { get; init; } = (_, _) => 0;

    /// <summary>By how much a unit's readings scatter more than the family's.</summary>
    public Func<string, double> Scatter { get; init; } = _ => 1;

    public IReadOnlyList<UnitReading> Readings(int lots, int unitsInLot)
    {
        List<UnitReading> readings = [];
        for (int lot = 0; lot < lots; lot++)
        {
            double[] centre = Draw([.. truth.RawError.Select(c => c.Mean)], [.. truth.RawError.Select(c => c.LotSigma)]);
            for (int unit = 0; unit < unitsInLot; unit++)
                readings.AddRange(Unit($"L{lot + 1}", $"{(lot * unitsInLot) + unit + 1:000}", centre));
        }

        return [.. readings.Select((reading, i) => reading with { Line = i + 2 })];
    }

    private IEnumerable<UnitReading> Unit(string lot, string name, double[] centre)
    {
        double[] coefficients = Draw(centre, [.. truth.RawError.Select(c => c.Sigma)]);
        double pressure = Normal(truth.PressureHysteresis), thermal = Normal(truth.ThermalHysteresis);
        double before = 25;
        foreach (double celsius in Visits)
        {
            double tau = (celsius - truth.Temperature.Reference.Celsius) / 100;
            foreach ((double x, PressureDirection direction) in Strokes())
            {
                double error = Curve(coefficients, x, tau) + Spoiling(name, tau);
                error += (direction == PressureDirection.Falling ? 1 : -1) * pressure / 2 * 4 * x * (1 - x);
                error += Math.Sign(before - celsius) * (celsius == 25 ? thermal : 0);
                error += truth.Repeatability.Percent * Scatter(name) * Normal();
                if (random.NextDouble() >= Gaps)
                    yield return new UnitReading
                    {
                        Lot = lot, Unit = name, Temperature = Temperature.FromCelsius(celsius), PressureFraction = x,
                        Direction = direction, Cycle = 1, Error = PercentOfSpan.FromPercent(error), Line = 0,
                    };
            }

            before = celsius;
        }
    }

    private IEnumerable<(double X, PressureDirection Direction)> Strokes() =>
        [.. Pressures.Select(x => (x, PressureDirection.Rising)), .. Pressures.SkipLast(1).Reverse().Select(x => (x, PressureDirection.Falling))];

    /// <summary>Coefficients about their means, correlated as the platform says, by the square root of the covariance.</summary>
    private double[] Draw(double[] mean, double[] sigma)
    {
        double[] normal = [.. mean.Select(_ => Normal())];
        foreach (CoefficientCorrelation c in truth.Correlations)
        {
            (int i, int j) = (IndexOf(c.First), IndexOf(c.Second));
            normal[j] = (c.Value * normal[i]) + (Math.Sqrt(1 - (c.Value * c.Value)) * normal[j]);
        }

        return [.. mean.Select((m, j) => m + (sigma[j] * normal[j]))];
    }

    private int IndexOf(CoefficientName name) => truth.RawError.ToList().FindIndex(c => c.Name == name);

    private double Curve(double[] coefficients, double x, double tau)
    {
        double sum = 0;
        for (int j = 0; j < coefficients.Length; j++)
        {
            CoefficientName name = truth.RawError[j].Name;
            double shape = name.Shape switch
            {
                PressureShape.Zero => 1,
                PressureShape.Span => x,
                PressureShape.Bow => 4 * x * (1 - x),
                _ => 6 * Math.Sqrt(3) * x * (1 - x) * (1 - (2 * x)),
            };
            sum += coefficients[j] * shape * Math.Pow(tau, name.Degree);
        }

        return sum;
    }

    private double Normal(Spread spread) => spread.Mean.Percent + (spread.Sigma.Percent * Normal());

    /// <summary>A standard normal number (Box &amp; Muller 1958).</summary>
    private double Normal() => Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
