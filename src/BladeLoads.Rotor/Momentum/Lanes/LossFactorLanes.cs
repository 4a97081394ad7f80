using System.Runtime.Intrinsics;

namespace BladeLoads.Rotor.Momentum.Lanes;

/// <summary><see cref="LossFactor"/>, eight at a time.</summary>
internal static class LossFactorLanes
{
    /// <summary><c>result[i]</c> is <c>LossFactor.Of(exponent[i], sine[i])</c> to 1e-15; near an end of
    /// the blade to what a unit in the last place of the exponential makes of it.</summary>
    public static Vector512<double> Of(Vector512<double> exponent, Vector512<double> sine)
    {
        var f = exponent / sine;
        // Away from an end of the blade, or where a loss is left out: 1 in every lane, to the last digit.
        if (Vector512.LessThanAll(f, Vector512.Create(LossFactor.NegligibleExponent)))
            return Vector512<double>.One;
        return (2 / Math.PI) * TrigonometryLanes.AcosOfPositive(Vector512.Exp(Vector512.Max(f, Vector512.Create(LossFactor.NegligibleExponent))));
    }
}
