using System.Globalization;
using System.Text;

namespace BandSpec.Documents.Pdf.Finishing;

/// <summary>
/// A file as PDFsharp writes it, cut into its objects along its table of offsets. Only what that one version writes is understood; a
/// surprise is an error rather than a damaged document.
/// </summary>
internal sealed class PlainFile
{
    private const string StreamMark = "\nstream\n", StreamEnd = "\nendstream\nendobj\n", ObjectEnd = "\nendobj\n";

    private readonly byte[] _file;
    private readonly string _text;

    private PlainFile(byte[] file)
    {
        _file = file;
        _text = Encoding.Latin1.GetString(file);
        var table = int.Parse(Word(_text.LastIndexOf("startxref\n", StringComparison.Ordinal) + 10), CultureInfo.InvariantCulture);
        Objects = [.. ReadObjects(table)];
        var trailer = new PdfObject(0, _text[_text.IndexOf("trailer\n", table, StringComparison.Ordinal)..]);
        Root = trailer.Reference("/Root") ?? throw Surprise("no catalogue");
        Info = trailer.Reference("/Info") ?? throw Surprise("no document information");
    }

    public IReadOnlyList<PdfObject> Objects { get; }

    public int Root { get; }

    public int Info { get; }

    public static PlainFile Read(byte[] file) => new(file);

    private string Word(int at) => _text[at.._text.IndexOf('\n', at)];

    private IEnumerable<PdfObject> ReadObjects(int table)
    {
        var header = Word(table + 5).Split(' ');
        var count = int.Parse(header[1], CultureInfo.InvariantCulture);
        var entries = _text.IndexOf('\n', table + 5) + 1;
        int Offset(int number) => int.Parse(_text.AsSpan(entries + 20 * number, 10), CultureInfo.InvariantCulture);
        var offsets = Enumerable.Range(1, count - 1).Select(i => (Number: i, Offset: Offset(i))).OrderBy(o => o.Offset).ToList();
        for (int i = 0; i < offsets.Count; i++)
            yield return ReadObject(offsets[i].Number, offsets[i].Offset, i + 1 < offsets.Count ? offsets[i + 1].Offset : table);
    }

    private PdfObject ReadObject(int number, int from, int to)
    {
        var text = _text[from..to];
        var head = number.ToString(CultureInfo.InvariantCulture) + " 0 obj\n";
        if (!text.StartsWith(head, StringComparison.Ordinal) || !text.EndsWith(ObjectEnd, StringComparison.Ordinal))
            throw Surprise($"object {number} is not where the table says");
        if (!text.EndsWith(StreamEnd, StringComparison.Ordinal)) return new PdfObject(number, text[head.Length..^ObjectEnd.Length]);
        var mark = text.IndexOf(StreamMark, StringComparison.Ordinal);
        var start = mark + StreamMark.Length;
        var dictionary = text[head.Length..mark];
        var length = new PdfObject(number, dictionary).Reference("/Length") ?? throw Surprise($"stream {number} tells no length");
        if (start + length + StreamEnd.Length != text.Length) throw Surprise($"stream {number} has another length than it tells");
        return new PdfObject(number, dictionary, _file[(from + start)..(from + start + length)]);
    }

    private static InvalidOperationException Surprise(string what) =>
        new($"The PDF library wrote a file that the finisher does not know: {what}.");
}
