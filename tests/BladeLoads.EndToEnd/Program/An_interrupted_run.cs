using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Publishing;

namespace BladeLoads.EndToEnd.Program;

public sealed class An_interrupted_run : IDisposable
{
    private readonly TemporaryFolder _folder = new();
    private readonly string _results;

    public An_interrupted_run()
    {
        var study = Path.Join(_folder.Path, "beck");
        _results = Path.Join(_folder.Path, "results", "beck");
        BeckStudy.Write(study);
        BeckStudy.AddLongSweep(study);
    }

    public void Dispose() => _folder.Dispose();

    [Theory]
    [InlineData("TERM", 143)]
    [InlineData("INT", 130)]
    public void Leaves_whole_results_only_and_says_what_remains(string signal, int exitCode)
    {
        using var run = Started.With(_folder.Path, new Dictionary<string, string>(), "run", "beck");
        run.Until(HasResults);
        run.Signal(signal);
        var finished = run.Wait();
        Assert.Equal(exitCode, finished.ExitCode);
        Assert.Matches(@"(?m)^stopped: \d+ cases? solved, \d+ not run; the same command goes on from here$", finished.Error);
        Assert.Empty(Hidden());
        AssertOnlyWholeResults();
    }

    [Fact]
    public void Can_be_killed_at_any_time_and_the_next_run_goes_on()
    {
        using var run = Started.With(_folder.Path, new Dictionary<string, string>(), "run", "beck");
        run.Until(HasResults);
        run.Signal("KILL");
        Assert.Equal(137, run.Wait().ExitCode);
        AssertOnlyWholeResults();
        Assert.Equal(0, Started.Run(_folder.Path, "run", "beck", "--only", "clean", "--only", "slow", "--all").ExitCode);
        Assert.Empty(Hidden());
    }

    [Fact]
    public void Leaves_nothing_hidden_behind_once_all_is_current()
    {
        Assert.Equal(0, Started.Run(_folder.Path, "run", "beck", "--only", "clean").ExitCode);
        Directory.CreateDirectory(Path.Join(_results, ".slow.0123456789ab-1.new"));   // as a killed run leaves it
        Assert.Equal(0, Started.Run(_folder.Path, "run", "beck", "--only", "clean").ExitCode);
        Assert.Empty(Hidden());
    }

    [Fact]
    public void Two_runs_at_once_spoil_nothing()
    {
        string[] command = ["run", "beck", "--all", "--only", "long~density_kg_m3-1.00*"];   // 19 variants
        using var one = Started.With(_folder.Path, new Dictionary<string, string>(), command);
        using var other = Started.With(_folder.Path, new Dictionary<string, string>(), command);
        Assert.Equal((0, 0), (one.Wait().ExitCode, other.Wait().ExitCode));
        Assert.Empty(Hidden());
        AssertOnlyWholeResults();
    }

    private bool HasResults() => Directory.Exists(_results) && Directory.EnumerateDirectories(_results, "long~*").Skip(2).Any();

    // The claims of cases whose process was lost stay until those are solved.
    private IEnumerable<string> Hidden()
        => Directory.EnumerateFileSystemEntries(_results, ".*").Where(e => Path.GetFileName(e) is not ".claims" and not ".index");

    private void AssertOnlyWholeResults()
    {
        var plan = Started.Run(_folder.Path, "plan", "beck").Out.TrimEnd('\n').Split('\n');
        var solved = Directory.EnumerateDirectories(_results).Count(f => ResultsFolder.Objection(Path.GetFileName(f)) is null);
        Assert.Equal(403, plan.Length - 1);
        Assert.Equal(solved, plan.Count(l => l.EndsWith("  current", StringComparison.Ordinal)));
        Assert.Equal(403 - solved, plan.Count(l => l.EndsWith("  missing: no result yet", StringComparison.Ordinal)));
    }
}
