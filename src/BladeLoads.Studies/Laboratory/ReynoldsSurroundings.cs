using System.Text.RegularExpressions;

namespace BladeLoads.Studies.Laboratory;

/// <summary>
/// What stands around a Reynolds number in a line of words. It is that of the rows only where nothing beside it may make it another: the
/// largest of a tunnel, a critical one, one a metre of chord.
/// </summary>
internal static partial class ReynoldsSurroundings
{
    // They turn a number into another wherever they stand in the same part of a line.
    private static readonly HashSet<string> Qualifiers = Words(
        "largest highest biggest greatest max maximum maximal min minimum minimal least lowest smallest most critical crit per up upto until "
        + "below above over under between from range ranges ranging various different several unit design limit limits beyond exceeding than "
        + "except other varied varies variable never not nicht kein keine pro je bis");

    // They say how or on what a section was measured, or nothing.
    private static readonly HashSet<string> Harmless = Words(
        "the a an is chord stream freestream free nominal nom mean average test tested measured run polar polars section profile aerofoil data same "
        + "clean soiled rough fouled eroded smooth tripped fixed forced natural transition approx approximately based number reynolds "
        + "millions million thousand thousands mio mln c re");

    // What follows one of these is said of something else.
    private static readonly HashSet<string> Prepositions = Words("at for with by in and of on bei mit und");

    /// <summary>The word or sign that may make it another number; null where there is none.</summary>
    /// <param name="before">Of the line, up to the name.</param>
    /// <param name="remark">Between name and number, in brackets.</param>
    /// <param name="after">Of the line, behind the number and what it is multiplied by.</param>
    public static string? Qualifier(string before, string remark, string after) => Before(before) ?? Remark(remark) ?? After(after);

    /// <summary>Whether a name without a number behind it says more or less than a number that follows: <c>Re &lt; 1e6</c>.</summary>
    public static bool Compares(string after)
    {
        var begin = after.AsSpan().TrimStart(" \t(,:=").ToString();
        return (begin is ['<' or '>' or '≤' or '≥' or '≠' or '±' or '!', ..] || Word().Match(begin) is { Index: 0, Success: true } word
            && Qualifiers.Contains(Plain(word.Value))) && NamesAnother("", begin);
    }

    /// <summary>Whether another number that can be a Reynolds number stands in the line.</summary>
    public static bool NamesAnother(string before, string after)
        => WithAPower().IsMatch(before) || WithAPower().IsMatch(after) || WithoutAPower().IsMatch(after);

    private static string? Before(string before)
    {
        var part = before[(before.AsSpan().LastIndexOfAny(",;|(") + 1)..];
        if (Word().Matches(part).FirstOrDefault(word => Qualifiers.Contains(Plain(word.Value))) is { } qualifier)
            return qualifier.Value;
        var end = part.TrimEnd(' ', '\t', '"', '\'', '.');
        if (end.Length == 0)
            return Word().Matches(before) is [.., var last] && Qualifiers.Contains(Plain(last.Value)) ? last.Value : null;
        if (!char.IsLetterOrDigit(end[^1]))
            return ":-–—=)]*#_".Contains(end[^1]) ? null : end[^1].ToString();
        return Word().Matches(end) is [.., var word] && word.Index + word.Length == end.Length && !IsHarmless(word.Value) ? word.Value : null;
    }

    private static string? Remark(string remark)
    {
        if (remark is not ['(' or '[' or '{' or '<', ..])
            return null;
        var inner = remark[1..^1].Trim();
        return Word().Matches(inner).FirstOrDefault(word => Qualifiers.Contains(Plain(word.Value))) is { } qualifier ? qualifier.Value
            : ReynoldsLine.PowerIn(remark) > 0 || inner is "" or "-" ? null
            : inner.Any(char.IsAsciiDigit) || inner.Contains('/') ? inner
            : Word().Matches(inner).FirstOrDefault(word => !IsHarmless(word.Value))?.Value;
    }

    private static string? After(string after)
    {
        var isOfSomethingElse = false;
        foreach (Match token in Tokens().Matches(after))
        {
            var word = token.Groups["word"].Value;
            if (Qualifiers.Contains(Plain(word)))
                return word;
            if (token.Groups["end"].Success)
                return Word().Match(after[(token.Index + token.Length)..]) is { Success: true } next && Qualifiers.Contains(Plain(next.Value))
                    ? next.Value
                    : null;
            if (token.Groups["value"].Success)
                return null;
            if (!isOfSomethingElse && (token.Groups["sign"].Success || word.Length > 0 && !IsHarmless(word)))
                return token.Value.Trim();
            isOfSomethingElse |= Prepositions.Contains(Plain(word));
        }
        return null;
    }

    // A word with a digit in it names something: a section, a run.
    private static bool IsHarmless(string word)
        => word.Any(char.IsAsciiDigit) || Harmless.Contains(Plain(word)) || Prepositions.Contains(Plain(word));

    private static string Plain(string word) => word.TrimEnd('.', '-', '_').ToLowerInvariant();

    private static HashSet<string> Words(string words) => new(words.Split(' '), StringComparer.Ordinal);

    [GeneratedRegex(@"\p{L}[\p{L}\p{N}_.-]*")]
    private static partial Regex Word();

    // The end of a part; a quantity with its value; a word; signs that mean nothing; others.
    [GeneratedRegex(
        """
        \s* (?: (?<end> [,;|] | [-–—](?=\s|$) )
        | (?<word> \p{L}[\p{L}\p{N}_.-]* ) (?<value> \s*[=:≈] | (?<=(?i:ma|mach|tu|ncrit|run|entry|test|section|case))\s+[0-9] )?
        | (?<none> ["'()\[\].\#*!=_~]+ ) | (?<sign> \S\S* ) )
        """,
        RegexOptions.IgnorePatternWhitespace | RegexOptions.CultureInvariant)]
    private static partial Regex Tokens();

    // Unless a letter stands for it: q = 1.2e4.
    [GeneratedRegex(
        """
        (?=[0-9]) (?<![\p{L}\p{N}_.,^]) (?<!\b\p{L}{1,2}\s*=\s*)
        [0-9][0-9.,]* (?: [ed]\+?0?[4-8](?![0-9]) | \s*[x×*·]\s*10\s*(?:\^|\*\*)?\s*[4-8⁴⁵⁶⁷⁸](?![0-9]) | \s*(?:millions?|mio|mln)\b )
        """,
        RegexOptions.IgnoreCase | RegexOptions.IgnorePatternWhitespace | RegexOptions.CultureInvariant)]
    private static partial Regex WithAPower();

    // Not 20190704: a day.
    [GeneratedRegex(
        """
        (?=[0-9]) (?<![\p{L}\p{N}_.,^/-]) (?<!\b\p{L}{1,2}\s*=\s*)
        (?: (?!(?:19|20)[0-9]{6}(?![0-9])) [0-9]{5,9} | [0-9]{1,3}(?:[ ',._][0-9]{3}){2} ) (?![\p{L}\p{N}_/-]|[.,][0-9])
        """,
        RegexOptions.IgnorePatternWhitespace | RegexOptions.CultureInvariant)]
    private static partial Regex WithoutAPower();
}
