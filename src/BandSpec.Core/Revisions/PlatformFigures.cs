using BandSpec.Core.Requirements;

namespace BandSpec.Core.Revisions;

/// <summary>The fields of a platform as figures. More scatter is harder on production; a mean of either sign may help or hurt.</summary>
internal sealed class PlatformFigures(Platform platform)
{
    private readonly FigureList list = new(FigureSubject.Platform);

    /// <summary>All fields in the order of the file.</summary>
    public IReadOnlyList<Figure> All()
    {
        list.Text("platform.name", platform.Name);
        list.Text("platform.revision", platform.Revision);
        list.Temperature("temperature.lower", platform.Temperature.Lower, Leeway.None);
        list.Temperature("temperature.upper", platform.Temperature.Upper, Leeway.None);
        list.Temperature("temperature.reference", platform.Temperature.Reference, Leeway.None);
        ListPressure(platform.Pressure);
        ListRawError();
        list.Number("correction.zero-degree", platform.ZeroDegree, "", Leeway.ForProduction);
        list.Number("correction.span-degree", platform.SpanDegree, "", Leeway.ForProduction);
        ListSpread("pressure-hysteresis", platform.PressureHysteresis, Leeway.LessForProduction);
        ListSpread("thermal-hysteresis", platform.ThermalHysteresis, Leeway.LessForProduction);
        list.Error("repeatability", platform.Repeatability, Leeway.LessForProduction);
        ListAgeing(platform.Ageing);
        if (platform.Sample is { } sample)
            list.ListSample(sample);
        return list.All;
    }

    private void ListPressure(PressureRating rating)
    {
        list.Text("pressure.smallest-span", rating.SmallestSpan.ToString());
        list.Text("pressure.largest-upper", rating.LargestUpper.ToString());
        list.Number("pressure.proof-factor", rating.ProofFactor, "", Leeway.None);
        list.Number("pressure.burst-factor", rating.BurstFactor, "", Leeway.None);
    }

    private void ListRawError()
    {
        foreach (RawErrorCoefficient coefficient in platform.RawError)
        {
            string path = $"raw-error.{Words.Of(coefficient.Name)}";
            list.Number($"{path}.mean", coefficient.Mean, "%FS", Leeway.None);
            list.Number($"{path}.sigma", coefficient.Sigma, "%FS", Leeway.LessForProduction);
            list.Number($"{path}.lot-sigma", coefficient.LotSigma, "%FS", Leeway.LessForProduction);
        }

        foreach (CoefficientCorrelation correlation in platform.Correlations)
            list.Number(
                $"raw-error.correlations[{Words.Of(correlation.First)}, {Words.Of(correlation.Second)}]", correlation.Value, "", Leeway.None);
    }

    private void ListAgeing(Ageing ageing)
    {
        ListSpread("ageing.zero", ageing.Zero, Leeway.None);
        ListSpread("ageing.span", ageing.Span, Leeway.None);
        list.Temperature("ageing.test.temperature", ageing.TestTemperature, Leeway.None);
        list.Number("ageing.test.duration", ageing.TestDuration.Hours, "h", Leeway.None);
        list.Number("ageing.activation-energy", ageing.ActivationEnergy, "eV", Leeway.None);
        list.Number("ageing.time-exponent", ageing.TimeExponent, "", Leeway.None);
    }

    private void ListSpread(string path, Spread spread, Func<double, Leeway> ofMean)
    {
        list.Error($"{path}.mean", spread.Mean, ofMean);
        list.Error($"{path}.sigma", spread.Sigma, Leeway.LessForProduction);
    }
}
