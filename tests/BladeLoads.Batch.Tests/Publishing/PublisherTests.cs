using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;

namespace BladeLoads.Batch.Tests.Publishing;

public class PublisherTests
{
    private static readonly ResultContent[] Old =
        [new("a.csv", "old a"u8.ToArray()), new("b.csv", "old b"u8.ToArray()), new("c.csv", "old c"u8.ToArray()), Receipt("old")];

    private static readonly ResultContent[] New = [new("a.csv", "new a"u8.ToArray()), new("b.csv", "new b"u8.ToArray()), Receipt("new")];

    private static readonly ResultContent[] WholeOld =
        [new("a.csv", "old a"u8.ToArray()), Receipt("old", ResultFile.Of("a.csv", "old a"u8))];

    [Theory]
    [InlineData(true, true)]
    [InlineData(true, false)]
    [InlineData(false, true)]
    [InlineData(false, false)]
    public void Whichever_step_the_disk_refuses_the_old_result_or_the_new_one_is_there_whole(bool hasOld, bool canExchange)
    {
        var hasSucceeded = false;
        for (var n = 1; !hasSucceeded; n++)
        {
            using var folder = new TemporaryFolder();
            var results = Runs.Results(folder);
            if (hasOld)
                Publish(results, Old, new Disk());
            var disk = new FailingDisk(n, canExchange: canExchange);
            var isPublished = false;
            try
            {
                Publish(results, New, disk);
                isPublished = true;   // setting the old result aside may have been refused: the next run does that
                hasSucceeded = !disk.HasRefused;
            }
            catch (IOException)
            {
                Assert.True(disk.HasRefused);
            }
            // The next run tidies up, and finds what a person would find.
            using (Publisher.Open(results, new Disk())) { }
            var found = TemporaryFolder.Contents(results.Case("clean"));
            var whole = isPublished ? [New] : new[] { hasOld ? Old : [], New };
            Assert.Contains(found, whole.Select(Contents));
            if (hasOld)
                Assert.Contains(Contents(Old), ReplacedResult.All(results).Select(r => TemporaryFolder.Contents(r.Folder)).Append(found));
            Assert.All(Directory.EnumerateFileSystemEntries(results.Study), e => Assert.False(Path.GetFileName(e).StartsWith('.'), e));
            Assert.True(n < 50, "never succeeds");
        }
    }

    [Fact]
    public void Steps_that_are_refused_once_alone_leave_a_whole_result_too()
    {
        for (var n = 1; n <= 9; n++)
        {
            using var folder = new TemporaryFolder();
            var results = Runs.Results(folder);
            Publish(results, Old, new Disk());
            try
            {
                Publish(results, New, new FailingDisk(n, canExchange: n % 2 == 0, only: true));
            }
            catch (IOException)
            {
            }
            Assert.Contains(TemporaryFolder.Contents(results.Case("clean")), new[] { Old, New }.Select(Contents));
        }
    }

    [Fact]
    public void What_a_killed_run_left_unfinished_is_removed_by_the_next()
    {
        using var folder = new TemporaryFolder();
        var results = Runs.Results(folder);
        var left = Path.Join(results.Study, ".clean.0123456789ab-1.new");
        Directory.CreateDirectory(left);
        File.WriteAllText(Path.Join(left, "a.csv"), "half");
        File.WriteAllText(Path.Join(results.Study, ".run-0123456789ab.lock"), "");
        using (Publisher.Open(results, new Disk())) { }
        Assert.Empty(Directory.EnumerateFileSystemEntries(results.Study));
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void What_a_rerun_replaces_moves_to_the_replaced_results_whole(bool canExchange)
    {
        using var folder = new TemporaryFolder();
        var results = Runs.Results(folder);
        Publish(results, Old, new Disk());
        Publish(results, New, new FailingDisk(0, canExchange: canExchange));
        Publish(results, Old, new FailingDisk(0, canExchange: canExchange));
        var replaced = ReplacedResult.Of(results, "clean");
        Assert.Equal(["19700101-000000~f-2", "19700101-000000~f"], replaced.Select(r => Path.GetFileName(r.Folder)));
        Assert.All(replaced, r => Assert.Equal(("clean", DateTime.UnixEpoch, "f"), (r.Case, r.SolvedAt, r.FingerprintStart)));
        Assert.Equal([Contents(New), Contents(Old)], replaced.Select(r => TemporaryFolder.Contents(r.Folder)));
        Assert.Equal(["clean", "replaced"], Directory.EnumerateFileSystemEntries(results.Study).Select(e => Path.GetFileName(e)).Order());
    }

    [Fact]
    public void A_whole_result_under_a_hidden_name_of_a_killed_run_goes_to_the_replaced_ones_and_half_a_one_is_removed()
    {
        using var folder = new TemporaryFolder();
        var results = Runs.Results(folder);
        Publish(results, New, new Disk());
        foreach (var (number, cut) in new[] { (1, 0), (2, 1) })
        {
            var left = Path.Join(results.Study, $".clean.0123456789ab-{number}.new");
            Directory.CreateDirectory(left);
            foreach (var file in WholeOld)
                File.WriteAllBytes(Path.Join(left, file.Name), file.Name == "a.csv" ? file.Bytes[..^cut].ToArray() : file.Bytes.ToArray());
        }
        using (Publisher.Open(results, new Disk())) { }
        Assert.Equal(Contents(New), TemporaryFolder.Contents(results.Case("clean")));
        Assert.Equal(Contents(WholeOld), TemporaryFolder.Contents(Assert.Single(ReplacedResult.All(results)).Folder));
        Assert.DoesNotContain(Directory.EnumerateFileSystemEntries(results.Study), e => Path.GetFileName(e).StartsWith('.'));
    }

    [Fact]
    public void What_a_living_run_is_writing_is_left_alone()
    {
        using var folder = new TemporaryFolder();
        var results = Runs.Results(folder);
        Directory.CreateDirectory(results.Study);
        using var held = new Disk().TryLock(Path.Join(results.Study, ".run-0123456789ab.lock"));
        var left = Path.Join(results.Study, ".clean.0123456789ab-1.new");
        Directory.CreateDirectory(left);
        using (Publisher.Open(results, new Disk())) { }
        Assert.True(Directory.Exists(left));
    }

    [Fact]
    public void Hidden_files_that_are_not_ours_are_left_alone()
    {
        using var folder = new TemporaryFolder();
        var results = Runs.Results(folder);
        Directory.CreateDirectory(results.Study);
        var theirs = Path.Join(results.Study, ".notes.new");
        File.WriteAllText(theirs, "mine");
        using (Publisher.Open(results, new Disk())) { }
        Assert.True(File.Exists(theirs));
    }

    [Fact]
    public void A_case_name_as_long_as_the_file_system_takes_can_be_published()
    {
        using var folder = new TemporaryFolder();
        var results = Runs.Results(folder);
        using var publisher = Publisher.Open(results, new Disk());
        var name = string.Concat(Enumerable.Repeat("ø", 127));   // 254 bytes of the 255 there are
        publisher.PublishCase(name, New);
        Assert.Equal(Contents(New), TemporaryFolder.Contents(results.Case(name)));
    }

    [Theory]
    [InlineData("logs")]
    [InlineData("Failures")]
    [InlineData("tables")]
    [InlineData("Replaced")]
    [InlineData("kept")]
    [InlineData("polars")]
    [InlineData("summary.csv")]
    [InlineData(".hidden")]
    [InlineData("../out")]
    public void A_name_that_the_results_folder_needs_itself_is_refused(string name)
    {
        using var folder = new TemporaryFolder();
        using var publisher = Publisher.Open(Runs.Results(folder), new Disk());
        Assert.Throws<ArgumentException>(() => publisher.PublishCase(name, New));
    }

    [Fact]
    public void A_flush_that_fails_is_an_error_though_dotnet_would_not_say_so()
    {
        if (!OperatingSystem.IsLinux())
            return;
        // The system flushes no such device: 22 is EINVAL, from fsync itself.
        Assert.Equal(22, Assert.Throws<IOException>(() => new Disk().Sync("/dev/null")).HResult);
        using var device = File.OpenHandle("/dev/null", FileMode.Open, FileAccess.Write);
        RandomAccess.FlushToDisk(device);
    }

    [Fact]
    public void What_is_replaced_leaves_its_hidden_name_only_when_the_new_result_is_flushed()
    {
        using var folder = new TemporaryFolder();
        var results = Runs.Results(folder);
        Publish(results, WholeOld, new Disk());
        using var publisher = Publisher.Open(results, new Disk());
        publisher.Place("clean", New);
        Assert.Empty(ReplacedResult.All(results));
        publisher.Settle();
        Assert.Equal(Contents(WholeOld), TemporaryFolder.Contents(Assert.Single(ReplacedResult.All(results)).Folder));
    }

    [Fact]
    public void A_flush_of_the_folder_that_is_refused_settles_nothing_and_the_next_one_all()
    {
        using var folder = new TemporaryFolder();
        var results = Runs.Results(folder);
        Publish(results, WholeOld, new Disk());
        const int StepsToPlace = 9;   // three writes, three flushes and that of their folder; a rename that finds a folder there; the exchange
        using var publisher = Publisher.Open(results, new FailingDisk(StepsToPlace + 1, only: true));
        publisher.Place("clean", New);
        Assert.Throws<IOException>(publisher.Settle);
        Assert.Empty(ReplacedResult.All(results));
        publisher.Settle();
        Assert.Single(ReplacedResult.All(results));
    }

    [Fact]
    public void A_flush_that_the_system_refuses_is_an_error()
        => Assert.Equal(2, Assert.Throws<IOException>(() => new Disk().Sync("/no/such/place")).HResult);   // 2: ENOENT

    private static void Publish(ResultsFolder results, ResultContent[] files, IDisk disk)
    {
        using var publisher = Publisher.Open(results, disk);
        publisher.PublishCase("clean", files);
    }

    private static ResultContent Receipt(string title, params ResultFile[] files) => new("receipt.json", ReceiptFile.Write(new Receipt(
        1, "fell", "clean", title, "f", 1, "0.0.0", DateTimeOffset.UnixEpoch, 0, new Dictionary<string, string>(), [], files,
        CaseSummary.Of(FellRotor.Curve(FellRotor.Rotor())), "")));

    private static Dictionary<string, string> Contents(IEnumerable<ResultContent> files)
        => files.ToDictionary(f => f.Name, f => System.Text.Encoding.UTF8.GetString(f.Bytes.Span), StringComparer.Ordinal);
}
