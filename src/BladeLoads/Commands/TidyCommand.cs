using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;
using BladeLoads.Results.Keeping;
using BladeLoads.Results.Wording;
using BladeLoads.Screen;

namespace BladeLoads.Commands;

/// <summary><c>bladeloads tidy</c>: removes results that reruns replaced, after saying which and how much room that frees.</summary>
internal static class TidyCommand
{
    private static readonly TimeSpan UsualAge = TimeSpan.FromDays(30);
    private const int UsualNumber = 3;

    public static Command Define(Surroundings surroundings)
    {
        var study = CommandLine.StudyArgument("the study's folder, or its name");
        var results = CommandLine.ResultsOption();
        var olderThan = new Option<TimeSpan?>("--older-than")
        {
            Description = "only results that were replaced longer ago than this: 30d, 2w, 12h",
            HelpName = "age",
            CustomParser = ParseAge,
        };
        var keepLast = new Option<int?>("--keep-last")
        {
            Description = "so many replaced results of each case stay, those solved last",
            HelpName = "number",
            CustomParser = ParseNumber,
        };
        var yes = new Option<bool>("--yes") { Description = "remove without asking" };
        var command = new Command(
            "tidy",
            "Tells which replaced results and unused tables can go and how much room that frees, and removes them when told to. With no "
            + "limit given: those replaced more than 30 days ago, but for the last 3 of each case.")
        {
            study, results, olderThan, keepLast, yes,
        };
        command.SetAction(parsed =>
        {
            var (age, number) = (parsed.GetValue(olderThan), parsed.GetValue(keepLast));
            return age is null && number is null
                ? Run(parsed.GetRequiredValue(study), parsed.GetRequiredValue(results), UsualAge, UsualNumber, parsed.GetValue(yes), surroundings)
                : Run(parsed.GetRequiredValue(study), parsed.GetRequiredValue(results), age, number ?? 0, parsed.GetValue(yes), surroundings);
        });
        return command;
    }

    private static int Run(string study, string root, TimeSpan? olderThan, int keepLast, bool yes, Surroundings surroundings)
    {
        var results = NamedResults.OfStudy(study, root);
        var tidying = Tidying.Plan(results, olderThan, keepLast, surroundings.Time.GetUtcNow());
        if (tidying.IsEmpty)
        {
            surroundings.Out.WriteLine($"nothing to tidy: {Count.Of(tidying.Staying, "replaced result")} {(tidying.Staying == 1 ? "stays" : "stay")}");
            return ExitCode.Good;
        }
        TidyLines.Write(tidying, surroundings.Out, wholeNames: !surroundings.OutIsTerminal);
        if (!yes && surroundings.Ask is null)
        {
            surroundings.Out.WriteLine("nothing removed; --yes removes it");
            return ExitCode.Good;
        }
        if (!yes && !surroundings.Ask!("remove it?"))
        {
            surroundings.Out.WriteLine("nothing removed");
            return ExitCode.Good;
        }
        if (!tidying.Remove(results, surroundings.Disk))
        {
            surroundings.Error.WriteLine(Printable.Of($"nothing removed: a run writes into {results.Study} just now; tidy when it has ended"));
            return ExitCode.SomeNotGood;
        }
        surroundings.Out.WriteLine($"removed; {Room.Of(tidying.Bytes)} freed");
        return ExitCode.Good;
    }

    private static TimeSpan? ParseAge(ArgumentResult argument)
    {
        var text = argument.Tokens.Count == 1 ? argument.Tokens[0].Value : "";
        double? hours = text.Length == 0 ? null : text[^1] switch { 'h' => 1, 'd' => 24, 'w' => 7 * 24, _ => null };
        if (hours is { } unit && double.TryParse(text[..^1], NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out var number)
            && number * unit is <= 1e6)
            return TimeSpan.FromHours(number * unit);
        argument.AddError($"--older-than is '{Printable.Of(text)}'; give a number with h, d or w: 12h, 30d, 2w");
        return null;
    }

    private static int? ParseNumber(ArgumentResult argument)
    {
        var text = argument.Tokens.Count == 1 ? argument.Tokens[0].Value : "";
        if (int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var number))
            return number;
        argument.AddError($"--keep-last is '{Printable.Of(text)}'; give a whole number, 0 or more");
        return null;
    }
}
