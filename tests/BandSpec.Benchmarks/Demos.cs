using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Files.Inputs;

namespace BandSpec.Benchmarks;

/// <summary>The demo requirements, read from their folder.</summary>
internal static class Demos
{
    /// <summary>Drafts a demo by its file name without ending.</summary>
    public static Specification Draft(string root, string name)
    {
        string folder = Path.Combine(root, "requirements-demo");
        InputContent Open(string path) => InputContent.Of(path, File.ReadAllBytes(Path.Combine(folder, path)));
        Application application = InputReading.Read(Open(name + ".yaml"), Open).Application
            ?? throw new InvalidOperationException($"{name} has findings");
        return SpecificationDraft.Draft(application);
    }
}
