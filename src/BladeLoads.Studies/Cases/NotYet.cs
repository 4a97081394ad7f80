using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>
/// What the formats know and the solver does not do yet. A line is removed here when its work is done; a value that changes
/// nothing (0, "hold") is accepted already.
/// </summary>
internal static class NotYet
{
    private static readonly (string Path, Func<TomlValue, bool> Asks, string Sentence)[] Lines =
    [
        ("rotor.tilt_deg", IsNotZero, "a tilted rotor is not solved yet; give 0 or leave it out"),
        ("wind.shear_exponent", IsNotZero, "wind shear is not solved yet; give 0 or leave it out"),
        ("wind.yaw_deg", IsNotZero, "yawed wind is not solved yet; give 0 or leave it out"),
        ("wind.turbulence_intensity", IsNotZero, "turbulence is not averaged over yet; give 0 or leave it out"),
        ("air.altitude_m", Always, "air is not worked out from altitude yet; give density_kg_m3 in its place"),
        ("air.temperature_C", Always, "air is not worked out from temperature yet; give density_kg_m3 in its place"),
        ("air.pressure_Pa", Always, "air is not worked out from pressure yet; give density_kg_m3 in its place"),
        ("air.relative_humidity", Always, "air is not worked out from humidity yet; give density_kg_m3 in its place"),
        ("control.tip_speed_ratio", IsBest, "the best tip-speed ratio is not searched for yet; give a number"),
        ("control.fine_pitch_deg", IsBest, "the best pitch is not searched for yet; give a number"),
        ("control.speed_limited_pitch", IsBest, "the best pitch is not searched for yet; give \"hold\" or leave it out"),
        ("control.above_rated", value => IsText(value, "pitch-to-stall"),
            "pitch to stall is not solved yet; give \"pitch-to-feather\" or \"none\""),
        ("control.thrust_limit_kN", Always, "a thrust limit is not held yet; leave it out"),
        ("control.drivetrain_efficiency", value => value is TomlValue.Table or TomlValue.List,
            "an efficiency that varies with load is not used yet; give one number"),
        ("site.mean_wind_speed_m_s", Always, "annual energy is not worked out yet; leave [site] out"),
        ("site.weibull_shape", Always, "annual energy is not worked out yet; leave [site] out"),
        ("site.availability", Always, "annual energy is not worked out yet; leave [site] out"),
        ("sections.extend", Always, "polars are not extended yet; leave it out and give tables to +-180 degrees"),
        ("sections.augment", Always, "lift is not augmented for rotation yet; leave it out"),
    ];

    /// <summary>What a left-out key would ask for that is not there yet.</summary>
    public static string TipSpeedRatioLeftOut
        => "control.tip_speed_ratio is left out, which asks for the best one; it is not searched for yet, give a number";

    /// <inheritdoc cref="TipSpeedRatioLeftOut"/>
    public static string FinePitchLeftOut
        => "control.fine_pitch_deg is left out, which asks for the best one; it is not searched for yet, give a number";

    /// <summary>The sentence for a value that asks for what is not there yet, or null.</summary>
    public static string? Sentence(string path, TomlValue value)
    {
        foreach (var line in Lines)
            if (line.Path == path && line.Asks(value))
                return line.Sentence;
        return null;
    }

    private static bool Always(TomlValue value) => true;

    private static bool IsNotZero(TomlValue value) => value is TomlValue.Number { Value: not 0 };

    private static bool IsBest(TomlValue value) => IsText(value, "best");

    private static bool IsText(TomlValue value, string text) => value is TomlValue.Text found && found.Value == text;
}
