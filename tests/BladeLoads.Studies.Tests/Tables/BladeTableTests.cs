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

        Told.Exactly(["blades/fell.csv:1:52: mass_kg_per_m is not used yet; moments are aerodynamic only"], study.Doubts);
        Assert.Equal(new FellStudy().OnlyCase().Fingerprint, Assert.Single(study.Cases).Fingerprint);
    }

    [Theory]
    [InlineData("1,0.8,", "1,abc,", "3:3: chord_m is 'abc'; give a number, such as 0.8")]
    [InlineData("1,0.8,", "1,\"0,8\",", "3:3: chord_m is '0,8'; write decimals with a point: 0.8")]
    [InlineData("1,0.8,", "1,0,8,", "3:1: 5 values where the header names 4 columns; give one value a column, and write decimals with a point")]
    [InlineData("1,0.8,12,root", "1,0.8,12", "3:1: 3 values where the header names 4 columns; give one value a column, and write decimals with a point")]
    [InlineData("1,0.8,", "1,\"1,234\",", "3:3: chord_m is '1,234'; write decimals with a point, thousands without a separator: 1.234 or 1234")]
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
    [InlineData("twist_deg,section", "twist_deg", "2:1: no column 'section'; name the section of each row")]
    [InlineData("radius_m,chord_m,twist_deg,section", "radius_m;chord_m;twist_deg;section", "2:1: columns are separated by ';'; separate them by ','")]
    [InlineData("radius_m,chord_m,twist_deg,section", "radius_m\tchord_m", "2:1: columns are separated by tabs; separate them by ','")]
    public void A_wrong_blade_table_is_told_by_row_and_column(string text, string by, string expected)
    {
        var study = new FellStudy().Change(File, text, by).Read();

        Told.Exactly([expected[0] == ':' ? File + expected : $"{File}:{expected}"], study.Errors);
        Assert.Equal(["clean"], study.Rejected.ToArray());
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
                "blades/fell.csv:2:15: thickness_ratio is 40; it is thickness over chord, above 0 to 1",
                "blades/fell.csv:3:14: thickness_ratio is 'x'; give a number, such as 0.8",
                "blades/fell.csv:3:16: mass_kg_per_m is -40; it must be 0 or more",
            ],
            new FellStudy().With(File, table).Read().Errors);
    }
}
