using BladeLoads.Batch.Tests.Building;
using BladeLoads.Batch.Work;
using BladeLoads.Commands;
using BladeLoads.Results.Publishing;

namespace BladeLoads.EndToEnd.InProcess;

public sealed class Keeping_and_comparing : IDisposable
{
    private readonly TemporaryFolder _folder = new();
    private double _factor = 1;
    private string[] _cases = ["clean", "slow"];
    private string _density = "1.225";

    private ResultsFolder Results => Runs.Results(_folder);

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_rerun_tells_what_moved_with_units_and_signs()
    {
        Run("run", "fell");
        _density = "1.05";
        _factor = 1.1;
        var (code, text, _) = Run("run", "fell");
        Assert.Equal(0, code);
        Assert.EndsWith($"""

            what moved, % of the result before
            case   best cp  rated  power  thrust  out-of-plane  in-plane  flapwise  edgewise
            clean     0.00   0.00   0.00  +10.00          0.00      0.00      0.00      0.00
            slow      0.00   0.00   0.00  +10.00          0.00      0.00      0.00      0.00

            clean (air.density_kg_m3 1.225 -> 1.05)
                                                   old  at m/s     new  at m/s  difference       %
              largest thrust, kN                6.0000    3.00  6.6000    3.00     +0.6000  +10.00
              thrust where it changed most, kN  6.0000    3.00  6.6000    3.00     +0.6000  +10.00
              8 figures unchanged

            slow (air.density_kg_m3 1.225 -> 1.05)
                                                   old  at m/s     new  at m/s  difference       %
              largest thrust, kN                6.0000    3.00  6.6000    3.00     +0.6000  +10.00
              thrust where it changed most, kN  6.0000    3.00  6.6000    3.00     +0.6000  +10.00
              8 figures unchanged

            changes: {Results.Changes}

            """, text, StringComparison.Ordinal);
    }

    [Fact]
    public void A_first_run_tells_of_no_changes_on_the_screen()
        => Assert.DoesNotContain("what moved", Run("run", "fell").Out, StringComparison.Ordinal);

    [Fact]
    public void A_kept_set_is_compared_by_its_name()
    {
        Run("run", "fell");
        var kept = Run("keep", "fell", "signed");
        Assert.Equal((0, $"kept 2 cases as 'signed'\nset: {Results.KeptAs("signed")}\n"), (kept.Code, kept.Out));
        _factor = 0.5;
        Run("run", "fell", "--all", "--only", "slow");
        var (code, text, error) = Run("compare", "signed", "fell");
        Assert.Equal((0, ""), (code, error));
        Assert.Equal($"""

            what moved from fell/kept/signed to fell, %
            1 case compared: no figure, no mark and no wind speed differs

            slow
                                                   old  at m/s     new  at m/s  difference       %
              largest thrust, kN                6.0000    3.00  3.0000    3.00     -3.0000  -50.00
              thrust where it changed most, kN  6.0000    3.00  3.0000    3.00     -3.0000  -50.00
              8 figures unchanged

            steady, characteristic, unfactored, without weight; no design envelope (each receipt.json says more)

            """, text);
        Assert.Equal("\nwhat moved from fell/kept/signed to fell, %\n2 cases moved by no more than 50 %\n", Run("compare", "signed", "fell", "--more-than", "50").Out[..80]);
        Assert.Contains("\"difference_percent\": -50", Run("compare", "signed", "slow", "--json").Out, StringComparison.Ordinal);
        var csv = Path.Join(_folder.Path, "moved.csv");
        Assert.Equal(0, Run("compare", "clean", "slow", "--csv", csv).Code);
        Assert.Contains("slow,clean,compared,largest thrust,kN,6,3,3,3,-3,-50,,rotor.name clean -> slow\n", File.ReadAllText(csv), StringComparison.Ordinal);
        Assert.Equal(3, Run("compare", "clean", "slow", "--csv", Path.Join(_folder.Path, "nowhere", "moved.csv")).Code);
    }

    [Fact]
    public void What_is_not_current_is_kept_only_as_it_is()
    {
        Run("run", "fell");
        _cases = ["clean", "new", "slow"];
        var (code, text, error) = Run("keep", "fell", "signed");
        Assert.Equal((1, ""), (code, text));
        Assert.Equal("""
            new: missing
            not kept: 1 case of 3 not current; run the study first, or keep what is there with --as-it-is

            """, error);
        Assert.StartsWith("kept 2 cases as 'signed' (1 missing)\n", Run("keep", "fell", "signed", "--as-it-is").Out, StringComparison.Ordinal);
        Assert.Equal(2, Run("keep", "fell", "signed", "--as-it-is").Code);
        Assert.Equal(0, Run("keep", "fell", "signed", "--as-it-is", "--replace").Code);
        Assert.Equal(2, Run("keep", "fell", "slow", "--as-it-is").Code);
        Assert.Equal(2, Run("keep", "fell", "a/b", "--as-it-is").Code);
    }

    [Fact]
    public void Names_that_mean_nothing_or_too_much_are_refused_with_what_there_is()
    {
        Assert.StartsWith("no results named 'clean': ", Run("compare", "clean", "slow").Error, StringComparison.Ordinal);
        Run("run", "fell");
        var (code, _, error) = Run("compare", "cleen", "slow");
        Assert.Equal((2, $"no results named 'cleen'; in '{_folder.Path}' there are fell/clean, fell/slow\n"), (code, error));
        Assert.Equal(2, Run("compare", "../fell", "slow").Code);
        Assert.Equal(2, Run("compare", "clean", "slow", "--more-than", "-1").Code);
        Assert.Equal(2, Run("compare", "fell", "fell", "--only", "x").Code);
        Directory.CreateDirectory(Path.Join(_folder.Path, "other"));
        Directory.Move(Results.Case("clean"), Path.Join(_folder.Path, "other", "slow"));
        Assert.Equal(
            $"'slow' can mean 'fell/slow' or 'other/slow' in '{_folder.Path}'; name the one that is meant\n", Run("compare", "slow", "fell").Error);
        Assert.Equal(0, Run("compare", "other/slow", "fell/slow").Code);
    }

    [Fact]
    public void Verify_tells_what_is_not_as_written_and_has_it_solved_again()
    {
        Run("run", "fell");
        Assert.Equal((0, "2 results verified: all as written\n"), Verify());
        var log = Path.Join(Results.Case("slow"), "case.log");
        File.WriteAllText(log, File.ReadAllText(log).Replace('e', 'E'));
        Assert.Equal((1, """
            slow: case.log has other bytes than were written
            2 results verified: 1 not as written
            to have 1 case solved again: bladeloads verify fell --set-aside, and run the study

            """), Verify());
        Assert.EndsWith("1 damaged result moved to replaced/ with what is left of it; the next run solves its case again\n", Verify("--set-aside").Out, StringComparison.Ordinal);
        Assert.StartsWith("2 cases: 1 current, 1 missing; solving 1\n", Run("run", "fell").Out, StringComparison.Ordinal);
        Assert.Equal((0, "2 results verified: all as written\n"), Verify());

        (int Code, string Out) Verify(params string[] more) => Run(["verify", "fell", .. more]) is var (code, text, _) ? (code, text) : default;
    }

    [Fact]
    public void Tidy_says_first_and_removes_when_told_to()
    {
        Run("run", "fell");
        Run("run", "fell", "--all");
        Assert.Equal("nothing to tidy: 2 replaced results stay\n", Run("tidy", "fell").Out);
        var said = Run("tidy", "fell", "--keep-last", "0");
        Assert.Matches(@"^case   replaced results      solved    replaced    room\nclean                 1  [-0-9]{10}  [-0-9]{10}  \d\.\d kB\nslow ", said.Out);
        Assert.EndsWith("2 replaced results; none stays\nnothing removed; --yes removes it\n", said.Out, StringComparison.Ordinal);
        Assert.EndsWith("nothing removed\n", Run(_ => false, "tidy", "fell", "--keep-last", "0").Out, StringComparison.Ordinal);
        Assert.Equal(2, ReplacedResult.All(Results).Length);
        Assert.EndsWith(" kB freed\n", Run(_ => true, "tidy", "fell", "--keep-last", "0").Out, StringComparison.Ordinal);
        Assert.Empty(ReplacedResult.All(Results));
        Assert.Equal(0, Run("plan", "fell").Code);
        Run("run", "fell", "--all");
        Assert.EndsWith(" kB freed\n", Run("tidy", "fell", "--older-than", "0h", "--yes").Out, StringComparison.Ordinal);
        Assert.Equal(2, Run("tidy", "fell", "--older-than", "30").Code);
        Assert.Equal(2, Run("tidy", "elsewhere").Code);
    }

    private (int Code, string Out, string Error) Run(params string[] arguments) => Run(null, arguments);

    private (int Code, string Out, string Error) Run(Func<string, bool>? ask, params string[] arguments)
    {
        using var output = new StringWriter { NewLine = "\n" };
        using var error = new StringWriter { NewLine = "\n" };
        var study = FellRotor.Study([.. _cases.Select(n => FellRotor.Case(n, values: [("air.density_kg_m3", _density), ("rotor.name", n)]))]);
        SolveCase solve = (rotor, _) => FellRotor.Scaled(FellRotor.Curve(rotor), _factor);
        var surroundings = new Surroundings(output, error, false, false, _ => study, solve, new Disk(), TimeProvider.System, _ => { }) { Ask = ask };
        var code = CommandLine.Run([.. arguments, "--results", _folder.Path], surroundings);
        return (code, output.ToString(), error.ToString());
    }
}
