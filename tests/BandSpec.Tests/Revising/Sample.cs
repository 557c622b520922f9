namespace BandSpec.Tests.Revising;

/// <summary>The input files of a small application that a plan fits, and whose search takes milliseconds.</summary>
internal static class Sample
{
    public static IReadOnlyList<(string Name, string Text)> Files { get; } =
        [(Workshop.Brine, Requirement), (Workshop.Platform, Platform), (Workshop.Station, Station)];

    private const string Requirement = """
        specification:
          number: HV-3107
          revision: A
          title: Brine reinjection line
          customer: Holmvik Geothermal
          prepared-by: Application engineering
          date: 2026-11-24
          changes:
            - { revision: A, date: 2026-11-24, text: First issue }
        platform: platforms/cell.yaml
        station: stations/line.yaml
        pressure: { lower: 0 bar, upper: 25 bar, reference: gauge }
        output: { signal: ratiometric-voltage, at-lower: 0.5 V, at-upper: 4.5 V, supply: 5 V, resolution: 12 bit }
        temperature:
          lower: -20 °C
          upper: 120 °C
          reference: 25 °C
          profile:
            - { from: -20 °C, to: 60 °C, dwell: 7500 h }
            - { from: 60 °C, to: 120 °C, dwell: 12000 h }
        allowed-error:
          - { from: -20 °C, to: 50 °C, limit: 2.4 %FS }
          - { from: 50 °C, to: 120 °C, limit: 2.0 %FS }
        safety-factor: 1.1
        capability: { sample: 1.67, long-run: 1.33 }
        compensation: { candidate-step: 35 K, temperatures: 4, separation: 15 K, objective: least-cost }
        test: { guard-band: 1.0, temperatures: auto }
        rounding: { band: 0.05 %FS, limit: 0.01 %FS }

        """;

    private const string Platform = """
        platform: { name: SK-40 welded steel cell, revision: 4 }
        temperature: { lower: -45 °C, upper: 165 °C, reference: 25 °C }
        pressure: { smallest-span: 4 bar, largest-upper: 40 bar, proof-factor: 2, burst-factor: 5 }
        raw-error:
          zero:
            - { degree: 0, mean: 0.0, sigma: 2.5, lot-sigma: 0.6 }
            - { degree: 1, mean: 0.9, sigma: 1.4, lot-sigma: 0.3 }
            - { degree: 2, mean: 0.55, sigma: 0.12, lot-sigma: 0.02 }
          span:
            - { degree: 0, mean: 0.0, sigma: 4.0, lot-sigma: 1.0 }
            - { degree: 1, mean: -6.5, sigma: 0.9, lot-sigma: 0.3 }
            - { degree: 2, mean: 1.6, sigma: 0.15, lot-sigma: 0.03 }
          bow:
            - { degree: 0, mean: 0.08, sigma: 0.03, lot-sigma: 0.01 }
        correction: { zero-degree: 3, span-degree: 3 }
        pressure-hysteresis: { mean: 0.05 %FS, sigma: 0.012 %FS }
        thermal-hysteresis: { mean: 0.04 %FS, sigma: 0.015 %FS }
        repeatability: 0.012 %FS
        ageing:
          zero: { mean: 0.02 %FS, sigma: 0.018 %FS }
          span: { mean: -0.015 %FS, sigma: 0.012 %FS }
          test: { temperature: 125 °C, duration: 1000 h }
          activation-energy: 0.6 eV
          time-exponent: 0.5

        """;

    private const string Station = """
        station: { name: Chamber line 2 }
        pressure-standard: { zero: 0.004 %FS, proportional: 0.010 %FS }
        reading-noise: 0.015 %FS
        readings-averaged: 4
        soak-gradient: 0.25 K
        pressure-points: { reference: [0, 0.5, 1], others: [0, 1] }
        test-points: { reference: [0, 0.5, 1], others: [0, 1] }
        chamber: { ambient: 23 °C, heating: 3 K/min, cooling: 2 K/min, soak: 35 min, pressure-point: 1.5 min, batch: 48, rate: 95 EUR/h }
        reject-cost: 22 EUR

        """;
}
