using System.Collections.Immutable;
using BladeLoads.Batch.Plan;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Tables;

namespace BladeLoads.Batch.Work;

/// <summary>The summary of a study: a row a case, from results just made and from those that were current before.</summary>
public static class StudySummary
{
    /// <param name="plan">Of the whole study, made before the run.</param>
    /// <param name="outcomes">Of the cases that were run; empty for none.</param>
    public static ImmutableArray<SummaryRow> Rows(StudyPlan plan, ImmutableSortedDictionary<string, CaseOutcome> outcomes) =>
    [
        .. plan.Cases.Select(planned => RowOf(planned, outcomes.GetValueOrDefault(planned.Case.Name))),
        .. plan.Rejected.Select(name => new SummaryRow(name, "", "", new CaseState.Blocked(null).Word, null)),
    ];

    /// <summary>Writes <c>summary.csv</c> where it is not there with these very bytes already.</summary>
    /// <param name="bytes">As <see cref="SummaryTable.Write"/> makes them.</param>
    /// <exception cref="NoRoomForResultsException">It cannot be written.</exception>
    public static void Publish(byte[] bytes, ResultsFolder results, Func<Publisher> publisher)
    {
        try
        {
            if (File.Exists(results.Summary) && File.ReadAllBytes(results.Summary).AsSpan().SequenceEqual(bytes))
                return;
            publisher().PublishFile(results.Summary, bytes);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new NoRoomForResultsException(results.Study, e);
        }
    }

    private static SummaryRow RowOf(PlannedCase planned, CaseOutcome? outcome)
    {
        var (state, summary) = (outcome, planned.State) switch
        {
            (CaseOutcome.Solved solved, _) => ("current", solved.Summary),
            (CaseOutcome.SolvedByAnother solved, _) => ("current", solved.Summary),
            (CaseOutcome.Reused reused, _) => ("current", reused.Summary),
            (CaseOutcome.Failed, CaseState.Current current) => ("failed", current.Read()),
            (CaseOutcome.Failed, _) => ("failed", null),
            (_, CaseState.Current current) => ("current", current.Read()),
            (_, CaseState.Retitled retitled) => ("current", retitled.Summary),
            _ => (planned.State.Word, null),
        };
        return new SummaryRow(planned.Case.Name, planned.Case.Title, planned.Case.Fingerprint, state, summary);
    }
}
