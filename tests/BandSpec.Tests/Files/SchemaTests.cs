using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using BandSpec.Core.Findings;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;
using BandSpec.Files.Schemas;
using BandSpec.Files.Yaml;
using BandSpec.Tests.House;
using Json.Schema;
using Xunit;

namespace BandSpec.Tests.Files;

public sealed class SchemaTests
{
    private static readonly string DemoFolder = Path.Combine(Tree.Root, "requirements-demo");

    public static TheoryData<string> DemoFiles { get; } =
        [.. Directory.EnumerateFiles(DemoFolder, "*.yaml", SearchOption.AllDirectories).Select(path => Path.GetRelativePath(DemoFolder, path))];

    [Theory]
    [MemberData(nameof(DemoFiles))]
    public void A_demo_follows_its_schema(string file) => Assert.Empty(Faults(SchemaOf(KindOf(file)), DemoFolder, file));

    [Theory]
    [InlineData(InputFile.Requirement, "brine-reinjection.yaml", "upper: 25 bar", "upper: 25 Bar")]
    [InlineData(InputFile.Requirement, "brine-reinjection.yaml", "title:", "titel:")]
    [InlineData(InputFile.Requirement, "brine-reinjection.yaml", "safety-factor: 1.15", "safety-factor: 0.5")]
    [InlineData(InputFile.Requirement, "brine-reinjection.yaml", "least-cost", "cheapest")]
    [InlineData(InputFile.Platform, "platforms/steel-cell-40.yaml", "zero.1", "tilt.1")]
    [InlineData(InputFile.Platform, "platforms/steel-cell-40.yaml", "span-degree: 3", "span-degree: 3.5")]
    [InlineData(InputFile.Station, "stations/chamber-line-2.yaml", "95 EUR/h", "95 EUR")]
    public void A_schema_refuses_what_the_reader_refuses(InputFile kind, string file, string old, string replacement)
    {
        string text = File.ReadAllText(Path.Combine(Demo.Folder, file));
        Assert.Contains(old, text, StringComparison.Ordinal);
        Assert.NotEmpty(Faults(SchemaOf(kind), YamlAsJson(text.Replace(old, replacement, StringComparison.Ordinal))));
    }

    [Theory]
    [MemberData(nameof(DemoFiles))]
    public void A_demo_names_its_schema_for_editors(string file)
    {
        string first = File.ReadLines(Path.Combine(DemoFolder, file)).First();
        const string Mark = "# yaml-language-server: $schema=";
        Assert.StartsWith(Mark, first, StringComparison.Ordinal);
        string path = Path.GetFullPath(Path.Combine(Path.GetDirectoryName(Path.Combine(DemoFolder, file))!, first[Mark.Length..]));
        Assert.Equal(Path.Combine(DemoFolder, "schemas", $"{KindOf(file).ToString().ToLowerInvariant()}.schema.json"), path);
    }

    [Theory]
    [InlineData(InputFile.Requirement)]
    [InlineData(InputFile.Platform)]
    [InlineData(InputFile.Station)]
    public void The_schemas_beside_the_demos_are_those_of_the_program(InputFile kind)
    {
        string path = Path.Combine(DemoFolder, "schemas", $"{kind.ToString().ToLowerInvariant()}.schema.json");
        Assert.Equal(Encoding.UTF8.GetString(InputSchemas.Write(kind).Span), File.ReadAllText(path));
    }

    /// <summary>What <c>characterize</c> and <c>age</c> write, sample and all, and a requirement that asks for a confidence.</summary>
    [Fact]
    public void A_characterized_platform_and_a_confidence_follow_their_schemas()
    {
        using Cli.Desk desk = new();
        string readings = Path.Combine(DemoFolder, "readings", "steel-cell-40");
        string[] range = ["--range", "0 bar..25 bar", "--platform", "cell.yaml", "--quiet"];
        Assert.Equal(0, desk.Run(["characterize", readings + ".csv", .. range]).ExitCode);
        Assert.Equal(0, desk.Run(["age", readings + "-storage.csv", .. range]).ExitCode);
        Assert.Contains("activation-energy-error:", desk.Text("cell.yaml"), StringComparison.Ordinal);
        Assert.Empty(Faults(SchemaOf(InputFile.Platform), desk.Folder, "cell.yaml"));
        Assert.NotEmpty(Faults(SchemaOf(InputFile.Platform), YamlAsJson(desk.Text("cell.yaml").Replace("  lots: 3", "  lots: many", StringComparison.Ordinal))));

        desk.Change("brine-reinjection.yaml", "long-run: 1.33 }", "long-run: 1.33, confidence: 0.95 }");
        Assert.Empty(Faults(SchemaOf(InputFile.Requirement), desk.Folder, "brine-reinjection.yaml"));
        desk.Change("brine-reinjection.yaml", "confidence: 0.95", "confidence: 1.5");
        Assert.NotEmpty(Faults(SchemaOf(InputFile.Requirement), desk.Folder, "brine-reinjection.yaml"));
    }

    [Fact]
    public void Result_and_limits_follow_their_schemas_to_the_last_member()
    {
        Specification specification = SpecificationDraft.Draft(Given.Application(), extras: DraftExtras.Decisions);

        Assert.NotNull(specification.Decisions);
        Assert.Empty(Faults(ResultSchema, ResultJson.Write(specification)));
        Assert.Empty(Faults(JsonSchema.FromText(Encoding.UTF8.GetString(OutputSchemas.Limits.Span)), LimitsJson.Write(specification)));
    }

    [Fact]
    public void The_result_of_a_pinned_plan_tells_the_optimum_by_its_schema()
    {
        Specification free = SpecificationDraft.Draft(Given.Application());
        Specification pinned = SpecificationDraft.Draft(Given.Application(Given.Requirement with
        {
            Compensation = Given.Requirement.Compensation with { Pinned = new PinnedPlan([Given.C(-20), Given.C(25), Given.C(150)], 2, 2) },
        }));
        JsonElement result = JsonDocument.Parse(ResultJson.Write(pinned)).RootElement, optimum = result.GetProperty("optimum");

        Assert.Empty(Faults(ResultSchema, ResultJson.Write(pinned)));
        Assert.Equal([-20, 25, 150], result.GetProperty("plan").GetProperty("temperatures").EnumerateArray().Select(t => t.GetDouble()));
        Assert.Equal(free.Choice.Plan.Temperatures.Select(t => t.Celsius), optimum.GetProperty("temperatures").EnumerateArray().Select(t => t.GetDouble()));
        Assert.Equal(free.Choice.ContinuousMargin, optimum.GetProperty("margin-continuous").GetDouble());
        Assert.True(optimum.GetProperty("proven").GetBoolean());
        Assert.False(JsonDocument.Parse(ResultJson.Write(free)).RootElement.TryGetProperty("optimum", out _));
    }

    [Fact]
    public void A_result_with_its_diagnosis_follows_its_schema()
    {
        Specification refused = Documents.Drafts.Refused;
        JsonElement result = JsonDocument.Parse(ResultJson.Write(refused)).RootElement;

        Assert.Empty(Faults(ResultSchema, ResultJson.Write(refused)));
        Assert.Equal(refused.Diagnosis!.Changes.Count, result.GetProperty("diagnosis").GetArrayLength());
        Assert.All(result.GetProperty("diagnosis").EnumerateArray(), change => Assert.Equal(
            change.GetProperty("suffices").GetBoolean(), change.GetProperty("after").ValueKind == JsonValueKind.Number));
        Assert.Equal(refused.Gains!.Count, result.GetProperty("gains").GetArrayLength());
        Assert.Equal("ageing", result.GetProperty("held-by").GetProperty("perfect-correction").GetProperty("terms")[0].GetProperty("term").GetString());
    }

    [Theory]
    [InlineData("brine-reinjection.yaml")]
    [InlineData("cold-store-suction.yaml")]
    [InlineData("hydrogen-dryer.yaml")]
    public void The_results_of_the_demos_follow_the_schema(string file)
    {
        InputContent Content(string name) => InputContent.Of(name, File.ReadAllBytes(Path.Combine(DemoFolder, name)));
        Specification specification = SpecificationDraft.Draft(InputReading.Read(Content(file), Content).Application!, extras: DraftExtras.Usual);
        JsonElement result = JsonDocument.Parse(ResultJson.Write(specification)).RootElement;

        Assert.Empty(Faults(ResultSchema, ResultJson.Write(specification)));
        Assert.Equal(!specification.Feasible, result.TryGetProperty("diagnosis", out _));
        Assert.InRange(result.GetProperty("margin-continuous").GetDouble(), 0, result.GetProperty("margin").GetDouble() * (1 + 1e-9));
        Assert.Equal(result.GetProperty("exchange-rounds").GetInt32() > 1, result.GetProperty("added-nodes").GetArrayLength() > 0);
    }

    private static InputFile KindOf(string file) =>
        file.StartsWith("platforms", StringComparison.Ordinal) ? InputFile.Platform
        : file.StartsWith("stations", StringComparison.Ordinal) ? InputFile.Station : InputFile.Requirement;

    private static JsonSchema SchemaOf(InputFile kind) => Schemas[kind];

    private static readonly JsonSchema ResultSchema = JsonSchema.FromText(Encoding.UTF8.GetString(OutputSchemas.Result.Span));

    // A schema registers itself by its identifier, which may be done once only.
    private static readonly Dictionary<InputFile, JsonSchema> Schemas = Enum.GetValues<InputFile>()
        .ToDictionary(kind => kind, kind => JsonSchema.FromText(Encoding.UTF8.GetString(InputSchemas.Write(kind).Span)));

    private static List<string> Faults(JsonSchema schema, string folder, string file) =>
        Faults(schema, YamlAsJson(File.ReadAllText(Path.Combine(folder, file))));

    private static List<string> Faults(JsonSchema schema, ReadOnlyMemory<byte> json)
    {
        using JsonDocument document = JsonDocument.Parse(json);
        EvaluationResults results = schema.Evaluate(document.RootElement, new EvaluationOptions { OutputFormat = OutputFormat.List });
        // A list names the branch of an alternative that did not hold beside the one that did.
        if (results.IsValid)
            return [];
        return [.. (results.Details ?? []).Append(results).Where(detail => !detail.IsValid && detail.Errors is not null)
            .SelectMany(detail => detail.Errors!.Select(error => $"{detail.InstanceLocation}: {error.Value}"))];
    }

    /// <summary>A YAML file as an editor's YAML server sees it: plain numbers and truth values of the core schema are such, all else is text.</summary>
    private static ReadOnlyMemory<byte> YamlAsJson(string yaml)
    {
        FoundFaults faults = new(InputFile.Requirement);
        YamlNode? root = TreeReading.Read(SourceText.Decode(Encoding.UTF8.GetBytes(yaml), faults), faults);
        Assert.Empty(faults.All);
        return Encoding.UTF8.GetBytes(ToJson(root!).ToJsonString());
    }

    private static JsonNode ToJson(YamlNode node) => node switch
    {
        MapNode map => new JsonObject(map.Entries.Select(entry => KeyValuePair.Create(entry.Key.Text, (JsonNode?)ToJson(entry.Value)))),
        ListNode list => new JsonArray([.. list.Items.Select(ToJson)]),
        ScalarNode { IsQuoted: false } number when double.TryParse(number.Text, out double value) => JsonValue.Create(value),
        ScalarNode scalar => JsonValue.Create(scalar.Text)!,
        _ => throw new InvalidOperationException("the tree has no other nodes"),
    };
}
