using BandSpec.Core.Findings;

namespace BandSpec.Files.Inputs;

/// <summary>
/// The inputs as a package carries them: under names of their own, since two input files may have the same name in different folders. So a
/// specification can be found again from its document alone.
/// </summary>
public static class CarriedInputs
{
    /// <summary>The name under which an input is carried.</summary>
    public static string NameOf(InputFile kind) => kind switch
    {
        InputFile.Requirement => "requirement.yaml",
        InputFile.Platform => "platform.yaml",
        InputFile.Station => "station.yaml",
        _ => throw new ArgumentOutOfRangeException(nameof(kind), kind, "only inputs are carried"),
    };

    /// <summary>Reads the inputs that a package carries.</summary>
    /// <param name="carrier">What carries them, as the user knows it; findings name it before the file.</param>
    /// <param name="files">The carried files by name.</param>
    public static InputSet Read(string carrier, IReadOnlyDictionary<string, ReadOnlyMemory<byte>> files)
    {
        ArgumentNullException.ThrowIfNull(files);
        return InputReading.Read(Carried(InputFile.Requirement), (kind, _) => Carried(kind), missing: null);

        InputContent Carried(InputFile kind)
        {
            string name = NameOf(kind), shown = $"{carrier}:{name}";
            return files.TryGetValue(name, out ReadOnlyMemory<byte> bytes)
                ? InputContent.Of(shown, bytes)
                : InputContent.Refused(shown, $"{carrier} does not carry {name}");
        }
    }
}
