using BandSpec.Core.Requirements;
using BandSpec.Core.Revisions;
using BandSpec.Core.Specifying;
using CsCheck;
using Xunit;

namespace BandSpec.Tests.Revisions;

/// <summary>What holds for the comparison of any two applications, drawn at random around the first demo.</summary>
public sealed class RandomRevisionsTests
{
    private static readonly Gen<Requirement> Requirements = Gen.Select(
        Gen.Double[1, 1.4], Gen.Double[0.9, 3], Gen.Double[0.6, 3], Gen.Int[-15, 100], Gen.Double[0, 1.5], Gen.Bool, Gen.Bool,
        (safety, cold, hot, edge, guard, isCurrent, isFine) => Drafted.Requirement with
        {
            SafetyFactor = safety,
            AllowedError = [new(Given.C(-20), Given.C(edge), Given.P(cold), null, 0), new(Given.C(edge), Given.C(150), Given.P(cold), Given.P(hot), 0)],
            Test = new VerificationRules(guard, null),
            Output = isCurrent ? new OutputSignal(SignalKind.Current, "mA", 4, 20, null, null, null) : Drafted.Requirement.Output,
            Rounding = Drafted.Requirement.Rounding with { Band = Given.P(isFine ? 0.01 : 0.05) },
        });

    private static readonly double[][] PressureLines = [[0, 1], [0, 0.5, 1], [0, 0.25, 0.5, 0.75, 1]];

    private static readonly Gen<Specification> Applications = Gen.Select(
        Requirements, Gen.Double[0.3, 1], Gen.Int[0, 2], Gen.Double[0.001, 0.03],
        (requirement, energy, lines, standard) => Drafted.Of(
            requirement, Given.Platform with { Ageing = Given.Platform.Ageing with { ActivationEnergy = energy } },
            Given.Station with { TestPoints = new PressureLists(PressureLines[lines], [0, 1]), StandardZero = Given.P(standard) }));

    [Fact]
    public void Nothing_differs_from_itself() => Applications.Sample(
        one => Comparison.Of(one, one) is { IsEmpty: true, LimitsDiffer: false, Points.Count: 0 }, iter: Rounds, print: Print);

    [Fact]
    public void The_other_way_round_tighter_is_looser() => Gen.Select(Applications, Applications).Sample(
        (a, b) =>
        {
            Comparison forth = Comparison.Of(a, b), back = Comparison.Of(b, a);
            return forth.LimitsDiffer == back.LimitsDiffer && AreMirrored(forth.Inputs, back.Inputs) && AreMirrored(forth.Outcome, back.Outcome)
                && forth.Points.Count == back.Points.Count
                && forth.Points.All(p => back.Points.Single(q => q.Place == p.Place) is var q
                    && (q.ForProduction, q.ForCustomer) == (Turned(p.ForProduction), Turned(p.ForCustomer)) && q.Shown == (p.Shown.New, p.Shown.Old));
        },
        iter: Rounds, print: pair => $"{Print(pair.Item1)} and {Print(pair.Item2)}");

    /// <summary>BANDSPEC_COMPARISONS makes the run a long one.</summary>
    private static long Rounds => long.TryParse(Environment.GetEnvironmentVariable("BANDSPEC_COMPARISONS"), out long rounds) ? rounds : 40;

    private static bool AreMirrored(IReadOnlyList<FigureChange> forth, IReadOnlyList<FigureChange> back) =>
        forth.Count == back.Count && forth.All(change => back.Single(b => (b.Subject, b.Name, b.Place) == (change.Subject, change.Name, change.Place)) is var mirrored
            && (mirrored.New, mirrored.Old) == (change.Old, change.New)
            && (mirrored.ForProduction, mirrored.ForCustomer) == (Turned(change.ForProduction), Turned(change.ForCustomer)));

    private static Bearing Turned(Bearing bearing) => bearing switch
    {
        Bearing.Tighter => Bearing.Looser,
        Bearing.Looser => Bearing.Tighter,
        _ => Bearing.Neutral,
    };

    private static string Print(Specification one) =>
        $"{one.Application.Requirement.SafetyFactor}, {string.Join("; ", one.Application.Requirement.AllowedError)}, {one.Application.Requirement.Test}";
}
