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
    public static Probe Close(in Bracket bracket, in Annulus annulus, double tolerance, ref int evaluations)
    {
        // Scaled by the sine, the residual is nearly quadratic down to small angles, which interpolation follows better; the root stays.
        static double Scaled(in Probe p) => p.Residual * p.Sine;

        var (a, b) = (bracket.Lower, bracket.Upper);
        var (fa, fb) = (Scaled(a), Scaled(b));
        var (c, fc) = (a, fa);
        var step = fa / (fa - fb);
        for (var i = 0; i < 200; i++)
        {
            var t = Residual.At(a.InflowAngle + (step * (b.InflowAngle - a.InflowAngle)), annulus);
            evaluations++;
            var ft = Scaled(t);
            if (ft > 0 == fa > 0)
                (c, fc) = (a, fa);
            else
                (c, fc, b, fb) = (b, fb, a, fa);
            (a, fa) = (t, ft);
            var best = Math.Abs(fa) < Math.Abs(fb) ? a : b;
            var width = Math.Abs(b.InflowAngle - a.InflowAngle);
            if (best.Residual == 0 || width <= tolerance)
                return best;
            var xi = (a.InflowAngle - b.InflowAngle) / (c.InflowAngle - b.InflowAngle);
            var phi = (fa - fb) / (fc - fb);
            step = phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi
                ? (fa / (fb - fa) * fc / (fb - fc)) + ((c.InflowAngle - a.InflowAngle) / (b.InflowAngle - a.InflowAngle) * fa / (fc - fa) * fb / (fc - fb))
                : 0.5;
            // A step shorter than this would leave the bracket wide on its other side for ever.
            var least = 0.4 * tolerance / width;
            step = Math.Clamp(step, least, 1 - least);
        }
        return Math.Abs(fa) < Math.Abs(fb) ? a : b;
    }
}
