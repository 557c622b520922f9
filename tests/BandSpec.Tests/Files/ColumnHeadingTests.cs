using BandSpec.Core.TestLimits;
using BandSpec.Files.Csv;
using Xunit;

namespace BandSpec.Tests.Files;

/// <summary>Headings and directions as both readers of readings take them.</summary>
public sealed class ColumnHeadingTests
{
    [Theory]
    [InlineData("Applied pressure [bar]", "applied-pressure", "bar")]
    [InlineData("  \"T_chamber (°C)\" ", "t-chamber", "°C")]
    [InlineData("unit", "unit", "")]
    [InlineData("reading [mV", "reading", "mV")]
    [InlineData("[mV]", "[mv]", "")]
    public void A_heading_is_a_name_and_a_unit(string text, string key, string unit)
    {
        ColumnHeading heading = ColumnHeading.Of(text);
        Assert.Equal((key, unit), (heading.Key, heading.Unit));
    }

    [Theory]
    [InlineData("", true, null)]
    [InlineData("Rising", true, PressureDirection.Rising)]
    [InlineData("+", true, PressureDirection.Rising)]
    [InlineData("DECREASING", true, PressureDirection.Falling)]
    [InlineData("down", true, PressureDirection.Falling)]
    [InlineData("sideways", false, null)]
    [InlineData("increasing slowly", false, null)]
    public void A_direction_is_read_in_capitals_or_not(string text, bool known, PressureDirection? side)
    {
        Assert.Equal(known, DirectionWords.TryRead(text, out PressureDirection? found));
        Assert.Equal(side, found);
    }
}
