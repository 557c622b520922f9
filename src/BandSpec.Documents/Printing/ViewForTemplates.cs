using Scriban.Runtime;

namespace BandSpec.Documents.Printing;

/// <summary>The print view as templates see it: names with letters and lists, read-only, nothing of .NET behind them.</summary>
internal static class ViewForTemplates
{
    public static ScriptObject Of(PrintView view) => Script(
        ("specification", Of(view.Identity)), ("standing", view.Standing), ("feasible", view.Verdict.Feasible), ("program", view.Program),
        ("platform", Script(("name", view.Platform), ("revision", view.PlatformRevision))), ("station", Script(("name", view.Station))),
        ("pressure", Of(view.Range)), ("output", Of(view.Output)), ("temperature", Of(view.Temperature)), ("profile", Of(view.Profile)),
        ("has_sample", view.Sample is not null), ("sample", Of(view.Sample)),
        ("has_diagnosis", view.Diagnosis is not null), ("has_remedies", view.Diagnosis is { Remedies.Count: > 0 }),
        ("is_pinned", view.Optimum is not null), ("optimum", Of(view.Optimum)),
        ("regions", List(view.Regions.Select(Of))),
        ("margin", view.Verdict.Margin), ("floor_margin", view.Verdict.FloorMargin), ("floor_holds", view.Verdict.FloorHolds),
        ("worst", Of(view.Verdict.Worst)), ("tightest", Of(view.Verdict.Tightest)), ("plan", Of(view.Plan)), ("test", Of(view.Test)));

    private static ScriptObject Of(SampleView? s) => Script(
        ("units", s?.Units ?? ""), ("lots", s?.Lots ?? ""), ("readings", s?.Readings ?? ""), ("confidence", s?.Confidence ?? ""), ("margin", s?.Margin ?? ""),
        ("further_units", s?.FurtherUnits ?? ""), ("falls_short", s?.FallsShort ?? false));

    private static ScriptObject Of(OptimumView? o) => Script(
        ("temperatures", o?.Temperatures ?? ""), ("margin", o?.Margin ?? ""), ("cost", o?.Cost ?? ""), ("is_taken", o?.IsTaken ?? false),
        ("fits", o?.Fits ?? false));

    public static ScriptObject Of(RegionView r) => Script(
        ("from", r.From), ("to", r.To), ("allowed", r.Allowed), ("allowed_at_start", r.AllowedAtStart), ("allowed_at_end", r.AllowedAtEnd),
        ("of_reading", r.OfReading),
        ("maximum", r.Maximum), ("typical", r.Typical), ("margin", r.Margin), ("holds", r.Holds), ("worst_pressure", r.WorstPressure),
        ("worst_temperature", r.WorstTemperature));

    public static ScriptObject Of(StayView s) => Script(("temperature", s.Temperature), ("pressures", s.Pressures), ("count", s.Count));

    /// <summary>A verification point for a test system: its figures are plain, with a point and a hyphen whatever the language.</summary>
    public static ScriptObject Of(PointView p, string pressureUnit, string outputUnit) => Script(
        ("id", p.Id), ("temperature", p.Temperature.Plain), ("pressure", p.Pressure.Plain), ("pressure_unit", pressureUnit),
        ("pressure_fraction", p.PressureFraction.Plain),
        ("direction", p.Direction),
        ("nominal", p.Nominal.Plain), ("lower", p.Lower.Plain), ("upper", p.Upper.Plain), ("output_unit", outputUnit),
        ("tolerance", p.Tolerance.Plain),
        ("guard_band", p.GuardBand.Plain),
        ("uncertainty", p.Uncertainty.Plain), ("consumer_risk", p.ConsumerRisk.Plain), ("producer_risk", p.ProducerRisk.Plain));

    public static ScriptObject Script(params (string Name, object Value)[] members)
    {
        var script = new ScriptObject(StringComparer.Ordinal);
        foreach (var (name, value) in members) script.SetValue(name, value, readOnly: true);
        script.IsReadOnly = true;
        return script;
    }

    public static ScriptArray List(IEnumerable<ScriptObject> items) => new(items) { IsReadOnly = true };

    public static ScriptObject Of(IdentityView i) => Script(
        ("number", i.Number), ("revision", i.Revision), ("title", i.Title), ("customer", i.Customer), ("prepared_by", i.PreparedBy),
        ("date", i.Date),
        ("changes", List(i.Changes.Select(c => Script(("revision", c.Revision), ("date", c.Date), ("text", c.Text))))));

    private static ScriptObject Of(RangeView r) => Script(
        ("lower", r.Lower), ("upper", r.Upper), ("unit", r.Unit), ("reference", r.Reference), ("proof", r.Proof), ("burst", r.Burst));

    private static ScriptObject Of(SignalView s) => Script(
        ("kind", s.Kind), ("at_lower", s.AtLower), ("at_upper", s.AtUpper), ("unit", s.Unit), ("supply", s.Supply),
        ("resolution", s.Resolution));

    private static ScriptObject Of(TemperatureView t) => Script(("lower", t.Lower), ("upper", t.Upper), ("reference", t.Reference));

    private static ScriptObject Of(ProfileView p) => Script(
        ("hours", p.Hours), ("years", p.Years), ("rms_error", p.RmsError), ("outside", p.Outside), ("equivalent_hours", p.EquivalentHours),
        ("age_factor", p.AgeFactor));

    private static ScriptObject Of(PlanView p) => Script(
        ("stays", List(p.Stays.Select(Of))), ("points", p.Points), ("zero_degree", p.ZeroDegree), ("span_degree", p.SpanDegree),
        ("minutes", p.Minutes),
        ("cost", p.Cost), ("currency", p.Currency), ("batch", p.Batch), ("considered", p.Considered), ("proven", p.Proven),
        ("objective", p.Objective));

    private static ScriptObject Of(TestView t) => Script(
        ("rule", t.Rule), ("guard_band", t.GuardBand), ("guarded", t.Guarded), ("risk", t.Risk), ("every_unit", t.EveryUnit), ("sample", t.Sample), ("long_run", t.LongRun), ("sample_sigma", t.SampleSigma),
        ("long_run_sigma", t.LongRunSigma),
        ("safety_factor", t.SafetyFactor), ("band_step", t.BandStep), ("limit_step", t.LimitStep), ("readings", t.Readings));
}
