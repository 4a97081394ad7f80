using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>Lift of a slender section where its flow is attached, and where it stalls: what none of them has.</summary>
internal static class AttachedLift
{
    // Of a thin plate's 2 pi a radian. A thick section has up to 1 + 0.8 times its thickness ratio without viscosity.
    private const double LeastSlope = 0.8;
    private const double LargestSlope = 1.35;
    private const double LowestZeroLift = -8;       // deg
    private const double HighestZeroLift = 0.5;     // deg; a symmetric section with some scatter
    private const double LeastOfLargest = 0.7;
    private const double LargestOfLargest = 2.2;
    private const double EarliestStall = 5;         // deg
    private const double Falls = 4;                 // deg, either side of 0
    private const double ByMuch = 0.1;

    public static IEnumerable<PolarDoubt> Doubts(CheckedPolar polar)
    {
        var figures = polar.Figures;
        if (figures.IsBluff)
            yield break;
        if (FallsAboutZero(polar) is { } falls)
            yield return falls;
        else if (figures.Attached is { } attached)
        {
            var zeroLift = double.RadiansToDegrees(attached.ZeroLiftAngle);
            var row = polar.RowNear(zeroLift);
            if (zeroLift > HighestZeroLift)
                yield return polar.Doubt(DoubtKinds.ZeroLiftAngle, "cl", [row], zeroLift - 4, zeroLift + 4,
                    $"lift is 0 at {Found(zeroLift)} deg, so the section lifts downwards at 0 deg",
                    "; blade sections lift upwards there: is a sign turned?");
            if (zeroLift < LowestZeroLift)
                yield return polar.Doubt(DoubtKinds.ZeroLiftAngle, "cl", [row], zeroLift - 4, zeroLift + 4,
                    $"lift is 0 at {Found(zeroLift)} deg",
                    $"; of blade sections it is between {Given(LowestZeroLift)} and 0 deg: are the angles shifted?");
            var ratio = figures.SlopeRatio!.Value;
            if (ratio is < LeastSlope or > LargestSlope)
                yield return polar.Doubt(DoubtKinds.LiftSlope, "cl", [row], zeroLift - 4, zeroLift + 4,
                    $"lift rises by {Found(attached.LiftSlope)} a radian about {Found(zeroLift)} deg, {Found(ratio)} of 2 pi",
                    $"; slender sections have {Given(LeastSlope)} to {Given(LargestSlope)} of it: is lift there scattered, augmented, or in another "
                    + "unit?");
        }
        foreach (var doubt in OfLargestLift(polar))
            yield return doubt;
    }

    private static IEnumerable<PolarDoubt> OfLargestLift(CheckedPolar polar)
    {
        if (polar.Figures.LargestLift is not { } largest)
            yield break;
        var angle = polar.Rows[largest.Row].AngleDeg;
        if (largest.AtEnd)
            yield return polar.Doubt(DoubtKinds.EndsBeforeStall, "cl", [largest.Row], angle, 180,
                $"the rows end at {Given(angle)} deg, before stall",
                "; measure on, or extend the table, which then rests on a guess");
        else if (largest.Value is < LeastOfLargest or > LargestOfLargest)
            yield return polar.Doubt(DoubtKinds.LargestLift, "cl", [largest.Row], angle - 2, angle + 2,
                $"the largest lift is {Given(largest.Value)}, at {Given(angle)} deg",
                $"; slender sections reach {Given(LeastOfLargest)} to {Given(LargestOfLargest)}: is it in another unit, or of a section with a "
                + "flap?");
        if (!largest.AtEnd && angle < EarliestStall)
            yield return polar.Doubt(DoubtKinds.LargestLift, "cl", [largest.Row], angle, angle + 10,
                $"the largest lift is at {Given(angle)} deg",
                $"; slender sections stall beyond {Given(EarliestStall)} deg: are the angles in another unit?");
    }

    private static PolarDoubt? FallsAboutZero(CheckedPolar polar)
    {
        if (polar.At(-Falls) is not { Lift: var before } || polar.At(Falls) is not { Lift: var after } || after > before - ByMuch)
            return null;
        return polar.Doubt(DoubtKinds.SignOfLift, "cl", [polar.RowNear(0)], -180, 180,
            $"cl falls from {Found(before)} at {Given(-Falls)} deg to {Found(after)} at {Given(Falls)} deg",
            "; is the sign of cl or of alpha_deg turned?");
    }
}
