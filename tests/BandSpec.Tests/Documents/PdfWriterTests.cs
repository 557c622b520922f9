using BandSpec.Documents.Pdf;
using Xunit;

namespace BandSpec.Tests.Documents;

public sealed class PdfWriterTests
{
    [Fact]
    public void Writes_the_sample() =>
        File.WriteAllBytes("/tmp/sample.pdf", PdfWriter.Write(SampleDocument.Full(), PageGeometry.A4, SampleDocument.Facts(SampleDocument.Note)));
}
