namespace BladeLoads.Rotor.Sections;

/// <summary>
/// Lift of a section without separation, by its own table: <c>slope x sin(alpha - zero-lift angle)</c>.
/// </summary>
/// <param name="ZeroLiftAngle">rad</param>
/// <param name="LiftSlope">A radian, above 0; near 2 pi for a thin section.</param>
/// <remarks>
/// The sine is that of a plate (key glauert1926 in docs/sources.md). The slope is the table's and not 2 pi, so that attached flow, where the
/// table is right, stays what it is: departure from snel1993 and du-selig1998, see docs/theory.md.
/// </remarks>
public readonly record struct PotentialLift(double ZeroLiftAngle, double LiftSlope)
{
    /// <summary>How far from 0 a zero-lift angle is looked for, rad.</summary>
    private const double Farthest = 20 * Math.PI / 180;

    /// <summary>How far from zero lift the flow is taken to be attached, rad.</summary>
    private const double Attached = 4 * Math.PI / 180;

    public double At(double angle) => LiftSlope * Math.Sin(angle - ZeroLiftAngle);

    /// <summary>
    /// Zero-lift angle: where lift passes through 0 upwards, straight between two rows, the place nearest to 0 degrees within 20. Slope: that
    /// of the straight line through it that fits the rows within 4 degrees best, or the nearest row on either side where there is none so
    /// near. A table that begins above zero lift is carried on downwards by the straight line through its first rows.
    /// </summary>
    /// <returns>Null for a section that does not lift: a round one, or one whose lift does not rise through 0.</returns>
    public static PotentialLift? Of(Polar polar)
        => ZeroLift(polar) is { } zeroLift ? Through(zeroLift, polar) : FromFirstRows(polar);

    private static double? ZeroLift(Polar polar)
    {
        double? nearest = null;
        for (var i = 1; i < polar.Angles.Length; i++)
        {
            var (below, above) = (polar.Lift[i - 1], polar.Lift[i]);
            if (!(below <= 0 && above >= 0 && above > below))
                continue;
            var angle = polar.Angles[i - 1] + ((polar.Angles[i] - polar.Angles[i - 1]) * (-below / (above - below)));
            if (Math.Abs(angle) <= Farthest && !(Math.Abs(angle) >= Math.Abs(nearest ?? double.PositiveInfinity)))
                nearest = angle;
        }
        return nearest;
    }

    private static PotentialLift? Through(double zeroLift, Polar polar)
    {
        // Rounding of the zero-lift angle must not make a neighbour of the row that it is.
        const double Same = 1e-9;
        var (before, after, near) = (double.PositiveInfinity, double.PositiveInfinity, 0);
        foreach (var angle in polar.Angles)
        {
            var x = angle - zeroLift;
            if (Math.Abs(x) <= Same)
                continue;
            (before, after) = x < 0 ? (Math.Min(before, -x), after) : (before, Math.Min(after, x));
            near += Math.Abs(x) <= Attached + Same ? 1 : 0;
        }
        var (low, high) = near >= 2 ? (-Attached, Attached) : (-before, after);
        var (xy, xx) = (0.0, 0.0);
        for (var i = 0; i < polar.Angles.Length; i++)
            if (polar.Angles[i] - zeroLift is var x && x >= low - Same && x <= high + Same)
                (xy, xx) = (xy + (x * polar.Lift[i]), xx + (x * x));
        return xy > 0 ? new PotentialLift(zeroLift, xy / xx) : null;
    }

    private static PotentialLift? FromFirstRows(Polar polar)
    {
        if (!(Math.Abs(polar.Angles[0]) <= Farthest && polar.Lift[0] > 0))
            return null;
        var (n, sx, sy, sxx, sxy) = (0, 0.0, 0.0, 0.0, 0.0);
        for (var i = 0; i < polar.Angles.Length && (n < 2 || polar.Angles[i] - polar.Angles[0] <= Attached); i++)
        {
            var (x, y) = (polar.Angles[i] - polar.Angles[0], polar.Lift[i]);
            (n, sx, sy, sxx, sxy) = (n + 1, sx + x, sy + y, sxx + (x * x), sxy + (x * y));
        }
        var slope = ((n * sxy) - (sx * sy)) / ((n * sxx) - (sx * sx));
        var zeroLift = polar.Angles[0] - ((sy - (slope * sx)) / n / slope);
        return slope > 0 && Math.Abs(zeroLift) <= Farthest ? new PotentialLift(zeroLift, slope) : null;
    }

    /// <summary>Drag coefficient of a polar at an angle, rad: straight between its rows, the end's beyond them.</summary>
    internal static double DragAt(Polar polar, double angle)
    {
        if (angle <= polar.Angles[0])
            return polar.Drag[0];
        for (var i = 1; i < polar.Angles.Length; i++)
            if (angle <= polar.Angles[i])
            {
                var share = (angle - polar.Angles[i - 1]) / (polar.Angles[i] - polar.Angles[i - 1]);
                return polar.Drag[i - 1] + (share * (polar.Drag[i] - polar.Drag[i - 1]));
            }
        return polar.Drag[^1];
    }

    /// <summary>Drag coefficient at zero lift; the least of the table where the section does not lift.</summary>
    public static double ZeroLiftDrag(Polar polar) => Of(polar) is { } lift ? DragAt(polar, lift.ZeroLiftAngle) : polar.Drag.Min();
}
