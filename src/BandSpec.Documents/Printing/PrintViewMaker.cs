using System.Globalization;
using BandSpec.Core.Bands;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;

namespace BandSpec.Documents.Printing;

/// <summary>Rounds a finished specification, once: bands up, limits inward, margins down.</summary>
internal sealed class PrintViewMaker
{
    private const double MarginStep = 0.001, CapabilityStep = 0.01;
    private const int SigmaDecimals = 3;

    private readonly Specification _specification;
    private readonly Requirement _requirement;
    private readonly string _sign;
    private readonly int _bandDecimals;

    public PrintViewMaker(Specification specification, string decimalSign)
    {
        (_specification, _requirement, _sign) = (specification, specification.Application.Requirement, decimalSign);
        _bandDecimals = Rounded.Decimals(_requirement.Rounding.Band.Percent);
        Regions = [.. specification.Bands.Regions.Select(Region)];
    }

    private IReadOnlyList<RegionView> Regions { get; }

    public PrintView Make(IReadOnlyList<DigestView> inputs, string program, string standing)
    {
        var inputViews = new InputViews(_requirement, _sign);
        var platform = _specification.Application.Platform;
        return new PrintView(
            inputViews.Identity, inputViews.Range(platform), inputViews.Output, inputViews.Temperature, Profile(inputViews), Regions,
            Verdict(), new PlanViews(_specification, _sign).Plan, [.. Terms()], [.. Derived()],
            [.. new PointViews(_requirement).Of(_specification.VerificationPoints)], Test(),
            platform.Name, platform.Revision, _specification.Application.Station.Name, inputs, program, standing, _sign)
        {
            Sample = Sample(platform.Sample),
            Optimum = new PlanViews(_specification, _sign).Optimum,
            Decisions = _specification.Decisions is { Rules: [{ Points.Count: > 0 }, ..] } decisions ? new DecisionViewMaker(decisions, _sign).Make() : null,
            LacksDecisions = _specification.LeftOut.HasFlag(DraftExtras.Decisions),
            LacksGains = _specification.LeftOut.HasFlag(DraftExtras.Gains),
            Diagnosis = new DiagnosisViews(_specification, Regions, _sign).Diagnosis,
        };
    }

    private SampleView? Sample(PlatformSample? sample) => sample is null || _specification.Bound is not { } bound
        ? null
        : new SampleView(
            Whole(sample.Units), Whole(sample.Lots), Whole(sample.Readings), Shown(Rounded.Given(100 * bound.Confidence)), Margin(bound.Lower),
            _specification.FurtherUnits is { } further ? Whole(further) : "",
            !_specification.Feasible && _specification.Bands.Margin >= 1 && _specification.Choice.HoldsEverywhere);

    private static string Whole(int count) => count.ToString(CultureInfo.InvariantCulture);

    private string Shown(Rounded figure) => figure.Shown(_sign);

    private string Band(PercentOfSpan value) => Shown(Rounded.Up(value.Percent, _requirement.Rounding.Band.Percent));

    private string Limit(PercentOfSpan value) => Shown(Rounded.Down(value.Percent, _requirement.Rounding.Limit.Percent));

    // What is nothing by its nature is told apart from what rounds to nothing.
    private string Sigma(PercentOfSpan value) => value.Percent == 0 ? "0" : Shown(Rounded.Nearest(value.Percent, SigmaDecimals));

    private string Margin(double value) => Index(value, MarginStep);

    // An index of what does not scatter at all is infinite.
    private string Index(double value, double step) => double.IsInfinity(value) ? "\u221e" : Shown(Rounded.Down(value, step));

    private RegionView Region(RegionBand band, int index)
    {
        var allowance = _requirement.AllowedError[index];
        string Allowed(double percent) => Shown(Rounded.Given(percent, _bandDecimals));
        return new RegionView(
            Shown(Rounded.Given(band.From.Celsius)), Shown(Rounded.Given(band.To.Celsius)),
            Allowed(band.AllowedTightest.Percent), Allowed(allowance.Limit.Percent),
            allowance.LimitAtEnd is { } end && end != allowance.Limit ? Allowed(end.Percent) : "",
            allowance.OfReading > 0 ? Shown(Rounded.Given(100 * allowance.OfReading)) : "",
            Band(band.Maximum), Band(band.Typical), Margin(band.Margin), band.Margin >= 1,
            Shown(Rounded.Given(Coarse(_requirement.Pressure, band.Worst.PressureFraction))),
            Shown(Rounded.Given(Math.Round(band.Worst.Temperature.Celsius, 1))));
    }

    // Where the margin is least matters to a thousandth of the range; more digits are those of a search, not of the figure.
    private static double Coarse(PressureRange range, double fraction)
    {
        var span = range.At(1).Value - range.At(0).Value;
        return Math.Round(range.At(fraction).Value, Math.Clamp(2 - (int)Math.Floor(Math.Log10(span)), 0, 9));
    }

    private ProfileView Profile(InputViews inputs)
    {
        var figures = _specification.Profile;
        return new ProfileView(
            inputs.Bins, inputs.Hours, inputs.Years, Shown(Rounded.Nearest(figures.RmsError.Percent, _bandDecimals + 1)),
            Shown(Rounded.PerMillion(figures.OutsideProbability)), Shown(Rounded.Nearest(figures.EquivalentTime.Hours, 0)),
            Shown(Rounded.Nearest(figures.AgeFactor, 2)));
    }

    private VerdictView Verdict()
    {
        var bands = _specification.Bands;
        // Of regions equally tight the one that is so throughout, rather than only at its end, is named.
        var tightest = Enumerable.Range(0, Regions.Count)
            .OrderBy(i => bands.Regions[i].AllowedTightest.Percent)
            .ThenBy(i => Widest(_requirement.AllowedError[i]))
            .First();
        return new VerdictView(
            _specification.Feasible, Margin(bands.Margin), Margin(_specification.Floor.Margin), _specification.Floor.Margin >= 1,
            Regions[bands.Worst.Region], Regions[tightest]);
    }

    private static double Widest(AllowedErrorRegion region) => Math.Max(region.Limit.Percent, (region.LimitAtEnd ?? region.Limit).Percent);

    private TestView Test()
    {
        var (rules, capability) = (_requirement.Test, _requirement.Capability);
        string Given(double value) => Shown(Rounded.Given(value));
        return new TestView(
            DecisionViewMaker.Key(rules.Rule), Given(rules.GuardBand), rules.GuardBand > 0, rules.Risk is { } risk ? Given(100 * risk) : "", rules.Promise == Core.Requirements.Promise.EveryUnit, Given(capability.Sample), Given(capability.LongRun),
            Shown(Rounded.Nearest(3 * capability.Sample, 2)), Shown(Rounded.Nearest(3 * capability.LongRun, 2)),
            Given(_requirement.SafetyFactor), Given(_requirement.Rounding.Band.Percent), Given(_requirement.Rounding.Limit.Percent),
            _specification.Application.Station.ReadingsAveraged.ToString(CultureInfo.InvariantCulture));
    }

    // A region's own terms are shown at the region's point of least margin, shared terms at that of the whole range.
    private IEnumerable<TermView> Terms()
    {
        foreach (var share in _specification.Bands.Worst.Terms)
        {
            var allotted = _specification.Allocation.Terms.Where(t => t.Term == share.Term).ToList();
            var perRegion = share.Term.Scope == Core.Residuals.TermScope.Region;
            if (!perRegion) yield return Term(share, null, allotted.FirstOrDefault());
            else
                for (int r = 0; r < Regions.Count; r++)
                    yield return Term(
                        _specification.Bands.Regions[r].Worst.Terms.First(t => t.Term == share.Term), r,
                        allotted.FirstOrDefault(t => t.Region == r));
        }
    }

    private TermView Term(TermShare share, int? region, Core.Allocating.TermAllocation? allotted)
    {
        var group = TermGroups.Of(share.Term.Key);
        return new TermView(
            group, share.Term.Key, group == TermGroups.Further ? share.Term.Key : "", region is { } r ? Regions[r] : null,
            Sigma(share.Added), Sigma(share.SigmaSample), Sigma(share.SigmaLongRun),
            allotted is null ? "" : Limit(allotted.Limit), allotted is null ? "" : Index(allotted.Capability, CapabilityStep),
            allotted is null ? "" : Shown(Rounded.PerMillion(allotted.OutsideFraction)),
            allotted?.Held ?? false);
    }

    private IEnumerable<DerivedView> Derived() => _specification.DerivedLimits.GroupBy(d => d.Name).SelectMany(g => g).Select(d =>
        new DerivedView(TermGroups.OfDerived(d.Name), d.Name, d.Region is { } r ? Regions[r] : null, Limit(d.Limit)));
}
