using System.CommandLine;
using System.CommandLine.Parsing;
using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;
using BandSpec.Files.Readings;
using BandSpec.Files.Yaml;

namespace BandSpec.Cli.Commands;

/// <summary>Options whose values are quantities and names, read by the same rules as in input files.</summary>
internal static class ValueOptions
{
    /// <summary>A quantity such as <c>25 °C</c>.</summary>
    public static Option<T?> Quantity<T>(string name, string description, QuantityForm<T> form, string help)
        where T : struct => new(name)
        {
            Description = description, HelpName = help, CustomParser = result => Read<T>(form, Text(result), result),
        };

    /// <summary>Times, one after the other.</summary>
    public static Option<Duration[]> Times(string name, string description) => new(name)
    {
        Description = description, HelpName = "TIME", AllowMultipleArgumentsPerToken = true,
        CustomParser = result => [.. result.Tokens.Select(token => Read<Duration>(QuantityForms.Time, token.Value, result)).OfType<Duration>()],
    };

    /// <summary>The calibrated range, such as <c>0 bar..25 bar</c>.</summary>
    public static Option<PressureRange?> Range() => new("--range")
    {
        Description = "The calibrated range when readings give pressures, such as \"0 bar..25 bar\".", HelpName = "RANGE",
        CustomParser = result => Ends(result) is { } ends && Read<Pressure>(QuantityForms.Pressure, ends.From, result) is { } lower
            && Read<Pressure>(QuantityForms.Pressure, ends.To, result) is { } upper
                ? new PressureRange(lower, upper, PressureReference.Gauge)
                : null,
    };

    /// <summary>The nominal output, such as <c>0 mV..100 mV</c>.</summary>
    public static Option<NominalOutput?> Output() => new("--output")
    {
        Description = "The nominal output over the range when readings are not errors, such as \"0 mV..100 mV\".", HelpName = "OUTPUT",
        CustomParser = result => Ends(result) is { } ends ? Nominal(ends, result) : null,
    };

    /// <summary>Columns with other names than usual.</summary>
    public static Option<string[]> Columns() => new("--column")
    {
        Description = "A column by another name, such as temperature=\"T chamber\"; the unit in brackets is not part of it.", HelpName = "NAME=HEADER",
    };

    /// <summary>The mapping of <see cref="Columns"/>.</summary>
    public static Dictionary<string, string> Mapping(IEnumerable<string> pairs) =>
        pairs.Select(pair => pair.Split('=', 2)).Where(pair => pair.Length == 2).GroupBy(pair => pair[0]).ToDictionary(p => p.Key, p => p.Last()[1]);

    /// <summary>Degrees that are fixed, such as <c>zero=3</c>.</summary>
    public static Option<KeyValuePair<PressureShape, int>[]> Degrees() => new("--degree")
    {
        Description = "Fixes the degree in temperature of a shape: zero=3, span=3, bow=1, s-shape=none.", HelpName = "SHAPE=DEGREE",
        CustomParser = result => [.. result.Tokens.Select(token => Degree(token.Value, result)).OfType<KeyValuePair<PressureShape, int>>()],
    };

    private static KeyValuePair<PressureShape, int>? Degree(string text, ArgumentResult result)
    {
        string[] parts = text.Split('=', 2);
        foreach (PressureShape shape in Enum.GetValues<PressureShape>())
            if (parts.Length == 2 && parts[0] == new CoefficientName(shape, 0).Word)
            {
                if (parts[1] == "none")
                    return new(shape, -1);
                if (int.TryParse(parts[1], out int degree) && degree is >= 0 and <= 8)
                    return new(shape, degree);
            }

        result.AddError($"`{text}`: accepted are zero, span, bow or s-shape with a degree 0 to 8 or `none`, such as zero=3");
        return null;
    }

    private static string Text(ArgumentResult result) => string.Join(' ', result.Tokens.Select(token => token.Value));

    private static (string From, string To)? Ends(ArgumentResult result)
    {
        string[] ends = Text(result).Split("..", StringSplitOptions.TrimEntries);
        if (ends.Length == 2)
            return (ends[0], ends[1]);
        result.AddError($"`{Text(result)}`: two ends with `..` between them are accepted");
        return null;
    }

    private static NominalOutput? Nominal((string From, string To) ends, ArgumentResult result)
    {
        string[] from = ends.From.Split(' ', 2), to = ends.To.Split(' ', 2);
        if (from.Length == 2 && to.Length == 2 && from[1] == to[1] && Numbers.TryRead(from[0], out double lower, out _)
            && Numbers.TryRead(to[0], out double upper, out _) && lower != upper)
            return new NominalOutput(lower, upper, from[1]);
        result.AddError($"`{Text(result)}`: two different numbers with the same unit are accepted");
        return null;
    }

    private static T? Read<T>(Form form, string text, ArgumentResult result)
        where T : struct
    {
        Reading reading = new(new FoundFaults(InputFile.Readings), null);
        object? value = form.Read(new ScalarNode(Extent.Start, text, false), "", reading);
        foreach (LocatedFinding fault in reading.Faults.All)
            result.AddError($"{fault.Finding.Found}: accepted is {fault.Finding.Accepted}");
        return (T?)value;
    }
}
