using BladeLoads.Rotor.Operation;

namespace BladeLoads.Results.Report;

/// <summary>What a mark of an operating point means, in a line.</summary>
internal static class MarkText
{
    public static string Of(PointMarks mark) => mark switch
    {
        PointMarks.Unbalanced => "no inflow angle balances blade force and momentum at an element; the figures of the point are blank",
        PointMarks.SeveralBalances => "more than one inflow angle balances, as in a sharp stall; the one with attached flow was taken: power and loads about there "
            + "are uncertain",
        PointMarks.OutsideAngles => "an angle of attack is outside its table; the end value of the table served",
        PointMarks.OutsideReynolds => "a Reynolds number is outside its tables; the nearest table served",
        PointMarks.ExceedsRated => "electrical power is above rated and nothing holds it",
        PointMarks.PowerJump => "power jumps across rated as the pitch moves; the side at or above rated was taken",
        PointMarks.PitchJump => "the pitch jumps at rated, because power rises with pitch there: the blade is stalled",
        PointMarks.RatedNotReached => "rated power is not made",
        PointMarks.BelowCutIn => "below the first wind speed of operation: the rotor is at rest",
        PointMarks.AboveCutOut => "above the last wind speed of operation: the rotor is at rest; no parked load",
        PointMarks.ThrustNotHeld => "thrust is above its limit even with the blades feathered",
        _ => throw new ArgumentOutOfRangeException(nameof(mark), mark, "one mark"),
    };
}
