using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Specifying;
using BandSpec.Documents.Charts;
using BandSpec.Documents.Printing;
using BandSpec.Documents.Templates;

namespace BandSpec.Documents.Composing;

/// <summary>
/// The charts of a specification, made once for page, SVG and Markdown. Curves are drawn from the figures before rounding.
/// </summary>
internal sealed class SpecificationCharts
{
    private readonly Specification _specification;
    private readonly PrintView _view;
    private readonly Words _words;

    public SpecificationCharts(Specification specification, PrintView view, Words words)
    {
        (_specification, _view, _words) = (specification, view, words);
        Dwell = DwellBins();
    }

    private IReadOnlyList<DwellBin> Dwell { get; }

    private bool HasDesign => _specification.Application.Requirement.SafetyFactor > 1;

    private string Sign => _view.DecimalSign;

    public BandChart Band
    {
        get
        {
            var worst = _specification.Bands.Worst;
            var curves = BandCurves.Of(_specification);
            return new BandChart(
                new(
                    Word("axis.temperature"), Word("axis.error"), Word("axis.dwell"), Word("key.allowed"), Word("key.design"),
                    Word("key.maximum"), Word("key.typical"), Word("key.plan"), Word("key.worst")),
                curves.Allowed, curves.Design, curves.Maximum, curves.Typical,
                [.. _specification.Choice.Plan.Temperatures.Select(t => t.Celsius)],
                new Spot(worst.Temperature.Celsius, worst.Maximum.Percent), Dwell) { DecimalSign = Sign };
        }
    }

    public PressureChart Pressure
    {
        get
        {
            var worst = _specification.Bands.Worst;
            var nodes = _specification.Bands.Nodes
                .Where(n => n.Region == worst.Region && n.Temperature == worst.Temperature).OrderBy(n => n.PressureFraction).ToList();
            return new PressureChart(
                new(
                    Word("axis.pressure"), Word("axis.error"), Word("key.allowed"), Word("key.design"), Word("key.maximum"),
                    Word("key.typical")),
                OverPressure(nodes, n => n.Allowed.Percent), HasDesign ? OverPressure(nodes, n => n.Design.Percent) : [],
                OverPressure(nodes, n => n.Maximum.Percent), OverPressure(nodes, n => n.Typical.Percent)) { DecimalSign = Sign };
        }
    }

    public ShareChart Shares
    {
        get
        {
            var capability = _specification.Application.Requirement.Capability;
            var bars = _specification.Bands.Regions.Select((region, i) =>
            {
                var shares = ErrorShares.Of(region.Worst, capability.Sample, capability.LongRun);
                return new ShareBar(Composition.RegionName(_words, _view.Regions[i]), [.. shares.Terms, shares.Safety, shares.Unused]);
            });
            var names = _specification.Bands.Worst.Terms.Select(t => Name(t.Term.Key));
            return new ShareChart(
                Word("axis.share"), [.. names, _words.Plain("budget.safety"), _words.Plain("budget.unused")],
                [.. bars]) { DecimalSign = Sign };
        }
    }

    public ChamberChart Chamber => new(
        new(Word("axis.time"), Word("axis.chamber"), Word("key.ramp"), Word("key.soak"), Word("key.measure")),
        _specification.Application.Station.Chamber.Ambient.Celsius, [.. Stays()],
        _specification.Choice.Run.Length.Minutes) { DecimalSign = Sign };

    public DwellChart Profile => new(Word("axis.temperature"), Word("axis.dwell"), Dwell) { DecimalSign = Sign };

    private string Word(string key) => _words.Plain(key);

    private string Name(string term) => TermGroups.Of(term) == TermGroups.Further ? term : _words.Plain("term." + term);

    private Spot[] OverPressure(IEnumerable<BandNode> nodes, Func<BandNode, double> value) =>
        [.. nodes.Select(n => new Spot(_specification.Application.Requirement.Pressure.At(n.PressureFraction).Value, value(n)))];

    private List<DwellBin> DwellBins()
    {
        var profile = _specification.Application.Requirement.Profile;
        var whole = profile.Sum(b => b.Dwell.Hours);
        double Share(double hours) => whole > 0 ? 100 * hours / whole : 0;
        return [.. profile.Select((b, i) =>
            new DwellBin(b.From.Celsius, b.To.Celsius, Share(b.Dwell.Hours), _view.Profile.Bins[i].Dwell + "\u00a0h"))];
    }

    // A step that takes no time is not in the run: where soak or measuring is missing, it begins and ends with the other.
    private IEnumerable<ChamberStay> Stays()
    {
        var plan = _specification.Choice.Plan;
        for (int i = 0; i < plan.Temperatures.Count; i++)
        {
            var steps = _specification.Choice.Run.Steps.Where(s => s.Action != ChamberAction.Ramp && s.To == plan.Temperatures[i]).ToList();
            if (steps.Count == 0) continue;
            var settled = steps.FirstOrDefault(s => s.Action == ChamberAction.Read)?.Begin ?? steps[^1].End;
            var label = _words.Plain("plan.stay-label", ("stay", ViewForTemplates.Of(_view.Plan.Stays[i])));
            yield return new ChamberStay(
                plan.Temperatures[i].Celsius, steps[0].Begin.Minutes, settled.Minutes, steps[^1].End.Minutes, label);
        }
    }
}
