namespace BandSpec.Core.LotJudging;

/// <summary>What became of one unit.</summary>
public enum UnitVerdict
{
    /// <summary>Every point was read and passes, and so does every derived figure.</summary>
    Pass,

    /// <summary>A reading or a derived figure lies beyond its limit.</summary>
    Fail,

    /// <summary>Nothing is beyond a limit, but a point was not read.</summary>
    Incomplete,
}

/// <summary>One unit of the lot.</summary>
/// <param name="Serial">Its serial number.</param>
/// <param name="Verdict">What became of it.</param>
/// <param name="Reasons">Every point and derived figure beyond its limit, with the error in %FS, in the order of the test.</param>
/// <param name="Missing">Ids of the points that were not read.</param>
public sealed record UnitJudgement(
    string Serial, UnitVerdict Verdict, IReadOnlyList<(string Name, double Error)> Reasons, IReadOnlyList<string> Missing);

/// <summary>Judges units one by one.</summary>
internal sealed class UnitJudging(LotLimits limits, UnitTable units, IReadOnlyList<DerivedFigure> derived)
{
    private readonly DerivedFigure[] figures = [.. derived];

    /// <summary>Only the verdict, for counting.</summary>
    public UnitVerdict VerdictOf(int unit)
    {
        ReadOnlySpan<float> errors = units.ErrorsOf(unit);
        bool missing = false;
        for (int point = 0; point < errors.Length; point++)
        {
            if (units.HasFailed(unit, point))
                return UnitVerdict.Fail;
            missing |= float.IsNaN(errors[point]);
        }

        foreach (DerivedFigure figure in figures)
            if (Math.Abs(figure.Of(errors)) > figure.Limit.Percent)
                return UnitVerdict.Fail;
        return missing ? UnitVerdict.Incomplete : UnitVerdict.Pass;
    }

    /// <summary>The verdict with its reasons.</summary>
    public UnitJudgement Judge(int unit)
    {
        UnitVerdict verdict = VerdictOf(unit);
        if (verdict == UnitVerdict.Pass)
            return new(units.SerialOf(unit), verdict, [], []);
        ReadOnlySpan<float> errors = units.ErrorsOf(unit);
        List<(string, double)> reasons = [];
        List<string> missing = [];
        for (int point = 0; point < errors.Length; point++)
        {
            if (units.HasFailed(unit, point))
                reasons.Add((limits.Points[point].Id, errors[point]));
            if (float.IsNaN(errors[point]))
                missing.Add(limits.Points[point].Id);
        }

        foreach (DerivedFigure figure in figures)
            if (figure.Of(errors) is var value && Math.Abs(value) > figure.Limit.Percent)
                reasons.Add(($"{figure.Name} at {figure.Place}", value));
        return new(units.SerialOf(unit), verdict, reasons, missing);
    }
}
