namespace BladeLoads.Rotor.Sections;

/// <summary>
/// The row of a polar at which the section stalls. Lift may rise again far beyond, to that of a plate across the wind, and higher than
/// before; so it is the first peak that counts, not the largest lift of the whole table.
/// </summary>
/// <remarks>Common practice, no source; the rule is ours.</remarks>
public static class StallPoint
{
    /// <summary>Share of the peak's lift that has to be lost before it rises again; less is the scatter of a tunnel.</summary>
    public const double LossThatCounts = 0.1;

    /// <summary>
    /// Index of the row, between 0 and 90 degrees, where lift is largest before it falls by a tenth; else of the largest lift there; null
    /// where that is the last row: the table ends before stall.
    /// </summary>
    public static int? Above(Polar polar)
        => Peak(polar, [.. Enumerable.Range(0, polar.Angles.Length).Where(i => polar.Angles[i] is > 0 and < Math.PI / 2)], 1);

    /// <summary>The same below 0, where lift is lowest: null where the table begins after stall.</summary>
    public static int? Below(Polar polar)
        => Peak(polar, [.. Enumerable.Range(0, polar.Angles.Length).Where(i => polar.Angles[i] is < 0 and > -Math.PI / 2).Reverse()], -1);

    // Rows going away from 0, lift counted positive that way; on the way to its angle of zero lift a section lifts the other way.
    private static int? Peak(Polar polar, int[] outwards, int sign)
    {
        int? peak = null;
        foreach (var row in outwards)
        {
            var lift = sign * polar.Lift[row];
            if (peak is null ? lift > 0 : lift > sign * polar.Lift[peak.Value])
                peak = row;
            else if (peak is { } p && lift < (1 - LossThatCounts) * sign * polar.Lift[p])
                return peak;
        }
        var last = sign > 0 ? polar.Angles.Length - 1 : 0;
        return peak == last ? null : peak;
    }
}
