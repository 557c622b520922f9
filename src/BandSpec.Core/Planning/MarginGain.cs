using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>
/// What a small change of one input does to a plan's least margin over every pressure and temperature, the plan left as it is. As long as the
/// plan stays the best, this is also what it does to the best margin (envelope theorem).
/// </summary>
/// <param name="Key">The input, by its path in the files: <c>reading-noise</c>, <c>raw-error.zero.2.sigma</c>.</param>
/// <param name="Gain">Change of the margin for one step upward; negative when the margin falls.</param>
/// <param name="Step">The step.</param>
/// <param name="Unit">Its unit: <c>%FS</c>, <c>K</c>, <c>%</c> for dwell, empty for a plain number.</param>
public sealed record MarginGain(string Key, double Gain, double Step, string Unit)
{
    /// <summary>The difference is taken over this part of a step to either side; margins are smooth on that scale.</summary>
    private const double PartOfStep = 0.01;

    /// <summary>The gains of all inputs, in the order of the files; inputs that cannot move are left out.</summary>
    /// <param name="application">The application.</param>
    /// <param name="plan">The plan.</param>
    /// <param name="cancellation">Ends the work between two inputs.</param>
    /// <exception cref="OperationCanceledException">It was ended before all gains were there.</exception>
    public static IReadOnlyList<MarginGain> AllOf(Application application, CompensationPlan plan, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(application);
        ArgumentNullException.ThrowIfNull(plan);
        double now = MarginOf(application, plan);
        return [.. new MovableInputs(application).All().Select(i => Of(i, now, plan, cancellation)).OfType<MarginGain>()];
    }

    /// <summary>Half the difference to both sides; to one side where the input cannot go to the other.</summary>
    private static MarginGain? Of(MovableInput input, double now, CompensationPlan plan, CancellationToken cancellation)
    {
        cancellation.ThrowIfCancellationRequested();
        double move = PartOfStep * input.Step;
        (Application? more, Application? less) = (input.Moved(move), input.Moved(-move));
        if (more is null && less is null)
            return null;
        double above = more is null ? now : MarginOf(more, plan), below = less is null ? now : MarginOf(less, plan);
        int sides = (more is null ? 0 : 1) + (less is null ? 0 : 1);
        return new MarginGain(input.Key, (above - below) / sides / PartOfStep, input.Step, input.Unit);
    }

    private static double MarginOf(Application application, CompensationPlan plan) => ContinuousMargin.AllOf(application, plan).Min(r => r.Margin);
}

/// <summary>An input that can be moved a little.</summary>
/// <param name="Key">Its path in the files.</param>
/// <param name="Step">The step that gains are given for.</param>
/// <param name="Unit">The unit of the step.</param>
/// <param name="Moved">The application with the input moved by an amount; nothing when that is not allowed.</param>
internal sealed record MovableInput(string Key, double Step, string Unit, Func<double, Application?> Moved);
