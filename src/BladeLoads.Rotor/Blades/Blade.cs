using System.Collections.Immutable;

namespace BladeLoads.Rotor.Blades;

/// <summary>One row of a blade table: radius m, chord m, twist rad (positive towards feather), section by name.</summary>
/// <param name="Section">Null where the thickness says which section it is.</param>
public sealed record BladeStation(double Radius, double Chord, double Twist, string? Section)
{
    /// <summary>Thickness over chord, above 0 to 1; null where the section is named.</summary>
    public double? ThicknessRatio { get; private init; }

    /// <summary>A station whose section is that of its thickness in a family of sections.</summary>
    /// <param name="thicknessRatio">Above 0 to 1.</param>
    public static BladeStation OfThickness(double radius, double chord, double twist, double thicknessRatio)
        => new(radius, chord, twist, null) { ThicknessRatio = thicknessRatio };
}

/// <summary>
/// A blade from its root (the hub radius) to its tip. Holds at least two stations; radii are positive and rise strictly; chords are
/// positive; either every station names its section or every one gives its thickness. Chord, twist and thickness are linear between
/// stations. Equality is by reference.
/// </summary>
public sealed class Blade
{
    private Blade(ImmutableArray<BladeStation> stations) => Stations = stations;

    public ImmutableArray<BladeStation> Stations { get; }

    /// <summary>Radius of the first station, m.</summary>
    public double HubRadius => Stations[0].Radius;

    /// <summary>Radius of the last station, m, along the blade.</summary>
    public double TipRadius => Stations[^1].Radius;

    /// <summary>Whether its sections are those of a thickness; else they are named.</summary>
    public bool IsByThickness => Stations[0].ThicknessRatio is not null;

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

    /// <summary>Chord, m.</summary>
    /// <param name="radius">m, from the hub radius to the tip radius.</param>
    public double ChordAt(double radius)
    {
        var (inner, outer, share) = Between(radius);
        return inner.Chord + (share * (outer.Chord - inner.Chord));
    }

    /// <summary>The stations on either side of a radius, m, and how far from the inner to the outer one it is, 0 to 1.</summary>
    internal (BladeStation Inner, BladeStation Outer, double Share) Between(double radius)
    {
        var j = 0;
        while (j < Stations.Length - 2 && Stations[j + 1].Radius <= radius)
            j++;
        var (inner, outer) = (Stations[j], Stations[j + 1]);
        return (inner, outer, (radius - inner.Radius) / (outer.Radius - inner.Radius));
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
            if ((s.Section is null) != (s.ThicknessRatio is > 0 and <= 1) || (s.Section is null) != (all[0].Section is null))
                throw new ArgumentException($"station {i}: a section, or a thickness ratio above 0 to 1 at every station", nameof(stations));
        }
        return new Blade(all);
    }
}
