using BandSpec.Documents.Printing;
using BandSpec.Documents.Templates;
using Scriban.Runtime;

namespace BandSpec.Documents.Judging;

/// <summary>What the words of a judgement see: its verdict and its counts.</summary>
internal static class JudgementForTemplates
{
    public static ScriptObject Of(JudgementView view, Words words, string program) => ViewForTemplates.Script(
        ("specification", view.Specification), ("title", view.Title), ("verdict", view.Verdict), ("program", program),
        ("sample", Of(view.Sample, words)), ("long_run", Of(view.LongRun, words)),
        ("units", ViewForTemplates.Script(
            ("all", view.Units.All), ("pass", view.Units.Pass), ("fail", view.Units.Fail), ("incomplete", view.Units.Incomplete))),
        ("readings", view.Readings), ("lots", view.Lots), ("sampled", view.Sampled), ("confidence", "95"));

    private static ScriptObject Of(DemandView demand, Words words) => ViewForTemplates.Script(
        ("demanded", demand.Demanded), ("standing", demand.Standing), ("least", demand.Least),
        ("least_name", demand.LeastIsDerived ? words.Plain("judge.derived-" + demand.LeastName) : demand.LeastName));
}
