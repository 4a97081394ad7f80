using System.Collections.Immutable;

namespace BladeLoads.Batch.Work;

/// <summary>What came of a run.</summary>
/// <param name="Outcomes">One a case, by its name.</param>
/// <param name="NoRoom">Why nothing more could be written, in one line; null where all could.</param>
/// <param name="Faults">Faults of ours outside any case.</param>
public sealed record RunResult(ImmutableSortedDictionary<string, CaseOutcome> Outcomes, string? NoRoom, ImmutableArray<Exception> Faults)
{
    public int NotRun => Outcomes.Values.Count(o => o is CaseOutcome.NotRun);

    public int Solved => Outcomes.Values.Count(o => o is CaseOutcome.Solved);

    /// <summary>How many another run at work on the same study has solved.</summary>
    public int SolvedByAnother => Outcomes.Values.Count(o => o is CaseOutcome.SolvedByAnother);

    /// <summary>Cases that a result was there for already.</summary>
    public int Reused => Outcomes.Values.Count(o => o is CaseOutcome.Reused);

    public int Failed => Outcomes.Values.Count(o => o is CaseOutcome.Failed);
}
