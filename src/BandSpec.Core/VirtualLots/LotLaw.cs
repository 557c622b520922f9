using BandSpec.Core.Requirements;

namespace BandSpec.Core.VirtualLots;

/// <summary>Everything about a lot that is the same for all its units, worked out once.</summary>
internal sealed class LotLaw
{
    /// <summary>Goes up with every change of what is drawn or summed, so that parts made by different versions are not mixed.</summary>
    private const ulong Generation = 1;

    /// <summary>The law of a subject.</summary>
    /// <exception cref="ArgumentException">The plan's points do not determine its correction.</exception>
    public LotLaw(LotSubject subject)
    {
        Places = PlacesOf(subject);
        RawError = new RawErrorLaw(subject.Platform, Places);
        Run = new CompensationRun(subject, Places);
        Traits = new UnitTraits(subject);
        Nominal = NominalError.Of(RawError, Run, Places);
        Test = new VerificationRun(subject, Places);
        Map = new UseMap(subject, Places, Nominal, Traits);
        Profile = new UseProfile(subject, Places, Nominal, Traits);
    }

    /// <summary>Where the coefficients of an error stand.</summary>
    public ShapePlaces Places { get; }

    /// <summary>How the raw error scatters.</summary>
    public RawErrorLaw RawError { get; }

    /// <summary>How units are read and compensated.</summary>
    public CompensationRun Run { get; }

    /// <summary>What compensation cannot touch.</summary>
    public UnitTraits Traits { get; }

    /// <summary>What compensation leaves of the mean unit.</summary>
    public NominalError Nominal { get; }

    /// <summary>The verification test.</summary>
    public VerificationRun Test { get; }

    /// <summary>The places of the operating map.</summary>
    public UseMap Map { get; }

    /// <summary>The use over the temperature profile.</summary>
    public UseProfile Profile { get; }

    /// <summary>Where every figure of a tally of such lots stands.</summary>
    public TallyPlan TallyPlan => new(Map.Regions, Test.Temperatures.Count, Test.Points, Map.Nodes);

    /// <summary>
    /// A number that two laws share only when all their numbers are equal (but for a chance of 2⁻⁶⁴), so that parts of different orders are
    /// not mixed.
    /// </summary>
    public ulong Fingerprint
    {
        get
        {
            ulong hash = 0xCBF2_9CE4_8422_2325 + Generation;
            IEnumerable<double> numbers =
                RawError.Numbers.Concat(Run.Numbers).Concat(Traits.Numbers).Concat(Test.Numbers).Concat(Map.Numbers).Concat(Profile.Numbers);
            foreach (double number in numbers)
                hash = ((hash ^ BitConverter.DoubleToUInt64Bits(number)) * 0x9E37_79B9_7F4A_7C15) ^ (hash >> 29);
            return hash;
        }
    }

    private static ShapePlaces PlacesOf(LotSubject subject)
    {
        int[] highest = [-1, -1, -1, -1];
        IEnumerable<CoefficientName> names = subject.Platform.RawError.Select(c => c.Name)
            .Concat(StoredCorrection.Names(subject.Plan, subject.Station.PressurePoints.Reference.Count));
        foreach (CoefficientName name in names)
            highest[(int)name.Shape] = Math.Max(highest[(int)name.Shape], name.Degree);
        return new ShapePlaces(highest);
    }
}
