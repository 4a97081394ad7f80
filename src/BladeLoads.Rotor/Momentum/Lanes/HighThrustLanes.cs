using System.Runtime.Intrinsics;

namespace BladeLoads.Rotor.Momentum.Lanes;

/// <summary><see cref="HighThrust"/>, eight at a time.</summary>
internal static class HighThrustLanes
{
    /// <summary><c>result[i]</c> is <c>HighThrust.InverseSpeedRatio(k[i], lossFactor[i], relation)</c> to 1e-14 of its value.</summary>
    public static Vector512<double> InverseSpeedRatio(Vector512<double> k, Vector512<double> lossFactor, HeavyLoading relation)
    {
        var light = Vector512<double>.One + k;
        var heavilyLoaded = Vector512.GreaterThan(
            k, Vector512.Create(relation == HeavyLoading.Glauert1935 ? HighThrust.GlauertLoading : HighThrust.BuhlLoading));
        if (heavilyLoaded == Vector512<double>.Zero)
            return light;
        // Lightly loaded lanes are given a loading at which the heavy relation stands, and dropped.
        var heavyK = Vector512.ConditionalSelect(heavilyLoaded, k, Vector512<double>.One);
        var heavy = relation == HeavyLoading.Glauert1935 ? InverseByGlauert(heavyK) : InverseByBuhl(heavyK, lossFactor);
        return Vector512.ConditionalSelect(heavilyLoaded, heavy, light);
    }

    private static Vector512<double> InverseByGlauert(Vector512<double> k)
    {
        var v = Vector512.Create(0.75) + Vector512.Sqrt((2 * k) - Vector512.Create(0.4375));
        var linear = 4 * (Vector512<double>.One - k);
        var three = Vector512.Create(3.0);
        var open = Vector512<double>.AllBitsSet;
        for (var i = 0; i < 20 && open != Vector512<double>.Zero; i++)
        {
            var f = (((((2 * v) - three) * v) + linear) * v) - three;
            var slope = (6 * v * (v - Vector512<double>.One)) + linear;
            var step = f / slope;
            // A lane that is done takes no further step, or its last digit would depend on its slowest neighbour.
            v -= step & open;
            open &= Vector512.GreaterThan(Vector512.Abs(step), 1e-9 * v);
        }
        return v;
    }

    private static Vector512<double> InverseByBuhl(Vector512<double> k, Vector512<double> F)
        => Vector512.Create(5.0 / 3) - F + Vector512.Sqrt((2 * F * k) - (F * (Vector512.Create(4.0 / 3) - F)));
}
