namespace BladeLoads.Studies.Tests.Cases;

/// <summary>Values that are probably a slip: raised as doubts, and the case runs. The ranges are common practice, no source.</summary>
public class UsualRangesTests
{
    [Theory]
    [InlineData("[rotor]", "[air]\ndensity_kg_m3 = 12.25\n[rotor]", "cases/clean.toml:6:17: density_kg_m3 is 12.25; air has 0.5 to 1.6 kg/m3")]
    [InlineData("[rotor]", "[air]\ndensity_kg_m3 = 0.49\n[rotor]", "cases/clean.toml:6:17: density_kg_m3 is 0.49; air has 0.5 to 1.6 kg/m3")]
    [InlineData("[rotor]", "[air]\ndynamic_viscosity_Pa_s = 0.01789\n[rotor]",
        "cases/clean.toml:6:26: dynamic_viscosity_Pa_s is 0.01789; air has 1e-5 to 3e-5 Pa s")]
    [InlineData("[rotor]", "[air]\ndynamic_viscosity_Pa_s = 9e-6\n[rotor]",
        "cases/clean.toml:6:26: dynamic_viscosity_Pa_s is 9e-06; air has 1e-5 to 3e-5 Pa s")]
    [InlineData("pitch_deg       = 2", "pitch_deg = 2\nrated_power_kW = 2_000_000",
        "cases/clean.toml:15:18: rated_power_kW is 2000000; no rotor makes more than 100,000 kW; is it in watts?")]
    [InlineData("[wind]", "[model]\nelements = 9\n[wind]", "cases/clean.toml:9:12: elements is 9; below 10 the loads along the blade are coarse")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = 7.33",
        "cases/clean.toml:13:19: rotor_speed_rpm is 7.33, a tip speed of 3.84 m/s; 5 to 150 m/s are usual, and rotor speeds are in rpm")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = 700",
        "cases/clean.toml:13:19: rotor_speed_rpm is 700, a tip speed of 366.52 m/s; 5 to 150 m/s are usual, and rotor speeds are in rpm")]
    [InlineData("from = 5, to = 7, step = 1", "from = 4, to = 24, step = 0.7",
        "cases/clean.toml:9:31: 24 is not reached in steps of 0.7; the last wind speed is 23.6")]
    [InlineData("from = 5, to = 7, step = 1", "from = 5, to = 6, step = 2",
        "cases/clean.toml:9:31: 6 is not reached in steps of 2; the last wind speed is 5")]
    // Usual, to the edges.
    [InlineData("[rotor]", "[air]\ndensity_kg_m3 = 0.5\ndynamic_viscosity_Pa_s = 1e-5\n[model]\nelements = 10\n[rotor]", null)]
    [InlineData("[rotor]", "[air]\ndensity_kg_m3 = 1.6\ndynamic_viscosity_Pa_s = 3e-5\n[rotor]", null)]
    [InlineData("pitch_deg       = 2", "pitch_deg = 2\nrated_power_kW = 100_000", null)]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = 0", null)]
    [InlineData("to = 7, step = 1", "to = 6, step = 0.1", null)]
    public void A_value_that_is_probably_a_slip_is_a_doubt_and_the_case_runs(string text, string by, string? expected)
        => AssertDoubts(FellStudy.Case, text, by, expected);

    [Theory]
    [InlineData("max_rotor_speed_rpm = 5",
        "cases/clean.toml:8:23: max_rotor_speed_rpm is 5, a tip speed of 2.62 m/s; 5 to 150 m/s are usual, and rotor speeds are in rpm")]
    [InlineData("max_rotor_speed_rpm = 500",
        "cases/clean.toml:8:23: max_rotor_speed_rpm is 500, a tip speed of 261.8 m/s; 5 to 150 m/s are usual, and rotor speeds are in rpm")]
    [InlineData("max_rotor_speed_rpm = 50", null)]
    [InlineData("min_rotor_speed_rpm = 5", null)]
    public void A_rotor_speed_limit_is_judged_by_the_speed_of_the_tip(string line, string? expected)
        => AssertDoubts(FellStudy.VariableSpeedCase, "[control]", $"[control]\n{line}", expected);

    [Theory]
    [InlineData("thrust_limit_kN = 280_000", "cases/clean.toml:8:19: thrust_limit_kN is 280000; no rotor takes more than 10,000 kN; is it in newtons?")]
    [InlineData("thrust_limit_kN = 10_000", null)]
    [InlineData("cut_in_wind_speed_m_s = 8",
        "cases/clean.toml:8:25: cut_in_wind_speed_m_s is 8, above the last wind speed of the case, 7 m/s; the rotor is at rest in every row")]
    [InlineData("cut_out_wind_speed_m_s = 4.5", "cases/clean.toml:8:26: cut_out_wind_speed_m_s is 4.5, and the case lists no wind speed "
        + "from cut-in 0 up to it; the rotor is at rest in every row")]
    [InlineData("cut_in_wind_speed_m_s = 7\ncut_out_wind_speed_m_s = 7", null)]
    public void A_control_that_is_probably_a_slip_is_a_doubt(string line, string? expected)
        => AssertDoubts(FellStudy.VariableSpeedCase, "[control]", $"[control]\n{line}", expected);

    [Theory]
    [InlineData("turbulence_intensity = 0.7",
        "cases/clean.toml:6:24: turbulence_intensity is 0.7; even in slight wind 0.6 is seldom exceeded; it is a share and not percent")]
    [InlineData("turbulence_intensity = 0.6", null)]
    public void A_turbulence_beyond_what_is_usual_is_a_doubt(string line, string? expected)
        => AssertDoubts(FellStudy.VariableSpeedCase, "[wind]", $"[wind]\n{line}", expected);

    [Fact]
    public void A_schedule_is_judged_by_its_highest_rotor_speed()
        => Told.Exactly(
            ["cases/clean.toml:9:12: schedule goes up to 7 rpm, a tip speed of 3.67 m/s; 5 to 150 m/s are usual, and rotor speeds are in rpm"],
            Sound(FellStudy.ScheduleCase).Change("schedules/gentle.csv", "4,40,0\n8,70,3", "4,4,0\n8,7,3").Read().Doubts);

    [Fact]
    public void The_cone_shortens_the_way_of_the_tip()
        => AssertDoubts(FellStudy.Case, "blade_count = 3\n\n[wind]\nspeeds_m_s = { from = 5, to = 7, step = 1 }\n\n[control]\nstrategy        = \"fixed-speed\"\nrotor_speed_rpm = 70",
            "blade_count = 3\ncone_deg = 60\n[wind]\nspeeds_m_s = [5]\n[control]\nstrategy = \"fixed-speed\"\nrotor_speed_rpm = 12",
            "cases/clean.toml:12:19: rotor_speed_rpm is 12, a tip speed of 3.14 m/s; 5 to 150 m/s are usual, and rotor speeds are in rpm");

    [Fact]
    public void A_wrong_value_is_an_error_and_no_doubt_beside_it()
        => Told.Exactly([],
            Sound(FellStudy.Case).Change("cases/clean.toml", "[rotor]", "[air]\ndensity_kg_m3 = 1225\n[model]\nelements = 0\n[rotor]").Read().Doubts);

    [Fact]
    public void Wind_speeds_of_a_range_are_numbers_as_one_would_write_them()
    {
        var speeds = Sound(FellStudy.Case.Replace("from = 5, to = 7, step = 1", "from = 4, to = 24, step = 0.7", StringComparison.Ordinal)).OnlyCase().Rotor.WindSpeeds;

        // 4 + 0.7 i, typed.
        Assert.Equal([4, 4.7, 5.4, 6.1, 6.8, 7.5, 8.2, 8.9, 9.6, 10.3, 11, 11.7, 12.4, 13.1, 13.8, 14.5, 15.2, 15.9, 16.6, 17.3, 18, 18.7, 19.4,
            20.1, 20.8, 21.5, 22.2, 22.9, 23.6], speeds.ToArray());
    }

    private static void AssertDoubts(string caseText, string text, string by, string? expected)
    {
        var study = Sound(caseText).Change("cases/clean.toml", text, by).Read();

        Told.Exactly(expected is null ? [] : [expected], study.Doubts);
        Told.Exactly([], study.Errors);
        Assert.Equal(["clean"], study.Cases.Select(c => c.Name));
    }

    // The tip's table goes round the circle, so that nothing else is doubtful.
    private static FellStudy Sound(string caseText)
        => new FellStudy().With("cases/clean.toml", caseText).With("polars/clean/tip.csv", FellStudy.RootPolar);
}
