using System.Diagnostics;
using System.Text.Json;
using BandSpec.Cli;
using BandSpec.Cli.Drafting;
using BandSpec.Cli.Printing;
using BandSpec.Core.Bands;
using BandSpec.Core.Deciding;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Files.Json;
using Xunit;

namespace BandSpec.Tests.Cli;

/// <summary>Ctrl-C in the middle of a search: exit code 1, the best plan so far kept, nothing claimed that was not proven.</summary>
public sealed class StoppedRuns : IDisposable
{
    private const string File = "brine-reinjection.yaml";

    private readonly Desk desk = new();

    /// <summary>69 candidate temperatures, 14 million plans: many seconds of search on any machine of today.</summary>
    public StoppedRuns() => desk.Change(
        File, "candidate-step: 5 K, temperatures: 3, separation: 15 K, reach: 15 K, objective: least-cost",
        "candidate-step: 2.5 K, temperatures: 3..6, separation: 15 K, reach: 15 K, objective: least-error");

    public void Dispose() => desk.Dispose();

    [Fact]
    public void A_draft_that_is_stopped_keeps_its_best_plan_and_says_how_far_it_got()
    {
        (int code, string output, string error) = desk.RunStoppedSoon("draft", File);

        Assert.Equal(1, code);
        Assert.Contains("not proven: the search was stopped when ", output, StringComparison.Ordinal);
        Assert.Matches("^bandspec: HV-3107-A: stopped when [0-9,]+ of [0-9,]+ plans were decided or discarded; its package holds the best plan so far, marked as not proven\n$", error);
        Assert.False(Result().GetProperty("plan").GetProperty("proven").GetBoolean());
        Assert.Contains("best plan found, not proven", System.IO.File.ReadAllText(desk.At("out/HV-3107-A/specification.md")), StringComparison.Ordinal);
        Assert.Contains("The draft was stopped before the decision rules were compared", desk.Text("out/HV-3107-A/specification.md"), StringComparison.Ordinal);
    }

    [Fact]
    public void A_package_that_was_stopped_is_neither_verified_nor_up_to_date_nor_released()
    {
        desk.RunStoppedSoon("draft", File);
        (int verified, string told, _) = desk.Run("verify", "out/HV-3107-A");
        Assert.Equal(1, verified);
        Assert.Contains("its draft was stopped before its end, so that it cannot be made again; draft it once more", told, StringComparison.Ordinal);
        Assert.DoesNotContain("up to date", desk.RunStoppedSoon("draft", File).Out, StringComparison.Ordinal);
        Assert.Equal((1, "", "bandspec: stopped; nothing was written\n"), desk.RunStoppedSoon("release", File, "--by", "N. Aas"));
        Assert.False(System.IO.File.Exists(desk.At("releases.json")));
    }

    [Fact]
    public void Stopped_without_a_plan_that_fits_it_does_not_say_that_there_is_none()
    {
        desk.Change(File, "safety-factor: 1.15", "safety-factor: 2.3");
        desk.Change(File, "objective: least-error", "objective: most-margin");
        (int code, string output, _) = desk.RunStoppedSoon("draft", File);
        string document = System.IO.File.ReadAllText(desk.At("out/HV-3107-A/specification.md"));

        Assert.Equal(1, code);
        Assert.Contains("NO PLAN FOUND  margin 0.", output, StringComparison.Ordinal);
        Assert.Contains("NO PLAN FOUND", document, StringComparison.Ordinal);
        Assert.Contains("The search was stopped before it was proven whether a compensation plan keeps the allowed error", document, StringComparison.Ordinal);
        Assert.DoesNotContain("NOT FEASIBLE", output + document, StringComparison.Ordinal);
    }

    [Fact]
    public void Of_several_requirements_those_not_begun_are_left()
    {
        desk.Write("second.yaml", System.IO.File.ReadAllText(desk.At(File)).Replace("HV-3107", "HV-3108", StringComparison.Ordinal));
        (int code, string output, _) = desk.RunStopped("draft", File, "second.yaml");

        Assert.Equal(1, code);
        Assert.Contains("2 stopped", output, StringComparison.Ordinal);
        Assert.False(Directory.Exists(desk.At("out")));
    }

    [Fact]
    public void A_search_that_is_stopped_in_its_middle_has_a_plan_of_its_candidates()
    {
        Application application = Given.Application(Given.Requirement with
        {
            Compensation = Given.Requirement.Compensation with { CandidateStep = Given.K(2.5), Objective = PlanObjective.LeastError, MostTemperatures = 5 },
        });
        using CancellationTokenSource stop = new();
        Specification specification = SpecificationDraft.Draft(application, new StopAt(20_000, stop), cancellation: stop.Token);

        Assert.True(stop.IsCancellationRequested);
        Assert.False(specification.IsComplete);
        Assert.InRange(specification.Choice.PlansDecided + specification.Choice.PlansDiscarded, 20_000, specification.Choice.PlansConsidered - 1);
        Assert.True(ContinuousMargin.AllOf(application, specification.Choice.Plan).Min(r => r.Margin) >= 1);
    }

    [Fact]
    public void Fronts_that_are_stopped_are_those_of_the_cheaper_plans()
    {
        Application application = Given.Application(Given.Requirement with { SafetyFactor = 1.8 });
        Tradeoff whole = Tradeoff.Of(application);
        using CancellationTokenSource stop = new();
        Tradeoff part = Tradeoff.Of(application, new StopAt(whole.PlansConsidered / 2, stop), stop.Token);

        Assert.False(part.Proven);
        Assert.NotNull(part.MarginCompleteTo);
        Assert.Null(part.RmsErrorCompleteTo);
        Assert.Equal(
            whole.ByMargin.Where(p => p.CostPerUnit <= part.MarginCompleteTo + 1e-9).Select(p => (p.CostPerUnit, p.Margin)),
            part.ByMargin.Select(p => (p.CostPerUnit, p.Margin)));
    }

    [Fact]
    public void Decision_rules_and_gains_that_were_not_come_to_are_left_out_and_named()
    {
        Application application = Given.Application(Given.Requirement with { Compensation = Given.Requirement.Compensation with { CandidateStep = Given.K(20) } });
        Specification whole = SpecificationDraft.Draft(application, extras: DraftExtras.Decisions);
        Specification stopped = SpecificationDraft.Draft(application, extras: DraftExtras.Decisions | DraftExtras.Gains, cancellation: new CancellationToken(canceled: true));

        Assert.Equal((true, DraftExtras.None), (whole.IsComplete, whole.LeftOut));
        Assert.Equal((false, DraftExtras.Decisions | DraftExtras.Gains), (stopped.IsComplete, stopped.LeftOut));
        Assert.Equal((null, null), (stopped.Decisions, stopped.Gains));
        Specification late = whole with { Decisions = null, LeftOut = DraftExtras.Decisions };
        ReadOnlyMemory<byte> result = ResultJson.Write(late);
        Assert.Equal(["decisions"], JsonDocument.Parse(result).RootElement.GetProperty("left-out").EnumerateArray().Select(part => part.GetString()!));
        Assert.False(Verdict.Read(result)!.Proven);
        Assert.EndsWith("stopped when its plan was proven; its package leaves out the decision rules", ProofWords.Stopped(late), StringComparison.Ordinal);
        Assert.True(Verdict.Read(ResultJson.Write(whole))!.Proven);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(5)]
    [InlineData(40)]
    public void The_comparison_of_rules_ends_when_it_is_asked_to(int milliseconds)
    {
        Application application = Given.Application(Given.Requirement with { Compensation = Given.Requirement.Compensation with { CandidateStep = Given.K(20) } });
        Specification whole = SpecificationDraft.Draft(application);
        using CancellationTokenSource stop = new();
        if (milliseconds == 0)
            stop.Cancel();
        else
            stop.CancelAfter(milliseconds);
        // A fast machine may come to the end once or twice; what counts is that nothing else is thrown, from whichever thread.
        Assert.ThrowsAny<OperationCanceledException>((Action)(() =>
        {
            for (int round = 0; round < 1000; round++)
                DecisionComparison.Of(application, whole.Choice.Plan, whole.Bands, whole.Allocation, stop.Token);
        }));
        Assert.Throws<OperationCanceledException>(() => MarginGain.AllOf(application, whole.Choice.Plan, stop.Token));
    }

    [Fact]
    public void Rules_that_were_not_compared_to_the_end_are_not_shown() =>
        Assert.Equal((1, "", "bandspec: stopped; nothing was written\n"), desk.RunStopped("rules", File));

    /// <summary>
    /// A real process and a real signal. The search takes a minute and more; a process that was too slow to listen when the signal came is ended by
    /// it, as it should be, and is tried again with more patience.
    /// </summary>
    [Fact]
    public void A_process_that_gets_the_signal_ends_with_its_best_so_far()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "signals are sent with kill");
        (int code, string output, string error) = Signalled(TimeSpan.FromSeconds(2));
        for (int patience = 4; code > 128 && patience < 60; patience *= 2)
            (code, output, error) = Signalled(TimeSpan.FromSeconds(patience));

        Assert.Equal(1, code);
        Assert.Contains("not proven: the search was stopped when ", output, StringComparison.Ordinal);
        Assert.StartsWith("bandspec: HV-3107-A: stopped when ", error, StringComparison.Ordinal);
        Assert.False(Result().GetProperty("plan").GetProperty("proven").GetBoolean());
    }

    private (int ExitCode, string Out, string Error) Signalled(TimeSpan after)
    {
        ProcessStartInfo start = new("dotnet") { WorkingDirectory = desk.Folder, RedirectStandardOutput = true, RedirectStandardError = true };
        foreach (string argument in new[] { typeof(CommandLine).Assembly.Location, "draft", File })
            start.ArgumentList.Add(argument);
        using Process run = Process.Start(start)!;
        Task<string> output = run.StandardOutput.ReadToEndAsync(TestContext.Current.CancellationToken);
        Task<string> error = run.StandardError.ReadToEndAsync(TestContext.Current.CancellationToken);
        Assert.False(run.WaitForExit(after), "the search was over before it could be stopped");
        using (Process kill = Process.Start("kill", ["-INT", run.Id.ToString(System.Globalization.CultureInfo.InvariantCulture)]))
            kill.WaitForExit();
        run.WaitForExit();
        return (run.ExitCode, output.Result, error.Result);
    }

    private JsonElement Result() => JsonDocument.Parse(System.IO.File.ReadAllText(desk.At("out/HV-3107-A/result.json"))).RootElement;

    /// <summary>Stops a search when it has come so far.</summary>
    private sealed class StopAt(long plans, CancellationTokenSource stop) : IProgress<SearchProgress>
    {
        public void Report(SearchProgress value)
        {
            if (value.Done >= plans)
                stop.Cancel();
        }
    }
}
