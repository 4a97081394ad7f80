using BladeLoads.Results.Publishing;
using BladeLoads.Screen;

namespace BladeLoads.Commands;

/// <summary><c>bladeloads plan</c>: how each case stands, and why.</summary>
internal static class PlanCommand
{
    public static int Run(string path, string resultsFolder, string[] only, Surroundings surroundings)
    {
        var study = AskedStudy.Read(path, surroundings);
        FindingLines.Write(study.Asked, surroundings.Error, withSource: surroundings.ErrorIsTerminal);
        var results = new ResultsFolder(Path.GetFullPath(resultsFolder), study.Asked.Name);
        var (_, plan) = study.Plan(results, only);
        if (NothingMeant.Tell(plan, study.Asked, only, surroundings))
            return ExitCode.NothingCouldRun;
        foreach (var line in PlanLines.Of(plan))
            surroundings.Out.WriteLine(line);
        surroundings.Out.WriteLine(PlanLines.Closing(plan));
        if (plan.Cases.IsEmpty)
            return ExitCode.NothingCouldRun;
        return study.Asked.Errors.IsEmpty && plan.Rejected.IsEmpty ? ExitCode.Good : ExitCode.SomeNotGood;
    }
}
