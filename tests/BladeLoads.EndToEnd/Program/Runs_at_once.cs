using System.Text.RegularExpressions;
using BladeLoads.Batch.Tests.Building;

namespace BladeLoads.EndToEnd.Program;

public sealed class Runs_at_once : IDisposable
{
    private static readonly Dictionary<string, string> Nothing = [];

    private readonly TemporaryFolder _folder = new();
    private readonly string _study;
    private readonly string _results;

    public Runs_at_once()
    {
        _study = Path.Join(_folder.Path, "beck");
        _results = Path.Join(_folder.Path, "results", "beck");
        BeckStudy.Write(_study);
    }

    public void Dispose() => _folder.Dispose();

    [Theory]
    [InlineData(2)]
    [InlineData(4)]
    public void Share_the_cases_of_a_study_and_solve_each_once(int processes)
    {
        BeckStudy.AddSmallSweep(_study, HowMany.SharedCases);
        var runs = Enumerable.Range(0, processes).Select(_ => Started.With(_folder.Path, Nothing, "run", "beck")).ToList();
        var finished = runs.ConvertAll(r => r.Wait());
        runs.ForEach(r => r.Dispose());
        Assert.All(finished, f => Assert.True(f.ExitCode == 0, f.All));
        var solved = Found.TimesSolved(_results);
        Assert.Equal(HowMany.SharedCases + 3, solved.Count);
        Assert.All(solved, s => Assert.Equal(1, s.Value));
        Found.AssertAllWhole(_results);
        Assert.Equal(HowMany.SharedCases + 3, Found.CaseFolders(_results).Count());
        Assert.DoesNotContain(Directory.EnumerateFileSystemEntries(_results, ".*"), e => Path.GetFileName(e) != ".index");
    }

    [Fact]
    public void A_run_that_is_held_up_keeps_its_case_and_the_other_says_what_it_waits_for()
    {
        BeckStudy.AddGiant(_study);
        using var held = Started.With(_folder.Path, Nothing, "run", "beck", "--only", "giant");
        held.Until(() => IsClaimed("giant", attempts: 1));
        held.Signal("STOP");
        using var other = Started.With(_folder.Path, Nothing, "run", "beck");
        other.Until(() => Logs().Any(l => l.Contains($"\"Process\":{held.Id}", StringComparison.Ordinal)));
        held.Signal("CONT");
        Assert.Equal(0, held.Wait().ExitCode);
        var finished = other.Wait();
        Assert.Equal(0, finished.ExitCode);
        Assert.Contains($"Case giant: waiting for process {held.Id}, another run that is solving it\n", finished.Error, StringComparison.Ordinal);
        Assert.Contains("\n1 case solved by another run\n", finished.Out, StringComparison.Ordinal);
        Assert.Equal(4, Found.TimesSolved(_results).Values.Sum());
    }

    [Fact]
    public void A_run_of_some_cases_does_not_write_the_others_out_of_the_summary_that_were_solved_meanwhile()
    {
        BeckStudy.AddGiant(_study);
        using var some = Started.With(_folder.Path, Nothing, "run", "beck", "--only", "giant");
        some.Until(() => IsClaimed("giant", attempts: 1));
        Assert.Equal(0, Started.Run(_folder.Path, "run", "beck", "--only", "clean", "--only", "slow", "--only", "thin-air").ExitCode);
        Assert.Equal(0, some.Wait().ExitCode);
        var lines = File.ReadAllLines(Path.Join(_results, "summary.csv"));
        Assert.Equal(5, lines.Length);
        Assert.All(lines[1..], line => Assert.Contains(",current", line, StringComparison.Ordinal));
    }

    [Fact]
    public void A_case_that_takes_its_process_with_it_three_times_fails_alone()
    {
        BeckStudy.AddGiant(_study);
        for (var attempt = 1; attempt <= 3; attempt++)
        {
            using var run = Started.With(_folder.Path, Nothing, "run", "beck");
            run.Until(() => IsClaimed("giant", attempt));
            run.Signal("KILL");
            run.Wait();
        }
        var last = Started.Run(_folder.Path, "run", "beck");
        Assert.Equal(1, last.ExitCode);
        Assert.Contains(
            "Case giant failed: its process was lost three times while solving it; it is tried again when one of its values changes, "
            + "or with --all\n", last.Error, StringComparison.Ordinal);
        Assert.Equal(["clean", "slow", "thin-air"], Found.CaseFolders(_results).Select(f => Path.GetFileName(f)).Order());
        Found.AssertAllWhole(_results);
    }

    private bool IsClaimed(string name, int attempts)
    {
        try
        {
            // Not through .NET's streams, which ask for a lock of their own.
            return Regex.IsMatch(System.Text.Encoding.UTF8.GetString(
                new BladeLoads.Results.Publishing.Disk().ReadThoughLocked(Path.Join(_results, ".claims", name))), $" attempts {attempts} ");
        }
        catch (IOException)
        {
            return false;
        }
    }

    private IEnumerable<string> Logs() => Directory.Exists(Path.Join(_results, "logs"))
        ? Directory.EnumerateFiles(Path.Join(_results, "logs")).SelectMany(ReadShared) : [];

    private static List<string> ReadShared(string path)
    {
        using var file = new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite);
        using var reader = new StreamReader(file);
        return [.. reader.ReadToEnd().Split('\n')];
    }
}
