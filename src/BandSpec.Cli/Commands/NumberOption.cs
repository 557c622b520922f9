using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;
using System.Numerics;

namespace BandSpec.Cli.Commands;

/// <summary>Options whose value is a plain number within bounds; a wrong one is refused in words.</summary>
internal static class NumberOption
{
    /// <summary>An option with a usual value.</summary>
    /// <param name="name">Its name, such as <c>--workers</c>.</param>
    /// <param name="description">What it does.</param>
    /// <param name="help">What stands for the value in the help.</param>
    /// <param name="takes">What is accepted, in words that follow <c>takes</c>.</param>
    /// <param name="isAccepted">Whether a number is.</param>
    /// <param name="usual">The value when it is left out.</param>
    public static Option<T> Create<T>(string name, string description, string help, string takes, Func<T, bool> isAccepted, T usual)
        where T : struct, INumber<T> => new(name)
        {
            Description = description, HelpName = help, DefaultValueFactory = _ => usual,
            CustomParser = result => Read(name, takes, isAccepted, result) ?? usual,
        };

    /// <summary>An option without a usual value.</summary>
    public static Option<T?> Create<T>(string name, string description, string help, string takes, Func<T, bool> isAccepted)
        where T : struct, INumber<T> => new(name)
        {
            Description = description, HelpName = help, CustomParser = result => Read(name, takes, isAccepted, result),
        };

    private static T? Read<T>(string name, string takes, Func<T, bool> isAccepted, ArgumentResult result)
        where T : struct, INumber<T>
    {
        string written = result.Tokens[0].Value;
        if (T.TryParse(written, NumberStyles.Float, CultureInfo.InvariantCulture, out T number) && isAccepted(number))
            return number;
        result.AddError($"`{written}`: {name} takes {takes}");
        return null;
    }
}
