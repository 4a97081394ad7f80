namespace BladeLoads.Rotor.Sections;

/// <summary>Where a polar is joined to its extension: at stall, or at its end, which keeps every row.</summary>
public enum ExtensionJoin { Stall, End }

/// <summary>How a side of a polar was extended.</summary>
public enum ExtensionKind
{
    /// <summary>It reaches 180 degrees and is left as it is.</summary>
    Complete,

    /// <summary>From the stall point; rows beyond it were left out.</summary>
    FromStall,

    /// <summary>From its end.</summary>
    FromEnd,

    /// <summary>Below zero: the table ends before it stalls there, and passes to the mirrored stall point of the other side.</summary>
    Mirrored,

    /// <summary>A round section, that does not lift: its end value goes on.</summary>
    CarriedOn,
}

/// <summary>A polar from -180 to 180 degrees, and how it came to be.</summary>
/// <param name="LargestDrag">Drag coefficient at 90 degrees of the extension.</param>
/// <param name="RaisedToFloor">Added rows whose drag was raised to that of a plate along the wind.</param>
public sealed record ExtendedPolar(Polar Polar, ExtendedSide Above, ExtendedSide Below, double LargestDrag, int RaisedToFloor);

/// <summary>One side of an extended polar.</summary>
/// <param name="JoinAngle">rad: the last row of the table that is left; +-pi where the side is complete.</param>
/// <param name="LiftSlopeBreak">A radian: slope of lift just beyond the join less the secant before it; NaN where there is no join.</param>
/// <param name="DragSlopeBreak">The same of drag.</param>
/// <param name="ShowsStall">Whether the table stalls on that side; else its extension rests on a guess.</param>
/// <param name="RowsLeftOut">Rows beyond the stall point that were replaced.</param>
public sealed record ExtendedSide(
    ExtensionKind Kind, double JoinAngle, double LiftSlopeBreak, double DragSlopeBreak, bool ShowsStall, int RowsLeftOut);

/// <summary>
/// Carries a polar on to +-180 degrees by the relation of Viterna and Corrigan for deep stall. Coefficients are continuous at the
/// joins; how much their slopes break there is told.
/// </summary>
/// <remarks>
/// From the join to 90 degrees: <see cref="DeepStall"/>. Beyond 90: mirrored, with 0.7 of the lift, through the stall point; from 180 degrees
/// less the angle of stall on in a straight line to no lift and the drag at zero lift at 180. Below zero: mirrored in the same way, through the
/// table's own values where it stalls there. Source: key viterna-corrigan1982 in docs/sources.md; mirroring and the factor are common practice,
/// no source. Where a table is special, docs/theory.md says what is done.
/// </remarks>
public static class PolarExtension
{
    /// <summary>Share of the lift that is left in mirrored flow.</summary>
    public const double MirroredLift = 0.7;

    /// <summary>
    /// Whether a polar can be extended: it is complete, or round, or has a row between 0 and 90 degrees.
    /// </summary>
    public static bool CanExtend(Polar polar)
        => (ReachesEnd(polar, 1) && ReachesEnd(polar, -1)) || polar.IsRound || polar.Angles.Any(IsBetween0And90Degrees);

    /// <summary>The polar from -180 to 180 degrees.</summary>
    /// <param name="aspectRatio">Of the blade: length over mean chord, above 0; above 50 counts as 50.</param>
    /// <exception cref="ArgumentException">The polar cannot be extended: see <see cref="CanExtend"/>.</exception>
    public static ExtendedPolar Extend(Polar polar, double aspectRatio, ExtensionJoin join)
    {
        var largestDrag = DeepStall.LargestDrag(aspectRatio);
        if (ReachesEnd(polar, 1) && ReachesEnd(polar, -1))
            return new ExtendedPolar(polar, Complete(polar, 1), Complete(polar, -1), largestDrag, 0);
        if (polar.IsRound)
            return CarryOn(polar, largestDrag);
        if (!polar.Angles.Any(IsBetween0And90Degrees))
            throw new ArgumentException("no row between 0 and 90 degrees", nameof(polar));
        return new ExtensionCurve(polar, largestDrag, join).Extend();
    }

    /// <param name="sign">1 for the side above zero, -1 for that below.</param>
    internal static bool ReachesEnd(Polar polar, int sign)
    {
        // Degrees turned into radians may miss pi by their last digit.
        const double Same = 1e-9;
        return sign > 0 ? polar.Angles[^1] >= Math.PI - Same : polar.Angles[0] <= -Math.PI + Same;
    }

    internal static bool IsBetween0And90Degrees(double angle) => angle is > 0 and < Math.PI / 2;

    internal static ExtendedSide Complete(Polar polar, int sign) => new(
        ExtensionKind.Complete, sign * Math.PI, double.NaN, double.NaN,
        (sign > 0 ? StallPoint.Above(polar) : StallPoint.Below(polar)) is not null, 0);

    private static ExtendedPolar CarryOn(Polar polar, double largestDrag)
    {
        var rows = polar.Angles.Select((angle, i) => (Angle: angle, Lift: polar.Lift[i], Drag: polar.Drag[i])).ToList();
        if (!ReachesEnd(polar, -1))
            rows.Insert(0, (-Math.PI, 0, rows[0].Drag));
        if (!ReachesEnd(polar, 1))
            rows.Add((Math.PI, 0, rows[^1].Drag));
        ExtendedSide Side(int sign) => ReachesEnd(polar, sign) ? Complete(polar, sign) : new ExtendedSide(
            ExtensionKind.CarriedOn, sign > 0 ? polar.Angles[^1] : polar.Angles[0], double.NaN, double.NaN, ShowsStall: false, 0);
        return new ExtendedPolar(FromRows(polar.Reynolds, rows), Side(1), Side(-1), largestDrag, 0);
    }

    internal static Polar FromRows(double reynolds, IReadOnlyCollection<(double Angle, double Lift, double Drag)> rows) => Polar.FromRows(
        reynolds, [.. rows.Select(row => row.Angle)], [.. rows.Select(row => row.Lift)], [.. rows.Select(row => row.Drag)]);
}
