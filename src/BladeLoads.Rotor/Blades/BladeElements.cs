using System.Collections.Immutable;
using BladeLoads.Rotor.Momentum;

namespace BladeLoads.Rotor.Blades;

/// <summary>A short length of blade, with the geometry at its middle.</summary>
/// <param name="Radius">Middle of its two edges, m.</param>
/// <param name="Length">Along the blade, m.</param>
/// <param name="Chord">m.</param>
/// <param name="Twist">rad, positive towards feather.</param>
/// <param name="InnerSection">Name of the section at the station inboard of it; empty where the thickness says.</param>
/// <param name="OuterSection">Name of the section at the station outboard of it; likewise.</param>
/// <param name="OuterWeight">Share of the outer section's coefficients, 0 to 1; 0 where both names are the same.</param>
public readonly record struct BladeElement(
    double Radius, double Length, double Chord, double Twist, string InnerSection, string OuterSection, double OuterWeight)
{
    /// <summary>Thickness over chord; null where the sections are named.</summary>
    public double? ThicknessRatio { get; init; }
}

/// <summary>Divides a blade into elements.</summary>
public static class BladeElements
{
    /// <summary>The elements of a blade, root to tip, that fill it from the first station to the last.</summary>
    /// <param name="count">1 or more.</param>
    /// <param name="spacing">Cosine: edges <c>r_k = Rh + (R - Rh)(1 - cos(pi k/N))/2</c>.</param>
    public static ImmutableArray<BladeElement> Of(Blade blade, int count, ElementSpacing spacing)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(count, 1);
        var elements = ImmutableArray.CreateBuilder<BladeElement>(count);
        for (var i = 0; i < count; i++)
        {
            var (inner, outer) = (EdgeAt(blade, i, count, spacing), EdgeAt(blade, i + 1, count, spacing));
            elements.Add(ElementAt(blade, (inner + outer) / 2, outer - inner));
        }
        return elements.MoveToImmutable();
    }

    private static double EdgeAt(Blade blade, int k, int count, ElementSpacing spacing)
    {
        var share = spacing == ElementSpacing.Cosine ? (1 - Math.Cos(Math.PI * k / count)) / 2 : (double)k / count;
        return blade.HubRadius + ((blade.TipRadius - blade.HubRadius) * share);
    }

    private static BladeElement ElementAt(Blade blade, double radius, double length)
    {
        var (a, b, w) = blade.Between(radius);
        return new BladeElement(
            radius, length, a.Chord + (w * (b.Chord - a.Chord)), a.Twist + (w * (b.Twist - a.Twist)),
            a.Section ?? "", b.Section ?? "", a.Section == b.Section ? 0 : w)
        {
            ThicknessRatio = a.ThicknessRatio + (w * (b.ThicknessRatio - a.ThicknessRatio)),
        };
    }
}
