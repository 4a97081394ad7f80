using BladeLoads.Batch.Tests.Building;
using BladeLoads.Studies.Tables;

namespace BladeLoads.EndToEnd.Program;

public sealed class Clean_against_soiled : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public Clean_against_soiled()
    {
        BeckStudy.Write(In("beck"));
        Set("round", "alpha_deg,cl,cd\n-180,0,0.6\n0,0,0.6\n180,0,0.6\n");
    }

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Is_one_sweep_once_the_soiled_set_is_made()
    {
        BeckStudy.Case(In("beck"), "soiling", """
            title = "Soiling"
            [sweep]
            polars = ["../polars/clean", "../polars/same", "../polars/soiled"]
            """);
        Succeed("polar", "scale", "beck/polars/clean", "--out", "beck/polars/same", "--lift-slope", "1");
        Succeed("polar", "scale", "beck/polars/clean", "--out", "beck/polars/soiled", "--lift-slope", "0.95", "--largest-lift", "0.9", "--drag-floor", "1.6");
        Succeed("check", "beck");
        Succeed("run", "beck", "--only", "soiling");

        var clean = Curve("soiling~polars-clean");
        Assert.Equal(clean, Curve("soiling~polars-same"));
        var soiled = Curve("soiling~polars-soiled");
        foreach (var (one, other) in Power(clean).Zip(Power(soiled)))
            Assert.True(other < one, $"{other} kW soiled, {one} kW clean");
    }

    [Fact]
    public void Factors_of_1_keep_every_value_of_a_set_and_say_what_was_not_scaled()
    {
        var text = Succeed("polar", "scale", "beck/polars/clean", "--out", "beck/polars/same", "--lift-slope", "1").Out;

        foreach (var name in new[] { "beck-18", "beck-30", "round" })
            Assert.Equal(Rows($"beck/polars/clean/{name}.csv"), Rows($"beck/polars/same/{name}.csv"));
        Assert.EndsWith("\nround.csv: all rows as they were, no lift to scale\nset: beck/polars/same\n", text, StringComparison.Ordinal);
        Assert.Equal(["beck-18.csv", "beck-30.csv", "round.csv"], Names("beck/polars/same"));
        Assert.Equal(["clean", "same"], Names("beck/polars"));
    }

    [Fact]
    public void A_bluff_section_without_a_largest_lift_stays_as_it_is_and_says_so()
    {
        Set("bluff", "alpha_deg,cl,cd\n-30,-0.7,0.9\n0,0,0.4\n20,0.5,0.6\n40,0.8,1\n");

        var text = Succeed("polar", "scale", "beck/polars/clean/bluff.csv", "--out", "soiled", "--largest-lift", "0.9").Out;

        Assert.EndsWith("\nbluff.csv: all rows as they were, a bluff section without a largest lift up to 30 deg\nset: soiled\n", text, StringComparison.Ordinal);
        Assert.Equal(Rows("beck/polars/clean/bluff.csv"), Rows("soiled/bluff.csv"));
    }

    [Fact]
    public void The_head_of_a_scaled_table_says_the_factors_and_keeps_what_it_said_before()
    {
        Set("t18", "# augmented: by someone\n# Fell tunnel\nreynolds,alpha_deg,cl,cd,cm\n1e6,-15,-0.5,0.1,0\n1e6,-10,-0.8,0.02,0.01\n1e6,0,0.2,0.01,-0.05\n1e6,10,1.2,0.02,-0.1\n1e6,20,0.7,0.25,-0.1\n1e6,40,0.9,0.8,-0.1\n");

        Succeed("polar", "scale", "beck/polars/clean/t18.csv", "--out", "beck/polars/soiled", "--largest-lift", "0.9", "--least-lift", "0.8", "--drag-floor", "1.5");

        var lines = File.ReadAllLines(In("beck/polars/soiled/t18.csv"));
        Assert.Matches(@"^# scaled by bladeloads \d+\.\d+\.\d+ from t18\.csv \(SHA-256 [0-9a-f]{64}\)$", lines[0]);
        Assert.Equal(
            [
                "# factors: lift slope 1, largest lift 0.9, least lift 0.8, drag floor 1.5; common practice, no measurement; moments as they were",
                "# at Reynolds number 1e6: largest lift 1.2 -> 1.08 at 10 deg; least lift -0.8 -> -0.64 at -10 deg; least drag 0.01 -> 0.015 at 0 deg; "
                    + "as it was up to -25 and from 25 deg on",
                "# the head of that table:",
                "# augmented: by someone",
                "# Fell tunnel",
                "reynolds,alpha_deg,cl,cd,cm",
                "1000000,-15,-0.425925925926,0.103703703704,0",
                "1000000,-10,-0.64,0.025,0.01",
                "1000000,0,0.2,0.015,-0.05",
                "1000000,10,1.08,0.025,-0.1",
                "1000000,20,0.681851851852,0.251296296296,-0.1",
                "1000000,40,0.9,0.8,-0.1",
            ],
            lines[1..]);
        Assert.Equal(["t18.csv"], Names("beck/polars/soiled"));
    }

    [Fact]
    public void Some_sections_are_scaled_and_the_others_copied_byte_for_byte()
    {
        File.WriteAllText(In("beck/polars/clean/set.toml"), "[thickness_ratio]\nbeck-18 = 0.18\n");
        File.WriteAllText(In("beck/polars/clean/README.txt"), "notes");

        var text = Succeed("polar", "scale", "beck/polars/clean", "--out", "beck/polars/soiled", "--drag-floor", "2", "--only", "*-18").Out;

        Assert.Contains("\nbeck-30.csv: copied\n", text, StringComparison.Ordinal);
        Assert.EndsWith("\nround.csv: copied\nREADME.txt: no table, not copied\nset: beck/polars/soiled\n", text, StringComparison.Ordinal);
        foreach (var name in new[] { "beck-30.csv", "round.csv", "set.toml" })
            Assert.Equal(File.ReadAllBytes(In($"beck/polars/clean/{name}")), File.ReadAllBytes(In($"beck/polars/soiled/{name}")));
        Assert.NotEqual(Rows("beck/polars/clean/beck-18.csv"), Rows("beck/polars/soiled/beck-18.csv"));
    }

    [Fact]
    public void A_set_that_is_there_stays_without_replace_and_never_loses_what_the_new_one_lacks()
    {
        Succeed("polar", "scale", "beck/polars/clean", "--out", "soiled", "--drag-floor", "2");
        Assert.Equal(
            "there is a folder 'soiled' already; give another, or put the new set in its place with --replace\n",
            Refuse("polar", "scale", "beck/polars/clean", "--out", "soiled", "--drag-floor", "3"));
        File.WriteAllText(In("soiled/mine.csv"), "mine");
        Assert.Equal(
            "'soiled' holds what the new set does not: mine.csv; a set that takes its place would lose it\n",
            Refuse("polar", "scale", "beck/polars/clean", "--out", "soiled", "--drag-floor", "3", "--replace"));
        File.Delete(In("soiled/mine.csv"));
        Succeed("polar", "scale", "beck/polars/clean", "--out", "soiled", "--drag-floor", "3", "--replace");
        Assert.Contains("drag floor 3;", File.ReadAllText(In("soiled/beck-18.csv")), StringComparison.Ordinal);
        Assert.Equal(["beck", "soiled"], Names(""));
    }

    [Fact]
    public void A_table_goes_into_the_folder_of_a_set_and_takes_no_place_unasked()
    {
        Succeed("polar", "scale", "beck/polars/clean/beck-18.csv", "--out", "soiled", "--drag-floor", "2");
        Succeed("polar", "scale", "beck/polars/clean/beck-30.csv", "--out", "soiled", "--drag-floor", "2");
        Assert.Equal(["beck-18.csv", "beck-30.csv"], Names("soiled"));
        Assert.Equal(
            "there is a table 'soiled/beck-18.csv' already; give another folder, or put the new one in its place with --replace\n",
            Refuse("polar", "scale", "beck/polars/clean/beck-18.csv", "--out", "soiled", "--drag-floor", "3"));
        Succeed("polar", "scale", "beck/polars/clean/beck-18.csv", "--out", "soiled", "--drag-floor", "3", "--replace");
    }

    [Fact]
    public void What_cannot_be_meant_is_refused_with_what_would_do()
    {
        Set("rising", "alpha_deg,cl,cd\n-5,-0.5,0.01\n0,0,0.01\n8,0.8,0.01\n");
        File.CreateSymbolicLink(In("linked"), In("beck/polars/clean"));

        string[] set = ["polar", "scale", "beck/polars/clean"];
        Assert.Equal(
            [
                "nothing to scale by; give one or more of --lift-slope, --largest-lift, --least-lift, --drag-floor\n",
                "'beck/polars/clean' holds what is read, which stays as it is; give the folder of another set\n",
                "'linked' holds what is read, which stays as it is; give the folder of another set\n",
                "there is no folder for 'no/where' to stand in; make it first\n",
                "'beck/study.toml' is a file; give a folder\n",
                "no section matches 'x*'; there are beck-18, beck-30, rising, round\n",
                "the factors on largest and least lift must be at least half of that on the lift slope\n",
                "beck/polars/clean/rising.csv: lift rises up to the end of the table or to 30 deg, so that there is no largest lift to scale; extend the table, choose "
                    + "others with --only, or give --largest-lift the factor of --lift-slope\n1 error; nothing written\n",
                "beck/polars/clean/rising.csv: lift falls down to the beginning of the table or to -30 deg, so that there is no least lift to scale; extend the table, choose "
                    + "others with --only, or leave --least-lift out\n1 error; nothing written\n",
                "'beck/study.toml' is no polar table and no folder; a polar table ends in .csv, 'bladeloads polar read' makes one\n",
                "beck/cases: holds no polar table; the tables of a set are files <section>.csv\n1 error; nothing written\n",
                "beck/polars/clean/nowhere.csv: is gone, or a link that leads nowhere\n1 error; nothing written\n",
            ],
            new string[][]
            {
                [.. set, "--out", "soiled"],
                [.. set, "--out", "beck/polars/clean", "--drag-floor", "2"],
                [.. set, "--out", "linked", "--drag-floor", "2"],
                [.. set, "--out", "no/where", "--drag-floor", "2"],
                [.. set, "--out", "beck/study.toml", "--drag-floor", "2"],
                [.. set, "--out", "soiled", "--drag-floor", "2", "--only", "x*"],
                [.. set, "--out", "soiled", "--lift-slope", "1.5", "--largest-lift", "0.7"],
                [.. set, "--out", "soiled", "--largest-lift", "0.9", "--only", "r*"],
                [.. set, "--out", "soiled", "--least-lift", "0.9", "--only", "r*"],
                ["polar", "scale", "beck/study.toml", "--out", "soiled", "--drag-floor", "2"],
                ["polar", "scale", "beck/cases", "--out", "soiled", "--drag-floor", "2"],
                ["polar", "scale", "beck/polars/clean/nowhere.csv", "--out", "soiled", "--drag-floor", "2"],
            }.Select(Refuse));
        Assert.StartsWith("--drag-floor is '0,5'; give a factor from 0.5 to 10, with a decimal point: 0.95\n", Refuse([.. set, "--out", "soiled", "--drag-floor", "0,5"]), StringComparison.Ordinal);
        Assert.Equal(["beck", "linked"], Names(""));
    }

    [Fact]
    public void A_place_that_is_no_folder_of_another_set_is_refused_with_one_that_would_do()
    {
        File.Copy(In("beck/polars/clean/beck-18.csv"), In("alone.csv"));
        Directory.CreateDirectory(In("beck/polars/aged"));

        string[] set = ["polar", "scale", "beck/polars/clean", "--drag-floor", "2", "--out"];
        string[] table = ["polar", "scale", "beck/polars/clean/beck-18.csv", "--drag-floor", "2", "--out"];
        string[] alone = ["polar", "scale", "alone.csv", "--drag-floor", "2", "--out"];
        const string within = "stands within the set that is read, and a set holds no other";
        const string file = "ends as a table does, and --out takes the folder of a set";
        Assert.Equal(
            [
                "'/' is the topmost folder of all and cannot be a set; give the folder of one\n",
                "'/' is the topmost folder of all and cannot be a set; give the folder of one\n",
                $"'beck/polars/clean/sub' {within}; 'beck/polars/sub', beside it, would do\n",
                $"'beck/polars/clean/sub/x.csv' {within}; 'beck/polars/x', beside it, would do\n",
                $"'beck/polars/clean/aged' {within}; give a folder outside it\n",
                $"'{In("beck/polars/clean/sub")}' {within}; '{In("beck/polars/sub")}', beside it, would do\n",
                $"'soiled/x.csv' {file}; 'soiled/x' would do\n",
                $"'soiled/x.csv' {file}; 'soiled' would do, and the table goes there as beck-18.csv\n",
                $"'soiled/x.CSV/' {file}; 'soiled' would do, and the table goes there as alone.csv\n",
                $"'x.csv' {file}; 'x' would do\n",
                $"'{In("soiled/x.csv")}' {file}; '{In("soiled")}' would do, and the table goes there as alone.csv\n",
            ],
            new string[][]
            {
                [.. set, "/"], [.. alone, "/"],
                [.. set, "beck/polars/clean/sub"], [.. table, "beck/polars/clean/sub/x.csv"], [.. table, "beck/polars/clean/aged"],
                [.. table, In("beck/polars/clean/sub")],
                [.. set, "soiled/x.csv"], [.. table, "soiled/x.csv"], [.. alone, "soiled/x.CSV/"], [.. alone, "x.csv"], [.. alone, In("soiled/x.csv")],
            }.Select(Refuse));
        Assert.Equal(["alone.csv", "beck"], Names(""));
        Succeed([.. alone, "soiled"]);
        Assert.Equal(["alone.csv"], Names("soiled"));
        File.WriteAllText(In("set.toml"), "");
        Assert.Equal(
            $"'again' {within}; '{Path.Join("..", "again")}', beside it, would do\n", Refuse([.. alone, "again"]));
    }

    [Fact]
    public void Every_error_of_a_set_is_told_at_once_and_nothing_is_written()
    {
        Set("a", "alpha_deg,cl,cd\n0,x,0.01\n");
        Set("b", "");
        File.CreateSymbolicLink(In("beck/polars/clean/c.csv"), "/dev/zero");
        File.CreateSymbolicLink(In("beck/polars/clean/d.csv"), In("beck/polars/clean/d.csv"));
        Set("e", "alpha_deg,cl,cd\n-10,-1,-0.01\n-5,-1,-0.02\n0,0.5,-0.03\n5,0.9,-4e-2\n10,1.1,-0.05\n");

        var error = Refuse("polar", "scale", "beck/polars/clean", "--out", "soiled", "--drag-floor", "2");

        Assert.Equal("""
            beck/polars/clean/a.csv:2:1: the table has one row; a polar needs three or more
            beck/polars/clean/a.csv:2:3: cl is 'x'; give a number, such as 0.8
            beck/polars/clean/b.csv: is empty
            beck/polars/clean/c.csv: is a link that leads out of the set; put the file itself into the folder
            beck/polars/clean/d.csv: is a link that leads round in a circle
            beck/polars/clean/e.csv:2:8: cd is -0.01; drag coefficients must be >= 0
            beck/polars/clean/e.csv:3:7: cd is -0.02; drag coefficients must be >= 0
            beck/polars/clean/e.csv:4:7: cd is -0.03; drag coefficients must be >= 0
            beck/polars/clean/e.csv:5:7: and 2 more like it in column cd
            10 errors; nothing written

            """, error);
        Assert.Equal(["beck"], Names(""));
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

    private void Set(string section, string text) => File.WriteAllText(In($"beck/polars/clean/{section}.csv"), text);

    private string In(string name) => Path.Join(_folder.Path, name);

    private string[] Names(string folder)
        => [.. Directory.EnumerateFileSystemEntries(In(folder)).Select(path => Path.GetFileName(path)).Order(StringComparer.Ordinal)];

    private string Curve(string variant) => File.ReadAllText(In($"results/beck/{variant}/power-curve.csv"));

    private static IEnumerable<double> Power(string curve)
    {
        var lines = curve.Split('\n', StringSplitOptions.RemoveEmptyEntries);
        var column = Array.IndexOf(lines[0].Split(','), "rotor_power_kW");
        return lines[1..].Select(line => double.Parse(line.Split(',')[column], System.Globalization.CultureInfo.InvariantCulture));
    }

    private List<string> Rows(string table) => [.. StoredPolars.FromBytes(table, File.ReadAllBytes(In(table)), out _)!.Polars
        .SelectMany(polar => polar.Rows.Select(row => $"{polar.Reynolds:R} {row}"))];
}
