using System.Globalization;
using System.Security;

namespace BandSpec.Documents.Pdf.Finishing;

/// <summary>
/// The metadata packet, with every text escaped. It repeats the document information word for word, since the archive standard wants
/// the two to agree. The claims to standards stand only where they are asked for.
/// </summary>
internal static class Xmp
{
    /// <summary>The producer that PDFsharp writes into the document information.</summary>
    private const string Producer = "PDFsharp 6.2.4";

    public static string Packet(PdfFacts facts, byte[] digest)
    {
        var date = facts.Date.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture) + "T00:00:00+00:00";
        return $"""
            <?xpacket begin="{'\uFEFF'}" id="W5M0MpCehiHzreSzNTczkc9d"?>
            <x:xmpmeta xmlns:x="adobe:ns:meta/">
            <rdf:RDF xmlns:rdf="http://www.w3.org/1999/02/22-rdf-syntax-ns#">
            <rdf:Description rdf:about="" xmlns:dc="http://purl.org/dc/elements/1.1/" xmlns:pdf="http://ns.adobe.com/pdf/1.3/" xmlns:xmp="http://ns.adobe.com/xap/1.0/" xmlns:xmpMM="http://ns.adobe.com/xap/1.0/mm/">
            <dc:format>application/pdf</dc:format>
            <dc:title><rdf:Alt><rdf:li xml:lang="x-default">{Safe(facts.Title)}</rdf:li></rdf:Alt></dc:title>
            <dc:creator><rdf:Seq><rdf:li>{Safe(facts.Author)}</rdf:li></rdf:Seq></dc:creator>
            <dc:description><rdf:Alt><rdf:li xml:lang="x-default">{Safe(facts.Subject)}</rdf:li></rdf:Alt></dc:description>
            <dc:language><rdf:Bag><rdf:li>{Safe(facts.Language)}</rdf:li></rdf:Bag></dc:language>
            <pdf:Producer>{Producer}</pdf:Producer>
            <xmp:CreatorTool>{Safe(facts.Creator)}</xmp:CreatorTool>
            <xmp:CreateDate>{date}</xmp:CreateDate>
            <xmp:ModifyDate>{date}</xmp:ModifyDate>
            <xmpMM:DocumentID>uuid:{Uuid(digest.AsSpan(0, 16))}</xmpMM:DocumentID>
            <xmpMM:InstanceID>uuid:{Uuid(digest.AsSpan(16, 16))}</xmpMM:InstanceID>
            </rdf:Description>
            {(facts.ClaimsConformance ? Claims : "")}</rdf:RDF>
            </x:xmpmeta>
            <?xpacket end="r"?>
            """.ReplaceLineEndings("\n");
    }

    private const string Claims = """
        <rdf:Description rdf:about="" xmlns:pdfaid="http://www.aiim.org/pdfa/ns/id/"><pdfaid:part>3</pdfaid:part><pdfaid:conformance>A</pdfaid:conformance></rdf:Description>
        <rdf:Description rdf:about="" xmlns:pdfuaid="http://www.aiim.org/pdfua/ns/id/"><pdfuaid:part>1</pdfuaid:part></rdf:Description>
        <rdf:Description rdf:about="" xmlns:pdfaExtension="http://www.aiim.org/pdfa/ns/extension/" xmlns:pdfaSchema="http://www.aiim.org/pdfa/ns/schema#" xmlns:pdfaProperty="http://www.aiim.org/pdfa/ns/property#">
        <pdfaExtension:schemas><rdf:Bag><rdf:li rdf:parseType="Resource">
        <pdfaSchema:schema>PDF/UA Universal Accessibility Schema</pdfaSchema:schema>
        <pdfaSchema:namespaceURI>http://www.aiim.org/pdfua/ns/id/</pdfaSchema:namespaceURI>
        <pdfaSchema:prefix>pdfuaid</pdfaSchema:prefix>
        <pdfaSchema:property><rdf:Seq><rdf:li rdf:parseType="Resource">
        <pdfaProperty:name>part</pdfaProperty:name><pdfaProperty:valueType>Integer</pdfaProperty:valueType>
        <pdfaProperty:category>internal</pdfaProperty:category><pdfaProperty:description>Part of ISO 14289 that the document follows</pdfaProperty:description>
        </rdf:li></rdf:Seq></pdfaSchema:property>
        </rdf:li></rdf:Bag></pdfaExtension:schemas></rdf:Description>

        """;

    private static string Safe(string text) => SecurityElement.Escape(text);

    // Marked as version 8 of RFC 9562: an identifier of the maker's own making.
    private static string Uuid(ReadOnlySpan<byte> bytes)
    {
        Span<byte> own = stackalloc byte[16];
        bytes.CopyTo(own);
        own[6] = (byte)((own[6] & 0x0F) | 0x80);
        own[8] = (byte)((own[8] & 0x3F) | 0x80);
        return new Guid(own, bigEndian: true).ToString();
    }
}
