using System.CommandLine;

namespace BladeLoads.Commands;

/// <summary>A command as a user types it.</summary>
internal static class CommandWords
{
    /// <summary><c>run</c>, <c>polar read</c>; empty for the program itself.</summary>
    public static string Of(Command command)
    {
        var words = new Stack<string>();
        for (Command? at = command; at is not null and not RootCommand; at = at.Parents.OfType<Command>().FirstOrDefault())
            words.Push(at.Name);
        return string.Join(' ', words);
    }
}
