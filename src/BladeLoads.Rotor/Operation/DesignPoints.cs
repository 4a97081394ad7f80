using System.Collections.Immutable;

namespace BladeLoads.Rotor.Operation;

/// <summary>Finds the operating points worth a name, off the grid of wind speeds.</summary>
internal static class DesignPoints
{
    /// <summary>m/s; how closely a region's beginning and the largest thrust are found.</summary>
    private const double WindSpeedTolerance = 1e-9;

    /// <summary>Between two wind speeds of a case; there are seven regions.</summary>
    private const int MostBeginnings = 8;

    /// <param name="curve">The curve on the case's own wind speeds.</param>
    /// <param name="hints">m/s, rising: wind speeds at which a region is likely to begin.</param>
    /// <param name="solve">A row of the curve at any wind speed.</param>
    /// <param name="regionAt">Its region alone, which takes less.</param>
    public static ImmutableArray<DesignPoint> Of(
        RotorCase rotorCase, ImmutableArray<CurvePoint> curve, double? ratedWindSpeed, ReadOnlySpan<double> hints,
        Func<double, CurvePoint> solve, Func<double, Region> regionAt)
    {
        var found = new List<DesignPoint>();
        if (ratedWindSpeed is { } rated && rated >= curve[0].Operation.WindSpeed && rated <= curve[^1].Operation.WindSpeed)
            found.Add(new DesignPoint(DesignPoint.RatedWindSpeed, solve(rated)));
        for (var i = 1; i < curve.Length; i++)
            Beginnings(curve[i - 1], curve[i], hints, solve, regionAt, found);
        var inOperation = curve.Where(p => (p.Marks & (PointMarks.BelowCutIn | PointMarks.AboveCutOut)) == 0 && p.Loads is not null).ToArray();
        if (inOperation.Length > 0)
            found.Add(new DesignPoint(DesignPoint.LargestThrust, LargestThrust(rotorCase, inOperation, found, solve)));
        return [.. found.OrderBy(p => p.Point.Operation.WindSpeed).ThenBy(p => p.Name, StringComparer.Ordinal)];
    }

    // The places between two points at which the region becomes another, by bisection, the lowest first.
    private static void Beginnings(
        CurvePoint from, CurvePoint to, ReadOnlySpan<double> hints, Func<double, CurvePoint> solve, Func<double, Region> regionAt,
        List<DesignPoint> found)
    {
        var (region, start) = (from.Region, from.Operation.WindSpeed);
        // Where power or thrust lies on a limit to the last digits, regions could alternate without end.
        for (var beginnings = 0; region != to.Region && beginnings < MostBeginnings; beginnings++)
        {
            var (below, above) = (start, to.Operation.WindSpeed);
            void Look(double place)
            {
                if (place <= below || place >= above)
                    return;
                if (regionAt(place) == region)
                    below = place;
                else
                    above = place;
            }

            foreach (var hint in hints)
            {
                Look(hint);
                Look(hint - (WindSpeedTolerance / 2));
            }
            while (above - below > WindSpeedTolerance)
                Look((below + above) / 2);
            var beginning = solve(above);
            found.Add(new DesignPoint($"{RegionWords.Of(beginning.Region)} begins", beginning));
            (region, start) = (beginning.Region, above);
        }
    }

    private static CurvePoint LargestThrust(
        RotorCase rotorCase, CurvePoint[] curve, List<DesignPoint> found, Func<double, CurvePoint> solve)
    {
        var best = curve.Concat(found.Select(p => p.Point).Where(p => p.Loads is not null)).MaxBy(p => p.Loads!.Thrust)!;
        // Between its neighbours, and the kinks that lie there, thrust has one top.
        var kinks = curve.Concat(found.Select(p => p.Point)).Select(p => p.Operation.WindSpeed).Distinct().Order().ToArray();
        var at = Array.IndexOf(kinks, best.Operation.WindSpeed);
        double[] places = [.. new[] { at - 1, at, at + 1 }.Where(i => i >= 0 && i < kinks.Length).Select(i => kinks[i])];
        var top = Largest.Find(v => solve(v).Loads?.Thrust ?? double.NaN, places, WindSpeedTolerance, worth: 1);
        if (!(top.Excess > best.Loads!.Thrust))
            return best;
        var there = solve(Math.Clamp(top.Place, rotorCase.CutInWindSpeed, rotorCase.CutOutWindSpeed));
        return there.Loads?.Thrust > best.Loads.Thrust ? there : best;
    }
}
