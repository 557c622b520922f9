using PdfSharp.Drawing;
using PdfSharp.Pdf;
using PdfSharp.UniversalAccessibility;

namespace BandSpec.Documents.Pdf.Sharp;

/// <summary>Opens our tags with PDFsharp's structure builder and adds the attributes it has no calls for.</summary>
internal sealed class SharpTags(UAManager structure)
{
    private StructureBuilder Builder => structure.StructureBuilder;

    public void Open(Tag tag, Box? area, double pageHeight)
    {
        switch (tag.Kind)
        {
            case TagKind.Figure: OpenFigure(tag, area, pageHeight); break;
            case TagKind.Div or TagKind.Caption: Builder.BeginGroupingElement("/" + tag.Kind); break;
            default: Builder.BeginBlockLevelElement("/" + tag.Kind); break;
        }
        if (tag.Columns > 1) Attributes().SetInteger("/ColSpan", tag.Columns);
        if (tag.Scope != HeaderScope.None) Attributes().SetName("/Scope", "/" + tag.Scope);
        if (tag.Kind == TagKind.L) Attributes("/List").SetName("/ListNumbering", "/None");
    }

    // PDFsharp writes the box as it is given: flipped here to count from the lower edge of the sheet.
    private void OpenFigure(Tag tag, Box? area, double pageHeight)
    {
        var box = area ?? throw new InvalidOperationException("A figure is opened without its place on the sheet.");
        Builder.BeginIllustrationElement("/Figure", tag.Alternative, new XRect(box.X, pageHeight - box.Bottom, box.Width, box.Height));
    }

    private PdfDictionary.DictionaryElements Attributes(string owner = "/Table")
    {
        var element = Builder.CurrentStructureElement;
        if (element.Elements.GetDictionary("/A") is not { } attributes)
        {
            attributes = new PdfDictionary(structure.Owner);
            attributes.Elements.SetName("/O", owner);
            element.Elements["/A"] = attributes;
        }
        return attributes.Elements;
    }
}
