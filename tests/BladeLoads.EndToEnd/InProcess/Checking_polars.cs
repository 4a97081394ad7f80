using System.Globalization;
using System.Text.Json;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Batch.Work;
using BladeLoads.Commands;
using BladeLoads.EndToEnd.Documentation;
using BladeLoads.Results.Publishing;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.EndToEnd.InProcess;

public sealed class Checking_polars : IDisposable
{
    private static readonly string Demo = Path.Combine(Repository.Root, "inputs", "tarn-valley");

    private readonly TemporaryFolder _folder = new();
    private readonly ExtractedStudies _studies = new();

    public void Dispose()
    {
        _folder.Dispose();
        _studies.Dispose();
    }

    private string Results => Path.Join(_folder.Path, "results");

    [Fact]
    public void A_table_by_itself_is_told_with_its_doubts_and_the_figures_of_all_its_Reynolds_numbers()
    {
        var (code, text, error) = Run("polar", "check", _studies.PathOf("example/polars/clean/fell-21.csv"));
        Assert.Equal((0, ""), (code, error));
        var file = _studies.PathOf("example/polars/clean/fell-21.csv");
        Assert.Equal($"""
            {file}:4:8: doubt: no row between -180 and -135 deg, and the curve there is a guess; far from the working range give one every 15 deg or closer; likewise lines 5, 6, 7, 8 and 25 more

            figures  Reynolds  slope/2pi  no lift deg  largest cl  at deg  best cl/cd  at deg  least cd  at deg  plate: laminar  turbulent
            fell-21       2e5       0.98         -3.5       1.280    10.0        70.8     5.0    0.0110     0.0          0.0059     0.0123  below-turbulent-plate
            fell-21       4e6       1.00         -3.5       1.420    14.0       104.4     5.0    0.0080     0.0          0.0013     0.0070

            no errors, 30 doubts in 1 table

            """, text);
        Assert.False(Directory.Exists(Results));
    }

    [Fact]
    public void A_set_is_told_as_a_whole_and_written_where_asked()
    {
        var set = _studies.PathOf("example/polars/clean");
        var (code, text, error) = Run("polar", "check", set, "--out", Path.Join(_folder.Path, "report"));
        Assert.Equal((0, ""), (code, error));
        Assert.EndsWith(
            "\nround           -          -            -           -       -           -       -    0.6000     0.0               -          -  bluff\n"
            + $"\nno errors, 30 doubts in 2 tables\nreport: {Path.Join(_folder.Path, "report")}\n", text, StringComparison.Ordinal);
        Assert.Equal(
            ["polar-doubts.csv", "polar-figures.csv"],
            FilesIn(Path.Join(_folder.Path, "report")).Where(f => f.EndsWith(".csv", StringComparison.Ordinal)));
    }

    [Fact]
    public void A_study_is_told_where_its_blades_work_and_what_to_look_at_first()
    {
        var (code, text, error) = Run("polar", "check", _studies.PathOf("example"), "--results", Results, "--only", "fixed-speed", "--workers", "1");
        Assert.Equal(0, code);
        Assert.StartsWith("solving 1 case with 1 worker\n", error, StringComparison.Ordinal);
        Assert.StartsWith("polars/clean/fell-21.csv:", text, StringComparison.Ordinal);
        Assert.Contains(
            "\nwhere the blades work, from 5 to 95 % of their length (1 case, every operating point alike):\n", text, StringComparison.Ordinal);
        Assert.Contains("\nlook first at, with the share of all blades at work there:\n", text, StringComparison.Ordinal);
        Assert.EndsWith($"\nno errors, 30 doubts in 2 tables\nreport: {Path.Join(Results, "example", "polars")}\n", text, StringComparison.Ordinal);
        Assert.Equal(
            ["polar-doubts.csv", "polar-figures.csv", "polar-histograms.csv", "polar-use.csv"],
            FilesIn(Path.Join(Results, "example", "polars")).Where(f => f.EndsWith(".csv", StringComparison.Ordinal)));
        // Nothing but the report: no case was published, and no plan is any wiser.
        Assert.Equal(["polars"], Directory.EnumerateDirectories(Path.Join(Results, "example")).Select(d => Path.GetFileName(d)!));
    }

    /// <summary>
    /// Counted a second time, from spanwise.csv and power-curve.csv of a run and the blade tables alone: the weights of blended sections by
    /// the radius between the rows of the blade.
    /// </summary>
    [Fact]
    public void The_histograms_are_those_of_the_spanwise_tables_of_a_run()
    {
        string[] only = ["--only", "two-bladed", "--only", "stall-10m", "--results", Results];
        Assert.Equal(0, Run(["run", Demo, .. only]).Code);
        Assert.Equal(0, Run(["polar", "check", Demo, .. only]).Code);

        var counted = new SortedDictionary<string, double>(StringComparer.Ordinal);
        foreach (var (name, blade, set) in ((string, string, string)[])
            [
                ("two-bladed", "tarn-38-two", "clean"), ("stall-10m~pitch_deg--2", "tarn-5", "small"), ("stall-10m~pitch_deg-0", "tarn-5", "small"),
                ("stall-10m~pitch_deg-2", "tarn-5", "small")])
            Count(counted, Path.Join(Results, "tarn-valley", name), Rows(Path.Join(Demo, "blades", blade + ".csv")), set);
        var whole = counted.GroupBy(c => KeyOfTable(c.Key)).ToDictionary(g => g.Key, g => g.Sum(c => c.Value));

        var told = Rows(Path.Join(Results, "tarn-valley", "polars", "polar-histograms.csv"))
            .ToDictionary(r => $"{r["table"]} {r["quantity"]} {Bin(r)}", r => Number(r["share"]), StringComparer.Ordinal);
        Assert.Equal(counted.Keys, told.Keys.Order(StringComparer.Ordinal));
        Assert.True(told.Count > 200, $"{told.Count} bins");
        foreach (var (key, share) in told)
            Assert.Equal(counted[key] / whole[KeyOfTable(key)], share, 1e-6);
        // Every table's shares, by angle and by Reynolds number, make one.
        foreach (var table in told.GroupBy(t => KeyOfTable(t.Key)))
            Assert.Equal(1, table.Sum(t => t.Value), 1e-9);
    }

    [Fact]
    public void The_same_report_comes_of_any_number_of_workers()
    {
        foreach (var workers in (string[])["1", "2", "5"])
            Assert.Equal(0, Run("polar", "check", _studies.PathOf("example"), "--results", Path.Join(Results, workers), "--workers", workers).Code);
        var one = TemporaryFolder.Contents(Path.Join(Results, "1"));
        Assert.Equal(one, TemporaryFolder.Contents(Path.Join(Results, "2")));
        Assert.Equal(one, TemporaryFolder.Contents(Path.Join(Results, "5")));
    }

    [Fact]
    public void As_JSON_the_same_rows_come_with_the_same_names()
    {
        var (code, text, _) = Run("polar", "check", _studies.PathOf("example"), "--results", Results, "--only", "fixed-speed", "--json");
        Assert.Equal(0, code);
        using var json = JsonDocument.Parse(text);
        Assert.Equal(
            ["format", "checked", "tool_version", "polar_figures", "polar_doubts", "polar_use", "polar_histograms"],
            json.RootElement.EnumerateObject().Select(p => p.Name));
        foreach (var name in (string[])["figures", "doubts", "use", "histograms"])
        {
            var rows = Rows(Path.Join(Results, "example", "polars", $"polar-{name}.csv"));
            var items = json.RootElement.GetProperty("polar_" + name).EnumerateArray().ToList();
            Assert.Equal(rows.Count, items.Count);
            foreach (var (row, item) in rows.Zip(items))
                Assert.Equal(row.Keys, item.EnumerateObject().Select(p => p.Name));
        }
        Assert.Equal(0.011, json.RootElement.GetProperty("polar_figures")[0].GetProperty("least_drag").GetDouble());
        Assert.Equal(JsonValueKind.Null, json.RootElement.GetProperty("polar_figures")[2].GetProperty("reynolds").ValueKind);
    }

    [Fact]
    public void A_table_with_an_error_is_told_first_and_the_others_are_checked()
    {
        _studies.Write("example/polars/clean/spare.csv", "alpha_deg,cl,cd\n-10,0,0.1\n0,0,-0.1\n10,0,0.1\n");
        var (code, text, _) = Run("polar", "check", _studies.PathOf("example"), "--results", Results, "--only", "fixed-speed");
        Assert.Equal(1, code);
        Assert.StartsWith(
            "polars/clean/spare.csv:3:5: cd is -0.1; drag coefficients must be >= 0\npolars/clean/fell-21.csv:", text, StringComparison.Ordinal);
        Assert.Contains("\n1 error in 1 file; 30 doubts in 2 tables without errors\n", text, StringComparison.Ordinal);
    }

    [Fact]
    public void A_table_that_no_blade_names_is_checked_and_said_to_be_not_used()
    {
        _studies.Write("example/polars/clean/spare.csv", "alpha_deg,cl,cd\n-180,0,0.6\n0,0,0.6\n180,0,0.6\n");
        var text = Run("polar", "check", _studies.PathOf("example"), "--results", Results, "--only", "fixed-speed").Out;
        Assert.Contains(
            "\nspare          -                    -  -180 to 180          -            -                -           -          -  not used\n", text,
            StringComparison.Ordinal);
    }

    [Fact]
    public void A_case_file_beside_its_tables_is_checked_under_the_name_of_its_folder()
    {
        Alone("clean.toml", "");
        var (code, text, error) = Run("polar", "check", Path.Join(_folder.Path, "alone", "clean.toml"), "--results", Results);
        Assert.True(code == 0, text + error);
        // The blade's own table stands there too, and is none of the set's.
        Assert.DoesNotContain("blade.csv", text, StringComparison.Ordinal);
        Assert.Contains("\nlook first at, with the share of all blades at work there:\n", text, StringComparison.Ordinal);
        Assert.Contains(">Section tip, set alone<", File.ReadAllText(Path.Join(Results, "alone", "polars", "tip.svg")), StringComparison.Ordinal);
    }

    [Fact]
    public void Of_a_set_and_of_a_table_the_sections_named_are_checked()
    {
        _studies.Write("example/polars/clean/spare.csv", "alpha_deg,cl,cd\n-10,0,0.1\n0,0,-0.1\n10,0,0.1\n");
        var set = _studies.PathOf("example/polars/clean");
        var (code, text, error) = Run("polar", "check", set, "--only", "ro*");
        Assert.Equal((0, ""), (code, error));
        Assert.DoesNotContain("fell-21", text, StringComparison.Ordinal);
        Assert.EndsWith(
            "\nno errors, no doubts in 1 table\n", text.Replace("0 doubts", "no doubts", StringComparison.Ordinal), StringComparison.Ordinal);
        (code, text, _) = Run("polar", "check", set, "--only", "sp*", "--only", "ro*");
        Assert.Equal(1, code);
        Assert.EndsWith("\n1 error in 1 file; 0 doubts in 1 table without errors\n", text, StringComparison.Ordinal);
        Assert.Equal(
            (2, "", "no section matches 'x*', 'y'; there are fell-21, round, spare\n"), Run("polar", "check", set, "--only", "x*", "--only", "y"));
        Assert.Equal((2, "", "no section matches 'x*'; there are round\n"), Run("polar", "check", Path.Join(set, "round.csv"), "--only", "x*"));
        Assert.Equal(0, Run("polar", "check", Path.Join(set, "round.csv"), "--only", "round").Code);
    }

    [Fact]
    public void Cases_with_errors_are_said_to_be_left_out()
    {
        Alone("clean.toml", "");
        Alone("cases/clean.toml", "");
        Alone("cases/wrong.toml", "colour = 3\n");
        var (code, text, _) = Run("polar", "check", Path.Join(_folder.Path, "alone"), "--results", Results);
        Assert.Equal(1, code);
        Assert.Contains("\n1 error in 1 file; 4 doubts in 1 table without errors; left out: 1 case with errors\n", text, StringComparison.Ordinal);
    }

    [Fact]
    public void The_report_is_told_by_the_path_that_was_given()
    {
        var relative = Path.GetRelativePath(Directory.GetCurrentDirectory(), Results);
        var text = Run("polar", "check", _studies.PathOf("example"), "--results", relative, "--only", "fixed-speed").Out;
        Assert.EndsWith($"\nreport: {Path.Join(relative, "example", "polars")}\n", text, StringComparison.Ordinal);
    }

    [Fact]
    public void A_study_of_which_no_case_can_run_says_why()
    {
        var (code, text, error) = Run("polar", "check", _studies.PathOf("broken"), "--results", Results);
        Assert.Equal((2, ""), (code, text));
        Assert.StartsWith("cases/clean.toml:13:1: unknown key 'tip_speed'", error, StringComparison.Ordinal);
        Assert.EndsWith("\n4 errors in 4 files; clean not run, nothing can run\n", error, StringComparison.Ordinal);
        Assert.False(Directory.Exists(Results));
    }

    [Fact]
    public void Names_that_lead_nowhere_are_told()
    {
        Told("no case matches 'x*'; the cases are air-and-pitch~", "polar", "check", _studies.PathOf("example"), "--only", "x*");
        Told("no study, set or table ", "polar", "check", Path.Join(_folder.Path, "nothing"));
        Told("--out is empty; give a folder", "polar", "check", _studies.PathOf("example/polars/clean"), "--out", "");
        File.WriteAllText(Path.Join(_folder.Path, "file"), "");
        Told(
            $"'{Path.Join(_folder.Path, "file")}' is a file; give a folder", "polar", "check", _studies.PathOf("example/polars/clean"), "--out",
            Path.Join(_folder.Path, "file"));

        void Told(string beginning, params string[] arguments)
        {
            var (code, text, error) = Run(arguments);
            Assert.Equal((2, ""), (code, text));
            Assert.StartsWith(beginning, error, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void Written_where_asked_a_report_of_ours_gives_way_and_no_other_file_does()
    {
        var table = _studies.PathOf("example/polars/clean/round.csv");
        var report = Path.Join(_folder.Path, "report");
        Directory.CreateDirectory(report);
        foreach (var (name, what) in new[] { ("round.svg", "picture"), ("polar-figures.csv", "report") })
        {
            var file = Path.Join(report, name);
            File.WriteAllText(file, "mine");
            Assert.Equal(
                (2, "", $"'{file}' is there and is no {what} of ours; give another folder with --out\n"),
                Run("polar", "check", table, "--out", report));
            Assert.Equal("mine", File.ReadAllText(file));
            Assert.Equal([name], FilesIn(report));
            File.Delete(file);
        }
        Assert.Equal(0, Run("polar", "check", table, "--out", report).Code);
        Assert.Equal(0, Run("polar", "check", table, "--out", report).Code);
        Assert.Equal(["polar-doubts.csv", "polar-figures.csv", "round.svg"], FilesIn(report));
    }

    [Fact]
    public void No_report_goes_among_polar_tables()
    {
        var (study, set) = (_studies.PathOf("example"), _studies.PathOf("example/polars/clean"));
        var before = FilesIn(set);
        foreach (var (source, folder) in new[]
            { (set, set), (Path.Join(set, "round.csv"), set), (study, set), (study, _studies.PathOf("example/polars")) })
            Assert.Equal(
                (2, "", $"'{folder}' holds the polars that are checked; give another folder with --out\n"),
                Run("polar", "check", source, "--out", folder));
        var other = _studies.PathOf("example/polars/laboratory");
        Assert.Equal(
            (2, "", $"'{other}' holds a polar table, fell-21.csv, and the report would be read as more of them; give another folder with --out\n"),
            Run("polar", "check", set, "--out", other));
        // Where the study lies in the folder that is named for results, the place of the report is that of its sets.
        Assert.Equal(
            (2, "", $"'{_studies.PathOf("example/polars")}' holds the polars that are checked; give another folder for results with --results\n"),
            Run("polar", "check", study, "--results", Path.GetDirectoryName(study)!));
        Assert.Equal(before, FilesIn(set));
    }

    [Fact]
    public void A_page_has_a_name_that_a_terminal_shows()
    {
        if (OperatingSystem.IsWindows())
            return;
        Directory.CreateDirectory(Path.Join(_folder.Path, "set"));
        File.WriteAllText(Path.Join(_folder.Path, "set", "new\nline.csv"), "alpha_deg,cl,cd\n-180,0,0.6\n0,0,0.6\n180,0,0.6\n");
        Assert.Equal(0, Run("polar", "check", Path.Join(_folder.Path, "set"), "--out", Path.Join(_folder.Path, "report")).Code);
        Assert.Equal(["new_u000aline.svg", "polar-doubts.csv", "polar-figures.csv"], FilesIn(Path.Join(_folder.Path, "report")));
    }

    [Fact]
    public void No_line_is_told_twice_for_one_kind_of_doubt()
    {
        var table = Path.Join(_folder.Path, "huge.csv");
        File.WriteAllText(table, "alpha_deg,cl,cd\n-4,-19,0.0105\n-2,0.1,19\n0,0.32,0.0091\n2,19,0.0093\n4,0.76,15\n6,0.86,0.0121\n8,1.04,0.0165\n");
        Assert.Contains(
            $"\n{table}:5:3: doubt: the largest lift is 19, at 2 deg; slender sections reach 0.7 to 2.2: is it in another unit, or of "
            + "a section with a flap?\n",
            Run("polar", "check", table).Out, StringComparison.Ordinal);
    }

    [Fact]
    public void A_disk_that_takes_no_more_is_told_in_one_line_with_exit_code_3()
    {
        var (code, text, error) = Run(
            ["polar", "check", _studies.PathOf("example/polars/clean"), "--out", Path.Join(_folder.Path, "report")],
            disk: new FailingDisk(1, () => new IOException("x", 28)));
        Assert.Equal((3, ""), (code, text));
        Assert.Equal($"cannot write results into {Path.Join(_folder.Path, "report")}: no room left on the disk\n", error);
    }

    [Fact]
    public void A_case_that_cannot_be_solved_is_told_and_the_others_count()
    {
        var calls = 0;
        var (code, text, error) = Run(
            ["polar", "check", _studies.PathOf("example"), "--results", Results, "--only", "fixed-speed", "--only", "scheduled", "--workers", "1"],
            solve: (rotor, cancellation) => calls++ == 0
                ? throw new InvalidOperationException("loss factor 1.0003")
                : CaseSolver.Solve(rotor, cancellation));
        Assert.Equal(1, code);
        Assert.Contains("Case scheduled failed: fault in BladeLoads, please report: loss factor 1.0003\n", error, StringComparison.Ordinal);
        Assert.Contains("(1 case, every operating point alike)", text, StringComparison.Ordinal);
        Assert.Contains("\nno errors, 30 doubts in 2 tables; left out: 1 case that failed in solving\n", text, StringComparison.Ordinal);
    }

    // A case of a study 'alone', beside its tables or in cases/.
    private void Alone(string file, string more)
    {
        var tables = file.Contains('/', StringComparison.Ordinal) ? ".." : ".";
        Put("tip.csv", "reynolds,alpha_deg,cl,cd\n1e6,-10,-0.8,0.02\n1e6,0,0.3,0.008\n1e6,10,1.2,0.02\n1e6,20,0.9,0.2\n");
        Put("blade.csv", "radius_m,chord_m,twist_deg,section\n1,1,10,tip\n10,0.5,0,tip\n");
        Put(file, $"""
            blade = "{tables}/blade.csv"
            polars = "{tables}"
            {more}[rotor]
            blade_count = 3
            [wind]
            speeds_m_s = [6, 8, 10]
            [control]
            strategy = "fixed-speed"
            rotor_speed_rpm = 50
            pitch_deg = 0

            """);

        void Put(string name, string text)
        {
            var path = Path.Join(_folder.Path, "alone", name);
            Directory.CreateDirectory(Path.GetDirectoryName(path)!);
            File.WriteAllText(path, text);
        }
    }

    private static void Count(SortedDictionary<string, double> counted, string result, List<Dictionary<string, string>> blade, string set)
    {
        var atRest = Rows(Path.Join(result, "power-curve.csv"))
            .Where(r => Number(r["rotor_speed_rpm"]) == 0).Select(r => r["wind_speed_m_s"]).ToHashSet();
        foreach (var row in Rows(Path.Join(result, "spanwise.csv")).Where(r => !atRest.Contains(r["wind_speed_m_s"])))
        {
            var radius = Number(row["radius_m"]);
            var after = blade.FindIndex(1, r => Number(r["radius_m"]) > radius);
            var (inner, outer) = (blade[after - 1], blade[after]);
            var share = (radius - Number(inner["radius_m"])) / (Number(outer["radius_m"]) - Number(inner["radius_m"]));
            var length = Number(row["element_length_m"]) / (Number(blade[^1]["radius_m"]) - Number(blade[0]["radius_m"]));
            Add(inner["section"], length * (1 - share));
            Add(outer["section"], length * share);

            void Add(string section, double weight)
            {
                var table = $"polars/{set}/{section}.csv";
                var degree = Math.Floor(Number(row["angle_of_attack_deg"]));
                var tenth = Math.Floor(10 * Math.Log10(Number(row["reynolds"])));
                foreach (var key in (string[])[$"{table} angle_of_attack_deg {degree:0}", $"{table} reynolds {tenth:0}"])
                    counted[key] = counted.GetValueOrDefault(key) + weight;
            }
        }
    }

    private static string Bin(Dictionary<string, string> row) => row["quantity"] == "reynolds"
        ? Math.Round(10 * Math.Log10(Number(row["from"]))).ToString("0", CultureInfo.InvariantCulture)
        : row["from"];

    private static string KeyOfTable(string key) => key[..key.LastIndexOf(' ')];

    private static string[] FilesIn(string folder)
        => [.. Directory.EnumerateFiles(folder).Select(f => Path.GetFileName(f)!).Order(StringComparer.Ordinal)];

    private static List<Dictionary<string, string>> Rows(string file)
    {
        var lines = File.ReadAllLines(file).Where(line => line is [not '#', ..]).Select(line => Cells(line)).ToList();
        return [.. lines.Skip(1).Select(cells => lines[0].Zip(cells).ToDictionary(pair => pair.First, pair => pair.Second))];
    }

    // A comma within quotes parts nothing.
    private static string[] Cells(string line)
    {
        var cells = new List<string> { "" };
        var isQuoted = false;
        foreach (var c in line)
            if (c == '"')
                isQuoted = !isQuoted;
            else if (c == ',' && !isQuoted)
                cells.Add("");
            else
                cells[^1] += c;
        return [.. cells];
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    private static (int Code, string Out, string Error) Run(params string[] arguments) => Run(arguments, null, null);

    private static (int Code, string Out, string Error) Run(string[] arguments, SolveCase? solve = null, IDisk? disk = null)
    {
        using var output = new StringWriter { NewLine = "\n" };
        using var error = new StringWriter { NewLine = "\n" };
        var surroundings = new Surroundings(
            output, error, false, false, StudyReader.Read, solve ?? CaseSolver.Solve, disk ?? new Disk(), TimeProvider.System, _ => { });
        var code = CommandLine.Run(arguments, surroundings);
        return (code, output.ToString(), error.ToString());
    }
}
