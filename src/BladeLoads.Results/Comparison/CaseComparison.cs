using System.Collections.Immutable;

namespace BladeLoads.Results.Comparison;

/// <summary>A figure before and after, in the unit of its file.</summary>
/// <param name="Old">Null where the older result has no such figure; the same for <paramref name="New"/>.</param>
/// <param name="Difference">New less old; of a moment, of its magnitude: above 0 the load has grown. Null where either is.</param>
/// <param name="Percent">The difference in percent of the old figure's magnitude; null where that is 0.</param>
/// <param name="HasTurned">Whether a moment has changed its sign.</param>
public sealed record FigureChange(
    string Name, string Unit, FigureValue? Old, FigureValue? New, double? Difference, double? Percent, bool HasTurned)
{
    // Rated power and whatever hangs on it differ in the last digits of a root finder between any two solutions.
    private const double SameWithin = 1e-9;

    /// <summary>Whether there is anything to tell: a number that differs by more than its last digits, or one that came or went.</summary>
    public bool IsChange => Difference is { } difference
        ? HasTurned || Math.Abs(difference) > SameWithin * Math.Max(Math.Abs(Old?.Value ?? 0), Math.Abs(New?.Value ?? 0))
        : Old is not null || New is not null;

    /// <summary>Whether it moved by more than so many percent; what has no percentage counts as moved if it changed at all.</summary>
    public bool IsMoreThan(double percent) => IsChange && (HasTurned || Percent is not { } moved || Math.Abs(moved) > percent);
}

/// <summary>A mark that came to, or went from, points of the curve.</summary>
/// <param name="OldPoints">How many points carried it; 0 for a mark of the curve alone, null where it was not there.</param>
/// <param name="NewAt">m/s: wind speeds with the mark that were without it before.</param>
/// <param name="LostAt">m/s: wind speeds that had the mark before and have it no more.</param>
public sealed record MarkChange(string Mark, int? OldPoints, int? NewPoints, ImmutableArray<double> NewAt, ImmutableArray<double> LostAt);

/// <summary>The wind speeds of two curves, m/s.</summary>
/// <param name="Common">How many are in both: only these are compared point by point.</param>
public sealed record CommonWindSpeeds(int Common, ImmutableArray<double> OnlyOld, ImmutableArray<double> OnlyNew);

/// <summary>An older and a newer result of a case beside each other, or why there is nothing beside it.</summary>
/// <param name="Case">The name of the newer one, or of the older where there is no newer.</param>
/// <param name="OldCase">The name of the older one; null where there is none.</param>
public abstract record CaseComparison(string Case, string? OldCase)
{
    /// <summary>What became of the comparison, in words.</summary>
    public abstract string Word { get; }

    /// <summary>Both were there.</summary>
    /// <param name="Why">What the two were made from differs in this, in one sentence; empty where nothing is known to differ.</param>
    /// <param name="Figures">Those of both or either, changed or not, in the order of <see cref="Comparison.Figures.All"/>.</param>
    /// <param name="Curves">Power and thrust at the common wind speed where they changed most.</param>
    /// <param name="Doubts">What makes numbers of either doubtful, a sentence each.</param>
    public sealed record Compared(
        string Case, string OldCase, string Why, ImmutableArray<FigureChange> Figures, ImmutableArray<FigureChange> Curves,
        ImmutableArray<MarkChange> Marks, CommonWindSpeeds WindSpeeds, ImmutableArray<string> Doubts) : CaseComparison(Case, OldCase)
    {
        public override string Word => "compared";

        public IEnumerable<FigureChange> Changes => Figures.Concat(Curves);

        public bool HasChanged => Changes.Any(c => c.IsChange) || !Marks.IsEmpty || HasOtherWindSpeeds;

        public bool HasOtherWindSpeeds => !WindSpeeds.OnlyOld.IsEmpty || !WindSpeeds.OnlyNew.IsEmpty;

        /// <summary>The largest move of any figure, %; 0 for none.</summary>
        public double LargestPercent => Changes.Select(c => Math.Abs(c.Percent ?? 0)).DefaultIfEmpty(0).Max();

        /// <summary>Only what moved by more than so many percent; marks and wind speeds that came or went are kept.</summary>
        public Compared MovedMoreThan(double percent) => this with
        {
            Figures = [.. Figures.Where(f => f.IsMoreThan(percent))],
            Curves = [.. Curves.Where(f => f.IsMoreThan(percent))],
        };
    }

    /// <summary>There was nothing to compare, or it could not be.</summary>
    public sealed record NotCompared(string Case, string? OldCase, NoComparison Reason, string Note) : CaseComparison(Case, OldCase)
    {
        public override string Word => Reason switch
        {
            NoComparison.NoEarlierResult => "no earlier result",
            NoComparison.Failed => "failed",
            NoComparison.NotRun => "not run",
            NoComparison.OnlyOld => "only in the old results",
            NoComparison.OnlyNew => "only in the new results",
            NoComparison.Unreadable => "cannot be compared",
            _ => throw new ArgumentOutOfRangeException(nameof(Reason), Reason, "has no word"),
        };
    }
}

/// <summary>Why two results do not stand beside each other.</summary>
public enum NoComparison
{
    NoEarlierResult,
    Failed,
    NotRun,
    OnlyOld,
    OnlyNew,
    Unreadable,
}
