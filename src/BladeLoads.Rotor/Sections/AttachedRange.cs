namespace BladeLoads.Rotor.Sections;

/// <summary>
/// The rows of a polar between which the flow is attached: about no lift, from the least lift to the largest.
/// </summary>
/// <param name="First">Row of the least lift; where that is not in the table, the first row from -30 degrees on.</param>
/// <param name="Last">Row of the largest lift; where that is not in the table, the last row up to 30 degrees.</param>
/// <param name="HasLeastLift">Whether lift turns at <paramref name="First"/>.</param>
/// <param name="HasLargestLift">Whether lift turns at <paramref name="Last"/>.</param>
/// <remarks>
/// Common practice, no source. Largest is the first lift from which it falls by a tenth, and by 0.05 at least; where it falls by less up
/// to 30 degrees, the largest up to there, unless it is that of the last row. Smaller dips are the noise of a tunnel, and beyond 30 degrees
/// lift rises once more, as that of a flat plate. Likewise below. Counted from the row nearest to 0 degrees.
/// </remarks>
public readonly record struct AttachedRange(int First, int Last, bool HasLeastLift, bool HasLargestLift)
{
    private const double WidestAngle = Math.PI / 6;
    private const double FarthestFromZero = Math.PI / 18;
    private const double Fall = 0.1;
    private const double LeastFall = 0.05;
    private const double LittleLift = 0.3;   // every section but a round one goes beyond

    /// <summary>
    /// Null where the polar lifts nowhere by 0.3, as a round section; where its lift falls from 0 degrees on; where it has no row within
    /// 10 degrees of 0.
    /// </summary>
    public static AttachedRange? Of(Polar polar)
    {
        var middle = NearestToZero(polar);
        if (Math.Abs(polar.Angles[middle]) > FarthestFromZero)
            return null;
        var (last, hasLargest) = Turn(polar, middle, 1);
        var (first, hasLeast) = Turn(polar, middle, -1);
        var lifts = polar.Lift[last] >= LittleLift || polar.Lift[first] <= -LittleLift;
        return lifts && !(hasLargest && last == middle) ? new AttachedRange(first, last, hasLeast, hasLargest) : null;
    }

    private static int NearestToZero(Polar polar)
    {
        var nearest = 0;
        for (var i = 1; i < polar.Angles.Length; i++)
            if (Math.Abs(polar.Angles[i]) < Math.Abs(polar.Angles[nearest]))
                nearest = i;
        return nearest;
    }

    // Upwards, or, with everything turned round, downwards.
    private static (int Row, bool Turns) Turn(Polar polar, int from, int sign)
    {
        var (farthest, end) = (from, from);
        for (var i = from; i >= 0 && i < polar.Angles.Length && Math.Abs(polar.Angles[i]) <= WidestAngle; i += sign)
        {
            var (lift, largest) = (sign * polar.Lift[i], sign * polar.Lift[farthest]);
            if (lift > largest)
                farthest = i;
            else if (largest > 0 && largest - lift > Math.Max(Fall * largest, LeastFall))
                return (farthest, true);
            end = i;
        }
        return farthest != end && sign * polar.Lift[farthest] > 0 ? (farthest, true) : (end, false);
    }
}
