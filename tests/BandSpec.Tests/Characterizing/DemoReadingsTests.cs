using System.Text;
using BandSpec.Core.Characterizing;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Inputs;
using BandSpec.Files.Readings;
using BandSpec.Files.Writing;
using BandSpec.Tests.House;
using Xunit;

namespace BandSpec.Tests.Characterizing;

/// <summary>The demo readings are what they claim to be, and tell their truth when they are read from the file.</summary>
public sealed class DemoReadingsTests
{
    private static readonly ReadingsFormat Format = new()
    {
        Range = new PressureRange(Pressure.From(0, PressureUnit.Bar), Pressure.From(25, PressureUnit.Bar), PressureReference.Gauge),
    };

    [Fact]
    public void The_files_are_made_as_they_say()
    {
        Assert.Equal(DemoReadings.FamilyCsv(), File.ReadAllText(PathOf("steel-cell-40.csv")));
        Assert.Equal(DemoReadings.StorageCsv(), File.ReadAllText(PathOf("steel-cell-40-storage.csv")));
    }

    [Fact]
    public void The_family_is_recognised_and_its_spoiled_units_are_named()
    {
        Characterization found = Found.Value;
        Assert.Equal(DemoReadings.Spoiled, found.SuspectUnits.Select(unit => unit.Unit).Order());
        Assert.Equal("repeatability", found.SuspectUnits.Single(unit => unit.Unit == "038").Term);
        Assert.Equal(46, found.Units);
        foreach (CoefficientEstimate estimate in found.Coefficients)
        {
            RawErrorCoefficient truth = Given.Platform.RawError.Single(c => c.Name == estimate.Name);
            Assert.InRange(estimate.Units.Sigma.Value, 0.6 * truth.Sigma, 1.6 * truth.Sigma);
        }
    }

    [Fact]
    public void The_written_platform_reads_back_the_same_and_fits_the_demo()
    {
        Characterization found = Found.Value;
        Platform written = PlatformFrame.Of(Given.Platform).With(found);
        string text = PlatformYaml.Write(written, StatisticsRemarks.Of(found, ["steel-cell-40.csv"]));
        (Platform? read, IReadOnlyList<PlacedFinding> findings) = PlatformReading.Read(InputContent.Of("cell.yaml", Encoding.UTF8.GetBytes(text)));
        Assert.Empty(findings);
        Assert.Equal(text, PlatformYaml.Write(read!, StatisticsRemarks.Of(found, ["steel-cell-40.csv"])));
        Assert.Equal(written.RawError, read!.RawError);
        Assert.Equal(written.Sample!.Coefficients.Select(c => c.MeanCovariance[^1]), read.Sample!.Coefficients.Select(c => c.MeanCovariance[^1]));
        Assert.Contains("sigma 2", text, StringComparison.Ordinal);
    }

    [Fact]
    public void The_storage_test_tells_its_truth()
    {
        ReadingsSet<DriftReading> set = StorageReadings.Read(Content("steel-cell-40-storage.csv"), Format);
        Assert.Empty(set.Findings);
        AgeingStatistics found = AgeingStatistics.Of(
            set.Readings, new AgeingScope { TestTemperature = Given.C(125), TestDuration = Duration.FromHours(1000) }).Value!;
        Assert.True(found.ActivationEnergy.Covers(0.6), found.ActivationEnergy.ToString());
        Assert.True(found.TimeExponent.Covers(0.5), found.TimeExponent.ToString());
        Assert.True(found.Zero.Mean.Covers(0.02), found.Zero.Mean.ToString());
    }

    private static readonly Lazy<Characterization> Found = new(() =>
    {
        ReadingsSet<UnitReading> set = FamilyReadings.Read(Content("steel-cell-40.csv"), Format);
        Assert.Empty(set.Findings);
        return Characterization.Of(set.Readings, Families.OpenScope).Value!;
    });

    private static InputContent Content(string name) => InputContent.Of(name, File.ReadAllBytes(PathOf(name)));

    private static string PathOf(string name) => Path.Combine(Tree.Root, "requirements-demo", "readings", name);
}
