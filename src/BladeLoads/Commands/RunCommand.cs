using System.Collections.Immutable;
using BladeLoads.Batch.Logs;
using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Plan.Index;
using BladeLoads.Batch.Queue;
using BladeLoads.Batch.Sharing;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Tables;
using BladeLoads.Rotor.Operation;
using BladeLoads.Screen;
using BladeLoads.Studies;

namespace BladeLoads.Commands;

/// <param name="Path">A study's folder, or a case file.</param>
/// <param name="All">Solve current cases too.</param>
internal sealed record RunRequest(string Path, string Results, int Workers, string[] Only, bool All, bool Quiet);

/// <summary><c>bladeloads run</c>: solves what is not current and shows the summary.</summary>
internal static class RunCommand
{
    private const int TablesShown = 6;

    public static int Run(RunRequest request, Surroundings surroundings)
    {
        using var signals = new StopSignals(surroundings);
        var study = AskedStudy.Read(request.Path, surroundings);
        FindingLines.Write(study.Asked, surroundings.Error, withSource: surroundings.ErrorIsTerminal);
        var results = new ResultsFolder(Path.GetFullPath(request.Results), study.Asked.Name);
        var look = new StudyLook(results, CommandLine.ToolVersion, SolverVersion.Number, surroundings.Time);
        var (wholePlan, plan) = study.Plan(look, request.Only);
        if (NothingMeant.Tell(plan, study.Asked, request.Only, surroundings))
            return ExitCode.NothingCouldRun;
        if (plan.Cases.IsEmpty)
        {
            surroundings.Error.WriteLine(FindingLines.Closing(study.Asked));
            return ExitCode.NothingCouldRun;
        }

        var due = plan.Cases.Where(c => request.All || c.IsDue).Select(c => c.Case).ToImmutableArray();
        if (!request.Quiet)
            surroundings.Out.WriteLine(due.IsEmpty ? PlanLines.AllCurrent(plan) : PlanLines.Summary(plan, request.All));

        if (due.IsEmpty)
        {
            Publisher.TidyIfPossible(results, surroundings.Disk);
            Claims.TidyIfPossible(results, surroundings.Disk);
        }
        using var publisher = new PublisherWhenNeeded(results, surroundings.Disk);
        var changes = RunChanges.Before(wholePlan, due.Select(c => c.Name), results);
        if (!due.IsEmpty)
            changes.Remember(publisher.Get());
        var run = due.IsEmpty ? NothingRun : Solve(due, request, results, publisher, plan, signals, surroundings);
        // Another run may have been at work meanwhile on cases that this one was not asked for.
        var othersAreDue = !due.IsEmpty && wholePlan.Cases.Any(c => c.IsDue && !run.Outcomes.ContainsKey(c.Case.Name));
        var rows = StudySummary.Rows(othersAreDue ? study.Plan(look, request.Only).Whole : wholePlan, run.Outcomes);
        var shown = RowsOf(plan, rows);
        var summary = SummaryTable.Write(rows, study.Whole.Baseline);
        if (run.NoRoom is null)
            StudySummary.Publish(summary, results, publisher.Get);
        var moved = run.NoRoom is null && !changes.IsEmpty ? changes.Compare(run.Outcomes) : [];
        if (run.NoRoom is null && !changes.IsEmpty)
            changes.Publish(moved, run.Outcomes, publisher.Get());
        if (run.NoRoom is null && !due.IsEmpty)
            look.LookAfterRun(study.Whole);
        if (run.SolvedByAnother > 0 && !request.Quiet)
            surroundings.Out.WriteLine($"{Count.Of(run.SolvedByAnother, "case")} solved by another run");
        if (run.NoRoom is null && !request.Quiet)
        {
            SummaryLines.Write(shown, BaselineOf(study.Whole, rows), results.Study, surroundings.ScreenWidth(), surroundings.Out);
            if (moved.Any(c => c is not CaseComparison.NotCompared { Reason: NoComparison.NoEarlierResult }))
                ChangeLines.Write(moved, ChangesOf(results, surroundings), surroundings.Out);
        }
        // After all is on the screen: a report that cannot be written hides nothing else.
        if (run.NoRoom is null && run.Faults.IsEmpty)
            StudyReportFile.Publish(rows, summary, study.Whole, results, CommandLine.ToolVersion, !run.Outcomes.IsEmpty, publisher.Get);
        return Tell(run, shown, study.Asked, signals, surroundings);
    }

    private static ChangesShown ChangesOf(ResultsFolder results, Surroundings surroundings) => new(
        "what moved, % of the result before", 0, TablesShown, !surroundings.OutIsTerminal, results.Changes, $"changes: {results.Changes}");

    private static RunResult NothingRun { get; } = new(ImmutableSortedDictionary<string, CaseOutcome>.Empty, null, []);

    private static RunResult Solve(
        ImmutableArray<StudyCase> due, RunRequest request, ResultsFolder results, PublisherWhenNeeded publisher, StudyPlan plan,
        StopSignals signals, Surroundings surroundings)
    {
        var screen = new ScreenLog(surroundings.Error);
        publisher.Get();   // a folder that cannot be written to is told before a log file in it is tried
        // Where results cannot be written either, that alone is told.
        string? logTrouble = null;
        var log = RunLog.Open(results.Logs, screen, surroundings.Time, line => logTrouble = line);
        var identity = new RunIdentity(SolverVersion.Number, CommandLine.ToolVersion);
        var reuse = request.All ? null : new CaseReuse(plan, results, publisher.Get(), surroundings.Disk, identity);
        var work = new CaseWork(
            surroundings.Solve, publisher.Get(), results, identity, log.Logger, surroundings.Time, surroundings.WaitForFile, reuse);
        var progress = new RunProgress(due.Length, due.Sum(c => CaseGroups.Estimate(c)), surroundings.Time);
        using var claims = new Claims(results, surroundings.Disk);
        RunResult Run() => StudyRun.Solve(due, AgainOf(plan, request), work, claims, request.Workers, progress, log.Logger, signals.Stopping);
        RunResult Shown() => request.Quiet ? Run()
            : surroundings.ErrorIsTerminal ? ProgressBar.Show(Run, progress, screen)
            : PlainProgress.Show(Run, progress, request.Workers, surroundings.Error, surroundings.Time);
        var run = NothingRun;
        try
        {
            run = Shown();
        }
        catch (Exception e)
        {
            log.Logger.Fault(e);
            run = NothingRun with { Faults = [e] };
        }
        log.Dispose();
        if (logTrouble is not null && run.NoRoom is null)
            screen.Line(logTrouble);
        return run;
    }

    private static Again AgainOf(StudyPlan plan, RunRequest request) => new(
        [.. plan.Cases.Where(c => c.State is CaseState.Current or CaseState.Retitled).Select(c => c.Case.Name)], request.All);

    private static ImmutableArray<SummaryRow> RowsOf(StudyPlan plan, ImmutableArray<SummaryRow> rows)
    {
        var names = plan.Cases.Select(c => c.Case.Name).Concat(plan.Rejected).ToHashSet(StringComparer.Ordinal);
        return [.. rows.Where(r => names.Contains(r.Case))];
    }

    private static SummaryRow? BaselineOf(Study study, ImmutableArray<SummaryRow> rows)
        => study.Baseline is null ? null : rows.FirstOrDefault(r => r.Case == study.Baseline);

    private static int Tell(
        RunResult run, ImmutableArray<SummaryRow> rows, Study study, StopSignals signals, Surroundings surroundings)
    {
        if (!run.Faults.IsEmpty)
            return ExitCode.Fault;   // told by the log
        if (run.NoRoom is not null)
        {
            surroundings.Error.WriteLine($"{run.NoRoom}; {Count.Of(run.NotRun, "case")} not run");
            return ExitCode.NoRoom;
        }
        if (signals.Code is { } code)
        {
            surroundings.Error.WriteLine(
                $"stopped: {Count.Of(run.Solved, "case")} solved, {run.NotRun} not run; the same command goes on from here");
            return code;
        }
        if (!study.Errors.IsEmpty)
            surroundings.Error.WriteLine(FindingLines.Closing(study));
        var allGood = run.Failed == 0 && run.NotRun == 0 && study.Errors.IsEmpty
            && rows.All(r => r.State == "current" && r.Summary is { UnbalancedPoints: 0 });
        return allGood ? ExitCode.Good : ExitCode.SomeNotGood;
    }

    /// <summary>Opens the results folder for writing when there is something to write: looking at current results needs no permission.</summary>
    private sealed class PublisherWhenNeeded(ResultsFolder results, IDisk disk) : IDisposable
    {
        private Publisher? _publisher;

        public Publisher Get() => _publisher ??= Publisher.Open(results, disk);

        public void Dispose() => _publisher?.Dispose();
    }
}
