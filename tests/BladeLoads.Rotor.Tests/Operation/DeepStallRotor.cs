using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Operation;

/// <summary>
/// An invented rotor, slow for its blades, whose sections beyond stall are flat plates: <c>cl = 0.65 sin 2 alpha</c>, <c>cd = 0.01 + 1.3 sin^2 alpha</c>.
/// Held at fine pitch and top speed its power passes a maximum and falls far below it at high wind. No figure of it is a reference for anything.
/// </summary>
internal static class DeepStallRotor
{
    public const double Degree = Math.PI / 180;

    private const double StallDeg = 10, ZeroLiftDeg = -4;

    // One register of annuli: these tests solve some hundred thousand operating points.
    private const int Elements = 8;

    public static RotorCase Case(Control control, double[] windSpeeds, double dropWidthDeg) => InventedRotor.Case(
        control, windSpeeds, model: InventedRotor.Model with { Elements = Elements }) with
    {
        Sections = SectionSet.Of([SectionOf("inboard", dropWidthDeg), SectionOf("outboard", dropWidthDeg)]),
    };

    /// <summary>Lift 2 pi per radian up to stall; from there over the width of the drop to that of the plate.</summary>
    private static Section SectionOf(string name, double dropWidthDeg)
    {
        double[] anglesDeg = [.. Enumerable.Range(-180, 361).Select(i => (double)i)];
        const double Top = 2 * Math.PI * (StallDeg - ZeroLiftDeg) * Degree;
        double Lift(double deg)
        {
            var attached = Math.Clamp(2 * Math.PI * (deg - ZeroLiftDeg) * Degree, -Top, Top);
            var beyond = Math.Max(deg - StallDeg, (2 * ZeroLiftDeg) - StallDeg - deg);
            var share = Math.Clamp(1 - (beyond / dropWidthDeg), 0, 1);
            return (share * attached) + ((1 - share) * 0.65 * Math.Sin(2 * deg * Degree));
        }
        return Section.FromPolars(name, [Polar.FromRows(
            double.NaN, [.. anglesDeg.Select(deg => Math.Clamp(deg * Degree, -Math.PI, Math.PI))], [.. anglesDeg.Select(Lift)],
            [.. anglesDeg.Select(deg => 0.01 + (1.3 * Math.Pow(Math.Sin(deg * Degree), 2)))])]);
    }
}
