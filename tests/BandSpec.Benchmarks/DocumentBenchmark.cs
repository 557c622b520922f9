using System.Diagnostics;
using BandSpec.Core.Specifying;
using BandSpec.Tests.Documents;
using PdfSharp.Pdf;
using PdfSharp.Pdf.IO;

namespace BandSpec.Benchmarks;

/// <summary>How long the documents of a specification take, charts, Markdown and limits included: drawn for the first time and again.</summary>
internal static class DocumentBenchmark
{
    public static void Run(string root)
    {
        Console.WriteLine("| document | first, ms | again, ms | pdf, kB | pages |");
        Console.WriteLine("| --- | --- | --- | --- | --- |");
        foreach ((string name, Specification specification) in (IEnumerable<(string, Specification)>)
            [("brine-reinjection", Demos.Draft(root, "brine-reinjection")), ("more than forty pages", Drafts.Long)])
        {
            (double first, IReadOnlyDictionary<string, byte[]> files) = Draw(specification);
            double again = Enumerable.Range(0, 5).Min(_ => Draw(specification).Milliseconds);
            byte[] pdf = files["specification.pdf"];
            Console.WriteLine($"| {name} | {first:F0} | {again:F0} | {pdf.Length / 1000} | {PagesOf(pdf)} |");
        }
    }

    private static (double Milliseconds, IReadOnlyDictionary<string, byte[]> Files) Draw(Specification specification)
    {
        long start = Stopwatch.GetTimestamp();
        IReadOnlyDictionary<string, byte[]> files = Drafts.Draw(specification);
        return (Stopwatch.GetElapsedTime(start).TotalMilliseconds, files);
    }

    private static int PagesOf(byte[] pdf)
    {
        using PdfDocument document = PdfReader.Open(new MemoryStream(pdf), PdfDocumentOpenMode.Import);
        return document.PageCount;
    }
}
