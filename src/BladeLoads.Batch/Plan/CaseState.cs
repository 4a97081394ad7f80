using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Wording;

namespace BladeLoads.Batch.Plan;

/// <summary>How a case stands: each knows its word and, where there is one, its reason in a sentence.</summary>
public abstract record CaseState
{
    private CaseState() { }

    public abstract string Word { get; }

    /// <summary>Empty where the word says all.</summary>
    public abstract string Reason { get; }

    /// <summary>The result is there, whole, and was made from these values by this solver.</summary>
    public sealed record Current(CaseSummary Summary) : CaseState
    {
        public override string Word => "current";

        public override string Reason => "";
    }

    /// <summary>A result is there, but made from something else. Holds one reason or more, all there are.</summary>
    public sealed record OutOfDate(ImmutableArray<StaleReason> Reasons) : CaseState
    {
        private const int Shown = 3;

        public override string Word => "out of date";

        public override string Reason => string.Join("; ", Reasons.Take(Shown).Select(r => r.Sentence))
            + (Reasons.Length > Shown ? string.Create(CultureInfo.InvariantCulture, $"; and {Reasons.Length - Shown} more") : "");
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

        public override string Reason => Printable.Of(string.Create(
            CultureInfo.InvariantCulture, $"{Failure.FailedAt.UtcDateTime:yyyy-MM-dd HH:mm} UTC: {Failure.Reason}"));
    }
}
