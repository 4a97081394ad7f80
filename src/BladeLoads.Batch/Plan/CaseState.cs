using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Wording;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Plan;

/// <summary>How a case stands: each knows its word and, where there is one, its reason in a sentence.</summary>
public abstract record CaseState
{
    private CaseState() { }

    public abstract string Word { get; }

    /// <summary>Empty where the word says all.</summary>
    public abstract string Reason { get; }

    /// <summary>The result is there, whole, and was made from these values by this solver.</summary>
    /// <param name="Read">Reads its figures; null where the result has gone meanwhile.</param>
    public sealed record Current(Func<CaseSummary?> Read) : CaseState
    {
        public override string Word => "current";

        public override string Reason => "";
    }

    /// <summary>The same, but under an earlier title. The receipt takes the new one without solving.</summary>
    public sealed record Retitled(CaseSummary Summary, string From, string To) : CaseState
    {
        public override string Word => "current";

        public override string Reason => Printable.Of($"title '{From}' -> '{To}'");
    }

    /// <summary>The result in place is another one, but one of these very values was replaced before. It is put back without solving.</summary>
    public sealed record CurrentAgain(FoundResult Found) : CaseState
    {
        public override string Word => "current again";

        public override string Reason => Printable.Of($"its result of {Time(Found.SolvedAt)} is in replaced/");
    }

    /// <summary>A result of these very values is there under another name. It is copied without solving.</summary>
    public sealed record Reusable(FoundResult Found) : CaseState
    {
        public override string Word => "re-usable";

        public override string Reason => Printable.Of($"the result of '{Found.Case}' of {Time(Found.SolvedAt)} has these very values");
    }

    /// <summary>A result is there, but made from something else. Holds one reason or more, all there are.</summary>
    public sealed record OutOfDate(ImmutableArray<StaleReason> Reasons) : CaseState
    {
        public override string Word => "out of date";

        public override string Reason => Sentences(Reasons);
    }

    /// <summary>A result is there, but not as it was written. Holds one reason or more, those of an outdated result among them.</summary>
    public sealed record Damaged(ImmutableArray<StaleReason> Reasons) : CaseState
    {
        public override string Word => "damaged";

        public override string Reason => Sentences(Reasons);
    }

    /// <summary>No result is there.</summary>
    public sealed record Missing : CaseState
    {
        public override string Word => "missing";

        public override string Reason => "no result yet";
    }

    /// <summary>The last run could not solve it; the next one tries again.</summary>
    public sealed record Failed(FailureRecord Failure) : CaseState
    {
        public override string Word => "failed";

        public override string Reason => Printable.Of($"{Time(Failure.FailedAt)}: {Failure.Reason}");
    }

    /// <summary>An error in its input keeps it from running; it has no values to plan with.</summary>
    /// <param name="Finding">The first that does; null where it is not known.</param>
    public sealed record Blocked(InputFinding? Finding) : CaseState
    {
        public override string Word => "blocked";

        public override string Reason => Finding is null ? "its input has errors" : Printable.Of($"{PlaceOf(Finding)}: {Finding.Text}");

        private static string PlaceOf(InputFinding finding) => finding.Line == 0
            ? finding.File
            : string.Create(CultureInfo.InvariantCulture, $"{finding.File}:{finding.Line}")
                + (finding.Column == 0 ? "" : string.Create(CultureInfo.InvariantCulture, $":{finding.Column}"));
    }

    private static string Sentences(ImmutableArray<StaleReason> reasons) => string.Join("; ", reasons.Select(r => r.Sentence));

    private static string Time(DateTimeOffset time)
        => string.Create(CultureInfo.InvariantCulture, $"{time.UtcDateTime:yyyy-MM-dd HH:mm} UTC");
}

/// <summary>A whole result that was found elsewhere than in its place.</summary>
/// <param name="Case">The case that it was solved for.</param>
/// <param name="Folder">In the study's results, with forward slashes: <c>replaced/clean/20261130-210455~0f3a...</c>.</param>
public sealed record FoundResult(string Case, string Folder, DateTimeOffset SolvedAt);
