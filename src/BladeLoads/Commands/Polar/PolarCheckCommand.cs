using System.Collections.Immutable;
using System.CommandLine;
using BladeLoads.Batch.Plan;
using BladeLoads.Batch.PolarCheck;
using BladeLoads.Batch.Queue;
using BladeLoads.Batch.Work;
using BladeLoads.Results.PolarCheck;
using BladeLoads.Results.Publishing;
using BladeLoads.Screen;
using BladeLoads.Studies;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.PolarCheck;

namespace BladeLoads.Commands.Polar;

/// <param name="Only">Of a study cases, else sections.</param>
/// <param name="Out">The folder for the report; null for the place that a study has for it, and for none without a study.</param>
internal sealed record PolarCheckRequest(
    GivenSource Source, string Results, string? Out, ImmutableArray<string> Only, int Workers, bool Json);

/// <summary><c>bladeloads polar check</c>: what is doubtful in polar tables, and where the blades of a study work in them.</summary>
internal static class PolarCheckCommand
{
    public static Command Define(Surroundings surroundings)
    {
        var source = new Argument<string>("study, set or table")
        {
            Description = "a study's folder or one case file, or the folder of a set, or one table",
        };
        var results = CommandLine.ResultsOption();
        results.Description = "of a study: the folder of results; the report goes to <study>/polars in it";
        var folder = new Option<string?>("--out") { Description = "write the report into this folder instead", HelpName = "folder" };
        var only = CommandLine.OnlyOption();
        only.Description = "of a study: only cases whose name matches; of a set or a table: only sections; * is any text, ? one character; may be "
            + "given several times";
        var workers = CommandLine.WorkersOption();
        var json = new Option<bool>("--json") { Description = "the same for scripts, as JSON" };
        var command = new Command(
            "check",
            "Tells every error and doubt of polar tables, by row, with their figures; of a study also where its blades work in them, for which "
            + "its cases are solved in memory.")
        {
            source, results, folder, only, workers, json,
        };
        command.SetAction(parsed =>
        {
            var given = GivenSource.Of(parsed.GetRequiredValue(source));
            given.RefuseWithoutStudy(parsed, results, "--out says where the report goes");
            given.RefuseWithoutStudy(parsed, workers, "leave it out");
            return Run(Request(parsed, given), surroundings);
        });
        return command;

        PolarCheckRequest Request(ParseResult parsed, GivenSource given) => new(
            given, parsed.GetRequiredValue(results), parsed.GetValue(folder), [.. parsed.GetValue(only) ?? []], parsed.GetValue(workers),
            parsed.GetValue(json));
    }

    private static int Run(PolarCheckRequest request, Surroundings surroundings)
    {
        var files = new DiskFiles();
        return request.Source switch
        {
            GivenSource.Table table => CheckAlone(CheckedTables.OfTable(table.Path, files), request, surroundings),
            GivenSource.Set set => CheckAlone(CheckedTables.OfSet(set.Path, files), request, surroundings),
            _ => CheckStudy(request, files, surroundings),
        };
    }

    private static int CheckAlone(CheckedTables all, PolarCheckRequest request, Surroundings surroundings)
    {
        var choice = new NameChoice(request.Only);
        choice.Check(all.Sections);
        var tables = all.Of(choice.Includes);
        CheckPlace(tables, null, request);
        return Tell(tables, UseOfTables.None, null, request, surroundings);
    }

    private static int CheckStudy(PolarCheckRequest request, DiskFiles files, Surroundings surroundings)
    {
        using var signals = new StopSignals(surroundings);
        var study = Chosen(AskedStudy.ReadAlone(request.Source.Path, surroundings), request.Only);
        var tables = CheckedTables.OfStudy(study, files);
        if (study.Cases.IsEmpty)
        {
            FindingLines.Write(study, surroundings.Error, withSource: surroundings.ErrorIsTerminal);
            surroundings.Error.WriteLine(FindingLines.Closing(study));
            return ExitCode.NothingCouldRun;
        }
        CheckPlace(tables, study, request);
        var progress = new RunProgress(study.Cases.Length, study.Cases.Sum(CaseGroups.Estimate), surroundings.Time);
        UseOfTables Solve() => UseOfTables.Of(
            study.Cases, tables.Tables, surroundings.Solve, request.Workers, progress, signals.Stopping);
        try
        {
            var use = surroundings.ErrorIsTerminal
                ? ProgressBar.Show(Solve, progress, new ScreenLog(surroundings.Error))
                : PlainProgress.Show(Solve, progress, request.Workers, surroundings.Error, surroundings.Time);
            return Tell(tables, use, study, request, surroundings);
        }
        catch (OperationCanceledException) when (signals.Code is not null)
        {
            surroundings.Error.WriteLine("stopped; nothing written");
            return signals.Code.Value;
        }
    }

    private static Study Chosen(Study study, ImmutableArray<string> only)
    {
        const int Shown = 12;
        var choice = new CaseChoice(only);
        var chosen = study.Cases.Where(c => choice.Includes(c.Name)).ToImmutableArray();
        if (chosen.IsEmpty && !study.Cases.IsEmpty)
            throw new WrongUseException(
                $"no case matches {string.Join(", ", only.Select(p => $"'{p}'"))}; the cases are "
                + string.Join(", ", study.Cases.Take(Shown).Select(c => c.Name))
                + (study.Cases.Length > Shown ? $" and {study.Cases.Length - Shown} more" : ""));
        return study with { Cases = chosen };
    }

    // Before hours of solving, not after.
    private static void CheckPlace(CheckedTables tables, Study? study, PolarCheckRequest request)
    {
        var sets = tables.Tables.Select(table => table.File).Concat(tables.Errors.Select(error => error.File))
            .Select(file => Path.GetDirectoryName(Path.GetFullPath(file, study?.Folder ?? Directory.GetCurrentDirectory()))!).Distinct().ToList();
        if (study is not null)
            sets = [.. sets, .. sets.Where(set => set != study.Folder).Select(set => Path.GetDirectoryName(set)!)];
        var names = Names(tables, study, request);
        if (request.Out is { } folder)
            ReportPlace.Check(folder, sets, tables.Tables.Select(table => CheckedPicture.FileNameOf(table.File, names)));
        else if (study is not null)
            ReportPlace.CheckInputs(new ResultsFolder(request.Results, study.Name).Polars, sets, "folder for results with --results");
    }

    private static TableNames Names(CheckedTables tables, Study? study, PolarCheckRequest request)
        => new(tables.Tables.Select(table => table.File).DefaultIfEmpty(""), study?.Name ?? request.Source.FolderName());

    /// <param name="study">Null where tables were asked for by themselves.</param>
    private static int Tell(CheckedTables tables, UseOfTables use, Study? study, PolarCheckRequest request, Surroundings surroundings)
    {
        var report = new PolarReport(tables, use.ByFile);
        var names = Names(tables, study, request);
        var folder = tables.Tables.IsEmpty ? null : Report();
        foreach (var (name, reason) in use.Failed)
            surroundings.Error.WriteLine($"Case {name} failed: {reason}");
        if (request.Json)
            surroundings.Out.WriteLine(report.ToJson(request.Source.Path, CommandLine.ToolVersion));
        else
            PolarCheckLines.Write(tables, use, names, study, folder, surroundings);
        return tables.Tables.IsEmpty ? ExitCode.NothingCouldRun
            : tables.Errors.IsEmpty && use.Failed.IsEmpty && study is null or { Rejected.IsEmpty: true } ? ExitCode.Good
            : ExitCode.SomeNotGood;

        // The folder as the user gave it; null where none is written.
        string? Report()
        {
            ImmutableArray<ResultContent> Files() => [.. report.Files(), .. CheckedPicture.Files(tables, use.ByFile, names)];
            if (request.Out is { } named)
                return ReportPlace.Write(named, Files(), surroundings.Disk);
            if (study is null)
                return null;
            ReportPlace.Write(new ResultsFolder(Path.GetFullPath(request.Results), study.Name), Files(), surroundings.Disk);
            return new ResultsFolder(request.Results, study.Name).Polars;
        }
    }
}
