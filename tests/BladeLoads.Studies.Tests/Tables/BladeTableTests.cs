namespace BladeLoads.Studies.Tests.Tables;

public class BladeTableTests
{
    private const string File = "blades/fell.csv";

    [Fact]
    public void A_blade_is_read_into_metres_and_radians()
    {
        var only = new FellStudy().OnlyCase();

        var stations = only.Rotor.Blade.Stations;
        Assert.Equal([new(1, 0.8, 12 * Math.PI / 180, "root"), new(3, 0.6, 5 * Math.PI / 180, "root"), new(5, 0.4, Math.PI / 180, "tip")],
            stations.ToArray());
        Assert.Equal("3 rows from 1 to 5 m, 2 sections", only.Inputs.Single(i => i.File == File).Contents);
    }

    [Fact]
    public void Columns_stand_in_any_order_with_comments_and_spaces_between()
    {
        const string other = "# one\n\n section , twist_deg,chord_m , radius_m\n  # two\nroot,12,0.8,1\n   \nroot, 5.0 ,0.60,3\n\"tip\",1,4e-1,+5.\n# three";

        Assert.Equal(
            new FellStudy().OnlyCase().Rotor.Blade.Stations.ToArray(),
            new FellStudy().With(File, other).OnlyCase().Rotor.Blade.Stations.ToArray());
    }

    [Fact]
    public void Thickness_and_mass_beside_a_section_are_read_and_not_used()
    {
        const string table = "radius_m,chord_m,twist_deg,section,thickness_ratio,mass_kg_per_m\n1,0.8,12,root,0.4,50\n3,0.6,5,root,,40\n5,0.4,1,tip,0.2,30\n";
        var study = new FellStudy().With(File, table).Read();

        Told.Exactly(["blades/fell.csv:1:52: mass_kg_per_m is not used yet; moments are aerodynamic only"],
            study.Doubts.Where(doubt => doubt.File == File));
        Assert.Equal(new FellStudy().OnlyCase().Fingerprint, Assert.Single(study.Cases).Fingerprint);
    }

    [Theory]
    [InlineData("1,0.8,", "1,abc,", "3:3: chord_m is 'abc'; give a number, such as 0.8")]
    [InlineData("1,0.8,", "1,\"0,8\",", "3:3: chord_m is '0,8'; write decimals with a point: 0.8")]
    [InlineData("1,0.8,", "1,0,8,", "3:1: 5 values where the header names 4 columns; give one value a column, and write decimals with a point")]
    [InlineData("1,0.8,12,root", "1,0.8,12", "3:1: 3 values where the header names 4 columns; give one value a column, and write decimals with a point")]
    [InlineData("1,0.8,", "1,\"1,234\",", "3:3: chord_m is '1,234'; write 1234 or 1.234, whichever is meant")]
    [InlineData("1,0.8,", "1,\"500,000\",", "3:3: chord_m is '500,000'; write it without separators: 500000")]
    [InlineData("1,0.8,", "1,\"0,800\",", "3:3: chord_m is '0,800'; write decimals with a point: 0.800")]
    [InlineData("1,0.8,", "1,\"-,8\",", "3:3: chord_m is '-,8'; write decimals with a point: -0.8")]
    [InlineData("1,0.8,", "1,\"1,000,000.5\",", "3:3: chord_m is '1,000,000.5'; write it without separators: 1000000.5")]
    [InlineData("1,0.8,", "1,,", "3:3: chord_m is empty; give a number")]
    [InlineData("1,0.8,", "1,nan,", "3:3: chord_m is 'nan'; give a finite number")]
    [InlineData("1,0.8,", "1,Infinity,", "3:3: chord_m is 'Infinity'; give a finite number")]
    [InlineData("1,0.8,", "1,-inf,", "3:3: chord_m is '-inf'; give a finite number")]
    [InlineData("1,0.8,", "1,1e999,", "3:3: chord_m is '1e999', beyond all numbers that can be kept; give a smaller one")]
    [InlineData("1,0.8,", "1,0x10,", "3:3: chord_m is '0x10'; give a number, such as 0.8")]
    [InlineData("1,0.8,", "1,0.8 m,", "3:3: chord_m is '0.8 m'; give a number, such as 0.8")]
    [InlineData("1,0.8,", "1,0.8\u001b[2J,", "3:3: chord_m is '0.8\\u001B[2J'; give a number, such as 0.8")]
    [InlineData("1,0.8,", "1,-0.8,", "3:3: chord_m is -0.8; it must be above 0")]
    [InlineData("1,0.8,", "0,0.8,", "3:1: radius_m is 0; it must be above 0")]
    [InlineData("1,0.8,12", "1,0.8,  200", "3:9: twist_deg is 200; give an angle from -180 to 180")]
    [InlineData("1,0.8,12,", "1,0.8,\u221290,", "3:7: twist_deg is '\u221290', with a minus sign (U+2212); write -90")]
    [InlineData("1,0.8,12,", "1,0.8,\u201390,", "3:7: twist_deg is '\u201390', with a dash (U+2013); write -90")]
    [InlineData("1,0.8,12,", "1,0.8,12\u00b0,", "3:7: twist_deg is '12\u00b0', with a degree sign (U+00B0); write 12")]
    [InlineData("1,0.8,12,", "1,0.8,\u221290 \u00b0,", "3:7: twist_deg is '\u221290 \u00b0', with a minus sign (U+2212) and a degree sign (U+00B0); write -90")]
    [InlineData("5,0.4,1,tip", "5000,0.4,1,tip", "5:1: radius_m is 5000; it must be at most 1000, in metres")]
    [InlineData("3,0.6,5,root", "6,0.6,5,root", "5:1: radius_m falls from 6 to 5 (row 4 to 5); radii must rise from root to tip")]
    [InlineData("3,0.6,5,root", "1,0.6,5,root", "4:1: radius_m is 1 again (row 3 to 4); radii must rise from root to tip")]
    [InlineData("3,0.6,5,root\n5,0.4,1,tip\n", "", ": has one row; a blade needs two or more, root first")]
    [InlineData("1,0.8,12,root\n3,0.6,5,root\n5,0.4,1,tip\n", "", ": has no row; a blade needs two or more, root first")]
    [InlineData("12,root", "12,", "3:10: section is empty; name a section")]
    [InlineData("12,root", "12,../root", "3:10: section '../root' begins with a dot; a section's name is also that of its polar file")]
    [InlineData("12,root", "12,a/root", "3:10: section 'a/root' holds '/'; a section's name is also that of its polar file")]
    [InlineData("12,root", "12,rot", "3:10: no table for section 'rot' in polars/clean/; it holds root, tip")]
    [InlineData("chord_m", "chord_mm", "2:10: unknown column 'chord_mm'; did you mean 'chord_m'?")]
    [InlineData("chord_m", "Chord_m", "2:10: unknown column 'Chord_m'; did you mean 'chord_m'?")]
    [InlineData("chord_m", "radius_m", "2:10: column 'radius_m' is there twice; keep one")]
    [InlineData("chord_m", "colour", "2:10: unknown column 'colour'; the columns are radius_m, chord_m, twist_deg, section, thickness_ratio, mass_kg_per_m")]
    [InlineData("chord_m", "", "2:10: a column has no name; the columns are radius_m, chord_m, twist_deg, section, thickness_ratio, mass_kg_per_m")]
    [InlineData(",twist_deg,section", ",section", "2:1: no column 'twist_deg'; the table has radius_m, chord_m, section")]
    [InlineData("twist_deg,section", "twist_deg", "2:1: no column 'section'; name the section of each row, or give its thickness_ratio")]
    [InlineData("radius_m,chord_m,twist_deg,section", "radius_m;chord_m;twist_deg;section", "2:1: columns are separated by ';'; separate them by ','")]
    [InlineData("radius_m,chord_m,twist_deg,section", "radius_m chord_m  twist_deg section", "2:1: columns are separated by spaces; separate them by ','")]
    [InlineData("radius_m,chord_m,twist_deg,section", "radius_m\tchord_m", "2:1: columns are separated by tabs; separate them by ','")]
    public void A_wrong_blade_table_is_told_by_row_and_column(string text, string by, string expected)
    {
        var study = new FellStudy().Change(File, text, by).Read();

        Told.Exactly([expected[0] == ':' ? File + expected : $"{File}:{expected}"], study.Errors);
        Assert.Equal(["clean"], study.Rejected.ToArray());
    }

    [Theory]
    [InlineData("1,0.8,0.21,root\n2,0.6,0.1,root\n3,0.5,0.05,root\n5,0.4,-0.015,tip\n",
        "blades/fell.csv:2:7: twist_deg runs from -0.015 to 0.21 only; these look like radians, angles are in degrees")]
    [InlineData("1,800,12,root\n3,600,5,root\n5,400,1,tip\n",
        "blades/fell.csv:2:3: chord_m is 800, more than half the tip radius of 5 m; radius and chord are both in metres")]
    [InlineData("1,0.8,0.21,root\n3,0.5,0.05,root\n5,0.4,-0.01,tip\n", null)]
    [InlineData("1,0.8,0.2,root\n2,0.6,0.2,root\n3,0.5,0.2,root\n5,0.4,0.2,tip\n", null)]
    [InlineData("1,2.5,0.6,root\n2,0.6,0.2,root\n3,0.5,0.2,root\n5,0.4,0.2,tip\n", null)]
    public void A_blade_that_seems_to_be_in_other_units_is_a_doubt_and_the_case_runs(string rows, string? expected)
    {
        var study = new FellStudy().With(File, "radius_m,chord_m,twist_deg,section\n" + rows).With("polars/clean/tip.csv", FellStudy.RootPolar).Read();

        Told.Exactly(expected is null ? [] : [expected], study.Doubts);
        Told.Exactly([], study.Errors);
        Assert.Equal(["clean"], study.Cases.Select(c => c.Name));
    }

    [Fact]
    public void Errors_of_one_kind_in_a_column_are_told_thrice_and_then_counted()
    {
        var rows = string.Concat(Enumerable.Range(1, 20).Select(i => $"{i},{(i <= 10 ? "x" : "0.8")},{(i == 5 ? "400" : "1")},{(i > 15 ? "tip,9" : "tip")}\n"));

        Told.Exactly(
            [
                "blades/fell.csv:2:3: chord_m is 'x'; give a number, such as 0.8",
                "blades/fell.csv:3:3: chord_m is 'x'; give a number, such as 0.8",
                "blades/fell.csv:4:3: chord_m is 'x'; give a number, such as 0.8",
                "blades/fell.csv:5:3: and 7 more like it in column chord_m",
                "blades/fell.csv:6:5: twist_deg is 400; give an angle from -180 to 180",
                "blades/fell.csv:17:1: 5 values where the header names 4 columns; give one value a column, and write decimals with a point",
                "blades/fell.csv:18:1: 5 values where the header names 4 columns; give one value a column, and write decimals with a point",
                "blades/fell.csv:19:1: 5 values where the header names 4 columns; give one value a column, and write decimals with a point",
                "blades/fell.csv:20:1: and 2 more like it",
            ],
            new FellStudy().With(File, "radius_m,chord_m,twist_deg,section\n" + rows).Read().Errors);
    }

    [Fact]
    public void A_blade_with_a_wrong_header_still_names_the_polar_tables_that_are_looked_at()
        => Told.Exactly(
            [
                "blades/fell.csv:2:10: unknown column 'chord'; did you mean 'chord_m'?",
                "polars/clean/tip.csv:4:8: cd is -1; drag coefficients must be >= 0",
            ],
            new FellStudy().Change(File, "chord_m", "chord").Change("polars/clean/tip.csv", "10,1.1,0.015", "10,1.1,-1")
                .With("polars/clean/other.csv", "rubbish").Read().Errors);

    [Theory]
    [InlineData("radius_m;chord_m;twist_deg;section\n", "blades/fell.csv:1:1: columns are separated by ';'; separate them by ','")]
    [InlineData("", "blades/fell.csv: is empty")]
    [InlineData(null, "cases/clean.toml:2:10: no file '../blades/fell.csv'; blades/ holds no file")]
    public void Where_a_blade_names_nothing_every_polar_table_of_the_set_is_looked_at(string? blade, string expected)
    {
        var study = new FellStudy().Change("polars/clean/tip.csv", "10,1.1,0.015", "10,1.1,-1")
            .With("polars/clean/other.csv", "alpha,cl,cd\n").With("polars/clean/notes.txt", "notes");
        if (blade is null)
            study.Files.Remove($"{FellStudy.Folder}/{File}");
        else
            study.With(File, blade);

        var read = study.Read();

        Told.Exactly(
            [
                expected,
                "polars/clean/other.csv:1:1: unknown column 'alpha'; did you mean 'alpha_deg'?",
                "polars/clean/tip.csv:4:8: cd is -1; drag coefficients must be >= 0",
            ],
            read.Errors);
        Told.Exactly([], read.Doubts);
    }

    [Fact]
    public void A_comment_is_no_header()
        => Told.Exactly(["blades/fell.csv: has no row of column names; begin with radius_m, chord_m, twist_deg"],
            new FellStudy().With(File, "# nothing\n").Read().Errors);

    [Fact]
    public void Thickness_and_mass_are_checked_where_they_are_given()
    {
        const string table = "radius_m,chord_m,twist_deg,section,thickness_ratio,mass_kg_per_m\n1,0.8,12,root,40,50\n3,0.6,5,root,x,-40\n5,0.4,1,tip,0.2,30\n";

        Told.Exactly(
            [
                "blades/fell.csv:2:15: thickness_ratio is 40; it is thickness over chord, above 0 to 1: 0.4",
                "blades/fell.csv:3:14: thickness_ratio is 'x'; give a number, such as 0.8",
                "blades/fell.csv:3:16: mass_kg_per_m is -40; it must be 0 or more",
            ],
            new FellStudy().With(File, table).Read().Errors);
    }
}
