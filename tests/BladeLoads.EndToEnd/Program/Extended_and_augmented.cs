using BladeLoads.Batch.Tests.Building;

namespace BladeLoads.EndToEnd.Program;

public sealed class Extended_and_augmented : IDisposable
{
    private const string T18 = """
        # Fell tunnel
        reynolds,alpha_deg,cl,cd,cm
        1e6,-10,-1.00,0.03,0.010
        1e6,-4,-0.440,0.01,0.01
        1e6,0,0,0.008,0
        1e6,4,0.44,0.01,0
        1e6,10,1.0,0.02,0
        1e6,14,1.2,0.04,-0.02
        1e6,17.5,0.9,0.15,-0.06
        1e6,20,0.8,0.25,-0.1

        """;

    private readonly TemporaryFolder _folder = new();

    public Extended_and_augmented() => BeckStudy.Write(In("beck"));

    public void Dispose() => _folder.Dispose();

    [Theory]
    [InlineData("stall")]
    [InlineData("end")]
    public void A_case_with_an_extended_set_gives_what_one_gives_that_extends_the_plain_set(string join)
    {
        Directory.CreateDirectory(In("beck/polars/short"));
        foreach (var name in new[] { "beck-18.csv", "beck-30.csv" })
            File.WriteAllLines(In($"beck/polars/short/{name}"), File.ReadLines(In($"beck/polars/clean/{name}"))
                .Where(line => !double.TryParse(line.Split(',')[0], out var angle) || angle is >= -8 and <= 22));
        BeckStudy.Case(In("beck"), "by-key", $"title = \"By key\"\npolars = \"../polars/short\"\n[sections]\nextend = \"viterna-1982\"\njoin = \"{join}\"");
        BeckStudy.Case(In("beck"), "by-file", "title = \"By file\"\npolars = \"../polars/whole\"");

        var told = Succeed("polar", "extend", "beck/polars/short", "--out", "beck/polars/whole", "--blade", "beck/blades/beck-20.csv", "--join", join).Out;
        Succeed("run", "beck", "--only", "by-*");

        // Length 19 m, area (1.4 + 1.5)/2 x 4 + (1.5 + 1.0)/2 x 7 + (1.0 + 0.4)/2 x 8 = 20.15 m2; 1.11 + 0.018 x 19^2/20.15.
        Assert.StartsWith(
            $"viterna-1982: aspect ratio 17.9156 of beck-20.csv, drag 1.43248 at 90 deg, joined at {(join == "stall" ? "stall" : "the end of the table")}\n",
            told, StringComparison.Ordinal);
        var sides = join == "stall" ? "above 0 from stall at 14 deg, 4 rows beyond left out" : "above 0 from the end at 22 deg";
        Assert.Contains($" Case by-key polar tables: beck-18: {sides}, slope of lift breaks by ", File.ReadAllText(In("results/beck/by-key/case.log")), StringComparison.Ordinal);
        foreach (var table in new[] { "power-curve.csv", "spanwise.csv" })
            AssertNear(In($"results/beck/by-key/{table}"), In($"results/beck/by-file/{table}"));
    }

    [Fact]
    public void An_extended_table_keeps_its_rows_to_the_digit_and_says_where_it_was_joined()
    {
        File.WriteAllText(In("t18.csv"), T18);

        var finished = Succeed("polar", "extend", "t18.csv", "--out", "whole", "--aspect-ratio", "12", "--join", "stall");

        // Drag at 90 degrees: 1.11 + 0.018 x 12 (viterna-corrigan1982).
        string[] record =
        [
            "viterna-1982: aspect ratio 12, drag 1.326 at 90 deg, joined at stall",
            "moments left out: the method has none",
            "at Reynolds number 1e6: above 0 from stall at 14 deg, 2 rows beyond left out, slope of lift breaks by -0.0995 a degree, of drag by +0.006; "
                + "below 0 from -10 deg to the mirrored stall point, slope of lift breaks by -0.1333 a degree, of drag by +0.0008",
        ];
        Assert.Equal($"{record[0]}\n{record[1]}\nt18.csv: {record[2]}\nset: whole\n", finished.Out);
        Assert.Equal("", finished.Error);
        var lines = File.ReadAllLines(In("whole/t18.csv"));
        Assert.Matches(@"^# extended by bladeloads \d+\.\d+\.\d+ from t18\.csv \(SHA-256 [0-9a-f]{64}\)$", lines[0]);
        Assert.Equal([.. record.Select(line => "# " + line), "# the head of that table:", "# Fell tunnel", "reynolds,alpha_deg,cl,cd", "1000000,-180,0,0.008"], lines[1..8]);
        var join = Array.IndexOf(lines, "1000000,-10,-1,0.03");
        Assert.Equal(
            ["1000000,-4,-0.44,0.01", "1000000,0,0,0.008", "1000000,4,0.44,0.01", "1000000,10,1,0.02", "1000000,14,1.2,0.04"], lines[(join + 1)..(join + 6)]);
        Assert.StartsWith("1000000,14.5,", lines[join + 6], StringComparison.Ordinal);
        Assert.Contains("1000000,90,0,1.326", lines);
        Assert.Equal("1000000,180,0,0.008", lines[^1]);

        var again = Succeed("polar", "extend", "whole/t18.csv", "--out", "again", "--aspect-ratio", "20");
        Assert.Equal("t18.csv: reaches from -180 to 180 deg already, copied\nset: again\n", again.Out);
        Assert.Equal(File.ReadAllBytes(In("whole/t18.csv")), File.ReadAllBytes(In("again/t18.csv")));
    }

    [Fact]
    public void What_is_doubtful_about_an_extension_is_told()
    {
        Directory.CreateDirectory(In("lab"));
        File.WriteAllText(In("lab/rising.csv"), "alpha_deg,cl,cd\n-5,-0.5,0.01\n0,0,0.01\n8,0.8,0.01\n");
        File.WriteAllText(In("lab/falling.csv"), "alpha_deg,cl,cd\n-10,0.8,0.02\n0,0,0.01\n10,-0.8,0.02\n");
        // Drag at 92.5 deg by hand: B1 sin2 87.5 + B2 cos 87.5 through (14 deg, 1, 0.1), less 2.09; lift -0.7 of the relation, less 0.142.
        File.WriteAllText(In("lab/late.csv"), "alpha_deg,cl,cd\n-9,-0.8,0.1\n-6,-0.6,0.02\n0,0,0.01\n10,0.9,0.02\n14,1,0.1\n20,0.8,0.3\n89.9,0.142,2.09\n");
        File.WriteAllText(In("lab/turned.csv"), "# here\n# Augmented: by hand\n" + T18);

        var finished = Succeed("polar", "extend", "lab", "--out", "whole", "--aspect-ratio", "12");

        Assert.Equal("""
            lab/falling.csv:2: doubt: lift is -0.8 at the last angle, 10 deg; extended from there, the section hardly lifts at all: is the sign of lift or angle turned?
            lab/late.csv:2: doubt: from the last row that is kept, 89.9 deg, to the next, 92.5 deg, lift goes by -0.182685 and drag by -0.765516: the table and the relation do not meet
            lab/rising.csv:2: doubt: shows no stall up to the last angle, 8 deg; extended from there, the section stalls at that angle
            lab/turned.csv:2: doubt: the table is augmented for rotation already; extend it as it was before, and augment then

            """, finished.Error);
        BeckStudy.Case(In("beck"), "by-key", "title = \"By key\"\nblade = \"../blades/turned.csv\"\npolars = \"../polars/lab\"\n[sections]\nextend = \"viterna-1982\"");
        File.WriteAllText(In("beck/blades/turned.csv"), "radius_m,chord_m,twist_deg,section\n1,1,5,turned\n20,0.5,0,turned\n");
        Directory.Move(In("lab"), In("beck/polars/lab"));
        Assert.Contains(
            "polars/lab/turned.csv:2:1: doubt: the table is augmented for rotation already; extend it as it was before, and augment then\n",
            Succeed("check", "beck").All, StringComparison.Ordinal);
    }

    [Fact]
    public void A_dip_that_is_taken_for_stall_is_doubted()
    {
        File.WriteAllText(In("dip.csv"), "alpha_deg,cl,cd\n-14.2,-0.84,0.05\n-10,-0.7,0.03\n-8,-0.56,0.03\n-6.1,-0.64,0.02\n0,0,0.01\n10,0.9,0.02\n14,1,0.1\n20,0.8,0.3\n");

        Assert.Equal(
            "dip.csv:2: doubt: joined at stall, -6.1 deg with lift -0.64, but of the rows that are left out one lifts more: -0.84 at -14.2 deg; "
                + "if what is between is a dip and no stall, join at the end, or mend the rows\n",
            Succeed("polar", "extend", "dip.csv", "--out", "new", "--aspect-ratio", "11", "--join", "stall").Error);
    }

    [Fact]
    public void An_augmented_table_says_for_which_place_and_is_not_augmented_again()
    {
        File.WriteAllText(In("t18.csv"), T18);

        var finished = Succeed("polar", "augment", "t18.csv", "--out", "turned", "--method", "snel-1993", "--chord-ratio", "0.4", "--radius-ratio", "0.3");

        // 3 x 0.4^2 = 0.48 (snel1993). Potential lift by the rows within 4 degrees of zero lift: 0.44/4 a degree; at 30 degrees
        // 0.11 x 180/pi x sin 30 = 3.15127, and 0.8, the end value, + 0.48 x (3.15127 - 0.8) = 1.92861.
        string[] record =
        [
            "augmented: snel-1993, c/r 0.4, r/R 0.3",
            "lift goes 0.48 of the way to potential lift, drag 0 of the way to that at zero lift; fades from 30 to 50 deg; moments as they were",
            "at Reynolds number 1e6: lift 0.8 -> 1.92861 at 30 deg, where it moves most; drag as it was; "
                + "12 rows added up to 50 deg, where the end value fades back",
        ];
        Assert.Equal($"{record[0]}\n{record[1]}\nt18.csv: {record[2]}\nset: turned\n", finished.Out);
        var lines = File.ReadAllLines(In("turned/t18.csv"));
        Assert.Matches(@"^# augmented by bladeloads \d+\.\d+\.\d+ from t18\.csv \(SHA-256 [0-9a-f]{64}\)$", lines[0]);
        Assert.Equal(
            [
                .. record.Select(line => "# " + line), "# the head of that table:", "# Fell tunnel", "reynolds,alpha_deg,cl,cd,cm",
                "1000000,-10,-1,0.03,0.01", "1000000,-4,-0.44,0.01,0.01", "1000000,0,0,0.008,0", "1000000,4,0.439828481273,0.01,0",
            ],
            lines[1..11]);
        Assert.Equal("1000000,50,0.8,0.25,-0.1", lines[^1]);

        Assert.Equal(
            "turned/t18.csv:2: the table is augmented already: 'snel-1993, c/r 0.4, r/R 0.3'; give the table as it was before, or choose others with --only\n"
                + "1 error; nothing written\n",
            Refuse("polar", "augment", "turned/t18.csv", "--out", "twice", "--method", "snel-1993", "--chord-ratio", "0.4", "--radius-ratio", "0.3"));
        Succeed("polar", "scale", "turned/t18.csv", "--out", "soiled", "--drag-floor", "1.5");
        Assert.StartsWith(
            "soiled/t18.csv:6: the table is augmented already: 'snel-1993, c/r 0.4, r/R 0.3'",
            Refuse("polar", "augment", "soiled/t18.csv", "--out", "twice", "--method", "snel-1993", "--chord-ratio", "0.4", "--radius-ratio", "0.3"), StringComparison.Ordinal);
    }

    [Fact]
    public void The_place_can_be_that_of_a_blade_and_some_sections_are_augmented()
    {
        File.WriteAllText(In("beck/polars/clean/round.csv"), "alpha_deg,cl,cd\n-180,0,0.6\n0,0,0.6\n180,0,0.6\n");

        var text = Succeed(
            "polar", "augment", "beck/polars/clean", "--out", "turned", "--method", "du-selig-1998", "--blade", "beck/blades/beck-20.csv", "--radius", "3",
            "--tip-speed-ratio", "6", "--only", "beck-30", "--only", "round").Out;

        // Chord (1.4 + 1.5)/2 = 1.45 m. Lambda = 6/sqrt(37); fL by x = (1.45/3)^(1/(0.15 Lambda)), fD by its square root (du-selig1998).
        Assert.Equal("""
            augmented: du-selig-1998, c/r 0.483333, r/R 0.15, tip-speed ratio 6
            lift goes 0.798108 of the way to potential lift, drag 0.658916 of the way to that at zero lift; fades from 30 to 50 deg; moments as they were
            beck-18.csv: copied
            beck-30.csv: lift 0.866 -> 2.68052 at 30 deg, where it moves most; drag 0.5175 -> 0.217726 at 32 deg, where it moves most
            round.csv: no lift to augment, copied
            set: turned

            """, text);
        foreach (var name in new[] { "beck-18", "round" })
            Assert.Equal(File.ReadAllBytes(In($"beck/polars/clean/{name}.csv")), File.ReadAllBytes(In($"turned/{name}.csv")));
    }

    [Fact]
    public void What_cannot_be_meant_is_refused_with_what_would_do()
    {
        File.WriteAllText(In("t18.csv"), T18);
        File.WriteAllText(In("behind.csv"), "alpha_deg,cl,cd\n-15,-0.7,0.1\n-8,-0.8,0.01\n0,0,0.01\n");
        File.WriteAllText(In("bad-blade.csv"), "radius_m,chord_m,twist_deg,section\n1,x,5,t\n2,1,0,t\n");
        string[] extend = ["polar", "extend", "t18.csv", "--out", "new"];
        string[] augment = ["polar", "augment", "t18.csv", "--out", "new", "--method"];
        const string Place = "say where the table is to serve: either --chord-ratio and --radius-ratio, or --blade and --radius\n";
        const string Ratio = "give the aspect ratio of the blade with --aspect-ratio, or the blade table with --blade; one of them\n";

        Assert.Equal(
            [
                Ratio,
                Ratio,
                "bad-blade.csv:2:3: chord_m is 'x'; give a number, such as 0.8\n1 error; nothing written\n",
                "no-blade.csv: is gone, or a link that leads nowhere\n1 error; nothing written\n",
                "behind.csv:2: the rows from here on have no angle between 0 and 90 deg to extend from; add rows up to stall\n1 error; nothing written\n",
                Place,
                Place,
                Place,
                "du-selig-1998 depends on how fast the rotor turns; give --tip-speed-ratio\n",
                "snel-1993 does not depend on how fast the rotor turns; leave --tip-speed-ratio out\n",
                "--radius is 0.5, and the blade of beck/blades/beck-20.csv reaches from 1 to 20 m\n",
                "the radius is 0.85 of the tip radius; nothing is augmented beyond 0.8\n",
                "with c/r 0.02 and r/R 0.5 nothing would be augmented\n",
            ],
            new string[][]
            {
                extend,
                [.. extend, "--aspect-ratio", "12", "--blade", "beck/blades/beck-20.csv"],
                [.. extend, "--blade", "bad-blade.csv"],
                [.. extend, "--blade", "no-blade.csv"],
                ["polar", "extend", "behind.csv", "--out", "new", "--aspect-ratio", "12"],
                [.. augment, "snel-1993"],
                [.. augment, "snel-1993", "--chord-ratio", "0.2"],
                [.. augment, "snel-1993", "--chord-ratio", "0.2", "--radius-ratio", "0.3", "--blade", "beck/blades/beck-20.csv"],
                [.. augment, "du-selig-1998", "--chord-ratio", "0.2", "--radius-ratio", "0.3"],
                [.. augment, "snel-1993", "--chord-ratio", "0.2", "--radius-ratio", "0.3", "--tip-speed-ratio", "6"],
                [.. augment, "snel-1993", "--blade", "beck/blades/beck-20.csv", "--radius", "0.5"],
                [.. augment, "snel-1993", "--blade", "beck/blades/beck-20.csv", "--radius", "17"],
                [.. augment, "du-selig-1998", "--chord-ratio", "0.02", "--radius-ratio", "0.5", "--tip-speed-ratio", "6"],
            }.Select(Refuse));
        foreach (var (option, value, text) in new[]
        {
            ("--aspect-ratio", "12,5", "--aspect-ratio is '12,5'; give a ratio from 0.1 to 1000, with a decimal point: 15.5\n"),
            ("--aspect-ratio", "NaN", "--aspect-ratio is 'NaN'; give a ratio from 0.1 to 1000, with a decimal point: 15.5\n"),
            ("--join", "Stall", "--join is 'Stall'; give stall or end\n"),
        })
            Assert.StartsWith(text, Refuse([.. extend, option, value]), StringComparison.Ordinal);
        Assert.StartsWith("--method is 'snel'; give du-selig-1998 or snel-1993\n", Refuse([.. augment, "snel"]), StringComparison.Ordinal);
        Assert.False(Directory.Exists(In("new")));
    }

    private Finished Succeed(params string[] arguments)
    {
        var finished = Started.Run(_folder.Path, arguments);
        Assert.True(finished.ExitCode == 0, finished.ToString());
        return finished;
    }

    private string Refuse(params string[] arguments)
    {
        var finished = Started.Run(_folder.Path, arguments);
        Assert.Equal((2, ""), (finished.ExitCode, finished.Out));
        return finished.Error;
    }

    private static void AssertNear(string one, string other)
    {
        // The rows of a file have twelve digits, and the results nine and more: a balance amplifies the last.
        const double Same = 1e-7;
        var (left, right) = (Cells(one), Cells(other));
        Assert.Equal(left.Length, right.Length);
        foreach (var (a, b) in left.Zip(right))
            if (double.TryParse(a, out var x) && double.TryParse(b, out var y))
                Assert.True(Math.Abs(x - y) <= Same * Math.Max(1, Math.Abs(x)), $"{x} by key, {y} by file");
            else
                Assert.Equal(a, b);
    }

    private static string[] Cells(string table) => [.. File.ReadLines(table).SelectMany(line => line.Split(','))];

    private string In(string name) => Path.Join(_folder.Path, name);
}
