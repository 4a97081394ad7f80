using System.CommandLine;

namespace BladeLoads.Commands;

/// <summary>A second name where a command takes one: a guess at a misspelt option would lead astray.</summary>
internal static class SurplusArgument
{
    /// <summary>What to say of the first; null where there is none.</summary>
    public static string? In(ParseResult result)
        => result is { CommandResult.Command: { Arguments: [var argument] } command, UnmatchedTokens: [var surplus, ..] }
            && !surplus.StartsWith('-')
                ? $"'{surplus}' is one too many: 'bladeloads {CommandWords.Of(command)}' takes one <{argument.Name}>"
                : null;
}
