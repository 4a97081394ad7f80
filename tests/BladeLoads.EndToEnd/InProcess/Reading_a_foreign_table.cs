using System.Security.Cryptography;
using System.Text;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Commands;
using BladeLoads.Results.Publishing;
using BladeLoads.Studies;
using BladeLoads.Studies.Tables;

namespace BladeLoads.EndToEnd.InProcess;

public sealed class Reading_a_foreign_table : IDisposable
{
    private const string Lab = "Fell tunnel\r\nRe = 0,75 million\r\nalpha [°];CL;CD\r\n-5;-0,4;0,01\r\n0;0,1;0,009\r\n5;0,6;0,01\r\n5;0,6;0,01\r\n";

    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_table_is_made_with_its_record_and_the_lab_s_file_stays()
    {
        File.WriteAllText(In("lab.txt"), Lab);
        var hash = Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(Lab)));

        var (code, text, error) = Run("read", In("lab.txt"), "--out", In("t18.csv"));

        Assert.Equal((0, ""), (code, error));
        Assert.Equal($"""
            # read by bladeloads {CommandLine.ToolVersion} from lab.txt (SHA-256 {hash})
            # text: UTF-8, semicolons between columns and a decimal comma
            # columns: alpha from 'alpha [°]' (column 1), cl from 'CL' (column 2), cd from 'CD' (column 3)
            # angles in degrees, as line 3 says
            # Reynolds number 750000 of line 2: 'Re = 0,75 million'
            # left out: line 7, the same as line 6
            reynolds,alpha_deg,cl,cd
            750000,-5,-0.4,0.01
            750000,0,0.1,0.009
            750000,5,0.6,0.01

            """, File.ReadAllText(In("t18.csv")));
        Assert.Equal($"""
            read by bladeloads {CommandLine.ToolVersion} from lab.txt (SHA-256 {hash})
            text: UTF-8, semicolons between columns and a decimal comma
            columns: alpha from 'alpha [°]' (column 1), cl from 'CL' (column 2), cd from 'CD' (column 3)
            angles in degrees, as line 3 says
            Reynolds number 750000 of line 2: 'Re = 0,75 million'
            left out: line 7, the same as line 6
            3 rows at Reynolds number 7.5e5, -5 to 5 deg
            table: {In("t18.csv")}

            """, text);
        Assert.Equal(Lab, File.ReadAllText(In("lab.txt")));
        Assert.Equal(["lab.txt", "t18.csv"], Names());
    }

    [Fact]
    public void What_is_read_reads_the_same_as_a_table_of_a_case_and_as_a_foreign_one()
    {
        File.WriteAllText(In("lab.txt"), Lab);
        Run("read", In("lab.txt"), "--out", In("t18.csv"));

        var stored = StoredPolars.FromBytes("t18.csv", File.ReadAllBytes(In("t18.csv")), out var errors);
        Assert.Equal(0, Run("read", In("t18.csv"), "--out", In("again.csv")).Code);

        Assert.Empty(errors);
        Assert.Equal([new(-5, -0.4, 0.01, double.NaN), new(0, 0.1, 0.009, double.NaN), new PolarRow(5, 0.6, 0.01, double.NaN)], stored!.Polars[0].Rows.ToArray());
        Assert.Equal(WithoutHead("t18.csv"), WithoutHead("again.csv"));
    }

    [Fact]
    public void An_augmented_table_stays_one_however_often_it_is_read()
    {
        File.WriteAllText(In("lab.txt"), "% augmented: snel-1993, c/r 0.2\r\n" + Lab);

        Assert.Equal(0, Run("read", In("lab.txt"), "--out", In("t18.csv")).Code);
        Assert.Equal(0, Run("read", In("t18.csv"), "--out", In("again.csv")).Code);

        foreach (var name in new[] { "t18.csv", "again.csv" })
            Assert.Equal("snel-1993, c/r 0.2", StoredPolars.FromBytes(name, File.ReadAllBytes(In(name)), out _)!.Augmented?.Text);
    }

    [Fact]
    public void A_preview_tells_and_writes_nothing()
    {
        File.WriteAllText(In("lab.txt"), "alpha cl cd\n" + string.Concat(Enumerable.Range(0, 20).Select(i => $"{i} 0.{i + 10} 0.01\n")));

        var (code, text, _) = Run("read", In("lab.txt"), "--preview");

        Assert.Equal(0, code);
        Assert.EndsWith("""

            20 rows, 0 to 19 deg
            alpha_deg,cl,cd
            0,0.1,0.01
            1,0.11,0.01
            2,0.12,0.01
            ...
            17,0.27,0.01
            18,0.28,0.01
            19,0.29,0.01
            preview: nothing written

            """, text, StringComparison.Ordinal);
        Assert.Equal(["lab.txt"], Names());
    }

    [Fact]
    public void Every_option_reaches_the_reader()
    {
        File.WriteAllText(In("lab.txt"), "rubbish 1 2 3 4 5\nx;a, b;y;z;s\n-0,1;-0,4;0,01;;A\nC new run\n0;0,1;-0,009;0;A\n3,5;0,1;0,02;0;B\n3,5;;0,02;0;A\n0,2;0,6;0,01;0;A\n6,1;0,6;0,01;0;A\n");

        var (code, text, error) = Run(
            "read", In("lab.txt"), "--out", In("t18.csv"), "--columns", "alpha=x,cl=a, b,cd=y", "--columns", "cm=none,reynolds=none,section=5", "--angles", "radians",
            "--decimal", "comma", "--separator", "semicolon", "--reynolds", "1.5e6", "--comment", "C", "--lines", "2-", "--section", "A", "--sweep", "all",
            "--leave-out", "incomplete", "--leave-out", "negative-drag", "--wrap");

        Assert.True(code == 0, error);
        Assert.Contains("\n3 rows at Reynolds number 1.5e6, -10.49574497 to 11.4591559026 deg\n", text, StringComparison.Ordinal);
    }

    [Fact]
    public void A_column_of_reynolds_numbers_in_millions_that_does_not_say_so_is_read_when_told()
    {
        File.WriteAllText(In("lab.txt"), "alpha cl cd Re\n-5 -0.4 0.01 1.0\n0 0.1 0.009 1.0\n5 0.6 0.01 1.0\n");

        var (code, text, error) = Run("read", In("lab.txt"), "--preview", "--reynolds", "millions");

        Assert.Equal((0, ""), (code, error));
        Assert.Contains("\nconverted: Reynolds numbers without a unit times 1000000, as --reynolds says\n", text, StringComparison.Ordinal);
        Assert.Contains("\n1000000,-5,-0.4,0.01\n", text, StringComparison.Ordinal);
    }

    [Fact]
    public void What_is_wrong_is_told_by_file_line_and_column_and_nothing_is_written()
    {
        File.WriteAllText(In("lab.txt"), "alpha cl cd\n-5 x 0.01\n0 0.1 0.009\n5 0.6\n");

        var (code, text, error) = Run("read", In("lab.txt"), "--out", In("t18.csv"));

        Assert.Equal((2, ""), (code, text));
        Assert.Equal($"""
            {In("lab.txt")}:2:4: cl is 'x'; give a number
            {In("lab.txt")}:4:1: 2 values where line 1 names 3; give one a column, or leave the line out by --lines or a comment mark
            2 errors; nothing written

            """, error);
        Assert.Equal(["lab.txt"], Names());
    }

    [Fact]
    public void A_file_that_is_there_stays_without_replace()
    {
        File.WriteAllText(In("lab.txt"), Lab);
        File.WriteAllText(In("t18.csv"), "mine");

        var (code, _, error) = Run("read", In("lab.txt"), "--out", In("t18.csv"));

        Assert.Equal((2, $"there is a file '{In("t18.csv")}' already; give another, or put the new table in its place with --replace\n"), (code, error));
        Assert.Equal("mine", File.ReadAllText(In("t18.csv")));
        Assert.Equal(0, Run("read", In("lab.txt"), "--out", In("t18.csv"), "--replace").Code);
        Assert.StartsWith("# read by bladeloads ", File.ReadAllText(In("t18.csv")), StringComparison.Ordinal);
    }

    [Fact]
    public void A_place_where_no_table_can_be_is_refused()
    {
        File.WriteAllText(In("lab.csv"), Lab);
        Directory.CreateDirectory(In("set.csv"));
        File.CreateSymbolicLink(In("link.csv"), In("elsewhere.csv"));
        File.CreateSymbolicLink(In("same.csv"), In("lab.csv"));

        Assert.Equal(
            [
                $"'{In("t18.txt")}' cannot be a polar table; give a file <section>.csv",
                $"'{In(".t18.csv")}' cannot be a polar table; give a file <section>.csv",
                $"'{In("lab.csv")}' is what is read, which stays as it is; give another file",
                $"'{In("same.csv")}' is what is read, which stays as it is; give another file",
                $"'{In("set.csv")}' is a folder; give a file in it",
                $"'{In("link.csv")}' is a link; give the file itself",
                $"there is no folder for '{In("nowhere/t18.csv")}' to stand in; make it first",
                $"'{In("a~b.csv")}' cannot be a polar table: the name of its section holds '~'; give another <section>.csv",
                $"'{In("CON.csv")}' cannot be a polar table: the name of its section is the name of a device on some systems; give another <section>.csv",
                $"'{In("a .csv")}' cannot be a polar table: the name of its section begins or ends with a space or a dot; give another <section>.csv",
            ],
            new[] { "t18.txt", ".t18.csv", "lab.csv", "same.csv", "set.csv", "link.csv", "nowhere/t18.csv", "a~b.csv", "CON.csv", "a .csv" }.Select(
                name => Refusal("read", In("lab.csv"), "--out", In(name), "--replace")));
        Assert.Equal(["lab.csv", "link.csv", "same.csv", "set.csv"], Names());
    }

    [Fact]
    public void Wrong_use_is_told_with_what_would_do()
    {
        File.WriteAllText(In("lab.txt"), Lab);
        Assert.Equal(
            [
                "where does the table go? Give --out <section>.csv, or --preview to see what would be done",
                "--columns has no role 'alpah'; did you mean 'alpha'?",
                "--columns has no role 'x'; there are alpha, cl, cd, cm, reynolds, normal, tangential, axial, section: --columns alpha=1,cl=2,cd=3",
                "--columns says no column for cl; give its number or its name: cl=2",
                "--columns says cl twice; keep one",
                "--columns cl=none: a table needs one; only cm and reynolds can be left out",
                "--columns needs normal together with tangential (positive towards the leading edge) or axial (towards the trailing edge)",
                "--columns says tangential and axial, which are one force seen from two sides; keep one",
                "--columns says forces square to the chord and along it, and lift or drag besides; keep one pair",
                "--comment is '1'; give the sign or the word that such lines begin with, no number and no sign of one",
            ],
            new string[][]
            {
                [], ["--columns", "alpah=1"], ["--columns", "x=1"], ["--columns", "cl="], ["--columns", "cl=1,cl=2"], ["--columns", "cl=none"],
                ["--columns", "normal=1"], ["--columns", "normal=1,tangential=2,axial=3"], ["--columns", "normal=1,axial=2,cl=3"], ["--comment", "1"],
            }.Select((options, i) => Refusal(["read", In("lab.txt"), .. i == 0 ? [] : (string[])["--preview"], .. options])));
        Assert.Equal(
            [
                "--angles is 'grad'; give degrees or radians", "--decimal is 'dot'; give point or comma",
                "--separator is ';'; give tab, semicolon, comma, bar or blanks", "--sweep is 'up'; give rising, falling, mean or all",
                "--reynolds is '1500'; give a number from 1e4 to 1e9: 1.5e6; or millions or thousands, the unit of those in the table",
                "--leave-out is 'everything'; give incomplete or negative-drag",
                "--lines is '5'; give the first and the last line of the table, 12-48, or the first alone, 12-",
                "--lines is '0-5'; give the first and the last line of the table, 12-48, or the first alone, 12-",
            ],
            new string[][] { ["--angles", "grad"], ["--decimal", "dot"], ["--separator", ";"], ["--sweep", "up"], ["--reynolds", "1500"], ["--leave-out", "everything"], ["--lines", "5"], ["--lines", "0-5"] }
                .Select(options => Refusal(["read", In("lab.txt"), "--preview", .. options]).Split('\n')[0]));
    }

    [Fact]
    public void A_disk_that_takes_no_more_leaves_no_half_a_table()
    {
        File.WriteAllText(In("lab.txt"), Lab);
        for (var at = 1; at <= 2; at++)
        {
            var (code, _, error) = Run(new FailingDisk(at), "read", In("lab.txt"), "--out", In("t18.csv"));

            Assert.Equal((3, $"cannot write {In("t18.csv")}: no room left on the disk\n"), (code, error));
            Assert.Equal(["lab.txt"], Names());
        }
    }

    [Fact]
    public void A_folder_in_which_no_file_can_be_made_is_told_in_words()
    {
        File.WriteAllText(In("lab.txt"), Lab);
        foreach (var trouble in new Exception[] { new FileNotFoundException("Could not find file 'x'"), new DirectoryNotFoundException("Could not find 'x'") })
        {
            var (code, _, error) = Run(new FailingDisk(1, () => trouble), "read", In("lab.txt"), "--out", In("t18.csv"));

            Assert.Equal((3, $"cannot write {In("t18.csv")}: no file can be made in its folder; give a place in another\n"), (code, error));
        }
    }

    [Fact]
    public void A_hostile_name_moves_no_cursor_and_breaks_no_head()
    {
        var name = "=1+1\u001b[2J\u202e,\"x.txt";
        File.WriteAllText(In(name), Lab.Replace("CL", "cl", StringComparison.Ordinal));

        var (code, text, _) = Run("read", In(name), "--out", In("t18.csv"));

        Assert.Equal(0, code);
        Assert.DoesNotContain('\u001b', text);
        Assert.StartsWith(
            $"# read by bladeloads {CommandLine.ToolVersion} from =1+1\\u001b[2J\\u202e,\"x.txt (SHA-256 ", File.ReadAllText(In("t18.csv")), StringComparison.Ordinal);
        Assert.NotNull(StoredPolars.FromBytes("t18.csv", File.ReadAllBytes(In("t18.csv")), out _));
    }

    [Fact]
    public void A_doubt_is_told_and_the_table_is_made()
    {
        File.WriteAllText(In("lab.txt"), "alpha cl cd\n-5 -0.4 0.01\n0 0.1 0.009\n5 0.6 0.01");

        var (code, _, error) = Run("read", In("lab.txt"), "--out", In("t18.csv"));

        Assert.Equal(
            (0, $"{In("lab.txt")}:4: doubt: the last row has no line end; if the file was cut off there, its last number may have lost digits\n"), (code, error));
    }

    private string In(string name) => Path.Join(_folder.Path, name);

    private string[] Names() => [.. Directory.EnumerateFileSystemEntries(_folder.Path).Select(path => Path.GetFileName(path)).Order(StringComparer.Ordinal)];

    private string[] WithoutHead(string name) => [.. File.ReadAllLines(In(name)).Where(line => line[0] != '#')];

    private static string Refusal(params string[] arguments)
    {
        var (code, text, error) = Run(arguments);
        Assert.Equal((2, ""), (code, text));
        return error.TrimEnd('\n');
    }

    private static (int Code, string Out, string Error) Run(params string[] arguments) => Run(new Disk(), arguments);

    private static (int Code, string Out, string Error) Run(IDisk disk, params string[] arguments)
    {
        using var output = new StringWriter { NewLine = "\n" };
        using var error = new StringWriter { NewLine = "\n" };
        var surroundings = new Surroundings(
            output, error, false, false, _ => throw new StudyNotFoundException("no study"), (_, _) => throw new InvalidOperationException(), disk, TimeProvider.System, _ => { });
        return (CommandLine.Run(["polar", .. arguments], surroundings), output.ToString(), error.ToString());
    }
}
