namespace BladeLoads.Studies.Tests.Cases;

/// <summary>What the formats know and the solver does not do yet is refused in words, never ignored.</summary>
public class NotYetTests
{
    [Theory]
    [InlineData("[rotor]", "tilt_deg = 5", "tilt_deg is 5; a tilted rotor is not solved yet; give 0 or leave it out")]
    [InlineData("[wind]", "shear_exponent = 0.2", "shear_exponent is 0.2; wind shear is not solved yet; give 0 or leave it out")]
    [InlineData("[wind]", "yaw_deg = -10", "yaw_deg is -10; yawed wind is not solved yet; give 0 or leave it out")]
    [InlineData("[wind]", "turbulence_intensity = 0.1",
        "turbulence_intensity is 0.1; turbulence is not averaged over yet; give 0 or leave it out")]
    [InlineData("[model]", "[air]\naltitude_m = 500",
        "altitude_m is 500; air is not worked out from altitude yet; give density_kg_m3 in its place")]
    [InlineData("[model]", "[air]\ntemperature_C = 15",
        "temperature_C is 15; air is not worked out from temperature yet; give density_kg_m3 in its place")]
    [InlineData("[model]", "[air]\npressure_Pa = 101325",
        "pressure_Pa is 101325; air is not worked out from pressure yet; give density_kg_m3 in its place")]
    [InlineData("[model]", "[air]\nrelative_humidity = 0.5",
        "relative_humidity is 0.5; air is not worked out from humidity yet; give density_kg_m3 in its place")]
    [InlineData("[control]", "speed_limited_pitch = \"best\"",
        "speed_limited_pitch is 'best'; the best pitch is not searched for yet; give \"hold\" or leave it out")]
    [InlineData("[control]", "above_rated = \"pitch-to-stall\"",
        "above_rated is 'pitch-to-stall'; pitch to stall is not solved yet; give \"pitch-to-feather\" or \"none\"")]
    [InlineData("[control]", "thrust_limit_kN = 320", "thrust_limit_kN is 320; a thrust limit is not held yet; leave it out")]
    [InlineData("[control]", "drivetrain_efficiency = [[0, 0.8], [1, 0.94]]",
        "drivetrain_efficiency is a list; an efficiency that varies with load is not used yet; give one number")]
    [InlineData("[model]", "[site]\nmean_wind_speed_m_s = 7.5\nweibull_shape = 2\navailability = 0.97",
        "mean_wind_speed_m_s is 7.5; annual energy is not worked out yet; leave [site] out")]
    [InlineData("[model]", "[sections]\nextend = \"viterna-1982\"",
        "extend is 'viterna-1982'; polars are not extended yet; leave it out and give tables to +-180 degrees")]
    [InlineData("[model]", "[sections]\naugment = \"snel-1993\"",
        "augment is 'snel-1993'; lift is not augmented for rotation yet; leave it out")]
    public void What_is_not_there_yet_is_told_at_its_key(string table, string keys, string expected)
    {
        var text = FellStudy.VariableSpeedCase.Replace($"{table}\n", keys[0] == '[' ? $"{keys}\n{table}\n" : $"{table}\n{keys}\n", StringComparison.Ordinal);
        var line = 1 + Array.FindIndex(text.Split('\n'), l => l.StartsWith(expected.Split(' ')[0], StringComparison.Ordinal));

        Told.Exactly([$"cases/clean.toml:{line}:1: {expected}"], Read(text).Errors);
    }

    [Theory]
    [InlineData("tip_speed_ratio = 7", "tip_speed_ratio = \"best\"",
        "cases/clean.toml:9:1: tip_speed_ratio is 'best'; the best tip-speed ratio is not searched for yet; give a number")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = \"best\"",
        "cases/clean.toml:10:1: fine_pitch_deg is 'best'; the best pitch is not searched for yet; give a number")]
    [InlineData("tip_speed_ratio = 7", "",
        "cases/clean.toml:7:2: control.tip_speed_ratio is left out, which asks for the best one; it is not searched for yet, give a number")]
    [InlineData("fine_pitch_deg = 1", "",
        "cases/clean.toml:7:2: control.fine_pitch_deg is left out, which asks for the best one; it is not searched for yet, give a number")]
    public void The_best_is_not_searched_for_yet(string text, string by, string expected)
        => Told.Exactly([expected], Read(FellStudy.VariableSpeedCase.Replace(text, by, StringComparison.Ordinal)).Errors);

    [Fact]
    public void What_changes_nothing_is_accepted()
    {
        var text = FellStudy.VariableSpeedCase
            .Replace("[rotor]", "[rotor]\ntilt_deg = 0\nhub_height_m = 30", StringComparison.Ordinal)
            .Replace("[wind]", "[wind]\nshear_exponent = 0.0\nyaw_deg = 0\nturbulence_intensity = 0", StringComparison.Ordinal)
            .Replace("[control]", "[control]\nspeed_limited_pitch = \"hold\"\nabove_rated = \"none\"", StringComparison.Ordinal);
        var plain = Assert.Single(Read(FellStudy.VariableSpeedCase).Cases);

        var study = Read(text);

        Told.Exactly([], study.Errors);
        Assert.Equal(plain.Fingerprint, Assert.Single(study.Cases).Fingerprint);
    }

    [Fact]
    public void A_blade_of_thickness_ratios_alone_is_not_read_yet()
    {
        var errors = new FellStudy().With("blades/fell.csv", "radius_m,chord_m,twist_deg,thickness_ratio\n1,1,0,0.4\n2,1,0,0.3\n").Read().Errors;

        Told.Exactly(["blades/fell.csv:1:1: sections from thickness_ratio are not supported yet; add a column 'section'"], errors);
    }

    [Fact]
    public void A_row_of_a_thickness_ratio_alone_is_not_read_yet()
    {
        var errors = new FellStudy().With("blades/fell.csv",
            "radius_m,chord_m,twist_deg,section,thickness_ratio\n1,1,0,root,0.4\n2,1,0,,0.3\n3,1,0,tip,\n").Read().Errors;

        Told.Exactly(["blades/fell.csv:3:7: a section from thickness_ratio is not supported yet; name a section"], errors);
    }

    private static Study Read(string caseText) => new FellStudy().With("cases/clean.toml", caseText).Read();
}
