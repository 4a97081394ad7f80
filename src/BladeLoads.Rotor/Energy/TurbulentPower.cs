using MathNet.Numerics;
using MathNet.Numerics.Distributions;

namespace BladeLoads.Rotor.Energy;

/// <summary>The ten-minute mean of power in turbulent wind, from the steady curve.</summary>
public static class TurbulentPower
{
    /// <summary>Deviations to either side of the mean beyond which wind speeds are left out: 1e-15 of them.</summary>
    private const double Reach = 8;

    private const int Order = 16;

    /// <summary>Mean power of a curve at a mean wind speed, W; NaN where a point without a balance lies within reach of the gusts.</summary>
    /// <inheritdoc cref="Mean(Func{double, double}, ReadOnlySpan{double}, double, double)"/>
    public static double Mean(SteadyPower steady, double windSpeed, double intensity)
        => Mean(steady.At, steady.Joints.AsSpan(), windSpeed, intensity);

    /// <summary>
    /// Mean power at a mean wind speed, W: the integral of <c>P(v)</c> over the normal distribution of mean V and deviation TI V.
    /// </summary>
    /// <param name="steady">Steady power, W, at a wind speed in m/s.</param>
    /// <param name="joints">m/s, rising: where the steady power may have a kink or a jump; none is integrated across.</param>
    /// <param name="windSpeed">Mean, m/s, above 0.</param>
    /// <param name="intensity">Standard deviation over mean, 0 or above.</param>
    /// <remarks>
    /// Gauss-Legendre quadrature of order 16 between joints no further apart than one deviation. The gust passes too fast for the rotor speed
    /// to follow, in truth; the steady curve at every wind speed is the customary simplification (key iec61400-12-1, from memory).
    /// </remarks>
    public static double Mean(Func<double, double> steady, ReadOnlySpan<double> joints, double windSpeed, double intensity)
    {
        var deviation = intensity * windSpeed;
        if (deviation == 0)
            return steady(windSpeed);
        var (from, to) = (Math.Max(0, windSpeed - (Reach * deviation)), windSpeed + (Reach * deviation));
        var sum = 0.0;
        foreach (var joint in joints)
            if (joint > from && joint < to)
            {
                sum += Between(from, joint);
                from = joint;
            }
        return sum + Between(from, to);

        double Between(double a, double b)
        {
            var pieces = Math.Max(1, (int)Math.Ceiling((b - a) / deviation));
            var total = 0.0;
            for (var i = 0; i < pieces; i++)
                total += Integrate.GaussLegendre(
                    v => steady(v) * Normal.PDF(windSpeed, deviation, v), a + ((b - a) * i / pieces), a + ((b - a) * (i + 1) / pieces), Order);
            return total;
        }
    }
}
