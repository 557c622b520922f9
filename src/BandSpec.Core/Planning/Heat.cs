namespace BandSpec.Core.Planning;

/// <summary>
/// One run over some families: what a plan must reach, and who has reached it. Plans a little behind the best stay in the running, since
/// further nodes may bring them to the front. Safe for several threads.
/// </summary>
internal sealed class Heat(MarginScore margin, double least, bool rmsFirst, double mostRms = double.PositiveInfinity)
{
    /// <summary>How far behind the best, relative, a plan stays in the running.</summary>
    public const double Reserve = 0.005;

    private readonly Lock gate = new();
    private double bestMargin = double.NegativeInfinity;
    private double bestRms = double.PositiveInfinity;

    /// <summary>The score by margin.</summary>
    public MarginScore Margin { get; } = margin;

    /// <summary>Whether the smallest rms comes before the largest margin.</summary>
    public bool RmsFirst { get; } = rmsFirst;

    /// <summary>Everyone still in the running.</summary>
    public List<Contender> Contenders { get; } = [];

    /// <summary>A margin below this is out: not feasible, or too far behind.</summary>
    public double LeastMargin => RmsFirst ? least : Math.Max(least, Contest.Below(Volatile.Read(ref bestMargin), Reserve));

    /// <summary>An rms above this is out.</summary>
    public double MostRms => Math.Min(mostRms, RmsFirst ? Contest.Above(Volatile.Read(ref bestRms), Reserve) : double.PositiveInfinity);

    /// <summary>Everyone in the running at the end.</summary>
    /// <param name="cutAt">The margin below which cuts kept plans out of the heat.</param>
    public Shortlist Shortlist(double cutAt) => new(Contenders, least, Math.Max(cutAt, LeastMargin), MostRms, RmsFirst);

    /// <summary>Takes a plan into the running and those out that it beats.</summary>
    public void Enter(Contender contender)
    {
        lock (gate)
        {
            if (contender.Margin < LeastMargin || contender.Rms > MostRms)
                return;
            bestMargin = Math.Max(bestMargin, contender.Margin);
            bestRms = Math.Min(bestRms, contender.Rms);
            Contenders.RemoveAll(c => c.Margin < LeastMargin || c.Rms > MostRms);
            Contenders.Add(contender);
        }
    }
}
