using BandSpec.Core.Requirements;
using CsCheck;

namespace BandSpec.Tests.Planning;

/// <summary>Random platforms, stations and requirements with few candidate plans.</summary>
internal static class RandomApplications
{
    /// <summary>An application with a handful of candidates; every third one has ties, its raw error and its profile being symmetric.</summary>
    public static Gen<Application> Small { get; } =
        from seed in Gen.Int[0, int.MaxValue]
        select Make(new Random(seed));

    private static Application Make(Random random)
    {
        double Between(double a, double b) => a + ((b - a) * random.NextDouble());
        bool symmetric = random.Next(3) == 0;
        Platform platform = Given.Platform with
        {
            RawError =
            [
                .. Given.Platform.RawError.Select(c => c with
                {
                    Mean = symmetric ? 0 : c.Mean * Between(-1, 2),
                    Sigma = symmetric && c.Name.Degree % 2 == 1 ? 0 : c.Sigma * Between(0, 2),
                    LotSigma = symmetric && c.Name.Degree % 2 == 1 ? 0 : c.LotSigma * Between(0, 2),
                }),
            ],
            Correlations = symmetric ? [] : [new CoefficientCorrelation(new(PressureShape.Zero, 1), new(PressureShape.Span, 1), Between(-0.9, 0.9))],
            Temperature = Given.Platform.Temperature with { Reference = Given.C(symmetric ? 65 : 25) },
            ZeroDegree = random.Next(1, 5),
            SpanDegree = random.Next(1, 4),
            Ageing = Given.Platform.Ageing with { Zero = Given.Spread(Between(-0.1, 0.1), 0.02), ActivationEnergy = symmetric ? 0 : 0.6 },
        };
        Station station = Given.Station with
        {
            ReadingNoise = Given.P(Between(0.001, 0.1)),
            SoakGradient = Given.K(symmetric ? 0 : Between(0, 0.5)),
            PressurePoints = random.Next(3) switch
            {
                0 => new PressureLists([0, 0.5, 1], [0, 1]),
                1 => new PressureLists([0, 0.3, 0.7, 1], [0, 0.5, 1]),
                _ => new PressureLists([0.1, 0.9], [0.1, 0.9]),
            },
        };
        return Given.Application(RequirementOf(random, symmetric), platform, station);
    }

    private static Requirement RequirementOf(Random random, bool symmetric) => Given.Requirement with
    {
        SafetyFactor = 1 + (2.5 * random.NextDouble()),
        HeldTerms = [],
        Temperature = Given.Requirement.Temperature with { Reference = Given.C(symmetric ? 65 : 25) },
        AllowedError = symmetric
            ? [new AllowedErrorRegion(Given.C(-20), Given.C(150), Given.P(1.5), null, 0)]
            : Given.Requirement.AllowedError,
        Profile = symmetric ? [new DwellBin(Given.C(-20), Given.C(150), Core.Quantities.Duration.FromHours(20000))] : Given.Requirement.Profile,
        Compensation = Given.Requirement.Compensation with
        {
            CandidateStep = Given.K(random.Next(2) == 0 ? 20 : 25),
            FewestTemperatures = 2,
            MostTemperatures = random.Next(2, 5),
            Reach = Given.K(random.Next(3) * 20),
            Objective = (PlanObjective)random.Next(3),
        },
    };
}
