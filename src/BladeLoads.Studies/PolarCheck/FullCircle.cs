using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>Far beyond stall every section is a plate across the wind, and -180 and 180 degrees are one angle.</summary>
internal static class FullCircle
{
    private const double DragClosure = 0.02;
    private const double LeastAcross = 1.0;      // drag of a plate as long as it is broad is 1.1
    private const double LargestAcross = 2.1;    // of an endless one 2.0
    private const double WrongLift = 0.1;        // of the wrong sign
    private const double Slack = 1e-9;           // deg

    public static IEnumerable<PolarDoubt> Doubts(CheckedPolar polar)
    {
        var (first, last) = (0, polar.Rows.Length - 1);
        if (polar.Rows[first].AngleDeg <= -180 + Slack && polar.Rows[last].AngleDeg >= 180 - Slack
            && Math.Abs(polar.Rows[last].Drag - polar.Rows[first].Drag) > DragClosure)
            yield return polar.Doubt(DoubtKinds.HalfTurn, "cd", [last, first], double.NaN, double.NaN,
                $"cd is {Given(polar.Rows[last].Drag)} at 180 deg and {Given(polar.Rows[first].Drag)} at -180 deg",
                "; these are one angle and should have one drag");
        if (polar.Figures.IsBluff)
            yield break;
        foreach (var angle in (double[])[-90, 90])
            if (polar.At(angle) is { Drag: var drag } && drag is < LeastAcross or > LargestAcross)
                yield return polar.Doubt(DoubtKinds.DragAcross, "cd", [polar.RowNear(angle)], angle - 30, angle + 30,
                    $"cd is {Found(drag)} at {Given(angle)} deg",
                    "; a plate across the wind has 1.1 to 2.0, and about 1.3 as long as a blade");
        // Lift points away from the wind: up, where the angle is between 0 and 90 degrees.
        foreach (var (angle, sign) in ((double, int)[])[(-135, 1), (-45, -1), (45, 1), (135, -1)])
            if (polar.At(angle) is { Lift: var lift } && sign * lift < -WrongLift)
                yield return polar.Doubt(DoubtKinds.SignOfLift, "cl", [polar.RowNear(angle)], angle - 45, angle + 45,
                    $"cl is {Found(lift)} at {Given(angle)} deg, where lift is {(sign > 0 ? "positive" : "negative")}",
                    "; is a sign turned in the extension?");
    }
}
