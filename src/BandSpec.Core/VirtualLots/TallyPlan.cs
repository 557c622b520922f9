namespace BandSpec.Core.VirtualLots;

/// <summary>What is counted in every lot; those that come once a region, stage or point stand behind the others in a <see cref="TallyPlan"/>.</summary>
internal enum Counted
{
    /// <summary>Units accepted by the verification test.</summary>
    Accepted,

    /// <summary>Units that never leave the allowed error, anywhere.</summary>
    Good,

    /// <summary>Good units that were rejected.</summary>
    GoodRejected,

    /// <summary>Accepted units that leave the allowed error somewhere at some time.</summary>
    AcceptedLeaving,

    /// <summary>Accepted units that leave the allowed error somewhere when new.</summary>
    AcceptedLeavingNew,

    /// <summary>Moments of use of accepted units with the error beyond the allowed.</summary>
    UseOutside,

    /// <summary>Moments of use of all units, at the end of life and with everything added to the nearer side, beyond the allowed.</summary>
    WorstUseOutside,
}

/// <summary>Where every figure of a tally stands.</summary>
/// <param name="Regions">Regions of the allowed error.</param>
/// <param name="Stages">Temperatures of the verification test.</param>
/// <param name="Points">Points of the verification test.</param>
/// <param name="Nodes">Places of the map.</param>
internal sealed record TallyPlan(int Regions, int Stages, int Points, int Nodes)
{
    /// <summary>Figures kept of one count: its sum over lots, its squares, and its products with the accepted units.</summary>
    public const int FiguresPerCount = 3;

    /// <summary>Figures kept of one place: see <see cref="NodeFigure"/>.</summary>
    public const int FiguresPerNode = (int)NodeFigure.Count;

    /// <summary>Bins of the error histogram, the open ones at both ends included.</summary>
    public const int Bins = 62;

    private const int Single = (int)Counted.WorstUseOutside + 1;

    /// <summary>How many counts a lot has.</summary>
    public int Counts => Single + Regions + Stages + (3 * Points);

    /// <summary>The first bin of the histogram.</summary>
    public int Histogram => 1 + (FiguresPerCount * Counts);

    /// <summary>Sum and squares over lots of the mean square of the worst use.</summary>
    public int UseSquare => Histogram + Bins;

    /// <summary>The first figure of the first place.</summary>
    public int FirstNode => UseSquare + 2;

    /// <summary>How many figures there are; the first is the number of lots.</summary>
    public int Length => FirstNode + (FiguresPerNode * Nodes);

    /// <summary>Index of the count of accepted units that leave a region.</summary>
    public static int LeavingRegion(int region) => Single + region;

    /// <summary>Index of the count of units that passed all temperatures of the test up to a stage.</summary>
    public int PassedStage(int stage) => Single + Regions + stage;

    /// <summary>Index of the count of units that failed at a point.</summary>
    public int FailedAt(int point) => Single + Regions + Stages + point;

    /// <summary>Index of the count of units within the limits at a point although truly beyond its tolerance.</summary>
    public int ConsumerAt(int point) => Single + Regions + Stages + Points + point;

    /// <summary>Index of the count of units outside the limits at a point although truly within its tolerance.</summary>
    public int ProducerAt(int point) => Single + Regions + Stages + (2 * Points) + point;

    /// <summary>Where the three figures of a count stand.</summary>
    public static int FiguresOf(int count) => 1 + (FiguresPerCount * count);
}

/// <summary>
/// What is summed over lots at each place: powers of the lot's mean <c>m</c> of the whole error less its nominal value, of the variance
/// <c>w</c> within the lot, their products, and the lot's mean <c>r</c> of what compensation left over, less its nominal value.
/// </summary>
internal enum NodeFigure
{
    /// <summary><c>m</c>.</summary>
    Mean,

    /// <summary><c>m²</c>.</summary>
    Mean2,

    /// <summary><c>m³</c>.</summary>
    Mean3,

    /// <summary><c>m⁴</c>.</summary>
    Mean4,

    /// <summary><c>w</c>.</summary>
    Within,

    /// <summary><c>w²</c>.</summary>
    Within2,

    /// <summary><c>m·w</c>.</summary>
    MeanWithin,

    /// <summary><c>m²·w</c>.</summary>
    Mean2Within,

    /// <summary><c>r</c>.</summary>
    Residue,

    /// <summary><c>r²</c>.</summary>
    Residue2,

    /// <summary>How many there are.</summary>
    Count,
}
