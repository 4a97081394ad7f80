using System.Text;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Publishing;

namespace BladeLoads.Batch.Tests.Publishing;

/// <summary>Files and folders that a user asked for: whole or not at all, whatever befalls the disk.</summary>
public sealed class WholeFilesTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_file_that_is_there_stays_unless_it_may_give_way()
    {
        var path = Place("t18.csv");

        Assert.True(WholeFile.Write(path, "one"u8, replace: false, new Disk()));
        Assert.False(WholeFile.Write(path, "two"u8, replace: false, new Disk()));
        Assert.Equal("one", File.ReadAllText(path));
        Assert.True(WholeFile.Write(path, "three"u8, replace: true, new Disk()));
        Assert.Equal("three", File.ReadAllText(path));
        Assert.Equal(["t18.csv"], Names(_folder.Path));
    }

    [Fact]
    public void A_folder_or_a_link_to_nowhere_never_gives_way_to_a_file()
    {
        Directory.CreateDirectory(Place("folder"));
        File.CreateSymbolicLink(Place("link"), Place("nowhere"));

        Assert.False(WholeFile.Write(Place("folder"), "one"u8, replace: true, new Disk()));
        Assert.False(WholeFile.Write(Place("folder"), "one"u8, replace: false, new Disk()));
        Assert.False(WholeFile.Write(Place("link"), "one"u8, replace: false, new Disk()));
        Assert.Equal(["folder", "link"], Names(_folder.Path));
    }

    [Fact]
    public void A_folder_that_is_there_stays_unless_it_may_give_way()
    {
        var path = Place("soiled");

        Assert.True(WholeFolder.Write(path, [Content("a.csv", "1"), Content("b.csv", "2")], replace: false, new Disk()));
        Assert.False(WholeFolder.Write(path, [Content("a.csv", "3")], replace: false, new Disk()));
        Assert.Equal(["a.csv", "b.csv"], Names(path));
        Assert.True(WholeFolder.Write(path, [Content("a.csv", "3")], replace: true, new Disk()));
        Assert.Equal(["a.csv"], Names(path));
        Assert.Equal("3", File.ReadAllText(Path.Join(path, "a.csv")));
        Assert.Equal(["soiled"], Names(_folder.Path));
    }

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void Whatever_befalls_the_disk_the_old_is_there_or_the_new_and_never_half(bool asFolder)
    {
        foreach (var misfortune in Enum.GetValues<Misfortune>())
            for (var at = 1; ; at++)
            {
                var path = Place($"{misfortune}-{at}");
                Write(path, "old", new Disk());
                var disk = new MisfortuneDisk(at, misfortune);
                try
                {
                    Write(path, "new", disk);
                }
                catch (Exception e) when (e is IOException or KilledException)
                {
                    // What it left is looked at below.
                }
                Assert.Contains(Read(path), new[] { "old", "new" });
                if (disk.HasStruck)
                    continue;
                Assert.Equal("new", Read(path));
                Assert.True(at > 3);
                break;
            }

        void Write(string path, string text, IDisk disk) => Assert.True(asFolder
            ? WholeFolder.Write(path, [Content("t.csv", text)], replace: true, disk)
            : WholeFile.Write(path, Encoding.UTF8.GetBytes(text), replace: true, disk));

        string Read(string path) => File.ReadAllText(asFolder ? Path.Join(path, "t.csv") : path);
    }

    [Fact]
    public void What_is_refused_leaves_nothing_beside()
    {
        for (var at = 1; at <= 4; at++)
            Assert.Throws<IOException>(() => WholeFile.Write(Place("t18.csv"), "one"u8, replace: false, new FailingDisk(at, only: true)));
        // The last step is the flush of the folder: the file stands, and perhaps not after a power cut.
        Assert.Equal(["t18.csv"], Names(_folder.Path));
    }

    private static ResultContent Content(string name, string text) => new(name, Encoding.UTF8.GetBytes(text));

    private string Place(string name) => Path.Join(_folder.Path, name);

    private static string[] Names(string folder) => [.. Directory.EnumerateFileSystemEntries(folder).Select(path => Path.GetFileName(path)).Order(StringComparer.Ordinal)];
}
