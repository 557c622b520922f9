using System.Diagnostics.CodeAnalysis;

namespace BandSpec.Files.Forms;

/// <summary>Makes a quantity of a number in one unit; false when the number is out of the quantity's range.</summary>
internal delegate bool MakeQuantity<T>(double number, Reading reading, [MaybeNullWhen(false)] out T value);

/// <summary>A unit that a quantity may be written in.</summary>
/// <param name="Symbol">The symbol that messages show.</param>
/// <param name="Make">Makes the quantity.</param>
/// <param name="Aliases">Other spellings that are accepted, for keyboards without the sign.</param>
internal sealed record Unit<T>(string Symbol, MakeQuantity<T> Make, params string[] Aliases)
{
    /// <summary>Every accepted spelling.</summary>
    internal IEnumerable<string> Spellings => Aliases.Prepend(Symbol);
}
