using System.Diagnostics;
using System.Text;

namespace BandSpec.Cli.Versioning;

/// <summary>What a call of git gave.</summary>
/// <param name="Succeeded">Whether git says so.</param>
/// <param name="Output">Its standard output, as far as it was wanted.</param>
/// <param name="Message">The first line of what it said besides.</param>
internal readonly record struct GitAnswer(bool Succeeded, ReadOnlyMemory<byte> Output, string Message)
{
    /// <summary>The output as text.</summary>
    public string Text => Encoding.UTF8.GetString(Output.Span);
}

/// <summary>Calls the git program. It is only ever asked to read; nothing in a repository is changed.</summary>
internal static class Git
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(60);

    /// <summary>Calls git and takes at most so many bytes of its output; what is longer counts as failed.</summary>
    /// <exception cref="RefusalException">There is no git, or it does not end.</exception>
    public static GitAnswer Call(string folder, int mostBytes, params IEnumerable<string> arguments)
    {
        ProcessStartInfo start = new("git", ["--no-pager", .. arguments])
        {
            WorkingDirectory = folder, RedirectStandardOutput = true, RedirectStandardError = true, RedirectStandardInput = true, UseShellExecute = false,
        };
        // No lock is taken for a mere look, and nobody is there to answer a question.
        start.Environment["GIT_OPTIONAL_LOCKS"] = "0";
        start.Environment["GIT_TERMINAL_PROMPT"] = "0";
        using Process git = Start(start);
        // A git that waits for a network or a lock would have the user wait without an end.
        using Timer watch = new(_ => git.Kill(entireProcessTree: true), null, Patience, Timeout.InfiniteTimeSpan);
        git.StandardInput.Close();
        Task<string> errors = git.StandardError.ReadToEndAsync();
        byte[] output = ReadAtMost(git.StandardOutput.BaseStream, mostBytes, out bool isWhole);
        if (!isWhole)
            git.Kill(entireProcessTree: true);
        git.WaitForExit();
        string first = errors.Result.Split('\n')[0].Trim().TrimEnd('.');
        string message = isWhole ? first.StartsWith("fatal: ", StringComparison.Ordinal) ? first["fatal: ".Length..] : first : $"more than {mostBytes} bytes";
        return new GitAnswer(isWhole && git.ExitCode == 0, output, message);
    }

    private static Process Start(ProcessStartInfo start)
    {
        try
        {
            return Process.Start(start) ?? throw new RefusalException("git cannot be run");
        }
        catch (System.ComponentModel.Win32Exception refused)
        {
            throw new RefusalException($"git cannot be run: {refused.Message}");
        }
    }

    private static byte[] ReadAtMost(Stream stream, int most, out bool isWhole)
    {
        byte[] buffer = new byte[64 * 1024];
        using MemoryStream read = new();
        while (stream.Read(buffer) is > 0 and int count)
        {
            read.Write(buffer, 0, count);
            if (read.Length > most)
            {
                isWhole = false;
                return [];
            }
        }

        isWhole = true;
        return read.ToArray();
    }
}
