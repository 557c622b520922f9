using PdfSharp.Pdf;

namespace BandSpec.Documents.Pdf.Sharp;

/// <summary>Writes what PDFsharp has no (or no reproducible) calls for: fixed dates, the output intent, and attached files.</summary>
internal static class SharpCatalogue
{
    private const string Profile = "PdfSharp.Resources.sRGB2014.icc";

    public static void Write(PdfDocument document, PdfFacts facts)
    {
        // The kind matters: any but Utc writes the zone of the machine.
        var date = facts.Date.ToDateTime(TimeOnly.MinValue, DateTimeKind.Utc);
        (document.Info.Title, document.Info.Author, document.Info.Subject) = (facts.Title, facts.Author, facts.Subject);
        (document.Info.Creator, document.Info.CreationDate, document.Info.ModificationDate) = (facts.Creator, date, date);
        // Sixteen letters of fixed length; the finisher puts the digest of the content in their place.
        document.Internals.FirstDocumentID = document.Internals.SecondDocumentID = new string('0', 16);
        WriteOutputIntent(document);
        if (facts.Attachments.Count > 0) WriteAttachments(document, facts);
    }

    private static void WriteOutputIntent(PdfDocument document)
    {
        using var resource = typeof(PdfDocument).Assembly.GetManifestResourceStream(Profile)
            ?? throw new InvalidOperationException($"PDFsharp no longer carries the colour profile {Profile}.");
        var bytes = new byte[resource.Length];
        resource.ReadExactly(bytes);
        var profile = new PdfDictionary(document);
        document.Internals.AddObject(profile);
        profile.CreateStream(bytes);
        profile.Elements.SetInteger("/N", 3);
        var intent = new PdfDictionary(document);
        document.Internals.AddObject(intent);
        intent.Elements.SetName("/Type", "/OutputIntent");
        intent.Elements.SetName("/S", "/GTS_PDFA1");
        intent.Elements.SetString("/OutputConditionIdentifier", "sRGB");
        intent.Elements.SetString("/Info", "sRGB IEC61966-2.1");
        intent.Elements.SetReference("/DestOutputProfile", profile);
        document.Internals.Catalog.Elements["/OutputIntents"] = new PdfArray(document, intent.ReferenceNotNull);
    }

    private static void WriteAttachments(PdfDocument document, PdfFacts facts)
    {
        PdfArray files = new(document), names = new(document);
        // The name tree has to be sorted by the names.
        foreach (var attachment in facts.Attachments.OrderBy(a => a.Name, StringComparer.Ordinal))
        {
            var file = Specification(document, attachment, facts.Date);
            files.Elements.Add(file.ReferenceNotNull);
            names.Elements.Add(new PdfString(attachment.Name));
            names.Elements.Add(file.ReferenceNotNull);
        }
        var tree = new PdfDictionary(document);
        tree.Elements["/Names"] = names;
        var root = new PdfDictionary(document);
        root.Elements["/EmbeddedFiles"] = tree;
        document.Internals.Catalog.Elements["/AF"] = files;
        document.Internals.Catalog.Elements["/Names"] = root;
    }

    // Associated files of PDF/A-3, done by hand: PDFsharp's own call leaves out the relationship and the media type and writes today's
    // date.
    private static PdfDictionary Specification(PdfDocument document, Attachment attachment, DateOnly date)
    {
        var content = new PdfDictionary(document);
        document.Internals.AddObject(content);
        content.CreateStream(attachment.Bytes);
        content.Elements.SetName("/Type", "/EmbeddedFile");
        content.Elements.SetName("/Subtype", "/" + attachment.MediaType);
        var parameters = new PdfDictionary(document);
        parameters.Elements.SetInteger("/Size", attachment.Bytes.Length);
        parameters.Elements.SetDateTime("/ModDate", date.ToDateTime(TimeOnly.MinValue, DateTimeKind.Utc));
        content.Elements["/Params"] = parameters;
        var file = new PdfDictionary(document);
        document.Internals.AddObject(file);
        file.Elements.SetName("/Type", "/Filespec");
        file.Elements.SetString("/F", attachment.Name);
        file.Elements["/UF"] = new PdfString(attachment.Name, PdfStringEncoding.Unicode);
        file.Elements.SetString("/Desc", attachment.Description);
        file.Elements.SetName("/AFRelationship", "/" + attachment.Relationship);
        var embedded = new PdfDictionary(document);
        embedded.Elements.SetReference("/F", content);
        embedded.Elements.SetReference("/UF", content);
        file.Elements["/EF"] = embedded;
        return file;
    }
}
