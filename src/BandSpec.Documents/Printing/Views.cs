namespace BandSpec.Documents.Printing;

/// <summary>Number, title and people of the specification.</summary>
internal sealed record IdentityView(
    string Number, string Revision, string Title, string Customer, string PreparedBy, string Date, IReadOnlyList<ChangeView> Changes);

internal sealed record ChangeView(string Revision, string Date, string Text);

/// <summary>The calibrated range; the reference is <c>gauge</c>, <c>absolute</c>, <c>sealed-gauge</c> or <c>differential</c>.</summary>
internal sealed record RangeView(string Lower, string Upper, string Unit, string Reference, string Proof, string Burst);

/// <summary>
/// The output; the kind is <c>ratiometric-voltage</c>, <c>voltage</c>, <c>current</c> or <c>code</c>. Supply and resolution may be empty.
/// </summary>
internal sealed record SignalView(string Kind, string AtLower, string AtUpper, string Unit, string Supply, string Resolution);

/// <summary>Operating temperatures in °C.</summary>
internal sealed record TemperatureView(string Lower, string Upper, string Reference);

/// <summary>A bin of the profile: temperatures in °C, dwell in h, share of the service life in percent.</summary>
internal sealed record BinView(string From, string To, string Dwell, string Share);

/// <summary>
/// The profile and what a unit does over it: life in h and years, rms error in %FS, probability in ppm, equivalent time in h.
/// </summary>
internal sealed record ProfileView(
    IReadOnlyList<BinView> Bins, string Hours, string Years, string RmsError, string Outside, string EquivalentHours, string AgeFactor);

/// <summary>
/// The promise in one region: temperatures in °C, errors in %FS. <c>Allowed</c> is the tightest, <c>AllowedAtEnd</c> and
/// <c>OfReading</c> are empty where the allowance is constant.
/// </summary>
internal sealed record RegionView(
    string From, string To, string Allowed, string AllowedAtStart, string AllowedAtEnd, string OfReading,
    string Maximum, string Typical, string Margin, bool Holds, string WorstPressure, string WorstTemperature);

/// <summary>The answer: the margin, the floor that no plan can beat, and the point of least margin.</summary>
internal sealed record VerdictView(
    bool Feasible, string Margin, string FloorMargin, bool FloorHolds, RegionView Worst, RegionView Tightest);

/// <summary>A stay of the chamber: temperature in °C, the pressures read there, and how many.</summary>
internal sealed record StayView(string Temperature, string Pressures, int Count);

/// <summary>The compensation plan and what it takes: chamber time in min, cost per unit.</summary>
internal sealed record PlanView(
    IReadOnlyList<StayView> Stays, int Points, string ZeroDegree, string SpanDegree, string Minutes, string Cost, string Currency,
    string Batch, string Considered, bool Proven, string Objective);

/// <summary>
/// A term's line in the budget, errors in %FS. The group is <c>reference</c>, <c>accuracy</c>, <c>thermal</c>, <c>ageing</c>,
/// <c>production</c> or <c>further</c>. Outside is the fraction of units beyond the limit in ppm. Region, limit, capability and outside are
/// empty where there is none; the name only for further terms.
/// </summary>
internal sealed record TermView(
    string Group, string Key, string Name, RegionView? Region, string Added, string SigmaSample, string SigmaLongRun, string Limit,
    string Capability, string Outside, bool Held);

/// <summary>The limit in %FS of a figure derived from several readings.</summary>
internal sealed record DerivedView(string Group, string Key, RegionView? Region, string Limit);

/// <summary>
/// A verification point. Pressure in the range's unit, readings in the output's unit, tolerance, guard band and uncertainty in %FS, risks
/// in
/// ppm. Figures are plain here: the test system's files show them as they are, pages by <see cref="Rounded.Shown"/>.
/// </summary>
internal sealed record PointView(
    string Id, Rounded Temperature, Rounded Pressure, Rounded PressureFraction, string Direction, Rounded Nominal, Rounded Lower,
    Rounded Upper,
    Rounded Tolerance, Rounded GuardBand, Rounded Uncertainty, Rounded ConsumerRisk, Rounded ProducerRisk);

/// <summary>
/// How the test decides: guard band factor, capability criteria with their sigma levels, safety factor, rounding steps in %FS.
/// </summary>
internal sealed record TestView(
    string Rule, string GuardBand, bool Guarded, string Risk, bool EveryUnit, string Sample, string LongRun, string SampleSigma, string LongRunSigma, string SafetyFactor,
    string BandStep, string LimitStep, string Readings);

internal sealed record DigestView(string Name, string Digest);

/// <summary>
/// The print view: every figure of a specification as it is shown, rounded once. Writers and templates see this and nothing else, and none
/// of them calculates.
/// </summary>
internal sealed record PrintView(
    IdentityView Identity, RangeView Range, SignalView Output, TemperatureView Temperature, ProfileView Profile,
    IReadOnlyList<RegionView> Regions,
    VerdictView Verdict, PlanView Plan, IReadOnlyList<TermView> Terms, IReadOnlyList<DerivedView> Derived, IReadOnlyList<PointView> Points,
    TestView Test, string Platform, string PlatformRevision, string Station, IReadOnlyList<DigestView> Inputs, string Program,
    string Standing, string DecimalSign)
{
    /// <summary>What the search would have chosen instead of a plan that the requirement pins; nothing when it pins none.</summary>
    public OptimumView? Optimum { get; init; }

    /// <summary>Why the answer is what it is; nothing when it was not worked out.</summary>
    public DiagnosisView? Diagnosis { get; init; }

    /// <summary>The decision rules side by side; nothing when they were not compared.</summary>
    public DecisionView? Decisions { get; init; }

    /// <summary>Whether the decision rules were to be compared and are left out, since the draft was stopped.</summary>
    public bool LacksDecisions { get; init; }

    /// <summary>Whether the gains were asked for and are left out, since the draft was stopped.</summary>
    public bool LacksGains { get; init; }

    /// <summary>What the platform's statistics rest on; nothing when the platform does not say.</summary>
    public SampleView? Sample { get; init; }
}

/// <summary>
/// The sample behind the statistics, and the margin that can be claimed from it; how many more units would raise that to 1, empty where none
/// are needed or none suffice. It falls short when it alone is why the plan does not fit: the margin is there, the confidence is not.
/// </summary>
internal sealed record SampleView(string Units, string Lots, string Readings, string Confidence, string Margin, string FurtherUnits, bool FallsShort);

/// <summary>What the search would have chosen: temperatures in °C, cost per unit; whether it is what was pinned, and whether it fits.</summary>
internal sealed record OptimumView(string Temperatures, string Margin, string Cost, bool IsTaken, bool Fits);

/// <summary>
/// Why the answer is what it is: the parts of the band where the margin is least, the single changes that would make a plan fit (none when one
/// does), and what a step of an input does to the margin (none unless asked for). Hopeless is what no correction at all can make fit.
/// </summary>
internal sealed record DiagnosisView(
    IReadOnlyList<PartView> Parts, IReadOnlyList<RemedyView> Remedies, IReadOnlyList<GainView> Gains, bool IsHopeless, bool AnySuffices,
    bool IsComplete);

/// <summary>
/// A term's part of the band in %FS and its share of the design band in percent, with the plan and with a perfect correction; empty where it has
/// none. The name only for further terms.
/// </summary>
internal sealed record PartView(string Key, string Name, string Plan, string PlanShare, string Floor, string FloorShare);

/// <summary>
/// A single change: the figure with its unit as it is, as it would suffice, and the furthest that was looked at; the temperatures in °C of a plan
/// that fits with it.
/// </summary>
internal sealed record RemedyView(
    string Key, RegionView? Region, string Before, string After, string Furthest, bool Suffices, bool IsAtEnd, string Plan);

/// <summary>What a step of an input, named by its path in the files, does to the margin.</summary>
internal sealed record GainView(string Input, string Step, string Gain);
