namespace BandSpec.Documents.Templates;

/// <summary>A template that cannot be read or carried out, with the place in it. Lines and columns count from 1.</summary>
public sealed class TemplateException : Exception
{
    /// <summary>Tells what is wrong at which place.</summary>
    /// <param name="file">The template's file as the user knows it.</param>
    /// <param name="line">Line, from 1.</param>
    /// <param name="column">Column, from 1.</param>
    /// <param name="reason">What is wrong, one sentence.</param>
    public TemplateException(string file, int line, int column, string reason)
        : base($"{file}:{line}:{column}: {reason}") => (File, Line, Column, Reason) = (file, line, column, reason);

    /// <summary>The template's file as the user knows it.</summary>
    public string File { get; }

    /// <summary>Line, from 1.</summary>
    public int Line { get; }

    /// <summary>Column, from 1.</summary>
    public int Column { get; }

    /// <summary>What is wrong, one sentence.</summary>
    public string Reason { get; }
}
