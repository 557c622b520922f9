using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Revisions;

/// <summary>
/// The points of the verification test as figures. A point is told by where it is, not by its name: temperature, fraction of the span,
/// direction. So a limit is compared with that of the same place although points were put before it.
/// </summary>
internal sealed class VerificationFigures(Specification specification)
{
    private readonly FigureList list = new(FigureSubject.Verification);

    /// <summary>All figures in the order of the test.</summary>
    public IReadOnlyList<Figure> All()
    {
        foreach (VerificationPoint point in specification.VerificationPoints)
            ListPoint(point, PointChange.PlaceOf(point));
        return list.All;
    }

    /// <summary>
    /// Production is told by what is accepted: how far each limit is from the nominal output, in %FS. The customer is told by the tolerance:
    /// what a good unit may show. A guard band moves the first alone.
    /// </summary>
    private void ListPoint(VerificationPoint point, string place)
    {
        OutputSignal output = specification.Application.Requirement.Output;
        list.Text("pressure", point.Pressure.ToString(), place);
        list.Number("nominal", point.Nominal, output.Unit, Leeway.None, place);
        list.Number(LowerLimit, point.Lower, output.Unit, l => RoomBetween(l, point.Nominal), place);
        list.Number(UpperLimit, point.Upper, output.Unit, u => RoomBetween(point.Nominal, u), place);
        list.Error(Tolerance, point.Tolerance, Leeway.ForCustomer, place);
        list.Error("guard band", point.GuardBand, Leeway.LessForProduction, place);
        list.Error("uncertainty", point.Uncertainty, Leeway.LessForProduction, place);
        list.Number("consumer's risk", point.ConsumerRisk, "", Leeway.ForCustomer, place);
        list.Number("producer's risk", point.ProducerRisk, "", Leeway.LessForProduction, place);

        Leeway RoomBetween(double low, double high) => Leeway.ForProduction(100 * (high - low) / Math.Abs(output.Span));
    }

    /// <summary>The name of the lower acceptance limit.</summary>
    public const string LowerLimit = "lower limit";

    /// <summary>The name of the upper acceptance limit.</summary>
    public const string UpperLimit = "upper limit";

    /// <summary>The name of the tolerance.</summary>
    public const string Tolerance = "tolerance";
}
