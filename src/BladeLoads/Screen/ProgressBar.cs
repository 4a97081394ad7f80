using BladeLoads.Batch.Work;
using Spectre.Console;

namespace BladeLoads.Screen;

/// <summary>Progress for someone who looks on: a bar with cases done, time left and solves a second, on the error stream.</summary>
internal static class ProgressBar
{
    private static readonly TimeSpan Look = TimeSpan.FromMilliseconds(100);

    public static T Show<T>(Func<T> run, RunProgress progress, ScreenLog screen)
    {
        var console = AnsiConsole.Create(new AnsiConsoleSettings { Out = new AnsiConsoleOutput(Console.Error) });
        screen.Through(console.WriteLine);
        try
        {
            return console.Progress()
                .Columns(new ProgressBarColumn(), new TaskDescriptionColumn { Alignment = Justify.Left })
                .Start(context =>
                {
                    var bar = context.AddTask(Markup.Escape(progress.Read().Sentence), maxValue: progress.Cases);
                    var running = Task.Factory.StartNew(run, CancellationToken.None, TaskCreationOptions.LongRunning, TaskScheduler.Default);
                    do
                    {
                        var reading = progress.Read();
                        bar.Value = reading.Done;
                        bar.Description = Markup.Escape(reading.Sentence);
                    }
                    while (Task.WaitAny([running], Look) < 0);
                    var end = progress.Read();
                    bar.Value = end.Done;
                    bar.Description = Markup.Escape(end.Sentence);
                    return running.GetAwaiter().GetResult();
                });
        }
        finally
        {
            screen.Directly();
        }
    }
}
