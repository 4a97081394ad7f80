using System.Globalization;
using BladeLoads.Batch.Work;

namespace BladeLoads.Screen;

/// <summary>Progress for a file or a pipe: a line at the beginning, one every few seconds, one at the end; no escape codes.</summary>
internal static class PlainProgress
{
    private static readonly TimeSpan Pace = TimeSpan.FromSeconds(5);
    private static readonly TimeSpan Look = TimeSpan.FromMilliseconds(200);

    public static T Show<T>(Func<T> run, RunProgress progress, int workers, TextWriter error, TimeProvider time)
    {
        error.WriteLine($"solving {Count.Of(progress.Cases, "case")} with {Count.Of(workers, "worker")}");
        var running = Task.Factory.StartNew(run, CancellationToken.None, TaskCreationOptions.LongRunning, TaskScheduler.Default);
        var told = time.GetTimestamp();
        while (Task.WaitAny([running], Look) < 0)
        {
            if (time.GetElapsedTime(told) < Pace)
                continue;
            error.WriteLine(progress.Read().Sentence);
            told = time.GetTimestamp();
        }
        var end = progress.Read();
        error.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{end.Sentence}, {end.Elapsed.TotalSeconds:0.0} s"));
        return running.GetAwaiter().GetResult();
    }
}
