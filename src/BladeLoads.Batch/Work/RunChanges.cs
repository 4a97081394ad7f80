using System.Collections.Immutable;
using BladeLoads.Batch.Plan;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Publishing;

namespace BladeLoads.Batch.Work;

/// <summary>
/// What moved in a run: each case that it solved, beside the result that the case had before. Both are read from their files. A run
/// that carries on an unfinished one tells what moved over both.
/// </summary>
public sealed class RunChanges
{
    private readonly ResultsFolder _results;
    private readonly ImmutableSortedDictionary<string, ResultIdentity?> _before;
    private readonly ImmutableHashSet<string> _due;

    private RunChanges(ResultsFolder results, ImmutableSortedDictionary<string, ResultIdentity?> before, ImmutableHashSet<string> due)
        => (_results, _before, _due) = (results, before, due);

    /// <summary>Looks at what is there before any case is solved.</summary>
    /// <param name="plan">Of the whole study: a case that is no more in it is not waited for.</param>
    /// <param name="due">The cases that the run is to solve.</param>
    public static RunChanges Before(StudyPlan plan, IEnumerable<string> due, ResultsFolder results)
    {
        var known = plan.Cases.Select(c => c.Case.Name).ToHashSet(StringComparer.Ordinal);
        var names = due.ToImmutableHashSet(StringComparer.Ordinal);
        var before = UnfinishedRun.Read(results).Where(b => known.Contains(b.Key)).ToImmutableSortedDictionary(StringComparer.Ordinal);
        before = before.AddRange(names.Where(n => !before.ContainsKey(n))
            .Select(n => KeyValuePair.Create(n, ResultIdentity.Of(results.Case(n)))));
        return new RunChanges(results, before, names);
    }

    /// <summary>Whether there can be anything to tell.</summary>
    public bool IsEmpty => _before.IsEmpty;

    /// <summary>Keeps what was there before in a file, until the run is finished.</summary>
    public void Remember(Publisher publisher) => UnfinishedRun.Write(_results, _before, publisher);

    /// <summary>A comparison a case, in the order of their names; a case of an unfinished run that has not been solved since is left out.</summary>
    /// <param name="outcomes">Of the cases that were due; one without an outcome was not run.</param>
    public ImmutableArray<CaseComparison> Compare(ImmutableSortedDictionary<string, CaseOutcome> outcomes) =>
    [
        .. _before.AsParallel().AsOrdered()
            .Where(b => _due.Contains(b.Key) || !IsWaitedFor(b.Key, outcomes))
            .Select(b => Compare(b.Key, b.Value, outcomes.GetValueOrDefault(b.Key)))
            .OfType<CaseComparison>(),
    ];

    /// <summary>Writes <c>changes.csv</c>, and forgets what was there before once every case has been solved or has failed.</summary>
    /// <exception cref="NoRoomForResultsException">It cannot be written.</exception>
    public void Publish(
        ImmutableArray<CaseComparison> comparisons, ImmutableSortedDictionary<string, CaseOutcome> outcomes, Publisher publisher)
    {
        try
        {
            if (!comparisons.IsEmpty)
                publisher.PublishFile(_results.Changes, ChangesTable.Write(comparisons));
            if (!_before.Keys.Any(name => IsWaitedFor(name, outcomes)))
                UnfinishedRun.Remove(_results, publisher);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new NoRoomForResultsException(_results.Study, e);
        }
    }

    /// <summary>Null where the result is still the one it was.</summary>
    private CaseComparison? Compare(string name, ResultIdentity? before, CaseOutcome? outcome)
    {
        if (outcome is CaseOutcome.Failed { Reason: var reason })
            return new CaseComparison.NotCompared(name, null, NoComparison.Failed, reason);
        if (IsUndone(name, outcome))
            return new CaseComparison.NotCompared(name, null, NoComparison.NotRun, "");
        if (before is null)
            return new CaseComparison.NotCompared(name, null, NoComparison.NoEarlierResult, "");
        if (ResultIdentity.Of(_results.Case(name)) == before)
            return null;
        // By its name first; one that a killed run was moving may lie under another's.
        var replaced = ReplacedResult.Of(_results, name)
            .OrderByDescending(r => r.MayBeOf(before.Fingerprint)).FirstOrDefault(r => ResultIdentity.Of(r.Folder) == before);
        return replaced is null
            ? new CaseComparison.NotCompared(name, name, NoComparison.Unreadable, "its earlier result is no more in replaced/")
            : ResultComparison.OfFolders(replaced.Folder, _results.Case(name), MadeFrom.Difference);
    }

    private bool IsUndone(string name, CaseOutcome? outcome) => _due.Contains(name) && outcome is null or CaseOutcome.NotRun;

    // Of a case that was not due, only its files can tell whether the unfinished run had come to it.
    private bool IsWaitedFor(string name, ImmutableSortedDictionary<string, CaseOutcome> outcomes) => _due.Contains(name)
        ? IsUndone(name, outcomes.GetValueOrDefault(name))
        : ResultIdentity.Of(_results.Case(name)) is var now && (now is null || now == _before[name]);
}
