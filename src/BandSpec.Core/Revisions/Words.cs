using System.Globalization;
using System.Text;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Revisions;

/// <summary>How figures name things: in the words of the input files.</summary>
internal static class Words
{
    /// <summary>A word of a closed list in lower case, its parts joined by hyphens: <c>least-cost</c>.</summary>
    public static string Of<T>(T word)
        where T : struct, Enum
    {
        StringBuilder written = new();
        foreach (char letter in word.ToString())
        {
            if (char.IsUpper(letter) && written.Length > 0)
                written.Append('-');
            written.Append(char.ToLowerInvariant(letter));
        }

        return written.ToString();
    }

    /// <summary>A coefficient's name: <c>zero.1</c>.</summary>
    public static string Of(CoefficientName name) => string.Create(CultureInfo.InvariantCulture, $"{Of(name.Shape)}.{name.Degree}");

    /// <summary>A temperature range: <c>-20 °C … 40 °C</c>.</summary>
    public static string Of(Temperature from, Temperature to) => $"{from} … {to}";
}
