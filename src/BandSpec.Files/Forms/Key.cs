namespace BandSpec.Files.Forms;

/// <summary>A key of a map: its name, the form of its value and what it means.</summary>
internal abstract class Key(string name, Form form, string about, bool isRequired)
{
    /// <summary>The key as it is written.</summary>
    internal string Name { get; } = name;

    /// <summary>The form of its value.</summary>
    internal Form Form { get; } = form;

    /// <summary>What it means, a sentence that editors show.</summary>
    internal string About { get; } = about;

    /// <summary>Whether it has to be there.</summary>
    internal bool IsRequired { get; } = isRequired;

    /// <summary>A key that may be left out, and what then holds.</summary>
    internal static Key<T> Optional<T>(string name, Form form, T fallback, string about)
        where T : notnull => new(name, form, about, false, fallback);

    /// <summary>A key that may be left out without anything in its place; ask <see cref="MapValues.Has"/> first.</summary>
    internal static Key<T> Optional<T>(string name, Form form, string about)
        where T : notnull => new(name, form, about, false, default);
}

/// <inheritdoc/>
/// <typeparam name="T">What its value is read as.</typeparam>
internal sealed class Key<T>(string name, Form form, string about, bool isRequired, T? fallback) : Key(name, form, about, isRequired)
    where T : notnull
{
    /// <summary>A key that has to be there.</summary>
    internal Key(string name, Form form, string about)
        : this(name, form, about, true, default)
    {
    }

    /// <summary>The value when the key is left out.</summary>
    internal T? Fallback { get; } = fallback;
}
