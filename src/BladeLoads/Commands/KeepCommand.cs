using System.Collections.Immutable;
using System.CommandLine;
using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Plan.Index;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Keeping;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Tables;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Operation;
using BladeLoads.Screen;

namespace BladeLoads.Commands;

/// <param name="Replace">A set of that name gives way.</param>
/// <param name="AsItIs">Keep though results are not current.</param>
internal sealed record KeptAsked(string Study, string Name, string Results, bool Replace, bool AsItIs);

/// <summary><c>bladeloads keep</c>: sets the results of a study aside under a name.</summary>
internal static class KeepCommand
{
    private const int CasesShown = 20;

    public static Command Define(Surroundings surroundings)
    {
        var study = CommandLine.StudyArgument("the study's folder");
        var name = new Argument<string>("name") { Description = "the name of the set, for people and for compare: signed-off-2026-11" };
        var results = CommandLine.ResultsOption();
        var replace = new Option<bool>("--replace") { Description = "put it in the place of a set of that name" };
        var asItIs = new Option<bool>("--as-it-is") { Description = "keep what is there, though cases are not current" };
        var command = new Command("keep", "Sets the results of a study aside under a name, as a copy that no run and no tidying touches.")
        {
            study, name, results, replace, asItIs,
        };
        command.SetAction(parsed => Run(
            new KeptAsked(
                parsed.GetRequiredValue(study), parsed.GetRequiredValue(name), parsed.GetRequiredValue(results), parsed.GetValue(replace),
                parsed.GetValue(asItIs)),
            surroundings));
        return command;
    }

    private static int Run(KeptAsked asked, Surroundings surroundings)
    {
        var study = AskedStudy.Read(asked.Study, surroundings);
        var results = new ResultsFolder(Path.GetFullPath(asked.Results), study.Whole.Name);
        var look = new StudyLook(results, CommandLine.ToolVersion, SolverVersion.Number, surroundings.Time);
        var (plan, _) = study.Plan(look, []);
        if (KeptSet.Objection(asked.Name) is { } objection)
            throw new WrongUseException($"'{asked.Name}' cannot be the name of a kept set: {objection}");
        if (plan.Cases.Any(c => c.Case.Name == asked.Name))
            throw new WrongUseException($"'{asked.Name}' is a case of the study; give the set another name, so that compare knows which is meant");
        if (!Directory.Exists(results.Study))
            throw new WrongUseException($"nothing to keep: there are no results in '{results.Study}'; run the study first");
        if (!asked.Replace && Path.Exists(results.KeptAs(asked.Name)))
            throw new WrongUseException($"there is a set '{asked.Name}' already; keep under another name, or put this one in its place with --replace");
        var notCurrent = plan.Cases.Where(c => c.State.Word != "current").Select(c => $"{c.Case.Name}: {c.State.Word}")
            .Concat(plan.Rejected.Select(r => $"{r}: blocked")).ToImmutableArray();
        if (!notCurrent.IsEmpty && !asked.AsItIs)
            return Refuse(
                $"not kept: {Count.Of(notCurrent.Length, "case")} of {plan.Cases.Length + plan.Rejected.Length} not current; "
                + "run the study first, or keep what is there with --as-it-is", notCurrent, surroundings);
        try
        {
            return Keep(asked, study, plan, results, surroundings);
        }
        catch (NotKeptException e)
        {
            return Refuse(e.Message, e.Cases, surroundings);
        }
    }

    private static int Keep(KeptAsked asked, AskedStudy study, StudyPlan plan, ResultsFolder results, Surroundings surroundings)
    {
        var rows = StudySummary.Rows(plan, ImmutableSortedDictionary<string, CaseOutcome>.Empty);
        var summary = SummaryTable.Write(rows, study.Whole.Baseline);
        var (folder, record) = KeptSet.Keep(
            results,
            new KeepRequest(
                asked.Name, [.. plan.Cases.Select(c => (c.Case.Name, c.State.Word)), .. plan.Rejected.Select(r => (r, "rejected"))],
                summary, StudyReportFile.Find(summary, results), asked.Replace, asked.AsItIs, surroundings.Time.GetUtcNow(),
                CommandLine.ToolVersion),
            surroundings.Disk);
        var kept = record.Cases.Count(c => c.Fingerprint is not null);
        var notCurrent = record.Cases.Where(c => c.State != "current").GroupBy(c => c.State, StringComparer.Ordinal)
            .Select(g => FormattableString.Invariant($"{g.Count()} {g.Key}")).ToList();
        surroundings.Out.WriteLine(Printable.Of(
            $"kept {Count.Of(kept, "case")} as '{record.Name}'{(notCurrent.Count == 0 ? "" : $" ({string.Join(", ", notCurrent)})")}"));
        surroundings.Out.WriteLine(Printable.Of($"set: {folder}"));
        return ExitCode.Good;
    }

    private static int Refuse(string why, ImmutableArray<string> cases, Surroundings surroundings)
    {
        foreach (var line in cases.Take(CasesShown))
            surroundings.Error.WriteLine(Printable.Of(line));
        if (cases.Length > CasesShown)
            surroundings.Error.WriteLine($"... and {cases.Length - CasesShown} more");
        surroundings.Error.WriteLine(Printable.Of(why));
        return ExitCode.SomeNotGood;
    }
}
