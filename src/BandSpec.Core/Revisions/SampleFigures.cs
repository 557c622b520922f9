using BandSpec.Core.Requirements;

namespace BandSpec.Core.Revisions;

/// <summary>What a platform's statistics rest on, as figures: the more was measured, the more production may rely on them.</summary>
internal static class SampleFigures
{
    /// <summary>Lists the fields of a sample.</summary>
    public static void ListSample(this FigureList list, PlatformSample sample)
    {
        list.Number("sample.units", sample.Units, "", Leeway.ForProduction);
        list.Number("sample.lots", sample.Lots, "", Leeway.ForProduction);
        list.Number("sample.readings", sample.Readings, "", Leeway.ForProduction);
        foreach (CoefficientAccuracy coefficient in sample.Coefficients)
        {
            string path = $"sample.coefficients[{Words.Of(coefficient.Name)}]";
            list.Number($"{path}.variance-error", coefficient.VarianceError, "", Leeway.LessForProduction);
            list.Number($"{path}.lot-variance-error", coefficient.LotVarianceError, "", Leeway.LessForProduction);
            list.Numbers($"{path}.mean-covariance", coefficient.MeanCovariance);
        }

        ListAccuracy(list, "sample.pressure-hysteresis", sample.PressureHysteresis);
        ListAccuracy(list, "sample.thermal-hysteresis", sample.ThermalHysteresis);
        list.Number("sample.repeatability-variance-error", sample.RepeatabilityVarianceError, "", Leeway.LessForProduction);
        if (sample.Ageing is { } ageing)
            ListAgeing(list, ageing);
    }

    private static void ListAgeing(FigureList list, AgeingAccuracy ageing)
    {
        list.Number("sample.ageing.units", ageing.Units, "", Leeway.ForProduction);
        ListAccuracy(list, "sample.ageing.zero", ageing.Zero);
        ListAccuracy(list, "sample.ageing.span", ageing.Span);
        list.Number("sample.ageing.activation-energy-error", ageing.ActivationEnergyError, "eV", Leeway.LessForProduction);
        list.Number("sample.ageing.time-exponent-error", ageing.TimeExponentError, "", Leeway.LessForProduction);
    }

    private static void ListAccuracy(FigureList list, string path, SpreadAccuracy? accuracy)
    {
        if (accuracy is null)
            return;
        list.Error($"{path}.mean-error", accuracy.MeanError, Leeway.LessForProduction);
        list.Number($"{path}.variance-error", accuracy.VarianceError, "", Leeway.LessForProduction);
    }
}
