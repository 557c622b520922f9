using System.Diagnostics;
using Xunit;

namespace BandSpec.Tests.Documents;

/// <summary>Programs of others that read what this program writes. Where one is not installed, the test is skipped and says so.</summary>
internal static class Tools
{
    /// <summary>Runs a program on a file and gives back what it printed, errors included.</summary>
    public static string Run(string program, byte[] file, Func<string, string> arguments)
    {
        var path = Path.Combine(Path.GetTempPath(), Path.GetRandomFileName() + ".pdf");
        File.WriteAllBytes(path, file);
        try
        {
            return Run(program, arguments(path));
        }
        finally
        {
            File.Delete(path);
        }
    }

    private static string Run(string program, string arguments)
    {
        Assert.SkipUnless(IsInstalled(program), $"{program} is not installed");
        using var process = Process.Start(new ProcessStartInfo(program, arguments) { RedirectStandardOutput = true, RedirectStandardError = true })!;
        var errors = process.StandardError.ReadToEndAsync();
        var output = process.StandardOutput.ReadToEnd();
        process.WaitForExit();
        return output + errors.Result;
    }

    private static bool IsInstalled(string program) =>
        (Environment.GetEnvironmentVariable("PATH") ?? "").Split(Path.PathSeparator).Any(folder => File.Exists(Path.Combine(folder, program)));
}
