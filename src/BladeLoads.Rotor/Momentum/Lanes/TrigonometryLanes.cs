using System.Runtime.Intrinsics;

namespace BladeLoads.Rotor.Momentum.Lanes;

/// <summary>
/// Sine, cosine and arc cosine, eight at a time, each lane by the same steps whatever its neighbours hold: the framework's own vector sine
/// takes another path when one lane is large, and would let an annulus change the last digits of the one beside it.
/// </summary>
/// <remarks>Source of the coefficients: key fdlibm5.3 in docs/sources.md.</remarks>
internal static class TrigonometryLanes
{
    /// <summary>
    /// Sine and cosine of angles from 0 to pi, rad; largest error 2 ulp of 1. Scalar twin: <see cref="Math.SinCos"/>.
    /// </summary>
    public static (Vector512<double> Sine, Vector512<double> Cosine) SinCos(Vector512<double> angle)
    {
        var quarters = Vector512.Round(angle * (2 / Math.PI));
        // pi/2 in two parts, the first with its last 20 bits clear, so that a few quarters are taken off exactly.
        var r = angle - (quarters * 1.57079632673412561417e+00) - (quarters * 6.07710050650619224932e-11);
        var z = r * r;
        var sine = r + (r * z * SinePart(z));
        var cosine = Vector512<double>.One - (z * 0.5) + (z * z * CosinePart(z));
        var isOdd = Vector512.Equals(quarters, Vector512<double>.One);
        var isTwo = Vector512.Equals(quarters, Vector512.Create(2.0));
        var (s, c) = (Vector512.ConditionalSelect(isOdd, cosine, sine), Vector512.ConditionalSelect(isOdd, -sine, cosine));
        return (Vector512.ConditionalSelect(isTwo, -s, s), Vector512.ConditionalSelect(isTwo, -c, c));
    }

    /// <summary>
    /// The arc cosine of 0 to 1, rad; largest error 2 ulp. Scalar twin: <see cref="Math.Acos"/>. Below 1/2 by the arc sine, above by the
    /// half-angle formula.
    /// </summary>
    public static Vector512<double> AcosOfPositive(Vector512<double> x)
    {
        var half = Vector512.Create(0.5);
        var large = Vector512.GreaterThan(x, half);
        var z = Vector512.ConditionalSelect(large, (Vector512<double>.One - x) * half, x * x);
        var root = Vector512.ConditionalSelect(large, Vector512.Sqrt(z), x);
        var asin = root + (root * ArcSinePart(z));
        return Vector512.ConditionalSelect(large, 2 * asin, Vector512.Create(Math.PI / 2) - asin);
    }

    private static Vector512<double> SinePart(Vector512<double> z) => Polynomial(
        z,
        [1.58969099521155010221e-10, -2.50507602534068634195e-08, 2.75573137070700676789e-06, -1.98412698298579493134e-04,
            8.33333333332248946124e-03, -1.66666666666666324348e-01]);

    private static Vector512<double> CosinePart(Vector512<double> z) => Polynomial(
        z,
        [-1.13596475577881948265e-11, 2.08757232129817482790e-09, -2.75573143513906633035e-07, 2.48015872894767294178e-05,
            -1.38888888888741095749e-03, 4.16666666666666019037e-02]);

    private static Vector512<double> ArcSinePart(Vector512<double> z)
    {
        var p = Polynomial(
            z,
            [3.47933107596021167570e-05, 7.91534994289814532176e-04, -4.00555345006794114027e-02, 2.01212532134862925881e-01,
                -3.25565818622400915405e-01, 1.66666666666666657415e-01]);
        var q = Polynomial(
            z,
            [7.70381505559019352791e-02, -6.88283971605453293030e-01, 2.02094576023350569471e+00, -2.40339491173441421878e+00, 1]);
        return p * z / q;
    }

    // Highest power first.
    private static Vector512<double> Polynomial(Vector512<double> z, ReadOnlySpan<double> coefficients)
    {
        var sum = Vector512.Create(coefficients[0]);
        foreach (var coefficient in coefficients[1..])
            sum = Vector512.FusedMultiplyAdd(sum, z, Vector512.Create(coefficient));
        return sum;
    }
}
