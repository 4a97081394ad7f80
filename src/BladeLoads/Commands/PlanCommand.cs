using System.Collections.Immutable;
using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Plan.Index;
using BladeLoads.Results.Publishing;
using BladeLoads.Rotor.Operation;
using BladeLoads.Screen;
using BladeLoads.Studies;
using BladeLoads.Studies.Files;

namespace BladeLoads.Commands;

/// <summary><c>bladeloads plan</c>: how each case stands, and why.</summary>
internal static class PlanCommand
{
    public static int Run(string path, string resultsFolder, string[] only, bool asJson, Surroundings surroundings)
    {
        var root = Path.GetFullPath(resultsFolder);
        if (TellAllCurrent(path, root, only, asJson, surroundings))
            return ExitCode.Good;
        var study = AskedStudy.Read(path, surroundings);
        FindingLines.Write(study.Asked, surroundings.Error, withSource: surroundings.ErrorIsTerminal);
        var results = new ResultsFolder(root, study.Asked.Name);
        var (whole, plan) = study.Plan(LookAt(results, surroundings), only);
        if (NothingMeant.Tell(plan, study.Asked, only, surroundings))
            return ExitCode.NothingCouldRun;
        Tell(plan.Standings, whole.Standings, results, asJson, surroundings);
        if (plan.Cases.IsEmpty)
            return ExitCode.NothingCouldRun;
        return study.Asked.Errors.IsEmpty && plan.Rejected.IsEmpty ? ExitCode.Good : ExitCode.SomeNotGood;
    }

    // The way of most mornings: a whole study of which nothing has changed need not be read to know that.
    private static bool TellAllCurrent(string path, string root, string[] only, bool asJson, Surroundings surroundings)
    {
        if (string.IsNullOrWhiteSpace(path) || path.Contains('\0'))
            return false;
        var folder = Path.TrimEndingDirectorySeparator(Path.GetFullPath(path));
        if (Path.GetFileName(folder) is not { Length: > 0 } name || !Directory.Exists(folder))
            return false;
        var results = new ResultsFolder(root, name);
        if (LookAt(results, surroundings).AllCurrent(folder, new DiskFiles()) is not { } all)
            return false;
        var choice = new CaseChoice([.. only]);
        var meant = only.Length == 0 ? all.Cases : [.. all.Cases.Where(c => choice.Includes(c.Name))];
        if (meant.IsEmpty)
            return false;
        FindingLines.Write(
            new Study(name, folder, null, [], [], [], all.Doubts), surroundings.Error, withSource: surroundings.ErrorIsTerminal);
        Tell(meant, all.Cases, results, asJson, surroundings);
        return true;
    }

    private static StudyLook LookAt(ResultsFolder results, Surroundings surroundings)
        => new(results, CommandLine.ToolVersion, SolverVersion.Number, surroundings.Time);

    private static void Tell(
        ImmutableArray<CaseStanding> cases, ImmutableArray<CaseStanding> whole, ResultsFolder results, bool asJson, Surroundings surroundings)
    {
        if (asJson)
        {
            PlanJson.Write(cases, results.StudyName, results.Study, surroundings.Out);
            return;
        }
        // In one piece: standard output is not buffered, and a line a case would be a call of the system each.
        var lines = string.Concat(PlanLines.Of(cases).Append(PlanLines.Closing(cases)).Concat(PlanLines.OfNoCase(results.OfNoCase(whole.Select(c => c.Name).ToHashSet(StringComparer.Ordinal)))).Select(line => line + surroundings.Out.NewLine));
        surroundings.Out.Write(lines);
        surroundings.Out.Flush();
    }
}
