using System.Text.Json;
using BandSpec.Core.Revisions;
using BandSpec.Core.Specifying;

namespace BandSpec.Files.Json;

/// <summary>Writes a comparison for programs: every changed figure, not rounded, with what it means for production and for the customer.</summary>
public static class ComparisonJson
{
    /// <summary>The format's name; it changes when a member is renamed or removed.</summary>
    public const string Format = "bandspec/comparison/1";

    /// <summary>The bytes of the document.</summary>
    /// <param name="comparison">The two records.</param>
    /// <param name="causes">What each changed part of the inputs does alone, the one that moved most first.</param>
    public static ReadOnlyMemory<byte> Write(Comparison comparison, IReadOnlyList<Cause> causes)
    {
        ArgumentNullException.ThrowIfNull(comparison);
        return JsonFile.Of(json =>
        {
            json.WriteString("format", Format);
            json.Object("old", old => WriteSide(old, comparison.Old));
            json.Object("new", now => WriteSide(now, comparison.New));
            json.WriteBoolean("limits-differ", comparison.LimitsDiffer);
            json.Objects("inputs", comparison.Inputs, WriteChange);
            json.Objects("outcome", comparison.Outcome, WriteChange);
            json.Objects("causes", causes, WriteCause);
        });
    }

    private static void WriteSide(Utf8JsonWriter json, Specification specification)
    {
        json.Identity(specification.Application.Requirement.Identity);
        json.WriteBoolean("feasible", specification.Feasible);
        json.Figure("margin", specification.Bands.Margin);
    }

    private static void WriteChange(Utf8JsonWriter json, FigureChange change)
    {
        json.WriteString("subject", Word(change.Subject));
        json.WriteString("name", change.Name);
        if (change.Place.Length > 0)
            json.WriteString("place", change.Place);
        WriteValue(json, "old", change.Old);
        WriteValue(json, "new", change.New);
        json.WriteString("production", Word(change.ForProduction));
        json.WriteString("customer", Word(change.ForCustomer));
    }

    /// <summary>A number with its unit, a text, or <c>null</c> for what is not there.</summary>
    private static void WriteValue(Utf8JsonWriter json, string name, Figure? figure)
    {
        if (figure is null)
            json.WriteNull(name);
        else if (figure.Number is { } number)
            json.Object(name, value =>
            {
                value.Figure("number", number);
                value.WriteString("unit", figure.Unit);
            });
        else
            json.WriteString(name, figure.Text);
    }

    private static void WriteCause(Utf8JsonWriter json, Cause cause)
    {
        json.Strings("keys", cause.Names.Select(name => $"{Word(name.File)}:{name.Key}"));
        json.WriteBoolean("solved", cause.Outcome is not null);
        json.Figure("movement", cause.Movement);
        if (cause.Largest is { } largest)
            json.Object("largest", change => WriteChange(change, largest));
    }

    private static string Word(FigureSubject subject) => subject == FigureSubject.DerivedLimits ? "derived-limits" : subject.ToString().ToLowerInvariant();

    private static string Word(Bearing bearing) => bearing.ToString().ToLowerInvariant();
}
