using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Inputs;
using Xunit;

namespace BandSpec.Tests.Files;

public sealed class ReadingInputs
{
    [Fact]
    public void The_brine_demo_is_read_as_it_is_written()
    {
        InputSet set = Demo.Read(Demo.Brine);

        Assert.Empty(set.Findings);
        Requirement requirement = set.Application!.Requirement;
        Assert.Equal("HV-3107-A", requirement.Identity.FolderName);
        Assert.Equal(25e5, requirement.Pressure.SpanInPascals);
        Assert.Equal(100 * 5 / 4096.0 / 4, requirement.Output.StepInPercent, 12);
        Assert.Equal("12 bit", requirement.Output.Resolution);
        Assert.Equal(33_000, requirement.Profile.Sum(bin => bin.Dwell.Hours), 9);
        Assert.Equal([1.6, 1.0, 1.0], requirement.AllowedError.Select(region => region.Limit.Percent));
        Assert.Equal(1.4, requirement.AllowedError[2].LimitAtEnd?.Percent);
        Assert.Equal((3, 6), (requirement.Compensation.FewestTemperatures, requirement.Compensation.MostTemperatures));
        Assert.Null(requirement.Test.Temperatures);
        Platform platform = set.Application.Platform;
        Assert.Equal(13, platform.RawError.Count);
        Assert.Equal(new CoefficientName(PressureShape.Span, 1), platform.Correlations.Single().Second);
        Assert.Equal(0, platform.RawError[4].LotSigma);
        Station station = set.Application.Station;
        Assert.Equal([0, 0.5, 1], station.PressurePoints.Reference);
        Assert.Equal(35, station.Chamber.Soak.Minutes, 12);
        Assert.Equal(new Money(95, "EUR"), station.Chamber.HourlyRate);
    }

    [Fact]
    public void An_error_written_as_a_pressure_is_a_part_of_the_requirements_span_in_all_three_files()
    {
        InputSet set = Demo.With(
            ("limit: 1.6 %FS", "limit: 400 mbar"), ("repeatability: 0.012 %FS", "repeatability: 300 Pa"), ("reading-noise: 0.015 %FS", "reading-noise: 0.375 kPa"));

        Assert.Empty(set.Findings);
        Assert.Equal(1.6, set.Application!.Requirement.AllowedError[0].Limit.Percent, 12);
        Assert.Equal(0.012, set.Application.Platform.Repeatability.Percent, 12);
        Assert.Equal(0.015, set.Application.Station.ReadingNoise.Percent, 12);
    }

    [Theory]
    [InlineData("14 °F", -10)]
    [InlineData("14 degF", -10)]
    [InlineData("-20.5 degC", -20.5)]
    [InlineData("-20.5°C", -20.5)]
    [InlineData("263.15 K", -10)]
    [InlineData("-0 °C", 0)]
    [InlineData("-1e1 °C", -10)]
    public void A_temperature_may_be_written_in_several_units(string written, double celsius)
    {
        InputSet set = Demo.With(("ambient: 23 °C", $"ambient: {written}"));

        Assert.Equal(Temperature.FromCelsius(celsius), set.Application?.Station.Chamber.Ambient);
    }

    [Fact]
    public void Dwells_in_percent_are_parts_of_the_service_life()
    {
        InputSet set = Demo.With(
            ("  profile:", "  service-life: 10 y\n  profile:"), ("dwell: 1500 h", "dwell: 10 %"), ("dwell: 6000 h", "dwell: 20 %"),
            ("dwell: 22000 h", "dwell: 60 %"), ("dwell: 3500 h", "dwell: 10 %"));

        Assert.Equal([8760, 17520, 52560, 8760], set.Application!.Requirement.Profile.Select(bin => bin.Dwell.Hours));
    }

    [Theory]
    [InlineData("{ signal: current, at-lower: 4 mA, at-upper: 20 mA, resolution: 14 bit }", "mA", 16 / 16384.0)]
    [InlineData("{ signal: current, at-lower: 4000 uA, at-upper: 20 mA, resolution: 2 µA }", "mA", 0.002)]
    [InlineData("{ signal: voltage, at-lower: 0 V, at-upper: 10 V }", "V", null)]
    [InlineData("{ signal: ratiometric-voltage, at-lower: 500 mV, at-upper: 4500 mV, supply: 5 V, resolution: 10 bit }", "mV", 5000 / 1024.0)]
    [InlineData("{ signal: code, at-lower: 1638 code, at-upper: 14745 counts, full-code: 16384 code, resolution: 14 bit }", "code", 1.0)]
    [InlineData("{ signal: code, at-lower: 1638 code, at-upper: 14745 code, resolution: 2 code }", "code", 2.0)]
    public void The_step_of_an_output_follows_its_signal(string output, string unit, double? step)
    {
        InputSet set = Demo.With(("{ signal: ratiometric-voltage, at-lower: 0.5 V, at-upper: 4.5 V, supply: 5 V, resolution: 12 bit }", output));

        Assert.Equal((unit, step), (set.Application?.Requirement.Output.Unit, set.Application?.Requirement.Output.Step));
    }
}
