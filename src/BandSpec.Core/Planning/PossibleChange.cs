using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>A figure that could be changed, from what it is to the furthest that makes sense, in steps; each step helps or does nothing.</summary>
/// <param name="Key">What is changed.</param>
/// <param name="Region">The region of an allowed error; otherwise <see langword="null"/>.</param>
/// <param name="Before">The figure as it is.</param>
/// <param name="Steps">How many steps there are to the furthest value; 0 when it is there already.</param>
/// <param name="Step">One step, with its sign.</param>
/// <param name="Unit">The unit of the figure.</param>
/// <param name="With">The application with another figure; nothing when it would contradict itself.</param>
internal sealed record PossibleChange(
    string Key, int? Region, double Before, int Steps, double Step, string Unit, Func<double, Application?> With)
{
    /// <summary>The figure after a number of steps; the furthest value is met exactly where it is zero.</summary>
    public double At(int steps)
    {
        double value = Before + (steps * Step);
        return Before > 0 && value < 1e-9 ? 0 : Math.Round(value, 9);
    }

    /// <summary>The application after a number of steps.</summary>
    public Application? After(int steps) => With(At(steps));
}

/// <summary>The changes that are looked at when no plan fits.</summary>
internal sealed class PossibleChanges(Application application)
{
    private const double LargestAllowance = 20;

    /// <summary>More lists than this take longer than a diagnosis may.</summary>
    private const double MostLists = 2e6;

    private readonly Requirement requirement = application.Requirement;
    private readonly Platform platform = application.Platform;
    private readonly Station station = application.Station;

    /// <summary>All of them; the operating limit is that on the side of the temperature given.</summary>
    public IEnumerable<PossibleChange> All(Temperature binding)
    {
        for (int r = 0; r < requirement.AllowedError.Count; r++)
            yield return AllowedError(r);
        yield return Down("safety-factor", requirement.SafetyFactor, 1, 0.01, "", v => With(requirement with { SafetyFactor = v }));
        yield return Down("capability", requirement.Capability.Sample, LeastCapability(), 0.01, "", v => With(
            requirement with
            {
                Capability = requirement.Capability with { Sample = v, LongRun = requirement.Capability.LongRun * v / requirement.Capability.Sample },
            }));
        yield return binding > requirement.Temperature.Reference ? UpperLimit() : LowerLimit();
        CompensationScope scope = requirement.Compensation;
        yield return new PossibleChange(
            "temperatures", null, scope.MostTemperatures, MoreTemperatures(scope), 1, "",
            v => With(requirement with { Compensation = scope with { MostTemperatures = (int)v } }));
        yield return Down("soak-gradient", station.SoakGradient.Kelvin, 0, 0.01, "K", v => With(station with { SoakGradient = TemperatureDifference.FromKelvin(v) }));
        yield return Down("pressure-standard", 1, 0, 0.01, "", v => With(
            station with { StandardZero = Times(station.StandardZero, v), StandardProportional = Times(station.StandardProportional, v) }));
        yield return Down("repeatability", platform.Repeatability.Percent, 0, 0.001, "%FS", v => With(platform with { Repeatability = Error(v) }));
        yield return Down("ageing", 1, 0, 0.01, "", v => With(
            platform with { Ageing = platform.Ageing with { Zero = Times(platform.Ageing.Zero, v), Span = Times(platform.Ageing.Span, v) } }));
    }

    private PossibleChange AllowedError(int region)
    {
        AllowedErrorRegion now = requirement.AllowedError[region];
        double from = now.Limit.Percent;
        int steps = Math.Max(0, (int)(((LargestAllowance - from) / 0.01) + 1e-9));
        return new PossibleChange("allowed-error", region, from, steps, 0.01, "%FS", v => With(requirement with
        {
            AllowedError =
            [
                .. requirement.AllowedError.Select((a, i) => i != region ? a : a with
                {
                    Limit = Error(v), LimitAtEnd = a.LimitAtEnd is { } end ? Times(end, v / from) : null, OfReading = a.OfReading * v / from,
                }),
            ],
        }));
    }

    /// <summary>Both indices fall in proportion, to the smallest accepted.</summary>
    private double LeastCapability() =>
        AcceptedRanges.Capability.Least * Math.Max(1, requirement.Capability.Sample / requirement.Capability.LongRun) * (1 + 1e-9);

    private int MoreTemperatures(CompensationScope scope)
    {
        int more = 0;
        while (scope.MostTemperatures + more < AcceptedRanges.PlanTemperatures.Most
            && new CandidateLists(scope with { MostTemperatures = scope.MostTemperatures + more + 1 }, requirement.Temperature).Count() <= MostLists)
            more++;
        return more;
    }

    private PossibleChange UpperLimit()
    {
        OperatingTemperature range = requirement.Temperature;
        double least = Math.Max(range.Reference.Celsius, range.Lower.Celsius + NeededWidth);
        return Down("operating-limit-upper", range.Upper.Celsius, least, 1, "°C", v => With(Narrowed(range with { Upper = Temperature.FromCelsius(v) })));
    }

    private PossibleChange LowerLimit()
    {
        OperatingTemperature range = requirement.Temperature;
        double most = Math.Min(range.Reference.Celsius, range.Upper.Celsius - NeededWidth);
        return new PossibleChange(
            "operating-limit-lower", null, range.Lower.Celsius, Math.Max(0, (int)(most - range.Lower.Celsius)), 1, "°C",
            v => With(Narrowed(range with { Lower = Temperature.FromCelsius(v) })));
    }

    /// <summary>Plans of the fewest temperatures have to fit; 10 K more keep the candidates apart.</summary>
    private double NeededWidth =>
        (requirement.Compensation.Separation.Kelvin * (requirement.Compensation.FewestTemperatures - 1)) + 10;

    /// <summary>The requirement over a narrower range: regions, profile and test temperatures are cut off; dwell beyond it is left out.</summary>
    private Requirement Narrowed(OperatingTemperature range) => requirement with
    {
        Temperature = range,
        AllowedError = [.. requirement.AllowedError.Where(a => a.From < range.Upper && a.To > range.Lower).Select(a => Cut(a, range))],
        Profile = [.. requirement.Profile.Where(b => b.From <= range.Upper && b.To >= range.Lower).Select(b => Cut(b, range)).Where(b => b.Dwell.Hours > 0)],
        Test = requirement.Test with { Temperatures = requirement.Test.Temperatures?.Where(t => t >= range.Lower && t <= range.Upper).ToList() },
    };

    private static AllowedErrorRegion Cut(AllowedErrorRegion region, OperatingTemperature range)
    {
        Temperature from = Temperature.Max(region.From, range.Lower), to = Temperature.Min(region.To, range.Upper);
        return region with
        {
            From = from, To = to,
            Limit = Error(region.At(from, 0)),
            LimitAtEnd = region.LimitAtEnd is null ? null : Error(region.At(to, 0)),
        };
    }

    private static DwellBin Cut(DwellBin bin, OperatingTemperature range)
    {
        Temperature from = Temperature.Max(bin.From, range.Lower), to = Temperature.Min(bin.To, range.Upper);
        double width = (bin.To - bin.From).Kelvin;
        return new DwellBin(from, to, width > 0 ? Duration.FromHours(bin.Dwell.Hours * (to - from).Kelvin / width) : bin.Dwell);
    }

    private static PossibleChange Down(string key, double from, double least, double step, string unit, Func<double, Application?> with) =>
        new(key, null, from, Math.Max(0, (int)Math.Ceiling(((from - least) / step) - 1e-9)), -step, unit, v => with(Math.Max(v, least)));

    private Application? With(Requirement changed) => Application.Check(changed, platform, station).Value;

    private Application? With(Station changed) => Application.Check(requirement, platform, changed).Value;

    private Application? With(Platform changed) => Application.Check(requirement, changed, station).Value;

    private static PercentOfSpan Error(double percent) => PercentOfSpan.FromPercent(percent);

    private static PercentOfSpan Times(PercentOfSpan error, double factor) => Error(error.Percent * factor);

    private static Spread Times(Spread spread, double factor) => new(Times(spread.Mean, factor), Times(spread.Sigma, factor));
}
