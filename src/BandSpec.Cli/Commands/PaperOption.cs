using System.CommandLine;
using BandSpec.Documents;

namespace BandSpec.Cli.Commands;

/// <summary>The option for the paper of a PDF.</summary>
internal static class PaperOption
{
    /// <summary>The option; A4 when left out.</summary>
    public static Option<Paper> Create() => new("--paper")
    {
        Description = "Paper of the PDF.",
        HelpName = "A4|Letter",
        DefaultValueFactory = _ => Paper.A4,
        CustomParser = result =>
        {
            string written = result.Tokens[0].Value;
            // A number would be taken for the paper at that place in the list.
            if (!char.IsAsciiDigit(written[..Math.Min(1, written.Length)].FirstOrDefault()) && Enum.TryParse(written, ignoreCase: true, out Paper paper))
                return paper;
            result.AddError($"there is no paper `{written}`; --paper takes A4 or Letter");
            return Paper.A4;
        },
    };
}
