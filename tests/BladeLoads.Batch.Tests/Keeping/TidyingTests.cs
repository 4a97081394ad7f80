using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Keeping;
using BladeLoads.Results.Publishing;
using static BladeLoads.Batch.Tests.Building.StoredResults;

namespace BladeLoads.Batch.Tests.Keeping;

public sealed class TidyingTests : IDisposable
{
    private static readonly DateTimeOffset Now = new(2026, 2, 1, 0, 0, 0, TimeSpan.Zero);

    private static readonly string Named = new('a', 64), NamedByKept = new('b', 64), NamedByReplaced = new('c', 64), Unnamed = new('d', 64);

    private readonly TemporaryFolder _folder = new();
    private readonly ResultsFolder _results;

    // The current result of a was solved on the 20th, those it replaced on the 2nd, 5th and 15th.
    public TidyingTests()
    {
        _results = KeptSetTests.Study(_folder, "a");
        Receipt("fell/a", 20, Named);
        Receipt("fell/kept/signed/a", 1, NamedByKept);
        foreach (var (day, table) in new[] { (2, NamedByReplaced), (5, Named), (15, Named) })
            Receipt($"fell/replaced/a/202601{day:00}-000000~f", day, table);
        Directory.CreateDirectory(_results.Tables);
        foreach (var table in new[] { Named, NamedByKept, NamedByReplaced, Unnamed })
            File.WriteAllText(Path.Join(_results.Tables, table + ".csv"), "0,0\n");
    }

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Age_counts_from_when_a_result_was_replaced()
    {
        // Replaced on the 5th, 15th and 20th: 27, 17 and 12 days before the first of February.
        Assert.Equal([2, 5, 15], Days(null, 0));
        Assert.Equal([2, 5], Days(TimeSpan.FromDays(16.9), 0));
        Assert.Equal([2], Days(TimeSpan.FromDays(17.1), 0));
        Assert.Empty(Days(TimeSpan.FromDays(28), 0));
    }

    [Fact]
    public void The_last_of_each_case_stay_whatever_their_age()
    {
        Assert.Equal([2], Days(null, 2));
        Assert.Equal([2], Days(TimeSpan.FromDays(16.9), 2));
        Assert.Empty(Days(null, 3));
    }

    [Fact]
    public void A_result_goes_and_everything_else_stays()
    {
        var before = TemporaryFolder.Contents(_results.Study);
        var tidying = Tidying.Plan(_results, null, 2, Now);
        Assert.Equal(before, TemporaryFolder.Contents(_results.Study));
        Assert.Equal((1, 2, 2), (tidying.Results.Length, tidying.Staying, tidying.Tables.Length));
        Assert.True(tidying.Remove(_results, new Disk()));
        var after = TemporaryFolder.Contents(_results.Study);
        var gone = before.Where(f => !after.ContainsKey(f.Key)).ToList();
        Assert.All(gone, f => Assert.True(
            f.Key.StartsWith("replaced/a/20260102", StringComparison.Ordinal) || f.Key == $"tables/{NamedByReplaced}.csv" || f.Key == $"tables/{Unnamed}.csv", f.Key));
        Assert.Equal(4, gone.Count);
        Assert.Equal(gone.Sum(f => f.Value.Length), tidying.Bytes);
        Assert.All(after, f => Assert.Equal(before[f.Key], f.Value));
    }

    [Fact]
    public void Tables_of_current_kept_and_staying_results_stay()
        => Assert.Equal([Unnamed], Tidying.Plan(_results, TimeSpan.FromDays(90), 0, Now).Tables.Select(t => Path.GetFileNameWithoutExtension(t.File)));

    [Fact]
    public void Nothing_is_removed_while_a_run_writes_there()
    {
        var tidying = Tidying.Plan(_results, null, 0, Now);
        using (Publisher.Open(_results, new Disk()))
            Assert.False(tidying.Remove(_results, new Disk()));
        Assert.Equal(3, ReplacedResult.All(_results).Length);
        Assert.True(tidying.Remove(_results, new Disk()));
        Assert.Empty(ReplacedResult.All(_results));
        Assert.False(Directory.Exists(_results.ReplacedOf("a")));
    }

    [Fact]
    public void A_result_that_nothing_newer_replaced_counts_from_when_it_moved()
    {
        Receipt("fell/a", 3, Named);   // an older one was brought back
        Directory.SetLastWriteTimeUtc(_results.ReplacedOf("a"), new DateTime(2026, 1, 31, 0, 0, 0, DateTimeKind.Utc));
        Assert.Equal([2, 5], Days(TimeSpan.FromDays(10), 0));
    }

    private List<int> Days(TimeSpan? olderThan, int keepLast)
        => [.. Tidying.Plan(_results, olderThan, keepLast, Now).Results.Select(r => r.Result.SolvedAt.Day).Order()];

    private void Receipt(string place, int day, string table) => WriteReceipt(
        WriteCurve(_folder, place, new Point(8, 1)), "a", 10, new Dictionary<string, int>(), day: day,
        values: new Dictionary<string, string> { ["section.fell-30"] = table });
}
