using BladeLoads.Results.Receipts;

namespace BladeLoads.Batch.Work;

/// <summary>What became of a case in a run.</summary>
public abstract record CaseOutcome
{
    private CaseOutcome() { }

    /// <summary>Its result is published.</summary>
    public sealed record Solved(CaseSummary Summary, int RotorSolves) : CaseOutcome;

    /// <summary>Another run at work on the same study has published its result meanwhile.</summary>
    public sealed record SolvedByAnother(CaseSummary Summary) : CaseOutcome;

    /// <summary>A result of its very values was there, and is in its place now.</summary>
    /// <param name="From">Where it was, relative to the study's results; the case's own folder where only the title was another.</param>
    public sealed record Reused(CaseSummary Summary, string From) : CaseOutcome;

    /// <summary>It alone could not be solved or published.</summary>
    /// <param name="Reason">One sentence, fit for a terminal.</param>
    public sealed record Failed(string Reason) : CaseOutcome;

    /// <summary>The run ended before it was done; nothing of it was published.</summary>
    public sealed record NotRun : CaseOutcome;
}
