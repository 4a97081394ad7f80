using System.Collections.Immutable;

namespace BladeLoads.Studies.Cases;

/// <summary>A key of a case file.</summary>
/// <param name="Path">Table and key, <c>air.density_kg_m3</c>; the key alone at the top of the file.</param>
/// <param name="Example">A value as a case file writes it.</param>
/// <param name="CanSweep">One plain value that a sweep may vary.</param>
internal sealed record KnownKey(string Path, string Example, bool CanSweep)
{
    /// <summary>The table, or nothing at the top of the file.</summary>
    public string Table => Path.LastIndexOf('.') is >= 0 and var dot ? Path[..dot] : "";

    /// <summary>The last part of the path, as messages and variants name it.</summary>
    public string Name => Path[(Path.LastIndexOf('.') + 1)..];
}

/// <summary>Every key that a case file may hold, in the order of docs/formats.md.</summary>
internal static class KnownKeys
{
    public const string Baseline = "baseline";
    public const string SweepTable = "sweep";

    public static ImmutableArray<KnownKey> All { get; } =
    [
        new("title", "\"Clean blades, sea level\"", false),
        new("blade", "\"../blades/tarn-44.csv\"", true),
        new("polars", "\"../polars/clean\"", true),
        new("rotor.blade_count", "3", true),
        new("rotor.cone_deg", "2.5", true),
        new("rotor.tilt_deg", "5", true),
        new("rotor.hub_height_m", "80", true),
        new("air.density_kg_m3", "1.225", true),
        new("air.dynamic_viscosity_Pa_s", "1.789e-5", true),
        new("air.altitude_m", "500", true),
        new("air.temperature_C", "15", true),
        new("air.pressure_Pa", "101325", true),
        new("air.relative_humidity", "0.5", true),
        new("air.reference_density_kg_m3", "1.225", true),
        new("wind.speeds_m_s", "{ from = 3, to = 25, step = 0.5 }", false),
        new("wind.shear_exponent", "0.2", true),
        new("wind.yaw_deg", "10", true),
        new("wind.turbulence_intensity", "0.1", true),
        new("control.strategy", "\"variable-speed\"", true),
        new("control.cut_in_wind_speed_m_s", "3", true),
        new("control.cut_out_wind_speed_m_s", "25", true),
        new("control.tip_speed_ratio", "8", true),
        new("control.fine_pitch_deg", "0", true),
        new("control.min_rotor_speed_rpm", "8", true),
        new("control.max_rotor_speed_rpm", "18", true),
        new("control.speed_limited_pitch", "\"hold\"", true),
        new("control.rated_power_kW", "2000", true),
        new("control.above_rated", "\"pitch-to-feather\"", true),
        new("control.thrust_limit_kN", "320", true),
        new("control.drivetrain_efficiency", "0.94", true),
        new("control.rotor_speed_rpm", "72", true),
        new("control.pitch_deg", "3", true),
        new("control.schedule", "\"../schedules/night.csv\"", true),
        new("site.mean_wind_speed_m_s", "7.5", true),
        new("site.weibull_shape", "2", true),
        new("site.availability", "0.97", true),
        new("site.losses", "{ wakes = 0.06, grid = 0.02 }", false),
        new("site.histogram", "\"../site/tarn-mast.csv\"", true),
        new("surface.tip_speed_ratios", "{ from = 4, to = 12, step = 0.5 }", false),
        new("surface.pitches_deg", "{ from = -4, to = 20, step = 1 }", false),
        new("surface.wind_speed_m_s", "8", true),
        new("model.elements", "40", true),
        new("model.spacing", "\"cosine\"", true),
        new("model.losses", "[\"tip\", \"hub\"]", false),
        new("model.heavy_loading", "\"glauert-1935\"", true),
        new("model.balance_with", "\"lift and drag\"", true),
        new("sections.extend", "\"viterna-1982\"", true),
        new("sections.aspect_ratio", "12", true),
        new("sections.join", "\"end\"", true),
        new("sections.augment", "\"snel-1993\"", true),
        new("outputs.spanwise", "\"all\"", false),
    ];

    private static readonly ImmutableDictionary<string, KnownKey> ByPath
        = All.ToImmutableDictionary(key => key.Path, StringComparer.Ordinal);

    /// <summary>Tables of a case file, <c>sweep</c> included.</summary>
    public static ImmutableArray<string> Tables { get; } =
        [.. All.Select(key => key.Table).Where(table => table.Length > 0).Distinct(StringComparer.Ordinal), SweepTable];

    /// <summary>Pairs of which a case takes one: of a pair, what the case states itself takes the place of a starting value.</summary>
    public static ImmutableArray<(string One, string Other)> Exclusive { get; } =
    [
        ("air.density_kg_m3", "air.altitude_m"), ("air.density_kg_m3", "air.temperature_C"), ("air.density_kg_m3", "air.pressure_Pa"),
        ("air.density_kg_m3", "air.relative_humidity"), ("air.altitude_m", "air.pressure_Pa"),
        ("site.histogram", "site.mean_wind_speed_m_s"), ("site.histogram", "site.weibull_shape"),
    ];

    public static KnownKey? Find(string path) => ByPath.GetValueOrDefault(path);

    public static IEnumerable<string> NamesIn(string table) => All.Where(key => key.Table == table).Select(key => key.Name);
}
