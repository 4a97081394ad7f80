using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Studies.Tests.Fingerprints;

public class FingerprintTests
{
    private const string Clean = "cases/clean.toml";

    [Theory]
    [InlineData("rotor.blade_count", "[rotor]\nblade_count = 3", "[rotor]\nblade_count = 2")]
    [InlineData("rotor.cone_deg", "[rotor]", "[rotor]\ncone_deg = 0.1")]
    [InlineData("air.density_kg_m3", "[model]", "[air]\ndensity_kg_m3 = 1.2\n[model]")]
    [InlineData("air.dynamic_viscosity_Pa_s", "[model]", "[air]\ndynamic_viscosity_Pa_s = 1.8e-5\n[model]")]
    [InlineData("wind.speeds_m_s", "[5, 6, 7]", "[5, 6]")]
    [InlineData("wind.speeds_m_s", "[5, 6, 7]", "[5, 6, 7.000000000000001]")]
    [InlineData("control.tip_speed_ratio", "tip_speed_ratio = 7", "tip_speed_ratio = 7.1")]
    [InlineData("control.fine_pitch_deg", "fine_pitch_deg = 1", "fine_pitch_deg = -1")]
    [InlineData("control.min_rotor_speed_rpm", "[control]", "[control]\nmin_rotor_speed_rpm = 10")]
    [InlineData("control.max_rotor_speed_rpm", "[control]", "[control]\nmax_rotor_speed_rpm = 100")]
    [InlineData("control.cut_in_wind_speed_m_s", "[control]", "[control]\ncut_in_wind_speed_m_s = 5.5")]
    [InlineData("control.cut_out_wind_speed_m_s", "[control]", "[control]\ncut_out_wind_speed_m_s = 6.5")]
    [InlineData("control.drivetrain_efficiency", "[control]", "[control]\ndrivetrain_efficiency = 0.9")]
    [InlineData("control.above_rated control.rated_power_kW", "[control]", "[control]\nrated_power_kW = 5")]
    [InlineData("control.rated_power_kW", "[control]", "[control]\nrated_power_kW = 5\nabove_rated = \"none\"")]
    [InlineData("control.tip_speed_ratio", "tip_speed_ratio = 7\n", "")]
    [InlineData("control.fine_pitch_deg", "fine_pitch_deg = 1", "fine_pitch_deg = \"best\"")]
    [InlineData("control.speed_limited_pitch", "[control]", "[control]\nspeed_limited_pitch = \"best\"")]
    [InlineData("control.thrust_limit_kN", "[control]", "[control]\nthrust_limit_kN = 5")]
    [InlineData("wind.turbulence_intensity", "[wind]", "[wind]\nturbulence_intensity = 0.1")]
    [InlineData("wind.turbulence_intensity", "[wind]", "[wind]\nturbulence_intensity = [[5, 0.2], [6, 0.1]]")]
    [InlineData("air.altitude_m air.density_kg_m3 air.dynamic_viscosity_Pa_s air.speed_of_sound_m_s", "[model]", "[air]\naltitude_m = 500\n[model]")]
    [InlineData("air.density_kg_m3 air.pressure_Pa", "[model]", "[air]\npressure_Pa = 1e5\n[model]")]
    [InlineData("air.density_kg_m3 air.relative_humidity", "[model]", "[air]\nrelative_humidity = 0.5\n[model]")]
    [InlineData("air.reference_density_kg_m3", "[model]", "[air]\nreference_density_kg_m3 = 1.2\n[model]")]
    [InlineData("site.availability site.mean_wind_speed_m_s site.weibull_shape", "[model]", "[site]\nmean_wind_speed_m_s = 7\n[model]")]
    [InlineData("surface.pitches_deg surface.tip_speed_ratios surface.wind_speed_m_s", "[model]",
        "[surface]\npitches_deg = [0]\ntip_speed_ratios = [7]\n[model]")]
    [InlineData("model.elements", "[model]", "[model]\nelements = 41")]
    [InlineData("model.spacing", "[model]", "[model]\nspacing = \"uniform\"")]
    [InlineData("model.losses", "[model]", "[model]\nlosses = [\"tip\"]")]
    [InlineData("model.losses", "[model]", "[model]\nlosses = [\"hub\"]")]
    [InlineData("model.losses", "[model]", "[model]\nlosses = []")]
    [InlineData("model.heavy_loading", "[model]", "[model]\nheavy_loading = \"buhl-2005\"")]
    [InlineData("model.balance_with", "[model]", "[model]\nbalance_with = \"lift\"")]
    [InlineData("sections.aspect_ratio sections.extend sections.join", "[model]", "[sections]\nextend = \"viterna-1982\"\n[model]")]
    [InlineData("sections.augment", "[model]", "[sections]\naugment = \"snel-1993\"\n[model]")]
    [InlineData("sections.augment", "[model]", "[sections]\naugment = \"du-selig-1998\"\n[model]")]
    [InlineData("outputs.spanwise", "[outputs]", "[outputs]\nspanwise = \"none\"")]
    [InlineData("outputs.spanwise", "[outputs]", "[outputs]\nspanwise = [6]")]
    public void Every_value_of_a_case_changes_it(string keys, string text, string by)
    {
        var before = Study().OnlyCase();
        var after = Study().Change(Clean, text, by).OnlyCase();

        Assert.NotEqual(before.Fingerprint, after.Fingerprint);
        Assert.Equal(keys, string.Join(' ', after.Values.Where(value => before.Values.GetValueOrDefault(value.Key) != value.Value).Select(value => value.Key)));
    }

    [Theory]
    [InlineData("blade", "blades/fell.csv", "1,0.8,12", "1.1,0.8,12")]
    [InlineData("blade", "blades/fell.csv", "1,0.8,12", "1,0.81,12")]
    [InlineData("blade", "blades/fell.csv", "1,0.8,12", "1,0.8,12.1")]
    [InlineData("blade", "blades/fell.csv", "3,0.6,5,root", "3,0.6,5,tip")]
    [InlineData("section.root", "polars/clean/root.csv", "1e6,0,0.3,0.01", "1e6,0.1,0.3,0.01")]
    [InlineData("section.root", "polars/clean/root.csv", "1e6,0,0.3,0.01", "1e6,0,0.31,0.01")]
    [InlineData("section.root", "polars/clean/root.csv", "1e6,0,0.3,0.01", "1e6,0,0.3,0.011")]
    [InlineData("section.tip", "polars/clean/tip.csv", "-10,-0.8", "-9.9,-0.8")]
    public void Every_value_of_a_table_changes_it(string key, string file, string text, string by)
    {
        var before = new FellStudy().OnlyCase();
        var after = new FellStudy().Change(file, text, by).OnlyCase();

        Assert.NotEqual(before.Fingerprint, after.Fingerprint);
        Assert.Equal([key], after.Values.Where(value => before.Values.GetValueOrDefault(value.Key) != value.Value).Select(value => value.Key));
    }

    [Fact]
    public void Reynolds_numbers_change_it()
    {
        var other = FellStudy.RootPolar.Replace("3e6", "3.1e6", StringComparison.Ordinal);

        Assert.NotEqual(new FellStudy().OnlyCase().Fingerprint, new FellStudy().With("polars/clean/root.csv", other).OnlyCase().Fingerprint);
    }

    [Fact]
    public void The_schedule_changes_it()
    {
        var before = new FellStudy().With(Clean, FellStudy.ScheduleCase).OnlyCase();
        var after = new FellStudy().With(Clean, FellStudy.ScheduleCase).Change("schedules/gentle.csv", "8,70,3", "8,70,3.1").OnlyCase();

        Assert.NotEqual(before.Fingerprint, after.Fingerprint);
    }

    [Theory]
    [InlineData(Clean, "tip_speed_ratio = 7", "tip_speed_ratio = 7.00 # of the tip")]
    [InlineData(Clean, "tip_speed_ratio = 7\nfine_pitch_deg = 1", "  fine_pitch_deg=1.0\ntip_speed_ratio   =   0.7e1")]
    [InlineData(Clean, "[5, 6, 7]", "[5.0, 6.00,\n  7]")]
    [InlineData(Clean, "[5, 6, 7]", "{ from = 5, to = 7, step = 1 }")]
    [InlineData(Clean, "[rotor]\nblade_count = 3", "rotor = { blade_count = 3 }")]
    [InlineData(Clean, "[rotor]\nblade_count = 3\n[wind]", "[wind]")]
    [InlineData(Clean, "[model]", "[model]\nelements = 40\nspacing = \"cosine\"\nlosses = [\"hub\", \"tip\"]\nheavy_loading = \"glauert-1935\"\nbalance_with = \"lift and drag\"")]
    [InlineData(Clean, "[model]", "[air]\ndensity_kg_m3 = 1.2250\ndynamic_viscosity_Pa_s = 0.00001789\n[model]")]
    [InlineData(Clean, "[outputs]", "[outputs]\nspanwise = \"all\"")]
    [InlineData(Clean, "[model]", "[sections]\nextend = \"none\"\naugment = \"none\"\naspect_ratio = 9\njoin = \"stall\"\n[model]")]
    [InlineData(Clean, "[control]", "[control]\nmin_rotor_speed_rpm = 0\ndrivetrain_efficiency = 1\nabove_rated = 'none'")]
    [InlineData(Clean, "blade  = ", "title = \"Another\"\nblade  = ")]
    [InlineData(Clean, "[rotor]", "[rotor]\nhub_height_m = 30\ncone_deg = -0.0")]
    [InlineData("blades/fell.csv", "1,0.8,12,root", "1.0, 0.80 ,1.2e1,root\n# comment")]
    [InlineData("polars/clean/tip.csv", "0,0.2,0.01,-0.05", "-0.0,2e-1,0.010,-0.0500")]
    [InlineData("polars/clean/tip.csv", "0,0.2,0.01,-0.05", "0,0.2,0.01,-0.06")]
    public void How_a_value_is_written_does_not_change_it(string file, string text, string by)
    {
        var study = Study();
        if (by == "[wind]")
            study.With(Clean, FellStudy.VariableSpeedCase + "[rotor]\nblade_count = 3\n").Change(Clean, "[rotor]\nblade_count = 3\n[wind]", by);
        else
            study.Change(file, text, by);

        Assert.Equal(Study().OnlyCase().Fingerprint, study.OnlyCase().Fingerprint);
    }

    [Fact]
    public void Names_of_case_study_and_files_do_not_change_it()
    {
        var moved = new MemoryFiles()
            .Write("/elsewhere/moor/cases/other.toml", FellStudy.Case.Replace("fell.csv", "renamed.csv", StringComparison.Ordinal).Replace("clean\"", "set\"", StringComparison.Ordinal))
            .Write("/elsewhere/moor/blades/renamed.csv", FellStudy.Blade)
            .Write("/elsewhere/moor/polars/set/root.csv", FellStudy.RootPolar)
            .Write("/elsewhere/moor/polars/set/tip.csv", FellStudy.TipPolar);

        Assert.Equal(new FellStudy().OnlyCase().Fingerprint, Assert.Single(StudyReader.Read("/elsewhere/moor", moved).Cases).Fingerprint);
    }

    [Fact]
    public void Order_of_columns_does_not_change_it()
    {
        const string turned = "cm,cd,cl,alpha_deg\n0,0.02,-0.8,-10\n-0.05,0.01,0.2,0\n-0.05,0.015,1.1,10\n";

        Assert.Equal(new FellStudy().OnlyCase().Fingerprint, new FellStudy().With("polars/clean/tip.csv", turned).OnlyCase().Fingerprint);
    }

    [Fact]
    public void Everything_that_determines_a_result_is_in_the_values()
    {
        var only = Study().OnlyCase();

        Assert.Equal(
            [
                "air.density_kg_m3 = 1.225", "air.dynamic_viscosity_Pa_s = 1.789e-05", $"air.speed_of_sound_m_s = {only.Values["air.speed_of_sound_m_s"]}",
                $"blade = {only.Values["blade"]}",
                "control.above_rated = none", "control.cut_in_wind_speed_m_s = 0", "control.cut_out_wind_speed_m_s = none",
                "control.drivetrain_efficiency = 1", "control.fine_pitch_deg = 1", "control.max_rotor_speed_rpm = none",
                "control.min_rotor_speed_rpm = 0", "control.rated_power_kW = none", "control.speed_limited_pitch = hold",
                "control.strategy = variable-speed", "control.thrust_limit_kN = none", "control.tip_speed_ratio = 7",
                "model.balance_with = lift and drag", "model.elements = 40", "model.heavy_loading = glauert-1935",
                "model.losses = tip,hub", "model.spacing = cosine",
                "outputs.spanwise = all", "rotor.blade_count = 3", "rotor.cone_deg = 0",
                $"section.root = {only.Values["section.root"]}", $"section.tip = {only.Values["section.tip"]}",
                $"solver = {SolverVersion.Number}", "wind.speeds_m_s = 5,6,7", "wind.turbulence_intensity = 0",
            ],
            only.Values.Select(value => $"{value.Key} = {value.Value}"));
        Assert.Matches("^[0-9a-f]{64}$", only.Fingerprint);
    }

    [Fact]
    public void A_file_is_hashed_as_it_lies_there()
    {
        byte[] bytes = [.. Encoding.UTF8.Preamble, .. Encoding.UTF8.GetBytes(FellStudy.Blade.ReplaceLineEndings("\r\n"))];

        var input = new FellStudy().With("blades/fell.csv", bytes).OnlyCase().Inputs.Single(i => i.File == "blades/fell.csv");

        Assert.Equal(Convert.ToHexStringLower(SHA256.HashData(bytes)), input.Sha256);
    }

    [Fact]
    public void A_machine_that_writes_decimals_with_a_comma_reads_the_same()
    {
        var before = CultureInfo.CurrentCulture;
        var comma = (CultureInfo)CultureInfo.InvariantCulture.Clone();
        comma.NumberFormat.NumberDecimalSeparator = ",";
        comma.NumberFormat.NumberGroupSeparator = ".";
        comma.NumberFormat.NegativeSign = "\u2212";
        var (plain, told) = (Study().OnlyCase(), Wrong().Read());
        try
        {
            CultureInfo.CurrentCulture = comma;

            var only = Study().OnlyCase();
            Assert.Equal(plain.Fingerprint, only.Fingerprint);
            Assert.Equal(plain.Values.ToArray(), only.Values.ToArray());
            Assert.Equal(plain.Inputs.ToArray(), only.Inputs.ToArray());
            Assert.Equal(told.Errors.ToArray(), Wrong().Read().Errors.ToArray());
            Assert.Equal(told.Rejected.ToArray(), Wrong().Read().Rejected.ToArray());
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }

        static FellStudy Wrong() => Study().Change(Clean, "tip_speed_ratio = 7", "tip_speed_ratio = -1.5")
            .Change("blades/fell.csv", "1,0.8,12", "1,-0.8,1.2e3").Change("polars/clean/tip.csv", "10,1.1,0.015", "-1.5,1.1,-0.25")
            .With("cases/swept.toml", FellStudy.Case + "[sweep]\n\"air.density_kg_m3\" = [-1.05, 1.225]\n");
    }

    private static FellStudy Study() => new FellStudy().With(Clean, FellStudy.VariableSpeedCase);
}
