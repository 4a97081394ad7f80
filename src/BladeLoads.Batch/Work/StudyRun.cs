using System.Collections.Concurrent;
using System.Collections.Immutable;
using BladeLoads.Batch.Logs;
using BladeLoads.Batch.Queue;
using BladeLoads.Results.Publishing;
using BladeLoads.Studies;
using Serilog;

namespace BladeLoads.Batch.Work;

/// <summary>What came of a run.</summary>
/// <param name="Outcomes">One a case, by its name.</param>
/// <param name="NoRoom">Why nothing more could be written, in one line; null where all could.</param>
/// <param name="Faults">Faults of ours outside any case.</param>
public sealed record RunResult(ImmutableSortedDictionary<string, CaseOutcome> Outcomes, string? NoRoom, ImmutableArray<Exception> Faults)
{
    public int NotRun => Outcomes.Values.Count(o => o is CaseOutcome.NotRun);

    public int Solved => Outcomes.Values.Count(o => o is CaseOutcome.Solved);

    /// <summary>Cases that a result was there for already.</summary>
    public int Reused => Outcomes.Values.Count(o => o is CaseOutcome.Reused);

    public int Failed => Outcomes.Values.Count(o => o is CaseOutcome.Failed);
}

/// <summary>Solves cases of a study with several workers.</summary>
public static class StudyRun
{
    /// <summary>Returns when every case is solved, has failed, or was left because the run was stopped or nothing more could be written.</summary>
    /// <param name="workers">1 or more.</param>
    /// <param name="stopping">No case is begun after; those under way are given up between two points.</param>
    public static RunResult Solve(
        IReadOnlyCollection<StudyCase> cases, CaseWork work, int workers, RunProgress progress, ILogger log, CancellationToken stopping)
    {
        var byName = cases.ToDictionary(c => c.Name, StringComparer.Ordinal);
        var outcomes = new ConcurrentDictionary<string, CaseOutcome>(StringComparer.Ordinal);
        using var ending = CancellationTokenSource.CreateLinkedTokenSource(stopping);
        string? noRoom = null;

        var jobs = CaseGroups.Of(cases.Select(c => (c.Name, CaseGroups.Estimate(c))), workers);
        log.Information("Run of {Cases} cases in {Jobs} jobs with {Workers} workers", cases.Count, jobs.Length, workers);
        var faults = CaseWorkers.Run(jobs, workers, name =>
        {
            var studyCase = byName[name];
            try
            {
                outcomes[name] = work.Do(studyCase, ending.Token);
            }
            catch (NoRoomForResultsException e)
            {
                outcomes[name] = new CaseOutcome.NotRun();
                Interlocked.CompareExchange(ref noRoom, e.Message, null);
                ending.Cancel();
            }
            if (outcomes[name] is not CaseOutcome.NotRun)
                progress.CaseEnded(CaseGroups.Estimate(studyCase), (outcomes[name] as CaseOutcome.Solved)?.RotorSolves ?? 0);
        });

        foreach (var name in byName.Keys)
            outcomes.TryAdd(name, new CaseOutcome.NotRun());
        var result = new RunResult(outcomes.ToImmutableSortedDictionary(StringComparer.Ordinal), noRoom, faults);
        log.Information(
            "Run ended: {Solved} solved, {Failed} failed, {NotRun} not run", result.Solved, result.Failed, result.NotRun);
        foreach (var fault in faults)
            log.Fault(fault);
        return result;
    }
}
