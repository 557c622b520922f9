using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics.RareEvents;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// The verification test: every point is read rising or falling, the unit lagging behind by half its hysteresis. The unit's repeatability
/// comes before the output's steps, the station's noise and the error of its standard, drawn anew for this run, after them. Readings are
/// held against the limits in the output's unit, limits included.
/// </summary>
internal sealed class VerificationRun
{
    /// <summary>The tolerance is worked out with the C library's functions; what these differ by on two machines is cut off.</summary>
    private const int ToleranceDigits = 9;

    private readonly TestPoint[] points;
    private readonly OutputSteps steps;
    private readonly ShapePlaces places;
    private readonly double outputPerPercent;
    private readonly double repeatability;
    private readonly double reading;
    private readonly double standardZero;
    private readonly double standardProportional;

    /// <summary>The test of a subject.</summary>
    public VerificationRun(LotSubject subject, ShapePlaces places)
    {
        this.places = places;
        Station station = subject.Station;
        steps = new OutputSteps(subject.Requirement.Output);
        outputPerPercent = subject.Requirement.Output.Span / 100;
        double average = Math.Sqrt(station.ReadingsAveraged);
        repeatability = subject.Platform.Repeatability.Percent / average;
        reading = station.ReadingNoise.Percent / average;
        standardZero = station.StandardZero.Percent;
        standardProportional = station.StandardProportional.Percent;
        Temperatures = [.. subject.VerificationPoints.Select(p => p.Temperature.Celsius).Distinct()];
        points = [.. subject.VerificationPoints.Select(p => PointOf(p, subject))];
    }

    /// <summary>The temperatures of the test in its order, °C.</summary>
    public IReadOnlyList<double> Temperatures { get; }

    /// <summary>How many points are tested.</summary>
    public int Points => points.Length;

    /// <summary>Every number of the test, to tell one from another.</summary>
    public IEnumerable<double> Numbers =>
        points.SelectMany(p => new[] { p.Tau, p.Shapes.Span, p.Side, p.Lower, p.Upper, p.Tolerance })
            .Concat(steps.Numbers).Concat([outputPerPercent, repeatability, reading, standardZero, standardProportional]);

    /// <summary>Tests a lot: marks the accepted units and counts who failed where.</summary>
    public void Test(LotStreams streams, ulong firstUnit, LotUnits lot, TallyPlan plan, Span<long> counts)
    {
        Span<Lanes> unit = new Lanes[points.Length];
        Span<Lanes> station = new Lanes[points.Length];
        Span<Lanes> standard = stackalloc Lanes[2];
        for (int group = 0; group < lot.Groups; group++)
        {
            Vector512<ulong> units = LotStreams.Group(firstUnit, group);
            streams.TestRepeatability.FillNormals(units, 0, unit);
            streams.TestReading.FillNormals(units, 0, station);
            streams.TestStandard.FillNormals(units, 0, standard);
            lot.Accepted[group] = TestGroup(lot, group, new RunChance(unit, station, standard), plan, counts);
        }
    }

    /// <summary>The test as linear readings of a unit, in %FS; the output's steps enter with their variance.</summary>
    /// <param name="law">The law, for the mean unit.</param>
    /// <param name="unit">How units move.</param>
    public Readings Linear(LotLaw law, LinearUnit unit)
    {
        Readings readings = new(unit.Dimensions + law.Traits.Count, standardZero);
        double own = (repeatability * repeatability) + (reading * reading) + (steps.Step * steps.Step / 12);
        double[] weights = new double[readings.Dimensions];
        foreach (TestPoint point in points)
        {
            Array.Clear(weights);
            unit.WeightsAt(point.Shapes, point.Tau, weights);
            weights[unit.Dimensions] = point.Side * law.Traits.Sources(point.Shapes)[0];
            double mean = law.Nominal.At(point.Shapes, point.Tau) + (point.Side * law.Traits.MeanHysteresis(point.Shapes));
            double first = (point.Lower - point.Nominal) / outputPerPercent;
            double second = (point.Upper - point.Nominal) / outputPerPercent;
            (double lower, double upper) = outputPerPercent > 0 ? (first, second) : (second, first);
            readings.Add(weights, new Reading(mean, lower, upper, Math.Sqrt(own), standardProportional * point.Shapes.Span));
        }
        return readings;
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private Lanes TestGroup(LotUnits lot, int group, in RunChance chance, TallyPlan plan, Span<long> counts)
    {
        Lanes passed = Lanes.AllBitsSet;
        for (int i = 0; i < points.Length; i++)
        {
            ref readonly TestPoint point = ref points[i];
            Lanes within = Read(lot, group, i, chance, out Lanes beyond);
            passed &= within;
            counts[plan.FailedAt(i)] += LotOrder.UnitsSideBySide - LaneMasks.Count(within);
            counts[plan.ConsumerAt(i)] += LaneMasks.Count(within & beyond);
            counts[plan.ProducerAt(i)] += LotOrder.UnitsSideBySide - LaneMasks.Count(within | beyond);
            if (point.EndsStage)
                counts[plan.PassedStage(point.Stage)] += LaneMasks.Count(passed);
        }
        counts[(int)Counted.Accepted] += LaneMasks.Count(passed);
        return passed;
    }

    /// <summary>Whether the reading is within the limits, and whether the unit is truly beyond the tolerance.</summary>
    private Lanes Read(LotUnits lot, int group, int i, in RunChance chance, out Lanes beyond)
    {
        ref readonly TestPoint point = ref points[i];
        Lanes nominal = Vector512.Create(point.NominalSteps);
        Lanes error = places.At(lot.Error.AsSpan(group), lot.Groups, point.Shapes, Vector512.Create(point.Tau));
        error = Vector512.FusedMultiplyAdd(Vector512.Create(point.Side * point.Shapes.Bow), lot.PressureHysteresis[group], error);
        beyond = Vector512.GreaterThan(Vector512.Abs(steps.Show(error, nominal)), Vector512.Create(point.Tolerance));
        Lanes shown = steps.Show(Vector512.FusedMultiplyAdd(Vector512.Create(repeatability), chance.Unit[i], error), nominal);
        shown = Vector512.FusedMultiplyAdd(Vector512.Create(reading), chance.Reading[i], shown);
        shown = Vector512.FusedMultiplyAdd(Vector512.Create(standardZero), chance.Standard[0], shown);
        shown = Vector512.FusedMultiplyAdd(Vector512.Create(standardProportional * point.Shapes.Span), chance.Standard[1], shown);
        Lanes output = Vector512.FusedMultiplyAdd(Vector512.Create(outputPerPercent), shown, Vector512.Create(point.Nominal));
        return Vector512.GreaterThanOrEqual(output, Vector512.Create(point.Lower))
            & Vector512.LessThanOrEqual(output, Vector512.Create(point.Upper));
    }

    private TestPoint PointOf(VerificationPoint point, LotSubject subject)
    {
        int stage = Temperatures.ToList().IndexOf(point.Temperature.Celsius);
        VerificationPoint last = subject.VerificationPoints.Last(p => p.Temperature == point.Temperature);
        double tau = (point.Temperature - subject.Platform.Temperature.Reference).Kelvin / 100;
        return new TestPoint(
            tau, ShapeValues.At(point.PressureFraction), point.Direction == PressureDirection.Rising ? -1 : 1,
            point.Nominal, steps.NominalAt(point.PressureFraction), point.Lower, point.Upper, Math.Round(point.Tolerance.Percent, ToleranceDigits),
            stage, ReferenceEquals(point, last));
    }

    /// <summary>One point of the test, in plain numbers; a unit lags, so that it reads low when the pressure rises.</summary>
    private readonly record struct TestPoint(
        double Tau, ShapeValues Shapes, double Side, double Nominal, double NominalSteps, double Lower, double Upper, double Tolerance,
        int Stage, bool EndsStage);
}
