using System.Globalization;

namespace BladeLoads.Studies.Tests.Cases;

public class SweepTests
{
    [Fact]
    public void Every_combination_becomes_a_variant_named_by_its_values()
    {
        var cases = Sound("\"air.density_kg_m3\" = [1.225, 1.05]\n\"polars\" = [\"../polars/clean\", \"../polars/soiled\"]\n");

        Assert.Equal(
            [
                "clean~density_kg_m3-1.05~polars-clean", "clean~density_kg_m3-1.05~polars-soiled",
                "clean~density_kg_m3-1.225~polars-clean", "clean~density_kg_m3-1.225~polars-soiled",
            ],
            cases.Select(c => c.Name));
        Assert.Equal(1.05, cases[0].Rotor.Air.Density);
        Assert.Equal("Clean blades (density_kg_m3 1.05, polars clean)", cases[0].Title);
        Assert.All(cases, c => Assert.Equal("cases/clean.toml", c.File));
        Assert.Equal(4, cases.Select(c => c.Fingerprint).Distinct().Count());
    }

    [Theory]
    [InlineData("air.dynamic_viscosity_Pa_s = [1.8e-5, 0.00002]", "clean~dynamic_viscosity_Pa_s-1.8e-05", "clean~dynamic_viscosity_Pa_s-2e-05")]
    [InlineData("model.balance_with = [\"lift and drag\", \"lift\"]", "clean~balance_with-lift", "clean~balance_with-lift-and-drag")]
    [InlineData("\"blade\" = [\"../blades/fell.csv\"]", "clean~blade-fell")]
    [InlineData("control.pitch_deg = [-1.50, 0.0, 1]", "clean~pitch_deg--1.5", "clean~pitch_deg-0", "clean~pitch_deg-1")]
    [InlineData("control.pitch_deg = [1]\nair.density_kg_m3 = [1.2]", "clean~pitch_deg-1~density_kg_m3-1.2")]
    [InlineData("[sweep.model]\nelements = [10, 20]", "clean~elements-10", "clean~elements-20")]
    public void Values_are_written_into_names_that_any_folder_may_have(string sweep, params string[] names)
        => Assert.Equal(names, Sound(sweep + "\n").Select(c => c.Name));

    [Theory]
    [InlineData("\"air.density\" = [1.2]",
        "cases/clean.toml:17:1: unknown key 'air.density' in [sweep]; did you mean 'air.density_kg_m3'?")]
    [InlineData("\"colour\" = [1.2]",
        "cases/clean.toml:17:1: unknown key 'colour' in [sweep]; name table and key, such as \"air.density_kg_m3\"")]
    [InlineData("\"wind.speeds_m_s\" = [1.2]",
        "cases/clean.toml:17:1: 'wind.speeds_m_s' cannot be swept; write a case for each value")]
    [InlineData("\"control.pitch_deg\" = 2",
        "cases/clean.toml:17:23: 'control.pitch_deg' is 2; give the values of a sweep as a list: [2]")]
    [InlineData("\"control.pitch_deg\" = []",
        "cases/clean.toml:17:23: 'control.pitch_deg' has no values; give at least one, or leave the key out")]
    [InlineData("\"control.pitch_deg\" = [1, 2, 1.0]",
        "cases/clean.toml:17:30: pitch_deg has 1 twice; each value once")]
    [InlineData("\"polars\" = [\"../polars/clean\", \"../polars/../polars/clean\"]",
        "cases/clean.toml:17:32: polars has '../polars/clean' and '../polars/../polars/clean', whose variants would both be named 'polars-clean'; rename one")]
    [InlineData("\"polars\" = [\"../polars/clean\", \"../polars/Clean\"]",
        "cases/clean.toml:17:32: polars has '../polars/clean' and '../polars/Clean', whose variants would both be named 'polars-Clean'; rename one")]
    [InlineData("\"control.pitch_deg\" = [1]\ncontrol.pitch_deg = [2]",
        "cases/clean.toml:18:1: 'control.pitch_deg' is swept twice; keep one list")]
    public void A_wrong_sweep_is_told(string sweep, string expected)
    {
        var study = Study(sweep + "\n").Read();

        Told.Exactly([expected], study.Errors);
        Assert.Empty(study.Cases);
    }

    [Fact]
    public void A_wrong_value_is_told_where_it_stands_and_keeps_only_its_variant_from_running()
    {
        var study = Study("\"air.density_kg_m3\" = [1.225, -1.05]\n\"control.pitch_deg\" = [1, \"2\"]\n").Read();

        Told.Exactly(
            [
                "cases/clean.toml:17:31: density_kg_m3 is -1.05; it must be above 0 and at most 100: there would be no air; give it in kg/m3, such as 1.225",
                "cases/clean.toml:18:27: pitch_deg is '2' in quotes, which is text; write the number without quotes: 2",
            ],
            study.Errors);
        Assert.Equal(["clean~density_kg_m3-1.225~pitch_deg-1"], study.Cases.Select(c => c.Name));
        Assert.Equal(
            ["clean~density_kg_m3--1.05~pitch_deg-1", "clean~density_kg_m3--1.05~pitch_deg-2", "clean~density_kg_m3-1.225~pitch_deg-2"],
            study.Rejected.ToArray());
    }

    [Fact]
    public void A_folder_that_is_not_there_is_told_in_the_list_of_the_sweep()
        => Told.Exactly(
            ["cases/clean.toml:17:32: no folder '../polars/soild'; polars/ holds clean, soiled"],
            Study("\"polars\" = [\"../polars/clean\", \"../polars/soild\"]\n").Read().Errors);

    [Fact]
    public void A_limit_that_a_swept_value_breaks_is_told_at_that_value()
    {
        var study = new FellStudy().With("cases/clean.toml", FellStudy.VariableSpeedCase
            .Replace("[control]", "[control]\nmin_rotor_speed_rpm = 10", StringComparison.Ordinal)
            + "[sweep]\n\"control.max_rotor_speed_rpm\" = [12, 9]\n").Read();

        Told.Exactly(
            ["cases/clean.toml:15:38: max_rotor_speed_rpm is 9, below min_rotor_speed_rpm 10 in line 8: "
                + "no rotor speed to turn at would be left; take 9 out of the sweep, or lower min_rotor_speed_rpm"], study.Errors);
        Assert.Equal(["clean~max_rotor_speed_rpm-12"], study.Cases.Select(c => c.Name));
    }

    [Fact]
    public void What_a_swept_value_asks_for_too_early_is_told_at_that_value()
        => Told.Exactly(
            ["cases/clean.toml:17:26: tilt_deg is 5; a tilted rotor is not solved yet; give 0 or leave it out"],
            Study("\"rotor.tilt_deg\" =   [0, 5]\n").Read().Errors);

    [Fact]
    public void More_than_ten_thousand_variants_are_refused()
    {
        var hundred = string.Join(", ", Enumerable.Range(1, 101));

        Told.Exactly(
            ["cases/clean.toml:17:1: [sweep] gives 101 x 101 variants; at most 10,000 are made from one case"],
            Study($"\"control.pitch_deg\" = [{hundred}]\n\"control.rotor_speed_rpm\" = [{hundred}]\n").Read().Errors);
    }

    [Fact]
    public void A_thousand_variants_read_every_table_once()
    {
        var densities = string.Join(", ", Enumerable.Range(1, 1000).Select(i => (i / 1000.0).ToString(CultureInfo.InvariantCulture)));
        var study = Study($"\"air.density_kg_m3\" = [{densities}]\n");

        var cases = study.SoundCases();

        Assert.Equal(1000, cases.Count);
        Assert.Equal(
            ["blades/fell.csv", "cases/clean.toml", "polars/clean/root.csv", "polars/clean/tip.csv"],
            study.Files.Reads.Select(path => path[(FellStudy.Folder.Length + 1)..]).Order(StringComparer.Ordinal));
        Assert.All(cases, c => Assert.Same(cases[0].Rotor.Sections, c.Rotor.Sections));
        Assert.All(cases, c => Assert.Same(cases[0].Rotor.Blade, c.Rotor.Blade));
    }

    [Fact]
    public void A_sweep_of_the_starting_values_runs_over_every_case()
    {
        var study = new FellStudy().With("cases/other.toml", FellStudy.Case).With("study.toml", "[sweep]\n\"air.density_kg_m3\" = [1.1, 1.2]\n");

        Assert.Equal(
            ["clean~density_kg_m3-1.1", "clean~density_kg_m3-1.2", "other~density_kg_m3-1.1", "other~density_kg_m3-1.2"],
            study.SoundCases().Select(c => c.Name));
    }

    private static IReadOnlyList<StudyCase> Sound(string sweep) => Study(sweep).SoundCases();

    // [sweep] is line 16, its first key line 17.
    private static FellStudy Study(string sweep) => new FellStudy()
        .With("cases/clean.toml", FellStudy.Case + "\n" + (sweep[0] == '[' ? sweep : "[sweep]\n" + sweep))
        .With("polars/soiled/root.csv", FellStudy.RootPolar.Replace("0.3", "0.25", StringComparison.Ordinal))
        .With("polars/soiled/tip.csv", FellStudy.TipPolar);
}
