using System.Text.Json;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Benchmarks;

/// <summary>An application's nodes and some of its plans as plain numbers, for the NumPy loop.</summary>
internal static class PlanExport
{
    public static string Of(SearchTables tables, IReadOnlyList<CompensationPlan> plans, int repetitions)
    {
        (RawError raw, Application application) = (tables.Raw, tables.Application);
        (double Tau, PressureNode Node, double Design)[] nodes =
        [
            .. from row in NodeRow.AllOf(application, [])
               from n in Enumerable.Range(0, row.Pressures.Length)
               select (raw.Reduced(row.Temperature), row.Pressures[n], row.Design[n]),
        ];
        var form = CorrectionForm.For(application.Station, 1, 1);
        return JsonSerializer.Serialize(new Dictionary<string, object>
        {
            ["shape"] = raw.Names.Select(n => (int)n.Shape), ["degree"] = raw.Names.Select(n => n.Degree),
            ["mean"] = raw.Mean, ["within"] = Rows(raw.Within), ["lots"] = Rows(raw.Lots),
            ["x"] = nodes.Select(n => n.Node.Shapes.Fraction), ["tau"] = nodes.Select(n => n.Tau),
            ["design"] = nodes.Select(n => n.Design), ["added"] = nodes.Select(n => n.Node.Added),
            ["drift"] = nodes.Select(n => n.Node.Drift), ["steady"] = nodes.Select(n => n.Node.Variance),
            ["sample"] = application.Requirement.Capability.Sample, ["long-run"] = application.Requirement.Capability.LongRun,
            ["bow"] = form.HasBow, ["s-shape"] = form.HasSShape, ["repetitions"] = repetitions,
            ["plans"] = plans.Select(p => PlanOf(p, raw, application)),
        });
    }

    private static Dictionary<string, object> PlanOf(CompensationPlan plan, RawError raw, Application application)
    {
        double noise = ReadingNoise.VarianceOf(application.Platform, application.Station);
        return new Dictionary<string, object>
        {
            ["x"] = plan.Points.Select(p => p.PressureFraction), ["tau"] = plan.Points.Select(p => raw.Reduced(p.Temperature)),
            ["variance"] = plan.Points.Select(p => noise + Correction.SoakVariance(raw, application.Station, p.PressureFraction, raw.Reduced(p.Temperature))),
            ["zero"] = plan.ZeroDegree, ["span"] = plan.SpanDegree,
        };
    }

    private static double[][] Rows(double[,] matrix) =>
        [.. Enumerable.Range(0, matrix.GetLength(0)).Select(i => Enumerable.Range(0, matrix.GetLength(1)).Select(j => matrix[i, j]).ToArray())];
}
