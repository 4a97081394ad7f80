using BladeLoads.Rotor.Operation;

namespace BladeLoads.Studies.Tests.Cases;

/// <summary>The strategy beyond numbers, turbulence and the surface.</summary>
public class FurtherTests
{
    [Theory]
    [InlineData("tip_speed_ratio = 7\nfine_pitch_deg = 1", "", null, null)]
    [InlineData("tip_speed_ratio = 7\nfine_pitch_deg = 1", "tip_speed_ratio = \"best\"\nfine_pitch_deg = \"best\"", null, null)]
    [InlineData("tip_speed_ratio = 7\n", "", null, 1.0)]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = \"best\"", 7.0, null)]
    public void The_best_is_asked_for_by_name_or_by_leaving_a_key_out(string text, string by, double? tipSpeedRatio, double? finePitchDeg)
    {
        var control = Assert.IsType<Control.VariableSpeed>(Study().Change("cases/clean.toml", text, by).OnlyCase().Rotor.Control);

        Assert.Equal(tipSpeedRatio, control.TipSpeedRatio);
        Assert.Equal(finePitchDeg, control.FinePitch is { } pitch ? Math.Round(double.RadiansToDegrees(pitch), 12) : null);
    }

    [Fact]
    public void A_strategy_is_read_whole()
    {
        var control = Assert.IsType<Control.VariableSpeed>(Control("speed_limited_pitch = \"best\"\nabove_rated = \"pitch-to-stall\"\n"
            + "rated_power_kW = 50\nthrust_limit_kN = 12").OnlyCase().Rotor.Control);

        Assert.Equal((SpeedLimitedPitch.Best, AboveRated.PitchToStall, 12e3), (control.SpeedLimitedPitch, control.AboveRated, control.ThrustLimit));
    }

    [Fact]
    public void An_efficiency_by_load_is_read()
    {
        var drivetrain = Control("rated_power_kW = 100\ndrivetrain_efficiency = [[0.1, 0.8], [1, 0.9]]").OnlyCase().Rotor.Drivetrain;

        // At a tenth of rated power the rotor makes 10/0.8 kW, at rated power 100/0.9 kW.
        Assert.Equal(10e3, drivetrain.Electrical(12.5e3), 1e-6);
        Assert.Equal(100e3, drivetrain.Electrical(100e3 / 0.9), 1e-6);
    }

    [Theory]
    [InlineData("turbulence_intensity = 0.1", 10, 0.1)]
    [InlineData("turbulence_intensity = [[5, 0.2], [15, 0.1]]", 10, 0.15)]
    [InlineData("turbulence_intensity = [[5, 0.2], [15, 0.1]]", 2, 0.2)]
    [InlineData("turbulence_intensity = [[5, 0.2], [15, 0.1]]", 20, 0.1)]
    public void Turbulence_is_a_number_or_varies_with_wind_speed(string key, double windSpeed, double intensity)
        => Assert.Equal(intensity, Wind(key).OnlyCase().Further.Turbulence!.At(windSpeed), 1e-15);

    [Fact]
    public void A_surface_is_read()
    {
        var surface = Surface("tip_speed_ratios = { from = 5, to = 7, step = 1 }\npitches_deg = [-90, 0]").OnlyCase().Further.Surface!;

        Assert.Equal([5, 6, 7], surface.TipSpeedRatios.ToArray());
        Assert.Equal([-Math.PI / 2, 0], surface.Pitches.ToArray());
        Assert.Equal(8, surface.WindSpeed);
    }

    [Theory]
    [InlineData("tip_speed_ratio = 7", "tip_speed_ratio = \"bets\"",
        "cases/clean.toml:9:19: tip_speed_ratio is 'bets'; give a number, or \"best\" for the one with the highest power coefficient")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = \"1,5\"",
        "cases/clean.toml:10:18: fine_pitch_deg is '1,5'; write decimals with a point: 1.5, without quotes")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nthrust_limit_kN = 0", "cases/clean.toml:11:19: thrust_limit_kN is 0; it must be above 0: a rotor that takes no thrust makes no power; "
        + "give the largest thrust that the rotor may take, in kN, such as 320, or leave the key out for none")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nthrust_limit_kN = -280", "cases/clean.toml:11:19: thrust_limit_kN is -280; it must be above 0: "
        + "a rotor that takes no thrust makes no power; give the largest thrust that the rotor may take, in kN, such as 320, or leave the key out for none")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nrated_power_kW = 5\ndrivetrain_efficiency = [[2, 0.8], [30, 0.9], [100, 0.95]]",
        "cases/clean.toml:12:37: drivetrain_efficiency has load 30; it must be from 0 to 10: "
        + "no machine carries ten times its rated power; it is a share and not percent: write 0.3\n"
        + "cases/clean.toml:12:48: drivetrain_efficiency has load 100; it must be from 0 to 10: "
        + "no machine carries ten times its rated power; it is a share and not percent: write 1")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nabove_rated = \"pitch-to-stall\"",
        "cases/clean.toml:11:15: above_rated is 'pitch-to-stall' without a rated power; give rated_power_kW or leave above_rated out")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\ndrivetrain_efficiency = [[0, 0.8], [1, 0.9]]",
        "cases/clean.toml:11:25: drivetrain_efficiency is by load, a share of rated power, and there is none; give rated_power_kW, or one number")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nrated_power_kW = 5\ndrivetrain_efficiency = [[0, 0.8], [0, 0.9]]",
        "cases/clean.toml:12:37: drivetrain_efficiency has load 0 twice; each load once")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nrated_power_kW = 5\ndrivetrain_efficiency = [[1, 0.8], [0.5, 0.9]]",
        "cases/clean.toml:12:37: drivetrain_efficiency falls from load 1 to 0.5; loads must rise")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nrated_power_kW = 5\ndrivetrain_efficiency = [[-1, 80], [1, 0.9]]",
        "cases/clean.toml:12:27: drivetrain_efficiency has load -1; it must be from 0 to 10: a load is a share of rated electrical power; "
        + "give the share of rated electrical power, such as 0.25\n"
        + "cases/clean.toml:12:31: drivetrain_efficiency has efficiency 80; it must be above 0 and at most 1: "
        + "electrical power would exceed rotor power; it is a share and not percent: write 0.8")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nrated_power_kW = 5\ndrivetrain_efficiency = [[0.5, 0.4], [0.6, 0.9]]",
        "cases/clean.toml:12:38: drivetrain_efficiency rises so steeply from load 0.5 to 0.6 that more load would need less rotor power; check both pairs")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nrated_power_kW = 5\ndrivetrain_efficiency = [0.9]",
        "cases/clean.toml:12:26: drivetrain_efficiency holds 0.9; give pairs of load and efficiency: [[0.1, 0.85], [1, 0.94]]")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nrated_power_kW = 5\ndrivetrain_efficiency = []",
        "cases/clean.toml:12:25: drivetrain_efficiency is an empty list; give one pair or more: [[0.1, 0.85], [1, 0.94]]")]
    public void A_wrong_strategy_is_told(string text, string by, string expected)
        => Told.Exactly(expected.Split('\n'), Study().Change("cases/clean.toml", text, by).Read().Errors);

    [Theory]
    [InlineData("turbulence_intensity = 12", "cases/clean.toml:6:24: turbulence_intensity is 12; it must be from 0 to 1: "
        + "the wind speed would vary by more than its mean; it is a share and not percent: write 0.12")]
    [InlineData("turbulence_intensity = -0.1", "cases/clean.toml:6:24: turbulence_intensity is -0.1; it must be from 0 to 1: "
        + "a standard deviation is never negative; give the standard deviation over the mean, such as 0.16")]
    [InlineData("turbulence_intensity = 1.2", "cases/clean.toml:6:24: turbulence_intensity is 1.2; it must be from 0 to 1: "
        + "the wind speed would vary by more than its mean; give the standard deviation over the mean, such as 0.16")]
    [InlineData("turbulence_intensity = [[5, 0.2], [4, 0.1]]",
        "cases/clean.toml:6:36: turbulence_intensity falls from wind speed 5 to 4; wind speeds must rise")]
    [InlineData("turbulence_intensity = [[5, 20]]", "cases/clean.toml:6:29: turbulence_intensity has intensity 20; it must be from 0 to 1: "
        + "the wind speed would vary by more than its mean; it is a share and not percent: write 0.2")]
    public void Wrong_turbulence_is_told(string key, string expected) => Told.Exactly([expected], Wind(key).Read().Errors);

    [Theory]
    [InlineData("pitches_deg = [0]",
        "cases/clean.toml:11:2: [surface] tip_speed_ratios is missing; write it, such as tip_speed_ratios = { from = 4, to = 12, step = 0.5 }")]
    [InlineData("tip_speed_ratios = 7\npitches_deg = [0]",
        "cases/clean.toml:12:20: tip_speed_ratios is 7; give a list, or { from = 4, to = 12, step = 0.5 }")]
    [InlineData("tip_speed_ratios = [0, 7]\npitches_deg = [0]",
        "cases/clean.toml:12:21: tip_speed_ratios holds 0; tip-speed ratios must be above 0")]
    [InlineData("tip_speed_ratios = [7]\npitches_deg = { from = 5, to = -5, step = 1 }",
        "cases/clean.toml:13:24: pitches_deg runs from 5 to -5; from must not exceed to")]
    [InlineData("tip_speed_ratios = { from = 1, to = 10, step = 0.01 }\npitches_deg = { from = 0, to = 20, step = 1 }",
        "cases/clean.toml:12:1: [surface] asks for 901 x 21 pairs; at most 10,000 are solved, so give larger steps")]
    [InlineData("tip_speed_ratios = [7]\npitches_deg = [0]\nwind_speed_m_s = 0", "cases/clean.toml:14:18: wind_speed_m_s is 0; it must be above 0 and at most 200")]
    public void A_wrong_surface_is_told(string keys, string expected) => Told.Exactly([expected], Surface(keys).Read().Errors);

    private static FellStudy Study() => new FellStudy().With("cases/clean.toml", FellStudy.VariableSpeedCase);

    private static FellStudy Control(string keys) => Study().Change("cases/clean.toml", "[control]", $"[control]\n{keys}");

    private static FellStudy Wind(string key) => Study().Change("cases/clean.toml", "[wind]", $"[wind]\n{key}");

    private static FellStudy Surface(string keys) => Study().Change("cases/clean.toml", "[model]", $"[surface]\n{keys}\n[model]");
}
