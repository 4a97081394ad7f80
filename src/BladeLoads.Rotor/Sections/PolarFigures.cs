namespace BladeLoads.Rotor.Sections;

/// <summary>What an aerodynamicist asks a polar first.</summary>
/// <param name="Attached">Zero-lift angle and lift slope; null for a section that does not lift.</param>
/// <param name="LargestLift">
/// The stall point (<see cref="StallPoint"/>), or the largest lift below 90 degrees of a table that ends before stall; null where
/// no row above 0 lifts.
/// </param>
/// <param name="LowestLift">The same below 0.</param>
/// <param name="BestLiftToDrag">The row within 30 degrees with the largest ratio; null where there is none with lift and drag above 0.</param>
/// <param name="LeastDrag">The row within 20 degrees with the least drag; null where the table has none there.</param>
/// <param name="FirstPeakAngle">rad: beyond it an element counts as stalled (<see cref="FirstLiftPeak"/>); infinite where nothing lifts.</param>
public sealed record PolarFigures(
    PotentialLift? Attached, PolarExtreme? LargestLift, PolarExtreme? LowestLift, PolarExtreme? BestLiftToDrag, PolarExtreme? LeastDrag,
    double FirstPeakAngle)
{
    private const double Working = Math.PI / 6;
    private const double Slender = Math.PI / 9;
    private const double MuchDrag = 0.1;

    /// <summary>
    /// A round or nearly round section, as blades have at their root: nowhere within 20 degrees has it less drag than 0.1. What is
    /// expected of a slender section does not hold for it. Common practice, no source.
    /// </summary>
    public bool IsBluff => LeastDrag is { Value: >= MuchDrag };

    /// <summary>Lift slope over that of a thin plate, 2 pi; null for a section that does not lift.</summary>
    public double? SlopeRatio => Attached?.LiftSlope / (2 * Math.PI);

    public static PolarFigures Of(Polar polar)
    {
        PolarExtreme? bestRatio = null, leastDrag = null;
        for (var i = 0; i < polar.Angles.Length; i++)
        {
            var (angle, ratio) = (polar.Angles[i], polar.Lift[i] / polar.Drag[i]);
            if (Math.Abs(angle) <= Working && polar.Drag[i] > 0 && ratio > (bestRatio?.Value ?? 0))
                bestRatio = new PolarExtreme(i, angle, ratio, AtEnd: false);
            if (Math.Abs(angle) <= Slender && polar.Drag[i] < (leastDrag?.Value ?? double.PositiveInfinity))
                leastDrag = new PolarExtreme(i, angle, polar.Drag[i], AtEnd: false);
        }
        return new PolarFigures(
            PotentialLift.Of(polar), Peak(polar, StallPoint.Above(polar), 1), Peak(polar, StallPoint.Below(polar), -1), bestRatio, leastDrag,
            FirstLiftPeak.Of(polar).Peak);
    }

    private static PolarExtreme? Peak(Polar polar, int? stall, int sign)
    {
        if (stall is { } row)
            return new PolarExtreme(row, polar.Angles[row], polar.Lift[row], AtEnd: false);
        var end = sign > 0 ? polar.Angles.Length - 1 : 0;
        var angle = sign * polar.Angles[end];
        return angle is > 0 and < Math.PI / 2 && sign * polar.Lift[end] > 0
            ? new PolarExtreme(end, polar.Angles[end], polar.Lift[end], AtEnd: true)
            : null;
    }
}

/// <summary>A row of a polar that has the largest or the least of something.</summary>
/// <param name="Angle">rad</param>
/// <param name="AtEnd">The table ends there: beyond may lie more.</param>
public readonly record struct PolarExtreme(int Row, double Angle, double Value, bool AtEnd);
