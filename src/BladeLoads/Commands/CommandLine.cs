using System.CommandLine;
using System.CommandLine.Help;
using System.CommandLine.Invocation;
using System.CommandLine.Parsing;
using System.Globalization;
using System.Reflection;
using BladeLoads.Commands.Polar;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.Commands;

/// <summary>The command line: what can be asked, and what every answer ends with.</summary>
internal static class CommandLine
{
    private const int MostWorkers = 1024;

    public static string ToolVersion { get; } =
        typeof(CommandLine).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()!.InformationalVersion;

    /// <summary>Runs a command and returns its exit code. Nothing escapes: no stack trace reaches a user.</summary>
    public static int Run(string[] arguments, Surroundings surroundings)
    {
        try
        {
            var result = Root(surroundings).Parse(arguments, new ParserConfiguration { ResponseFileTokenReplacer = null });
            if (MisspeltOption.In(result) is { } misspelt)
                throw new WrongUseException(misspelt);
            if (SurplusArgument.In(result) is { } surplus)
                throw new WrongUseException(surplus);
            if (result.Errors.Count > 0 && result.Action is ParseErrorAction action)
                return Refuse(result, action, surroundings);
            return result.Invoke(Invocation(surroundings));
        }
        catch (Exception e) when (e is StudyNotFoundException or WrongUseException)
        {
            surroundings.Error.WriteLine(Printable.Of(e.Message));
            return ExitCode.NothingCouldRun;
        }
        catch (NoRoomForResultsException e)
        {
            surroundings.Error.WriteLine(e.Message);
            return ExitCode.NoRoom;
        }
        // Redirected to a full disk, or to nothing at all: perhaps this cannot be told either.
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            TellIfPossible($"cannot write the output: {DiskTrouble.Reason(e)}", surroundings);
            return ExitCode.NoRoom;
        }
        catch (Exception e)
        {
            TellIfPossible($"fault in BladeLoads, please report: {Printable.Of(e.Message)}", surroundings);
            return ExitCode.Fault;
        }
    }

    private static void TellIfPossible(string line, Surroundings surroundings)
    {
        try
        {
            surroundings.Error.WriteLine(line);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            // The exit code says what is left to say.
        }
    }

    private static InvocationConfiguration Invocation(Surroundings surroundings) => new()
    {
        Output = surroundings.Out,
        Error = surroundings.Error,
        EnableDefaultExceptionHandler = false,
        ProcessTerminationTimeout = null,   // signals are ours: see StopSignals
    };

    private static int Refuse(ParseResult result, ParseErrorAction action, Surroundings surroundings)
    {
        action.ShowHelp = false;
        result.Invoke(Invocation(surroundings with { Out = surroundings.Error }));
        var words = CommandWords.Of(result.CommandResult.Command);
        surroundings.Error.WriteLine($"'bladeloads {words}{(words.Length == 0 ? "" : " ")}--help' shows what can be asked, with examples");
        return ExitCode.NothingCouldRun;
    }

    private static RootCommand Root(Surroundings surroundings)
    {
        var root = new RootCommand(
            "Power, thrust and torque curves and blade loads of wind turbine rotors, from blade and section tables. "
            + "Results are an input to, not a substitute for, load calculations under IEC 61400-1/-2, reviewed and signed by licensed engineers.")
        {
            Check(surroundings), Plan(surroundings), RunStudy(surroundings), CompareCommand.Define(surroundings),
            KeepCommand.Define(surroundings), VerifyCommand.Define(surroundings), TidyCommand.Define(surroundings),
            PolarCommand.Define(surroundings),
        };
        root.Directives.Clear();   // a study may be named [suggest]
        foreach (var option in root.Options)
        {
            if (option is HelpOption { Action: HelpAction help })
                option.Action = new HelpWithExamples(help);
            if (option is VersionOption)
                option.Action = new TellVersion();
        }
        return root;
    }

    private static Command Check(Surroundings surroundings)
    {
        var study = StudyArgument("the study's folder, or one case file");
        var command = new Command("check", "Reads a study and tells every error and every doubt at once; solves and writes nothing.") { study };
        command.SetAction(result => CheckCommand.Run(result.GetRequiredValue(study), surroundings));
        return command;
    }

    private static Command Plan(Surroundings surroundings)
    {
        var study = StudyArgument("the study's folder, or one case file");
        var results = ResultsOption();
        var only = OnlyOption();
        var json = new Option<bool>("--json") { Description = "the same for scripts, as JSON" };
        var command = new Command("plan", "Tells how the results of each case stand, what a run would solve, and why; solves nothing.")
        {
            study, results, only, json,
        };
        command.SetAction(result => PlanCommand.Run(
            result.GetRequiredValue(study), result.GetRequiredValue(results), result.GetValue(only) ?? [], result.GetValue(json), surroundings));
        return command;
    }

    private static Command RunStudy(Surroundings surroundings)
    {
        var study = StudyArgument("the study's folder, or one case file");
        var results = ResultsOption();
        var only = OnlyOption();
        var workers = WorkersOption();
        var all = new Option<bool>("--all") { Description = "solve current cases too" };
        var quiet = new Option<bool>("--quiet") { Description = "show errors and warnings alone" };
        var command = new Command("run", "Solves the cases of a study that are not current, and shows the summary.")
        {
            study, results, workers, only, all, quiet,
        };
        command.SetAction(result => RunCommand.Run(
            new RunRequest(
                result.GetRequiredValue(study), result.GetRequiredValue(results), result.GetValue(workers), result.GetValue(only) ?? [],
                result.GetValue(all), result.GetValue(quiet)),
            surroundings));
        return command;
    }

    internal static Argument<string> StudyArgument(string description) => new("study") { Description = description };

    internal static Option<string> ResultsOption()
    {
        var option = new Option<string>("--results")
        {
            Description = "the folder that results go to, a folder for each study in it",
            HelpName = "folder",
            DefaultValueFactory = _ => "results",
        };
        option.Validators.Add(result =>
        {
            if (result.Tokens is [{ Value: "" }])
                result.AddError("--results is empty; give a folder");
        });
        return option;
    }

    internal static Option<string[]> OnlyOption() => new("--only")
    {
        Description = "only cases whose name matches; * is any text, ? one character; may be given several times",
        HelpName = "pattern",
    };

    internal static Option<int> WorkersOption() => new("--workers")
    {
        Description = "how many cases are solved at a time; left out, as many as the machine has cores",
        HelpName = "number",
        DefaultValueFactory = _ => Environment.ProcessorCount,
        CustomParser = ParseWorkers,
    };

    private static int ParseWorkers(ArgumentResult argument)
    {
        var text = argument.Tokens.Count == 1 ? argument.Tokens[0].Value : "";
        if (int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var workers) && workers is >= 1 and <= MostWorkers)
            return workers;
        argument.AddError($"--workers is '{Printable.Of(text)}'; give a whole number from 1 to {MostWorkers}");
        return 1;
    }

    private sealed class TellVersion : SynchronousCommandLineAction
    {
        public override bool ClearsParseErrors => true;

        public override int Invoke(ParseResult parseResult)
        {
            parseResult.InvocationConfiguration.Output.WriteLine(string.Create(
                CultureInfo.InvariantCulture, $"bladeloads {ToolVersion}, solver version {SolverVersion.Number}"));
            return ExitCode.Good;
        }
    }
}
