using System.Globalization;
using System.Text;
using System.Xml;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Printing;

/// <summary>Findings in the XML that test reports are exchanged in (the form of JUnit): one case a requirement, failed when it has findings.</summary>
internal static class FindingJunit
{
    /// <summary>The whole report.</summary>
    /// <param name="cases">Each requirement with its findings, and what else kept it from being done.</param>
    public static ReadOnlyMemory<byte> Of(IReadOnlyList<(string File, IReadOnlyList<PlacedFinding> Findings, string? Error)> cases)
    {
        using MemoryStream bytes = new();
        using (XmlWriter xml = XmlWriter.Create(bytes, new XmlWriterSettings { Indent = true, NewLineChars = "\n", Encoding = new UTF8Encoding(false) }))
        {
            xml.WriteStartElement("testsuites");
            xml.WriteStartElement("testsuite");
            xml.WriteAttributeString("name", "bandspec");
            xml.WriteAttributeString("tests", Count(cases.Count));
            xml.WriteAttributeString("failures", Count(cases.Count(one => one.Findings.Count > 0)));
            xml.WriteAttributeString("errors", Count(cases.Count(one => one.Error is not null)));
            foreach ((string file, IReadOnlyList<PlacedFinding> findings, string? error) in cases)
                WriteCase(xml, file, findings, error);
            xml.WriteEndElement();
            xml.WriteEndElement();
        }

        bytes.WriteByte((byte)'\n');
        return bytes.ToArray();
    }

    private static void WriteCase(XmlWriter xml, string file, IReadOnlyList<PlacedFinding> findings, string? error)
    {
        xml.WriteStartElement("testcase");
        xml.WriteAttributeString("classname", "requirement");
        xml.WriteAttributeString("name", Safe(file));
        foreach (PlacedFinding placed in findings)
        {
            xml.WriteStartElement("failure");
            xml.WriteAttributeString("type", placed.Finding.Rule);
            xml.WriteAttributeString("message", Safe(placed.Finding.Found));
            xml.WriteString(Safe($"{placed.Place.File}:{placed.Place.Line}:{placed.Place.Column}: {FindingSarif.TextOf(placed)}"));
            xml.WriteEndElement();
        }

        if (error is not null)
        {
            xml.WriteStartElement("error");
            xml.WriteAttributeString("message", Safe(error));
            xml.WriteEndElement();
        }

        xml.WriteEndElement();
    }

    private static string Count(int number) => number.ToString(CultureInfo.InvariantCulture);

    /// <summary>XML has no way to write some characters at all: a box stands for them.</summary>
    private static string Safe(string text)
    {
        StringBuilder safe = new(text.Length);
        for (int i = 0; i < text.Length; i++)
        {
            bool isPair = i + 1 < text.Length && XmlConvert.IsXmlSurrogatePair(text[i + 1], text[i]);
            if (isPair)
                safe.Append(text[i]).Append(text[++i]);
            else
                safe.Append(XmlConvert.IsXmlChar(text[i]) ? text[i] : '\uFFFD');
        }

        return safe.ToString();
    }
}
