namespace BandSpec.Core.Findings;

/// <summary>Finds the word that a misspelt one was probably meant to be.</summary>
public static class Spelling
{
    /// <summary>Longer words are not compared: no key is that long, and the work grows with the square.</summary>
    private const int LongestWord = 60;

    /// <summary>
    /// The accepted word nearest to what was written, in upper or lower case; <see langword="null"/> when none is near. Near is at most one slip
    /// of the finger for every three letters: a letter too many, too few, wrong, or two exchanged.
    /// </summary>
    /// <param name="written">What was written.</param>
    /// <param name="accepted">The words to choose from; the first wins among equally near ones.</param>
    public static string? Nearest(string written, IEnumerable<string> accepted)
    {
        ArgumentNullException.ThrowIfNull(written);
        ArgumentNullException.ThrowIfNull(accepted);
        if (written.Length is 0 or > LongestWord)
            return null;
        int near = Math.Max(1, written.Length / 3);
        return accepted
            .Where(word => word.Length <= LongestWord)
            .Select(word => (word, slips: Slips(written.ToUpperInvariant(), word.ToUpperInvariant())))
            .Where(candidate => candidate.slips <= near && candidate.slips < candidate.word.Length)
            .OrderBy(candidate => candidate.slips)
            .FirstOrDefault().word;
    }

    /// <summary>Optimal string alignment distance (the restricted form of Damerau 1964): insert, leave out, replace, exchange neighbours.</summary>
    private static int Slips(string a, string b)
    {
        int[,] d = new int[a.Length + 1, b.Length + 1];
        for (int i = 0; i <= a.Length; i++)
            d[i, 0] = i;
        for (int j = 0; j <= b.Length; j++)
            d[0, j] = j;
        for (int i = 1; i <= a.Length; i++)
        {
            for (int j = 1; j <= b.Length; j++)
            {
                int replaced = d[i - 1, j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1);
                d[i, j] = Math.Min(replaced, Math.Min(d[i - 1, j], d[i, j - 1]) + 1);
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                    d[i, j] = Math.Min(d[i, j], d[i - 2, j - 2] + 1);
            }
        }
        return d[a.Length, b.Length];
    }
}
