using System.Diagnostics.CodeAnalysis;

namespace BandSpec.Core.Findings;

/// <summary>A value that passed its rules, or the findings that kept it from existing; never both, never neither.</summary>
/// <typeparam name="T">What is there when nothing was found.</typeparam>
public sealed class Checked<T>
    where T : class
{
    private Checked(T? value, IReadOnlyList<Finding> findings) => (Value, Findings) = (value, findings);

    /// <summary>The value; <see langword="null"/> exactly when there are findings.</summary>
    public T? Value { get; }

    /// <summary>Everything that was found, in the order of the rules; empty exactly when there is a value.</summary>
    public IReadOnlyList<Finding> Findings { get; }

    /// <summary>Whether the value is there.</summary>
    [MemberNotNullWhen(true, nameof(Value))]
    public bool IsValid => Value is not null;

    /// <summary>The value when no finding is listed, otherwise the findings.</summary>
    internal static Checked<T> Of(IReadOnlyList<Finding> findings, Func<T> value) =>
        findings.Count == 0 ? new Checked<T>(value(), []) : new Checked<T>(null, findings);
}
