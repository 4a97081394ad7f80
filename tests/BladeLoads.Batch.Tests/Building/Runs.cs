using BladeLoads.Batch.Queue;
using BladeLoads.Batch.Sharing;
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

    /// <param name="again">Left out: what is current is solved all the same.</param>
    public static RunResult Solve(
        ResultsFolder results, IReadOnlyCollection<StudyCase> cases, SolveCase? solve = null, int workers = 2, IDisk? disk = null,
        ILogger? log = null, Action<int>? waitForFile = null, int solverVersion = 1, Again? again = null,
        Action<CancellationToken>? pause = null, CancellationToken stopping = default)
    {
        using var publisher = Publisher.Open(results, disk ?? new Disk());
        var logger = log ?? Logger.None;
        var work = new CaseWork(
            solve ?? ((rotor, _) => FellRotor.Curve(rotor)), publisher, results, new RunIdentity(solverVersion, "0.0.0"), logger,
            TimeProvider.System, waitForFile ?? (_ => { }));
        var progress = new RunProgress(cases.Count, cases.Sum(c => CaseGroups.Estimate(c)), TimeProvider.System);
        using var claims = new Claims(results, disk ?? new Disk());
        return StudyRun.Solve(cases, again ?? new Again([.. cases.Select(c => c.Name)], Lost: false), work, claims, workers, progress, logger, stopping, pause);
    }
}
