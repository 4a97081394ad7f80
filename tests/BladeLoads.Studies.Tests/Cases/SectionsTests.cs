using BladeLoads.Rotor.Sections;

namespace BladeLoads.Studies.Tests.Cases;

/// <summary>[sections]: what is done to the tables of a case before they serve.</summary>
public class SectionsTests
{
    private const string Clean = "cases/clean.toml";
    private const string Tip = "polars/clean/tip.csv";

    // Stalls at 12 degrees, and at -10.
    private const string StallingTip = """
        alpha_deg,cl,cd
        -14,-0.5,0.1
        -10,-0.8,0.02
        0,0.2,0.01
        12,1.2,0.02
        16,0.9,0.1

        """;

    [Fact]
    public void A_case_that_asks_for_nothing_takes_tables_as_they_are()
    {
        var only = Study("").OnlyCase();

        Assert.Equal(Augmentation.None, only.Rotor.Augmentation);
        Assert.Equal(5, only.Rotor.Sections["tip"].Polars[0].Angles.Length);
        Assert.DoesNotContain(only.Values, value => value.Key.StartsWith("sections.", StringComparison.Ordinal));
    }

    [Fact]
    public void Extended_tables_go_round_and_joined_at_their_end_keep_every_row()
    {
        var only = Study("extend = \"viterna-1982\"").OnlyCase();

        // By hand: 4 m of blade, chords 0.8, 0.6 and 0.4 m every 2 m: 2.4 m2, so 16/2.4.
        Assert.Equal(16 / 2.4, double.Parse(only.Values["sections.aspect_ratio"], System.Globalization.CultureInfo.InvariantCulture), 1e-9);
        Assert.Equal(("viterna-1982", "end"), (only.Values["sections.extend"], only.Values["sections.join"]));
        var polar = only.Rotor.Sections["tip"].Polars[0];
        var expected = PolarExtension.Extend(Plain().Polars[0], 16 / 2.4, ExtensionJoin.End).Polar;
        Assert.Equal((-Math.PI, Math.PI), (polar.Angles[0], polar.Angles[^1]));
        Assert.Equal(expected.Angles.ToArray(), polar.Angles.ToArray());
        Assert.Equal(expected.Lift.ToArray(), polar.Lift.ToArray());
        Assert.Equal(expected.Drag.ToArray(), polar.Drag.ToArray());
        Assert.Contains(double.DegreesToRadians(16), polar.Angles);
        // A table that goes round already.
        Assert.Equal(3, only.Rotor.Sections["root"].Polars[0].Angles.Length);
    }

    [Fact]
    public void Aspect_ratio_and_join_are_the_cases_where_it_states_them()
    {
        var only = Study("extend = \"viterna-1982\"\naspect_ratio = 12.0\njoin = \"stall\"").OnlyCase();

        Assert.Equal(("12", "stall"), (only.Values["sections.aspect_ratio"], only.Values["sections.join"]));
        var polar = only.Rotor.Sections["tip"].Polars[0];
        Assert.DoesNotContain(double.DegreesToRadians(16), polar.Angles);
        Assert.Equal(1.11 + (0.018 * 12), polar.Drag.Max(), 1e-12);
    }

    [Theory]
    [InlineData("snel-1993", Augmentation.Snel1993)]
    [InlineData("du-selig-1998", Augmentation.DuSelig1998)]
    [InlineData("none", Augmentation.None)]
    public void A_case_is_augmented_as_it_asks(string method, Augmentation expected)
        => Assert.Equal(expected, Study($"augment = \"{method}\"").OnlyCase().Rotor.Augmentation);

    [Fact]
    public void A_sweep_may_run_over_none_and_both_methods()
    {
        var cases = Study("extend = \"viterna-1982\"\n[sweep]\n\"sections.augment\" = [\"none\", \"snel-1993\", \"du-selig-1998\"]").SoundCases();

        Assert.Equal(["clean~augment-du-selig-1998", "clean~augment-none", "clean~augment-snel-1993"], cases.Select(c => c.Name));
        Assert.Equal([Augmentation.DuSelig1998, Augmentation.None, Augmentation.Snel1993], cases.Select(c => c.Rotor.Augmentation));
        Assert.Equal(3, cases.Select(c => c.Fingerprint).Distinct().Count());
        Assert.Equal(Study("extend = \"viterna-1982\"").OnlyCase().Fingerprint, cases[1].Fingerprint);
    }

    [Fact]
    public void A_sweep_may_run_over_tables_extended_and_not()
    {
        var study = Study("aspect_ratio = 9\n[sweep]\n\"sections.extend\" = [\"none\", \"viterna-1982\"]").Read();

        Told.Exactly([], study.Errors);
        Assert.Equal([double.DegreesToRadians(16), Math.PI], study.Cases.Select(c => c.Rotor.Sections["tip"].Polars[0].Angles[^1]));
        Told.Exactly(
            ["polars/clean/tip.csv:2:1: angles reach from -14 to 16 deg; beyond them the end value serves, and each use is marked outside-angles"],
            study.Doubts);
    }

    [Fact]
    public void A_blade_by_thickness_is_extended_table_by_table_before_it_is_interpolated()
    {
        var only = Study("extend = \"viterna-1982\"\naugment = \"snel-1993\"")
            .With("blades/fell.csv", "radius_m,chord_m,twist_deg,thickness_ratio\n1,0.8,12,0.4\n3,0.6,5,0.3\n5,0.4,1,0.2\n")
            .With("polars/clean/set.toml", "[thickness_ratio]\nroot = 0.4\ntip = 0.2\n").OnlyCase();

        Assert.Equal(Augmentation.Snel1993, only.Rotor.Augmentation);
        var tip = PolarExtension.Extend(Plain().Polars[0], 16 / 2.4, ExtensionJoin.End).Polar;
        var family = only.Rotor.Sections.Family!;
        Assert.Equal(tip.Lift.ToArray(), family.Members[0].Section.Polars[0].Lift.ToArray());
        var between = family.At(0.3).Polars[0];
        Assert.Equal((-Math.PI, Math.PI), (between.Angles[0], between.Angles[^1]));
        // The mean of the tip's plate across the wind and the root's cubic there: half way from 0.01, flat, to 0.02, rising 0.02 in a half turn.
        var across = between.Angles.IndexOf(Math.PI / 2);
        Assert.Equal((1.11 + (0.018 * 16 / 2.4) + 0.015 - (0.02 / 8)) / 2, between.Drag[across], 1e-9);
    }

    [Theory]
    [InlineData("extend = \"viterna\"", "1:10: extend is 'viterna'; write \"viterna-1982\" or \"none\"")]
    [InlineData("extend = true", "1:10: extend is true; give text in quotes, such as \"viterna-1982\"")]
    [InlineData("augment = \"snel\"", "1:11: augment is 'snel'; write \"snel-1993\", \"du-selig-1998\" or \"none\"")]
    [InlineData("extend = \"viterna-1982\"\naspect_ratio = 0", "2:16: aspect_ratio is 0; it must be above 0")]
    [InlineData("extend = \"viterna-1982\"\njoin = \"peak\"", "2:8: join is 'peak'; write \"stall\" or \"end\"")]
    [InlineData("extent = \"viterna-1982\"", "1:1: unknown key 'extent' in [sections]; did you mean 'extend'?")]
    public void A_wrong_value_is_told_at_its_place(string keys, string expected)
    {
        var lines = FellStudy.Case.Split('\n').Length;
        var parts = expected.Split(':', 2);
        Told.Exactly([$"cases/clean.toml:{lines + int.Parse(parts[0], System.Globalization.CultureInfo.InvariantCulture)}:{parts[1]}"], Study(keys).Read().Errors);
    }

    [Fact]
    public void A_table_that_cannot_be_extended_keeps_the_case_from_running_and_no_other()
    {
        var study = Study("extend = \"viterna-1982\"")
            .With(Tip, "# lowered\nalpha_deg,cl,cd\n-14,-0.5,0.1\n-10,-0.8,0.02\n0,0.2,0.01\n")
            .With("cases/plain.toml", FellStudy.Case).Read();

        Told.Exactly(
            ["cases/clean.toml:16:10: extend is 'viterna-1982', but the rows from polars/clean/tip.csv:3 on have no angle between 0 and 90 deg "
                + "to extend from; add rows up to stall, or leave extend out"],
            study.Errors);
        Assert.Equal(["plain"], study.Cases.Select(c => c.Name));
        Assert.Equal("clean", Assert.Single(study.Rejected));
    }

    [Fact]
    public void A_table_that_ends_before_stall_is_extended_and_doubted()
    {
        var study = Study("extend = \"viterna-1982\"").With(Tip, FellStudy.TipPolar).Read();

        Told.Exactly([], study.Errors);
        Told.Exactly(
            ["polars/clean/tip.csv:2:1: shows no stall up to the last angle, 10 deg; extended from there, the section stalls at that angle"], study.Doubts);
    }

    [Theory]
    [InlineData("# augmented: snel-1993, c/r 0.2", "snel-1993, c/r 0.2")]
    [InlineData("  #  Augmented : by hand", "by hand")]
    public void A_table_that_says_it_is_augmented_is_not_augmented_again(string comment, string quoted)
    {
        var study = Study("augment = \"du-selig-1998\"").With(Tip, $"# invented\n\n{comment}\n{StallingTip}")
            .With("cases/plain.toml", FellStudy.Case).Read();

        Told.Exactly(
            ["cases/clean.toml:16:11: augment is 'du-selig-1998', but polars/clean/tip.csv:3 says that its table is augmented already: "
                + $"'{quoted}'; leave augment out, or give the table as it was before"],
            study.Errors);
        Assert.Equal(["plain"], study.Cases.Select(c => c.Name));
    }

    [Theory]
    [InlineData("# augmentation: none")]
    [InlineData("# not augmented: this is the tunnel's")]
    public void Another_comment_says_nothing_of_augmentation(string comment)
        => Assert.Equal(Augmentation.Snel1993, Study("augment = \"snel-1993\"").With(Tip, $"{comment}\n{StallingTip}").OnlyCase().Rotor.Augmentation);

    [Fact]
    public void A_comment_among_the_rows_says_nothing_of_augmentation()
        => Assert.Equal(Augmentation.Snel1993, Study("augment = \"snel-1993\"").With(Tip, StallingTip + "# augmented: snel-1993\n").OnlyCase().Rotor.Augmentation);

    [Fact]
    public void A_section_that_cannot_be_augmented_though_it_lifts_is_doubted()
    {
        var study = Study("augment = \"snel-1993\"\nextend = \"viterna-1982\"").Read();

        Told.Exactly([], study.Errors);
        // The root of this study lifts most at 0 degrees.
        Told.Exactly(["polars/clean/root.csv:2:1: lift does not rise through 0 within 20 deg of 0; augment leaves these rows as they are"], study.Doubts);
    }

    [Fact]
    public void What_goes_with_extend_alone_is_doubted_without_it()
    {
        var study = Study("aspect_ratio = 12\njoin = \"stall\"").With(Tip, FellStudy.RootPolar).Read();

        Told.Exactly([], study.Errors);
        Told.Exactly(
            [
                "cases/clean.toml:16:16: aspect_ratio is 12, but nothing is extended; give extend = \"viterna-1982\", or leave it out",
                "cases/clean.toml:17:8: join is 'stall', but nothing is extended; give extend = \"viterna-1982\", or leave it out",
            ],
            study.Doubts);
    }

    [Fact]
    public void A_case_takes_back_what_it_starts_from()
    {
        var study = Study("extend = \"none\"\naugment = \"none\"")
            .With("study.toml", "[sections]\nextend = \"viterna-1982\"\naugment = \"snel-1993\"\naspect_ratio = 10\n")
            .With("cases/other.toml", FellStudy.Case).SoundCases();

        Assert.Equal([Augmentation.None, Augmentation.Snel1993], study.Select(c => c.Rotor.Augmentation));
        Assert.Equal(Study("").OnlyCase().Fingerprint, study[0].Fingerprint);
        Assert.Equal("10", study[1].Values["sections.aspect_ratio"]);
    }

    private static Section Plain() => Study("").OnlyCase().Rotor.Sections["tip"];

    // The keys stand from the line after the case's last.
    private static FellStudy Study(string keys) => new FellStudy().With(Clean, $"{FellStudy.Case}[sections]\n{keys}\n").With(Tip, StallingTip);
}
