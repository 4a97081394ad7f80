namespace BladeLoads.Rotor.Momentum;

/// <summary>Closes a bracket of the residual on its root.</summary>
internal static class RootBracket
{
    /// <summary>
    /// The root within a bracket, by inverse quadratic interpolation where it can be trusted and bisection where not (key chandrupatla1997
    /// in docs/sources.md). Done when the bracket is no wider than the tolerance or the residual is 0; where the residual jumps across 0
    /// the place of the jump is the root.
    /// </summary>
    /// <param name="tolerance">rad.</param>
    public static Root Close(in Bracket bracket, in Annulus annulus, double tolerance, ref int evaluations)
    {
        // Scaled by the sine, the residual is nearly quadratic down to small angles, which interpolation follows better; the root stays.
        var (a, fa) = (bracket.Lower.InflowAngle, bracket.Lower.Residual * bracket.Lower.Sine);
        var (b, fb) = (bracket.Upper.InflowAngle, bracket.Upper.Residual * bracket.Upper.Sine);
        var (c, fc) = (a, fa);
        var step = fa / (fa - fb);
        for (var i = 0; i < 200 && fa != 0 && Math.Abs(b - a) > tolerance; i++)
        {
            // A step shorter than this would leave the bracket wide on its other side for ever.
            var least = 0.4 * tolerance / Math.Abs(b - a);
            var t = a + (Math.Clamp(step, least, 1 - least) * (b - a));
            var probe = Residual.At(t, annulus);
            evaluations++;
            var ft = probe.Residual * probe.Sine;
            if (ft > 0 == fa > 0)
                (c, fc) = (a, fa);
            else
                (c, fc, b, fb) = (b, fb, a, fa);
            (a, fa) = (t, ft);
            var xi = (a - b) / (c - b);
            var phi = (fa - fb) / (fc - fb);
            step = phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi
                ? (fa / (fb - fa) * fc / (fb - fc)) + ((c - a) / (b - a) * fa / (fc - fa) * fb / (fc - fb))
                : 0.5;
        }
        return Math.Abs(fa) <= Math.Abs(fb) ? new Root(a, fa / Math.Sin(a)) : new Root(b, fb / Math.Sin(b));
    }
}

/// <summary>An inflow angle, rad, and what is left of the balance there.</summary>
internal readonly record struct Root(double InflowAngle, double Residual)
{
    /// <summary>
    /// Whether the residual jumps across 0 here instead of vanishing: where a table does not go round, its ends meet at +-180 degrees with
    /// different lift. That is no balance.
    /// </summary>
    public bool IsJump(in Annulus annulus) => Math.Abs(Residual * Math.Sin(InflowAngle)) > 1e-8 * (1 + annulus.SpeedRatio);
}
