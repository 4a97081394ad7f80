namespace BladeLoads.Rotor.Sections;

/// <summary>What <see cref="PolarExtension"/> adds to one polar, that lifts and is not complete.</summary>
internal sealed class ExtensionCurve
{
    private const double RightAngle = Math.PI / 2;

    // A row nearer to its neighbour than this, rad, would make a needle of a secant.
    private const double Nearest = 0.5 * Math.PI / 180;

    // Degrees between added rows. Between two rows coefficients are within 0.003 of the curve then.
    private const double Step = 2.5;

    private readonly Polar _polar;
    private readonly double _largestDrag;
    private readonly double _floor;
    private readonly int? _stallAbove;
    private readonly int? _stallBelow;
    private readonly (int Row, ExtensionKind Kind) _above;
    private readonly (int Row, ExtensionKind Kind) _below;

    // The stall point, through which all mirrored flow goes.
    private readonly double _stallAngle;
    private readonly Coefficients _atStall;
    private readonly DeepStall _stalled;
    private readonly Coefficients _atEnd;

    // Of a mirrored side below zero: where lift has come down along the lift line to that of the mirrored stall point; rad, outwards.
    private readonly double _knee;
    private int _raised;

    public ExtensionCurve(Polar polar, double largestDrag, ExtensionJoin join)
    {
        (_polar, _largestDrag) = (polar, largestDrag);
        _floor = PlateFriction.Laminar(polar.Reynolds);
        (_stallAbove, _stallBelow) = (StallPoint.Above(polar), StallPoint.Below(polar));
        var last = polar.Angles.Length - 1;
        var stall = _stallAbove ?? LastBelowRightAngle();
        (_stallAngle, _atStall) = (polar.Angles[stall], RowAt(stall));
        _stalled = DeepStall.Through(_stallAngle, _atStall.Lift, _atStall.Drag, largestDrag);
        _above = PolarExtension.ReachesEnd(polar, 1) ? (last, ExtensionKind.Complete)
            : join == ExtensionJoin.Stall && _stallAbove is { } above ? (above, ExtensionKind.FromStall)
            : (last, ExtensionKind.FromEnd);
        _below = PolarExtension.ReachesEnd(polar, -1) ? (0, ExtensionKind.Complete)
            : join == ExtensionJoin.Stall && _stallBelow is { } below ? (below, ExtensionKind.FromStall)
            : _stallBelow is not null || polar.Angles[0] < Math.Min(0, Nearest - _stallAngle) ? (0, ExtensionKind.FromEnd)
            : (0, ExtensionKind.Mirrored);
        _knee = Knee();
        // -180 and 180 degrees are one angle: where the table has one of them, the other is the same.
        _atEnd = _above.Kind == ExtensionKind.Complete ? RowAt(last)
            : _below.Kind == ExtensionKind.Complete ? RowAt(0)
            : new Coefficients(0, PotentialLift.ZeroLiftDrag(polar));
    }

    public ExtendedPolar Extend()
    {
        var rows = new List<(double Angle, double Lift, double Drag)>();
        for (var i = _below.Row; i <= _above.Row; i++)
            rows.Add((_polar.Angles[i], _polar.Lift[i], _polar.Drag[i]));
        var (above, below) = (SideOf(1), SideOf(-1));
        if (above.Kind != ExtensionKind.Complete)
            rows.AddRange(Added(1, _polar.Angles[_above.Row]));
        if (below.Kind != ExtensionKind.Complete)
            rows.InsertRange(0, Enumerable.Reverse(Added(-1, _polar.Angles[_below.Row])));
        return new ExtendedPolar(PolarExtension.FromRows(_polar.Reynolds, rows), above, below, _largestDrag, _raised);
    }

    // Outwards.
    private List<(double Angle, double Lift, double Drag)> Added(int sign, double join)
    {
        var added = new List<(double Angle, double Lift, double Drag)>();
        foreach (var angle in AnglesBeyond(sign, sign * join))
        {
            var (lift, drag) = At(sign, angle);
            if (drag < _floor)
                _raised++;
            added.Add((sign * angle, lift + 0.0, Math.Max(drag, _floor)));
        }
        return added;
    }

    private SortedSet<double> AnglesBeyond(int sign, double join)
    {
        var isMirrored = sign < 0 && _below.Kind == ExtensionKind.Mirrored;
        double[] corners = isMirrored ? [_knee, _stallAngle, RightAngle, Math.PI - _stallAngle, Math.PI] : [RightAngle, Math.PI - _stallAngle, Math.PI];
        // Just beyond a join the curve bends most; a row there keeps the table's cubic from cutting the corner.
        var first = join + Nearest;
        var angles = new SortedSet<double>();
        if (!isMirrored && corners.All(corner => corner > first + Nearest))
            angles.Add(first);
        foreach (var corner in corners.Where(corner => corner == Math.PI || corner > join + Nearest))
            if (corner is RightAngle or Math.PI || corners.All(other => other == corner || Math.Abs(other - corner) > Nearest))
                angles.Add(corner);
        for (var step = 1; step * Step < 180; step++)
            if (double.DegreesToRadians(step * Step) is var angle && angle > first + Nearest
                && corners.All(corner => Math.Abs(angle - corner) > Nearest))
                angles.Add(angle);
        return angles;
    }

    // Where the lift line does not come down so far before the mirrored stall point, a straight line leads there.
    private double Knee()
    {
        if (_below.Kind != ExtensionKind.Mirrored || PotentialLift.Of(_polar) is not { } line)
            return _stallAngle;
        var (join, joined) = (-_polar.Angles[0], RowAt(0));
        var knee = join + ((joined.Lift - Mirrored(_atStall).Lift) / line.LiftSlope);
        return knee > join + Nearest && knee < _stallAngle - Nearest ? knee : _stallAngle;
    }

    /// <summary>Coefficients of the extension at <c>sign x angle</c>.</summary>
    /// <param name="angle">rad, from the join to pi.</param>
    private Coefficients At(int sign, double angle)
    {
        var (row, kind) = sign > 0 ? _above : _below;
        var join = sign * _polar.Angles[row];
        var joined = RowAt(row);
        if (angle >= RightAngle)
        {
            var reversed = Reversed(sign, angle);
            if (join < RightAngle || join >= Math.PI)
                return reversed;
            // A table that ends beyond 90 degrees: its difference to the mirrored curve fades to none at 180.
            var there = Reversed(sign, join);
            var left = (Math.PI - angle) / (Math.PI - join);
            return new Coefficients(
                reversed.Lift + (left * (joined.Lift - there.Lift)), Math.Max(0, reversed.Drag + (left * (joined.Drag - there.Drag))));
        }
        if (sign > 0)
            return Curve(1, join, joined).At(angle);
        if (kind != ExtensionKind.Mirrored)
            return Mirrored(Curve(-1 / PolarExtension.MirroredLift, join, joined).At(angle));
        if (angle >= _stallAngle)
            return Mirrored(_stalled.At(angle));
        var end = Mirrored(_atStall);
        var (liftShare, dragShare) = (Math.Min(1, (angle - join) / (_knee - join)), (angle - join) / (_stallAngle - join));
        return new Coefficients(joined.Lift + (liftShare * (end.Lift - joined.Lift)), joined.Drag + (dragShare * (end.Drag - joined.Drag)));
    }

    private DeepStall Curve(double liftFactor, double join, Coefficients joined)
        => DeepStall.Through(join, liftFactor * joined.Lift, joined.Drag, _largestDrag);

    private static Coefficients Mirrored(Coefficients c) => new(-PolarExtension.MirroredLift * c.Lift, c.Drag);

    // From 90 to 180 degrees on either side: the trailing edge leads. Lift there has the sign of the other side's.
    private Coefficients Reversed(int sign, double angle)
    {
        if (angle == RightAngle)
            return new Coefficients(0, _largestDrag);
        var x = Math.PI - angle;
        var stalled = Mirrored(x >= _stallAngle ? _stalled.At(x) : _atStall);
        var (lift, drag) = (sign * stalled.Lift, stalled.Drag);
        if (x >= _stallAngle)
            return new Coefficients(lift, drag);
        var share = x / _stallAngle;
        return new Coefficients(_atEnd.Lift + (share * (lift - _atEnd.Lift)), _atEnd.Drag + (share * (drag - _atEnd.Drag)));
    }

    private ExtendedSide SideOf(int sign)
    {
        var (row, kind) = sign > 0 ? _above : _below;
        if (kind == ExtensionKind.Complete)
            return PolarExtension.Complete(_polar, sign);
        var join = _polar.Angles[row];
        var before = row - sign;
        var (liftBreak, dragBreak) = (double.NaN, double.NaN);
        if (before >= 0 && before < _polar.Angles.Length)
        {
            const double Little = 1e-6;
            var (here, beyond, inside) = (RowAt(row), At(sign, (sign * join) + Little), RowAt(before));
            var width = join - _polar.Angles[before];
            liftBreak = (sign * (beyond.Lift - here.Lift) / Little) - ((here.Lift - inside.Lift) / width);
            dragBreak = (sign * (beyond.Drag - here.Drag) / Little) - ((here.Drag - inside.Drag) / width);
        }
        return new ExtendedSide(
            kind, join, liftBreak, dragBreak, (sign > 0 ? _stallAbove : _stallBelow) is not null,
            sign > 0 ? _polar.Angles.Length - 1 - row : row);
    }

    private Coefficients RowAt(int row) => new(_polar.Lift[row], _polar.Drag[row]);

    private int LastBelowRightAngle()
    {
        var row = -1;
        for (var i = 0; i < _polar.Angles.Length; i++)
            if (PolarExtension.IsBetween0And90Degrees(_polar.Angles[i]))
                row = i;
        return row;
    }
}
