using System.Globalization;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Revisions;

/// <summary>
/// The fields of a requirement as figures. An item of a list is named by what makes it itself, since its number changes when another is put
/// before it; but regions and bins by their number while both lists are equally long, so that a moved edge is one change.
/// </summary>
/// <param name="requirement">The requirement.</param>
/// <param name="regionsByNumber">Whether regions are named by their number.</param>
/// <param name="binsByNumber">Whether bins of the profile are named by their number.</param>
internal sealed class RequirementFigures(Requirement requirement, bool regionsByNumber, bool binsByNumber)
{
    private readonly FigureList list = new(FigureSubject.Requirement);

    /// <summary>All fields in the order of the file.</summary>
    public IReadOnlyList<Figure> All()
    {
        ListIdentity(requirement.Identity);
        list.Text("platform", requirement.PlatformFile);
        list.Text("station", requirement.StationFile);
        ListPressure(requirement.Pressure);
        ListOutput(requirement.Output);
        ListTemperature(requirement.Temperature);
        for (int i = 0; i < requirement.AllowedError.Count; i++)
            ListRegion(requirement.AllowedError[i], i);
        list.Number("safety-factor", requirement.SafetyFactor, "", Leeway.LessForProduction);
        list.Number("capability.sample", requirement.Capability.Sample, "", Leeway.LessForBoth);
        list.Number("capability.long-run", requirement.Capability.LongRun, "", Leeway.LessForBoth);
        if (requirement.Capability.Confidence is { } confidence)
            list.Number("capability.confidence", confidence, "", Leeway.LessForBoth);
        ListTerms();
        ListCompensation(requirement.Compensation);
        ListTest();
        return list.All;
    }

    private void ListIdentity(SpecificationIdentity identity)
    {
        list.Text("specification.number", identity.Number);
        list.Text("specification.revision", identity.Revision);
        list.Text("specification.title", identity.Title);
        list.Text("specification.customer", identity.Customer);
        list.Text("specification.prepared-by", identity.PreparedBy);
        list.Text("specification.date", Date(identity.Date));
        for (int i = 0; i < identity.Changes.Count; i++)
            list.Text($"specification.changes[{i}]", NoteOf(identity.Changes[i]));
    }

    private static string NoteOf(RevisionNote note) => $"{note.Revision}, {Date(note.Date)}: {note.Text}";

    private static string Date(DateOnly date) => date.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);

    private void ListPressure(PressureRange pressure)
    {
        list.Text("pressure.lower", pressure.Lower.ToString());
        list.Text("pressure.upper", pressure.Upper.ToString());
        list.Word("pressure.reference", pressure.Reference);
    }

    private void ListOutput(OutputSignal output)
    {
        list.Word("output.signal", output.Kind);
        list.Number("output.at-lower", output.AtLower, output.Unit, Leeway.None);
        list.Number("output.at-upper", output.AtUpper, output.Unit, Leeway.None);
        if (output.Supply is { } supply)
            list.Number("output.supply", supply, output.Unit, Leeway.None);
        if (output.Resolution is { } resolution)
            list.Text("output.resolution", resolution);
        if (output.Step is { } step)
            list.Number("output.step", step, output.Unit, Leeway.LessForProduction);
    }

    /// <summary>A wider range has to be served and is promised, and so is a longer life: tighter for both.</summary>
    private void ListTemperature(OperatingTemperature range)
    {
        list.Temperature("temperature.lower", range.Lower, Leeway.ForBoth);
        list.Temperature("temperature.upper", range.Upper, Leeway.LessForBoth);
        list.Temperature("temperature.reference", range.Reference, Leeway.None);
        for (int i = 0; i < requirement.Profile.Count; i++)
        {
            DwellBin bin = requirement.Profile[i];
            string path = $"temperature.profile[{(binsByNumber ? Number(i) : Words.Of(bin.From, bin.To))}]";
            list.Temperature($"{path}.from", bin.From, Leeway.None);
            list.Temperature($"{path}.to", bin.To, Leeway.None);
            list.Number($"{path}.dwell", bin.Dwell.Hours, "h", Leeway.LessForBoth);
        }
    }

    private void ListRegion(AllowedErrorRegion region, int index)
    {
        string path = $"allowed-error[{(regionsByNumber ? Number(index) : Words.Of(region.From, region.To))}]";
        list.Temperature($"{path}.from", region.From, Leeway.None);
        list.Temperature($"{path}.to", region.To, Leeway.None);
        list.Error($"{path}.limit", region.Limit, Leeway.ForBoth);
        if (region.LimitAtEnd is { } end)
            list.Error($"{path}.limit-at-end", end, Leeway.ForBoth);
        if (region.OfReading > 0)
            list.Number($"{path}.of-reading", 100 * region.OfReading, "%", Leeway.ForBoth);
    }

    private void ListTerms()
    {
        foreach (HeldTerm held in requirement.HeldTerms)
            list.Error($"held-terms.{held.Term}", held.Limit, Leeway.ForBoth);
        foreach (FurtherTerm further in requirement.FurtherTerms)
        {
            string path = $"further-terms[{further.Name}]";
            list.Error($"{path}.bound", further.Bound, Leeway.LessForProduction);
            list.Error($"{path}.sigma", further.Sigma, Leeway.LessForProduction);
            list.Word($"{path}.shape", further.Shape);
        }
    }

    /// <summary>What widens the choice of plans is room for production.</summary>
    private void ListCompensation(CompensationScope scope)
    {
        list.Number("compensation.candidate-step", scope.CandidateStep.Kelvin, "K", Leeway.None);
        list.Number("compensation.temperatures.fewest", scope.FewestTemperatures, "", Leeway.LessForProduction);
        list.Number("compensation.temperatures.most", scope.MostTemperatures, "", Leeway.ForProduction);
        list.Number("compensation.separation", scope.Separation.Kelvin, "K", Leeway.LessForProduction);
        list.Number("compensation.reach", scope.Reach.Kelvin, "K", Leeway.ForProduction);
        list.Word("compensation.objective", scope.Objective);
        if (scope.Pinned is { } pinned)
            ListPinned(pinned);
    }

    private void ListPinned(PinnedPlan pinned)
    {
        list.Text("compensation.plan", string.Join(", ", pinned.Temperatures));
        list.Text("compensation.zero-degree", pinned.ZeroDegree is { } zero ? Number(zero) : "highest");
        list.Text("compensation.span-degree", pinned.SpanDegree is { } span ? Number(span) : "highest");
    }

    private void ListTest()
    {
        list.Word("test.decision-rule", requirement.Test.Rule);
        list.Number("test.guard-band", requirement.Test.GuardBand, "", Leeway.LessForProduction);
        if (requirement.Test.Risk is { } risk)
            list.Number("test.risk", risk, "", Leeway.ForProduction);
        list.Word("test.promise", requirement.Test.Promise);
        list.Text("test.temperatures", requirement.Test.Temperatures is { } given ? string.Join(", ", given) : "auto");
        list.Error("rounding.band", requirement.Rounding.Band, Leeway.ForCustomer);
        list.Error("rounding.limit", requirement.Rounding.Limit, Leeway.LessForProduction);
    }

    private static string Number(int index) => index.ToString(CultureInfo.InvariantCulture);
}
