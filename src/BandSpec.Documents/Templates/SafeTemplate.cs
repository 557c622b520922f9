using System.Globalization;
using Scriban;
using Scriban.Parsing;
using Scriban.Runtime;
using Scriban.Syntax;

namespace BandSpec.Documents.Templates;

/// <summary>
/// A template that can do nothing but write text: it sees what it is given, read-only, and neither files, clock, chance nor .NET. Loops,
/// depth, output and time are bounded, and whatever goes wrong is an error with its place.
/// </summary>
internal sealed class SafeTemplate
{
    private const int MostSteps = 100_000, MostDepth = 40, MostLetters = 2_000_000;

    private static readonly ScriptObject Builtins = MakeBuiltins();

    private readonly Template _template;
    private readonly string _file;

    public SafeTemplate(string file, string text)
    {
        _file = file;
        // Scriban takes it for the end of the text, and would leave the rest out without a word.
        if (text.IndexOf('\0', StringComparison.Ordinal) is >= 0 and var at)
            throw new TemplateException(file, text.AsSpan(0, at).Count('\n') + 1, at - text.LastIndexOf('\n', at), "An invisible character, U+0000.");
        _template = Template.Parse(text, file, new ParserOptions { ExpressionDepthLimit = 100 });
        if (_template.Messages.FirstOrDefault(m => m.Type == ParserMessageType.Error) is { } error) throw At(error.Span, error.Message);
    }

    /// <param name="view">Everything the template may see.</param>
    /// <param name="escape">What is done to every value before it is written; the template's own text is left as it is.</param>
    public string Render(IScriptObject view, Func<string, string>? escape = null)
    {
        var context = new EscapingContext(Builtins, escape)
        {
            StrictVariables = true,
            EnableRelaxedMemberAccess = false,
            EnableRelaxedTargetAccess = false,
            EnableRelaxedFunctionAccess = false,
            EnableRelaxedIndexerAccess = false,
            LoopLimit = MostSteps,
            RecursiveLimit = MostDepth,
            ObjectRecursionLimit = MostDepth,
            LimitToString = MostLetters,
            OutputLimit = MostLetters,
            // The limits would cut the text off without a word otherwise.
            OnStringLimit = ScriptLimitBehavior.Throw,
            OnOutputLimit = ScriptLimitBehavior.Throw,
            TemplateLoader = NoOther.Instance,
            RegexTimeOut = TimeSpan.FromMilliseconds(500),
            NewLine = "\n",
            MemberFilter = _ => false,
        };
        context.PushCulture(CultureInfo.InvariantCulture);
        context.PushGlobal(view);
        // Variables of the template's own live here and end with it.
        context.PushGlobal(new ScriptObject());
        try
        {
            return _template.Render(context);
        }
        catch (ScriptRuntimeException fault)
        {
            throw At(fault.Span, fault.OriginalMessage);
        }
    }

    // What is missing at the end of the text has no place of its own.
    private TemplateException At(SourceSpan span, string reason) =>
        new(_file, Math.Max(span.Start.Line, 0) + 1, Math.Max(span.Start.Column, 0) + 1, reason.Trim().TrimEnd('.') + ".");

    // Without the clock, chance, and evaluation of text made up at run time. Shared by all templates, so read-only throughout.
    private static ScriptObject MakeBuiltins()
    {
        var builtins = TemplateContext.GetDefaultBuiltinObject();
        builtins.Remove("date");
        Without(builtins, "math", "random", "uuid");
        Without(builtins, "object", "eval", "eval_template");
        foreach (var group in builtins.Values.OfType<ScriptObject>()) group.IsReadOnly = true;
        builtins.IsReadOnly = true;
        return builtins;
    }

    private static void Without(ScriptObject builtins, string group, params string[] names)
    {
        if (builtins[group] is not ScriptObject all) throw new InvalidOperationException($"Scriban no longer has the functions '{group}'.");
        var functions = (ScriptObject)all.Clone(deep: false);
        foreach (var name in names) functions.Remove(name);
        builtins.SetValue(group, functions, readOnly: true);
    }

    /// <summary>A template is one file: what it seems to say is all that it says.</summary>
    private sealed class NoOther : ITemplateLoader
    {
        public static readonly NoOther Instance = new();

        public string GetPath(TemplateContext context, SourceSpan callerSpan, string templateName) =>
            throw new ScriptRuntimeException(callerSpan, $"a template cannot include another, `{templateName}`");

        public string? Load(TemplateContext context, SourceSpan callerSpan, string templatePath) =>
            throw new ScriptRuntimeException(callerSpan, "a template cannot include another");

        public ValueTask<string?> LoadAsync(TemplateContext context, SourceSpan callerSpan, string templatePath) =>
            throw new ScriptRuntimeException(callerSpan, "a template cannot include another");
    }

    private sealed class EscapingContext(ScriptObject builtins, Func<string, string>? escape) : TemplateContext(builtins)
    {
        public override TemplateContext Write(SourceSpan span, object? textAsObject) =>
            base.Write(span, escape is not null && textAsObject is string text ? escape(text) : textAsObject);
    }
}
