using BandSpec.Core.Characterizing;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Tests.Characterizing;

/// <summary>Readings of units in storage, drawn from known drift statistics in the plainest way.</summary>
internal sealed class SimulatedStorage(Ageing truth, double repeatability, int seed)
{
    private static readonly double[] Hours = [0, 168, 500, 1000];
    private readonly Random random = new(seed);

    public List<DriftReading> Readings(int unitsEach, params double[] temperatures)
    {
        List<DriftReading> readings = [];
        foreach (double celsius in temperatures)
            for (int unit = 0; unit < unitsEach; unit++)
                readings.AddRange(Unit($"{celsius}-{unit + 1}", celsius));
        return readings;
    }

    private IEnumerable<DriftReading> Unit(string name, double celsius)
    {
        double zero = Normal(truth.Zero), span = Normal(truth.Span), startZero = 2 * Normal(), startSpan = 3 * Normal();
        double acceleration = Math.Exp(truth.ActivationEnergy / 8.617333262145e-5
            * ((1 / (truth.TestTemperature.Celsius + 273.15)) - (1 / (celsius + 273.15))));
        foreach (double hours in Hours)
            foreach (double x in new[] { 0.0, 0.5, 1.0 })
            {
                double grown = Math.Pow(acceleration * hours / truth.TestDuration.Hours, truth.TimeExponent);
                double error = startZero + (startSpan * x) + ((zero + (span * x)) * grown) + (repeatability * Normal());
                yield return new DriftReading
                {
                    Unit = name, Storage = Temperature.FromCelsius(celsius), Stored = Duration.FromHours(hours), PressureFraction = x,
                    Error = PercentOfSpan.FromPercent(error), Line = 1,
                };
            }
    }

    private double Normal(Spread spread) => spread.Mean.Percent + (spread.Sigma.Percent * Normal());

    private double Normal() => Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
