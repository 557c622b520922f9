using System.Diagnostics;
using BandSpec.Cli;
using BandSpec.Cli.Printing;
using BandSpec.Tests.Revising;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>What no command foresees reaches the user as one line, with the place of the details.</summary>
public sealed class FaultTests : IDisposable
{
    private readonly Workshop shop = new();

    public void Dispose() => shop.Dispose();

    [Theory]
    [InlineData("check", Workshop.Brine)]
    [InlineData("draft", Workshop.Brine)]
    [InlineData("compare", Workshop.Brine, Workshop.Brine)]
    [InlineData("schema", "result")]
    public void A_fault_of_the_program_is_one_line_and_a_file_with_the_details(params string[] arguments)
    {
        (int code, string error) = Run(new InvalidOperationException("two\nlines"), arguments);
        Assert.Equal(3, code);
        string line = Assert.Single(error.TrimEnd('\n').Split('\n'));
        Assert.StartsWith("bandspec: a fault of the program, not of your files: two lines (InvalidOperationException); details are in ", line, StringComparison.Ordinal);
        string details = line[(line.IndexOf("details are in ", StringComparison.Ordinal) + "details are in ".Length)..];
        string text = File.ReadAllText(details);
        File.Delete(details);
        Assert.Contains($"arguments: {string.Join(' ', arguments)}\n", text, StringComparison.Ordinal);
        Assert.Contains("   at ", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Output_that_nobody_reads_any_more_is_no_fault_to_be_told() =>
        Assert.Equal((3, ""), Run(new IOException("Broken pipe", 32), ["schema", "result"]));

    [Fact]
    public void Output_that_does_not_fit_the_disk_is_told_in_plain_words() =>
        Assert.Equal((3, "bandspec: the output cannot be written: the disk is full\n"), Run(new IOException("No space left on device", 28), ["schema", "result"]));

    [Theory]
    [InlineData("check", "pipe.yaml")]
    [InlineData("verify", "pipe.yaml")]
    [InlineData("compare", "pipe.yaml", "pipe.yaml")]
    [InlineData("unpack", "pipe.yaml")]
    [InlineData("draft", "through.yaml")]
    public async Task A_pipe_that_nobody_writes_to_is_not_waited_for(params string[] arguments)
    {
        MakePipe();
        shop.Write("through.yaml", shop.Read(Workshop.Brine).Replace(Workshop.Platform, "pipe.yaml", StringComparison.Ordinal));
        Task<Screen> run = Task.Run(() => shop.Run(arguments), TestContext.Current.CancellationToken);
        Screen screen = await run.WaitAsync(TimeSpan.FromSeconds(60), TestContext.Current.CancellationToken);
        Assert.Equal(arguments[0] == "verify" ? 1 : 2, screen.ExitCode);
    }

    private void MakePipe()
    {
        try
        {
            using Process made = Process.Start("mkfifo", [shop.PathOf("pipe.yaml")]);
            made.WaitForExit();
        }
        catch (System.ComponentModel.Win32Exception)
        {
            Assert.Skip("there is no mkfifo on this machine");
        }
    }

    private (int ExitCode, string Error) Run(Exception fault, string[] arguments)
    {
        using StringWriter error = new() { NewLine = "\n" };
        using BrokenWriter output = new(fault);
        int code = CommandLine.Run(arguments, new Terminal
        {
            Out = output, Error = error, Ink = Ink.None, IsWatched = false, Folder = shop.Folder, Clock = TimeProvider.System,
        });
        return (code, error.ToString());
    }

    /// <summary>Standard output that cannot be written to.</summary>
    private sealed class BrokenWriter(Exception fault) : StringWriter
    {
        public override void Write(char value) => throw fault;

        public override void Write(string? value) => throw fault;

        public override void Write(char[] buffer, int index, int count) => throw fault;
    }
}
