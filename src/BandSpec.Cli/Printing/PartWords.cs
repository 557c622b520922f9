using System.Globalization;
using BandSpec.Core.VirtualLots;

namespace BandSpec.Cli.Printing;

/// <summary>What is wrong with parts, in words.</summary>
internal static class PartWords
{
    /// <summary>One finding.</summary>
    /// <param name="finding">The finding.</param>
    /// <param name="files">The parts' files in the order they were given.</param>
    /// <param name="order">The order that the first part is of.</param>
    public static string Of(PartFinding finding, IReadOnlyList<string> files, LotOrder order)
    {
        string lots = string.Create(
            CultureInfo.InvariantCulture, $"lots {finding.Lots.First + 1} to {finding.Lots.End} of {order.Lots} ({(finding.Lots.End - finding.Lots.First) * order.LotSize:N0} units)");
        return finding.Fault switch
        {
            PartFault.Foreign => $"{files[finding.Part ?? 0]}: it belongs to another specification, another order or another version than {files[0]}",
            PartFault.Duplicate => $"{files[finding.Part ?? 0]}: {lots} are in another part too",
            _ => $"missing: {lots} are in no part; the report is of the others",
        };
    }
}
