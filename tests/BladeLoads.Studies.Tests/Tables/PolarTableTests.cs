using System.Globalization;

namespace BladeLoads.Studies.Tests.Tables;

public class PolarTableTests
{
    private const string Root = "polars/clean/root.csv";
    private const string Tip = "polars/clean/tip.csv";

    [Fact]
    public void A_polar_is_read_for_each_reynolds_number()
    {
        var only = new FellStudy().OnlyCase();

        var root = only.Rotor.Sections["root"];
        Assert.Equal([1e6, 3e6], root.Polars.Select(p => p.Reynolds));
        Assert.Equal([-Math.PI, 0, Math.PI], root.Polars[0].Angles.ToArray());
        Assert.Equal([0, 0.4, 0], root.Polars[1].Lift.ToArray());
        Assert.Equal([0.02, 0.009, 0.02], root.Polars[1].Drag.ToArray());
        Assert.Equal("2 Reynolds numbers from 1e6 to 3e6, 6 rows, -180 to 180 deg", only.Inputs.Single(i => i.File == Root).Contents);
    }

    [Fact]
    public void A_table_without_reynolds_numbers_leaves_them_open()
    {
        var only = new FellStudy().OnlyCase();

        Assert.Equal(double.NaN, Assert.Single(only.Rotor.Sections["tip"].Polars).Reynolds);
        Assert.Equal("no Reynolds number, 3 rows, -10 to 10 deg", only.Inputs.Single(i => i.File == Tip).Contents);
    }

    [Fact]
    public void One_reynolds_number_is_told_as_one()
    {
        var only = new FellStudy().With(Tip, "reynolds,alpha_deg,cl,cd\n1500000,-10,0,0.1\n1.5e6,0,0,0.1\n1500000.0,10,0,0.1\n").OnlyCase();

        Assert.Equal("Reynolds number 1.5e6, 3 rows, -10 to 10 deg", only.Inputs.Single(i => i.File == Tip).Contents);
    }

    [Fact]
    public void An_angle_a_hair_beyond_180_degrees_is_180_degrees()
    {
        var only = new FellStudy().Change(Root, "1e6,180,", "1e6,180.0000000005,").OnlyCase();

        Assert.Equal(Math.PI, only.Rotor.Sections["root"].Polars[0].Angles[^1]);
    }

    [Theory]
    [InlineData(Tip, "10,1.1,0.015", "10,1.1,-0.01", "4:8: cd is -0.01; drag coefficients must be >= 0")]
    [InlineData(Tip, "10,1.1,0.015", "10,110,0.015", "4:4: cl is 110, and no section has a coefficient beyond 20; a decimal sign, a unit or a column is wrong")]
    [InlineData(Tip, "10,1.1,0.015", "10,1.1,1e300", "4:8: cd is 1e300, and no section has a coefficient beyond 20; a decimal sign, a unit or a column is wrong")]
    [InlineData(Tip, "10,1.1,0.015", "10,1.1,-1e-300", "4:8: cd is -1e-300; drag coefficients must be >= 0")]
    [InlineData(Tip, "10,1.1,0.015", "10,x,0.015", "4:4: cl is 'x'; give a number, such as 0.8")]
    [InlineData(Tip, "10,1.1,0.015,-0.05", "10,1.1,0.015,", "4:14: cm is empty; give a number")]
    [InlineData(Tip, "10,1.1,0.015", "0.0,1.1,0.015", "4:1: alpha_deg is 0 again (row 3 to 4); angles must rise within one Reynolds number")]
    [InlineData(Tip, "10,1.1,0.015", "-2,1.1,0.015", "4:1: alpha_deg falls from 0 to -2 (row 3 to 4); angles must rise within one Reynolds number")]
    [InlineData(Tip, "10,1.1,0.015", "181,1.1,0.015", "4:1: alpha_deg is 181; give an angle from -180 to 180")]
    [InlineData(Tip, "10,1.1,0.015", "180.000000002,1.1,0.015", "4:1: alpha_deg is 180.000000002; give an angle from -180 to 180")]
    [InlineData(Tip, "10,1.1,0.015", "nan,1.1,0.015", "4:1: alpha_deg is 'nan'; give a finite number")]
    [InlineData(Tip, "10,1.1,0.015,-0.05\n", "", "2:1: the table has two rows; a polar needs three or more")]
    [InlineData(Tip, "-10,-0.8,0.02,0\n0,0.2,0.01,-0.05\n", "", "2:1: the table has one row; a polar needs three or more")]
    [InlineData(Tip, "-10,-0.8,0.02,0\n0,0.2,0.01,-0.05\n10,1.1,0.015,-0.05\n", "", ": has no row; a polar needs three or more")]
    [InlineData(Tip, "alpha_deg", "alpha", "1:1: unknown column 'alpha'; did you mean 'alpha_deg'?")]
    [InlineData(Tip, "alpha_deg", "alpha_rad", "1:1: unknown column 'alpha_rad'; did you mean 'alpha_deg'?")]
    [InlineData(Tip, "cm", "ct", "1:17: unknown column 'ct'; did you mean 'cl'?")]
    [InlineData(Root, "3e6,180,0.0,0.02\n", "", "5:1: Reynolds number 3e6 has two rows; a polar needs three or more")]
    [InlineData(Root, "3e6,-180,0.0,0.02\n3e6,0,0.4,0.009\n3e6,180,0.0,0.02", "1e5,-180,0,0\n1e5,0,0,0\n1e5,180,0,0",
        "5:1: reynolds falls from 1000000 to 100000 (row 4 to 5); Reynolds numbers must rise")]
    [InlineData(Root, "3e6,180,0.0,0.02\n", "3e6,180,0.0,0.02\n1e6,-20,0,0\n1e6,0,0,0\n1e6,20,0,0\n",
        "8:1: reynolds returns to 1e6; keep the rows of one Reynolds number together")]
    [InlineData(Root, "1e6,-180,0.0,0.02\n1e6,0,0.3,0.01\n1e6,180,0.0,0.02", "1,-180,0,0\n1,0,0,0\n1,180,0,0",
        "2:1: reynolds is 1; Reynolds numbers of blades are 1e4 and more, three million is 3e6")]
    public void A_wrong_polar_table_is_told_by_row_and_column(string file, string text, string by, string expected)
    {
        var study = new FellStudy().Change(file, text, by).Read();

        Told.Exactly([expected[0] == ':' ? file + expected : $"{file}:{expected}"], study.Errors);
        Assert.Equal(["clean"], study.Rejected.ToArray());
    }

    [Fact]
    public void Angles_that_look_like_radians_are_refused()
        => Told.Exactly(
            ["polars/clean/tip.csv:2:1: alpha_deg runs from -3.14159 to 3.14159 only; these look like radians, angles are in degrees"],
            new FellStudy().With(Tip, "alpha_deg,cl,cd\n-3.14159,0,0\n0,0,0\n3.14159,0,0\n").Read().Errors);

    [Fact]
    public void Lift_that_does_not_close_round_the_circle_is_a_doubt_and_the_case_runs()
    {
        var study = new FellStudy().Change(Root, "1e6,180,0.0,", "1e6,180,0.06,").Read();

        Told.Exactly(
            ["polars/clean/root.csv:4:9: cl is 0.06 at 180 deg and 0 at -180 deg; these are one angle and should have one lift"],
            study.Doubts.Where(doubt => doubt.File == Root));
        Told.Exactly([], study.Errors);
        Assert.Equal(["clean"], study.Cases.Select(c => c.Name));
    }

    [Theory]
    [InlineData(FellStudy.TipPolar,
        "polars/clean/tip.csv:2:1: angles reach from -10 to 10 deg; beyond them the end value serves, and each use is marked outside-angles")]
    [InlineData("alpha_deg,cl,cd\n-180,0,0\n0,0,0\n179,0,0\n",
        "polars/clean/tip.csv:2:1: angles reach from -180 to 179 deg; beyond them the end value serves, and each use is marked outside-angles")]
    [InlineData("reynolds,alpha_deg,cl,cd\n1e5,-180,0,0\n1e5,0,0,0\n1e5,180,0,0\n1e6,-20,0,0\n1e6,0,0,0\n1e6,30,0,0\n",
        "polars/clean/tip.csv:5:1: angles reach from -20 to 30 deg; beyond them the end value serves, and each use is marked outside-angles")]
    [InlineData("alpha_deg,cl,cd\n-180,0,0\n0,0,0\n180,0,0\n", null)]
    public void Angles_that_do_not_go_round_are_a_doubt_once_a_table_that_a_blade_names(string tip, string? expected)
    {
        var study = new FellStudy().With(Tip, tip).With("polars/clean/other.csv", FellStudy.TipPolar).With("cases/second.toml", FellStudy.Case).Read();

        Told.Exactly(expected is null ? [] : [expected], study.Doubts);
        Told.Exactly([], study.Errors);
    }

    [Fact]
    public void Negative_drag_in_many_rows_is_told_by_number()
        => Told.Exactly(
            [
                "polars/clean/tip.csv:2:8: cd is -0.01; drag coefficients must be >= 0",
                "polars/clean/tip.csv:3:7: cd is -0.02; drag coefficients must be >= 0",
                "polars/clean/tip.csv:4:7: cd is -0.03; drag coefficients must be >= 0",
                "polars/clean/tip.csv:5:7: and 2 more like it in column cd",
            ],
            new FellStudy().With(Tip, "alpha_deg,cl,cd\n-10,-1,-0.01\n-5,-1,-0.02\n0,0.5,-0.03\n5,0.9,-4e-2\n10,1.1,-0.05\n").Read().Errors);

    [Theory]
    [InlineData("-20,0.2,-0.9\n-10,0.02,-0.8\n-5,0.01,-0.4\n-2,0.01,-0.1\n0,0.01,0.2\n10,0.02,0.4\n20,0.2,0.9\n", 1)]
    [InlineData("-90,1.8,-0.2\n-10,0.02,-0.8\n-5,0.01,-0.4\n-2,0.01,-0.1\n0,0.01,0.3\n10,0.02,1.2\n90,1.8,0.1\n", 1)]
    public void Lift_and_drag_that_seem_exchanged_are_asked_for(string rows, int more)
    {
        var errors = new FellStudy().With(Tip, "alpha_deg,cl,cd\n" + rows).Errors().ToList();

        Assert.Equal(4, errors.Count);
        Assert.Equal($"polars/clean/tip.csv:5:9: and {more} more like it in column cd; are cl and cd exchanged?", errors[^1]);
    }

    [Fact]
    public void A_table_of_the_set_that_no_blade_names_is_not_read()
    {
        var study = new FellStudy().With("polars/clean/other.csv", "rubbish");

        study.OnlyCase();

        Assert.DoesNotContain($"{FellStudy.Folder}/polars/clean/other.csv", study.Files.Reads);
    }

    [Fact]
    public void Two_angles_that_are_one_in_radians_are_told_as_not_rising()
    {
        // 3e-324 deg and 0 deg are both 0 rad; so are neighbours of many an angle.
        var next = Math.BitIncrement(57.0).ToString("R", CultureInfo.InvariantCulture);
        var errors = new FellStudy().With(Tip, $"alpha_deg,cl,cd\n-10,0,0\n0,0,0\n5e-324,0,0\n57,0,0\n{next},0,0\n").Read().Errors;

        Assert.StartsWith("polars/clean/tip.csv:4:1: alpha_deg falls from 0 to 5e-324", FindingText.Format(errors[0]), StringComparison.Ordinal);
    }
}
