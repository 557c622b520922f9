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

    [Theory]
    [InlineData(19_990, "")]
    [InlineData(1_000_000, "The PDF nests its objects more than 20000 deep.")]
    public void Brackets_within_brackets_do_not_run_out_of_stack(int depth, string message)
    {
        byte[] pdf = WithNestedArray(depth);
        if (message.Length == 0)
            Assert.Empty(SpecificationFile.Attachments(pdf));
        else
            Assert.Equal(message, Assert.Throws<InvalidDataException>(() => SpecificationFile.Attachments(pdf)).Message);
    }

    private static byte[] WithNestedArray(int depth)
    {
        StringBuilder pdf = new("%PDF-1.7\n");
        string[] objects =
        [
            "<</Type/Catalog/Pages 2 0 R/Deep 4 0 R>>", "<</Type/Pages/Kids[3 0 R]/Count 1>>", "<</Type/Page/Parent 2 0 R/MediaBox[0 0 9 9]>>",
            new string('[', depth) + new string(']', depth),
        ];
        List<int> places = [];
        foreach ((string body, int number) in objects.Select((body, i) => (body, i + 1)))
        {
            places.Add(pdf.Length);
            pdf.Append(CultureInfo.InvariantCulture, $"{number} 0 obj\n{body}\nendobj\n");
        }

        int table = pdf.Length;
        pdf.Append(CultureInfo.InvariantCulture, $"xref\n0 {objects.Length + 1}\n0000000000 65535 f \n");
        foreach (int place in places)
            pdf.Append(CultureInfo.InvariantCulture, $"{place:0000000000} 00000 n \n");
        pdf.Append(CultureInfo.InvariantCulture, $"trailer\n<</Size {objects.Length + 1}/Root 1 0 R>>\nstartxref\n{table}\n%%EOF\n");
        return Encoding.ASCII.GetBytes(pdf.ToString());
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
