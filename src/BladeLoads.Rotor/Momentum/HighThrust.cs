namespace BladeLoads.Rotor.Momentum;

/// <summary>
/// The relation between the thrust of an annulus and its axial induction <c>a</c>: simple momentum theory for light loading, an empirical
/// curve where the wake no longer has the energy to stream away.
/// </summary>
/// <remarks>
/// Loading is measured by <c>k = solidity x normal force coefficient / (4 F sin2 phi)</c>, with which
/// <c>CT = 4 F k (1 - a)^2</c>. Sources: keys glauert1935, buhl2005 in docs/sources.md.
/// </remarks>
public static class HighThrust
{
    /// <summary>Loading beyond which the relation of glauert-1935 holds: a = 1/3.</summary>
    internal const double GlauertLoading = 0.5;

    /// <summary>Loading beyond which the relation of buhl-2005 holds: a = 0.4.</summary>
    internal const double BuhlLoading = 2.0 / 3;

    /// <summary>
    /// Thrust coefficient of an annulus. Momentum theory <c>4 F a (1 - a)</c>; beyond a = 1/3, glauert-1935:
    /// <c>4 F a (1 - a (5 - 3 a)/4)</c>; beyond a = 0.4, buhl-2005: <c>8/9 + (4 F - 40/9) a + (50/9 - 4 F) a^2</c>.
    /// </summary>
    /// <param name="axialInduction">Up to 1.</param>
    /// <param name="lossFactor">Above 0 to 1.</param>
    public static double ThrustCoefficient(double axialInduction, double lossFactor, HeavyLoading relation)
    {
        var (a, F) = (axialInduction, lossFactor);
        return relation switch
        {
            HeavyLoading.Glauert1935 when a > 1.0 / 3 => 4 * F * a * (1 - (a * (5 - (3 * a)) / 4)),
            HeavyLoading.Buhl2005 when a > 0.4 => (8.0 / 9) + (((4 * F) - (40.0 / 9)) * a) + (((50.0 / 9) - (4 * F)) * a * a),
            _ => 4 * F * a * (1 - a),
        };
    }

    /// <summary>
    /// <c>1 / (1 - a)</c>, the wind speed over the speed through the disc, at a loading <paramref name="k"/>. For light loading it is
    /// <c>1 + k</c>, also for negative k; it passes through 0 at k = -1, where no flow exists.
    /// </summary>
    /// <param name="k">Any; heavy loading begins at 1/2 (glauert-1935) or 2/3 (buhl-2005).</param>
    /// <param name="lossFactor">F, above 0 to 1.</param>
    public static double InverseSpeedRatio(double k, double lossFactor, HeavyLoading relation)
    {
        if (relation == HeavyLoading.Glauert1935)
            return k > GlauertLoading ? InverseByGlauert(k) : 1 + k;
        return k > BuhlLoading ? InverseByBuhl(k, lossFactor) : 1 + k;
    }

    // With v = 1/(1 - a) the relation a (1 - a (5 - 3a)/4) = k (1 - a)^2 becomes 2v^3 - 3v^2 + 4(1 - k)v - 3 = 0, of which the largest
    // root is wanted. The start is exact at k = 1/2 and right to a few percent beyond; from there Newton's steps are quadratic.
    private static double InverseByGlauert(double k)
    {
        var v = 0.75 + Math.Sqrt((2 * k) - 0.4375);
        for (var i = 0; i < 20; i++)
        {
            var f = (((((2 * v) - 3) * v) + (4 * (1 - k))) * v) - 3;
            var slope = (6 * v * (v - 1)) + (4 * (1 - k));
            var step = f / slope;
            v -= step;
            if (Math.Abs(step) <= 1e-9 * v)
                break;
        }
        return v;
    }

    // The relation with v = 1/(1 - a) is 2v^2 + (4F - 20/3)v + 50/9 - 4F = 4Fk. Of the published root, a = (2Fk - 4/9)/(g1 + sqrt g2), this
    // is another way to write 1/(1 - a), without its 0/0 at 2Fk = 4/9.
    private static double InverseByBuhl(double k, double F) => (5.0 / 3) - F + Math.Sqrt((2 * F * k) - (F * ((4.0 / 3) - F)));
}
