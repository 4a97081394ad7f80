using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Results.Wording;

/// <summary>The words for marks in tables, on the screen and in receipts.</summary>
public static class StatusWords
{
    private static readonly (PointMarks Mark, string Word)[] OfPoints =
    [
        (PointMarks.Unbalanced, "unbalanced"),
        (PointMarks.SeveralBalances, "several-balances"),
        (PointMarks.OutsideAngles, "outside-angles"),
        (PointMarks.OutsideReynolds, "outside-reynolds"),
        (PointMarks.ExceedsRated, "exceeds-rated"),
        (PointMarks.PowerJump, "power-jump"),
        (PointMarks.PitchJump, "pitch-jump"),
        (PointMarks.RatedNotReached, "rated-not-reached"),
        (PointMarks.BelowCutIn, "below-cut-in"),
        (PointMarks.AboveCutOut, "above-cut-out"),
        (PointMarks.ThrustNotHeld, "thrust-not-held"),
    ];

    private static readonly (ElementMarks Mark, string Word)[] OfElements =
    [
        (ElementMarks.Unbalanced, "unbalanced"),
        (ElementMarks.SeveralBalances, "several-balances"),
        (ElementMarks.OutsideAngles, "outside-angles"),
        (ElementMarks.OutsideReynolds, "outside-reynolds"),
    ];

    /// <summary>Every mark of a point with its word, in the order in which a status cell holds them.</summary>
    public static IReadOnlyList<(PointMarks Mark, string Word)> PointWords => OfPoints;

    /// <summary>The marks as words with single spaces between them; empty for none.</summary>
    public static string Of(PointMarks marks)
        => marks == PointMarks.None ? "" : string.Join(' ', OfPoints.Where(m => marks.HasFlag(m.Mark)).Select(m => m.Word));

    /// <inheritdoc cref="Of(PointMarks)"/>
    public static string Of(ElementMarks marks)
        => marks == ElementMarks.None ? "" : string.Join(' ', OfElements.Where(m => marks.HasFlag(m.Mark)).Select(m => m.Word));
}
