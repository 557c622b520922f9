using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>What a specification's PDF carries comes back byte for byte.</summary>
public sealed class UnpackTests : IDisposable
{
    private readonly Desk desk = new();

    public void Dispose() => desk.Dispose();

    [Fact]
    public void Inputs_and_results_come_back_byte_for_byte()
    {
        desk.Run("draft", "brine-reinjection.yaml", "--quiet");

        (int code, string output, string error) = desk.Run("unpack", "out/HV-3107-A/specification.pdf", "--out", "rework");

        Assert.Equal((0, ""), (code, error));
        Assert.Contains("rework/result.json", output.Replace('\\', '/'), StringComparison.Ordinal);
        Same("rework/brine-reinjection.yaml", "brine-reinjection.yaml");
        Same("rework/steel-cell-40.yaml", "platforms/steel-cell-40.yaml");
        Same("rework/chamber-line-2.yaml", "stations/chamber-line-2.yaml");
        Same("rework/result.json", "out/HV-3107-A/result.json");
        Same("rework/limits.json", "out/HV-3107-A/limits.json");
    }

    [Fact]
    public void A_folder_that_is_there_is_left_as_it_is()
    {
        desk.Run("draft", "brine-reinjection.yaml", "--quiet");
        Assert.Equal(
            (2, "", "bandspec: platforms exists already and was left as it is; name another folder with --out\n"),
            desk.Run("unpack", "out/HV-3107-A/specification.pdf", "--out", "platforms"));
    }

    [Fact]
    public void What_is_no_PDF_is_refused() => Assert.Equal(
        (2, "", "bandspec: brine-reinjection.yaml is not a PDF that can be read\n"), desk.Run("unpack", "brine-reinjection.yaml", "--out", "x"));

    private void Same(string unpacked, string original) =>
        Assert.Equal(File.ReadAllBytes(desk.At(original)), File.ReadAllBytes(desk.At(unpacked)));
}
