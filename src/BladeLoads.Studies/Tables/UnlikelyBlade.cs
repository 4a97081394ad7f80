using System.Collections.Immutable;
using BladeLoads.Rotor.Blades;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Tables;

/// <summary>Blades that can be, but are more likely in other units than the table's. Common practice, no source.</summary>
internal static class UnlikelyBlade
{
    private const int FewStations = 3;
    private const double SmallTwist = 0.6;   // deg; as radians a twist of 34 degrees
    private const double WideChord = 0.5;    // of the tip radius

    /// <param name="cells">Of each station, root to tip.</param>
    public static void Doubt(Blade blade, IReadOnlyList<(Place Chord, Place Twist)> cells, Findings findings)
    {
        var twists = blade.Stations.Select(station => double.RadiansToDegrees(station.Twist)).ToImmutableArray();
        var (lowest, highest) = (Shown(twists.Min()), Shown(twists.Max()));
        if (twists.Length > FewStations && twists.All(twist => Math.Abs(twist) < SmallTwist) && lowest != highest)
            findings.Doubt(cells[0].Twist,
                $"twist_deg runs from {lowest} to {highest} only; these look like radians, angles are in degrees");
        for (var i = 0; i < cells.Count; i++)
            if (blade.Stations[i].Chord > WideChord * blade.TipRadius)
            {
                findings.Doubt(cells[i].Chord, $"chord_m is {CanonicalText.Of(blade.Stations[i].Chord)}, "
                    + $"more than half the tip radius of {CanonicalText.Of(blade.TipRadius)} m; "
                    + "radius and chord are both in metres");
                return;
            }
    }

    // Through radians and back, a number may have gained a digit at its end.
    private static string Shown(double degrees) => CanonicalText.Of(Math.Round(degrees, 9));
}
