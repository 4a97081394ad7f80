namespace BladeLoads.Rotor.Momentum;

/// <summary>
/// What can be proved of the residual between two inflow angles without looking at every angle between them.
/// </summary>
/// <remarks>
/// With s = abs(sin phi) and y = solidity x cn / (4 F), the first term of the residual for phi above 0 is W(s, y) = s / (1 - a) at
/// k = y/s^2. In light loading W = s + y/s, so dW/ds = 1 - k. In heavy loading v = W/s solves a polynomial in s and y, whose derivatives
/// give dW/ds = (3v^2 - 8v + 9)/(4v^2 - 3v + 3/v) for glauert-1935 and ((20/3 - 4F)v - (100/9 - 8F))/(4v + 4F - 20/3) for buhl-2005: both at
/// least 0.33. So W rises with s and with y everywhere, and falls with F where cn is positive; bounds of each give bounds of W. The slope
/// dW/dy is at most 1/s. The coefficients are bounded by their values at the ends and at the rows between.
/// </remarks>
internal static class ResidualBounds
{
    private const double LeastSlopeInSine = 0.33;

    /// <summary>
    /// True where the residual is proved to keep one sign from <paramref name="a"/> to <paramref name="b"/>, both on one side of 0 and of
    /// pi/2.
    /// </summary>
    public static bool KeepOneSign(in Probe a, in Probe b, in Annulus annulus, in Sections.CoefficientRange range)
    {
        var lambda = annulus.SpeedRatio;
        var quarterSolidity = annulus.Solidity / 4;
        var (leastSine, largestSine) = Ordered(Math.Abs(a.Sine), Math.Abs(b.Sine));
        var (leastCosine, largestCosine) = Ordered(a.Cosine, b.Cosine);
        var (leastLoss, largestLoss) = Ordered(a.LossFactor, b.LossFactor);
        var (leastLift, largestLift) = Product(range.LeastLift, range.LargestLift, leastCosine, largestCosine);
        var drag = annulus.DragInBalance;
        // Rounding of a few units in the last place of the largest term must not prove what is not so.
        var margin = 1e-12 * (1 + lambda);

        if (a.InflowAngle > 0)
        {
            var leastCn = leastLift + (drag * range.LeastDrag * leastSine);
            var largestCn = largestLift + (drag * range.LargestDrag * largestSine);
            if (a.Residual > 0)
            {
                var F = leastCn >= 0 ? largestLoss : leastLoss;
                var first = leastSine * HighThrust.InverseSpeedRatio(
                    quarterSolidity * leastCn / (F * leastSine * leastSine), F, annulus.HeavyLoading);
                var leastSwirl = quarterSolidity * range.LeastLift / (range.LeastLift >= 0 ? largestLoss : leastLoss);
                return first - (lambda * largestCosine) + (lambda * leastSwirl) > margin;
            }
            else
            {
                var F = largestCn >= 0 ? leastLoss : largestLoss;
                var first = largestSine * HighThrust.InverseSpeedRatio(
                    quarterSolidity * largestCn / (F * largestSine * largestSine), F, annulus.HeavyLoading);
                var largestSwirl = quarterSolidity * range.LargestLift / (range.LargestLift >= 0 ? leastLoss : largestLoss);
                return first - (lambda * leastCosine) + (lambda * largestSwirl) < -margin;
            }
        }

        // Propeller brake: -s + y/s - lambda (cos phi + swirl), with cn = cl cos phi - cd s.
        if (a.Residual > 0)
        {
            var cn = leastLift - (drag * range.LargestDrag * largestSine);
            var y = quarterSolidity * cn / (cn >= 0 ? largestLoss : leastLoss);
            var largestSwirl = quarterSolidity * range.LargestLift / (range.LargestLift >= 0 ? leastLoss : largestLoss);
            return -largestSine + (y / (cn >= 0 ? largestSine : leastSine)) - (lambda * (largestCosine + largestSwirl)) > margin;
        }
        else
        {
            var cn = largestLift - (drag * range.LeastDrag * leastSine);
            var y = quarterSolidity * cn / (cn >= 0 ? leastLoss : largestLoss);
            var leastSwirl = quarterSolidity * range.LeastLift / (range.LeastLift >= 0 ? largestLoss : leastLoss);
            return -leastSine + (y / (cn >= 0 ? leastSine : largestSine)) - (lambda * (leastCosine + leastSwirl)) < -margin;
        }
    }

    /// <summary>
    /// True where the residual is proved to rise all the way from <paramref name="a"/> to <paramref name="b"/>, both in (0, pi/2]. Never
    /// where the angle of attack passes +-180 degrees between them: lift may jump there.
    /// </summary>
    public static bool Rises(in Probe a, in Probe b, in Annulus annulus, in Sections.CoefficientRange range)
    {
        if (!(a.InflowAngle > 0) || b.Cosine < 0 || annulus.AngleOfAttack(a.InflowAngle) > annulus.AngleOfAttack(b.InflowAngle))
            return false;
        var lambda = annulus.SpeedRatio;
        // The logarithmic derivative of each of the two losses by the angle lies between -cot(phi)/2 and 0, that of 1/F within this.
        var cotangent = a.Cosine / a.Sine;
        var drag = annulus.DragInBalance;
        var leastCn = Math.Min(0, range.LeastLift) + (drag * range.LeastDrag * a.Sine);
        var swirlSlope = range.LeastLiftSlope + (Math.Min(0, range.LeastLift) * cotangent);
        var liftSlope = range.LeastLiftSlope * (range.LeastLiftSlope >= 0 ? b.Cosine : a.Cosine);
        var sineTerm = (drag * range.LeastDragSlope) - range.LargestLift;
        var cnSlope = liftSlope + (sineTerm * (sineTerm >= 0 ? a.Sine : b.Sine)) + (drag * range.LeastDrag * b.Cosine)
            + (Math.Min(0, leastCn) * cotangent);
        // What falls, falls fastest where F is least.
        var perLoss = annulus.Solidity / (4 * Math.Min(a.LossFactor, b.LossFactor));
        var slope = (LeastSlopeInSine * b.Cosine) + (lambda * a.Sine)
            + (perLoss * Math.Min(0, cnSlope) / a.Sine) + (perLoss * lambda * Math.Min(0, swirlSlope));
        return slope > 0;
    }

    private static (double Least, double Largest) Ordered(double a, double b) => a <= b ? (a, b) : (b, a);

    private static (double Least, double Largest) Product(double a0, double a1, double b0, double b1)
    {
        var (p, q, r, t) = (a0 * b0, a0 * b1, a1 * b0, a1 * b1);
        return (Math.Min(Math.Min(p, q), Math.Min(r, t)), Math.Max(Math.Max(p, q), Math.Max(r, t)));
    }
}
