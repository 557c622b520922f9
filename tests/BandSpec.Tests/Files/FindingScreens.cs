using BandSpec.Cli.Printing;
using BandSpec.Files.Inputs;
using Snapshooter.Xunit3;
using Xunit;

namespace BandSpec.Tests.Files;

/// <summary>
/// The whole screen of every rule, approved by reading it: a demo file with one thing made wrong, and what the user then sees. The approved
/// screens are in __snapshots__; read the difference before taking over a changed one.
/// </summary>
public sealed class FindingScreens
{
    private const string Limits = "{ from: -20 °C, to: 40 °C, limit: 1.6 %FS }";
    private const string Held = "held-terms: { pressure-hysteresis: 0.15 %FS }";
    private const string Output = "{ signal: ratiometric-voltage, at-lower: 0.5 V, at-upper: 4.5 V, supply: 5 V, resolution: 12 bit }";
    private const string Scope = "{ candidate-step: 5 K, temperatures: 3..6, separation: 15 K, reach: 15 K, objective: least-cost }";
    private const string Correlation = "    - { between: [zero.1, span.1], value: 0.35 }";

    [Fact]
    public void Texts_and_numbers() => Approve(
        ("title: Brine reinjection line, wellhead skid", "titel: Brine reinjection line"),
        ("safety-factor: 1.15", "safety-faktor: 1.15"),
        ("safety-factor: 1.15", "safety-factor: 1,15"),
        ("safety-factor: 1.15", "safety-factor: NaN"),
        ("safety-factor: 1.15", "safety-factor: -.inf"),
        ("safety-factor: 1.15", "safety-factor: 1e308"),
        ("safety-factor: 1.15", "safety-factor: \"1.15\""),
        ("safety-factor: 1.15", "safety-factor: \u22121.15"),
        ("safety-factor: 1.15", "safety-factor: [1.15]"),
        ("safety-factor: 1.15", "safety-factor:"),
        ("safety-factor: 1.15", "safety-factor: { value: 1 }"),
        ("safety-factor: 1.15\n", ""),
        ("customer: Holmvik Geothermal", "customer: \"\""),
        ("date: 2026-11-24\n  changes", "date: 24.11.2026\n  changes"),
        ("readings-averaged: 4", "readings-averaged: 4.5"),
        ("reject-cost: 22 EUR", "reject-cost: 22 Euro"),
        ("temperatures: 3..6", "temperatures: 3-6"));

    [Fact]
    public void Quantities_and_units() => Approve(
        ("lower: 0 bar", "lower: 0"),
        ("upper: 25 bar", "upper: 25 Bar"),
        ("upper: 25 bar", "upper: 25 °C"),
        ("upper: 25 bar", "upper: 2,5 bar"),
        ("upper: 25 bar", "upper: 1_000 kPa"),
        ("upper: 25 bar", "upper: nan bar"),
        ("upper: 25 bar", "upper: bar"),
        ("upper: 25 bar", "upper: twenty bar"),
        ("ambient: 23 °C", "ambient: -300 °C"),
        ("ambient: 23 °C", "ambient: 23 C"),
        ("soak-gradient: 0.25 K", "soak-gradient: 0.25 °C"),
        ("dwell: 1500 h", "dwell: -1500 h"),
        ("dwell: 1500 h", "dwell: 1500 hours"),
        ("heating: 3 K/min", "heating: 3 K/s"),
        ("activation-energy: 0.6 eV", "activation-energy: 58 kJ/mol"),
        ("limit: 1.6 %FS", "limit: 1.6 %"),
        ("reference: gauge", "reference: guage"),
        ("resolution: 12 bit", "resolution: 12 bits"));

    [Fact]
    public void Shape_of_the_file() => Approve(
        ("  number: HV-3107", "  number: HV-3107\n  number: HV-3108"),
        ("safety-factor: 1.15", "safety-factor: &s 1.15"),
        ("safety-factor: 1.15", "safety-factor: *s"),
        ("safety-factor: 1.15", "safety-factor: !!float 1.15"),
        ("safety-factor: 1.15", "safety-factor: 1.15\n---\nsecond: document"),
        ("safety-factor: 1.15", "safety-factor: 1.15\n? [a, b]\n: 3"),
        ("safety-factor: 1.15", "safety-factor: [[[[[[[[[[[[[[[[1]]]]]]]]]]]]]]]]"),
        ("safety-factor: 1.15", "safety-factor: 1.15\n\tcapability: 3"),
        ("safety-factor: 1.15", "safety-factor: 1.15]"),
        ("safety-factor: 1.15", "safety-factor: [1.15"),
        ("safety-factor: 1.15", "safety-factor: 1.15\u0007"),
        ("safety-factor: 1.15", "safety-factor: 1.15 # \u202Eover"),
        ("allowed-error:\n", "allowed-error: []\nallowed:\n"));

    [Fact]
    public void Identity() => Approve(
        ("number: HV-3107", "number: ../../x"),
        ("number: HV-3107", "number: CON"),
        ("number: HV-3107", $"number: {new string('x', 300)}"),
        ("number: HV-3107", "number: HV 3107"),
        ("  revision: A\n", "  revision: B\n"),
        ("date: 2026-11-24, text", "date: 2026-12-24, text"),
        ("    - { revision: A, date: 2026-11-24, text: First issue }", "    - { revision: A, date: 2026-11-24, text: First issue }\n    - { revision: A, date: 2026-11-23, text: Again }"),
        ("date: 2026-11-24\n  changes", "date: 1926-11-24\n  changes"),
        ("customer: Holmvik Geothermal", $"customer: {new string('x', 201)}"),
        ("customer: Holmvik Geothermal", "customer: \"Holmvik\\nGeothermal\""));

    [Fact]
    public void Pressure_and_output() => Approve(
        ("upper: 25 bar", "upper: -25 bar"),
        ("upper: 25 bar", "upper: 1e-9 bar"),
        ("upper: 25 bar", "upper: 1e9 bar"),
        ("lower: 0 bar", "lower: -1.2 bar"),
        ("lower: 0 bar, upper: 25 bar, reference: gauge", "lower: -0.5 bar, upper: 25 bar, reference: absolute"),
        (Output, "{ signal: ratiometric-voltage, at-lower: 0.5 V, at-upper: 4.5 V }"),
        (Output, "{ signal: voltage, at-lower: 0.5 V, at-upper: 4.5 V, supply: 5 V }"),
        (Output, "{ signal: voltage, at-lower: 4 mA, at-upper: 20 mA }"),
        (Output, "{ signal: current, at-lower: 4 mA, at-upper: 20 mA, resolution: 1 mV }"),
        (Output, "{ signal: code, at-lower: 0 code, at-upper: 4095 code, resolution: 12 bit }"),
        (Output, "{ signal: current, at-lower: 4 mA, at-upper: 20 mA, full-code: 4096 code }"),
        (Output, "{ signal: voltage, at-lower: 1 V, at-upper: 1 V }"),
        ("at-upper: 4.5 V", "at-upper: 5.5 V"),
        ("supply: 5 V", "supply: 0 V"),
        ("resolution: 12 bit", "resolution: 3 bit"),
        ("resolution: 12 bit", "resolution: 500 mV"));

    [Fact]
    public void Temperatures_and_profile() => Approve(
        ("upper: 150 °C\n  reference: 25 °C", "upper: -150 °C\n  reference: 25 °C"),
        ("upper: 150 °C\n  reference: 25 °C", "upper: 150 °C\n  reference: 155 °C"),
        ("to: 10 °C, dwell", "to: 12 °C, dwell"),
        ("to: 10 °C, dwell", "to: -21 °C, dwell"),
        ("{ from: 115 °C, to: 150 °C, dwell", "{ from: 115 °C, to: 160 °C, dwell"),
        ("dwell: 1500 h", "dwell: 0 h"),
        ("dwell: 1500 h", "dwell: 5 %"),
        ("dwell: 1500 h", "dwell: 101 y"),
        ("  profile:", "  service-life: 10 y\n  profile:"));

    [Fact]
    public void Dwells_in_percent()
    {
        (string, string)[] percent =
            [("dwell: 1500 h", "dwell: 10 %"), ("dwell: 6000 h", "dwell: 20 %"), ("dwell: 22000 h", "dwell: 60 %"), ("dwell: 3500 h", "dwell: 11 %")];
        Snapshot.Match(Screen(percent) + "\n" + Screen([.. percent, ("  profile:", "  service-life: 10 y\n  profile:")]));
    }

    [Fact]
    public void Allowed_errors() => Approve(
        (Limits, "{ from: -20 °C, to: 35 °C, limit: 1.6 %FS }"),
        (Limits, "{ from: -20 °C, to: 45 °C, limit: 1.6 %FS }"),
        (Limits, "{ from: -10 °C, to: 40 °C, limit: 1.6 %FS }"),
        (Limits, "{ from: -30 °C, to: 40 °C, limit: 1.6 %FS }"),
        (Limits, "{ from: 40 °C, to: -20 °C, limit: 1.6 %FS }"),
        ("to: 150 °C, limit", "to: 145 °C, limit"),
        ("to: 150 °C, limit", "to: 155 °C, limit"),
        (Limits, "{ from: -20 °C, to: 40 °C, limit: 0 %FS }"),
        (Limits, "{ from: -20 °C, to: 40 °C, limit: 1.6 %FS, limit-at-end: 60 %FS }"),
        (Limits, "{ from: -20 °C, to: 40 °C, limit: 1.6 %FS, of-reading: 51 % }"));

    [Fact]
    public void Terms() => Approve(
        (Held, "held-terms: { presure-hysteresis: 0.15 %FS }"),
        (Held, "held-terms: { weather: 0.15 %FS }"),
        (Held, "held-terms: { resolution: 0.15 %FS }"),
        (Held, "held-terms: { pressure-hysteresis: 0.04 %FS }"),
        (Held, "held-terms: { Supply ripple: 0.02 %FS }"),
        (Held, "held-terms: { ageing: 0.02 %FS }"),
        (Held, "held-terms: { pressure-hysteresis: -1 %FS }"),
        ("name: Supply ripple", "name: Ageing"),
        ("bound: 0.02 %FS", "bound: -0.02 %FS"),
        ("bound: 0.02 %FS, sigma: 0.01 %FS", "bound: 0 %FS, sigma: 0 %FS"),
        ("shape: constant }", "shape: constant }\n  - { name: supply ripple, bound: 0.02 %FS, sigma: 0.01 %FS, shape: constant }"),
        ("shape: constant", "shape: linear"));

    [Fact]
    public void Compensation_test_and_rounding() => Approve(
        (Scope, Scope.Replace("3..6", "6..3")),
        (Scope, Scope.Replace("3..6", "1..12")),
        (Scope, Scope.Replace("separation: 15 K", "separation: 90 K")),
        (Scope, Scope.Replace("reach: 15 K", "reach: -1 K")),
        (Scope, Scope.Replace("candidate-step: 5 K", "candidate-step: 0 K")),
        (Scope, Scope.Replace("candidate-step: 5 K", "candidate-step: 0.5 K").Replace("15 K, reach", "1 K, reach")),
        (Scope, Scope.Replace("least-cost", "cheapest")),
        ("sample: 1.67", "sample: 5"),
        ("guard-band: 1.0", "guard-band: 4"),
        ("temperatures: auto", "temperatures: [25 °C, 150 °C, 160 °C]"),
        ("temperatures: auto", "temperatures: [25 °C, 25 °C]"),
        ("temperatures: auto", "temperatures: automatic"),
        ("limit: 0.01 %FS }", "limit: 0.9 %FS }"),
        ("band: 0.05 %FS", "band: 0 %FS"));

    [Fact]
    public void Decision_rules() => Approve(
        ("guard-band: 1.0", "decision-rule: guarded"),
        ("guard-band: 1.0", "decision-rule: simple, guard-band: 1"),
        ("guard-band: 1.0", "decision-rule: global"),
        ("guard-band: 1.0", "decision-rule: specific-risk"),
        ("guard-band: 1.0", "decision-rule: specific-risk, risk: 0.6"),
        ("guard-band: 1.0", "decision-rule: global-risk, risk: 0"),
        ("guard-band: 1.0", "decision-rule: global-risk, risk: 2 %"),
        ("guard-band: 1.0", "guard-band: 1, risk: 0.025"),
        ("guard-band: 1.0", "guard-band: 1.0, promise: each-unit"),
        ("guard-band: 1.0, ", ""));

    [Fact]
    public void Platform() => Approve(
        ("zero:\n    - { degree: 0, mean: 0.0", "zero:\n    - { degree: 1, mean: 0.0"),
        ("- { degree: 4, mean: 0.05, sigma: 0.03 }", "- { degree: 9, mean: 0.05, sigma: 0.03 }"),
        ("- { degree: 4, mean: 0.05, sigma: 0.03 }", "- { degree: 4, mean: 0.05, sigma: -0.03 }"),
        (Correlation, "    - { between: [zero.1, span.1], value: 1.35 }"),
        (Correlation, "    - { between: [zero.1, span.7], value: 0.35 }"),
        (Correlation, "    - { between: [zero.1, tilt.1], value: 0.35 }"),
        (Correlation, "    - { between: [zero.1, zero.1], value: 0.35 }"),
        (Correlation, Correlation + "\n    - { between: [span.1, zero.1], value: 0.3 }"),
        (Correlation, Correlation.Replace("0.35", "0.9") + "\n    - { between: [zero.2, span.1], value: 0.9 }\n    - { between: [zero.1, zero.2], value: -0.9 }"),
        ("span-degree: 3", "span-degree: 0"),
        ("burst-factor: 5", "burst-factor: 1.5"),
        ("smallest-span: 4 bar", "smallest-span: 0 bar"),
        ("test: { temperature: 125 °C, duration: 1000 h }", "test: { temperature: 125 °C, duration: 0 h }"),
        ("thermal-hysteresis: { mean: 0.04 %FS", "thermal-hysteresis: { mean: -0.04 %FS"));

    [Fact]
    public void Station() => Approve(
        ("pressure-points: { reference: [0, 0.5, 1], others: [0, 1] }", "pressure-points: { reference: [0, 0.5, 1], others: [1, 0] }"),
        ("pressure-points: { reference: [0, 0.5, 1], others: [0, 1] }", "pressure-points: { reference: [0, 0.5, 1], others: [0] }"),
        ("others: [0, 1] }\nchamber", "others: [0, 1.1] }\nchamber"),
        ("batch: 48", "batch: 0"),
        ("heating: 3 K/min", "heating: 0 K/min"),
        ("reject-cost: 22 EUR", "reject-cost: 22 USD"));

    [Fact]
    public void How_the_three_fit() => Approve(
        ("upper: 165 °C", "upper: 145 °C"),
        ("temperature: { lower: -45 °C", "temperature: { lower: -15 °C"),
        ("smallest-span: 4 bar", "smallest-span: 40 bar"),
        ("largest-upper: 40 bar", "largest-upper: 20 bar"),
        ("test: { temperature: 125 °C, duration: 1000 h }", "test: { temperature: 20 °C, duration: 100 h }"),
        ("reading-noise: 0.015 %FS", "reading-noise: 1.5 %FS"),
        ("pressure-points: { reference: [0, 0.5, 1], others: [0, 1] }", "pressure-points: { reference: [0, 0.5, 1], others: [0] }"),
        ("station: stations/chamber-line-2.yaml", "station: stations/chamber-line-3.yaml"),
        ("platform: platforms/steel-cell-40.yaml\nstation", "platform: [a, b]\nstation"));

    [Fact]
    public void Everything_is_found_in_one_go() => Snapshot.Match(Screen(
        ("title: Brine reinjection line, wellhead skid", "titel: Brine reinjection line"), ("upper: 25 bar", "upper: 25 Bar"),
        ("dwell: 1500 h", "dwell: 0 h"), (Limits, "{ from: -20 °C, to: 35 °C, limit: 1.6 %FS }"), ("span-degree: 3", "span-degree: 0"),
        ("reject-cost: 22 EUR", "reject-cost: 22 USD"), ("heating: 3 K/min", "heating: 3")));

    private static void Approve(params (string Old, string New)[] faults) =>
        Snapshot.Match(string.Join("\n", faults.Select(fault => Screen(fault))), options => options);

    private static string Screen(params (string Old, string New)[] faults)
    {
        InputSet set = Demo.With(faults);
        Assert.Null(set.Application);
        return FindingScreen.Of(set.Findings, Ink.None);
    }
}
