using System.Globalization;
using BladeLoads.Batch.Tests.Building;

namespace BladeLoads.EndToEnd.Program;

/// <summary>
/// A power cut: what is on the disk of a run that is held for a moment, without what the system still holds in memory. See HowMany for
/// how many instants.
/// </summary>
public sealed class A_power_cut : IDisposable
{
    private const int Variants = 150;

    private static readonly Dictionary<string, string> Nothing = [];

    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [FactOfRoot]
    public void Leaves_all_that_was_done_whole_and_the_next_run_carries_on()
    {
        var study = Path.Join(_folder.Path, "beck");
        BeckStudy.Write(study);
        BeckStudy.AddSmallSweep(study, Variants, pitch: 1);
        var image = Path.Join(_folder.Path, "disk.img");
        Mounted.MakeImage(image, 48);
        using var disk = Mounted.Image(Path.Join(_folder.Path, "disk"), image);
        var results = Path.Join(disk.Folder, "beck");
        Assert.Equal(0, Started.Run(_folder.Path, "run", "beck", "--results", disk.Folder, "--only", "small~density_kg_m3-1.00?").ExitCode);
        var old = Found.Fingerprints(results).Values.ToHashSet(StringComparer.Ordinal);
        BeckStudy.AddSmallSweep(study, Variants, pitch: 0);
        Assert.Equal(0, Started.Run(_folder.Path, "run", "beck").ExitCode);
        var undisturbed = Path.Join(_folder.Path, "results", "beck");
        var expected = Found.Tables(undisturbed);
        var wanted = Found.Fingerprints(undisturbed);

        var random = new Random(20261201);
        var mostDone = 0;
        for (var cut = 1; cut <= HowMany.PowerCuts; cut++)
        {
            // One run is cut at several instants; then a new one begins.
            using var run = Started.With(_folder.Path, Nothing, "run", "beck", "--results", disk.Folder, "--all");
            run.Until(() => Directory.Exists(Path.Join(results, ".claims")) && Done(results, wanted).Count > 0);
            var copies = new List<(string Image, HashSet<string> Done)>();
            for (var ended = false; !ended && cut <= HowMany.PowerCuts; cut++)
            {
                ended = run.EndsWithin(TimeSpan.FromMilliseconds(random.Next(10, 120)));
                if (!ended)
                    copies.Add(Cut(run, image, results, wanted, cut));
            }
            cut--;
            run.Signal("KILL");
            run.Wait();
            foreach (var (copy, done) in copies)
            {
                mostDone = Math.Max(mostDone, done.Count);
                Check(copy, done, old, wanted, expected);
            }
        }
        Assert.True(mostDone > 0, "no cut fell into a run that had done something");
    }

    /// <summary>
    /// Every flush of a file takes with it whatever the file system has to say, so in a busy run a flush that is left out goes unnoticed.
    /// Here a case that takes long is at work, and nothing is flushed after the others are done.
    /// </summary>
    [FactOfRoot]
    public void Spares_what_was_done_though_nothing_has_been_flushed_since()
    {
        var study = Path.Join(_folder.Path, "beck");
        BeckStudy.Write(study);
        Assert.Equal(0, Started.Run(_folder.Path, "run", "beck").ExitCode);
        var wanted = Found.Fingerprints(Path.Join(_folder.Path, "results", "beck"));
        BeckStudy.AddGiant(study);
        var image = Path.Join(_folder.Path, "disk.img");
        Mounted.MakeImage(image, 48);
        using var disk = Mounted.Image(Path.Join(_folder.Path, "disk"), image);
        var results = Path.Join(disk.Folder, "beck");
        using var run = Started.With(_folder.Path, Nothing, "run", "beck", "--results", disk.Folder, "--workers", "2");
        run.Until(() => Directory.Exists(results) && Done(results, wanted).Count == wanted.Count);
        var (copy, done) = Cut(run, image, results, wanted, number: 0);
        run.Signal("KILL");
        run.Wait();
        using var cut = Mounted.Image(Path.Join(_folder.Path, "cut"), copy);
        Assert.Equal(done.Order(), Found.Fingerprints(Path.Join(cut.Folder, "beck")).Keys.Order());
        Found.AssertAllWhole(Path.Join(cut.Folder, "beck"));
    }

    private (string Image, HashSet<string> Done) Cut(
        Started run, string image, string results, Dictionary<string, string> wanted, int number)
    {
        run.Signal("STOP");
        while (!AreAllStopped(run.Id))
            Thread.Yield();
        var done = Done(results, wanted);
        var copy = Path.Join(_folder.Path, $"cut-{number}.img");
        File.Copy(image, copy);
        run.Signal("CONT");
        return (copy, done);
    }

    private void Check(
        string image, HashSet<string> done, HashSet<string> old, Dictionary<string, string> wanted, Dictionary<string, string> expected)
    {
        using (var disk = Mounted.Image(Path.Join(_folder.Path, "cut"), image))
        {
            var results = Path.Join(disk.Folder, "beck");
            Found.AssertAllWhole(results);
            var found = Found.Fingerprints(results);
            Assert.All(done, name => Assert.Equal(wanted[name], found.GetValueOrDefault(name)));
            Assert.True(old.IsSubsetOf(Found.FingerprintsAnywhere(results)), "a result of before is gone");
            var next = Started.Run(_folder.Path, "run", "beck", "--results", disk.Folder);
            Assert.True(next.ExitCode == 0, next.All);
            Assert.Equal(expected, Found.Tables(results));
        }
        File.Delete(image);
    }

    // A claim is gone only when its result is flushed: what is in its place without one is done.
    private static HashSet<string> Done(string results, Dictionary<string, string> wanted) => Found.Fingerprints(results)
        .Where(f => wanted[f.Key] == f.Value && !File.Exists(Path.Join(results, ".claims", f.Key)))
        .Select(f => f.Key).ToHashSet(StringComparer.Ordinal);

    private static bool AreAllStopped(int process) => Directory
        .EnumerateDirectories($"/proc/{process.ToString(CultureInfo.InvariantCulture)}/task")
        .All(task => File.ReadAllText(Path.Join(task, "stat")).Split(") ")[^1][0] == 'T');
}
