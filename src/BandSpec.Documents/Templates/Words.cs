using System.Text.RegularExpressions;
using BandSpec.Documents.Model;
using Scriban.Runtime;

namespace BandSpec.Documents.Templates;

/// <summary>
/// All headings, fixed sentences and cautions of one language. A word file is a list of entries, each opened by a line <c>:: key</c>;
/// what follows is a Scriban template that writes marked-up text (<see cref="Markup"/>), with blank lines between paragraphs. Values are
/// protected on their way in, so that a star in a customer's name stays a star.
/// </summary>
internal sealed partial class Words
{
    private static readonly string[] Files = ["document.scriban", "terms.scriban", "decisions.scriban", "cautions.scriban"];

    /// <summary>The file of words that only the judgement of a lot needs.</summary>
    public const string OfJudgements = "judgement.scriban";

    private readonly Dictionary<string, Entry> _entries;
    private readonly ScriptObject _view;
    private readonly string _folder;

    private Words(Dictionary<string, Entry> entries, ScriptObject view, string folder) =>
        (_entries, _view, _folder) = (entries, view, folder);

    private sealed record Entry(string File, int Line, SafeTemplate Template);

    /// <summary>The paths of the word files of a language.</summary>
    public static IEnumerable<string> PathsOf(string language) => Files.Select(file => $"words/{language}/{file}");

    /// <summary>
    /// Reads the word files of a language, and further ones by name; every entry is parsed at once, so that a mistake shows however rarely
    /// the entry is used.
    /// </summary>
    public static Words Load(TemplateSources sources, string language, params IEnumerable<string> further)
    {
        var folder = $"words/{language}";
        var entries = new Dictionary<string, Entry>();
        foreach (var file in Files.Concat(further))
        {
            if (sources.Read($"{folder}/{file}") is not var (name, text))
                throw new TemplateException(
                    $"{folder}/{file}", 1, 1,
                    $"There is no such file, neither among the user's templates nor built in: the language '{language}' is not known.");
            foreach (var section in WordSection.Cut(name, text))
                if (!entries.TryAdd(section.Key, new Entry(name, section.Line, new SafeTemplate(name, section.PaddedText))))
                    throw new TemplateException(name, section.Line, 1, $"The entry '{section.Key}' stands here a second time.");
        }
        return new Words(entries, new ScriptObject { IsReadOnly = true }, folder);
    }

    public Phrase this[string key] => Say(key);

    /// <summary>The same words about a specification.</summary>
    public Words About(ScriptObject view) => new(_entries, view, _folder);

    /// <summary>The entry as one paragraph, with what it needs beyond the print view.</summary>
    public Phrase Say(string key, params (string Name, object Value)[] more) =>
        Paragraphs(key, more) is var paragraphs && paragraphs.Count > 0 ? paragraphs[0] : Phrase.Empty;

    public string Plain(string key, params (string Name, object Value)[] more) => Say(key, more).Plain;

    /// <summary>The entry's paragraphs; none when the entry decides to say nothing.</summary>
    public IReadOnlyList<Phrase> Paragraphs(string key, params (string Name, object Value)[] more)
    {
        if (!_entries.TryGetValue(key, out var entry)) throw new TemplateException(_folder, 1, 1, $"The entry '{key}' is missing.");
        var scope = _view;
        if (more.Length > 0)
        {
            scope = (ScriptObject)_view.Clone(deep: false);
            scope.IsReadOnly = false;
            foreach (var (name, value) in more) scope.SetValue(name, value, readOnly: true);
        }
        var text = entry.Template.Render(scope, Markup.Escape).Trim().Split(
            "\n\n", StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries);
        return [.. text.Select(paragraph => Parse(entry, paragraph))];
    }

    private static Phrase Parse(Entry entry, string paragraph)
    {
        try
        {
            var line = string.Join(' ', paragraph.Split('\n', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries));
            return Markup.Parse(SpaceBeforeUnit().Replace(line, "\u00a0"));
        }
        catch (FormatException fault)
        {
            throw new TemplateException(entry.File, entry.Line, 1, fault.Message);
        }
    }

    // A figure stays on one line with its unit and with the sign before it; a word of up to four letters after a figure is taken for a
    // unit, which does no harm.
    [GeneratedRegex(@"(?<=\d) (?=[°%]|\p{L}{1,4}\b)| (?=[≥≤=] ?\d)|(?<=[≥≤=]) (?=\d)")]
    private static partial Regex SpaceBeforeUnit();
}
