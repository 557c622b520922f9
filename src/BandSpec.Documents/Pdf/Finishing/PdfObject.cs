using System.Text;

namespace BandSpec.Documents.Pdf.Finishing;

/// <summary>An object of a PDF file: its number, its text (one char a byte), and the bytes of its stream if it has one.</summary>
internal sealed record PdfObject(int Number, string Text, byte[]? Stream = null)
{
    public bool Is(string type) =>
        Text.Contains("/Type/" + type + "/", StringComparison.Ordinal) || Text.EndsWith("/Type/" + type + ">>", StringComparison.Ordinal);

    /// <summary>The number of the object that a key of this one refers to.</summary>
    public int? Reference(string key)
    {
        var at = Text.IndexOf(key + " ", StringComparison.Ordinal);
        if (at < 0) return null;
        var digits = Text[(at + key.Length + 1)..].TakeWhile(char.IsAsciiDigit).ToArray();
        return digits.Length == 0 ? null : int.Parse(digits, System.Globalization.CultureInfo.InvariantCulture);
    }

    public byte[] TextBytes => Encoding.Latin1.GetBytes(Text);
}
