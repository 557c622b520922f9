using BandSpec.Cli.Opening;
using BandSpec.Cli.Printing;
using BandSpec.Core.Specifying;
using BandSpec.Core.VirtualLots;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Trying;

/// <summary>What came of one try.</summary>
/// <param name="Inputs">What was read, and the findings.</param>
/// <param name="Specification">The specification; null when there are findings.</param>
/// <param name="Result">What was counted; null likewise.</param>
internal sealed record Tried(InputSet Inputs, Specification? Specification, LotResult? Result);

/// <summary>Reads a requirement, works out its specification, and makes virtual lots of it.</summary>
/// <param name="terminal">Where progress is shown.</param>
internal sealed class TryRun(Terminal terminal)
{
    /// <summary>The relative standard error that a rare probability is refined to.</summary>
    public const double RelativeError = 0.01;

    /// <summary>The most draws that are spent on it.</summary>
    public const long MostDraws = 20_000_000;

    /// <summary>Tries one requirement.</summary>
    /// <exception cref="FormatException">A change has no value to replace.</exception>
    public Tried Try(TryRequest request, CancellationToken cancellation)
    {
        InputSet inputs = InputFolder.Read(request.File, request.Root, terminal.Folder, request.Changes);
        if (inputs.Application is not { } application)
            return new Tried(inputs, null, null);
        Specification specification = SearchBar.Over(
            terminal, application.Requirement.Identity.FolderName, bar => SpecificationDraft.Draft(application, bar, cancellation: cancellation));
        using (LotBar bar = new(terminal, request.Order.LotSize))
            return new Tried(inputs, specification, LotRun.Make(LotSubject.Of(specification), request.Order, request.Threads, bar, cancellation));
    }
}
