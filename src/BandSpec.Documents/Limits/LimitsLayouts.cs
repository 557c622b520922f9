using System.Globalization;
using System.Security;
using System.Text;
using BandSpec.Documents.Printing;
using BandSpec.Documents.Templates;
using Scriban.Runtime;

namespace BandSpec.Documents.Limits;

/// <summary>
/// Writes the acceptance limits in every layout under <c>limits/</c>. A layout is a Scriban file named after what it writes:
/// <c>points.xml.scriban</c> writes <c>points.xml</c>. Values are protected as the kind of file wants it, and what comes out is checked.
/// </summary>
internal static class LimitsLayouts
{
    private const string Folder = "limits", Suffix = ".scriban";

    public static IEnumerable<DocumentFile> Write(TemplateSources sources, PrintView view)
    {
        var limits = View(view);
        foreach (var path in sources.Files(Folder).Where(p => p.EndsWith(Suffix, StringComparison.Ordinal)))
        {
            if (sources.Read(path) is not var (name, text)) continue;
            var file = path[(path.LastIndexOf('/') + 1)..^Suffix.Length];
            var written = new SafeTemplate(name, text).Render(limits, EscapeFor(file));
            LimitsCheck.Check(name, file, written, view.Points);
            yield return new DocumentFile(file, Encoding.UTF8.GetBytes(written));
        }
    }

    private static Func<string, string>? EscapeFor(string file) => Path.GetExtension(file) switch
    {
        ".xml" => SecurityElement.Escape,
        ".csv" => Quoted,
        _ => null,
    };

    // A spreadsheet would run what begins like a formula; a number with its sign is none.
    private static string Quoted(string value)
    {
        bool isFormula = value.Length > 0 && "=+-@\t".Contains(value[0], StringComparison.Ordinal)
            && !double.TryParse(value, NumberStyles.Float, CultureInfo.InvariantCulture, out _);
        string safe = isFormula ? $"'{value}" : value;
        return safe.AsSpan().IndexOfAny(",;\"\n") < 0 ? safe : $"\"{safe.Replace("\"", "\"\"", StringComparison.Ordinal)}\"";
    }

    // The fields of limits.json, with underscores in their names.
    private static ScriptObject View(PrintView view) => ViewForTemplates.Script(
        ("format", "bandspec/limits/1"),
        ("specification", ViewForTemplates.Of(view.Identity)),
        ("feasible", view.Verdict.Feasible), ("standing", view.Standing),
        ("decision_rule", ViewForTemplates.Script(
            ("rule", view.Test.Rule), ("guard_band", Plain(view.Test.GuardBand, view)), ("risk", Plain(view.Test.Risk, view)))),
        ("sample_criterion", Plain(view.Test.Sample, view)),
        ("long_run_criterion", Plain(view.Test.LongRun, view)),
        ("pressure_unit", view.Range.Unit), ("output_unit", view.Output.Unit),
        ("points", ViewForTemplates.List(view.Points.Select(p => ViewForTemplates.Of(p, view.Range.Unit, view.Output.Unit)))));

    private static string Plain(string shown, PrintView view) => shown.Replace(view.DecimalSign, ".", StringComparison.Ordinal);
}
