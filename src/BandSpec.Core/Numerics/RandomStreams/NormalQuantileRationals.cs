namespace BandSpec.Core.Numerics.RandomStreams;

/// <summary>The three rational functions of PPND16, algorithm AS 241 (Wichura, Applied Statistics 37, 1988), relative error about 1e-16.</summary>
internal static class NormalQuantileRationals
{
    private static readonly double[] CentralAbove =
    [
        2509.0809287301226727, 33430.575583588128105, 67265.770927008700853, 45921.953931549871457,
        13731.693765509461125, 1971.5909503065514427, 133.14166789178437745, 3.3871328727963666080,
    ];

    private static readonly double[] CentralBelow =
    [
        5226.4952788528545610, 28729.085735721942674, 39307.895800092710610, 21213.794301586595867,
        5394.1960214247511077, 687.18700749205790830, 42.313330701600911252, 1.0,
    ];

    private static readonly double[] MiddleAbove =
    [
        7.74545014278341407640e-4, 0.0227238449892691845833, 0.241780725177450611770, 1.27045825245236838258,
        3.64784832476320460504, 5.76949722146069140550, 4.63033784615654529590, 1.42343711074968357734,
    ];

    private static readonly double[] MiddleBelow =
    [
        1.05075007164441684324e-9, 5.47593808499534494600e-4, 0.0151986665636164571966, 0.148103976427480074590,
        0.689767334985100004550, 1.67638483018380384940, 2.05319162663775882187, 1.0,
    ];

    private static readonly double[] FarAbove =
    [
        2.01033439929228813265e-7, 2.71155556874348757815e-5, 0.00124266094738807843860, 0.0265321895265761230930,
        0.296560571828504891230, 1.78482653991729133580, 5.46378491116411436990, 6.65790464350110377720,
    ];

    private static readonly double[] FarBelow =
    [
        2.04426310338993978564e-15, 1.42151175831644588870e-7, 1.84631831751005468180e-5, 7.86869131145613259100e-4,
        0.0148753612908506148525, 0.136929880922735805310, 0.599832206555887937690, 1.0,
    ];

    /// <summary>The factor of <c>q = p − ½</c> for <c>|q| ≤ 0.425</c>, at <c>r = 0.180625 − q²</c>.</summary>
    public static double Central(double r) => Polynomial(CentralAbove, r) / Polynomial(CentralBelow, r);

    /// <summary>The quantile for tails down to e⁻²⁵, at <c>√(−ln tail) − 1.6</c>.</summary>
    public static double Middle(double r) => Polynomial(MiddleAbove, r) / Polynomial(MiddleBelow, r);

    /// <summary>The quantile for smaller tails, at <c>√(−ln tail) − 5</c>.</summary>
    public static double Far(double r) => Polynomial(FarAbove, r) / Polynomial(FarBelow, r);

    private static double Polynomial(double[] coefficients, double r)
    {
        double sum = 0;
        foreach (double coefficient in coefficients)
            sum = (sum * r) + coefficient;
        return sum;
    }
}
