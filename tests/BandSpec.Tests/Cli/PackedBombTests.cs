using System.Globalization;
using System.IO.Compression;
using System.Text;
using BandSpec.Documents;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>A PDF of some kilobytes whose own object stream unpacks to more than memory should be asked for (ISO 32000-1, 7.5.7).</summary>
public sealed class PackedBombTests : IDisposable
{
    private readonly Desk desk = new();

    public void Dispose() => desk.Dispose();

    [Theory]
    [InlineData("unpack", "bomb.pdf")]
    [InlineData("verify", "bomb.pdf")]
    [InlineData("compare", "bomb.pdf", "brine-reinjection.yaml")]
    public void It_is_refused_before_it_is_unpacked(params string[] arguments)
    {
        File.WriteAllBytes(desk.At("bomb.pdf"), WithObjectStream(Pack(17 << 20), "/FlateDecode"));
        long before = GC.GetAllocatedBytesForCurrentThread();

        (int code, string output, string error) = desk.Run(arguments);

        Assert.Equal(2, code);
        Assert.Contains("what it packs unpacks to more than 16777216 bytes", output + error, StringComparison.Ordinal);
        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 0, 30 << 20);
    }

    [Theory]
    [InlineData("[/FlateDecode/FlateDecode]")]
    [InlineData("[ /Fl#61teDecode /FlateDecode ]")]
    [InlineData("/LZWDecode")]
    [InlineData("/L#5AWDecode")]
    [InlineData("5 0 R")]
    [InlineData("/FlateDecode/Encrypt 7 0 R")]
    [InlineData("/FlateDecode/#45ncrypt 7 0 R")]
    public void Packings_whose_size_cannot_be_told_are_refused(string filter)
    {
        byte[] pdf = WithObjectStream(Pack(1000), filter);
        Assert.Throws<InvalidDataException>(() => SpecificationFile.Attachments(pdf));
    }

    [Fact]
    public void Many_small_streams_count_together()
    {
        byte[] one = Pack(3 << 20);
        byte[] pdf = [.. Enumerable.Range(0, 6).SelectMany(_ => WithObjectStream(one, "/FlateDecode"))];
        Assert.Contains("16777216", Assert.Throws<IOException>(() => SpecificationFile.Attachments(pdf)).Message, StringComparison.Ordinal);
    }

    private static byte[] WithObjectStream(byte[] packed, string filter) =>
    [
        .. "%PDF-1.7\n"u8,
        .. Encoding.ASCII.GetBytes(string.Create(CultureInfo.InvariantCulture, $"4 0 obj\n<</Type/ObjStm/N 1/First 4/Length {packed.Length}/Filter{filter}>>\nstream\r\n")),
        .. packed, .. "\nendstream\nendobj\nstartxref\n9\n%%EOF\n"u8,
    ];

    private static byte[] Pack(int zeros)
    {
        using MemoryStream packed = new();
        using (ZLibStream zlib = new(packed, CompressionLevel.Optimal, leaveOpen: true))
            zlib.Write(new byte[zeros]);
        return packed.ToArray();
    }
}
