using System.Collections.Immutable;
using BladeLoads.Rotor.Energy;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>Reads [surface], the turbulence intensity and the reference density.</summary>
internal static class FurtherReader
{
    private const string Turbulence = "wind.turbulence_intensity", ReferenceDensity = "air.reference_density_kg_m3";
    private const string Ratios = "surface.tip_speed_ratios", Pitches = "surface.pitches_deg", SurfaceWind = "surface.wind_speed_m_s";
    private const int MostPairs = 10_000;

    private static readonly RisingNumbers RatioNumbers = new(
        "tip_speed_ratios", "tip-speed ratio", "at the tip", Bounds.AboveZeroTo(50), "{ from = 4, to = 12, step = 0.5 }");

    private static readonly RisingNumbers PitchNumbers = new(
        "pitches_deg", "pitch angle", "degrees", Bounds.Within(180), "{ from = -4, to = 20, step = 1 }");

    private static readonly Pairs IntensityPairs = new(
        "turbulence_intensity", ("wind speed", Bounds.ZeroOrMore), ("intensity", Ranges.TurbulenceIntensity), "[[5, 0.2], [15, 0.14]]");

    public static TurbulenceIntensity? ReadTurbulence(CaseValues values)
    {
        if (values.Find(Turbulence) is not { Value: TomlValue.List list })
        {
            var intensity = values.Number(Turbulence, CaseDefaults.TurbulenceIntensity, Ranges.TurbulenceIntensity);
            UsualRanges.Check(values, Turbulence, intensity);
            return intensity > 0 ? TurbulenceIntensity.Constant(intensity) : null;
        }
        var rows = IntensityPairs.Read(values, list);
        values.Note(Turbulence, Pairs.Canonical(rows));
        return rows.IsEmpty ? null : new TurbulenceIntensity(rows);
    }

    public static double? ReadReferenceDensity(CaseValues values)
    {
        if (!values.Has(ReferenceDensity))
            return null;
        var density = values.Number(ReferenceDensity, double.NaN, Ranges.Density);
        UsualRanges.Check(values, ReferenceDensity, density);
        return density;
    }

    public static SurfaceGrid? ReadSurface(CaseValues values, Findings findings)
    {
        if (!values.Has(Ratios) && !values.Has(Pitches) && !values.Has(SurfaceWind))
            return null;
        var ratios = Numbers(values, Ratios, RatioNumbers, findings);
        var pitches = Numbers(values, Pitches, PitchNumbers, findings);
        var windSpeed = values.Number(SurfaceWind, CaseDefaults.SurfaceWindSpeed, Bounds.AboveZeroTo(Limits.WindSpeed));
        if ((long)ratios.Length * pitches.Length > MostPairs)
            values.RefuseKey(Ratios, $"[surface] asks for {CanonicalText.Of(ratios.Length)} x {CanonicalText.Of(pitches.Length)} pairs; "
                + "at most 10,000 are solved, so give larger steps");
        return new SurfaceGrid(ratios, [.. pitches.Select(double.DegreesToRadians)], windSpeed);
    }

    private static ImmutableArray<double> Numbers(CaseValues values, string path, RisingNumbers numbers, Findings findings)
    {
        if (values.Find(path) is not { } entry)
        {
            values.Missing(path, null);
            return [];
        }
        var read = numbers.Read(entry.Value, findings);
        if (read.IsEmpty)
            values.Spoil();
        values.Note(path, CanonicalText.Of(read));
        return read;
    }
}
