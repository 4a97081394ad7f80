using System.Collections.Immutable;
using BladeLoads.Results.Publishing;
using BladeLoads.Studies;
using BladeLoads.Studies.Files;

namespace BladeLoads.Batch.Plan.Index;

/// <summary>A look at a study's results that takes from the index what it can, and leaves it there for the next.</summary>
/// <param name="time">Tells how long ago a file was changed: see <see cref="FileStamp"/>.</param>
public sealed class StudyLook(ResultsFolder results, string toolVersion, int solverVersion, TimeProvider time)
{
    private static readonly CaseState.Current CurrentUnread = new(() => null);

    private PlanIndex? _index = PlanIndex.Read(results, toolVersion, solverVersion);

    /// <summary>
    /// Every case, where the study reads as it did and every one is current; null otherwise, and then the study has to be read. Neither
    /// an input nor a receipt is opened that has not changed.
    /// </summary>
    /// <param name="studyFolder">Absolute path.</param>
    public CurrentStudy? AllCurrent(string studyFolder, IStudyFiles files)
    {
        if (_index is not { Sight: { } sight } index || sight.Root != studyFolder)
            return null;
        var inputs = Task.Run(() => sight.LookAgain(files, time));   // beside the results: both wait for the system
        using var known = new KnownResults(results, index, time);
        var standings = ImmutableArray.CreateBuilder<CaseStanding>(index.Cases.Length);
        foreach (var indexed in index.Cases)
        {
            if (known.Look(indexed.Name, out _) is not { } facts || !facts.IsOf(indexed.Fingerprint, solverVersion)
                || facts.Title != indexed.Title || known.IsDamaged(indexed.Name, facts))
                return null;
            standings.Add(new CaseStanding(indexed.Name, indexed.Title, indexed.Fingerprint, CurrentUnread));
        }
        if (inputs.GetAwaiter().GetResult() is not { } again)
            return null;
        if (known.HasLearned || !ReferenceEquals(again, sight))
            IndexFile.Write(results.Index, index with { Sight = again, Results = Merged(index, known) });
        return new CurrentStudy(standings.DrainToImmutable(), index.Doubts);
    }

    /// <summary>The plan of a study that was read.</summary>
    public StudyPlan Plan(Study study)
    {
        using var known = new KnownResults(results, _index, time);
        var plan = StudyPlan.Make(study, known, solverVersion);
        Keep(study, known);
        return plan;
    }

    /// <summary>After a run: what it has published is known to the next plan.</summary>
    public void LookAfterRun(Study study)
    {
        using var known = new KnownResults(results, _index, time);
        foreach (var studyCase in study.Cases)
            known.Look(studyCase.Name, out _);
        Keep(study, known);
    }

    private void Keep(Study study, KnownResults known)
    {
        var index = PlanIndex.Of(study, known, toolVersion, solverVersion);
        if (_index is null || known.HasLearned || !SameInputs(index, _index) || index.Results.Count < _index.Results.Count)
            IndexFile.Write(results.Index, index);
        _index = index;
    }

    private static bool SameInputs(PlanIndex one, PlanIndex other)
        => one.Sight is null && other.Sight is null
            || one.Sight is not null && other.Sight is not null && one.Sight.Root == other.Sight.Root
                && one.Sight.RealRoot == other.Sight.RealRoot && one.Cases.AsSpan().SequenceEqual(other.Cases.AsSpan())
                && one.Sight.Entries.Length == other.Sight.Entries.Length
                && one.Sight.Entries.Zip(other.Sight.Entries).All(p => p.First.Path == p.Second.Path && p.First.Stamp == p.Second.Stamp
                    && p.First.IsSettled == p.Second.IsSettled);

    private static Dictionary<string, ResultFacts> Merged(PlanIndex index, KnownResults known)
    {
        var all = index.Results.ToDictionary(StringComparer.Ordinal);
        foreach (var (folder, facts) in known.Facts)
            all[folder] = facts;
        return all;
    }
}

/// <summary>A study every case of which is current.</summary>
/// <param name="Doubts">What there is to be told of its inputs.</param>
public sealed record CurrentStudy(ImmutableArray<CaseStanding> Cases, ImmutableArray<InputFinding> Doubts);
