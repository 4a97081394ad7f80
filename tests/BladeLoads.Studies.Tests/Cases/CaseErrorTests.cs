namespace BladeLoads.Studies.Tests.Cases;

/// <summary>What a wrong value in a case file is answered with, word for word.</summary>
public class CaseErrorTests
{
    [Theory]
    // Keys and tables that are not known.
    [InlineData("blade_count = 3", "blade_cuont = 3",
        "cases/clean.toml:6:1: unknown key 'blade_cuont' in [rotor]; did you mean 'blade_count'?")]
    [InlineData("pitch_deg       = 2", "pitch_deg = 2\ntip_speed = 7",
        "cases/clean.toml:15:1: unknown key 'tip_speed' in [control]; did you mean 'tip_speed_ratio'?")]
    [InlineData("[rotor]", "[rotor]\ncolour = \"white\"",
        "cases/clean.toml:6:1: unknown key 'colour' in [rotor]; known are blade_count, cone_deg, tilt_deg, hub_height_m")]
    [InlineData("[rotor]", "[rotor]\ndensity_kg_m3 = 1.2",
        "cases/clean.toml:6:1: unknown key 'density_kg_m3' in [rotor]; it belongs in [air]")]
    [InlineData("[rotor]", "[rotor]\nhub_height_ft = 260",
        "cases/clean.toml:6:1: unknown key 'hub_height_ft' in [rotor]; did you mean 'hub_height_m'?")]
    [InlineData("[rotor]", "[rotro]",
        "cases/clean.toml:5:2: unknown table [rotro]; did you mean [rotor]?")]
    [InlineData("[rotor]", "[weather]\nrain = true\n[rotor]",
        "cases/clean.toml:5:2: unknown table [weather]; known are [rotor], [air], [wind], [control], [site], [surface], [model], [sections], [outputs], [sweep]")]
    [InlineData("title  = ", "titel  = ",
        "cases/clean.toml:1:1: unknown key 'titel' at the top of the file; did you mean 'title'?")]
    [InlineData("title  = ", "blade_count = 3\ntitle  = ",
        "cases/clean.toml:1:1: unknown key 'blade_count' at the top of the file; it belongs in [rotor]")]
    [InlineData("[rotor]\nblade_count = 3", "rotor = 3",
        "cases/clean.toml:5:9: rotor is 3; write it as a table: [rotor]")]
    [InlineData("title  = ", "baseline = \"clean\"\ntitle  = ",
        "cases/clean.toml:1:1: baseline is a matter of the whole study; write it in study.toml")]
    // What is missing.
    [InlineData("blade_count = 3", "",
        "cases/clean.toml:5:2: [rotor] blade_count is missing; write it, such as blade_count = 3")]
    [InlineData("blade  = \"../blades/fell.csv\"", "",
        "cases/clean.toml: blade is missing; write it, such as blade = \"../blades/tarn-44.csv\"")]
    [InlineData("strategy        = \"fixed-speed\"", "",
        "cases/clean.toml:11:2: [control] strategy is missing; write it, such as strategy = \"variable-speed\"")]
    [InlineData("rotor_speed_rpm = 70", "",
        "cases/clean.toml:11:2: [control] rotor_speed_rpm is missing; write it, such as rotor_speed_rpm = 72")]
    [InlineData("speeds_m_s = { from = 5, to = 7, step = 1 }", "",
        "cases/clean.toml:8:2: [wind] speeds_m_s is missing; write it, such as speeds_m_s = { from = 3, to = 25, step = 0.5 }")]
    // Wrong types.
    [InlineData("blade_count = 3", "blade_count = \"3\"",
        "cases/clean.toml:6:15: blade_count is '3' in quotes, which is text; write the number without quotes: 3")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = \"70,5\"",
        "cases/clean.toml:13:19: rotor_speed_rpm is '70,5'; write decimals with a point: 70.5, without quotes")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = \"70,500\"",
        "cases/clean.toml:13:19: rotor_speed_rpm is '70,500'; write 70500 or 70.500, whichever is meant, without quotes")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = \"fast\"",
        "cases/clean.toml:13:19: rotor_speed_rpm is 'fast'; give a number, such as 72")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = true",
        "cases/clean.toml:13:19: rotor_speed_rpm is true; give a number, such as 72")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = [70]",
        "cases/clean.toml:13:19: rotor_speed_rpm is a list; give a number, such as 72")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = 1979-05-27",
        "cases/clean.toml:13:19: rotor_speed_rpm is a date or time; give a number, such as 72")]
    [InlineData("title  = \"Clean blades\"", "title = 5",
        "cases/clean.toml:1:9: title is 5; give text in quotes, such as \"Clean blades, sea level\"")]
    [InlineData("blade  = \"../blades/fell.csv\"", "blade = [1]",
        "cases/clean.toml:2:9: blade is a list; give text in quotes, such as \"../blades/tarn-44.csv\"")]
    // Numbers that cannot be.
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = nan",
        "cases/clean.toml:13:19: rotor_speed_rpm is nan; give a finite number")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = -inf",
        "cases/clean.toml:13:19: rotor_speed_rpm is infinite; give a finite number")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = 1e400",
        "cases/clean.toml:13:19: rotor_speed_rpm is infinite; give a finite number")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = -70",
        "cases/clean.toml:13:19: rotor_speed_rpm is -70; it must be from 0 to 100000: the rotor turns one way only; give it in rpm, such as 12")]
    [InlineData("pitch_deg       = 2", "pitch_deg = 181",
        "cases/clean.toml:14:13: pitch_deg is 181; it must be from -180 to 180")]
    [InlineData("blade_count = 3", "blade_count = 0",
        "cases/clean.toml:6:15: blade_count is 0; it must be from 1 to 20")]
    [InlineData("blade_count = 3", "blade_count = 21",
        "cases/clean.toml:6:15: blade_count is 21; it must be from 1 to 20")]
    [InlineData("blade_count = 3", "blade_count = 2.5",
        "cases/clean.toml:6:15: blade_count is 2.5; give a whole number")]
    [InlineData("blade_count = 3", "blade_count = 3\ncone_deg = -80.1",
        "cases/clean.toml:7:12: cone_deg is -80.1; it must be from -80 to 80")]
    [InlineData("blade_count = 3", "blade_count = 3\nhub_height_m = 0",
        "cases/clean.toml:7:16: hub_height_m is 0; it must be above 0")]
    [InlineData("[rotor]", "[air]\ndensity_kg_m3 = 0\ndynamic_viscosity_Pa_s = -1e-5\n[rotor]",
        "cases/clean.toml:6:17: density_kg_m3 is 0; it must be above 0 and at most 100: there would be no air; give it in kg/m3, such as 1.225",
        "cases/clean.toml:7:26: dynamic_viscosity_Pa_s is -1e-05; it must be above 0 and at most 1: "
        + "Reynolds numbers would have no bound; give it in Pa s, such as 1.789e-5")]
    // Beyond what any rotor is.
    [InlineData("[rotor]", "[air]\ndensity_kg_m3 = 1225\ndynamic_viscosity_Pa_s = 17.89\n[rotor]",
        "cases/clean.toml:6:17: density_kg_m3 is 1225; it must be above 0 and at most 100: no air is as dense; give it in kg/m3, such as 1.225",
        "cases/clean.toml:7:26: dynamic_viscosity_Pa_s is 17.89; it must be above 0 and at most 1: "
        + "no air is as viscous; give it in Pa s, such as 1.789e-5")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = 100001\nrated_power_kW = 2e9",
        "cases/clean.toml:13:19: rotor_speed_rpm is 100001; it must be from 0 to 100000: no rotor turns as fast; give it in rpm, such as 12",
        "cases/clean.toml:14:18: rated_power_kW is 2000000000; it must be above 0 and at most 1000000000: "
        + "no machine makes as much; give it in kW, such as 2000, or leave the key out for none")]
    [InlineData("rotor_speed_rpm = 70", "rotor_speed_rpm = 70\ncut_in_wind_speed_m_s = 201\ncut_out_wind_speed_m_s = 250",
        "cases/clean.toml:14:25: cut_in_wind_speed_m_s is 201; it must be from 0 to 200: "
        + "no machine operates there; give it in m/s, such as 3, or leave the key out for none",
        "cases/clean.toml:15:26: cut_out_wind_speed_m_s is 250; it must be above 0 and at most 200: "
        + "no machine operates there; give it in m/s, such as 25, or leave the key out for none")]
    [InlineData("{ from = 5, to = 7, step = 1 }", "[5, 201]",
        "cases/clean.toml:9:18: speeds_m_s holds 201; wind speeds must be at most 200 m/s")]
    [InlineData("to = 7", "to = 2400",
        "cases/clean.toml:9:31: speeds_m_s has to = 2400; wind speeds must be at most 200 m/s")]
    [InlineData("[wind]", "[air]\nrelative_humidity = 50\n[wind]\nturbulence_intensity = 12",
        "cases/clean.toml:9:21: relative_humidity is 50; it must be from 0 to 1: "
        + "air holds no more water than when it is saturated; it is a share and not percent: write 0.5",
        "cases/clean.toml:11:24: turbulence_intensity is 12; it must be from 0 to 1: "
        + "the wind speed would vary by more than its mean; it is a share and not percent: write 0.12")]
    // Wind speeds.
    [InlineData("step = 1 ", "step = 0 ",
        "cases/clean.toml:9:41: speeds_m_s has step = 0; it must be above 0")]
    [InlineData("step = 1 ", "step = -1 ",
        "cases/clean.toml:9:41: speeds_m_s has step = -1; it must be above 0")]
    [InlineData("step = 1 ", "step = 1e-9 ",
        "cases/clean.toml:9:41: speeds_m_s has step = 1e-09, which gives more than 10,000 wind speeds; give a larger step")]
    [InlineData("step = 1 ", "step = nan ",
        "cases/clean.toml:9:41: speeds_m_s has step = nan; give a finite number, without quotes")]
    [InlineData("step = 1 ", "stride = 1 ",
        "cases/clean.toml:9:34: speeds_m_s has an unknown key 'stride'; known are from, to, step")]
    [InlineData(", step = 1 ", "",
        "cases/clean.toml:9:14: speeds_m_s has no step; give all of from, to, step")]
    [InlineData("from = 5", "from = 0",
        "cases/clean.toml:9:23: speeds_m_s has from = 0; it must be above 0")]
    [InlineData("from = 5", "from = 8",
        "cases/clean.toml:9:23: speeds_m_s runs from 8 to 7; from must not exceed to")]
    [InlineData("{ from = 5, to = 7, step = 1 }", "6",
        "cases/clean.toml:9:14: speeds_m_s is 6; give a list, or { from = 3, to = 25, step = 0.5 }")]
    [InlineData("{ from = 5, to = 7, step = 1 }", "[]",
        "cases/clean.toml:9:14: speeds_m_s is an empty list; give at least one wind speed")]
    [InlineData("{ from = 5, to = 7, step = 1 }", "[5, 6, 6]",
        "cases/clean.toml:9:21: speeds_m_s holds 6 twice; each wind speed once")]
    [InlineData("{ from = 5, to = 7, step = 1 }", "[5, 7, 6]",
        "cases/clean.toml:9:21: speeds_m_s falls from 7 to 6; wind speeds must rise")]
    [InlineData("{ from = 5, to = 7, step = 1 }", "[0, 7]",
        "cases/clean.toml:9:15: speeds_m_s holds 0; wind speeds must be above 0")]
    [InlineData("{ from = 5, to = 7, step = 1 }", "[5, \"6\"]",
        "cases/clean.toml:9:18: speeds_m_s holds '6'; give finite numbers, without quotes")]
    // The model and the outputs.
    [InlineData("[wind]", "[model]\nelements = 1000000000\n[wind]",
        "cases/clean.toml:9:12: elements is 1000000000; it must be from 1 to 2000")]
    [InlineData("[wind]", "[model]\nelements = 0\n[wind]",
        "cases/clean.toml:9:12: elements is 0; it must be from 1 to 2000")]
    [InlineData("[wind]", "[model]\nheavy_loading = \"glauert\"\nspacing = \"sine\"\nbalance_with = \"drag\"\n[wind]",
        "cases/clean.toml:9:17: heavy_loading is 'glauert'; write \"glauert-1935\" or \"buhl-2005\"",
        "cases/clean.toml:10:11: spacing is 'sine'; write \"cosine\" or \"uniform\"",
        "cases/clean.toml:11:16: balance_with is 'drag'; write \"lift and drag\" or \"lift\"")]
    [InlineData("[wind]", "[model]\nlosses = [\"tip\", \"root\"]\n[wind]",
        "cases/clean.toml:9:18: losses holds 'root'; known are \"tip\" and \"hub\"")]
    [InlineData("[wind]", "[model]\nlosses = [\"tip\", \"tip\"]\n[wind]",
        "cases/clean.toml:9:18: losses holds 'tip' twice; keep one")]
    [InlineData("[wind]", "[model]\nlosses = \"tip\"\n[wind]",
        "cases/clean.toml:9:10: losses is 'tip'; give a list of \"tip\" and \"hub\", or an empty one: []")]
    [InlineData("[wind]", "[outputs]\nspanwise = [5, 6.5]\n[wind]",
        "cases/clean.toml:9:16: spanwise holds 6.5, which is no wind speed of the case; the nearest is 6")]
    [InlineData("[wind]", "[outputs]\nspanwise = \"some\"\n[wind]",
        "cases/clean.toml:9:12: spanwise is 'some'; write \"all\", \"none\" or a list of wind speeds")]
    // Text that must not reach a terminal as it is.
    [InlineData("title  = \"Clean blades\"", "title = \"a\\u001b[2Jb\"",
        "cases/clean.toml:1:9: title is 'a\\u001B[2Jb'; write it in one line, without control characters")]
    [InlineData("strategy        = \"fixed-speed\"", "strategy = \"\\u202Efixed\"",
        "cases/clean.toml:12:12: strategy is '\\u202Efixed'; write \"variable-speed\", \"fixed-speed\" or \"schedule\"")]
    [InlineData("strategy        = \"fixed-speed\"", "strategy = \"a very long word indeed, longer than anyone would want to see again in a message of ours\"",
        "cases/clean.toml:12:12: strategy is 'a very long word indeed, longer than anyone would want to see again in a mess...'; write \"variable-speed\", \"fixed-speed\" or \"schedule\"")]
    public void A_wrong_case_is_told_where_what_and_what_would_do(string text, string by, params string[] expected)
    {
        var study = new FellStudy().Change("cases/clean.toml", text, by).Read();

        Told.Exactly(expected, study.Errors);
        Assert.Equal(["clean"], study.Rejected.ToArray());
        Assert.Empty(study.Cases);
    }

    [Fact]
    public void All_errors_are_told_at_once_in_file_order()
    {
        var study = new FellStudy()
            .Change("cases/clean.toml", "blade_count = 3", "blade_count = 0")
            .Change("cases/clean.toml", "pitch_deg       = 2", "pitch_deg = nan")
            .With("cases/also.toml", FellStudy.Case.Replace("\"Clean blades\"", "7", StringComparison.Ordinal))
            .Change("polars/clean/tip.csv", "0.02,0\n", "-0.02,0\n")
            .Change("blades/fell.csv", "0.8", "-0.8")
            .With("study.toml", "titel = \"x\"\n");

        Told.Exactly(
            [
                "study.toml:1:1: unknown key 'titel' at the top of the file; did you mean 'title'?",
                "cases/also.toml:1:10: title is 7; give text in quotes, such as \"Clean blades, sea level\"",
                "cases/clean.toml:6:15: blade_count is 0; it must be from 1 to 20",
                "cases/clean.toml:14:13: pitch_deg is nan; give a finite number",
                "blades/fell.csv:3:3: chord_m is -0.8; it must be above 0",
                "polars/clean/tip.csv:2:10: cd is -0.02; drag coefficients must be >= 0",
            ],
            study.Read().Errors);
    }

    [Fact]
    public void Files_follow_in_the_order_of_starting_values_cases_blades_polars_and_the_rest()
    {
        InputFinding[] inOrder =
        [
            new("study.toml", 9, 1, "a"), new("cases/a.toml", 0, 0, "the whole file"), new("cases/a.toml", 2, 10, "a"),
            new("cases/a.toml", 10, 2, "a"), new("cases/a.toml", 10, 11, "a"), new("cases/a.toml", 10, 11, "b"),
            new("cases/a.toml", 10, 0, "the whole line"), new("cases/b.toml", 1, 1, "a"), new("blades/z.csv", 1, 1, "a"),
            new("polars/a/a.csv", 1, 1, "a"), new("polars/a/b.csv", 1, 1, "a"), new("a.toml", 1, 1, "a"), new("schedules/a.csv", 1, 1, "a"),
        ];

        Assert.Equal(inOrder, inOrder.Reverse().Order(FindingOrder.Instance));
        Told.Exactly(
            [
                "study.toml:1:1: unknown key 'titel' at the top of the file; did you mean 'title'?",
                "cases/clean.toml:4:15: blade_count is 0; it must be from 1 to 20",
                "blades/fell.csv:3:3: chord_m is -0.8; it must be above 0",
                "polars/clean/tip.csv:2:10: cd is -0.02; drag coefficients must be >= 0",
                "schedules/gentle.csv:2:3: rotor_speed_rpm is -40; it must be from 0 to 100000",
            ],
            new FellStudy()
                .With("cases/clean.toml", FellStudy.ScheduleCase.Replace("= 3", "= 0", StringComparison.Ordinal))
                .Change("schedules/gentle.csv", "4,40", "4,-40")
                .Change("polars/clean/tip.csv", "0.02,0\n", "-0.02,0\n")
                .Change("blades/fell.csv", "0.8", "-0.8")
                .With("study.toml", "titel = \"x\"\n").Read().Errors);
    }

    [Fact]
    public void A_case_with_an_error_is_not_run_and_the_others_are()
    {
        var study = new FellStudy().With("cases/wrong.toml", FellStudy.Case.Replace("= 3", "= 0", StringComparison.Ordinal)).Read();

        Assert.Equal(["clean"], study.Cases.Select(c => c.Name));
        Assert.Equal(["wrong"], study.Rejected.ToArray());
    }

    [Fact]
    public void A_table_shared_by_many_cases_is_told_wrong_once()
    {
        var study = new FellStudy()
            .With("cases/second.toml", FellStudy.Case).With("cases/third.toml", FellStudy.Case)
            .Change("polars/clean/tip.csv", "0.02,0\n", "-0.02,0\n").Read();

        Told.Exactly(["polars/clean/tip.csv:2:10: cd is -0.02; drag coefficients must be >= 0"], study.Errors);
        Assert.Equal(["clean", "second", "third"], study.Rejected.ToArray());
    }

    [Fact]
    public void Errors_of_one_file_beyond_fifty_are_counted()
    {
        var keys = string.Concat(Enumerable.Range(0, 60).Select(i => $"qqqqqqqqqqqq{i:00} = 1\n"));
        var errors = new FellStudy().With("cases/clean.toml", keys + FellStudy.Case).Errors().ToList();

        Assert.Equal(51, errors.Count);
        Assert.Equal("cases/clean.toml:51: and 10 more errors from here on", errors[^1]);
    }

    [Theory]
    [InlineData("..")]
    [InlineData(".")]
    [InlineData("")]
    [InlineData("a~b")]
    [InlineData("a\\b")]
    [InlineData("a\u001bb")]
    [InlineData("logs")]
    [InlineData("Failures")]
    [InlineData("tables")]
    [InlineData("replaced")]
    [InlineData("Kept")]
    [InlineData("summary.csv")]
    [InlineData("nul")]
    public void A_case_name_that_is_no_safe_folder_name_is_refused(string name)
    {
        const string end = "; rename the file, its results get a folder of this name";
        var expected = name switch
        {
            ".." => "cases/...toml: the case name '..' begins with a dot" + end,
            "." => "cases/..toml: the case name '.' begins with a dot" + end,
            "" => "cases/.toml: the case name '' is empty" + end,
            "a~b" => "cases/a~b.toml: the case name 'a~b' holds '~'" + end,
            "a\\b" => "cases/a/b.toml: the case name 'a\\b' holds '\\'" + end,
            "a\u001bb" => "cases/a\\u001Bb.toml: the case name 'a\\u001Bb' holds a control character" + end,
            "nul" => "cases/nul.toml: the case name 'nul' is the name of a device on some systems" + end,
            _ => $"cases/{name}.toml: the case name '{name}' is kept for another part of the results; rename the file",
        };

        Told.Exactly([expected], new FellStudy().With($"cases/{name}.toml", FellStudy.Case).Read().Errors);
    }

    [Fact]
    public void A_case_name_longer_than_a_hundred_characters_is_refused()
    {
        var errors = new FellStudy().With($"cases/{new string('x', 101)}.toml", FellStudy.Case).Errors();

        Assert.Equal(
            [$"cases/{new string('x', 101)}.toml: the case name '{new string('x', 77)}...' is longer than 100 characters; rename the file, its results get a folder of this name"],
            errors);
    }
}
