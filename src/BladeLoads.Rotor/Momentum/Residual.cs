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
        var t = Terms.At(inflowAngle, annulus);
        var residual = inflowAngle > 0
            ? (t.Sine * HighThrust.InverseSpeedRatio(t.K, t.F, annulus.HeavyLoading)) - (annulus.SpeedRatio * (t.Cosine - t.Swirl))
            : (t.Sine * (1 - t.K)) - (annulus.SpeedRatio * (t.Cosine + t.Swirl));
        return new Probe(inflowAngle, t.Sine, t.Cosine, t.F, residual);
    }

    /// <summary>
    /// The induction at a balanced inflow angle, and whether it is a flow: one that passes the disc downwind and turns with the blade no
    /// faster than the blade.
    /// </summary>
    public static Induction InductionAt(double inflowAngle, in Annulus annulus)
    {
        var t = Terms.At(inflowAngle, annulus);
        var swirl = inflowAngle > 0 ? t.Swirl : -t.Swirl;
        var throughDisc = inflowAngle > 0 ? 1 / HighThrust.InverseSpeedRatio(t.K, t.F, annulus.HeavyLoading) : 1 / (1 - t.K);
        var isFlow = throughDisc / t.Sine > 0 && t.Cosine - swirl >= 0 && (inflowAngle > 0 || t.K > 1);
        // a' = k'/(1 - k') with k' = swirl / cos phi, written so that it stands at cos phi = 0.
        return new Induction(1 - throughDisc, swirl / (t.Cosine - swirl), t.F, t.Coefficients, t.Sine, t.Cosine, isFlow);
    }

    /// <param name="K">k: solidity x normal force coefficient / (4 F sin2 phi).</param>
    /// <param name="Swirl">k' cos phi: solidity x lift coefficient / (4 F).</param>
    private readonly record struct Terms(double Sine, double Cosine, Coefficients Coefficients, double F, double K, double Swirl)
    {
        public static Terms At(double inflowAngle, in Annulus annulus)
        {
            var (sin, cos) = Math.SinCos(inflowAngle);
            var coefficients = annulus.CoefficientsAt(annulus.AngleOfAttack(inflowAngle));
            var F = annulus.LossAt(Math.Abs(sin));
            var cn = (coefficients.Lift * cos) + (annulus.DragInBalance * coefficients.Drag * sin);
            var k = annulus.Solidity * cn / (4 * F * sin * sin);
            return new Terms(sin, cos, coefficients, F, k, annulus.Solidity * coefficients.Lift / (4 * F));
        }
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
