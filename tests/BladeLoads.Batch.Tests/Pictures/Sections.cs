using BladeLoads.Rotor.Sections;

namespace BladeLoads.Batch.Tests.Pictures;

/// <summary>Invented sections to draw.</summary>
internal static class Sections
{
    public static Polar Lifting(double reynolds, double factor = 1, double fromDeg = -12, double toDeg = 20) => Rows(
        reynolds, [.. Enumerable.Range(0, 17).Select(i => fromDeg + (i * (toDeg - fromDeg) / 16))],
        deg => factor * (deg < 12 ? 0.1 * deg : 1.2 - (0.04 * (deg - 12))), deg => factor * (0.01 + (0.0002 * deg * deg)));

    public static Section Of(params double[] reynolds)
        => Section.FromPolars("fell-21", reynolds.Select((re, i) => Lifting(re, 1 + (0.02 * i))));

    public static Section Round() => Section.FromPolars("round", [Rows(double.NaN, [-180, 0, 180], _ => 0, _ => 0.6)]);

    public static Polar Rows(double reynolds, double[] anglesDeg, Func<double, double> lift, Func<double, double> drag) => Polar.FromRows(
        reynolds, [.. anglesDeg.Select(double.DegreesToRadians)], [.. anglesDeg.Select(lift)], [.. anglesDeg.Select(drag)]);
}
