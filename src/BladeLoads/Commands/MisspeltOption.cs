using System.CommandLine;
using BladeLoads.Results.Wording;
using BladeLoads.Studies;

namespace BladeLoads.Commands;

/// <summary>A word that begins like an option and is none: without a look it would be taken for a study.</summary>
internal static class MisspeltOption
{
    /// <summary>What to say of the first; null where there is none.</summary>
    public static string? In(ParseResult result)
    {
        var command = result.CommandResult.Command;
        var known = command.Options.Concat(result.RootCommandResult.Command.Options).Select(o => o.Name).Distinct().ToArray();
        foreach (var token in result.Tokens)
        {
            if (token.Value == "--")
                return null;
            if (!token.Value.StartsWith("--", StringComparison.Ordinal) || known.Contains(token.Value.Split('=')[0], StringComparer.Ordinal)
                || command.Options.Any(o => o.Aliases.Contains(token.Value)))
                continue;
            return Nearest.Of(token.Value, known) is { } near
                ? Printable.Of($"unknown option '{token.Value}'; did you mean '{near}'?")
                : Printable.Of($"unknown option '{token.Value}'; 'bladeloads {CommandWords.Of(command)} --help' shows what there is; for a file or folder of that name say './{token.Value}'");
        }
        return null;
    }
}
