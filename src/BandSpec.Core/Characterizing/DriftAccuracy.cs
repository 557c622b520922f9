using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Characterizing;

/// <summary>How accurate the drift figures are, now and with a further test: the inverse of the expected information.</summary>
internal sealed class DriftAccuracy
{
    private readonly DriftInformation information;
    private readonly Grid now = new(DriftInformation.Size, DriftInformation.Size);
    private readonly int[] kept;

    public DriftAccuracy(DriftInformation information, DriftSupport support, IReadOnlyList<StoredUnit> units)
    {
        this.information = information;
        foreach (StoredUnit unit in units)
            Products.AddTo(now, 1, information.Of([.. unit.Readings.Select(r => new DriftCondition(r.Storage, r.Stored, r.PressureFraction))]));
        kept =
        [
            .. support.Free.Contains(DriftFigure.Energy) ? new[] { 0 } : [],
            .. support.Free.Contains(DriftFigure.Exponent) ? new[] { 1 } : [],
            .. Enumerable.Range(2, DriftInformation.Size - 2),
        ];
    }

    /// <summary>Standard errors with the readings at hand.</summary>
    public DriftErrors Now() => Errors(now);

    /// <summary>Standard errors with a planned test besides.</summary>
    public DriftErrors With(PlannedAgeingTest planned)
    {
        Grid then = now.Copy();
        Products.AddTo(then, planned.Units, information.Of(
            [.. from stored in planned.Times.Prepend(Duration.FromHours(0))
                from x in planned.PressureFractions
                select new DriftCondition(planned.Storage, stored, x)]));
        return Errors(then);
    }

    /// <summary>Covariance of activation energy and time exponent; rows and columns of what was assumed are zero.</summary>
    public Grid FigureCovariance()
    {
        Grid whole = Covariance(now), part = new(2, 2);
        for (int a = 0; a < 2; a++)
            for (int b = 0; b < 2; b++)
                part[a, b] = whole[a, b];
        return part;
    }

    private DriftErrors Errors(Grid sum)
    {
        Grid covariance = Covariance(sum);
        double Error(int a) => Math.Sqrt(covariance[a, a]);
        return new DriftErrors(
            Error(0), Error(1), Error(2), Error(3),
            information.SigmaError(covariance[4, 4]).Zero, information.SigmaError(covariance[5, 5]).Span);
    }

    /// <summary>The inverse over the figures that are free, scaled first: the figures differ by powers of ten.</summary>
    private Grid Covariance(Grid sum)
    {
        Grid scaled = new(kept.Length, kept.Length);
        for (int a = 0; a < kept.Length; a++)
            for (int b = 0; b < kept.Length; b++)
                scaled[a, b] = sum[kept[a], kept[b]] / Math.Sqrt(sum[kept[a], kept[a]] * sum[kept[b], kept[b]]);
        Grid inverse = Cholesky.Inverse(Cholesky.Factor(scaled));
        Grid covariance = new(DriftInformation.Size, DriftInformation.Size);
        for (int a = 0; a < kept.Length; a++)
            for (int b = 0; b < kept.Length; b++)
                covariance[kept[a], kept[b]] = inverse[a, b] / Math.Sqrt(sum[kept[a], kept[a]] * sum[kept[b], kept[b]]);
        return covariance;
    }
}
