using System.Collections.Immutable;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Plan;

/// <summary>A case that can be read, and how its results stand.</summary>
public sealed record PlannedCase(StudyCase Case, CaseState State)
{
    /// <summary>Whether a run has anything to do for it without being told to.</summary>
    public bool IsDue => State is not CaseState.Current;
}

/// <summary>How the results of every case of a study stand, in the order of the study.</summary>
/// <param name="Rejected">Cases that an input error keeps from running; they have no values to plan with.</param>
public sealed record StudyPlan(ImmutableArray<PlannedCase> Cases, ImmutableArray<string> Rejected)
{
    /// <summary>For a rejected case the error that keeps it from running.</summary>
    public ImmutableDictionary<string, InputFinding> Blocking { get; init; } = ImmutableDictionary<string, InputFinding>.Empty;

    /// <summary>Every case by name and how it stands, those that are blocked after the others.</summary>
    public ImmutableArray<CaseStanding> Standings =>
    [
        .. Cases.Select(c => new CaseStanding(c.Case.Name, c.Case.Title, c.Case.Fingerprint, c.State)),
        .. Rejected.Select(name => new CaseStanding(name, "", "", new CaseState.Blocked(Blocking.GetValueOrDefault(name)))),
    ];

    /// <summary>Looks at the results; nothing is written.</summary>
    /// <param name="solverVersion">The version of the physics at hand.</param>
    public static StudyPlan Make(Study study, ResultsFolder results, int solverVersion)
    {
        using var known = new KnownResults(results, null, TimeProvider.System);
        return Make(study, known, solverVersion);
    }

    internal static StudyPlan Make(Study study, KnownResults known, int solverVersion)
        => new([.. study.Cases.Select(c => new PlannedCase(c, StateOf(c, known, solverVersion)))], study.Rejected) { Blocking = study.Blocking };

    /// <summary>The same plan, of the cases that a choice keeps.</summary>
    public StudyPlan Only(CaseChoice choice) => this with
    {
        Cases = [.. Cases.Where(c => choice.Includes(c.Case.Name))],
        Rejected = [.. Rejected.Where(choice.IncludesRejected)],
    };

    private static CaseState StateOf(StudyCase studyCase, KnownResults known, int solverVersion)
    {
        var facts = known.Look(studyCase.Name, out var why);
        ImmutableArray<StaleReason> damage = facts is not null ? !known.IsDamaged(studyCase.Name, facts) ? [] : [.. known.Damage(studyCase.Name, facts)]
            : why is not null ? [new StaleReason.ReceiptUnreadable(why)] : [];
        if (facts is not null && damage.IsEmpty && facts.IsOf(studyCase.Fingerprint, solverVersion))
            return CurrentOf(studyCase, facts, known);
        if (known.Find(studyCase, solverVersion) is { } found)
            return found.Case == studyCase.Name ? new CaseState.CurrentAgain(found) : new CaseState.Reusable(found);
        // A failure speaks for the values it was met with; with others the case is simply not solved yet.
        if (ReceiptFile.ReadFailure(known.Results.Failure(studyCase.Name)) is { } failure
            && failure.Fingerprint == studyCase.Fingerprint && failure.SolverVersion == solverVersion)
            return new CaseState.Failed(failure);
        if (facts is null && why is null)
            return new CaseState.Missing();
        ImmutableArray<StaleReason> reasons = facts is not null && known.Open(studyCase.Name) is { } receipt
            ? [.. Differences.Between(receipt, studyCase, known.Results, solverVersion), .. damage] : damage;
        return damage.IsEmpty ? new CaseState.OutOfDate(reasons) : new CaseState.Damaged(reasons);
    }

    private static CaseState CurrentOf(StudyCase studyCase, ResultFacts facts, KnownResults known)
    {
        if (facts.Title != studyCase.Title && known.Open(studyCase.Name) is { } receipt)
            return new CaseState.Retitled(receipt.Summary, facts.Title, studyCase.Title);
        return new CaseState.Current(() => known.Open(studyCase.Name)?.Summary);
    }
}

/// <summary>A case by name, and how it stands: all that telling a plan needs.</summary>
/// <param name="Title">Empty for a case that is blocked, as is its fingerprint.</param>
public sealed record CaseStanding(string Name, string Title, string Fingerprint, CaseState State)
{
    /// <summary>Whether a run solves it without being told to.</summary>
    public bool NeedsSolving => State is CaseState.OutOfDate or CaseState.Damaged or CaseState.Missing or CaseState.Failed;

    /// <summary>Whether a run puts a result that is there into its place, or gives it its title, without solving.</summary>
    public bool IsThereAlready => State is CaseState.Retitled or CaseState.CurrentAgain or CaseState.Reusable;
}
