using BladeLoads.Batch.Tests.Building;

namespace BladeLoads.EndToEnd.Program;

public sealed class A_disk_without_room : IDisposable
{
    private const int Variants = 60;

    private static readonly Dictionary<string, string> Nothing = [];

    private readonly TemporaryFolder _folder = new();

    public A_disk_without_room()
    {
        BeckStudy.Write(Path.Join(_folder.Path, "beck"));
        BeckStudy.AddSmallSweep(Path.Join(_folder.Path, "beck"), Variants);
    }

    public void Dispose() => _folder.Dispose();

    [FactOfRoot]
    public void Stops_the_run_in_one_line_and_when_there_is_room_again_the_same_command_goes_on()
    {
        Assert.Equal(0, Started.Run(_folder.Path, "run", "beck").ExitCode);
        using var small = Mounted.InMemory(Path.Join(_folder.Path, "small"), 1 << 20);
        var results = Path.Join(small.Folder, "beck");
        for (var again = 0; again < 4; again++)   // no attempt is counted, or the third would be the last
        {
            var full = Started.Run(_folder.Path, "run", "beck", "--results", small.Folder);
            Assert.Equal(3, full.ExitCode);
            Assert.DoesNotContain("the log", full.Error, StringComparison.Ordinal);   // one line says it all
            Assert.Matches(
                @"\ncannot write results into .+/small/beck: no room left on the disk; \d+ cases not run\n$", "\n" + full.Error);
            Found.AssertAllWhole(results);
            Assert.False(Directory.Exists(Path.Join(results, "failures")));
            Assert.False(Directory.Exists(Path.Join(results, ".claims")));
        }
        Assert.InRange(Found.CaseFolders(results).Count(), 1, Variants);
        small.Remount("size=64m");
        var roomy = Started.Run(_folder.Path, "run", "beck", "--results", small.Folder);
        Assert.True(roomy.ExitCode == 0, roomy.All);
        Assert.Equal(Found.Tables(Path.Join(_folder.Path, "results", "beck")), Found.Tables(results));
    }

    [FactOfRoot]
    public void That_becomes_read_only_during_a_run_stops_it_in_one_line()
    {
        BeckStudy.AddLongSweep(Path.Join(_folder.Path, "beck"));
        var image = Path.Join(_folder.Path, "disk.img");
        Mounted.MakeImage(image, 64);
        string results;
        using (var disk = Mounted.Image(Path.Join(_folder.Path, "disk"), image))
        {
            results = Path.Join(disk.Folder, "beck");
            using var run = Started.With(_folder.Path, Nothing, "run", "beck", "--results", disk.Folder);
            run.Until(() => Directory.Exists(results) && Found.CaseFolders(results).Skip(5).Any());
            disk.Remount("abort");   // what ext4 does by itself when its disk fails
            var finished = run.Wait();
            Assert.True(finished.ExitCode == 3, finished.All);
            Assert.DoesNotContain("the log", finished.Error, StringComparison.Ordinal);   // one line says it all
            Assert.Matches(
                @"\ncannot write results into .+/disk/beck: (the file system is read-only|the disk reports an input/output error); "
                + @"\d+ cases not run\n$", "\n" + finished.Error);
        }
        using (Mounted.Image(Path.Join(_folder.Path, "disk"), image))
        {
            Found.AssertAllWhole(results);
            var next = Started.Run(_folder.Path, "run", "beck", "--results", Path.Join(_folder.Path, "disk"), "--only", "small*");
            Assert.True(next.ExitCode == 0, next.All);
        }
    }
}
