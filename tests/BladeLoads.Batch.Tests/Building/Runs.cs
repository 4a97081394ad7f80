using BladeLoads.Batch.Queue;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Publishing;
using BladeLoads.Studies;
using Serilog;
using Serilog.Core;

namespace BladeLoads.Batch.Tests.Building;

/// <summary>Runs cases with an invented solver.</summary>
internal static class Runs
{
    public static ResultsFolder Results(TemporaryFolder folder) => new(folder.Path, "fell");

    public static RunResult Solve(
        ResultsFolder results, IReadOnlyCollection<StudyCase> cases, SolveCase? solve = null, int workers = 2, IDisk? disk = null,
        ILogger? log = null, Action<int>? waitForFile = null, int solverVersion = 1, CancellationToken stopping = default)
    {
        using var publisher = Publisher.Open(results, disk ?? new Disk());
        var logger = log ?? Logger.None;
        var work = new CaseWork(
            solve ?? ((rotor, _) => FellRotor.Curve(rotor)), publisher, results, new RunIdentity(solverVersion, "0.0.0"), logger,
            TimeProvider.System, waitForFile ?? (_ => { }));
        var progress = new RunProgress(cases.Count, cases.Sum(c => CaseGroups.Estimate(c)), TimeProvider.System);
        return StudyRun.Solve(cases, work, workers, progress, logger, stopping);
    }
}
