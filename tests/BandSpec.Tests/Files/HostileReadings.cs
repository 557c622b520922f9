using System.Text;
using BandSpec.Core.Characterizing;
using BandSpec.Core.LotJudging;
using BandSpec.Documents.Templates;
using BandSpec.Files.Inputs;
using BandSpec.Files.LotReadings;
using BandSpec.Files.Readings;
using CsCheck;
using Scriban.Runtime;
using Xunit;

namespace BandSpec.Tests.Files;

/// <summary>Readings, limits and templates changed at random: each is read or refused with its place, in bounded time, and never an exception.</summary>
public sealed class HostileReadings
{
    private const string Lot = "serial,point,reading\nA-1,V01,0.5012\nA-1,V02,4.4998\nA-2,V01,0.4987\nA-2,V02,4.5003\n";

    private const string Family = "unit,lot,temperature [°C],pressure-fraction,direction,cycle,error [%FS]\nU1,L1,25,0,rising,1,0.12\nU1,L1,25,1,rising,1,-0.31\nU2,L1,85,0.5,falling,2,1.02\n";

    private const string Layout = "{{ for p in points }}{{ p.id }};{{ p.lower | math.round 3 }};{{ if p.id == 'V01' }}x{{ end }}{{ end }}{{ func f(x) }}{{ x }}{{ end }}{{ f title }}";

    private static readonly string Limits = """
        { "format": "bandspec/limits/1", "specification": { "number": "T-1", "revision": "A" }, "sample-criterion": 1.67, "long-run-criterion": 1.33,
          "points": [
            { "id": "V01", "temperature": 25, "pressure": 0, "pressure-unit": "bar", "pressure-fraction": 0, "direction": "rising",
              "nominal": 0.5, "lower": 0.46, "upper": 0.54, "output-unit": "V", "tolerance": 1.1 },
            { "id": "V02", "temperature": 25, "pressure": 10, "pressure-unit": "bar", "pressure-fraction": 1, "direction": "rising",
              "nominal": 4.5, "lower": 4.46, "upper": 4.54, "output-unit": "V", "tolerance": 1.1 } ],
          "derived-limits": [ { "name": "zero", "limit": 0.5 } ], "reference-temperature": 25 }
        """;

    private static readonly string[] Pieces =
    [
        "NaN", "Infinity", "-1e308", "1e309", "-0", "1,5", ",", ";", "\t", "\"", "\"\"", "\n", "\r\n", "\r", "\u0000", "\uFEFF", "=1+1", "\u202E", "°C", "[bar]", "(mV)", "[", "]",
        "{", "}", "{{", "}}", "{{ while true }}", "{{ end }}", "{{ for i in 1..99 }}", "include 'x'", " | regex.match '^(a+)+$'", "* 1000000000", ": null", ": [[[[[[[[[[[[[[[[", "1e-320",
        "99999999999999999999", "V01", "rising", "\ud83d\ude00", new string('x', 5000), "(((((((((((((((((((((((((((((((((((((((((", "~}}", "{{-", "#", "@", "..", "ret", "$$",
    ];

    private static readonly LotLimits Known = LimitsFile.Read("limits.json", Encoding.UTF8.GetBytes(Limits)).Limits!;

    private static readonly ScriptObject View = new()
    {
        ["title"] = "Brine", ["points"] = new ScriptArray { new ScriptObject { ["id"] = "V01", ["lower"] = 0.46 }, new ScriptObject { ["id"] = "V02", ["lower"] = 4.46 } },
    };

    /// <summary>A change: at a place, so many bytes are left out and a piece is put in.</summary>
    private static readonly Gen<(double At, int Removed, byte[] Put)> Change = Gen.Select(
        Gen.Double[0, 1], Gen.OneOf(Gen.Const(0), Gen.Int[0, 3], Gen.Int[0, 60]),
        Gen.OneOf(Gen.Int[0, Pieces.Length - 1].Select(i => Encoding.UTF8.GetBytes(Pieces[i])), Gen.Byte.Array[0, 4]));

    [Fact]
    public void Readings_of_a_lot() => Sample(Lot, bytes =>
    {
        using MemoryStream stream = new(bytes);
        LotCollector collector = new(Known);
        ReadingReport report = CsvReadings.Read(stream, "lot.csv", collector);
        if (report.Findings.Count == 0)
            LotJudgement.Of(collector);
        return report.Findings.All(f => f.Place.Line >= 1);
    });

    [Fact]
    public void Readings_of_a_family() => Sample(Family, bytes =>
    {
        ReadingsSet<UnitReading> set = FamilyReadings.Read(InputContent.Of("family.csv", bytes), new ReadingsFormat());
        return set.Findings.All(f => f.Place.Line >= 1);
    });

    [Fact]
    public void Limits_of_a_lot() => Sample(Limits, bytes =>
    {
        (LotLimits? limits, IReadOnlyList<PlacedFinding> findings) = LimitsFile.Read("limits.json", bytes);
        return limits is null == findings.Count > 0;
    });

    [Fact]
    public void A_template() => Sample(Layout, bytes =>
    {
        try
        {
            return new SafeTemplate("layout.txt", Encoding.UTF8.GetString(bytes)).Render(View).Length <= 2_000_000;
        }
        catch (TemplateException refused)
        {
            return refused is { Line: >= 1, Column: >= 1 } ? true : throw new InvalidOperationException($"no place: {refused.Line}:{refused.Column}", refused);
        }
    });

    /// <summary>BANDSPEC_FUZZ_ROUNDS makes the run a long one.</summary>
    private static long Rounds => long.TryParse(Environment.GetEnvironmentVariable("BANDSPEC_FUZZ_ROUNDS"), out long rounds) ? rounds : 300;

    private static void Sample(string original, Func<byte[], bool> isAsExpected) => Change.List[1, 6].Sample(
        changes => isAsExpected(Changed(original, changes)), iter: Rounds, threads: 1, print: changes => Encoding.UTF8.GetString(Changed(original, changes)));

    private static byte[] Changed(string original, IEnumerable<(double At, int Removed, byte[] Put)> changes)
    {
        byte[] bytes = Encoding.UTF8.GetBytes(original);
        foreach ((double at, int removed, byte[] put) in changes)
        {
            int begin = (int)(at * bytes.Length), end = Math.Min(bytes.Length, begin + removed);
            bytes = [.. bytes[..begin], .. put, .. bytes[end..]];
        }

        return bytes;
    }
}
