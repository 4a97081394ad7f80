using System.Runtime.Intrinsics;

namespace BladeLoads.Rotor.Momentum.Lanes;

/// <summary><see cref="RootBracket"/>, eight at a time; every lane has its own fate.</summary>
internal static class RootLanes
{
    /// <summary>
    /// The roots within eight brackets, each as <see cref="RootBracket.Close"/> would close it, in the same steps. A lane that is done is
    /// frozen; where <paramref name="wanted"/> is not set a lane does not count.
    /// </summary>
    /// <param name="rounds">Evaluations that the slowest lane took.</param>
    public static (Vector512<double> InflowAngle, Vector512<double> Residual) Close(
        in ProbeLanes lower, in ProbeLanes upper, Vector512<double> wanted, in AnnulusLanes annuli, double tolerance, out int rounds)
    {
        var (a, fa) = (lower.InflowAngle, lower.Residual * lower.Sine);
        var (b, fb) = (upper.InflowAngle, upper.Residual * upper.Sine);
        var (c, fc) = (a, fa);
        var step = fa / (fa - fb);
        var one = Vector512<double>.One;
        var zero = Vector512<double>.Zero;
        for (rounds = 0; rounds < 200; rounds++)
        {
            var width = Vector512.Abs(b - a);
            var active = wanted & Vector512.GreaterThan(width, Vector512.Create(tolerance)) & ~Vector512.Equals(fa, zero);
            if (active == zero)
                break;
            var least = Vector512.Create(0.4 * tolerance) / width;
            var t = a + (Vector512.Min(Vector512.Max(step, least), one - least) * (b - a));
            // Lanes that are done, or were never wanted, stay where a residual exists.
            t = Vector512.ConditionalSelect(active, t, lower.InflowAngle);
            var probe = ResidualLanes.At(t, annuli);
            var ft = probe.Residual * probe.Sine;
            var sameSide = Vector512.Equals(Vector512.GreaterThan(ft, zero).AsInt64(), Vector512.GreaterThan(fa, zero).AsInt64()).AsDouble();
            var keep = ~active;
            (c, fc) = (Select(keep, c, Vector512.ConditionalSelect(sameSide, a, b)), Select(keep, fc, Vector512.ConditionalSelect(sameSide, fa, fb)));
            (b, fb) = (Select(keep | sameSide, b, a), Select(keep | sameSide, fb, fa));
            (a, fa) = (Select(keep, a, t), Select(keep, fa, ft));
            var xi = (a - b) / (c - b);
            var phi = (fa - fb) / (fc - fb);
            var trusted = Vector512.LessThan(phi * phi, xi) & Vector512.LessThan((one - phi) * (one - phi), one - xi);
            var quadratic = (fa / (fb - fa) * fc / (fb - fc)) + ((c - a) / (b - a) * fa / (fc - fa) * fb / (fc - fb));
            step = Vector512.ConditionalSelect(trusted, quadratic, Vector512.Create(0.5));
        }
        var aIsBetter = Vector512.LessThanOrEqual(Vector512.Abs(fa), Vector512.Abs(fb));
        var root = Vector512.ConditionalSelect(aIsBetter, a, b);
        return (root, Vector512.ConditionalSelect(aIsBetter, fa, fb) / TrigonometryLanes.SinCos(root).Sine);
    }

    private static Vector512<double> Select(Vector512<double> mask, Vector512<double> whereSet, Vector512<double> elsewhere)
        => Vector512.ConditionalSelect(mask, whereSet, elsewhere);
}
