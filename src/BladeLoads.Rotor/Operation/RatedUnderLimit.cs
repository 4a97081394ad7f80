using System.Collections.Immutable;

namespace BladeLoads.Rotor.Operation;

/// <summary>
/// The rated wind speed under a thrust limit: the rotor may pitch before it makes rated power, and comes to it later than at fine pitch.
/// </summary>
internal static class RatedUnderLimit
{
    private const double Step = 0.25;         // m/s
    private const double Tolerance = 1e-9;    // m/s

    /// <summary>
    /// m/s: the lowest from cut-in to cut-out at which rated power is held; null where there is none. The points of the curve tell it where
    /// the case lists wind speeds; where it lists none, the rest is walked, so that a short list does not pass for a rotor that is too weak.
    /// </summary>
    /// <param name="atFinePitch">m/s: where the rotor makes rated power without the limit; null for nowhere.</param>
    public static double? WindSpeed(
        RotorCase rotorCase, double? atFinePitch, ImmutableArray<CurvePoint> curve, ImmutableArray<DesignPoint> designPoints,
        Func<double, Region> regionAt)
    {
        if (atFinePitch is not { } first)
            return null;
        var (firstRow, lastRow) = (curve[0].Operation.WindSpeed, curve[^1].Operation.WindSpeed);
        var last = double.IsFinite(rotorCase.CutOutWindSpeed) ? rotorCase.CutOutWindSpeed : lastRow;
        return Walk(first, Math.Min(firstRow, last), regionAt)
            ?? curve.Concat(designPoints.Select(d => d.Point)).Where(p => p.Region == Region.RatedPower)
                .Min(p => (double?)p.Operation.WindSpeed)
            ?? Walk(Math.Max(first, lastRow), last, regionAt);
    }

    // A stretch of rated power shorter than a step is passed over: it would begin and end within a quarter of a metre a second.
    private static double? Walk(double from, double to, Func<double, Region> regionAt)
    {
        if (from > to)
            return null;
        if (regionAt(from) == Region.RatedPower)
            return from;
        for (var below = from; below < to;)
        {
            var above = Math.Min(below + Step, to);
            if (regionAt(above) == Region.RatedPower)
                return Close(below, above, regionAt);
            below = above;
        }
        return null;
    }

    private static double Close(double below, double above, Func<double, Region> regionAt)
    {
        while (above - below > Tolerance)
            if ((below + above) / 2 is var middle && regionAt(middle) == Region.RatedPower)
                above = middle;
            else
                below = middle;
        return above;
    }
}
