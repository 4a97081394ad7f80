using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>Two neighbouring Reynolds numbers of one section that differ by more than the Reynolds number does.</summary>
internal static class ReynoldsSteps
{
    private const double AttachedFrom = -4;        // deg
    private const double AttachedTo = 6;           // deg
    private const double AttachedLift = 0.15;      // largest difference there
    private const double LargestLift = 0.35;       // and of the largest lift, for a step of e in the Reynolds number or less
    private const double AboutPeak = 2;            // deg, either side: both may peak at one angle
    private const double LaminarPower = 0.5;       // drag falls no faster with the Reynolds number than a laminar plate's
    private const double DragSlack = 1.35;         // and rises by no more than this

    public static IEnumerable<PolarDoubt> Doubts(CheckedPolar lower, CheckedPolar upper)
    {
        if (lower.Rows.Select(r => (r.AngleDeg, r.Lift, r.Drag)).SequenceEqual(upper.Rows.Select(r => (r.AngleDeg, r.Lift, r.Drag))))
        {
            if (!upper.Figures.IsBluff)
                yield return upper.Doubt(DoubtKinds.ReynoldsNumbers, "reynolds", [0], double.NaN, double.NaN,
                    $"every row is as at Reynolds number {lower.ReynoldsText}",
                    "; measure there, or leave one of the two out");
            yield break;
        }
        if (upper.Figures.IsBluff || lower.Figures.IsBluff)
            yield break;
        var step = Math.Log(upper.Reynolds / lower.Reynolds);
        if (FarthestApart(lower, upper) is var (angle, here, there) && Math.Abs(here - there) > AttachedLift)
            yield return upper.Doubt(DoubtKinds.ReynoldsNumbers, "cl", [upper.RowNear(angle)], AttachedFrom, AttachedTo,
                $"cl at {Given(angle)} deg is {Found(here)}, and {Found(there)} at Reynolds number {lower.ReynoldsText}",
                "; attached lift hardly depends on it: are the two of one section and one tunnel?");
        if (upper.Figures.LargestLift is { AtEnd: false } largest && lower.Figures.LargestLift is { AtEnd: false } before
            && Math.Abs(largest.Value - before.Value) > LargestLift * Math.Max(1, step))
            yield return upper.Doubt(DoubtKinds.ReynoldsNumbers, "cl", [largest.Row],
                double.RadiansToDegrees(Math.Min(largest.Angle, before.Angle)) - AboutPeak,
                double.RadiansToDegrees(Math.Max(largest.Angle, before.Angle)) + AboutPeak,
                $"the largest lift is {Given(largest.Value)}, and {Given(before.Value)} at Reynolds number {lower.ReynoldsText}",
                "; that is a jump: give a Reynolds number between them, or mend the slip");
        if (upper.Figures.LeastDrag is { } drag && lower.Figures.LeastDrag is { } dragBefore
            && (drag.Value > dragBefore.Value * DragSlack || drag.Value < dragBefore.Value * Math.Exp(-LaminarPower * step) / DragSlack))
            yield return upper.Doubt(DoubtKinds.ReynoldsNumbers, "cd", [drag.Row], AttachedFrom, AttachedTo,
                $"the least drag is {Given(drag.Value)}, and {Given(dragBefore.Value)} at Reynolds number {lower.ReynoldsText}",
                "; drag falls with it, and no faster than its square root: are the two of one section, equally smooth?");
    }

    private static (double Angle, double Here, double There)? FarthestApart(CheckedPolar lower, CheckedPolar upper)
    {
        (double Angle, double Here, double There)? farthest = null;
        for (var angle = AttachedFrom; angle <= AttachedTo; angle++)
            if (upper.At(angle) is { Lift: var here } && lower.At(angle) is { Lift: var there }
                && !(farthest is var (_, x, y) && Math.Abs(here - there) <= Math.Abs(x - y)))
                farthest = (angle, here, there);
        return farthest;
    }
}
