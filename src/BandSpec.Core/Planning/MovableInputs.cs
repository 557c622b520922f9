using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>Every number of an application that a margin depends on, with the step that engineers think in.</summary>
internal sealed class MovableInputs(Application application)
{
    private const double ErrorStep = 0.01;
    private readonly Requirement requirement = application.Requirement;
    private readonly Platform platform = application.Platform;
    private readonly Station station = application.Station;

    /// <summary>All of them, requirement, platform, station.</summary>
    public IEnumerable<MovableInput> All() =>
        [.. OfRequirement(), .. OfTemperature(), .. OfFurtherTerms(), .. OfCoefficients(), .. OfPlatform(), .. OfStation()];

    private IEnumerable<MovableInput> OfRequirement()
    {
        for (int i = 0; i < requirement.AllowedError.Count; i++)
        {
            int region = i;
            yield return Error($"allowed-error[{i}]", d => With(requirement with { AllowedError = Changed(requirement.AllowedError, region, a => Wider(a, d)) }));
        }

        yield return Number("safety-factor", d => With(requirement with { SafetyFactor = requirement.SafetyFactor + d }));
        CapabilityTarget target = requirement.Capability;
        yield return Number("capability.sample", d => With(requirement with { Capability = target with { Sample = target.Sample + d } }));
        yield return Number("capability.long-run", d => With(requirement with { Capability = target with { LongRun = target.LongRun + d } }));
    }

    /// <summary>Both ends of the range with the outermost region and bin, and the dwell of each bin in percent of it.</summary>
    private IEnumerable<MovableInput> OfTemperature()
    {
        OperatingTemperature range = requirement.Temperature;
        int lastRegion = requirement.AllowedError.Count - 1;
        yield return Kelvin("temperature.lower", d => With(requirement with
        {
            Temperature = range with { Lower = Moved(range.Lower, d) },
            AllowedError = Changed(requirement.AllowedError, 0, a => a with { From = Moved(a.From, d) }),
            Profile = [.. requirement.Profile.Select(b => b.From == range.Lower || d > 0 ? b with { From = Temperature.Max(b.From, Moved(range.Lower, d)) } : b)],
        }));
        yield return Kelvin("temperature.upper", d => With(requirement with
        {
            Temperature = range with { Upper = Moved(range.Upper, d) },
            AllowedError = Changed(requirement.AllowedError, lastRegion, a => a with { To = Moved(a.To, d) }),
            Profile = [.. requirement.Profile.Select(b => b.To == range.Upper || d < 0 ? b with { To = Temperature.Min(b.To, Moved(range.Upper, d)) } : b)],
        }));
        for (int i = 0; i < requirement.Profile.Count; i++)
        {
            int bin = i;
            yield return new MovableInput($"temperature.profile[{i}].dwell", 1, "%", d => With(requirement with
            {
                Profile = Changed(requirement.Profile, bin, b => b with { Dwell = Duration.FromHours(b.Dwell.Hours * (1 + (d / 100))) }),
            }));
        }
    }

    private IEnumerable<MovableInput> OfFurtherTerms()
    {
        for (int i = 0; i < requirement.FurtherTerms.Count; i++)
        {
            int term = i;
            yield return Error($"further-terms[{i}].bound", d => With(
                requirement with { FurtherTerms = Changed(requirement.FurtherTerms, term, t => t with { Bound = By(t.Bound, d) }) }));
            yield return Error($"further-terms[{i}].sigma", d => With(
                requirement with { FurtherTerms = Changed(requirement.FurtherTerms, term, t => t with { Sigma = By(t.Sigma, d) }) }));
        }
    }

    private IEnumerable<MovableInput> OfCoefficients()
    {
        for (int i = 0; i < platform.RawError.Count; i++)
        {
            int at = i;
            RawErrorCoefficient c = platform.RawError[i];
            string name = $"raw-error.{c.Name.Shape switch { PressureShape.Zero => "zero", PressureShape.Span => "span", PressureShape.Bow => "bow", _ => "s-shape" }}.{c.Name.Degree}";
            yield return Error($"{name}.mean", d => With(platform with { RawError = Changed(platform.RawError, at, r => r with { Mean = r.Mean + d }) }));
            yield return Error($"{name}.sigma", d => With(platform with { RawError = Changed(platform.RawError, at, r => r with { Sigma = r.Sigma + d }) }));
            yield return Error($"{name}.lot-sigma", d => With(platform with { RawError = Changed(platform.RawError, at, r => r with { LotSigma = r.LotSigma + d }) }));
        }
    }

    private IEnumerable<MovableInput> OfPlatform()
    {
        Platform p = platform;
        return
        [
            .. OfSpread("pressure-hysteresis", p.PressureHysteresis, s => p with { PressureHysteresis = s }),
            .. OfSpread("thermal-hysteresis", p.ThermalHysteresis, s => p with { ThermalHysteresis = s }),
            Error("repeatability", d => With(p with { Repeatability = By(p.Repeatability, d) })),
            .. OfSpread("ageing.zero", p.Ageing.Zero, s => p with { Ageing = p.Ageing with { Zero = s } }),
            .. OfSpread("ageing.span", p.Ageing.Span, s => p with { Ageing = p.Ageing with { Span = s } }),
        ];
    }

    private IEnumerable<MovableInput> OfSpread(string key, Spread now, Func<Spread, Platform> with) =>
    [
        Error($"{key}.mean", d => With(with(now with { Mean = By(now.Mean, d) }))),
        Error($"{key}.sigma", d => With(with(now with { Sigma = By(now.Sigma, d) }))),
    ];

    private IEnumerable<MovableInput> OfStation()
    {
        Station s = station;
        return
        [
            Error("pressure-standard.zero", d => With(s with { StandardZero = By(s.StandardZero, d) })),
            Error("pressure-standard.proportional", d => With(s with { StandardProportional = By(s.StandardProportional, d) })),
            Error("reading-noise", d => With(s with { ReadingNoise = By(s.ReadingNoise, d) })),
            Kelvin("soak-gradient", d => With(s with { SoakGradient = TemperatureDifference.FromKelvin(s.SoakGradient.Kelvin + d) })),
        ];
    }

    private static AllowedErrorRegion Wider(AllowedErrorRegion region, double d) =>
        region with { Limit = By(region.Limit, d), LimitAtEnd = region.LimitAtEnd is { } end ? By(end, d) : null };

    private static IReadOnlyList<T> Changed<T>(IReadOnlyList<T> list, int at, Func<T, T> change) => [.. list.Select((item, i) => i == at ? change(item) : item)];

    private static PercentOfSpan By(PercentOfSpan error, double d) => PercentOfSpan.FromPercent(error.Percent + d);

    private static Temperature Moved(Temperature temperature, double kelvin) => temperature + TemperatureDifference.FromKelvin(kelvin);

    private static MovableInput Error(string key, Func<double, Application?> moved) => new(key, ErrorStep, "%FS", moved);

    private static MovableInput Kelvin(string key, Func<double, Application?> moved) => new(key, 1, "K", moved);

    private static MovableInput Number(string key, Func<double, Application?> moved) => new(key, 0.01, "", moved);

    private Application? With(Requirement changed) => Application.Check(changed, platform, station).Value;

    private Application? With(Platform changed) => Application.Check(requirement, changed, station).Value;

    private Application? With(Station changed) => Application.Check(requirement, platform, changed).Value;
}
