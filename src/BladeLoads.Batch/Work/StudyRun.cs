using System.Collections.Immutable;
using BladeLoads.Batch.Logs;
using BladeLoads.Batch.Queue;
using BladeLoads.Batch.Sharing;
using BladeLoads.Studies;
using Serilog;

namespace BladeLoads.Batch.Work;

/// <summary>Solves cases of a study with several workers, and with other runs that are at work on the same study.</summary>
public static class StudyRun
{
    /// <summary>
    /// Returns when every case is solved, by this run or another, has failed, or was left because the run was stopped or nothing more
    /// could be written.
    /// </summary>
    /// <param name="workers">1 or more.</param>
    /// <param name="stopping">No case is begun after; those under way are given up between two points.</param>
    /// <param name="pause">Waits before a case that another run has is looked at again; a tenth of a second where it is left out.</param>
    public static RunResult Solve(
        IReadOnlyCollection<StudyCase> cases, Again again, CaseWork work, Claims claims, int workers, RunProgress progress, ILogger log,
        CancellationToken stopping, Action<CancellationToken>? pause = null)
    {
        var jobs = CaseGroups.Of(cases.Select(c => (c.Name, CaseGroups.Estimate(c))), workers);
        log.Information("Run of {Cases} cases in {Jobs} jobs with {Workers} workers", cases.Count, jobs.Length, workers);
        using var shared = new SharedWork(cases, again, work, claims, progress, log, stopping);
        var faults = CaseWorkers.Run(jobs, workers, shared.DoJob);
        try
        {
            shared.DoTheRest(pause ?? (token => token.WaitHandle.WaitOne(TimeSpan.FromMilliseconds(100))));
        }
        catch (Exception e)
        {
            faults = faults.Add(e);
        }
        var result = new RunResult(shared.Outcomes(), shared.NoRoom, faults);
        log.Information(
            "Run ended: {Solved} solved, {SolvedByAnother} solved by another run, {Failed} failed, {NotRun} not run",
            result.Solved, result.SolvedByAnother, result.Failed, result.NotRun);
        foreach (var fault in faults)
            log.Fault(fault);
        return result;
    }
}

/// <summary>What a run does over that it need not.</summary>
/// <param name="Current">Names of the cases whose result was current when the run was planned.</param>
/// <param name="Lost">Whether cases are tried that lost their process too often.</param>
public sealed record Again(ImmutableHashSet<string> Current, bool Lost)
{
    public static Again Nothing { get; } = new([], false);
}
