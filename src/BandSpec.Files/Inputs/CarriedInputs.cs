using BandSpec.Core.Findings;
using BandSpec.Files.Json;

namespace BandSpec.Files.Inputs;

/// <summary>
/// The inputs that a specification's PDF carries, so that the specification can be found again from its document alone. Which attachment is
/// which input stands in one of them, the provenance.
/// </summary>
public sealed class CarriedInputs
{
    /// <summary>The name under which a PDF carries its provenance.</summary>
    public const string ProvenanceName = "provenance.json";

    private readonly string carrier;
    private readonly IReadOnlyDictionary<string, ReadOnlyMemory<byte>> files;

    private CarriedInputs(string carrier, IReadOnlyDictionary<string, ReadOnlyMemory<byte>> files, Manifest provenance) =>
        (this.carrier, this.files, Provenance) = (carrier, files, provenance);

    /// <summary>How the PDF was made, and from what.</summary>
    public Manifest Provenance { get; }

    /// <summary>What a PDF carries; <see langword="null"/> when it carries no provenance.</summary>
    /// <param name="carrier">The PDF as the user knows it; findings name it before the file.</param>
    /// <param name="files">The attached files by name.</param>
    public static CarriedInputs? Of(string carrier, IReadOnlyDictionary<string, ReadOnlyMemory<byte>> files)
    {
        ArgumentNullException.ThrowIfNull(files);
        return files.TryGetValue(ProvenanceName, out ReadOnlyMemory<byte> bytes) && Manifest.Read(bytes) is { } provenance
            ? new CarriedInputs(carrier, files, provenance)
            : null;
    }

    /// <summary>Reads requirement, platform and station.</summary>
    /// <param name="missing">The letters of a text that no document can show; <see langword="null"/> when none is going to be written.</param>
    public InputSet Read(Func<string, IReadOnlyList<string>>? missing = null) =>
        InputReading.Read(Carried(InputFile.Requirement), (kind, _) => Carried(kind), missing);

    /// <summary>The carried templates by their paths in their folder.</summary>
    public IReadOnlyDictionary<string, ReadOnlyMemory<byte>> Templates() => Provenance.Inputs
        .Where(input => input.Kind == "template" && files.ContainsKey(input.AttachedAs))
        .DistinctBy(input => input.Name)
        .ToDictionary(input => input.Name, input => files[input.AttachedAs]);

    /// <summary>The inputs are shown under the names that they had when the document was made, so that it can be made again.</summary>
    private InputContent Carried(InputFile file)
    {
        string kind = file.ToString().ToLowerInvariant();
        return Provenance.Inputs.FirstOrDefault(input => input.Kind == kind) is { } listed && files.TryGetValue(listed.AttachedAs, out ReadOnlyMemory<byte> bytes)
            ? InputContent.Of($"{carrier}/{listed.Name}", bytes)
            : InputContent.Refused($"{carrier}/{kind}", $"{carrier} does not carry its {kind}");
    }
}
