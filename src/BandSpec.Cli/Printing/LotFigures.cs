using System.Globalization;
using BandSpec.Core.VirtualLots;

namespace BandSpec.Cli.Printing;

/// <summary>Shares and probabilities in words that fit their size.</summary>
internal static class LotFigures
{
    private static readonly CultureInfo Plain = CultureInfo.InvariantCulture;

    /// <summary>A large share in percent with its interval.</summary>
    public static string Share(Rate rate) => rate.Of == 0
        ? "    of no unit"
        : string.Create(Plain, $"{100 * rate.Value,11:0.00000} %   {100 * rate.Lower:0.00000} to {100 * rate.Upper:0.00000} %");

    /// <summary>A small share as count and parts per million with its interval.</summary>
    public static string Counted(Rate rate) => rate.Of == 0
        ? "    of no unit"
        : string.Create(Plain, $"{rate.Count,11:N0}   {Probability(rate.Value)}   {Probability(rate.Lower)} to {Probability(rate.Upper)}");

    /// <summary>A sampled probability with its interval.</summary>
    public static string Sampled(SampledProbability probability) => double.IsNaN(probability.Value)
        ? " nothing is accepted"
        : string.Create(
            Plain,
            $" {Probability(probability.Value)}   {Probability(probability.Lower)} to {Probability(probability.Upper)}, ±{100 * probability.RelativeError:0.0} % from {probability.Draws:N0} draws");

    /// <summary>A probability in ppm or ppb, below in powers of ten.</summary>
    public static string Probability(double value) => value switch
    {
        0 => "0",
        >= 0.01 => string.Create(Plain, $"{100 * value:G4} %"),
        >= 1e-7 => string.Create(Plain, $"{1e6 * value:G4} ppm"),
        >= 1e-11 => string.Create(Plain, $"{1e9 * value:G4} ppb"),
        _ => value.ToString("0.00e+0", Plain),
    };
}
