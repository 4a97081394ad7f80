using System.Collections.Immutable;

namespace BladeLoads.EndToEnd.Documentation;

/// <summary>A table of docs/formats.md, found by the line that introduces it.</summary>
internal static class DocumentedTable
{
    private const string Document = "docs/formats.md";

    /// <summary>The cells of each row below the header, trimmed, of the first table after the line that reads <paramref name="introduction"/>.</summary>
    /// <exception cref="FormatException">There is no such line, or no table after it.</exception>
    public static ImmutableArray<ImmutableArray<string>> Rows(string introduction)
    {
        var after = Repository.Lines(Document).SkipWhile(line => line != introduction).Skip(1).ToList();
        var rows = after.SkipWhile(line => !line.StartsWith('|')).TakeWhile(line => line.StartsWith('|')).Skip(2)
            .Select(line => line.Trim('|').Split('|').Select(cell => cell.Trim()).ToImmutableArray()).ToImmutableArray();
        return rows.IsEmpty ? throw new FormatException($"{Document}: no table after '{introduction}'") : rows;
    }

    /// <summary>The words of the first column without their quotes of code; a cell may hold several.</summary>
    public static ImmutableArray<string> Names(string introduction) => [.. Rows(introduction).SelectMany(row => NamesIn(row[0]))];

    public static IEnumerable<string> NamesIn(string cell) => cell.Split(", ").Select(name => name.Trim('`'));
}
