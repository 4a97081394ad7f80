using BladeLoads.Batch.Tests.Building;
using BladeLoads.Batch.Work;
using BladeLoads.Commands;
using BladeLoads.Results.Publishing;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.EndToEnd.InProcess;

public sealed class Commands_with_an_invented_solver : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void The_summary_has_a_row_a_case_and_the_differences_to_the_baseline()
    {
        var study = Study("clean", "sweep~density_kg_m3-1.05~fine_pitch_deg--1.5~min_rotor_speed-8") with { Baseline = "clean" };
        var (code, text, _) = Run(study);
        Assert.Equal(0, code);
        Assert.Equal($"""
            2 cases: 2 missing; solving 2

            case                                                            best cp  at TSR  power kW  rated m/s  thrust kN  at m/s  flapwise kNm
            clean                                                           0.3900   31.00     2.700      2.500      6.000   3.000         5.900
            sweep~density_kg_m3-1.05~fine_pitch_deg--1.5~min_rotor_speed-8  0.3900   31.00     2.700      2.500      6.000   3.000         5.900
            power: largest electrical; thrust, flapwise moment at the blade root: largest; marks with their points

            difference to clean, %
            case                                                            best cp     power     rated    thrust  flapwise
            sweep~density_kg_m3-1.05~fine_pitch_deg--1.5~min_rotor_speed-8     0.00      0.00      0.00      0.00      0.00

            steady, characteristic, unfactored, without weight; no design envelope (each receipt.json says more)
            results: {Path.Join(_folder.Path, "fell")}
            report:  {Path.Join(_folder.Path, "fell", "report.html")}

            """, text);
    }

    [Fact]
    public void Points_without_a_balance_make_the_exit_code_1_when_solved_and_when_current()
    {
        SolveCase solve = (rotor, _) => FellRotor.Curve(rotor, PointMarks.Unbalanced);
        var first = Run(Study("clean"), solve: solve);
        Assert.Equal(1, first.Code);
        Assert.Contains("  unbalanced:3\n", first.Out, StringComparison.Ordinal);
        Assert.Contains(
            "Case clean: no inflow angle balances blade force and momentum at 3 of 3 points; they are marked 'unbalanced' and left blank\n",
            first.Error, StringComparison.Ordinal);
        var second = Run(Study("clean"), solve: solve);
        Assert.Equal(1, second.Code);
        Assert.StartsWith("the case is current; nothing to solve\n", second.Out, StringComparison.Ordinal);
    }

    [Fact]
    public void A_case_that_fails_makes_the_exit_code_1_and_is_tried_again()
    {
        var (code, text, error) = Run(Study("a", "b"), solve: (_, _) => throw new InvalidOperationException("loss factor 1.0003"));
        Assert.Equal(1, code);
        Assert.Contains("Case a failed: fault in BladeLoads, please report: loss factor 1.0003\n", error, StringComparison.Ordinal);
        Assert.DoesNotContain("   at ", text + error, StringComparison.Ordinal);
        Assert.StartsWith("2 cases: 2 failed; solving 2\n", Run(Study("a", "b")).Out, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(28, "no room left on the disk")]
    [InlineData(30, "the file system is read-only")]
    [InlineData(13, "no permission to write")]
    [InlineData(122, "the disk quota is used up")]
    [InlineData(5, "the disk reports an input/output error")]
    public void A_disk_that_takes_no_more_is_told_in_one_line_with_exit_code_3(int errno, string reason)
    {
        var (code, text, error) = Run(Study("a", "b", "c"), disk: new FailingDisk(1, () => new IOException("x", errno)));
        Assert.Equal(3, code);
        Assert.EndsWith($"\ncannot write results into {Path.Join(_folder.Path, "fell")}: {reason}; 3 cases not run\n", error, StringComparison.Ordinal);
        Assert.Equal("3 cases: 3 missing; solving 3\n", text);
        Assert.False(File.Exists(Path.Join(_folder.Path, "fell", "summary.csv")));
    }

    [Fact]
    public void A_fault_of_ours_is_one_line_and_exit_code_70()
    {
        var (code, text, error) = Run(() => throw new InvalidOperationException("odd\e[2J"));
        Assert.Equal(70, code);
        Assert.Equal("", text);
        Assert.Equal("fault in BladeLoads, please report: odd\\u001b[2J\n", error);
    }

    [Fact]
    public void A_fault_during_a_run_stands_with_its_details_in_the_log()
    {
        var studyCase = FellRotor.Case("a");
        var twice = FellRotor.Study(studyCase, studyCase);   // two cases of one name cannot come from a study's folder
        var (code, _, error) = Run(twice);
        Assert.Equal(70, code);
        Assert.Single(error.Split('\n'), line => line.StartsWith("fault in BladeLoads, please report: ", StringComparison.Ordinal));
        var log = File.ReadAllText(Directory.EnumerateFiles(Path.Join(_folder.Path, "fell", "logs")).Single());
        Assert.Contains("   at ", log, StringComparison.Ordinal);
    }

    [Fact]
    public void Errors_and_doubts_are_told_in_file_order_with_their_places()
    {
        var study = FellRotor.Study(FellRotor.Case("good")) with
        {
            Rejected = ["bad", "worse"],
            Errors = [new("cases/bad.toml", 14, 1, "unknown key 'tip_speed'"), new("cases/worse.toml", 0, 0, "is empty")],
            Doubts = [new("cases/bad.toml", 15, 3, "a doubt"), new("blades/fell.csv", 3, 0, "another")],
        };
        var (code, text, _) = Run(study, "check");
        Assert.Equal(1, code);
        Assert.Equal("""
            cases/bad.toml:14:1: unknown key 'tip_speed'
            cases/bad.toml:15:3: doubt: a doubt
            cases/worse.toml: is empty
            blades/fell.csv:3: doubt: another
            2 errors in 2 files, 2 doubts; bad, worse not run, 1 other can run

            """, text);
    }

    [Fact]
    public void On_a_terminal_the_line_stands_below_its_error_with_a_caret()
    {
        File.WriteAllText(Path.Join(_folder.Path, "bad.toml"), "[control]\n\ttip_speed = 7\e # much too fast\n");
        var study = FellRotor.Study() with
        {
            Folder = _folder.Path,
            Rejected = ["bad"],
            Errors = [new("bad.toml", 2, 2, "unknown key 'tip_speed' in [control]")],
        };
        var (code, text, _) = Run(() => study, "check", isTerminal: true);
        Assert.Equal(2, code);
        Assert.Equal("""
            bad.toml:2:2: unknown key 'tip_speed' in [control]
                 tip_speed = 7\u001b # much too fast
                 ^
            1 error in 1 file; bad not run, nothing can run

            """, text);
    }

    private static Study Study(params string[] names) => FellRotor.Study([.. names.Select(n => FellRotor.Case(n))]);

    private (int Code, string Out, string Error) Run(Study study, string command = "run", SolveCase? solve = null, IDisk? disk = null)
        => Run(() => study, command, solve, disk);

    private (int Code, string Out, string Error) Run(
        Func<Study> study, string command = "run", SolveCase? solve = null, IDisk? disk = null, bool isTerminal = false)
    {
        using var output = new StringWriter { NewLine = "\n" };
        using var error = new StringWriter { NewLine = "\n" };
        var surroundings = new Surroundings(
            output, error, isTerminal, false, _ => study(), solve ?? ((rotor, _) => FellRotor.Curve(rotor)), disk ?? new Disk(),
            TimeProvider.System, _ => { });
        string[] results = command == "check" ? [] : ["--results", _folder.Path];
        var code = CommandLine.Run([command, "fell", .. results], surroundings);
        return (code, output.ToString(), error.ToString());
    }
}
