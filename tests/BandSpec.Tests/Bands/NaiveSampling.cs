using BandSpec.Core.Requirements;

namespace BandSpec.Tests.Bands;

/// <summary>
/// Units made one by one in the plainest way there is: <see cref="Random"/>, the library's sine and logarithm, normal
/// equations solved by elimination. Slow and short, written from the statement of the model and from nothing in the program, so that the
/// closed form has somebody to disagree with.
/// </summary>
internal sealed class NaiveSampling
{
    private readonly Requirement requirement;
    private readonly Platform platform;
    private readonly Station station;
    private readonly CompensationPlan plan;
    private readonly Random random;
    private readonly CoefficientName[] rawNames;
    private readonly CoefficientName[] storedNames;
    private readonly double[][] rows;
    private readonly double ageFactor;

    public NaiveSampling(Requirement requirement, Platform platform, Station station, CompensationPlan plan, int seed)
    {
        (this.requirement, this.platform, this.station, this.plan) = (requirement, platform, station, plan);
        random = new Random(seed);
        rawNames = [.. platform.RawError.Select(c => c.Name)];
        storedNames = [.. StoredNames(plan, station.PressurePoints.Reference.Count)];
        rows = [.. plan.Points.Select(p => storedNames.Select(n => Shape(n.Shape, p.PressureFraction) * Power(Tau(p.Temperature.Celsius), n.Degree)).ToArray())];
        ageFactor = Math.Pow(requirement.Profile.Sum(HoursInTest) / platform.Ageing.TestDuration.Hours, platform.Ageing.TimeExponent);
    }

    /// <summary>One error at the end of life per place, of a unit of the mean lot or of a lot of its own.</summary>
    /// <param name="places">Pressure fractions and temperatures.</param>
    /// <param name="sides">At each place the side, −1 or 1, on which everything that only adds is added.</param>
    /// <param name="lots">Whether the unit's lot is shifted too.</param>
    /// <returns>What compensation left over, and the whole error as the output shows it.</returns>
    public (double Residue, double Whole)[] Unit(IReadOnlyList<(double X, double Celsius)> places, IReadOnlyList<double> sides, bool lots)
    {
        double[] raw = RawError(lots);
        double[] stored = Fit(raw);
        double hysteresis = Draw(platform.PressureHysteresis), thermal = Draw(platform.ThermalHysteresis);
        double zero = ageFactor * Draw(platform.Ageing.Zero), span = ageFactor * Draw(platform.Ageing.Span);
        double further = requirement.FurtherTerms.Sum(f => f.Sigma.Percent * Normal()), bound = requirement.FurtherTerms.Sum(f => f.Bound.Percent);
        (double, double)[] errors = new (double, double)[places.Count];
        for (int i = 0; i < places.Count; i++)
        {
            (double x, double celsius) = places[i];
            double residue = Error(rawNames, raw, x, celsius) - Error(storedNames, stored, x, celsius);
            double added = (hysteresis / 2 * 4 * x * (1 - x)) + thermal + bound;
            double error = residue + zero + (span * x) + further + (platform.Repeatability.Percent * Normal()) + (sides[i] * added);
            errors[i] = (residue, Rounded(error, x));
        }
        return errors;
    }

    private double Normal() => Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());

    private double Draw(Spread spread) => spread.Mean.Percent + (spread.Sigma.Percent * Normal());

    private double Tau(double celsius) => (celsius - platform.Temperature.Reference.Celsius) / 100;

    private static double Shape(PressureShape shape, double x) => shape switch
    {
        PressureShape.Zero => 1,
        PressureShape.Span => x,
        PressureShape.Bow => 4 * x * (1 - x),
        _ => 6 * Math.Sqrt(3) * x * (1 - x) * (1 - (2 * x)),
    };

    private double Error(CoefficientName[] names, double[] coefficients, double x, double celsius)
    {
        double sum = 0;
        for (int i = 0; i < names.Length; i++)
            sum += coefficients[i] * Shape(names[i].Shape, x) * Power(Tau(celsius), names[i].Degree);
        return sum;
    }

    private static double Power(double value, int degree)
    {
        double product = 1;
        for (int k = 0; k < degree; k++)
            product *= value;
        return product;
    }

    /// <summary>Only pairs of coefficients are correlated in the demos, so the second of a pair is made from the first.</summary>
    private double[] RawError(bool lots)
    {
        double[] units = [.. rawNames.Select(_ => Normal())];
        double[] shifts = [.. rawNames.Select(_ => lots ? Normal() : 0)];
        foreach (CoefficientCorrelation pair in platform.Correlations)
        {
            (int first, int second) = (Array.IndexOf(rawNames, pair.First), Array.IndexOf(rawNames, pair.Second));
            foreach (double[] z in new[] { units, shifts })
                z[second] = (pair.Value * z[first]) + (Math.Sqrt(1 - (pair.Value * pair.Value)) * z[second]);
        }
        return [.. platform.RawError.Select((c, i) => c.Mean + (c.Sigma * units[i]) + (c.LotSigma * shifts[i]))];
    }

    private double[] Fit(double[] raw)
    {
        double zero = station.StandardZero.Percent * Normal(), proportional = station.StandardProportional.Percent * Normal();
        double[] readings = [.. plan.Points.Select(p =>
            Reading(raw, p.PressureFraction, p.Temperature.Celsius) + zero + (proportional * p.PressureFraction))];
        return NormalEquations(rows, readings);
    }

    private static IEnumerable<CoefficientName> StoredNames(CompensationPlan plan, int pressures)
    {
        for (int k = 0; k <= plan.ZeroDegree; k++)
            yield return new CoefficientName(PressureShape.Zero, k);
        for (int k = 0; k <= plan.SpanDegree; k++)
            yield return new CoefficientName(PressureShape.Span, k);
        if (pressures >= 3)
            yield return new CoefficientName(PressureShape.Bow, 0);
        if (pressures >= 4)
            yield return new CoefficientName(PressureShape.SShape, 0);
    }

    /// <summary>The mean of the station's readings at a point, every one drawn; the unit stands at a temperature not quite the chamber's.</summary>
    private double Reading(double[] raw, double x, double celsius)
    {
        double error = Error(rawNames, raw, x, celsius + (station.SoakGradient.Kelvin * Normal()));
        double sum = 0;
        for (int i = 0; i < station.ReadingsAveraged; i++)
            sum += error + (platform.Repeatability.Percent * Normal()) + (station.ReadingNoise.Percent * Normal());
        return sum / station.ReadingsAveraged;
    }

    private static double[] NormalEquations(double[][] rows, double[] readings)
    {
        int n = rows[0].Length;
        double[,] a = new double[n, n + 1];
        for (int r = 0; r < rows.Length; r++)
            for (int i = 0; i < n; i++)
            {
                for (int j = 0; j < n; j++)
                    a[i, j] += rows[r][i] * rows[r][j];
                a[i, n] += rows[r][i] * readings[r];
            }
        for (int pivot = 0; pivot < n; pivot++)
            for (int i = 0; i < n; i++)
                if (i != pivot)
                    Eliminate(a, pivot, i, n);
        return [.. Enumerable.Range(0, n).Select(i => a[i, n] / a[i, i])];
    }

    private static void Eliminate(double[,] a, int pivot, int row, int n)
    {
        double factor = a[row, pivot] / a[pivot, pivot];
        for (int j = pivot; j <= n; j++)
            a[row, j] -= factor * a[pivot, j];
    }

    private double HoursInTest(DwellBin bin)
    {
        const double Boltzmann = 8.617333262e-5; // eV/K, CODATA 2018
        return Enumerable.Range(0, 1000).Average(i =>
        {
            double kelvin = bin.From.Kelvin + ((bin.To - bin.From).Kelvin * (i + 0.5) / 1000);
            return bin.Dwell.Hours * Math.Exp(platform.Ageing.ActivationEnergy / Boltzmann * ((1 / platform.Ageing.TestTemperature.Kelvin) - (1 / kelvin)));
        });
    }

    private double Rounded(double error, double x)
    {
        OutputSignal output = requirement.Output;
        if (output.Step is not { } step)
            return error;
        double nominal = output.AtLower + (x * output.Span);
        return (Math.Round((nominal + (output.Span * error / 100)) / step) * step - nominal) / output.Span * 100;
    }
}
