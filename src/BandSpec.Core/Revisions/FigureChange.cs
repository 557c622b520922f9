namespace BandSpec.Core.Revisions;

/// <summary>What a change means for one side.</summary>
public enum Bearing
{
    /// <summary>Neither: nothing changes for that side, or the figure alone does not tell.</summary>
    Neutral,

    /// <summary>The <see cref="Leeway"/> shrinks: for production something becomes harder, to the customer more is promised.</summary>
    Tighter,

    /// <summary>The <see cref="Leeway"/> grows: for production something becomes easier, to the customer less is promised.</summary>
    Looser,
}

/// <summary>
/// A figure that has another value in the newer record, or that only one of the two records has. Taken the other way round, tighter becomes
/// looser and the reverse.
/// </summary>
/// <param name="Old">The figure in the older record; <see langword="null"/> when it was not there.</param>
/// <param name="New">The figure in the newer record; <see langword="null"/> when it is no longer there.</param>
public sealed record FigureChange(Figure? Old, Figure? New)
{
    /// <summary>What the figure belongs to.</summary>
    public FigureSubject Subject => Either.Subject;

    /// <summary>Its name.</summary>
    public string Name => Either.Name;

    /// <summary>Where it holds.</summary>
    public string Place => Either.Place;

    /// <summary>What the change means for production; neutral for a figure that only one record has, or in another unit.</summary>
    public Bearing ForProduction => BearingOf(figure => figure.Leeway.Production);

    /// <summary>What the change means for the customer; neutral for a figure that only one record has, or in another unit.</summary>
    public Bearing ForCustomer => BearingOf(figure => figure.Leeway.Customer);

    /// <summary>
    /// How far the figure moved: the difference of its leeway as a part of the larger of the two, production's where there is one; 0 where
    /// neither side's leeway is told. At most 1 while the sign stays.
    /// </summary>
    public double Movement => LeewaysOf(figure => figure.Leeway.Production ?? figure.Leeway.Customer) is not var (a, b) || Figure.AreSame(a, b) ? 0
        : double.IsFinite(a) && double.IsFinite(b) ? Math.Abs(a - b) / Math.Max(Math.Abs(a), Math.Abs(b)) : 1;

    /// <summary>
    /// Both values to be shown side by side, with no more digits than it takes to tell them apart; <see langword="null"/> for a figure that is
    /// not there.
    /// </summary>
    public (string? Old, string? New) Shown => ShownFigures.Of(Old, New);

    private Figure Either => New ?? Old ?? throw new InvalidOperationException("a change has at least one of its two figures");

    /// <summary>The figures that differ, in the order of the newer record; those that are gone follow.</summary>
    internal static IReadOnlyList<FigureChange> Between(IReadOnlyList<Figure> old, IReadOnlyList<Figure> now)
    {
        Dictionary<(FigureSubject, string, string), Figure> before = ByName(old), after = ByName(now);
        return
        [
            .. now.Select(figure => new FigureChange(before.GetValueOrDefault(NameOf(figure)), figure))
                .Where(change => change.Old is null || !change.Old.HasTheSameValue(change.New!)),
            .. old.Where(figure => !after.ContainsKey(NameOf(figure))).Select(figure => new FigureChange(figure, null)),
        ];
    }

    private static Dictionary<(FigureSubject, string, string), Figure> ByName(IReadOnlyList<Figure> figures) => figures.ToDictionary(NameOf);

    private static (FigureSubject Subject, string Name, string Place) NameOf(Figure figure) => (figure.Subject, figure.Name, figure.Place);

    private Bearing BearingOf(Func<Figure, double?> leeway) =>
        LeewaysOf(leeway) is not var (a, b) || Figure.AreSame(a, b) ? Bearing.Neutral : b < a ? Bearing.Tighter : Bearing.Looser;

    private (double Old, double New)? LeewaysOf(Func<Figure, double?> leeway) =>
        Old is not null && New is not null && Old.Unit == New.Unit && leeway(Old) is { } before && leeway(New) is { } after ? (before, after) : null;
}
