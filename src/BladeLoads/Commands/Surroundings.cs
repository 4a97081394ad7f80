using BladeLoads.Batch.Work;
using BladeLoads.Results.Publishing;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.Commands;

/// <summary>All that the commands touch outside themselves.</summary>
/// <param name="OutIsTerminal">Whether someone looks at <paramref name="Out"/> just now.</param>
/// <param name="ErrorIsTerminal">Whether someone looks at <paramref name="Error"/> just now.</param>
internal sealed record Surroundings(
    TextWriter Out, TextWriter Error, bool OutIsTerminal, bool ErrorIsTerminal, Func<string, Study> ReadStudy, SolveCase Solve,
    IDisk Disk, TimeProvider Time, Action<int> WaitForFile)
{
    /// <summary>Puts a question to whoever sits at the terminal, and tells whether the answer was yes; null where nobody does.</summary>
    public Func<string, bool>? Ask { get; init; }

    /// <summary>Characters of a line of the terminal; null where the output is redirected.</summary>
    public int? ScreenWidth() => OutIsTerminal && !Console.IsOutputRedirected ? Console.WindowWidth : null;

    public static Surroundings OfThisProcess() => new(
        Console.Out, Console.Error, !Console.IsOutputRedirected, !Console.IsErrorRedirected, StudyReader.Read, CaseSolver.Solve,
        new Disk(), TimeProvider.System, tries => Thread.Sleep(TimeSpan.FromMilliseconds(50 << tries)))
    {
        Ask = Console.IsInputRedirected || Console.IsOutputRedirected ? null : AskAtTheTerminal,
    };

    private static bool AskAtTheTerminal(string question)
    {
        Console.Out.Write($"{question} [y/N] ");
        return Console.In.ReadLine()?.Trim() is "y" or "Y" or "yes";
    }
}
