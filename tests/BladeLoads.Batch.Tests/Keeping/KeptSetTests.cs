using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Keeping;
using BladeLoads.Results.Publishing;
using static BladeLoads.Batch.Tests.Building.StoredResults;

namespace BladeLoads.Batch.Tests.Keeping;

public sealed class KeptSetTests : IDisposable
{
    private static readonly byte[] Summary = "case\n"u8.ToArray();

    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_kept_set_holds_copies_of_the_results_the_summary_and_what_was_kept()
    {
        var results = Study(_folder, "a", "b");
        var (folder, record) = KeptSet.Keep(results, Request("signed", "a", "b", "c"), new Disk());
        Assert.Equal(results.KeptAs("signed"), folder);
        Assert.Equal(["a", "b", "kept.json", "summary.csv"], Directory.EnumerateFileSystemEntries(folder).Select(f => Path.GetFileName(f)).Order());
        Assert.Equal(TemporaryFolder.Contents(results.Case("a")), TemporaryFolder.Contents(Path.Join(folder, "a")));
        Assert.Equal([("a", "current", "f"), ("b", "current", "f"), ("c", "missing", null)], record.Cases.Select(c => (c.Case, c.State, c.Fingerprint)));
        var read = KeptRecord.Read(folder)!;
        Assert.Equal((record.Name, record.KeptAt, record.ToolVersion, 3), (read.Name, read.KeptAt, read.ToolVersion, read.Cases.Count));
        Assert.All(Verification.OfKept(folder), v => Assert.Empty(v.Flaws));
    }

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void Whichever_step_the_disk_refuses_the_set_is_whole_or_as_it_was(bool replace)
    {
        var hasSucceeded = false;
        for (var n = 1; !hasSucceeded; n++)
        {
            using var folder = new TemporaryFolder();
            var results = Study(folder, "a", "b");
            if (replace)
                KeptSet.Keep(results, Request("signed", "a"), new Disk());
            var disk = new FailingDisk(n);
            try
            {
                KeptSet.Keep(results, Request("signed", "a", "b") with { Replace = replace }, disk);
                hasSucceeded = true;
            }
            catch (NoRoomForResultsException)
            {
                Assert.True(disk.HasRefused);
            }
            using (Publisher.Open(results, new Disk())) { }
            Assert.DoesNotContain(Directory.EnumerateFileSystemEntries(results.Study), e => Path.GetFileName(e).StartsWith('.'));
            if (Directory.Exists(results.KeptAs("signed")))
            {
                Assert.All(Verification.OfKept(results.KeptAs("signed")), v => Assert.Empty(v.Flaws));
                Assert.Contains(KeptRecord.Read(results.KeptAs("signed"))!.Cases.Count, replace ? [1, 2] : new[] { 2 });
            }
            else
                Assert.False(replace || hasSucceeded);
            Assert.True(n < 50, "never succeeds");
        }
    }

    [Fact]
    public void A_name_that_is_taken_is_not_given_away_unless_told_to()
    {
        var results = Study(_folder, "a", "b");
        KeptSet.Keep(results, Request("signed", "a"), new Disk());
        Assert.Equal(
            "not kept: there is a set 'signed' already; keep under another name, or put this one in its place with --replace",
            Assert.Throws<NotKeptException>(() => KeptSet.Keep(results, Request("signed", "b"), new Disk())).Message);
        Assert.Equal(["a"], KeptRecord.Read(results.KeptAs("signed"))!.Cases.Select(c => c.Case));
        KeptSet.Keep(results, Request("signed", "b") with { Replace = true }, new Disk());
        Assert.Equal(["b"], KeptRecord.Read(results.KeptAs("signed"))!.Cases.Select(c => c.Case));
        Assert.False(Directory.Exists(Path.Join(results.KeptAs("signed"), "a")));
    }

    [Fact]
    public void Where_folders_cannot_be_exchanged_a_set_is_not_given_up_for_another()
    {
        var results = Study(_folder, "a", "b");
        KeptSet.Keep(results, Request("signed", "a"), new Disk());
        Assert.Throws<NotKeptException>(() => KeptSet.Keep(results, Request("signed", "b") with { Replace = true }, new FailingDisk(0, canExchange: false)));
        Assert.Equal(["a"], KeptRecord.Read(results.KeptAs("signed"))!.Cases.Select(c => c.Case));
    }

    [Fact]
    public void A_result_that_is_not_what_was_written_is_not_kept_as_if_it_were()
    {
        var results = Study(_folder, "a", "b");
        File.AppendAllText(Path.Join(results.Case("b"), "power-curve.csv"), "9,1\n");
        var refused = Assert.Throws<NotKeptException>(() => KeptSet.Keep(results, Request("signed", "a", "b"), new Disk()));
        Assert.StartsWith("b: power-curve.csv has ", Assert.Single(refused.Cases), StringComparison.Ordinal);
        Assert.False(Directory.Exists(results.KeptAs("signed")));
        var (_, record) = KeptSet.Keep(results, Request("signed", "a", "b") with { AsItIs = true }, new Disk());
        Assert.Equal([("a", "current"), ("b", "damaged")], record.Cases.Select(c => (c.Case, c.State)));
    }

    [Theory]
    [InlineData("")]
    [InlineData(".hidden")]
    [InlineData("a/b")]
    [InlineData("..")]
    [InlineData("replaced")]
    [InlineData("a\nb")]
    public void A_name_that_is_no_safe_folder_name_is_refused(string name) => Assert.NotNull(KeptSet.Objection(name));

    internal static ResultsFolder Study(TemporaryFolder folder, params string[] cases)
    {
        foreach (var name in cases)
            WriteReceipt(WriteCurve(folder, $"fell/{name}", new Point(8, 1)), name, 10, new Dictionary<string, int>(), day: 20);
        return Runs.Results(folder);
    }

    private static KeepRequest Request(string name, params string[] cases) => new(
        name, [.. cases.Select(c => (c, c == "c" ? "missing" : "current"))], Summary, null, false, false,
        new DateTimeOffset(2026, 2, 1, 0, 0, 0, TimeSpan.Zero), "0.0.0");
}
