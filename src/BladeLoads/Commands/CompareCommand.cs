using System.Collections.Immutable;
using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;
using BladeLoads.Batch.Plan;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Wording;
using BladeLoads.Screen;

namespace BladeLoads.Commands;

/// <param name="MoreThan">%: only what moved by more.</param>
/// <param name="Csv">The file for the whole comparison; null for none.</param>
internal sealed record CompareRequest(string Old, string New, string Results, string[] Only, double MoreThan, bool Json, string? Csv);

/// <summary><c>bladeloads compare</c>: what moved between any two results, or sets of them.</summary>
internal static class CompareCommand
{
    private const int TablesShown = 12;

    public static Command Define(Surroundings surroundings)
    {
        var old = new Argument<string>("old") { Description = "the older results: a folder, a case, a kept set, or a study" };
        var now = new Argument<string>("new") { Description = "the newer ones, named in the same ways" };
        var results = CommandLine.ResultsOption();
        results.Description = "the folder in which names are looked for";
        var only = CommandLine.OnlyOption();
        var moreThan = new Option<double>("--more-than")
        {
            Description = "only what moved by more than so many percent",
            HelpName = "percent",
            DefaultValueFactory = _ => 0,
            CustomParser = ParsePercent,
        };
        var json = new Option<bool>("--json") { Description = "as JSON, for scripts" };
        var csv = new Option<string?>("--csv") { Description = "write the comparison into this file too", HelpName = "file" };
        var command = new Command("compare", "Tells what moved between two results, cases, kept sets or studies; solves nothing.")
        {
            old, now, results, only, moreThan, json, csv,
        };
        command.SetAction(parsed => Run(
            new CompareRequest(
                parsed.GetRequiredValue(old), parsed.GetRequiredValue(now), parsed.GetRequiredValue(results), parsed.GetValue(only) ?? [],
                parsed.GetValue(moreThan), parsed.GetValue(json), parsed.GetValue(csv)),
            surroundings));
        return command;
    }

    private static int Run(CompareRequest request, Surroundings surroundings)
    {
        var (old, now) = (NamedResults.Find(request.Old, request.Results), NamedResults.Find(request.New, request.Results));
        var choice = new CaseChoice([.. request.Only]);
        var all = ResultSet.Compare(old, now, MadeFrom.Difference);
        var meant = all.Where(c => choice.Includes(c.Case)).ToImmutableArray();
        if (meant.IsEmpty)
            throw new WrongUseException($"no case matches {string.Join(", ", request.Only.Select(p => $"'{p}'"))}");
        var told = meant.Select(c => MovedMoreThan(c, request.MoreThan)).OfType<CaseComparison>().ToImmutableArray();
        if (request.Csv is { } file && !Written(file, ChangesTable.Write(told), surroundings))
            return ExitCode.NoRoom;
        if (request.Json)
            surroundings.Out.WriteLine(ComparisonJson.Write(old.Folder, now.Folder, told));
        else
            ChangeLines.Write(
                meant,
                new ChangesShown(
                    $"what moved from {old.Name} to {now.Name}, %", request.MoreThan, TablesShown, !surroundings.OutIsTerminal,
                    request.Csv ?? "--csv <file> writes all, --only <pattern> shows some", SummaryLines.Caution),
                surroundings.Out);
        return meant.Any(c => c is CaseComparison.Compared)
            && !meant.Any(c => c is CaseComparison.NotCompared { Reason: NoComparison.Unreadable })
                ? ExitCode.Good : ExitCode.SomeNotGood;
    }

    private static CaseComparison? MovedMoreThan(CaseComparison comparison, double percent)
    {
        if (percent == 0 || comparison is not CaseComparison.Compared compared)
            return comparison;
        var moved = compared.MovedMoreThan(percent);
        return moved.Changes.Any() || !moved.Marks.IsEmpty || moved.HasOtherWindSpeeds || !moved.Doubts.IsEmpty ? moved : null;
    }

    private static bool Written(string file, byte[] bytes, Surroundings surroundings)
    {
        try
        {
            if (WholeFile.Write(file, bytes, replace: true, surroundings.Disk))
                return true;
            surroundings.Error.WriteLine(Printable.Of($"cannot write {file}: a folder of that name is there"));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            surroundings.Error.WriteLine(Printable.Of($"cannot write {file}: {DiskTrouble.Reason(e)}"));
        }
        return false;
    }

    private static double ParsePercent(ArgumentResult argument)
    {
        var text = argument.Tokens.Count == 1 ? argument.Tokens[0].Value : "";
        if (double.TryParse(text, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out var percent) && double.IsFinite(percent))
            return percent;
        argument.AddError($"--more-than is '{Printable.Of(text)}'; give a percentage of 0 or more, with a decimal point: 0.5");
        return 0;
    }
}
