using System.Collections.Immutable;

namespace BladeLoads.Rotor.Blades;

/// <summary>One row of a blade table: radius m, chord m, twist rad (positive towards feather), section by name.</summary>
public sealed record BladeStation(double Radius, double Chord, double Twist, string Section);

/// <summary>
/// A blade from its root (the hub radius) to its tip. Holds at least two stations; radii are positive and rise strictly; chords are
/// positive. Chord and twist are linear between stations. Equality is by reference.
/// </summary>
public sealed class Blade
{
    private Blade(ImmutableArray<BladeStation> stations) => Stations = stations;

    public ImmutableArray<BladeStation> Stations { get; }

    /// <summary>Radius of the first station, m.</summary>
    public double HubRadius => Stations[0].Radius;

    /// <summary>Radius of the last station, m, along the blade.</summary>
    public double TipRadius => Stations[^1].Radius;

    /// <summary>Length over mean chord: the square of the length over the area, chords in straight lines between stations.</summary>
    public double AspectRatio
    {
        get
        {
            var area = 0.0;
            for (var i = 1; i < Stations.Length; i++)
                area += (Stations[i].Radius - Stations[i - 1].Radius) * (Stations[i].Chord + Stations[i - 1].Chord) / 2;
            return (TipRadius - HubRadius) * (TipRadius - HubRadius) / area;
        }
    }

    /// <exception cref="ArgumentException">Fewer than two stations, or one that breaks what the type promises.</exception>
    public static Blade FromStations(IEnumerable<BladeStation> stations)
    {
        var all = stations.ToImmutableArray();
        if (all.Length < 2)
            throw new ArgumentException("a blade needs two stations or more", nameof(stations));
        for (var i = 0; i < all.Length; i++)
        {
            var s = all[i];
            if (!(s.Radius > 0) || !(s.Chord > 0) || !double.IsFinite(s.Radius) || !double.IsFinite(s.Chord) || !double.IsFinite(s.Twist))
                throw new ArgumentException($"station {i}: radius and chord positive, all finite", nameof(stations));
            if (i > 0 && !(s.Radius > all[i - 1].Radius))
                throw new ArgumentException($"station {i}: radii must rise", nameof(stations));
        }
        return new Blade(all);
    }
}
