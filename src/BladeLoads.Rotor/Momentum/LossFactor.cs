namespace BladeLoads.Rotor.Momentum;

/// <summary>
/// Prandtl's loss factor: the finite number of blades lets flow round their ends, so that the mean induction of an annulus is less than
/// the induction at the blade. Dimensionless, 0 (at the end) to 1.
/// </summary>
public static class LossFactor
{
    /// <summary>
    /// Loss at the blade tip: <c>F = (2/pi) acos(exp(-B (R - r) / (2 r abs(sin phi))))</c>.
    /// </summary>
    /// <param name="bladeCount">1 or more.</param>
    /// <param name="radius">m, above 0, at most <paramref name="tipRadius"/>.</param>
    /// <param name="tipRadius">m.</param>
    /// <param name="inflowAngle">rad, any sign; at 0 the factor is 1 (its limit).</param>
    /// <remarks>Source: key glauert1935 in docs/sources.md.</remarks>
    public static double Tip(int bladeCount, double radius, double tipRadius, double inflowAngle)
        => Of(TipExponent(bladeCount, radius, tipRadius), Math.Abs(Math.Sin(inflowAngle)));

    /// <summary>
    /// Loss at the blade root: <c>F = (2/pi) acos(exp(-B (r - Rh) / (2 Rh abs(sin phi))))</c>.
    /// </summary>
    /// <param name="bladeCount">1 or more.</param>
    /// <param name="radius">m, at least <paramref name="hubRadius"/>.</param>
    /// <param name="hubRadius">m, above 0.</param>
    /// <param name="inflowAngle">rad, any sign; at 0 the factor is 1 (its limit).</param>
    /// <remarks>Common practice, no source: Prandtl's form with the hub in place of the tip.</remarks>
    public static double Hub(int bladeCount, double radius, double hubRadius, double inflowAngle)
        => Of(HubExponent(bladeCount, radius, hubRadius), Math.Abs(Math.Sin(inflowAngle)));

    /// <summary>Below this the exponential is lost beside 1 in the factor's last digit.</summary>
    internal const double NegligibleExponent = -40;

    /// <summary>What is divided by <c>abs(sin phi)</c> in the tip's exponential; 0 or less.</summary>
    internal static double TipExponent(int bladeCount, double radius, double tipRadius)
        => -bladeCount * (tipRadius - radius) / (2 * radius);

    /// <summary>What is divided by <c>abs(sin phi)</c> in the hub's exponential; 0 or less.</summary>
    internal static double HubExponent(int bladeCount, double radius, double hubRadius)
        => -bladeCount * (radius - hubRadius) / (2 * hubRadius);

    internal static double Of(double exponent, double sine)
    {
        var f = exponent / sine;
        if (!(f > NegligibleExponent))
            return 1;
        return 2 / Math.PI * Math.Acos(Math.Exp(f));
    }
}
