using System.Text;

namespace BandSpec.Documents.Pdf.Layout;

/// <summary>Collects a line; neighbours that are set alike become one span, so that text is drawn and copied in long pieces.</summary>
internal sealed class LineInProgress
{
    private readonly List<Span> _spans = [];
    private readonly StringBuilder _text = new();
    private Span _open;

    public double Width { get; private set; }

    public bool IsEmpty => Width == 0;

    public void Add(Span span, double width)
    {
        if (_text.Length > 0 && (span.Face, span.Size, span.Rise) != (_open.Face, _open.Size, _open.Rise)) Close();
        if (_text.Length == 0) _open = span with { X = Width };
        _text.Append(span.Text);
        Width += width;
    }

    public Line Finish()
    {
        Close();
        var line = new Line([.. _spans], Width);
        _spans.Clear();
        Width = 0;
        return line;
    }

    private void Close()
    {
        if (_text.Length > 0) _spans.Add(_open with { Text = _text.ToString() });
        _text.Clear();
    }
}
