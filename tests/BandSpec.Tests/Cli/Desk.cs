using BandSpec.Cli;
using BandSpec.Cli.Printing;
using BandSpec.Tests.House;

namespace BandSpec.Tests.Cli;

/// <summary>A folder of its own for a test, with the example files in it, and the program run in it as a user would.</summary>
internal sealed class Desk : IDisposable
{
    public string Folder { get; } = Directory.CreateTempSubdirectory("bandspec-test-").FullName;

    public Desk()
    {
        string example = Path.Combine(Tree.Root, "tests", "BandSpec.Tests", "Example");
        foreach (string file in Directory.EnumerateFiles(example, "*.yaml", SearchOption.AllDirectories))
        {
            string copy = At(Path.GetRelativePath(example, file));
            Directory.CreateDirectory(Path.GetDirectoryName(copy)!);
            File.Copy(file, copy);
        }
        // Few enough plans that a draft takes no time to speak of.
        Change("brine-reinjection.yaml", "temperatures: 3..6", "temperatures: 3");
    }

    public string At(string path) => Path.Combine(Folder, path);

    public string Text(string path) => File.ReadAllText(At(path));

    public void Write(string path, string text)
    {
        Directory.CreateDirectory(Path.GetDirectoryName(At(path))!);
        File.WriteAllText(At(path), text);
    }

    public void Change(string path, string old, string replacement) =>
        Write(path, File.ReadAllText(At(path)).Replace(old, replacement, StringComparison.Ordinal));

    /// <summary>What a run printed and ended with; the folder's own path is shown as <c>DESK</c>.</summary>
    public (int ExitCode, string Out, string Error) Run(params string[] arguments) => RunUntil(arguments, CancellationToken.None);

    /// <summary>The same when the user has pressed Ctrl-C at once.</summary>
    public (int ExitCode, string Out, string Error) RunStopped(params string[] arguments) => RunUntil(arguments, new CancellationToken(canceled: true));

    /// <summary>The same when the user presses Ctrl-C after a second.</summary>
    public (int ExitCode, string Out, string Error) RunStoppedSoon(params string[] arguments)
    {
        using CancellationTokenSource soon = new(TimeSpan.FromSeconds(1));
        return RunUntil(arguments, soon.Token);
    }

    private (int ExitCode, string Out, string Error) RunUntil(string[] arguments, CancellationToken interruption)
    {
        using StringWriter output = new() { NewLine = "\n" }, error = new() { NewLine = "\n" };
        int code = CommandLine.Run(arguments, new Terminal
        {
            Out = output, Error = error, Ink = Ink.None, IsWatched = false, Folder = Folder, Clock = TimeProvider.System, Interruption = () => interruption,
        });
        return (code, Shown(output), Shown(error));
    }

    public void Dispose() => Directory.Delete(Folder, recursive: true);

    private string Shown(StringWriter text) => text.ToString().Replace(Folder, "DESK", StringComparison.Ordinal);
}
