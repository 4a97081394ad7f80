using System.Text;

namespace BladeLoads.Studies.Tests.Laboratory;

public class ForeignTableTests
{
    private const string Small = "alpha;cl;cd\n-5;-0,4;0,01\n0;0,1;0,009\n5;0,6;0,01\n";
    private const string Rows = "-5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01";

    public static TheoryData<string> Readable => ForeignCase.Titles(TablesThatAreRead.All);

    public static TheoryData<string> Refused => ForeignCase.Titles(TablesThatAreRefused.All);

    [Theory]
    [MemberData(nameof(Readable))]
    public void A_table_that_can_be_read_in_one_way_is_read_so(string title)
    {
        var table = TablesThatAreRead.All.Single(one => one.Title == title);

        Assert.Equal(table.Expected, Foreign.Outcome(Foreign.Read(table.Text, table.Options)));
    }

    [Theory]
    [MemberData(nameof(Refused))]
    public void A_table_that_cannot_be_read_or_in_two_ways_is_refused_with_what_would_do(string title)
    {
        var table = TablesThatAreRefused.All.Single(one => one.Title == title);

        var read = Foreign.Read(table.Text, table.Options);

        Assert.Equal(table.Expected, Foreign.Outcome(read));
        Assert.True(read.Polars.IsEmpty && !read.Errors.IsEmpty);
    }

    [Theory]
    [InlineData("utf-8", true, "UTF-8")]
    [InlineData("utf-16", true, "UTF-16")]
    [InlineData("utf-16", false, "UTF-16")]
    [InlineData("utf-16BE", true, "UTF-16")]
    [InlineData("utf-16BE", false, "UTF-16")]
    [InlineData("utf-32", true, "UTF-32")]
    [InlineData("utf-32", false, "UTF-32")]
    [InlineData("utf-32BE", true, "UTF-32")]
    [InlineData("iso-8859-1", false, "Windows-1252 (Latin-1)")]
    public void Every_usual_encoding_is_read(string encoding, bool withMark, string told)
    {
        var coder = Encoding.GetEncoding(encoding);

        var table = Foreign.Read([.. withMark ? coder.GetPreamble() : [], .. coder.GetBytes(Small.Replace("alpha", "alpha [°]"))]);

        Assert.Equal(Rows, Foreign.Outcome(table));
        Assert.Equal($"text: {told}, semicolons between columns and a decimal comma", table.Record[0]);
        Assert.Contains("angles in degrees, as line 1 says", table.Record);
    }

    [Theory]
    [InlineData("\r\n")]
    [InlineData("\r")]
    [InlineData("\n\f")]
    [InlineData("\r\n\r\n")]
    public void Every_line_end_is_one(string end)
        => Assert.Equal(Rows, Foreign.Outcome(Foreign.Read(Small.Replace("\n", end) + "\x1A")));

    [Fact]
    public void A_dash_of_a_one_byte_encoding_is_a_minus_sign()
        => Assert.Equal(Rows, Foreign.Outcome(Foreign.Read([.. "alpha;cl;cd\n"u8, 0x96, .. "5;-0,4;0,01\n0;0,1;0,009\n5;0,6;0,01\n"u8])));

    [Fact]
    public void A_last_row_without_a_line_end_is_a_doubt()
    {
        var table = Foreign.Read(Small.TrimEnd('\n'));

        Assert.Equal(Rows, Foreign.Outcome(table));
        Told.Exactly(["lab.txt:4: the last row has no line end; if the file was cut off there, its last number may have lost digits"], table.Doubts);
        Assert.Empty(Foreign.Read(Small + "end").Doubts);
    }

    [Fact]
    public void The_record_says_all_that_was_done()
    {
        var table = Foreign.Read("""
            Fell tunnel, section t18
            # Re (millions) 0.75
            alpha [rad];x;cn;ct
            0,2;7;0,9;0,1
            0,1;7;0,5;0,02
            0,0;7;0,1;-0,01
            0,0;7;0,10;-0,010
            -0,1;;;
            # -0,2;7;-0,7;0,01
            end of the table

            """, "--columns normal=3,tangential=4 --leave-out incomplete");

        Assert.Equal(
            [
                "text: UTF-8, semicolons between columns and a decimal comma",
                "columns: alpha from 'alpha [rad]' (column 1), normal from 'cn' (column 3), tangential from 'ct' (column 4); not taken: 'x' (column 2)",
                "angles in radians, as line 3 says",
                "Reynolds number 750000 of line 2: 'Re (millions) 0.75'",
                "converted: angles from radians to degrees, 12 significant digits; cl and cd from forces square to the chord and along it, 12 significant digits",
                "rows are sorted by angle at Reynolds number 750000",
                "left out: line 7, the same as line 6",
                "left out: line 8, a value is missing",
                "left out: line 9, a row behind a comment mark",
                "left out: line 10, a remark below the rows",
            ],
            table.Record.ToArray());
    }

    [Fact]
    public void The_record_says_nothing_of_signs_in_rows_that_are_not_taken()
    {
        Assert.DoesNotContain("converted: minus signs of typesetters to -", Foreign.Read(Small + "# \u22127;-0,5;0,01\n").Record);
        Assert.Contains("converted: minus signs of typesetters to -", Foreign.Read(Small + "\u22127;-0,5;0,01\n").Record);
    }

    [Fact]
    public void The_record_says_that_a_line_was_not_believed_in_the_unit_of_the_angle()
        => Assert.Contains(
            "angles in degrees, as --angles says and as they go beyond all radians, though line 1 names radians",
            Foreign.Read("alpha [rad];cl;cd\n-5;-0,4;0,01\n0;0,1;0,009\n5;0,6;0,01\n", "--angles degrees").Record);

    [Fact]
    public void The_record_says_that_degree_signs_were_taken_from_angles()
    {
        var record = Foreign.Read("alpha;cl;cd\n-3°;-0,4;0,01\n0°;0,1;0,009\n4°;0,6;0,01\n").Record;

        Assert.Contains("angles in degrees, as line 2 says", record);
        Assert.Contains("converted: degree signs taken from angles", record);
    }

    [Theory]
    [InlineData("deg")]
    [InlineData("rad")]
    public void Whether_columns_are_exchanged_is_asked_by_angle_in_any_unit(string unit)
    {
        // A plate at every angle, with drag a little below 0 where it is small; and attached flow with lift under cd.
        var circle = Enumerable.Range(-12, 25).Select(i =>
        {
            var (sin, cos) = Math.SinCos(double.DegreesToRadians(15 * i));
            return (15.0 * i, 1.8 * sin * cos, Math.Abs(i) is <= 1 or >= 11 ? -0.001 : 1.3 * sin * sin);
        });
        var exchanged = Enumerable.Range(-10, 21).Select(i => ((double)i, 0.01, 0.1 * i));

        Assert.Equal("and 4 more like it in column cd", LastError(circle));
        Assert.Equal("and 7 more like it in column cd; are cl and cd exchanged?", LastError(exchanged));

        string LastError(IEnumerable<(double AngleDeg, double Lift, double Drag)> rows)
            => Foreign.Read($"alpha [{unit}] cl cd\n" + string.Concat(rows.Select(Line))).Errors[^1].Text;

        string Line((double AngleDeg, double Lift, double Drag) row) => FormattableString.Invariant(
            $"{(unit == "deg" ? row.AngleDeg : double.DegreesToRadians(row.AngleDeg))} {row.Lift} {row.Drag}\n");
    }

    [Theory]
    [InlineData("0 3.1416", "the last digit of pi rounded up taken as 180 degrees")]
    [InlineData("0 6.2832", "the last digit of 2 pi rounded up taken as 360 degrees; 1 angle beyond 180 degrees by a turn")]
    [InlineData("3.142 -6.28319",
        "the last digit of pi rounded up taken as 180 degrees; the last digit of 2 pi rounded up taken as 360 degrees; "
        + "1 angle beyond 180 degrees by a turn")]
    public void The_record_says_that_a_last_digit_was_taken_as_the_round_angle(string angles, string done)
    {
        var rows = string.Concat(angles.Split(' ').Select(angle => $"{angle} 0.1 0.01\n"));

        Assert.Contains(
            $"converted: angles from radians to degrees, 12 significant digits; {done}",
            Foreign.Read($"alpha cl cd\n1 0.5 0.1\n2 0.5 1.1\n{rows}", "--angles radians --wrap --sweep all").Record);
    }

    [Fact]
    public void Many_lines_are_told_as_ranges()
    {
        var rows = string.Concat(Enumerable.Range(0, 40).Select(i => i % 3 == 0 || i > 30 ? $"{i} 0.1 0.01\n{i} 0.1 0.01\n" : $"{i} 0.1 0.01\n"));

        Assert.Equal(
            [
                "left out: line 3, the same as line 2", "left out: line 7, the same as line 6", "left out: line 11, the same as line 10",
            ],
            Foreign.Read("alpha cl cd\n" + rows).Record.Where(line => line.StartsWith("left out", StringComparison.Ordinal)).Take(3));
        Assert.Contains(
            "left out: lines 3, 5 to 6, 8, 10, 12, 14 and more, drag below 0",
            Foreign.Read("alpha cl cd\n1 1 1\n2 1 -1\n3 1 1\n4 1 -1\n5 1 -1\n6 1 1\n7 1 -1\n8 1 1\n9 1 -1\n10 1 1\n11 1 -1\n12 1 1\n13 1 -1\n14 1 1\n15 1 -1\n",
                "--leave-out negative-drag").Record);
    }

    [Theory]
    [InlineData("-cm", "its sign is turned")]
    [InlineData("\u2212CM", "its sign is turned")]
    [InlineData("cm (nose down positive)", "its sign is turned")]
    [InlineData("cm*10", "it is a multiple of the moment coefficient")]
    [InlineData("cm [%]", "it is a multiple of the moment coefficient")]
    [InlineData("Cm LE", "it is about the leading edge; --columns cm=4 takes it as it stands")]
    [InlineData("cmte", "it is about the trailing edge; --columns cm=4 takes it as it stands")]
    [InlineData("CM_ac", "it is about the aerodynamic centre; --columns cm=4 takes it as it stands")]
    [InlineData("Cm_corr", "it is one version of several; --columns cm=4 takes it as it stands")]
    [InlineData("Cm root", "it is not plainly about the quarter chord; --columns cm=4 takes it as it stands")]
    public void The_record_says_why_a_column_is_not_taken_for_the_moment(string name, string why)
    {
        var text = $"alpha;cl;cd;{name}\n-5;-0.4;0.01;0.1\n0;0.1;0.009;0.1\n5;0.6;0.01;0.1\n";

        Assert.Contains($"no moment: '{name}' (column 4) is not taken, as {why}", Foreign.Read(text).Record);
        Assert.Equal(Rows, Foreign.Outcome(Foreign.Read(text)));
        Assert.Equal(!why.Contains("--columns", StringComparison.Ordinal), Foreign.Read(text, "--columns cm=4").Polars.IsEmpty);
        Assert.Contains(
            $"columns: alpha from 'alpha' (column 1), cl from 'cl' (column 2), cd from 'cd' (column 3); not taken: '{name}' (column 4)",
            Foreign.Read(text, "--columns cm=none").Record);
    }

    [Fact]
    public void A_moment_said_to_be_nose_up_is_taken()
        => Assert.Equal(
            "-5 -0.4 0.01 0.1 | 0 0.1 0.009 0.1 | 5 0.6 0.01 0.1",
            Foreign.Outcome(Foreign.Read("alpha;cl;cd;cm (nose up positive)\n-5;-0.4;0.01;0.1\n0;0.1;0.009;0.1\n5;0.6;0.01;0.1\n")));

    [Theory]
    [InlineData("Re = 1.0e6", 1e6)]
    [InlineData("RE=1,5E6", 1.5e6)]
    [InlineData("re 750000", 750000)]
    [InlineData("Reynolds 1 000 000", 1e6)]
    [InlineData("Reynolds number: 1'250'000", 1.25e6)]
    [InlineData("Reynolds no. = 1,000,000", 1e6)]
    [InlineData("Reynoldszahl 1.000.000", 1e6)]
    [InlineData("Reynolds number 0.3 million, clean", 3e5)]
    [InlineData("Re = 1.5 M", 1.5e6)]
    [InlineData("Re (millions) 1.5", 1.5e6)]
    [InlineData("Re [10^6] = 1.5", 1.5e6)]
    [InlineData("Re x 10^-6: 0.75", 750000)]
    [InlineData("Re/1e6 = 0.57", 570000)]
    [InlineData("Re = 1.5 x 10^6, Ma = 0.1", 1.5e6)]
    [InlineData("Re = 1.5 * 10**6", 1.5e6)]
    [InlineData("Re;300000;;", 3e5)]
    [InlineData("\"Re\",\"1e6\"", 1e6)]
    [InlineData("Re ~ 500 thousand", 5e5)]
    [InlineData("run 7 at Re=2E+06", 2e6)]
    [InlineData("# Fell tunnel, section t18 (Re 1.5e6), 2019-07-04", 1.5e6)]
    [InlineData("Re = 1e6 (nominal)", 1e6)]
    [InlineData("Reynolds number Re = 1e6 and Ma 0.1", 1e6)]
    [InlineData("chord Reynolds number: 1e6; tripped at 5 % chord, q = 1.2e4 Pa", 1e6)]
    [InlineData("Re (chord) = 1e6 - clean", 1e6)]
    [InlineData("## Re_c = 1e6 ##", 1e6)]
    [InlineData("Rec = 1.5e6", 1.5e6)]
    [InlineData("Reynolds number based on chord: 1e6", 1e6)]
    [InlineData("Reynolds number (based on chord): 1e6", 1e6)]
    [InlineData("Reynolds number on the mean chord: 1.5e6", 1.5e6)]
    [InlineData("Reynolds number based on the mean aerodynamic chord: 1.5e6", 1.5e6)]
    [InlineData("Re number = 1.5e6", 1.5e6)]
    [InlineData("Rey. = 1.5e6", 1.5e6)]
    [InlineData("Re.: 1.5e6", 1.5e6)]
    [InlineData("Reynolds number, chord = 1.5e6", 1.5e6)]
    [InlineData("Reynolds number based on chord, Re = 1.5e6", 1.5e6)]
    [InlineData("Re = 1.5 mln", 1.5e6)]
    [InlineData("Re = 1_500_000", 1.5e6)]
    [InlineData("Re = 750000_clean", 750000)]
    public void A_line_that_names_a_reynolds_number_is_understood(string line, double reynolds)
        => Assert.Equal(
            [reynolds], Foreign.Read($"{line}\nalpha cl cd\n-5 -0.4 0.01\n0 0.1 0.009\n5 0.6 0.01\n").Polars.Select(polar => polar.Reynolds));

    [Theory]
    [InlineData("# Tunnel: largest Reynolds number 6e6", "largest")]
    [InlineData("Re = 2.5e6 per metre", "per")]
    [InlineData("Re = 2.5e6, per metre", "per")]
    [InlineData("Re = 2.5e6 1/m", "1")]
    [InlineData("Re = 2.5e6, 2019", "1")]
    [InlineData("Re = 2.5e6 /m", "/m")]
    [InlineData("Re [1/m] = 2.5e6", "1/m")]
    [InlineData("# not Re = 1e6", "not")]
    [InlineData("critical at Re = 4e5", "critical")]
    [InlineData("Tunnel Re = 6e6", "Tunnel")]
    [InlineData("Re (max) = 6e6", "max")]
    [InlineData("Re_max = 6e6", "max")]
    [InlineData("Re = 6e6 or more", "or")]
    [InlineData("Re = 6e6 (max.)", "max.")]
    [InlineData("Re up to 6e6", "?")]
    [InlineData("Re = one million", "?")]
    [InlineData("Re one million", "?")]
    [InlineData("Re: one and a half million", "?")]
    [InlineData("Reynolds number one and a half million", "?")]
    [InlineData("Reynolds number: two", "?")]
    [InlineData("Re = -1.5e6", "?")]
    [InlineData("Rec = -1.5e6", "?")]
    [InlineData("Re number = -1.5e6", "?")]
    [InlineData("Rey = one million", "?")]
    [InlineData("Rec: 1.5e6", "?")]
    [InlineData("Re: -1.5e6", "?")]
    [InlineData("Re - 750000", "?")]
    [InlineData("Re = approx. 1500000", "?")]
    [InlineData("Re was 1.5e6", "?")]
    [InlineData("Re,c = 1.5e6", "?")]
    [InlineData("ReD = 1.5e6", "?")]
    [InlineData("Re∞ = 1.5e6", "?")]
    [InlineData("Reynolds number based on chord 0.5 m: 1.5e6", "")]
    [InlineData("Re = 1e6 (nominal), 1_020_000 (measured)", "")]
    [InlineData("Re < 6e6", "?")]
    [InlineData("Re = 1e6 (nominal), 1.02e6 (measured)", "")]
    [InlineData("Re = 1e6, measured: 1.02 million", "")]
    [InlineData("Re = 1000000 (nominal), 1020000 (measured)", "")]
    [InlineData("Re about 1e6 to 2e6", "")]
    [InlineData("Re = 1.4e6 to 1.6e6", "")]
    [InlineData("from 1e5 on, Re = 1e6", "")]
    public void A_reynolds_number_beside_which_other_words_stand_is_refused_with_the_words(string line, string qualifier)
        => Told.Exactly(
            [
                $"lab.txt:1:1: '{line.TrimStart('#', ' ')}' names "
                + (qualifier switch
                {
                    "" => "more than one Reynolds number",
                    "1" => "a Reynolds number, and another number stands right behind it",
                    "?" => "a Reynolds number in a way that is not understood",
                    _ => $"a Reynolds number, and '{qualifier}' beside it may make it another than that of the rows",
                })
                + "; write it as Re = 1.5e6, say it with --reynolds, or say --columns reynolds=none for a table without",
            ],
            Foreign.Read($"{line}\nalpha cl cd\n-5 -0.4 0.01\n0 0.1 0.009\n5 0.6 0.01\n").Errors);

    [Fact]
    public void The_record_shows_the_lines_that_name_reynolds_numbers_and_of_many_the_first()
    {
        static string Blocks(int count) => "alpha cl cd\n" + string.Concat(
            Enumerable.Range(1, count).Select(i => $"Re = {i},5 million, clean\n-5 -0.4 0.01\n0 0.1 0.009\n5 0.6 0.01\n"));

        Assert.Equal(
            ["Reynolds number 1500000 of line 2: 'Re = 1,5 million, clean'", "Reynolds number 2500000 of line 6: 'Re = 2,5 million, clean'"],
            Foreign.Read(Blocks(2)).Record.Where(line => line.StartsWith("Reynolds", StringComparison.Ordinal)));
        Assert.Equal(
            ["Reynolds number 12500000 of line 46: 'Re = 12,5 million, clean'", "Reynolds numbers of lines 50 and 54 besides"],
            Foreign.Read(Blocks(14)).Record.Where(line => line.StartsWith("Reynolds", StringComparison.Ordinal)).Skip(11));
    }

    [Fact]
    public void The_record_says_that_a_unit_of_reynolds_numbers_was_said()
        => Assert.Contains(
            "converted: Reynolds numbers without a unit times 1000000, as --reynolds says", Foreign.Read("Re = 1.5\n" + Small, "--reynolds millions").Record);

    [Theory]
    [InlineData("more results below")]
    [InlineData("re-run of the 12th")]
    [InlineData("Subject: RE your order")]
    [InlineData("Reynolds number: not noted")]
    [InlineData("Reynolds number held the same over the two runs")]
    [InlineData("Reynolds numbers are in millions")]
    [InlineData("Re = n/a, Ma = 0.1")]
    [InlineData("RE: two tables")]
    [InlineData("Rec: 12")]
    [InlineData("By R. Reynolds; thousands of rows")]
    [InlineData("Ref = 101325 Pa")]
    [InlineData("Reference pressure = 101325 Pa")]
    [InlineData("re-run 5 at 20 m/s")]
    [InlineData("area 5")]
    public void A_line_that_names_none_is_prose(string line)
        => Assert.Equal(
            [double.NaN], Foreign.Read($"{line}\nalpha cl cd\n-5 -0.4 0.01\n0 0.1 0.009\n5 0.6 0.01\n").Polars.Select(polar => polar.Reynolds));

    [Theory]
    [InlineData("alpha", "CL", "CD")]
    [InlineData("Alpha (deg)", "Cl (-)", "Cd (-)")]
    [InlineData("ALPHA [°]", "C_L", "C_D")]
    [InlineData("angle of attack in degrees", "coefficient of lift", "coefficient of drag")]
    [InlineData("AoA/deg", "lift coeff.", "drag coeff.")]
    [InlineData("AOA", "Lift", "Drag")]
    [InlineData("alpha_deg", "c l", "c d")]
    [InlineData("𝛼 / °", "c𝗅", "c_d")]
    [InlineData("Incidence", "Cl", "Cd total")]
    public void The_usual_words_of_the_trade_are_understood(string angle, string lift, string drag)
        => Assert.Equal(Rows, Foreign.Outcome(Foreign.Read($"{lift};{angle};{drag}\n-0,4;-5;0,01\n0,1;0;0,009\n0,6;5;0,01\n")));

    [Fact]
    public void A_table_is_read_the_same_twice()
    {
        var one = Foreign.Read(Small);
        var other = Foreign.Read(Small);

        Assert.Equal(Foreign.Outcome(one), Foreign.Outcome(other));
        Assert.Equal(one.Record.ToArray(), other.Record.ToArray());
        Assert.Equal(one.Sha256, other.Sha256);
        Assert.Equal(64, one.Sha256.Length);
    }
}
