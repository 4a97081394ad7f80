using System.CommandLine;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Commands.Polar;

/// <summary><c>bladeloads polar extend</c>: tables from -180 to 180 degrees, from tables that end near stall.</summary>
internal static class PolarExtendCommand
{
    public static Command Define(Surroundings surroundings)
    {
        var set = new NewSetOptions("extend");
        var aspectRatio = NumberOption.Define(
            "--aspect-ratio", "length of the blade over its mean chord; drag deep in stall depends on it", "ratio", 0.1, 1000, "15.5");
        var blade = new Option<string>("--blade") { Description = "a blade table that gives the aspect ratio", HelpName = "blade.csv" };
        var join = WordOption.Define<ExtensionJoin>(
            "--join", "where the extension begins: at the end of the table, which keeps every row, or at stall; left out, at the end");
        var command = new Command(
            "extend", "Carries polar tables on to -180 and 180 degrees by the relation of Viterna and Corrigan (1982) for deep stall.")
        {
            set.Source, set.Folder, aspectRatio, blade, join, set.Only, set.Replace,
        };
        command.SetAction(parsed => Asked(parsed.GetValue(aspectRatio), parsed.GetValue(blade), parsed.GetValue(join), surroundings) is { } asked
            ? set.Of(parsed).Make((table, file) => ExtendedTable.Of(table, file, asked), surroundings)
            : ExitCode.NothingCouldRun);
        return command;
    }

    // Null, and told, where the blade cannot be read.
    private static ExtensionAsked? Asked(double? aspectRatio, string? blade, ExtensionJoin? join, Surroundings surroundings)
    {
        var joined = join ?? ExtensionJoin.End;
        return (aspectRatio, blade) switch
        {
            ({ } ratio, null) => new ExtensionAsked(ratio, "", joined),
            (null, { } path) => GivenBlade.Read(path, surroundings) is { } given
                ? new ExtensionAsked(given.AspectRatio, $" of {Path.GetFileName(path)}", joined)
                : null,
            _ => throw new WrongUseException("give the aspect ratio of the blade with --aspect-ratio, or the blade table with --blade; one of them"),
        };
    }
}
