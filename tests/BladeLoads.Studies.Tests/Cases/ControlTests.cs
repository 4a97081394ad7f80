using BladeLoads.Rotor.Operation;

namespace BladeLoads.Studies.Tests.Cases;

public class ControlTests
{
    [Fact]
    public void Variable_speed_is_read_with_its_defaults()
    {
        var rotor = Read(FellStudy.VariableSpeedCase).Rotor;

        var control = Assert.IsType<Control.VariableSpeed>(rotor.Control);
        Assert.Equal(7, control.TipSpeedRatio);
        Assert.Equal(Math.PI / 180, control.FinePitch!.Value, 15);
        Assert.Equal((0, double.PositiveInfinity), (control.MinRotorSpeed, control.MaxRotorSpeed));
        Assert.Equal((null, AboveRated.None), (control.RatedPower, control.AboveRated));
        Assert.Equal((0, double.PositiveInfinity, 1), (rotor.CutInWindSpeed, rotor.CutOutWindSpeed, rotor.Drivetrain.Electrical(1)));
    }

    [Fact]
    public void Rated_power_is_held_by_pitching_to_feather_unless_the_case_says_otherwise()
    {
        const string limits = "[control]\nmin_rotor_speed_rpm = 6\nmax_rotor_speed_rpm = 12\nrated_power_kW = 50\n"
            + "drivetrain_efficiency = 0.9\ncut_in_wind_speed_m_s = 4\ncut_out_wind_speed_m_s = 20\n";
        var rotor = Read(FellStudy.VariableSpeedCase.Replace("[control]\n", limits, StringComparison.Ordinal)).Rotor;

        var control = Assert.IsType<Control.VariableSpeed>(rotor.Control);
        Assert.Equal((50e3, AboveRated.PitchToFeather), (control.RatedPower, control.AboveRated));
        Assert.Equal(6 * Math.Tau / 60, control.MinRotorSpeed, 15);
        Assert.Equal(12 * Math.Tau / 60, control.MaxRotorSpeed, 15);
        Assert.Equal((4, 20, 0.9), (rotor.CutInWindSpeed, rotor.CutOutWindSpeed, rotor.Drivetrain.Electrical(1)));

        var none = Read(FellStudy.VariableSpeedCase.Replace("[control]\n", limits + "above_rated = \"none\"\n", StringComparison.Ordinal)).Rotor;
        Assert.Equal(AboveRated.None, Assert.IsType<Control.VariableSpeed>(none.Control).AboveRated);
    }

    [Fact]
    public void A_schedule_is_read_from_its_table()
    {
        var only = Read(FellStudy.ScheduleCase);

        var schedule = Assert.IsType<Control.Schedule>(only.Rotor.Control);
        Assert.Equal([new(4, 40 * Math.Tau / 60, 0), new(8, 70 * Math.Tau / 60, double.DegreesToRadians(3))], schedule.Points.ToArray());
        Assert.Equal("2 wind speeds from 4 to 8 m/s", only.Inputs[^1].Contents);
        Assert.Equal("schedules/gentle.csv", only.Inputs[^1].File);
    }

    [Fact]
    public void A_schedule_need_not_cover_wind_speeds_without_operation()
    {
        var wide = FellStudy.ScheduleCase
            .Replace("[5, 6, 7]", "[3, 6, 9]", StringComparison.Ordinal)
            .Replace("[control]", "[control]\ncut_in_wind_speed_m_s = 4\ncut_out_wind_speed_m_s = 8", StringComparison.Ordinal);

        Assert.IsType<Control.Schedule>(Read(wide).Rotor.Control);
    }

    [Theory]
    [InlineData("tip_speed_ratio = 7", "tip_speed_ratio = 0",
        "cases/clean.toml:9:19: tip_speed_ratio is 0; it must be above 0: the rotor would not turn in its own direction; "
        + "give a number such as 8, or \"best\" for the one with the highest power coefficient")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = -91",
        "cases/clean.toml:10:18: fine_pitch_deg is -91; it must be from -90 to 90: the blade would stand beyond full stall; "
        + "give it in degrees, such as 0, or \"best\" for the one with the highest power coefficient")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nrotor_speed_rpm = 70",
        "cases/clean.toml:11:1: 'rotor_speed_rpm' does not go with strategy 'variable-speed', which takes tip_speed_ratio, fine_pitch_deg, "
        + "min_rotor_speed_rpm, max_rotor_speed_rpm, speed_limited_pitch, above_rated, thrust_limit_kN; leave it out")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nmin_rotor_speed_rpm = 20\nmax_rotor_speed_rpm = 18",
        "cases/clean.toml:11:23: min_rotor_speed_rpm is 20, above max_rotor_speed_rpm 18 in line 12: "
        + "no rotor speed to turn at would be left; lower min_rotor_speed_rpm, or raise max_rotor_speed_rpm")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\ncut_in_wind_speed_m_s = 26\ncut_out_wind_speed_m_s = 25",
        "cases/clean.toml:11:25: cut_in_wind_speed_m_s is 26, above cut_out_wind_speed_m_s 25 in line 12: "
        + "no wind speed to operate at would be left; lower cut_in_wind_speed_m_s, or raise cut_out_wind_speed_m_s")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\ndrivetrain_efficiency = 1.01",
        "cases/clean.toml:11:25: drivetrain_efficiency is 1.01; it must be above 0 and at most 1: "
        + "electrical power would exceed rotor power; give the share of rotor power that becomes electrical, such as 0.94")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\ndrivetrain_efficiency = 94",
        "cases/clean.toml:11:25: drivetrain_efficiency is 94; it must be above 0 and at most 1: "
        + "electrical power would exceed rotor power; it is a share and not percent: write 0.94")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\ndrivetrain_efficiency = 0",
        "cases/clean.toml:11:25: drivetrain_efficiency is 0; it must be above 0 and at most 1: "
        + "no electrical power would be left; give the share of rotor power that becomes electrical, such as 0.94")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nrated_power_kW = -5",
        "cases/clean.toml:11:18: rated_power_kW is -5; it must be above 0 and at most 1000000000: "
        + "there would be no power to hold; give it in kW, such as 2000, or leave the key out for none")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nabove_rated = \"pitch-to-feather\"",
        "cases/clean.toml:11:15: above_rated is 'pitch-to-feather' without a rated power; give rated_power_kW or leave above_rated out")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nabove_rated = \"feather\"",
        "cases/clean.toml:11:15: above_rated is 'feather'; write \"pitch-to-feather\", \"pitch-to-stall\" or \"none\"")]
    [InlineData("fine_pitch_deg = 1", "fine_pitch_deg = 1\nspeed_limited_pitch = 0",
        "cases/clean.toml:11:23: speed_limited_pitch is 0; give text in quotes, such as \"hold\"")]
    [InlineData("\"variable-speed\"", "\"variable\"",
        "cases/clean.toml:8:12: strategy is 'variable'; write \"variable-speed\", \"fixed-speed\" or \"schedule\"")]
    public void A_wrong_control_is_told(string text, string by, string expected)
        => Told.Exactly([expected], Study(FellStudy.VariableSpeedCase).Change("cases/clean.toml", text, by).Read().Errors);

    [Theory]
    [InlineData("schedule = \"../schedules/gentle.csv\"", "",
        "cases/clean.toml:7:2: [control] schedule is missing; write it, such as schedule = \"../schedules/night.csv\"")]
    [InlineData("gentle", "gentel",
        "cases/clean.toml:9:12: no file '../schedules/gentel.csv'; schedules/ holds gentle.csv")]
    [InlineData("[5, 6, 7]", "[5, 6, 9]",
        "cases/clean.toml:9:12: schedule '../schedules/gentle.csv' runs from 4 to 8 m/s and does not cover 9 m/s: "
        + "rotor speed and pitch are not known there; add rows, or set cut-in and cut-out within it")]
    [InlineData("[5, 6, 7]", "[3, 5, 6, 9, 10]",
        "cases/clean.toml:9:12: schedule '../schedules/gentle.csv' runs from 4 to 8 m/s and does not cover 3 wind speeds of the case, "
        + "the first 3 and the last 10 m/s: rotor speed and pitch are not known there; add rows, or set cut-in and cut-out within it")]
    [InlineData("[control]", "[control]\npitch_deg = 3",
        "cases/clean.toml:8:1: 'pitch_deg' does not go with strategy 'schedule', which takes schedule; leave it out")]
    public void A_wrong_use_of_a_schedule_is_told(string text, string by, string expected)
        => Told.Exactly([expected], Study(FellStudy.ScheduleCase).Change("cases/clean.toml", text, by).Read().Errors);

    [Fact]
    public void A_rotor_at_rest_is_a_fixed_speed_of_zero()
    {
        var rest = Read(FellStudy.Case.Replace("= 70", "= 0", StringComparison.Ordinal));

        Assert.Equal(0, Assert.IsType<Control.FixedSpeed>(rest.Rotor.Control).RotorSpeed);
    }

    private static StudyCase Read(string caseText) => Study(caseText).OnlyCase();

    private static FellStudy Study(string caseText) => new FellStudy().With("cases/clean.toml", caseText);
}
