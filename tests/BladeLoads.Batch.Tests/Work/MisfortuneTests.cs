using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Tests.Work;

/// <summary>Whatever befalls a run at whichever of its effects on the disk: no half result is ever visible, and the next run carries on.</summary>
public class MisfortuneTests
{
    // A result that is out of date; one that is not there yet, and one that failed before.
    private static StudyCase[] Before => [FellRotor.Case("b", values: ("pitch", "1"))];

    private static StudyCase[] Now =>
        [FellRotor.Case("a"), FellRotor.Case("b", FellRotor.Rotor(windSpeeds: 2), values: ("pitch", "2")), FellRotor.Case("d")];

    [Theory]
    [InlineData(Misfortune.Killed, true)]
    [InlineData(Misfortune.Killed, false)]
    [InlineData(Misfortune.RefusedFromThenOn, true)]
    [InlineData(Misfortune.Refused, false)]
    internal void At_whichever_effect_it_strikes_every_visible_result_is_whole_and_the_next_run_carries_on(
        Misfortune misfortune, bool canExchange)
    {
        using var prepared = new TemporaryFolder(inMemory: true);
        Prepare(Runs.Results(prepared));
        using var undisturbed = new TemporaryFolder(inMemory: true);
        prepared.CopyTo(undisturbed);
        Assert.Equal(Now.Length, Runs.Solve(Runs.Results(undisturbed), Now, workers: 1).Solved);
        var expected = Visible(Runs.Results(undisturbed));

        var hasSucceeded = false;
        for (var n = 1; !hasSucceeded; n++)
        {
            using var folder = new TemporaryFolder(inMemory: true);
            prepared.CopyTo(folder);
            var results = Runs.Results(folder);
            var disk = new MisfortuneDisk(n, misfortune, canExchange);
            var done = SolveUntil(disk, results);
            hasSucceeded = !disk.HasStruck;
            var strike = $"{misfortune} at {n}, {(canExchange ? "with" : "without")} exchange";

            Assert.True(AreWhole(results), strike);
            Assert.True(OldOnesAreKept(results, allowHidden: true), strike);
            Assert.All(done, name => Assert.True(IsCurrent(results, name), $"{name} was done, and is not current: {strike}"));

            var next = Runs.Solve(results, [.. Now.Where(c => !IsCurrent(results, c.Name))], workers: 1);
            Assert.True(next.NoRoom is null && next.Failed == 0 && next.NotRun == 0 && next.Faults.IsEmpty, strike);
            Assert.Equal(expected, Visible(results));
            Assert.True(OldOnesAreKept(results, allowHidden: false), strike);
            Assert.All(
                Directory.EnumerateFileSystemEntries(results.Study), e => Assert.False(Path.GetFileName(e).StartsWith('.'), $"{e}: {strike}"));
            Assert.True(n < 500, "never succeeds");
        }
    }

    [Fact]
    public void A_disk_that_takes_no_more_stops_the_run_fails_no_case_and_counts_no_attempt()
    {
        var hasSucceeded = false;
        for (var n = 1; !hasSucceeded; n++)
        {
            using var folder = new TemporaryFolder(inMemory: true);
            var results = Runs.Results(folder);
            // Full for everything that needs room; what is there can be deleted still, as on a real disk.
            var disk = new FailingDisk(n);
            try
            {
                var result = Runs.Solve(results, Now, workers: 1, disk: disk);
                hasSucceeded = !disk.HasRefused;
                Assert.Equal((0, 0), (result.Failed, result.Faults.Length));
                Assert.Equal(hasSucceeded ? null : $"cannot write results into {results.Study}: no room left on the disk", result.NoRoom);
            }
            catch (NoRoomForResultsException)
            {
            }
            Assert.False(Directory.Exists(results.Claims));
            Assert.False(Directory.Exists(results.Failures));
        }
    }

    private static void Prepare(ResultsFolder results)
    {
        Runs.Solve(results, Before, workers: 1);
        Runs.Solve(results, [FellRotor.Case("d")], (_, _) => throw new InvalidOperationException("odd"), workers: 1);
    }

    /// <summary>The names of the cases that the run called done.</summary>
    private static List<string> SolveUntil(MisfortuneDisk disk, ResultsFolder results)
    {
        try
        {
            return [.. Runs.Solve(results, Now, workers: 1, disk: disk).Outcomes.Where(o => o.Value is CaseOutcome.Solved).Select(o => o.Key)];
        }
        catch (Exception e) when (e is KilledException or NoRoomForResultsException)
        {
            return [];
        }
    }

    private static bool IsCurrent(ResultsFolder results, string name)
        => StudyPlan.Make(FellRotor.Study(Now), results, 1).Cases.Single(c => c.Case.Name == name).State is CaseState.Current;

    private static bool AreWhole(ResultsFolder results) => Directory.EnumerateDirectories(results.Study)
        .Where(f => Path.GetFileName(f) is not ['.', ..] and not "logs" and not "failures" and not "replaced")
        .All(f => ResultCheck.Of(f).IsEmpty);

    // The results of before: in their place, among the replaced ones, or under a hidden name until the next run.
    private static bool OldOnesAreKept(ResultsFolder results, bool allowHidden)
    {
        var folders = Directory.EnumerateDirectories(results.Study, "*", SearchOption.AllDirectories)
            .Where(f => allowHidden || !Path.GetRelativePath(results.Study, f).StartsWith('.'))
            .Select(f => (Folder: f, Receipt: (ReceiptFile.Read(f) as ReceiptReading.Readable)?.Receipt))
            .Where(f => f.Receipt is not null && ResultCheck.IsWhole(f.Folder, f.Receipt))
            .Select(f => f.Receipt!.Fingerprint)
            .ToHashSet(StringComparer.Ordinal);
        return Before.All(c => folders.Contains(c.Fingerprint));
    }

    // Tables alone: receipts and logs have times in them.
    private static Dictionary<string, string> Visible(ResultsFolder results) => TemporaryFolder.Contents(results.Study)
        .Where(f => f.Key.EndsWith(".csv", StringComparison.Ordinal) && !f.Key.StartsWith("replaced", StringComparison.Ordinal))
        .ToDictionary(StringComparer.Ordinal);
}
