using System.Collections.Immutable;

namespace BladeLoads.Rotor.Operation;

/// <summary>Finds the operating points worth a name, off the grid of wind speeds.</summary>
internal static class DesignPoints
{
    /// <summary>m/s; how closely a region's beginning and the largest thrust are found.</summary>
    private const double WindSpeedTolerance = 1e-9;

    /// <summary>m/s; a region narrower than this is none: two limits fall together there, and only rounding parts them.</summary>
    private const double LeastWidth = 1e-6;

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
        double[] likely = [.. hints, rotorCase.CutInWindSpeed, rotorCase.CutOutWindSpeed];
        foreach (var place in Beginnings(curve, likely, regionAt))
            if (solve(place) is var beginning)
                found.Add(new DesignPoint($"{RegionWords.Of(beginning.Region)} begins", beginning));
        if (LargestThrust(rotorCase, curve, found, solve) is { } largest)
            found.Add(new DesignPoint(DesignPoint.LargestThrust, largest));
        return [.. found.OrderBy(p => p.Point.Operation.WindSpeed).ThenBy(p => p.Name, StringComparer.Ordinal)];
    }

    // Where a region begins that is one.
    private static List<double> Beginnings(ImmutableArray<CurvePoint> curve, double[] hints, Func<double, Region> regionAt)
    {
        var changes = new List<(double Place, Region Region)>();
        for (var i = 1; i < curve.Length; i++)
            AddChanges(curve[i - 1], curve[i], hints, regionAt, changes);
        var beginnings = new List<double>();
        var before = curve[0].Region;
        for (var i = 0; i < changes.Count; i++)
        {
            var (place, region) = changes[i];
            var isEmpty = i + 1 < changes.Count && changes[i + 1].Place - place < LeastWidth;
            if (isEmpty || region == before)
                continue;
            beginnings.Add(place);
            before = region;
        }
        return beginnings;
    }

    // The places between two points at which the region becomes another, by bisection, the lowest first.
    private static void AddChanges(
        CurvePoint from, CurvePoint to, double[] hints, Func<double, Region> regionAt, List<(double Place, Region Region)> changes)
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
            (region, start) = (regionAt(above), above);
            changes.Add((start, region));
        }
    }

    // Of a flat top the lowest wind speed; null where the curve has no point in operation.
    private static CurvePoint? LargestThrust(
        RotorCase rotorCase, ImmutableArray<CurvePoint> curve, List<DesignPoint> found, Func<double, CurvePoint> solve)
    {
        var points = curve.Concat(found.Select(p => p.Point)).Where(IsOperating).ToList();
        if (points.Count == 0)
            return null;
        // The first and the last wind speed of operation may lie between two of the case.
        foreach (var end in new[] { rotorCase.CutInWindSpeed, rotorCase.CutOutWindSpeed })
            if (end > curve[0].Operation.WindSpeed && end < curve[^1].Operation.WindSpeed && solve(end) is var last && IsOperating(last))
                points.Add(last);
        var best = points.MaxBy(p => p.Loads!.Thrust)!;
        // Between its neighbours, and the kinks that lie there, thrust has one top.
        var kinks = points.Select(p => p.Operation.WindSpeed).Distinct().Order().ToArray();
        var at = Array.IndexOf(kinks, best.Operation.WindSpeed);
        double[] places = [.. new[] { at - 1, at, at + 1 }.Where(i => i >= 0 && i < kinks.Length).Select(i => kinks[i])];
        var top = Largest.Find(v => solve(v).Loads?.Thrust ?? double.NaN, places, WindSpeedTolerance, worth: 1);
        if (top.Excess > best.Loads!.Thrust && solve(top.Place) is var there && IsOperating(there))
            points.Add(there);
        var largest = points.Max(p => p.Loads!.Thrust);
        return points.OrderBy(p => p.Operation.WindSpeed)
            .First(p => p.Loads!.Thrust >= largest - (DesignPoint.FlatWithin * Math.Abs(largest)));
    }

    private static bool IsOperating(CurvePoint point)
        => (point.Marks & (PointMarks.BelowCutIn | PointMarks.AboveCutOut)) == 0 && point.Loads is not null;
}
