namespace BladeLoads.Studies.Tests.Cases;

/// <summary>A lower limit above its upper one: told with the line of the other, and with the advice that is likely to help.</summary>
public class CrossedLimitsTests
{
    private const string NoWind = "no wind speed to operate at would be left", NoSpeed = "no rotor speed to turn at would be left";

    [Theory]
    // Exchanged, they would be what is usual.
    [InlineData("cut_in_wind_speed_m_s = 25\ncut_out_wind_speed_m_s = 3",
        "cases/clean.toml:8:25: cut_in_wind_speed_m_s is 25, above cut_out_wind_speed_m_s 3 in line 9: " + NoWind + "; exchange them")]
    [InlineData("max_rotor_speed_rpm = 35\nmin_rotor_speed_rpm = 70",
        "cases/clean.toml:9:23: min_rotor_speed_rpm is 70, above max_rotor_speed_rpm 35 in line 8: " + NoSpeed + "; exchange them")]
    // Exchanged, they would still be odd: one of them is mistyped.
    [InlineData("cut_in_wind_speed_m_s = 3\ncut_out_wind_speed_m_s = 2.5", "cases/clean.toml:8:25: cut_in_wind_speed_m_s is 3, "
        + "above cut_out_wind_speed_m_s 2.5 in line 9: " + NoWind + "; lower cut_in_wind_speed_m_s, or raise cut_out_wind_speed_m_s")]
    [InlineData("min_rotor_speed_rpm = 40\nmax_rotor_speed_rpm = 7", "cases/clean.toml:8:23: min_rotor_speed_rpm is 40, "
        + "above max_rotor_speed_rpm 7 in line 9: " + NoSpeed + "; lower min_rotor_speed_rpm, or raise max_rotor_speed_rpm")]
    [InlineData("min_rotor_speed_rpm = 40\nmax_rotor_speed_rpm = 39", "cases/clean.toml:8:23: min_rotor_speed_rpm is 40, "
        + "above max_rotor_speed_rpm 39 in line 9: " + NoSpeed + "; lower min_rotor_speed_rpm, or raise max_rotor_speed_rpm")]
    public void Two_that_stand_together_are_to_be_exchanged_only_where_that_helps(string keys, string expected)
        => Told.Exactly([expected], Study(keys).Read().Errors);

    [Fact]
    public void One_that_is_a_starting_value_is_told_with_its_file()
        => Told.Exactly(
            ["cases/clean.toml:8:25: cut_in_wind_speed_m_s is 25, above cut_out_wind_speed_m_s 3 in study.toml:2: "
                + NoWind + "; lower cut_in_wind_speed_m_s, or raise cut_out_wind_speed_m_s"],
            Study("cut_in_wind_speed_m_s = 25").With("study.toml", "[control]\ncut_out_wind_speed_m_s = 3\n").Read().Errors);

    [Fact]
    public void One_that_is_swept_is_told_at_its_value()
        => Told.Exactly(
            ["cases/clean.toml:15:42: cut_in_wind_speed_m_s is 25, above cut_out_wind_speed_m_s 20 in line 8: "
                + NoWind + "; take 25 out of the sweep, or raise cut_out_wind_speed_m_s"],
            Study("cut_out_wind_speed_m_s = 20", "[sweep]\n\"control.cut_in_wind_speed_m_s\" = [3, 4, 25]\n").Read().Errors);

    [Theory]
    [InlineData("min_rotor_speed_rpm = 40\nmax_rotor_speed_rpm = 40")]
    [InlineData("cut_in_wind_speed_m_s = 6\ncut_out_wind_speed_m_s = 6")]
    public void Two_that_are_one_do_not_cross(string keys) => Told.Exactly([], Study(keys).Read().Errors);

    private static FellStudy Study(string keys, string atTheEnd = "") => new FellStudy()
        .With("cases/clean.toml", FellStudy.VariableSpeedCase.Replace("[control]\n", $"[control]\n{keys}\n", StringComparison.Ordinal) + atTheEnd);
}
