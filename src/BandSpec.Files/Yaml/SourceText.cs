using System.Text;

namespace BandSpec.Files.Yaml;

/// <summary>The text of one input file and its lines, or a finding that says why the bytes are not such a text.</summary>
internal sealed class SourceText
{
    /// <summary>
    /// The largest file that is read, in bytes. The longest sensible input, a platform with every coefficient and correlation, has 30 kB; the
    /// time to read a file grows with its size, and a megabyte takes well under a second.
    /// </summary>
    internal const int LargestFile = 1 << 20;

    private static readonly UTF8Encoding Strict = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    private SourceText(string text) => (Text, Lines) = (text, text.ReplaceLineEndings("\n").Split('\n'));

    /// <summary>The text without a byte-order mark.</summary>
    internal string Text { get; }

    /// <summary>The lines without their ends.</summary>
    internal IReadOnlyList<string> Lines { get; }

    /// <summary>A line counted from 1; empty outside the file.</summary>
    internal string Line(int number) => number >= 1 && number <= Lines.Count ? Lines[number - 1] : "";

    /// <summary>Decodes a file. What keeps it from being read is added to the findings; the text is then not to be read.</summary>
    /// <param name="bytes">The file's bytes.</param>
    /// <param name="faults">Where findings go.</param>
    /// <param name="largest">The most bytes that are read.</param>
    internal static SourceText Decode(ReadOnlySpan<byte> bytes, FoundFaults faults, int largest = LargestFile)
    {
        if (bytes.Length > largest)
            return Refuse(faults, "file-size", $"the file has more than {largest} bytes", $"at most {largest} bytes");
        if (bytes.StartsWith((ReadOnlySpan<byte>)[0xFE, 0xFF]) || bytes.StartsWith((ReadOnlySpan<byte>)[0xFF, 0xFE]) || bytes.Contains((byte)0))
            return Refuse(faults, "encoding", "the file is not UTF-8, it looks like UTF-16 or a binary file", "save it as UTF-8");
        if (bytes.StartsWith(Encoding.UTF8.Preamble))
            bytes = bytes[Encoding.UTF8.Preamble.Length..];
        try
        {
            SourceText source = new(Strict.GetString(bytes));
            source.RefuseOddCharacter(faults);
            return source;
        }
        catch (DecoderFallbackException)
        {
            return Refuse(faults, "encoding", "the file has bytes that are not UTF-8", "save it as UTF-8");
        }
    }

    private static SourceText Refuse(FoundFaults faults, string rule, string found, string accepted)
    {
        faults.Add(Extent.Start, "", rule, found, accepted);
        return new SourceText("");
    }

    /// <summary>
    /// Looks for characters that an editor does not show, or that make a line show something else than it says. Only the first is reported: a
    /// file with one of them mostly has many.
    /// </summary>
    private void RefuseOddCharacter(FoundFaults faults)
    {
        for (int line = 0; line < Lines.Count; line++)
        {
            int column = Lines[line].AsSpan().IndexOfAny(OddCharacters.Values);
            if (column < 0)
                continue;
            faults.Add(
                new Extent(line + 1, column + 1, 1), "", "odd-character",
                $"an invisible character, U+{(int)Lines[line][column]:X4}", "printable text, spaces and line ends");
            return;
        }
    }
}
