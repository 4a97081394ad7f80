using System.Collections.Immutable;
using BladeLoads.Rotor.Energy;

namespace BladeLoads.Studies;

/// <summary>What a case asks for beside its curve; null for what it does not.</summary>
/// <param name="ReferenceDensity">kg/m3, to which the curve is normalised.</param>
public sealed record FurtherResults(SurfaceGrid? Surface, Site? Site, TurbulenceIntensity? Turbulence, double? ReferenceDensity)
{
    public static FurtherResults None { get; } = new(null, null, null, null);
}

/// <summary>The pairs at which coefficients are tabled.</summary>
/// <param name="TipSpeedRatios">Above 0, rising, one or more.</param>
/// <param name="Pitches">rad, rising, one or more.</param>
/// <param name="WindSpeed">m/s, above 0; sets the Reynolds numbers.</param>
public sealed record SurfaceGrid(ImmutableArray<double> TipSpeedRatios, ImmutableArray<double> Pitches, double WindSpeed);
