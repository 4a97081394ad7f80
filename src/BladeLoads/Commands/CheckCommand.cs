using BladeLoads.Screen;

namespace BladeLoads.Commands;

/// <summary><c>bladeloads check</c>: every error and every doubt at once.</summary>
internal static class CheckCommand
{
    public static int Run(string path, Surroundings surroundings)
    {
        var study = AskedStudy.Read(path, surroundings).Asked;
        FindingLines.Write(study, surroundings.Out, withSource: surroundings.OutIsTerminal);
        surroundings.Out.WriteLine(FindingLines.Closing(study));
        if (study.Cases.IsEmpty)
            return ExitCode.NothingCouldRun;
        return study.Errors.IsEmpty && study.Rejected.IsEmpty ? ExitCode.Good : ExitCode.SomeNotGood;
    }
}
