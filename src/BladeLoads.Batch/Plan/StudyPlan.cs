using System.Collections.Immutable;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Plan;

/// <summary>A case that can be read, and how its results stand.</summary>
public sealed record PlannedCase(StudyCase Case, CaseState State)
{
    /// <summary>Whether a run solves it without being told to.</summary>
    public bool IsDue => State is not CaseState.Current;
}

/// <summary>How the results of every case of a study stand, in the order of the study. Nothing is written by making one.</summary>
/// <param name="Rejected">Cases that an input error keeps from running; they have no values to plan with.</param>
public sealed record StudyPlan(ImmutableArray<PlannedCase> Cases, ImmutableArray<string> Rejected)
{
    /// <param name="solverVersion">The version of the physics at hand.</param>
    public static StudyPlan Make(Study study, ResultsFolder results, int solverVersion)
        => new([.. study.Cases.Select(c => new PlannedCase(c, StateOf(c, results, solverVersion)))], study.Rejected);

    /// <summary>The same plan, of the cases that a choice keeps.</summary>
    public StudyPlan Only(CaseChoice choice)
        => new([.. Cases.Where(c => choice.Includes(c.Case.Name))], [.. Rejected.Where(choice.IncludesRejected)]);

    private static CaseState StateOf(StudyCase studyCase, ResultsFolder results, int solverVersion)
    {
        var folder = results.Case(studyCase.Name);
        var reading = ReceiptFile.Read(folder);
        ImmutableArray<StaleReason> reasons = reading switch
        {
            ReceiptReading.Readable { Receipt: var receipt } => Differences.Between(receipt, studyCase, folder, solverVersion),
            ReceiptReading.Unreadable { Why: var why } => [new StaleReason.ReceiptUnreadable(why)],
            _ => [],
        };
        if (reading is ReceiptReading.Readable { Receipt.Summary: var summary } && reasons.IsEmpty)
            return new CaseState.Current(summary);
        // A failure speaks for the values it was met with; with others the case is simply not solved yet.
        if (ReceiptFile.ReadFailure(results.Failure(studyCase.Name)) is { } failure
            && failure.Fingerprint == studyCase.Fingerprint && failure.SolverVersion == solverVersion)
            return new CaseState.Failed(failure);
        return reading is ReceiptReading.NoResult ? new CaseState.Missing() : new CaseState.OutOfDate(reasons);
    }
}
