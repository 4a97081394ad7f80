using BladeLoads.Batch.Tests.Building;

namespace BladeLoads.EndToEnd.Program;

public sealed class The_report : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public The_report() => BeckStudy.Write(Path.Join(_folder.Path, "beck"));

    public void Dispose() => _folder.Dispose();

    private string Report => Path.Join(_folder.Path, "results/beck/report.html");

    [Fact]
    public void Is_written_by_a_run_stays_where_nothing_changes_and_tells_what_the_next_one_moved()
    {
        Run("run", "beck");
        var first = File.ReadAllText(Report);
        foreach (var name in new[] { "clean", "slow", "thin-air" })
            Assert.Contains($"<td>{name}</td>", first, StringComparison.Ordinal);
        Assert.DoesNotContain("What the last run that solved anything moved", first, StringComparison.Ordinal);

        var written = File.GetLastWriteTimeUtc(Report);
        Run("run", "beck");
        Assert.Equal((first, written), (File.ReadAllText(Report), File.GetLastWriteTimeUtc(Report)));

        File.WriteAllText(Report, first.Replace("<h2>Cautions</h2>", "<h2>Cautious</h2>", StringComparison.Ordinal));
        Run("run", "beck");
        Assert.Equal(first, File.ReadAllText(Report));

        BeckStudy.Case(Path.Join(_folder.Path, "beck"), "slow", "title = \"Slow\"\n[control]\nrotor_speed_rpm = 27");
        Run("run", "beck");
        var second = File.ReadAllText(Report);
        Assert.Contains("<h2>What the last run that solved anything moved</h2>", second, StringComparison.Ordinal);
        Assert.Contains("<td>largest thrust, kN</td>", second, StringComparison.Ordinal);
    }

    [Fact]
    public void Is_kept_with_the_results_it_is_of_and_with_no_others()
    {
        Run("run", "beck");
        Run("keep", "beck", "signed");
        Assert.Equal(File.ReadAllBytes(Report), File.ReadAllBytes(Path.Join(_folder.Path, "results/beck/kept/signed/report.html")));

        File.WriteAllText(Report, "another one");
        Run("keep", "beck", "later");
        Assert.False(File.Exists(Path.Join(_folder.Path, "results/beck/kept/later/report.html")));
    }

    [Fact]
    public void That_is_kept_is_verified_with_the_set()
    {
        Run("run", "beck");
        Run("keep", "beck", "signed");
        var kept = Path.Join(_folder.Path, "results/beck/kept/signed/report.html");
        File.WriteAllText(kept, File.ReadAllText(kept).Replace("<h2>Cautions</h2>", "<h2>Cautious</h2>", StringComparison.Ordinal));

        var finished = Started.Run(_folder.Path, "verify", "results/beck/kept/signed");

        Assert.Equal(1, finished.ExitCode);
        Assert.Contains("signed/report.html: report.html has other bytes than were written\n", finished.All, StringComparison.Ordinal);
    }

    [Fact]
    public void That_cannot_be_written_hides_nothing_else()
    {
        Directory.CreateDirectory(Report);
        var finished = Started.Run(_folder.Path, "run", "beck");
        Assert.Equal(3, finished.ExitCode);
        Assert.Contains("\nclean  ", finished.Out, StringComparison.Ordinal);
        Assert.Contains("a folder stands where", finished.Error, StringComparison.Ordinal);
    }

    private void Run(params string[] arguments)
    {
        var finished = Started.Run(_folder.Path, arguments);
        Assert.True(finished.ExitCode == 0, finished.ToString());
    }
}
