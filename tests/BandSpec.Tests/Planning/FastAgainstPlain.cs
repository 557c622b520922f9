using System.Runtime.Intrinsics;
using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using Xunit;

namespace BandSpec.Tests.Planning;

/// <summary>The search's way to margin and rms against the plain formulas.</summary>
public sealed class FastAgainstPlain
{
    [Theory]
    [InlineData(new[] { -20, 60, 150 }, 2, 2)]
    [InlineData(new[] { -20, 25, 90, 150 }, 3, 3)]
    [InlineData(new[] { -10, 25, 90, 150 }, 2, 3)]
    [InlineData(new[] { -15, 10, 50, 95, 140 }, 4, 3)]
    public void Margin_and_rms_are_those_of_the_plain_formulas(int[] celsius, int zero, int span)
    {
        Application application = Given.Application();
        var tables = new SearchTables(application);
        int[] list = [.. celsius.Select(t => tables.Families.Candidates.ToList().IndexOf(Given.C(t)))];
        var batch = new PlanBatch(list.Length, tables.NearestIn(list));
        batch.Add(list);
        var fit = new PlanFit(tables);
        fit.Load(batch);
        Assert.Equal(Vector512<double>.AllBitsSet.AsInt64(), fit.To(tables.RowsOf(zero, span)).AsInt64());
        int row = 0;

        CompensationPlan plan = tables.PlanOf(list, zero, span);
        double margin = new MarginScore(tables, []).Of(fit, double.NegativeInfinity, ref row)[0];
        Assert.Equal(BandMap.Of(application, plan).Margin, margin, 1e-10);
        Assert.Equal(ProfileFigures.Of(application, plan).RmsError.Percent, new RmsScore(tables).Of(fit, double.PositiveInfinity)[0], 1e-12);
    }
}
