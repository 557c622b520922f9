using System.Globalization;
using BandSpec.Core.VirtualLots;

namespace BandSpec.Cli.Printing;

/// <summary>While lots are made: how many units of how many, and the time that is left at the pace so far.</summary>
internal sealed class LotBar(Terminal terminal, int lotSize) : IProgress<LotProgress>, IDisposable
{
    private readonly StatusLine line = new(terminal, TimeSpan.FromMilliseconds(100));
    private readonly long begun = terminal.Clock.GetTimestamp();

    /// <inheritdoc/>
    public void Report(LotProgress value) => line.Show(() =>
    {
        double part = Math.Clamp((double)value.Made / value.Ordered, 0, 1);
        return string.Create(
            CultureInfo.InvariantCulture,
            $"{StatusLine.Bar(part)} {value.Made * lotSize:N0} of {value.Ordered * lotSize:N0} units, {StatusLine.Left(terminal.Clock.GetElapsedTime(begun), part)} left; Ctrl-C shows what is there so far");
    });

    /// <summary>Takes the line away.</summary>
    public void Dispose() => line.Dispose();
}
