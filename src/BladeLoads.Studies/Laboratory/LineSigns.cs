namespace BladeLoads.Studies.Laboratory;

/// <summary>By what a line is known that holds no row.</summary>
/// <param name="asked">A mark of comments besides the usual ones; null for none.</param>
internal sealed class LineSigns(string? asked)
{
    private readonly string[] _marks = asked is null ? ["#", "%", "!", "//"] : ["#", "%", "!", "//", asked];

    /// <param name="rest">The comment without its mark.</param>
    public bool IsComment(string line, out string rest)
    {
        rest = "";
        var text = line.TrimStart();
        if (FirstWord(text) is var first && ForeignNumber.IsErrorOfASpreadsheet(first))
            return false;
        foreach (var mark in _marks)
            if (text.StartsWith(mark, StringComparison.Ordinal))
            {
                rest = text[mark.Length..];
                return true;
            }
        return false;
    }

    /// <summary>A line without the remark that ends it; only a line that begins as a row does can have one.</summary>
    public string WithoutRemark(string line)
    {
        var begin = line.AsSpan().TrimStart();
        if (begin.IsEmpty || !(char.IsAsciiDigit(begin[0]) || begin[0] is '+' or '-' or '.' or ',' or '"' or '|' or '\u2212'))
            return line;
        return WithoutEnd(line);
    }

    /// <summary>A line without what follows a comment mark in it.</summary>
    public string WithoutEnd(string line)
    {
        for (var at = 1; at < line.Length; at++)
            if (char.IsWhiteSpace(line[at - 1]) && EndsAt(line.AsSpan(at)) && !ForeignNumber.IsErrorOfASpreadsheet(FirstWord(line[at..])))
                return line[..at];
        return line;
    }

    // Not %: it stands behind numbers, and may mean them.
    private bool EndsAt(ReadOnlySpan<char> rest)
    {
        foreach (var mark in _marks)
            if (mark != "%" && rest.StartsWith(mark, StringComparison.Ordinal))
                return true;
        return false;
    }

    /// <summary>Blanks and separators alone, as a spreadsheet writes an empty row.</summary>
    public static bool IsEmpty(string line) => line.All(c => char.IsWhiteSpace(c) || c is ';' or ',' or '|' or '"');

    /// <summary>A line drawn with signs, to set a header off.</summary>
    public static bool IsRuling(string line)
        => line.Count(c => c is '-' or '=' or '_' or '~' or '*') >= 3
            && line.All(c => char.IsWhiteSpace(c) || c is '-' or '=' or '_' or '~' or '*' or '+' or '|' or ':' or ';' or ',');

    private static string FirstWord(string text)
    {
        var end = text.AsSpan().IndexOfAny(" \t;,|");
        return end < 0 ? text : text[..end];
    }
}
