using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace BandSpec.Files.Yaml;

/// <summary>
/// Builds the tree of a document from the parser's events. What YAML can do and an input has no use for (anchors, aliases, tags, more than one
/// document) is a finding each; size and depth are bounded, so that no file can explode.
/// </summary>
internal sealed class TreeReading
{
    /// <summary>The deepest nesting; the deepest input has six levels.</summary>
    internal const int DeepestLevel = 12;

    /// <summary>The most values in a file; the largest sensible input has a few hundred.</summary>
    internal const int MostNodes = 20_000;

    private readonly Parser parser;
    private readonly SourceText source;
    private readonly FoundFaults faults;
    private int nodes;

    private TreeReading(SourceText source, FoundFaults faults)
    {
        (this.source, this.faults) = (source, faults);
        parser = new Parser(new StringReader(source.Text));
    }

    /// <summary>The root of the document; <see langword="null"/> when no tree could be made, and then there is a finding.</summary>
    internal static YamlNode? Read(SourceText source, FoundFaults faults)
    {
        TreeReading reading = new(source, faults);
        try
        {
            return reading.ReadDocument();
        }
        catch (UnreadableException unreadable)
        {
            faults.Add(unreadable.Extent, "", unreadable.Rule, unreadable.Message, unreadable.Accepted);
            return null;
        }
    }

    private YamlNode ReadDocument()
    {
        if (Next() is not StreamStart || Next() is not DocumentStart)
            throw new UnreadableException(Extent.Start, "empty-file", "the file is empty", "the keys of an input file");
        YamlNode root = ReadNode(Next(), 0);
        while (Next() is { } after and not StreamEnd)
        {
            if (after is DocumentStart)
                throw new UnreadableException(ExtentOf(after), "second-document", "a second document begins here", "one document in a file");
        }
        return root;
    }

    private YamlNode ReadNode(ParsingEvent first, int level)
    {
        if (++nodes > MostNodes)
            throw new UnreadableException(ExtentOf(first), "too-many-values", $"more than {MostNodes} values", $"at most {MostNodes} values");
        if (level > DeepestLevel)
            throw new UnreadableException(ExtentOf(first), "nesting", $"more than {DeepestLevel} levels deep", $"at most {DeepestLevel} levels");
        RefuseExtras(first);
        return first switch
        {
            Scalar scalar => new ScalarNode(ExtentOf(scalar), scalar.Value, scalar.Style != ScalarStyle.Plain),
            SequenceStart list => ReadList(list, level + 1),
            MappingStart map => ReadMap(map, level + 1),
            _ => new RefusedNode(ExtentOf(first)),
        };
    }

    private ListNode ReadList(SequenceStart start, int level)
    {
        List<YamlNode> items = [];
        while (Next() is var item and not SequenceEnd)
            items.Add(ReadNode(item, level));
        bool inBrackets = start.Style == SequenceStyle.Flow;
        return new ListNode(inBrackets ? ExtentOf(start.Start, parser.Current!.End) : ExtentOf(start), items);
    }

    private MapNode ReadMap(MappingStart start, int level)
    {
        List<MapEntry> entries = [];
        Dictionary<string, int> lines = [];
        while (Next() is var key and not MappingEnd)
        {
            YamlNode name = ReadNode(key, level);
            YamlNode value = ReadNode(Next(), level);
            if (name is not ScalarNode text)
                faults.Add(name.Extent, "", "key", "a key that is not a single word", "a word before the colon");
            else if (!lines.TryAdd(text.Text, text.Extent.Line))
                RefuseAgain(text, lines[text.Text]);
            else
                entries.Add(new MapEntry(text, Owned(value, text)));
        }
        Extent extent = start.Style == MappingStyle.Flow || entries.Count == 0 ? ExtentOf(start.Start, parser.Current!.End) : entries[0].Key.Extent;
        return new MapNode(extent, SplitNumbers.Join(entries, faults));
    }

    private void RefuseAgain(ScalarNode key, int firstLine) => faults.Add(
        key.Extent, "", "duplicate-key", $"`{key.Text}` a second time, first in line {firstLine}", "each key once", atKey: true);

    /// <summary>What concerns a list or map that begins below its key is shown at the key.</summary>
    private static YamlNode Owned(YamlNode value, ScalarNode key) =>
        value.Extent.Line == key.Extent.Line ? value : value with { Extent = value is ScalarNode ? value.Extent : key.Extent };

    private void RefuseExtras(ParsingEvent node)
    {
        if (node is AnchorAlias alias)
            faults.Add(ExtentOf(node), "", "alias", $"an alias, `*{alias.Value}`", "the value itself, written out");
        if (node is not NodeEvent { } told)
            return;
        if (!told.Anchor.IsEmpty)
            faults.Add(ExtentOf(node), "", "anchor", $"an anchor, `&{told.Anchor}`", "the value without an anchor");
        if (!told.Tag.IsEmpty)
            faults.Add(ExtentOf(node), "", "tag", $"a tag, `{told.Tag}`", "the value without a tag");
    }

    /// <summary>
    /// The next event. For some broken texts the parser fails in ways of its own besides its exception for syntax errors (an open bracket at the
    /// end of a line makes it throw an InvalidOperationException), so that whatever it throws is taken for a syntax error.
    /// </summary>
    private ParsingEvent Next()
    {
        try
        {
            return parser.MoveNext() && parser.Current is { } current
                ? current
                : throw new UnreadableException(Extent.Start, "empty-file", "the file is empty", "the keys of an input file");
        }
        catch (YamlException fault)
        {
            throw new UnreadableException(ExtentOf(fault.End, fault.End), "syntax", SyntaxWords.Of(fault), SyntaxWords.Accepted);
        }
        catch (Exception fault) when (fault is InvalidOperationException or ArgumentException or IndexOutOfRangeException or FormatException)
        {
            Mark last = parser.Current?.End ?? Mark.Empty;
            throw new UnreadableException(ExtentOf(last, last), "syntax", "no sense can be made of what follows here", SyntaxWords.Accepted);
        }
    }

    private Extent ExtentOf(ParsingEvent part) => ExtentOf(part.Start, part.End);

    private Extent ExtentOf(Mark start, Mark end)
    {
        int line = Math.Clamp((int)start.Line, 1, Math.Max(1, source.Lines.Count));
        int width = source.Line(line).Length;
        int column = Math.Clamp((int)start.Column, 1, width + 1);
        int last = end.Line == start.Line ? (int)end.Column : width + 1;
        return new Extent(line, column, Math.Max(1, Math.Min(last, width + 1) - column));
    }
}
