namespace BladeLoads.Studies.Tests.Tables;

/// <summary>Blades that give the thickness of their sections in place of names, and sets that name the thickness of their tables.</summary>
public sealed class ThicknessTests
{
    private const string Header = "radius_m,chord_m,twist_deg,thickness_ratio\n";
    private const string Rows = Header + "1,0.8,12,0.4\n3,0.6,5,0.3\n5,0.4,1,0.2\n";
    private const string Set = "[thickness_ratio]\nroot = 0.4\ntip = 0.2\n";
    private const string NarrowDoubt = "polars/clean/tip.csv:2:1: angles reach from -10 to 10 deg; "
        + "beyond them the end value serves, and each use is marked outside-angles";

    private static FellStudy Study(string blade, string set = Set)
        => new FellStudy().With("blades/fell.csv", blade).With("polars/clean/set.toml", set);

    [Fact]
    public void A_blade_by_thickness_takes_its_sections_from_the_set_that_names_their_thickness()
    {
        var only = Study(Rows).OnlyCase();
        Assert.True(only.Rotor.Blade.IsByThickness);
        Assert.Equal([0.4, 0.3, 0.2], only.Rotor.Blade.Stations.Select(s => s.ThicknessRatio));
        Assert.Equal(["tip", "root"], only.Rotor.Sections.Family!.Members.Select(m => m.Section.Name));
        Assert.Equal(["0.4", "0.2"], new[] { only.Values["thickness_ratio.root"], only.Values["thickness_ratio.tip"] });
        Assert.Contains("polars/clean/set.toml", only.Inputs.Select(i => i.File));
        // Half way between: the mean of the two tables at 0 degrees, the root's at its lower Reynolds number.
        var between = only.Rotor.Sections.Family.At(0.3).Polars[0];
        Assert.Equal((0.3 + 0.2) / 2, between.Lift[between.Angles.IndexOf(0)], 1e-12);
    }

    [Fact]
    public void A_thickness_of_a_table_or_of_a_row_counts_and_a_comment_does_not()
    {
        var before = Study(Rows).OnlyCase().Fingerprint;
        Assert.NotEqual(before, Study(Rows, Set.Replace("0.2", "0.21", StringComparison.Ordinal)).OnlyCase().Fingerprint);
        Assert.NotEqual(before, Study(Rows.Replace("0.3", "0.31", StringComparison.Ordinal)).OnlyCase().Fingerprint);
        Assert.Equal(before, Study(Rows, "# as measured\n[thickness_ratio]\ntip = 0.20\nroot = 0.4\n").OnlyCase().Fingerprint);
    }

    [Fact]
    public void Where_section_and_thickness_are_both_given_the_section_is_used_and_the_difference_raised()
    {
        const string both = "radius_m,chord_m,twist_deg,section,thickness_ratio\n1,0.8,12,root,0.4\n3,0.6,5,root,0.32\n5,0.4,1,tip,0.204\n";
        var study = Study(both).Read();
        Told.Exactly([], study.Errors);
        Told.Exactly(
            ["blades/fell.csv:3:14: thickness_ratio is 0.32, and section 'root' is 0.4 thick by polars/clean/set.toml; the section is used", NarrowDoubt],
            study.Doubts);
        var plain = new FellStudy().OnlyCase();
        Assert.Equal(plain.Fingerprint, Assert.Single(study.Cases).Fingerprint);
    }

    [Fact]
    public void A_row_outside_the_thicknesses_of_the_set_is_raised()
        => Told.Exactly(
            [
                "blades/fell.csv:2:10: thickness_ratio is 0.9, above the thickest table of the set, 'root' with 0.4, which serves alone",
                "blades/fell.csv:4:9: thickness_ratio is 0.15, below the thinnest table of the set, 'tip' with 0.2, which serves alone",
                NarrowDoubt,
            ],
            Study(Header + "1,0.8,12,0.9\n3,0.6,5,0.3\n5,0.4,1,0.15\n").Read().Doubts);

    [Fact]
    public void A_set_that_names_no_thickness_is_told_what_would_do()
        => Told.Exactly(
            ["blades/fell.csv: gives thickness_ratio in place of sections, and polars/clean/ has no set.toml; "
                + "name there the thickness of each table under [thickness_ratio]: tip-18 = 0.18"],
            new FellStudy().With("blades/fell.csv", Rows).Read().Errors);

    [Theory]
    [InlineData("# nothing yet\n", "polars/clean/set.toml: names no thickness; give that of each table under [thickness_ratio]: tip-18 = 0.18")]
    [InlineData("[thickness_ratio]\nroot = 40\ntip = 0.2\n",
        "polars/clean/set.toml:2:8: thickness_ratio of 'root' is 40; it is thickness over chord, above 0 to 1: 0.4")]
    [InlineData("[thickness_ratio]\nroot = 0\ntip = \"0.2\"\n",
        "polars/clean/set.toml:2:8: thickness_ratio of 'root' is 0; it is thickness over chord, above 0 to 1",
        "polars/clean/set.toml:3:7: thickness_ratio of 'tip' is '0.2'; give the thickness over chord as a number, without quotes")]
    [InlineData("[thickness_ratio]\nroot = 0.2\ntip = 0.2\n",
        "polars/clean/set.toml:3:1: 'root' and 'tip' are both 0.2 thick; between tables of one thickness nothing can be interpolated")]
    [InlineData("thickness_ratio = 0.2\n",
        "polars/clean/set.toml:1:19: thickness_ratio is 0.2; write [thickness_ratio] and below it a line a table: tip-18 = 0.18")]
    [InlineData("[thickness]\nroot = 0.4\n",
        "polars/clean/set.toml:1:2: unknown key 'thickness'; a set has [thickness_ratio], with the thickness over chord of each table")]
    [InlineData("[thickness_ratio]\nroot = 0.4\nmiddle = 0.3\ntip = 0.2\n",
        "polars/clean/set.toml:3:1: no table for section 'middle' in polars/clean/; it holds root, tip")]
    public void What_is_wrong_in_a_set_is_told_at_its_place(string set, params string[] expected)
        => Told.Exactly(expected, Study(Rows, set).Read().Errors);

    [Fact]
    public void Tables_without_common_angles_cannot_be_interpolated()
        => Told.Exactly(
            ["polars/clean/set.toml: its tables have hardly an angle in common; "
                + "coefficients can be interpolated in thickness only at angles that all of them reach"],
            Study(Rows).With("polars/clean/root.csv", "alpha_deg,cl,cd\n9,0.1,0.01\n12,0.2,0.01\n20,0.3,0.01\n").Read().Errors);

    [Theory]
    [InlineData("radius_m,chord_m,twist_deg\n1,1,0\n2,1,0\n",
        "blades/fell.csv:1:1: no column 'section'; name the section of each row, or give its thickness_ratio")]
    [InlineData("radius_m,chord_m,twist_deg,section,thickness_ratio\n1,1,0,root,0.4\n2,1,0,,0.3\n3,1,0,tip,\n",
        "blades/fell.csv:3:7: section is empty; name one in every row, or leave the column out and thickness_ratio serves")]
    [InlineData("radius_m,chord_m,twist_deg,thickness_ratio\n1,1,0,0.4\n2,1,0,\n",
        "blades/fell.csv:3:7: thickness_ratio is empty; give a number")]
    [InlineData("radius_m,chord_m,twist_deg,thickness_ratio\n1,1,0,40\n2,1,0,21\n3,1,0,1.2\n",
        "blades/fell.csv:2:7: thickness_ratio is 40; it is thickness over chord, above 0 to 1: 0.4",
        "blades/fell.csv:3:7: thickness_ratio is 21; it is thickness over chord, above 0 to 1: 0.21",
        "blades/fell.csv:4:7: thickness_ratio is 1.2; it is thickness over chord, above 0 to 1")]
    public void A_row_without_a_shape_is_told(string blade, params string[] expected)
        => Told.Exactly(expected, Study(blade).Read().Errors);
}
