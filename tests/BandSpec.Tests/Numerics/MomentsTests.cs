using BandSpec.Core.Numerics;
using BandSpec.Tests.Reference;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class MomentsTests
{
    /// <summary>
    /// NIST StRD univariate sets NumAcc1 to 4, made from their construction; certified values found (check-values section 6). The digits
    /// reached are -log10 of the relative error of the standard deviation, the measure NIST uses; 10000000.2 as a double allows 8.
    /// </summary>
    [Theory]
    [InlineData(1, 10000002, 1, 14)]
    [InlineData(2, 1.2, 0.1, 14)]
    [InlineData(3, 1000000.2, 0.1, 9)]
    [InlineData(4, 10000000.2, 0.1, 8)]
    public void Reference_sets_of_numerical_accuracy(int set, double mean, double deviation, double digits)
    {
        double[] readings = set == 1 ? [10000001, 10000003, 10000002] : Alternating(set == 2 ? "1" : set == 3 ? "1000000" : "10000000");
        Moments moments = Moments.Of(readings);
        Close.Relative(mean, moments.Mean, 3e-16, $"mean {set}");
        Close.Relative(deviation, moments.StandardDeviation, Math.Pow(10, -digits), $"deviation {set}");
    }

    /// <summary>NIST StRD Michelso, the same as base R's <c>morley</c> (Speed/1000 + 299); certified, found. NIST's 15 digits end at 8.</summary>
    [Fact]
    public void Speed_of_light_1879()
    {
        Moments moments = Moments.Of([.. ReferenceTable.Numbers("michelso.csv").Select(row => row[0])]);
        Close.Relative(299.8524, moments.Mean, 2e-16);
        Close.Relative(0.0790105478190518, moments.StandardDeviation, 1e-13);
    }

    /// <summary>The textbook formula, mean of squares minus square of mean, keeps no digit of NumAcc4: why it is not used.</summary>
    [Fact]
    public void The_textbook_formula_fails_where_this_does_not()
    {
        double[] readings = Alternating("10000000");
        double sum = readings.Sum(), squares = readings.Sum(x => x * x), n = readings.Length;
        double textbook = Math.Sqrt(Math.Max(0, (squares - sum * sum / n) / (n - 1)));
        Assert.True(Close.Error(0.1, textbook) > 0.1);
    }

    [Fact]
    public void Parts_join_to_the_whole()
    {
        double[] readings = Alternating("1000000");
        Moments whole = Moments.Of(readings), joined = new(999_990);
        joined.Add(Moments.Of([]));
        foreach (double[] part in readings.Chunk(77))
            joined.Add(Moments.Of(part));
        joined.Add(new Moments(3));
        Assert.Equal((whole.Count, whole.Minimum, whole.Maximum), (joined.Count, joined.Minimum, joined.Maximum));
        Close.Relative(whole.Mean, joined.Mean, 2e-16);
        Close.Relative(whole.StandardDeviation, joined.StandardDeviation, 1e-9);
    }

    [Fact]
    public void Too_few_readings_have_no_deviation()
    {
        Assert.Equal(double.NaN, Moments.Of([]).Mean);
        Assert.Equal(double.NaN, Moments.Of([1]).StandardDeviation);
        Assert.Equal(0, Moments.Of([1, 1]).StandardDeviation);
    }

    /// <summary>x.2, then x.1 and x.3 in turn 500 times.</summary>
    private static double[] Alternating(string x) =>
        [double.Parse(x + ".2"), .. Enumerable.Range(0, 1000).Select(i => double.Parse(x + (i % 2 == 0 ? ".1" : ".3")))];
}
