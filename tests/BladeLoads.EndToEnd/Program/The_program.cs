using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Publishing;

namespace BladeLoads.EndToEnd.Program;

public sealed class The_program : IDisposable
{
    private readonly TemporaryFolder _folder = new();
    private readonly string _study;
    private readonly string _results;

    public The_program()
    {
        _study = Path.Join(_folder.Path, "beck");
        _results = Path.Join(_folder.Path, "results", "beck");
        BeckStudy.Write(_study);
    }

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Solves_a_study_and_then_finds_all_current()
    {
        var first = Run("run", "beck");
        Assert.True(first.ExitCode == 0, first.All);
        Assert.StartsWith("3 cases: 3 missing; solving 3\n", first.Out, StringComparison.Ordinal);
        Assert.EndsWith($"\nresults: {_results}\nreport:  {_results}/report.html\n", first.Out, StringComparison.Ordinal);
        Assert.StartsWith("solving 3 cases with ", first.Error, StringComparison.Ordinal);
        foreach (var name in new[] { "clean", "slow", "thin-air" })
            Assert.Equal(
                ["case.log", "design-points.csv", "power-curve.csv", "receipt.json", "spanwise.csv"],
                Directory.EnumerateFiles(Path.Join(_results, name)).Select(f => Path.GetFileName(f)!).Order());
        Assert.Equal(10, File.ReadAllLines(Path.Join(_results, "clean", "power-curve.csv")).Length);
        Assert.Single(Directory.EnumerateFiles(Path.Join(_results, "logs"), "*.jsonl"));
        var before = Results();

        var second = Run("run", "beck");
        Assert.True(second.ExitCode == 0, second.All);
        Assert.StartsWith("all 3 cases are current; nothing to solve\n", second.Out, StringComparison.Ordinal);
        Assert.Equal(first.Out[first.Out.IndexOf("\ncase ", StringComparison.Ordinal)..], second.Out[second.Out.IndexOf("\ncase ", StringComparison.Ordinal)..]);
        Assert.Equal(before, Results());
    }

    [Fact]
    public void Solves_what_changed_and_nothing_else_and_says_why()
    {
        Run("run", "beck");
        BeckStudy.Case(_study, "slow", "title = \"Slow\"\n# a comment costs nothing\n[control]\nrotor_speed_rpm = 27");
        BeckStudy.Case(_study, "clean", "# a comment costs nothing\ntitle = \"Clean blades\"");
        var plan = Run("plan", "beck");
        Assert.Equal(
            "clean     current\nslow      out of date: control.rotor_speed_rpm 26 -> 27\nthin-air  current\n"
            + "3 cases: 2 current, 1 out of date; run solves 1\n", plan.Out);
        Assert.Equal(0, plan.ExitCode);
        Assert.StartsWith("3 cases: 2 current, 1 out of date; solving 1\n", Run("run", "beck").Out, StringComparison.Ordinal);
        Assert.EndsWith("3 cases: 3 current; nothing to run\n", Run("plan", "beck").Out, StringComparison.Ordinal);
    }

    [Fact]
    public void Names_the_table_that_changed()
    {
        Run("run", "beck");
        var table = Path.Join(_study, "polars/clean/beck-18.csv");
        File.WriteAllText(table, File.ReadAllText(table).Replace("\n4,", "\n4.5,", StringComparison.Ordinal));
        Assert.StartsWith("clean     out of date: polar beck-18.csv: 1 row added at 4.5 deg, 1 row removed at 4 deg\n", Run("plan", "beck").Out, StringComparison.Ordinal);
    }

    [Fact]
    public void Writes_no_escape_code_into_a_file_or_a_pipe()
    {
        BeckStudy.Case(_study, "hostile", "title = \"\\u001b[2J=1+1 <script> \\u202e\\n\"");
        foreach (var command in new[] { "check", "plan", "run", "plan" })
        {
            var finished = Run(command, "beck");
            Assert.DoesNotContain('\e', finished.All);
            Assert.DoesNotContain('\u202e', finished.All);
        }
        // Tables keep what the inputs say, and the index is no text.
        Assert.All(
            TemporaryFolder.Contents(_results).Where(f => !f.Key.EndsWith(".csv", StringComparison.Ordinal) && !f.Key.EndsWith(".index", StringComparison.Ordinal)),
            f => Assert.DoesNotContain('\e', f.Value));
    }

    [Fact]
    public void One_worker_and_several_write_the_same_bytes_in_any_culture()
    {
        Run("run", "beck", "--workers", "1");
        var german = new Dictionary<string, string> { ["LANG"] = "de_DE.UTF-8", ["LC_ALL"] = "de_DE.UTF-8" };
        Started.Run(_folder.Path, german, "run", "beck", "--workers", "3", "--results", "others");
        var tables = Tables(_results);
        Assert.Equal(10, tables.Count);
        Assert.Equal(tables, Tables(Path.Join(_folder.Path, "others", "beck")));
    }

    [Fact]
    public void Runs_the_good_cases_of_a_study_with_a_bad_one()
    {
        BeckStudy.Case(_study, "bad", "titel = \"Bad\"");
        var check = Run("check", "beck");
        Assert.Matches(@"(?m)^cases/bad\.toml:1:1: .*titel", check.Out);
        Assert.EndsWith("1 error in 1 file; bad not run, 3 others can run\n", check.Out, StringComparison.Ordinal);
        Assert.Equal(1, check.ExitCode);

        var run = Run("run", "beck");
        Assert.StartsWith("cases/bad.toml:1:1: ", run.Error, StringComparison.Ordinal);
        Assert.EndsWith("1 error in 1 file; bad not run, 3 others can run\n", run.Error, StringComparison.Ordinal);
        Assert.StartsWith("4 cases: 3 missing, 1 blocked; solving 3\n", run.Out, StringComparison.Ordinal);
        Assert.Equal(1, run.ExitCode);
        var plan = Run("plan", "beck");
        Assert.Equal(1, plan.ExitCode);
        Assert.Contains("bad       blocked: cases/bad.toml:1:1: unknown key 'titel'", plan.Out, StringComparison.Ordinal);
        Assert.Equal(1, Run("run", "beck").ExitCode);
    }

    [Fact]
    public void Says_so_where_nothing_can_run()
    {
        File.WriteAllText(Path.Join(_study, "blades/beck-20.csv"), "radius_m,chord_m,twist_deg,section\n");
        foreach (var command in new[] { "check", "plan", "run" })
        {
            var finished = Run(command, "beck");
            Assert.True(finished.ExitCode == 2, $"{command}: {finished}");
            Assert.DoesNotContain("   at ", finished.All, StringComparison.Ordinal);
        }
        Assert.False(Directory.Exists(_results));
    }

    [Fact]
    public void Solves_one_case_file_and_keeps_the_others_in_the_summary()
    {
        Run("run", "beck", "--only", "clean");
        var run = Run("run", "beck/cases/slow.toml");
        Assert.True(run.ExitCode == 0, run.All);
        Assert.StartsWith("1 case: 1 missing; solving 1\n", run.Out, StringComparison.Ordinal);
        Assert.Contains("difference to clean, %", run.Out, StringComparison.Ordinal);
        var states = File.ReadAllLines(Path.Join(_results, "summary.csv")).Skip(1).Select(l => (l.Split(',')[0], l.Split(',')[22]));
        Assert.Equal([("clean", "current"), ("slow", "current"), ("thin-air", "missing")], states);
    }

    [Fact]
    public void Keeps_to_the_cases_it_is_asked_for()
    {
        Assert.Equal(0, Run("run", "beck", "--only", "c*", "--only", "sl?w").ExitCode);
        Assert.False(Directory.Exists(Path.Join(_results, "thin-air")));
        var none = Run("run", "beck", "--only", "cleen");
        Assert.Equal(2, none.ExitCode);
        Assert.Equal("no case matches 'cleen'; the cases are clean, slow, thin-air\n", none.Error);
    }

    [Fact]
    public void Solves_all_again_when_told_to_and_nothing_moves()
    {
        Run("run", "beck");
        var before = Tables(_results);
        var again = Run("run", "beck", "--all");
        Assert.StartsWith("3 cases: 3 current; solving 3\n", again.Out, StringComparison.Ordinal);
        Assert.Equal(before, Tables(_results));
    }

    [Fact]
    public void Is_silent_when_quiet_and_all_is_well()
    {
        var quiet = Run("run", "beck", "--quiet");
        Assert.Equal(new Finished(0, "", ""), quiet);
    }

    [Fact]
    public void Finds_its_way_through_odd_names()
    {
        foreach (var odd in new[] { "[suggest]", "@a b'c", "ø 翼", "-x" })
        {
            BeckStudy.Write(Path.Join(_folder.Path, odd));
            var run = Run("run", "--results", "[odd] é", "--", odd);
            Assert.True(run.ExitCode == 0, $"{odd}: {run.All}");
            Assert.True(File.Exists(Path.Join(_folder.Path, "[odd] é", odd, "clean", "receipt.json")), odd);
        }
    }

    [Fact]
    public void Tells_in_one_line_that_results_have_nowhere_to_go()
    {
        File.WriteAllText(Path.Join(_folder.Path, "taken"), "");
        var run = Run("run", "beck", "--results", "taken");
        Assert.Equal(3, run.ExitCode);
        Assert.StartsWith($"cannot write results into {Path.Join(_folder.Path, "taken", "beck")}: ", run.Error, StringComparison.Ordinal);
        Assert.Single(run.Error.TrimEnd('\n').Split('\n'));
    }

    [Fact]
    public void Tells_in_one_line_that_its_output_cannot_be_written()
    {
        var full = Started.RunInShell(_folder.Path, "plan beck > /dev/full");
        Assert.Equal(new Finished(3, "", "cannot write the output: no room left on the disk\n"), full);
    }

    [Theory]
    [InlineData]
    [InlineData("run")]
    [InlineData("bogus")]
    [InlineData("run", "beck", "--workers", "none")]
    [InlineData("run", "beck", "--workers", "0")]
    [InlineData("run", "beck", "--sideways")]
    [InlineData("run", "nowhere")]
    [InlineData("check", "nowhere/clean.toml")]
    [InlineData("plan", "")]
    [InlineData("compare", "one")]
    [InlineData("compare", "one", "other")]
    [InlineData("keep", "beck", "signed")]
    [InlineData("verify", "beck")]
    [InlineData("tidy", "beck", "--keep-last", "some")]
    public void Refuses_wrong_use(params string[] arguments)
    {
        var finished = Run(arguments);
        Assert.True(finished.ExitCode == 2, finished.ToString());
        Assert.NotEqual("", finished.Error);
        Assert.DoesNotContain("   at ", finished.All, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("bladeloads check ", "--help")]
    [InlineData("bladeloads check ", "check", "--help")]
    [InlineData("bladeloads plan ", "plan", "--help")]
    [InlineData("bladeloads run ", "run", "--help")]
    [InlineData("bladeloads run ", "run", "-h")]
    [InlineData("bladeloads compare ", "compare", "--help")]
    [InlineData("bladeloads keep ", "keep", "--help")]
    [InlineData("bladeloads verify ", "verify", "--help")]
    [InlineData("bladeloads tidy ", "tidy", "--help")]
    public void Helps_with_examples(string example, params string[] arguments)
    {
        var help = Run(arguments);
        Assert.Equal(0, help.ExitCode);
        Assert.Contains(example, help.Out[help.Out.IndexOf("Examples:", StringComparison.Ordinal)..], StringComparison.Ordinal);
    }

    [Fact]
    public void Tells_its_version() => Assert.Matches(@"^bladeloads \d+\.\d+\.\d+, solver version \d+\n$", Run("--version").Out);

    /// <summary>All but the index, which knows better after two seconds.</summary>
    private Dictionary<string, string> Results()
        => TemporaryFolder.Contents(_results).Where(f => f.Key != ".index").ToDictionary(StringComparer.Ordinal);

    private Finished Run(params string[] arguments) => Started.Run(_folder.Path, arguments);

    /// <summary>The summary and the tables of current results, by relative path.</summary>
    private static Dictionary<string, string> Tables(string results) => TemporaryFolder.Contents(results)
        .Where(f => f.Key.EndsWith(".csv", StringComparison.Ordinal))
        .Where(f => f.Key == "summary.csv" || ResultsFolder.Objection(f.Key.Split(Path.DirectorySeparatorChar)[0]) is null)
        .ToDictionary(StringComparer.Ordinal);
}
