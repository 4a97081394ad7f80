using System.Diagnostics;
using BladeLoads.Batch.Tests.Building;

namespace BladeLoads.EndToEnd.Program;

/// <summary>SIGKILL at random instants of a run that replaces results: see HowMany for how many.</summary>
public sealed class A_killed_run : IDisposable
{
    private const int Variants = 40;

    private static readonly Dictionary<string, string> Nothing = [];

    private readonly TemporaryFolder _before = new();

    public A_killed_run()
    {
        // Half of the results are there and out of date, the other half is missing.
        BeckStudy.Write(Study(_before));
        BeckStudy.AddSmallSweep(Study(_before), Variants / 2, pitch: 1);
        Assert.Equal(0, Started.Run(_before.Path, "run", "beck").ExitCode);
        BeckStudy.AddSmallSweep(Study(_before), Variants, pitch: 0);
    }

    public void Dispose() => _before.Dispose();

    [Fact]
    public void Leaves_whole_results_at_whatever_instant_and_comes_to_the_tables_of_an_undisturbed_one()
    {
        using var undisturbed = new TemporaryFolder();
        _before.CopyTo(undisturbed);
        var clock = Stopwatch.StartNew();
        Assert.Equal(0, Started.Run(undisturbed.Path, "run", "beck").ExitCode);
        var length = clock.Elapsed;
        var expected = Found.Tables(Results(undisturbed));
        var old = Found.Fingerprints(Results(_before)).Values.ToHashSet(StringComparer.Ordinal);
        var wanted = Found.Fingerprints(Results(undisturbed));

        var random = new Random(20261201);
        for (var kill = 1; kill <= HowMany.Kills; kill++)
        {
            using var folder = new TemporaryFolder();
            _before.CopyTo(folder);
            var results = Results(folder);
            var claimed = kill % 4 == 0;
            var wait = length * random.NextDouble() * (claimed ? 1 : 0.6);
            var told = $"kill {kill} of {HowMany.Kills}, {wait.TotalMilliseconds:0} ms after {(claimed ? "the start" : "the first claim")}";
            KillOne(folder, results, wait, atFirstClaim: !claimed);
            Found.AssertAllWhole(results);
            Assert.True(old.IsSubsetOf(Found.FingerprintsAnywhere(results)), $"a result of before is gone: {told}");
            var finished = Found.Fingerprints(results).Where(f => wanted[f.Key] == f.Value).Select(f => f.Key).ToHashSet(StringComparer.Ordinal);
            if (random.Next(2) == 0)
            {
                KillOne(folder, results, wait / 2, atFirstClaim: false);
                Assert.Subset(Found.Fingerprints(results).Where(f => wanted[f.Key] == f.Value).Select(f => f.Key).ToHashSet(), finished);
            }
            var next = Started.Run(folder.Path, "run", "beck");
            Assert.True(next.ExitCode == 0, $"{told}: {next.All}");
            Assert.Equal(expected, Found.Tables(results));
            Assert.True(old.IsSubsetOf(Found.FingerprintsAnywhere(results)), $"a result of before is gone: {told}");
            Assert.Equal([], Directory.EnumerateFileSystemEntries(results, ".*").Where(e => Path.GetFileName(e) != ".index"));
        }
    }

    private static void KillOne(TemporaryFolder folder, string results, TimeSpan wait, bool atFirstClaim)
    {
        using var run = Started.With(folder.Path, Nothing, "run", "beck");
        var claims = Path.Join(results, ".claims");
        while (atFirstClaim && !Directory.Exists(claims) && !run.EndsWithin(TimeSpan.FromMilliseconds(1)))
        {
        }
        if (!run.EndsWithin(wait))
            run.Signal("KILL");
        run.Wait();
    }

    private static string Study(TemporaryFolder folder) => Path.Join(folder.Path, "beck");

    private static string Results(TemporaryFolder folder) => Path.Join(folder.Path, "results", "beck");
}
