namespace BandSpec.Core.Revisions;

/// <summary>A part of the inputs that changed, and what its change does alone: the older inputs solved again with this part of the newer.</summary>
/// <param name="Names">
/// The keys that were swapped, with their file. More than one when none of them fits the older inputs without the others, such as an
/// operating range and the allowed errors that cover it.
/// </param>
/// <param name="Inputs">The fields that changed in them.</param>
/// <param name="Outcome">What that did; <see langword="null"/> when the swapped inputs contradict the rest, so that nothing can be said.</param>
public sealed record Cause(
    IReadOnlyList<(FigureSubject File, string Key)> Names, IReadOnlyList<FigureChange> Inputs, IReadOnlyList<FigureChange>? Outcome)
{
    /// <summary>The figure that moved most: of the band, the margins and the acceptance limits; <see langword="null"/> when none of them moved.</summary>
    public FigureChange? Largest => Outcome?.Where(Counts).Where(change => change.Movement > 0).MaxBy(change => change.Movement);

    /// <summary>How far it moved, <see cref="FigureChange.Movement"/>; 0 when nothing did.</summary>
    public double Movement => Largest?.Movement ?? 0;

    /// <summary>
    /// The causes of what changed between two records, the one that moved most first. Each needs a search for a plan of its own.
    /// </summary>
    /// <param name="comparison">The two records.</param>
    /// <param name="cancellation">Ends the searches early.</param>
    /// <exception cref="OperationCanceledException">A search was ended before it had an answer.</exception>
    public static IReadOnlyList<Cause> Of(Comparison comparison, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(comparison);
        InputSwaps swaps = new(comparison);
        return [.. swaps.Groups().Select(group => swaps.CauseOf(group, cancellation)).OrderByDescending(cause => cause.Movement)];
    }

    /// <summary>What a customer or a tester reads; a share that one term lost to another moves far and means little.</summary>
    private static bool Counts(FigureChange change) => change.Subject switch
    {
        FigureSubject.Band => true,
        FigureSubject.Margin => change.Name == "margin",
        FigureSubject.Verification => change.Name is VerificationFigures.LowerLimit or VerificationFigures.UpperLimit,
        _ => false,
    };
}
