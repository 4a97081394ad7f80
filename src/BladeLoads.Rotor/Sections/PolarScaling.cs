namespace BladeLoads.Rotor.Sections;

/// <summary>By what a soiled or aged section differs from a clean one; four times 1 is the clean one.</summary>
/// <param name="LiftSlope">Of lift against angle about no lift, 0.5 to 1.5.</param>
/// <param name="LargestLift">Of the largest lift, 0.5 to 1.5, and at least half of <paramref name="LiftSlope"/>.</param>
/// <param name="LeastLift">Of the least (most negative) lift, likewise.</param>
/// <param name="DragFloor">Of the least drag, 0.5 to 10.</param>
public readonly record struct PolarFactors(double LiftSlope, double LargestLift, double LeastLift, double DragFloor);

/// <summary>What came of scaling a polar: a closed set.</summary>
public abstract record PolarScaling
{
    private const double Straight = 0.5;                 // share of the largest lift up to which lift follows the slope factor alone
    private const double LongestHold = Math.PI / 18;     // 10 degrees beyond the largest lift
    private const double FadeWidth = Math.PI / 12;       // 15 degrees

    private PolarScaling()
    {
    }

    /// <summary>The polar with its factors.</summary>
    /// <param name="Polar">On the same angles.</param>
    /// <param name="Range">Rows between which the flow is attached.</param>
    /// <param name="LeastDrag">Row of the least drag within them.</param>
    /// <param name="UnchangedBelow">rad; at this angle and below every value is as it was.</param>
    /// <param name="UnchangedAbove">rad; at this angle and above every value is as it was.</param>
    public sealed record Scaled(Polar Polar, AttachedRange Range, int LeastDrag, double UnchangedBelow, double UnchangedAbove) : PolarScaling;

    /// <summary>The polar has no attached flow (<see cref="AttachedRange.Of"/>), as a round section: there is nothing to scale.</summary>
    public sealed record WithoutLift : PolarScaling;

    /// <summary>Lift still rises where the table ends, or at 30 degrees: a factor on its largest value has nothing to hold on to.</summary>
    /// <param name="Row">The last row looked at.</param>
    public sealed record WithoutLargestLift(int Row) : PolarScaling;

    /// <summary>
    /// Scales lift slope, largest and least lift, and the floor of drag of a polar, where its flow is attached; nothing where it is
    /// separated.
    /// </summary>
    /// <remarks>
    /// Between least and largest lift, with x = cl/clmax (below 0: cl/clmin) and q = max(0, (x - x1)/(1 - x1)):
    /// <c>cl' = LiftSlope cl + (LargestLift - LiftSlope) clmax q^2</c>, x1 = 1/2, or 2 LargestLift/LiftSlope - 1 where that is less, so
    /// that more lift stays more lift. Beyond, <c>cl' = cl (1 + (LargestLift - 1) A)</c>; <c>cd' = cd + (DragFloor - 1) min(cd, cdmin) A</c>.
    /// A is 1 up to the end of attached flow and from there falls to 0 within 15 degrees as 1 - 3 t^2 + 2 t^3. Attached flow ends at the
    /// largest lift, or, where lift stays above its new largest value, with the last row that does, up to 10 degrees on. Where the least
    /// lift is not in the table, the slope factor serves alone below 0. docs/theory.md, 1.7. Common practice, no source.
    /// </remarks>
    /// <exception cref="ArgumentOutOfRangeException">A factor is outside its range.</exception>
    public static PolarScaling Of(Polar polar, PolarFactors factors)
    {
        Check(factors);
        if (AttachedRange.Of(polar) is not { } range)
            return new WithoutLift();
        if (!range.HasLargestLift && factors.LargestLift != factors.LiftSlope)
            return new WithoutLargestLift(range.Last);
        var above = new Side(polar, range.Last, 1, factors.LiftSlope, range.HasLargestLift ? factors.LargestLift : factors.LiftSlope);
        var below = new Side(polar, range.First, -1, factors.LiftSlope, range.HasLeastLift ? factors.LeastLift : factors.LiftSlope);
        var leastDrag = range.First;
        for (var i = range.First; i <= range.Last; i++)
            if (polar.Drag[i] < polar.Drag[leastDrag])
                leastDrag = i;

        var lift = new double[polar.Angles.Length];
        var drag = new double[polar.Angles.Length];
        for (var i = 0; i < lift.Length; i++)
        {
            var side = i < range.First ? below : i > range.Last ? above : polar.Lift[i] < 0 ? below : above;
            var weight = i < range.First ? below.Weight(polar.Angles[i]) : i > range.Last ? above.Weight(polar.Angles[i]) : 1;
            lift[i] = i >= range.First && i <= range.Last
                ? side.Attached(polar.Lift[i])
                : polar.Lift[i] * (1 + ((side.Factor - 1) * weight));
            drag[i] = polar.Drag[i] + ((factors.DragFloor - 1) * Math.Min(polar.Drag[i], polar.Drag[leastDrag]) * weight);
        }
        return new Scaled(
            Polar.FromRows(polar.Reynolds, polar.Angles.AsSpan(), lift, drag), range, leastDrag, below.Separated, above.Separated);
    }

    private static void Check(PolarFactors factors)
    {
        if (!(factors.LiftSlope is >= 0.5 and <= 1.5 && factors.LargestLift is >= 0.5 and <= 1.5 && factors.LeastLift is >= 0.5 and <= 1.5
            && factors.DragFloor is >= 0.5 and <= 10))
            throw new ArgumentOutOfRangeException(nameof(factors), "factors on lift are 0.5 to 1.5, on drag 0.5 to 10");
        if (Math.Min(factors.LargestLift, factors.LeastLift) < factors.LiftSlope / 2)
            throw new ArgumentOutOfRangeException(nameof(factors), "the factor on largest and least lift is at least half of that on the slope");
    }

    /// <summary>Positive or negative lift, with the end of attached flow on that side.</summary>
    private sealed class Side
    {
        private readonly double _slope;
        private readonly double _farthest;
        private readonly double _straight;
        private readonly double _hold;
        private readonly int _sign;

        public Side(Polar polar, int farthest, int sign, double slope, double factor)
        {
            (_slope, Factor, _sign) = (slope, factor, sign);
            _farthest = polar.Lift[farthest];
            _straight = Math.Min(Straight, (2 * factor / slope) - 1);
            var hold = farthest;
            while (IsHeld(polar, hold + sign, polar.Angles[farthest]))
                hold += sign;
            _hold = polar.Angles[hold];
        }

        /// <summary>On lift, at its largest and beyond.</summary>
        public double Factor { get; }

        public double Separated => _hold + (_sign * FadeWidth);

        public double Attached(double lift)
        {
            if (_farthest == 0 || Factor == _slope)
                return _slope * lift;
            var q = Math.Max(0, ((lift / _farthest) - _straight) / (1 - _straight));
            return (_slope * lift) + ((Factor - _slope) * _farthest * q * q);
        }

        public double Weight(double angle)
        {
            var t = Math.Clamp(_sign * (angle - _hold) / FadeWidth, 0, 1);
            return 1 - (t * t * (3 - (2 * t)));
        }

        private bool IsHeld(Polar polar, int row, double angle)
            => row >= 0 && row < polar.Angles.Length && _sign * (polar.Angles[row] - angle) <= LongestHold
                && _sign * polar.Lift[row] > Factor * _sign * _farthest;
    }
}
