using System.Runtime.Intrinsics;

namespace BladeLoads.Rotor.Momentum.Lanes;

/// <summary><see cref="Residual"/>, eight at a time, for inflow angles above 0.</summary>
internal static class ResidualLanes
{
    /// <summary><c>result[i]</c> is <c>Residual.At(inflowAngle[i], annuli[i])</c> to 1e-13 of the largest of its terms.</summary>
    public static ProbeLanes At(Vector512<double> inflowAngle, in AnnulusLanes annuli)
    {
        var (sin, cos) = TrigonometryLanes.SinCos(inflowAngle);
        var (cl, cd) = annuli.CoefficientsAt(inflowAngle);
        var F = LossFactorLanes.Of(annuli.TipExponent, sin) * LossFactorLanes.Of(annuli.HubExponent, sin);
        var cn = (cl * cos) + (annuli.DragInBalance * cd * sin);
        var k = annuli.QuarterSolidity * cn / (F * sin * sin);
        var swirl = annuli.QuarterSolidity * cl / F;
        var residual = (sin * HighThrustLanes.InverseSpeedRatio(k, F, annuli.HeavyLoading)) - (annuli.SpeedRatio * (cos - swirl));
        return new ProbeLanes(inflowAngle, sin, cos, F, residual);
    }
}

/// <summary>Eight probes.</summary>
internal readonly record struct ProbeLanes(
    Vector512<double> InflowAngle, Vector512<double> Sine, Vector512<double> Cosine, Vector512<double> LossFactor,
    Vector512<double> Residual)
{
    public static ProbeLanes Select(Vector512<double> mask, in ProbeLanes whereSet, in ProbeLanes elsewhere) => new(
        Vector512.ConditionalSelect(mask, whereSet.InflowAngle, elsewhere.InflowAngle),
        Vector512.ConditionalSelect(mask, whereSet.Sine, elsewhere.Sine),
        Vector512.ConditionalSelect(mask, whereSet.Cosine, elsewhere.Cosine),
        Vector512.ConditionalSelect(mask, whereSet.LossFactor, elsewhere.LossFactor),
        Vector512.ConditionalSelect(mask, whereSet.Residual, elsewhere.Residual));

    /// <param name="probes">Receives one a lane.</param>
    public void CopyTo(Span<Probe> probes)
    {
        const int Count = AnnulusLanes.Count;
        Span<double> lanes = stackalloc double[5 * Count];
        InflowAngle.CopyTo(lanes);
        Sine.CopyTo(lanes[Count..]);
        Cosine.CopyTo(lanes[(2 * Count)..]);
        LossFactor.CopyTo(lanes[(3 * Count)..]);
        Residual.CopyTo(lanes[(4 * Count)..]);
        for (var i = 0; i < Count; i++)
            probes[i] = new Probe(lanes[i], lanes[Count + i], lanes[(2 * Count) + i], lanes[(3 * Count) + i], lanes[(4 * Count) + i]);
    }
}
