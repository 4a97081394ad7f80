using System.Collections.Concurrent;
using System.Collections.Immutable;
using BladeLoads.Batch.Logs;
using BladeLoads.Batch.Queue;
using BladeLoads.Batch.Sharing;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Studies;
using Serilog;

namespace BladeLoads.Batch.Work;

/// <summary>
/// The cases of a run, of which other runs may be solving some. Each is claimed before it is solved. What another run has, and what
/// was lost with its process before, comes last and alone: so a case that kills its process takes no neighbour with it twice.
/// </summary>
internal sealed class SharedWork : IDisposable
{
    /// <summary>So often may a process be lost with a case before it is tried no more.</summary>
    public const int MostLostAttempts = 3;

    public const string LostReason =
        "its process was lost three times while solving it; it is tried again when one of its values changes, or with --all";

    // At a tenth of a second each.
    private const int PausesBeforeItIsTold = 20;

    private readonly Dictionary<string, StudyCase> _cases;
    private readonly ImmutableDictionary<string, DateTimeOffset> _before;
    private readonly bool _triesLostOnes;
    private readonly CaseWork _work;
    private readonly Claims _claims;
    private readonly RunProgress _progress;
    private readonly ILogger _log;
    private readonly CancellationTokenSource _ending;
    private readonly ConcurrentDictionary<string, CaseOutcome> _outcomes = new(StringComparer.Ordinal);
    private readonly ConcurrentBag<(StudyCase Case, int LostAttempts)> _later = [];
    private string? _noRoom;

    public SharedWork(
        IEnumerable<StudyCase> cases, Again again, CaseWork work, Claims claims, RunProgress progress, ILogger log,
        CancellationToken stopping)
    {
        _cases = cases.ToDictionary(c => c.Name, StringComparer.Ordinal);
        _before = again.Current
            .Where(_cases.ContainsKey)
            .Select(name => (Name: name, Receipt: work.FindResult(_cases[name])))
            .Where(found => found.Receipt is not null)
            .ToImmutableDictionary(found => found.Name, found => found.Receipt!.SolvedAt, StringComparer.Ordinal);
        _triesLostOnes = again.Lost;
        (_work, _claims, _progress, _log) = (work, claims, progress, log);
        _ending = CancellationTokenSource.CreateLinkedTokenSource(stopping);
    }

    /// <summary>Why nothing more could be written, in one line.</summary>
    public string? NoRoom => _noRoom;

    /// <summary>One a case; what has none yet was not run.</summary>
    public ImmutableSortedDictionary<string, CaseOutcome> Outcomes()
        => _cases.Keys.ToImmutableSortedDictionary(
            name => name, name => _outcomes.GetValueOrDefault(name) ?? new CaseOutcome.NotRun(), StringComparer.Ordinal);

    /// <summary>Solves the cases of a job that nobody else has, one after the other, and settles them together.</summary>
    public void DoJob(IReadOnlyList<string> names)
    {
        var placed = new List<PlacedCase>();
        try
        {
            foreach (var name in names)
                if (Try(_cases[name], placed, isLast: false) is { } later)
                    _later.Add((_cases[name], later.LostAttempts));
        }
        finally
        {
            Settle(placed);
        }
    }

    /// <summary>Sees to the cases that came to nothing in their jobs, and waits for those that another run is solving.</summary>
    public void DoTheRest(Action<CancellationToken> pause)
    {
        var rest = _later.OrderBy(c => c.LostAttempts).ThenBy(c => c.Case.Name, StringComparer.Ordinal).Select(c => c.Case).ToList();
        for (var pauses = 0; rest.Count > 0;)
        {
            var remaining = rest.Where(IsStillElsewhere).ToList();
            if (remaining.Count > 0 && remaining.Count == rest.Count)
            {
                if (++pauses == PausesBeforeItIsTold)
                    foreach (var waiting in remaining)
                        _log.WaitsForAnother(waiting, _claims.HolderOf(waiting.Name));
                pause(_ending.Token);
            }
            rest = remaining;
        }
    }

    public void Dispose() => _ending.Dispose();

    private bool IsStillElsewhere(StudyCase studyCase)
    {
        var placed = new List<PlacedCase>();
        try
        {
            return Try(studyCase, placed, isLast: true) is not null;
        }
        finally
        {
            Settle(placed);
        }
    }

    /// <summary>Null where something came of the case; it may have to be settled. Otherwise it is to be tried later.</summary>
    private Later? Try(StudyCase studyCase, List<PlacedCase> placed, bool isLast)
    {
        if (_ending.IsCancellationRequested)
            return null;
        Claim? claim = null;
        try
        {
            claim = _claims.TryTake(studyCase);
            if (claim is null || claim.LostAttempts > 0 && !isLast)
                return new Later(claim?.LostAttempts ?? 0);
            TryClaimed(studyCase, claim, placed);
        }
        catch (IOException e) when (!DiskTrouble.StopsTheRun(e) && claim is null)
        {
            FailUnclaimed(studyCase, e);
        }
        catch (NoRoomForResultsException e)
        {
            End(e.Message);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            End(_work.NoRoom(e).Message);
        }
        finally
        {
            if (!placed.Exists(p => p.Claim == claim))
                claim?.GiveBack();
        }
        return null;
    }

    private void FailUnclaimed(StudyCase studyCase, IOException trouble)
    {
        try
        {
            Ended(studyCase, _work.GiveUp(studyCase, $"it cannot be claimed: {DiskTrouble.Reason(trouble)}"));
        }
        catch (NoRoomForResultsException e)
        {
            End(e.Message);
        }
    }

    private void TryClaimed(StudyCase studyCase, Claim claim, List<PlacedCase> placed)
    {
        if (PublishedMeanwhile(studyCase) is { } receipt)
        {
            claim.Done();
            _log.SolvedByAnother(studyCase);
            Ended(studyCase, new CaseOutcome.SolvedByAnother(receipt.Summary));
            return;
        }
        if (claim.LostAttempts >= MostLostAttempts && !_triesLostOnes)
        {
            Ended(studyCase, _work.GiveUp(studyCase, LostReason));
            return;
        }
        claim.Begin();
        switch (_work.Do(studyCase, _ending.Token))
        {
            case CaseOutcome.Solved solved:
                placed.Add(new PlacedCase(studyCase, claim, solved));
                break;
            case CaseOutcome.NotRun:
                break;
            case var settled:
                claim.Done();
                Ended(studyCase, settled);
                break;
        }
    }

    // A result that was current when the run was planned is nobody's work of this hour.
    private Receipt? PublishedMeanwhile(StudyCase studyCase)
        => _work.FindResult(studyCase) is { } receipt
            && !(_before.TryGetValue(studyCase.Name, out var before) && before == receipt.SolvedAt) ? receipt : null;

    private void Settle(List<PlacedCase> placed)
    {
        if (placed.Count == 0)
            return;
        try
        {
            _work.Settle();
            foreach (var (studyCase, claim, outcome) in placed)
            {
                claim.Done();
                Ended(studyCase, outcome);
            }
        }
        catch (NoRoomForResultsException e)
        {
            foreach (var (_, claim, _) in placed)
                claim.GiveBack();
            End(e.Message);
        }
    }

    private void Ended(StudyCase studyCase, CaseOutcome outcome)
    {
        _outcomes[studyCase.Name] = outcome;
        _progress.CaseEnded(CaseGroups.Estimate(studyCase), (outcome as CaseOutcome.Solved)?.RotorSolves ?? 0);
    }

    private void End(string noRoom)
    {
        Interlocked.CompareExchange(ref _noRoom, noRoom, null);
        _ending.Cancel();
    }

    private sealed record Later(int LostAttempts);

    private sealed record PlacedCase(StudyCase Case, Claim Claim, CaseOutcome.Solved Outcome);
}
