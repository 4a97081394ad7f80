namespace BladeLoads.Studies.Tests.Studies;

/// <summary>study.toml: values that every case starts from.</summary>
public class StartingValuesTests
{
    [Fact]
    public void What_a_case_leaves_out_is_taken_key_by_key()
    {
        var study = new FellStudy()
            .With("study.toml", "polars = \"polars/clean\"\nblade = \"blades/fell.csv\"\n[air]\ndensity_kg_m3 = 1.1\ndynamic_viscosity_Pa_s = 1.7e-5\n[rotor]\nblade_count = 2\n")
            .Change("cases/clean.toml", "polars = \"../polars/clean\"", "")
            .Change("cases/clean.toml", "[wind]", "[air]\ndensity_kg_m3 = 1.2\n[wind]");

        var only = study.OnlyCase();

        Assert.Equal((1.2, 1.7e-5), (only.Rotor.Air.Density, only.Rotor.Air.DynamicViscosity));
        Assert.Equal(3, only.Rotor.BladeCount);
        Assert.Equal(["cases/clean.toml", "study.toml", "blades/fell.csv", "polars/clean/root.csv", "polars/clean/tip.csv"], only.Inputs.Select(i => i.File));
    }

    [Fact]
    public void A_value_gives_one_fingerprint_wherever_it_is_written()
    {
        var inCase = new FellStudy().Change("cases/clean.toml", "[wind]", "[air]\ndensity_kg_m3 = 1.1\n[wind]").OnlyCase();
        var inStudy = new FellStudy().With("study.toml", "[air]\ndensity_kg_m3 = 1.10\n").OnlyCase();

        Assert.Equal(inCase.Fingerprint, inStudy.Fingerprint);
    }

    [Fact]
    public void A_wrong_starting_value_fails_the_cases_that_take_it_and_is_told_once()
    {
        var study = new FellStudy()
            .With("study.toml", "[air]\ndensity_kg_m3 = -1\n")
            .With("cases/second.toml", FellStudy.Case)
            .With("cases/own.toml", FellStudy.Case + "[air]\ndensity_kg_m3 = 1.2\n").Read();

        Told.Exactly(["study.toml:2:17: density_kg_m3 is -1; it must be above 0 and at most 100: there would be no air; give it in kg/m3, such as 1.225"], study.Errors);
        Assert.Equal(["clean", "second"], study.Rejected.ToArray());
        Assert.Equal(["own"], study.Cases.Select(c => c.Name));
    }

    [Fact]
    public void Starting_values_that_cannot_be_read_fail_every_case_and_nothing_else_is_called_missing()
    {
        var study = new FellStudy().With("study.toml", "[rotor]\nblade_count = drei\n").Change("cases/clean.toml", "blade_count = 3", "").Read();

        Told.Exactly(["study.toml:2:15: blade_count is 'drei' without quotes; write text in quotes: \"drei\""], study.Errors);
        Assert.Equal(["clean"], study.Rejected.ToArray());
    }

    [Fact]
    public void A_reference_of_the_starting_values_is_relative_to_the_study_folder()
        => Told.Exactly(
            ["study.toml:1:10: no folder 'polars/soild'; polars/ holds clean"],
            new FellStudy().With("study.toml", "polars = \"polars/soild\"\n").Change("cases/clean.toml", "polars = \"../polars/clean\"", "").Read().Errors);

    [Fact]
    public void A_value_of_a_case_takes_the_place_of_a_sweep_in_the_starting_values()
    {
        var study = new FellStudy().With("study.toml", "[sweep]\n\"control.pitch_deg\" = [1, 2]\n\"air.density_kg_m3\" = [1.1]\n");

        Assert.Equal(["clean~density_kg_m3-1.1"], study.SoundCases().Select(c => c.Name));
    }

    [Fact]
    public void A_starting_value_of_another_strategy_is_told_where_it_belongs()
        => Told.Exactly(
            ["study.toml:2:1: 'tip_speed_ratio' does not go with strategy 'fixed-speed', which takes rotor_speed_rpm, pitch_deg; "
                + "write it in the cases that it goes with"],
            new FellStudy().With("study.toml", "[control]\ntip_speed_ratio = 7\n").Read().Errors);

    [Fact]
    public void The_baseline_is_a_case_by_name()
        => Assert.Equal("clean", new FellStudy().With("study.toml", "baseline = \"clean\"\n").Read().Baseline);

    [Theory]
    [InlineData("baseline = \"claen\"", "study.toml:1:12: baseline 'claen' names no case; did you mean 'clean'?")]
    [InlineData("baseline = \"soiled\"", "study.toml:1:12: baseline 'soiled' names no case; cases are clean, swept~pitch_deg-1, swept~pitch_deg-2")]
    [InlineData("baseline = \"swept\"", "study.toml:1:12: baseline 'swept' is a sweep; name one of its variants, such as 'swept~pitch_deg-1'")]
    [InlineData("baseline = 3", "study.toml:1:12: baseline is 3; give the name of a case in quotes")]
    public void A_baseline_that_names_no_case_is_told_and_the_cases_run(string line, string expected)
    {
        var study = new FellStudy().With("study.toml", line + "\n")
            .With("cases/swept.toml", FellStudy.Case + "[sweep]\n\"control.pitch_deg\" = [1, 2]\n").Read();

        Told.Exactly([expected], study.Errors);
        Assert.Null(study.Baseline);
        Assert.Equal(3, study.Cases.Length);
    }

    [Theory]
    [InlineData("baselin = 3", "study.toml:1:1: unknown key 'baselin' at the top of the file; did you mean 'baseline'?")]
    [InlineData("colour = 3", "study.toml:1:1: unknown key 'colour' at the top of the file; known are title, blade, polars, baseline")]
    public void A_key_that_study_toml_does_not_know_is_told_with_those_that_it_knows(string line, string expected)
        => Told.Exactly([expected], new FellStudy().With("study.toml", line + "\n").Read().Errors);

    [Fact]
    public void A_variant_may_be_the_baseline()
    {
        var study = new FellStudy().With("study.toml", "baseline = \"swept~pitch_deg-1\"\n")
            .With("cases/swept.toml", FellStudy.Case + "[sweep]\n\"control.pitch_deg\" = [1, 2]\n").Read();

        Assert.Equal("swept~pitch_deg-1", study.Baseline);
    }

    [Theory]
    [InlineData("other", "other", "")]
    [InlineData("clean", "clean", "")]
    [InlineData("othre", null, "study.toml:1:12: baseline 'othre' names no case; did you mean 'other'?")]
    public void The_baseline_of_a_case_read_alone_may_be_another_case(string baseline, string? expected, string error)
    {
        var study = new FellStudy().With("study.toml", $"baseline = \"{baseline}\"\n").With("cases/other.toml", FellStudy.Case);

        var read = StudyReader.Read("/studies/fell/cases/clean.toml", study.Files);

        Assert.Equal(expected, read.Baseline);
        Told.Exactly(error.Length == 0 ? [] : [error], read.Errors);
    }
}
