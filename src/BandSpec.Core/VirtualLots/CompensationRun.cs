using System.Runtime.Intrinsics;
using BandSpec.Core.Requirements;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// A compensation run: each unit is read at the plan's points and its correction is fitted and stored. At every point the unit is not quite
/// at the chamber's temperature and its raw error is taken at the temperature it does have; the reading carries the noise of unit and
/// station and the error of the pressure standard, which stays the same over the run. The raw channel is read at its full digital
/// resolution; the output's steps come later, at the output.
/// </summary>
internal sealed class CompensationRun
{
    private readonly ShapePlaces places;
    private readonly StoredCorrection correction;
    private readonly double[] taus;
    private readonly ShapeValues[] shapes;
    private readonly double soak;
    private readonly double noise;
    private readonly double standardZero;
    private readonly double standardProportional;

    /// <summary>The run of a plan on a station.</summary>
    public CompensationRun(LotSubject subject, ShapePlaces places)
    {
        this.places = places;
        double TauOf(PlanPoint point) => (point.Temperature - subject.Platform.Temperature.Reference).Kelvin / 100;
        Station station = subject.Station;
        correction = StoredCorrection.For(subject.Plan, station.PressurePoints.Reference.Count, TauOf, places);
        taus = [.. subject.Plan.Points.Select(TauOf)];
        shapes = [.. subject.Plan.Points.Select(p => ShapeValues.At(p.PressureFraction))];
        soak = station.SoakGradient.Kelvin / 100;
        double repeatability = subject.Platform.Repeatability.Percent;
        double reading = station.ReadingNoise.Percent;
        noise = Math.Sqrt(((repeatability * repeatability) + (reading * reading)) / station.ReadingsAveraged);
        standardZero = station.StandardZero.Percent;
        standardProportional = station.StandardProportional.Percent;
    }

    /// <summary>How many points are read.</summary>
    public int Points => taus.Length;

    /// <summary>Every number of the run, to tell one from another.</summary>
    public IEnumerable<double> Numbers =>
        correction.Numbers.Concat(taus).Concat(shapes.Select(s => s.Span)).Concat([soak, noise, standardZero, standardProportional]);

    /// <summary>What a run without any chance leaves of a raw error.</summary>
    /// <param name="raw">The raw error's coefficients, one number a place.</param>
    public double[] LeftOf(double[] raw)
    {
        Lanes[] error = [.. raw.Select(Vector512.Create)];
        Lanes[] still = new Lanes[Points];
        Compensate(new RunChance(still, still, new Lanes[2]), new Lanes[Points], error);
        return [.. error.Select(e => e.ToScalar())];
    }

    /// <summary>
    /// What one standard deviation of each error of the run leaves in the coefficients: noise and unsettled temperature at each point, the
    /// standard's zero and proportional error. Unsettled temperature has the variance of its product with the slopes of units.
    /// </summary>
    /// <param name="nominal">Mean coefficients of the raw error.</param>
    /// <param name="sources">What scatters them, one standard deviation each.</param>
    public IEnumerable<double[]> CarriedSources(double[] nominal, IReadOnlyList<double[]> sources)
    {
        for (int i = 0; i < Points; i++)
        {
            double slopes = Square(SlopeAt(i, nominal)) + sources.Sum(s => Square(SlopeAt(i, s)));
            double sigma = Math.Sqrt((noise * noise) + (soak * soak * slopes));
            int point = i;
            yield return Carried(p => p == point ? sigma : 0);
        }
        yield return Carried(_ => standardZero);
        yield return Carried(p => standardProportional * shapes[p].Span);
    }

    private double[] Carried(Func<int, double> reading)
    {
        Lanes[] error = new Lanes[places.Count];
        correction.Subtract([.. Enumerable.Range(0, Points).Select(p => Vector512.Create(reading(p)))], error);
        return [.. error.Select(e => e.ToScalar())];
    }

    /// <summary>Slope of an error over reduced temperature at a point, from two readings close by; the step leaves 1e-6 of it at most.</summary>
    private double SlopeAt(int point, double[] coefficients)
    {
        const double Step = 5e-4;
        Lanes[] error = [.. coefficients.Select(Vector512.Create)];
        double Reading(double tau) => places.At(error, 1, shapes[point], Vector512.Create(tau)).ToScalar();
        return (Reading(taus[point] + Step) - Reading(taus[point] - Step)) / (2 * Step);
    }

    private static double Square(double value) => value * value;

    /// <summary>Reads eight units, fits and stores.</summary>
    /// <param name="chance">Standard normal numbers of the run.</param>
    /// <param name="readings">Room for <see cref="Points"/> readings.</param>
    /// <param name="error">The raw error on entry, the error left over on return.</param>
    public void Compensate(in RunChance chance, Span<Lanes> readings, Span<Lanes> error)
    {
        for (int i = 0; i < taus.Length; i++)
        {
            Lanes tau = Vector512.FusedMultiplyAdd(Vector512.Create(soak), chance.Unit[i], Vector512.Create(taus[i]));
            Lanes reading = places.At(error, 1, shapes[i], tau);
            reading = Vector512.FusedMultiplyAdd(Vector512.Create(noise), chance.Reading[i], reading);
            reading = Vector512.FusedMultiplyAdd(Vector512.Create(standardZero), chance.Standard[0], reading);
            readings[i] = Vector512.FusedMultiplyAdd(Vector512.Create(standardProportional * shapes[i].Span), chance.Standard[1], reading);
        }
        correction.Subtract(readings, error);
    }
}

/// <summary>The chance of one run of eight units, all standard normal.</summary>
/// <param name="unit">One number a point.</param>
/// <param name="reading">One number a point.</param>
/// <param name="standard">Two numbers: zero and proportional.</param>
internal readonly ref struct RunChance(ReadOnlySpan<Lanes> unit, ReadOnlySpan<Lanes> reading, ReadOnlySpan<Lanes> standard)
{
    /// <summary>The unit's own at each point: temperature not settled in a compensation run, repeatability in a verification test.</summary>
    public ReadOnlySpan<Lanes> Unit { get; } = unit;

    /// <summary>Noise of the reading at each point.</summary>
    public ReadOnlySpan<Lanes> Reading { get; } = reading;

    /// <summary>The pressure standard: zero and proportional.</summary>
    public ReadOnlySpan<Lanes> Standard { get; } = standard;
}
