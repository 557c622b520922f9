using System.Globalization;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Revisions;

/// <summary>The figures of one subject while they are listed; no two get the same name and place.</summary>
internal sealed class FigureList(FigureSubject subject)
{
    private readonly List<Figure> figures = [];
    private readonly HashSet<(string, string)> taken = [];

    /// <summary>Everything listed so far.</summary>
    public IReadOnlyList<Figure> All => figures;

    /// <summary>A word or a list of words.</summary>
    public void Text(string name, string text, string place = "") => figures.Add(Figure.OfText(subject, name, Free(name, place), text));

    /// <summary>A word of a closed list, as it is written in files.</summary>
    public void Word<T>(string name, T word)
        where T : struct, Enum => Text(name, Words.Of(word));

    /// <summary>A number with its unit.</summary>
    public void Number(string name, double number, string unit, Func<double, Leeway> leeway, string place = "") =>
        figures.Add(Figure.OfNumber(subject, name, Free(name, place), number, unit, leeway(number)));

    /// <summary>An error in percent of span.</summary>
    public void Error(string name, PercentOfSpan error, Func<double, Leeway> leeway, string place = "") =>
        Number(name, error.Percent, "%FS", leeway, place);

    /// <summary>A temperature.</summary>
    public void Temperature(string name, Temperature temperature, Func<double, Leeway> leeway) =>
        Number(name, temperature.Celsius, "°C", leeway);

    /// <summary>A list of plain numbers.</summary>
    public void Numbers(string name, IEnumerable<double> numbers) =>
        Text(name, string.Join(", ", numbers.Select(n => n.ToString(CultureInfo.InvariantCulture))));

    /// <summary>
    /// A place that no other figure of the name has. Inputs may list one thing twice, such as two bins over the same temperatures; they are
    /// then told apart by their order.
    /// </summary>
    private string Free(string name, string place)
    {
        string free = place;
        for (int turn = 2; !taken.Add((name, free)); turn++)
            free = string.Create(CultureInfo.InvariantCulture, $"{place} ({turn})").TrimStart();
        return free;
    }
}
