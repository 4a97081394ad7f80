using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Momentum;

/// <summary>
/// The momentum balance of an annulus as one equation in the inflow angle: where it is 0, the forces on the blade and the momentum that
/// the wake has lost agree, along the axis and round it.
/// </summary>
/// <remarks>
/// Single-variable form: key ning2014 in docs/sources.md. Where we depart from it: drag leaves no swirl in the wake, and counts along the
/// axis only. With drag in the swirl the residual falls to minus infinity as the inflow angle goes to 0 from above, and a false balance
/// near a = 1 hides the propeller-brake state.
/// </remarks>
internal static class Residual
{
    /// <summary>
    /// phi above 0: <c>sin phi/(1 - a) - (Vn/Vt)(cos phi - s cl/(4F))</c>; below 0 (propeller brake):
    /// <c>sin phi (1 - k) - (Vn/Vt)(cos phi + s cl/(4F))</c>. A ratio of speeds.
    /// </summary>
    /// <param name="inflowAngle">rad, -pi to pi, not 0.</param>
    public static Probe At(double inflowAngle, in Annulus annulus)
    {
        var (sin, cos) = Math.SinCos(inflowAngle);
        var (cl, cd) = annulus.CoefficientsAt(annulus.AngleOfAttack(inflowAngle));
        var F = annulus.LossAt(Math.Abs(sin));
        var cn = (cl * cos) + (annulus.DragInBalance * cd * sin);
        var k = annulus.Solidity * cn / (4 * F * sin * sin);
        var swirl = annulus.Solidity * cl / (4 * F);
        var residual = inflowAngle > 0
            ? (sin * HighThrust.InverseSpeedRatio(k, F, annulus.HeavyLoading)) - (annulus.SpeedRatio * (cos - swirl))
            : (sin * (1 - k)) - (annulus.SpeedRatio * (cos + swirl));
        return new Probe(inflowAngle, sin, cos, F, residual);
    }

    /// <summary>
    /// The induction at a balanced inflow angle, and whether it is a flow: one that passes the disc downwind and turns with the blade no
    /// faster than the blade.
    /// </summary>
    public static Induction InductionAt(double inflowAngle, in Annulus annulus)
    {
        var (sin, cos) = Math.SinCos(inflowAngle);
        var (cl, cd) = annulus.CoefficientsAt(annulus.AngleOfAttack(inflowAngle));
        var F = annulus.LossAt(Math.Abs(sin));
        var cn = (cl * cos) + (annulus.DragInBalance * cd * sin);
        var k = annulus.Solidity * cn / (4 * F * sin * sin);
        var swirl = annulus.Solidity * cl / (4 * F) * (inflowAngle > 0 ? 1 : -1);
        var throughDisc = inflowAngle > 0 ? 1 / HighThrust.InverseSpeedRatio(k, F, annulus.HeavyLoading) : 1 / (1 - k);
        var isFlow = throughDisc / sin > 0 && cos - swirl >= 0 && (inflowAngle > 0 || k > 1);
        // a' = k'/(1 - k') with k' = swirl / cos phi, written so that it stands at cos phi = 0.
        return new Induction(1 - throughDisc, swirl / (cos - swirl), F, new Coefficients(cl, cd), sin, cos, isFlow);
    }
}

/// <summary>The residual at an inflow angle, with what its bounds are made from.</summary>
internal readonly record struct Probe(double InflowAngle, double Sine, double Cosine, double LossFactor, double Residual);

/// <param name="Axial">a; refers to the undisturbed wind along the normal of the coned blade.</param>
/// <param name="Tangential">a'.</param>
/// <param name="LossFactor">F.</param>
/// <param name="Coefficients">Of the section at the inflow angle.</param>
/// <param name="Sine">Of the inflow angle.</param>
/// <param name="Cosine">Of the inflow angle.</param>
/// <param name="IsFlow">Whether such a flow can exist.</param>
internal readonly record struct Induction(
    double Axial, double Tangential, double LossFactor, Coefficients Coefficients, double Sine, double Cosine, bool IsFlow);
