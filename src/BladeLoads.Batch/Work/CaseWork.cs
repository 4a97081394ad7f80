using System.Collections.Concurrent;
using BladeLoads.Batch.Logs;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Tables;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;
using Serilog;

namespace BladeLoads.Batch.Work;

/// <summary>The physics, as the batch knows it.</summary>
public delegate PowerCurve SolveCase(RotorCase rotorCase, CancellationToken cancellation);

/// <summary>
/// Solves one case and puts its result in its place: tables, log and receipt. What goes wrong with it stays with it. It is done only
/// when it is settled too, which serves several cases at once.
/// </summary>
/// <param name="reuse">Looks for a result that is there already; null to solve whatever is asked for.</param>
/// <param name="waitForFile">Waits between two tries at a file in use; the argument counts the tries made, from 1.</param>
public sealed class CaseWork(
    SolveCase solve, Publisher publisher, ResultsFolder results, RunIdentity identity, ILogger runLog, TimeProvider time,
    Action<int> waitForFile, CaseReuse? reuse = null)
{
    private readonly ConcurrentDictionary<string, bool> _tablesKept = new(StringComparer.Ordinal);

    private const int TriesAtABusyFile = 4;

    /// <exception cref="NoRoomForResultsException">Nothing more can be written; the case counts as not run.</exception>
    public CaseOutcome Do(StudyCase studyCase, CancellationToken stopping)
    {
        using var log = new CaseLog(runLog, studyCase.Name);
        try
        {
            stopping.ThrowIfCancellationRequested();
            CaseOutcome outcome = Reuse(studyCase, log) as CaseOutcome ?? SolveAndPublish(studyCase, log, stopping);
            publisher.Remove(results.Failure(studyCase.Name));
            return outcome;
        }
        catch (OperationCanceledException) when (stopping.IsCancellationRequested)
        {
            return new CaseOutcome.NotRun();
        }
        catch (Exception e) when (DiskTrouble.StopsTheRun(e))
        {
            throw NoRoom(e);
        }
        // Whatever it is, it must not take the neighbours of this case with it.
        catch (Exception e)
        {
            return Fail(studyCase, e, log);
        }
    }

    /// <summary>Returns when all results that were put in place before would survive a power cut.</summary>
    /// <exception cref="NoRoomForResultsException">They would not, and nothing more can be written.</exception>
    public void Settle()
    {
        try
        {
            WithPatience(publisher.Settle);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw NoRoom(e);
        }
    }

    /// <summary>What is to be told where nothing more can be written.</summary>
    public NoRoomForResultsException NoRoom(Exception trouble) => new(results.Study, trouble);

    /// <summary>Has a case failed without trying it.</summary>
    /// <param name="reason">One sentence, fit for a terminal.</param>
    /// <exception cref="NoRoomForResultsException">Nothing more can be written.</exception>
    public CaseOutcome.Failed GiveUp(StudyCase studyCase, string reason)
    {
        using var log = new CaseLog(runLog, studyCase.Name);
        return Fail(studyCase, reason, null, log);
    }

    /// <summary>The receipt of the whole result, made from these values by this solver, that lies in the case's place; null for none.</summary>
    public Receipt? FindResult(StudyCase studyCase)
    {
        var folder = results.Case(studyCase.Name);
        return ReceiptFile.Read(folder) is ReceiptReading.Readable { Receipt: var receipt }
            && receipt.Fingerprint == studyCase.Fingerprint && receipt.SolverVersion == identity.SolverVersion
            && ResultCheck.IsWhole(folder, receipt) ? receipt : null;
    }

    private CaseOutcome.Reused? Reuse(StudyCase studyCase, CaseLog log)
    {
        if (reuse?.Try(studyCase) is not { } outcome)
            return null;
        TableArchive.Keep(studyCase.Tables, results, publisher, _tablesKept);
        log.Logger.Reused(studyCase, outcome.From);
        return outcome;
    }

    private CaseOutcome.Solved SolveAndPublish(StudyCase studyCase, CaseLog log, CancellationToken stopping)
    {
        var started = time.GetTimestamp();
        log.Logger.Read(studyCase);
        var curve = solve(studyCase.Rotor, stopping);
        var further = FurtherWork.Of(studyCase, curve, solve, stopping);
        var summary = further.Complete(CaseSummary.Of(curve));
        log.Logger.Balanced(studyCase, curve);
        List<ResultContent> files = [new(CurveTable.FileName, CurveTable.Write(curve, further.MeanPower))];
        if (SpanwiseTable.Write(curve, studyCase.Spanwise) is { } spanwise)
            files.Add(new(SpanwiseTable.FileName, spanwise));
        files.AddRange(further.Tables(studyCase, curve));
        var seconds = time.GetElapsedTime(started).TotalSeconds;
        log.Logger.Solved(studyCase, summary, seconds);
        files.Add(new(CaseLog.FileName, log.ToBytes()));
        files.Add(new(Receipt.FileName, ReceiptFile.Write(ReceiptOf(studyCase, summary, files, seconds))));
        WithPatience(() => TableArchive.Keep(studyCase.Tables, results, publisher, _tablesKept));
        WithPatience(() => publisher.Place(studyCase.Name, files));
        return new CaseOutcome.Solved(summary, curve.RotorSolves + further.RotorSolves);
    }

    private Receipt ReceiptOf(StudyCase studyCase, CaseSummary summary, IEnumerable<ResultContent> files, double seconds) => new(
        Receipt.CurrentFormat, results.StudyName, studyCase.Name, studyCase.Title, studyCase.Fingerprint, identity.SolverVersion,
        identity.ToolVersion, time.GetUtcNow(), seconds, studyCase.Values, studyCase.Inputs,
        [.. files.Select(file => ResultFile.Of(file.Name, file.Bytes.Span))], summary, Caution.Text);

    private CaseOutcome.Failed Fail(StudyCase studyCase, Exception trouble, CaseLog log)
    {
        var isOfTheDisk = trouble is IOException or UnauthorizedAccessException;
        var reason = isOfTheDisk
            ? $"its result cannot be written: {DiskTrouble.Reason(trouble)}"
            : $"fault in BladeLoads, please report: {Printable.Of(trouble.Message)}";
        return Fail(studyCase, reason, isOfTheDisk ? null : trouble, log);
    }

    private CaseOutcome.Failed Fail(StudyCase studyCase, string reason, Exception? details, CaseLog log)
    {
        log.Logger.Failed(studyCase, reason, details);
        var record = new FailureRecord(
            studyCase.Name, studyCase.Title, studyCase.Fingerprint, identity.SolverVersion, time.GetUtcNow(), reason, log.Lines);
        try
        {
            WithPatience(() => publisher.PublishFile(results.Failure(studyCase.Name), ReceiptFile.Write(record)));
        }
        catch (Exception e) when (DiskTrouble.StopsTheRun(e))
        {
            throw NoRoom(e);
        }
        catch (IOException e)
        {
            log.Logger.Warning("Case {Case}: its failure could not be recorded: {Reason}", studyCase.Name, DiskTrouble.Reason(e));
        }
        return new CaseOutcome.Failed(reason);
    }

    // Only a file in use is worth another try: a bad table stays bad.
    private void WithPatience(Action publish)
    {
        for (var tries = 1; ; tries++)
        {
            try
            {
                publish();
                return;
            }
            catch (IOException e) when (tries < TriesAtABusyFile && DiskTrouble.IsBusy(e))
            {
                waitForFile(tries);
            }
        }
    }
}

/// <summary>What of the program itself a receipt names.</summary>
public sealed record RunIdentity(int SolverVersion, string ToolVersion);
