using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The form of <c>temperature</c> in a requirement: the operating range and the profile.</summary>
internal static class TemperatureForm
{
    /// <summary>How far the parts of the service life may be from 100 %: figures with one decimal place add up to that.</summary>
    private const double ShareSlack = 0.1;

    private static readonly Key<Temperature> From = new("from", QuantityForms.Temperature, "Colder end of the bin.");
    private static readonly Key<Temperature> To = new("to", QuantityForms.Temperature, "Hotter end of the bin.");
    private static readonly Key<Dwell> Time = new("dwell", QuantityForms.Dwell, "Time spent there, or percent of service-life.");

    private static readonly MapForm<WrittenBin> Bin = new(
        "a bin of the profile", [From, To, Time], v => new WrittenBin(v.Of(From), v.Of(To), v.Of(Time)));

    private static readonly Key<Temperature> Lower = new("lower", QuantityForms.Temperature, "Coldest operating temperature.");
    private static readonly Key<Temperature> Upper = new("upper", QuantityForms.Temperature, "Hottest operating temperature.");
    private static readonly Key<Temperature> Reference = new(
        "reference", QuantityForms.Temperature, "Reference temperature, inside the range.");

    private static readonly Key<Duration> ServiceLife = Key.Optional<Duration>(
        "service-life", QuantityForms.Time, "The whole service life; needed when dwells are given in percent.");

    private static readonly Key<IReadOnlyList<WrittenBin>> Profile = new(
        "profile", new ListForm<WrittenBin>("temperature profile", Bin, 1, 200), "How long the unit stays at which temperature over its service life.");

    /// <summary>The form.</summary>
    internal static MapForm<TemperatureSection> Form { get; } = new(
        "the operating temperatures", [Lower, Upper, Reference, ServiceLife, Profile],
        v => new TemperatureSection(ReadRange(v), ReadProfile(v)), isLenient: true);

    private static OperatingTemperature? ReadRange(MapValues v) =>
        v.Has(Lower) && v.Has(Upper) && v.Has(Reference) ? new OperatingTemperature(v.Of(Lower), v.Of(Upper), v.Of(Reference)) : null;

    private static DwellBin[]? ReadProfile(MapValues v)
    {
        if (v.Find(Profile) is not { } bins)
            return null;
        int shares = bins.Count(bin => bin.Dwell.Percent is not null);
        if (shares != 0 && shares != bins.Count)
            v.Complain(
                Profile, "profile-mixed", "some dwells are times and some are percent", "every dwell a time, or every dwell in percent with `service-life`");
        else if (v.Has(ServiceLife) != shares > 0)
            v.Complain(
                ServiceLife, "service-life",
                shares > 0 ? "dwells in percent of a service life that is not given" : "a service life beside dwells that are times",
                shares > 0 ? "`service-life`, such as `15 y`" : "leave `service-life` out, or give every dwell in percent");
        else if (shares > 0 && bins.Sum(bin => bin.Dwell.Percent!.Value) is var sum && Math.Abs(sum - 100) > ShareSlack)
            v.Complain(Profile, "profile-sum", FormattableString.Invariant($"dwells of {sum:0.###} % in all"), "100 % in all");
        if (v.HasComplaint)
            return null;
        double life = v.Has(ServiceLife) ? v.Of(ServiceLife).Hours : 0;
        return [.. bins.Select(bin => new DwellBin(
            bin.From, bin.To, bin.Dwell.Time ?? Duration.FromHours(bin.Dwell.Percent!.Value / 100 * life)))];
    }
}

/// <summary>A bin as it was written.</summary>
internal sealed record WrittenBin(Temperature From, Temperature To, Dwell Dwell);

/// <summary>What a requirement says about temperature, as far as it could be read.</summary>
internal sealed record TemperatureSection(OperatingTemperature? Range, IReadOnlyList<DwellBin>? Profile);
