namespace BladeLoads.Rotor.Sections;

/// <summary>
/// Slopes of the piecewise cubic Hermite interpolant that keeps the shape of its data: monotone between any two neighbouring points, so
/// that the extremes of an interval are the values at its ends.
/// </summary>
/// <remarks>
/// Interior slopes: keys fritsch-butland1984, fritsch-carlson1980 in docs/sources.md. Ends: three-point formula, limited so that the
/// shape is kept; not periodic.
/// </remarks>
public static class Pchip
{
    /// <summary>Slopes at the points, one a point.</summary>
    /// <param name="x">At least three, rising.</param>
    /// <param name="y">One an x.</param>
    /// <param name="slopes">Receives the slopes; as long as <paramref name="x"/>.</param>
    public static void Slopes(ReadOnlySpan<double> x, ReadOnlySpan<double> y, Span<double> slopes)
    {
        var n = x.Length;
        for (var i = 1; i < n - 1; i++)
        {
            var (h1, h2) = (x[i] - x[i - 1], x[i + 1] - x[i]);
            var (d1, d2) = ((y[i] - y[i - 1]) / h1, (y[i + 1] - y[i]) / h2);
            var (w1, w2) = ((2 * h2) + h1, h2 + (2 * h1));
            slopes[i] = SameSign(d1, d2) ? (w1 + w2) / ((w1 / d1) + (w2 / d2)) : 0;
        }
        slopes[0] = EndSlope(x[1] - x[0], x[2] - x[1], (y[1] - y[0]) / (x[1] - x[0]), (y[2] - y[1]) / (x[2] - x[1]));
        slopes[n - 1] = EndSlope(
            x[n - 1] - x[n - 2], x[n - 2] - x[n - 3],
            (y[n - 1] - y[n - 2]) / (x[n - 1] - x[n - 2]), (y[n - 2] - y[n - 3]) / (x[n - 2] - x[n - 3]));
    }

    /// <summary>The interpolant at one place.</summary>
    /// <param name="x">At least two, rising; with two the interpolant is a straight line.</param>
    /// <param name="y">One an x.</param>
    /// <param name="at">Within the range of <paramref name="x"/>.</param>
    public static double ValueAt(ReadOnlySpan<double> x, ReadOnlySpan<double> y, double at)
    {
        var i = 0;
        while (i < x.Length - 2 && at >= x[i + 1])
            i++;
        var (h, u) = (x[i + 1] - x[i], at - x[i]);
        var d = (y[i + 1] - y[i]) / h;
        if (x.Length == 2)
            return y[i] + (u * d);
        Span<double> slopes = stackalloc double[x.Length];
        Slopes(x, y, slopes);
        var (s0, s1) = (slopes[i], slopes[i + 1]);
        return y[i] + (u * (s0 + (u * ((((3 * d) - (2 * s0) - s1) / h) + (u * ((s0 + s1 - (2 * d)) / (h * h)))))));
    }

    private static double EndSlope(double h0, double h1, double d0, double d1)
    {
        var slope = ((((2 * h0) + h1) * d0) - (h0 * d1)) / (h0 + h1);
        if (!SameSign(slope, d0))
            return 0;
        return !SameSign(d0, d1) && Math.Abs(slope) > 3 * Math.Abs(d0) ? 3 * d0 : slope;
    }

    private static bool SameSign(double a, double b) => (a > 0 && b > 0) || (a < 0 && b < 0);
}
