using BandSpec.Documents.Charts;

namespace BandSpec.Documents.Judging;

/// <summary>A judgement as it is printed: every figure rounded once, words of closed lists as their keys.</summary>
/// <param name="Specification">Number and revision.</param>
/// <param name="Title">Its title; may be empty.</param>
/// <param name="Verdict"><c>proven</c>, <c>met</c> or <c>missed</c>.</param>
/// <param name="Sample">The criterion within a lot.</param>
/// <param name="LongRun">The criterion over lots.</param>
/// <param name="Units">Units counted.</param>
/// <param name="Readings">Readings taken.</param>
/// <param name="Lots">Lots by name; empty when no reading named one.</param>
/// <param name="Characteristics">Points in the order of the test, then derived figures.</param>
/// <param name="NotPassed">The first units that do not pass.</param>
/// <param name="Files">What was read.</param>
/// <param name="Faults">Lines that took no part, by kind.</param>
/// <param name="Sampled">Whether histograms and normality rest on a sample of the values.</param>
internal sealed record JudgementView(
    string Specification, string Title, string Verdict, DemandView Sample, DemandView LongRun, UnitCountView Units, string Readings, string Lots,
    IReadOnlyList<CharacteristicView> Characteristics, IReadOnlyList<UnitView> NotPassed, IReadOnlyList<ReadFileView> Files,
    IReadOnlyList<FaultView> Faults, bool Sampled);

/// <summary>A demand on all characteristics: its index, how the worst stands to it, and which one that is.</summary>
internal sealed record DemandView(string Demanded, string Standing, string Least, string LeastName, bool LeastIsDerived);

internal sealed record UnitCountView(string All, string Pass, string Fail, string Incomplete);

/// <summary>A characteristic; %FS. <c>Name</c> is a point's id or the key of a derived figure.</summary>
internal sealed record CharacteristicView(
    string Name, bool Derived, PlaceView Place, string Tolerance, string Count, string Mean, string Outside, string OutsideUpTo,
    CapabilityView? Within, CapabilityView? Overall, PercentileView? Percentiles, string Outliers, LotValues? Values);

/// <summary>Where a characteristic is taken; empty parts where they do not matter.</summary>
internal sealed record PlaceView(string Temperature, string Pressure, string Direction);

/// <summary>Capability within a lot or over lots and how it stands to its demand.</summary>
/// <param name="Deviation">Standard deviation.</param>
/// <param name="Spread">Cp or Pp, and its lower limit.</param>
/// <param name="SpreadLower">Lower limit.</param>
/// <param name="Nearer">Cpk or Ppk.</param>
/// <param name="NearerLower">Lower limit.</param>
/// <param name="Normal"><c>yes</c>, <c>no</c> or <c>unknown</c>.</param>
/// <param name="Standing"><c>proven</c>, <c>met</c>, <c>missed</c> or <c>refuted</c>.</param>
/// <param name="ByPercentiles">Whether percentiles decided.</param>
/// <param name="More">Units to add so that the demand is proven; empty when none are needed or no number would do.</param>
internal sealed record CapabilityView(
    string Deviation, string Spread, string SpreadLower, string Nearer, string NearerLower, string Normal, string Standing, bool ByPercentiles,
    string More);

/// <summary>Capability by percentiles; %FS for the three percentiles. Few when the extremes stand for the outer ones.</summary>
internal sealed record PercentileView(string Low, string Median, string High, string Spread, string Nearer, string NearerLower, bool Few);

internal sealed record UnitView(string Serial, string Verdict, string Reasons, string Missing);

internal sealed record ReadFileView(string Name, string Lines, string Layout);

internal sealed record FaultView(string Kind, string Count, string Places);
