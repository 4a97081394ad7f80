using System.Diagnostics;
using System.Globalization;
using BladeLoads.Results.Publishing;

namespace BladeLoads.Benchmarks;

/// <summary>
/// What it takes to publish a case, everything flushed: four files of the size of a small case of the demo study, ten cases to a flush of the
/// study's folder, as a job of small cases has them. Beside it, in turns, the same files written and flushed with nothing about them.
/// </summary>
internal static class PublishingCases
{
    private const int CasesInAJob = 10;
    private const int Rounds = 12;

    private static readonly (string Name, int Bytes)[] Files =
        [("power-curve.csv", 4_000), ("spanwise.csv", 25_000), ("case.log", 2_500), ("receipt.json", 5_000)];

    /// <summary>Prints ms a case: median over the rounds, smallest and largest.</summary>
    /// <param name="args">A folder on the disk to be measured; the system's temporary folder where it is left out.</param>
    public static int Measure(string[] args)
    {
        var folder = Directory.CreateDirectory(Path.Join(args.Length > 0 ? args[0] : Path.GetTempPath(), $"publishing-{Guid.NewGuid():N}"));
        try
        {
            var results = new ResultsFolder(folder.FullName, "fell");
            using var publisher = Publisher.Open(results, new Disk());
            List<double> bare = [], first = [], again = [];
            for (var round = 0; round < Rounds; round++)
            {
                bare.Add(MillisecondsACase(i => WriteBare(new Disk(), Path.Join(folder.FullName, $"bare-{round}-{i}")), () => { }));
                // Each result is there once before it is replaced.
                first.Add(MillisecondsACase(i => publisher.Place($"{round}-{i}", Contents(i)), publisher.Settle));
                again.Add(MillisecondsACase(i => publisher.Place($"{round}-{i}", Contents(i + 1)), publisher.Settle));
            }
            Print("files and their folder written and flushed", bare);
            Print("a case published", first);
            Print("a case published in place of another", again);
            return 0;
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    private static double MillisecondsACase(Action<int> publish, Action settle)
    {
        var watch = Stopwatch.StartNew();
        for (var i = 0; i < CasesInAJob; i++)
            publish(i);
        settle();
        return watch.Elapsed.TotalMilliseconds / CasesInAJob;
    }

    private static void WriteBare(Disk disk, string folder)
    {
        disk.CreateFolder(folder);
        foreach (var file in Contents(0))
        {
            disk.Write(Path.Join(folder, file.Name), file.Bytes.Span);
            disk.Sync(Path.Join(folder, file.Name));
        }
        disk.Sync(folder);
    }

    private static IEnumerable<ResultContent> Contents(int seed)
    {
        var random = new Random(seed);
        foreach (var (name, length) in Files)
        {
            var bytes = new byte[length];
            random.NextBytes(bytes);
            yield return new ResultContent(name, bytes);
        }
    }

    private static void Print(string what, List<double> milliseconds)
    {
        var sorted = milliseconds.Order().ToList();
        Console.WriteLine(string.Create(
            CultureInfo.InvariantCulture, $"{what,-44} {sorted[sorted.Count / 2]:0.0} ms a case ({sorted[0]:0.0} to {sorted[^1]:0.0})"));
    }
}
