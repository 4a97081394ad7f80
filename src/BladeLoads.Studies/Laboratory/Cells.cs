using System.Collections.Immutable;
using System.Text;

namespace BladeLoads.Studies.Laboratory;

/// <summary>A piece of a line between separators.</summary>
/// <param name="Text">Without blanks around it, and without its quotes.</param>
/// <param name="Column">Of its first character in the line, counted from 1.</param>
/// <param name="IsQuoted">It stood in double quotes: separators within it were none.</param>
internal readonly record struct Cell(string Text, int Column, bool IsQuoted);

/// <summary>Lines taken apart.</summary>
internal static class Cells
{
    public static char? SignOf(CellSeparator separator) => separator switch
    {
        CellSeparator.Tab => '\t',
        CellSeparator.Semicolon => ';',
        CellSeparator.Comma => ',',
        CellSeparator.Bar => '|',
        _ => null,
    };

    public static string InWords(CellSeparator separator) => separator switch
    {
        CellSeparator.Tab => "tabs",
        CellSeparator.Semicolon => "semicolons",
        CellSeparator.Comma => "commas",
        CellSeparator.Bar => "bars",
        _ => "blanks",
    };

    /// <summary>The cells of a line, in their order; empty ones stand, but for those outside the outer bars of a line.</summary>
    public static ImmutableArray<Cell> Of(string line, CellSeparator separator)
    {
        var cells = ImmutableArray.CreateBuilder<Cell>();
        var at = 0;
        if (SignOf(separator) is not { } sign)
        {
            while (SkipBlanks(line, ref at))
                cells.Add(Next(line, ref at, char.IsWhiteSpace));
            return cells.DrainToImmutable();
        }
        var end = line.Length;
        if (separator == CellSeparator.Bar)
            (at, end) = WithinBars(line);
        var inner = line[..end];
        while (true)
        {
            // A tab is a blank too, and must not be passed over.
            while (at < inner.Length && inner[at] != sign && char.IsWhiteSpace(inner[at]))
                at++;
            cells.Add(Next(inner, ref at, c => c == sign));
            if (at >= inner.Length)
                return cells.DrainToImmutable();
            at++;
        }
    }

    /// <summary>The same without empty cells at the end, down to <paramref name="count"/>: a line may end in separators.</summary>
    public static ImmutableArray<Cell> WithoutTrailing(ImmutableArray<Cell> cells, int count)
    {
        var length = cells.Length;
        while (length > count && cells[length - 1] is { Text.Length: 0, IsQuoted: false })
            length--;
        return length == cells.Length ? cells : cells[..length];
    }

    private static Cell Next(string line, ref int at, Func<char, bool> ends)
    {
        var start = at;
        if (at < line.Length && line[at] == '"' && Quoted(line, at, ends) is var (text, after))
        {
            at = after;
            return new Cell(text.Trim(), start + 1, true);
        }
        while (at < line.Length && !ends(line[at]))
            at++;
        return new Cell(line[start..at].Trim(), start + 1, false);
    }

    // Null where no quote closes it right before a separator: then quotes are characters as others.
    private static (string Text, int After)? Quoted(string line, int at, Func<char, bool> ends)
    {
        var text = new StringBuilder();
        for (var i = at + 1; i < line.Length; i++)
        {
            if (line[i] != '"')
            {
                text.Append(line[i]);
                continue;
            }
            if (i + 1 < line.Length && line[i + 1] == '"')
            {
                text.Append('"');
                i++;
                continue;
            }
            var after = i + 1;
            while (after < line.Length && !ends(line[after]) && char.IsWhiteSpace(line[after]))
                after++;
            return after == line.Length || ends(line[after]) ? (text.ToString(), after) : null;
        }
        return null;
    }

    private static bool SkipBlanks(string line, ref int at)
    {
        while (at < line.Length && char.IsWhiteSpace(line[at]))
            at++;
        return at < line.Length;
    }

    private static (int From, int To) WithinBars(string line)
    {
        var (from, to) = (0, line.TrimEnd().Length);
        if (to > 1 && line[to - 1] == '|')
            to--;
        var first = line.Length - line.TrimStart().Length;
        if (first < to && line[first] == '|')
            from = first + 1;
        return (from, to);
    }
}
