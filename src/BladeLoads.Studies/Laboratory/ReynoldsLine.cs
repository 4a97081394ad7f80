using System.Text.RegularExpressions;

namespace BladeLoads.Studies.Laboratory;

/// <summary>A line that names a Reynolds number: <c>Re = 1.0e6</c>, <c>Reynolds number 1 000 000</c>, <c>Re (millions) 1.5</c>.</summary>
/// <param name="Line">Counted from 1.</param>
/// <param name="Value">NaN where the number cannot be told.</param>
internal readonly partial record struct ReynoldsLine(int Line, double Value)
{
    private const int LongestLook = 200;   // characters: a line that announces something does so early

    public bool IsUnderstood => !double.IsNaN(Value);

    /// <summary>Null for a line that names none.</summary>
    public static ReynoldsLine? In(string whole, int line)
    {
        var text = whole.Length <= LongestLook ? whole : whole[..LongestLook];
        var values = new HashSet<double>();
        var isUnclear = false;
        foreach (Match match in Naming().Matches(text))
        {
            if (!match.Groups["number"].Success)
            {
                isUnclear |= match.Groups["whole"].Success && text.AsSpan(match.Index).IndexOfAnyInRange('0', '9') >= 0;
                continue;
            }
            var number = match.Groups["number"].Value.TrimEnd(' ', '.', ',', '\'', '\u2019', '\u00A0', '\u2009', '\u202F');
            var isMultiplied = match.Groups["times"].Success || match.Groups["million"].Success || match.Groups["thousand"].Success;
            var end = isMultiplied ? match.Index + match.Length : match.Groups["number"].Index + number.Length;
            if (!MoreNumbers().IsMatch(text[end..]) && !NumbersInARow().IsMatch(text[end..])
                && ReynoldsText.TryParse(number, PowerOf(match), null, out var value))
                values.Add(value);
            else
                isUnclear = true;
        }
        return values.Count == 1 && !isUnclear ? new ReynoldsLine(line, values.First())
            : values.Count > 0 || isUnclear ? new ReynoldsLine(line, double.NaN)
            : null;
    }

    /// <summary>Whether a cell of a row names a Reynolds number: a remark that matters, or a line that ran into the row.</summary>
    public static bool IsNamedIn(string cell) => InCell().IsMatch(cell.Length <= LongestLook ? cell : cell[..LongestLook]);

    /// <summary>
    /// The power of ten in a remark on a Reynolds number, such as <c>millions</c>, <c>x 10^6</c>, <c>/1e6</c>; 0 where there is none.
    /// </summary>
    /// <remarks>Whether it multiplies or divides cannot be told from its sign, and need not: only one of the two gives such a number.</remarks>
    public static int PowerIn(string remark) => Millions().IsMatch(remark) ? 6 : Thousands().IsMatch(remark) ? 3 : 0;

    private static int PowerOf(Match match)
    {
        var power = PowerIn(match.Groups["remark"].Value);
        if (match.Groups["times"].Success)
            power += Times(match.Groups["times"].Value);
        return power + (match.Groups["million"].Success ? 6 : match.Groups["thousand"].Success ? 3 : 0);
    }

    private static int Times(string digits)
    {
        const string raised = "\u2070\u00B9\u00B2\u00B3\u2074\u2075\u2076\u2077\u2078\u2079";
        var power = 0;
        foreach (var digit in digits)
            power = (10 * power) + (raised.Contains(digit) ? raised.IndexOf(digit, StringComparison.Ordinal) : digit - '0');
        return power;
    }

    // A name; a remark on it; then a number, with what it is multiplied by. Re alone is a name only where a number follows.
    [GeneratedRegex(
        """
        (?<![\p{L}\p{N}_])
        (?: (?<whole>reynolds (?:[-\s]*(?:numbers?|no\.?|nr\.?|zahl))?) | re | rn ) (?![\p{L}\p{N}_])
        \s*
        (?<remark> [(\[{<][^)\]}>]*[)\]}>] | [x×*·/]\s*(?:10\s*\^?\s*[-−]?\s*[0-9⁰¹²³⁴⁵⁶⁷⁸⁹]+ | 1e[-+]?[0-9]+) )?
        (?:
          [\s:=;,|"~≈]* (?:(?:is|of|about)\s+)?
          (?<number> (?:[0-9][0-9.,'’\u00A0\u2009\u202F\x20]* | [.,][0-9]+) (?:(?<=[0-9.])[ed][-+]?[0-9]+)? )
          (?: \s*[x×*·]\s*10\s*(?:\^|\*\*)?\s*(?<times>[0-9⁰¹²³⁴⁵⁶⁷⁸⁹]{1,2})(?![0-9])
            | \s*(?<million>millions?|mill?\b\.?|mio\b\.?|(?-i:M)(?![\p{L}\p{N}]))
            | \s*(?<thousand>thousand|tsd\b\.?|k(?![\p{L}\p{N}])) )?
        )?
        """,
        RegexOptions.IgnoreCase | RegexOptions.IgnorePatternWhitespace | RegexOptions.CultureInvariant)]
    private static partial Regex Naming();

    // Another number right behind it, or the number goes on as a word.
    [GeneratedRegex(
        @"^\s*(?:[,;/&~±–−+|-]|to\b|and\b|or\b|bis\b|\.\.+)?\s*[-+.,]?[0-9]|^[\p{L}\p{N}^]",
        RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex MoreNumbers();

    [GeneratedRegex(@"re(?:ynolds[^=:0-9]*)?\s*[=:]\s*[0-9]", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex InCell();

    // Numbers with nothing but separators between: a row of the table that has run into the line.
    [GeneratedRegex("""(?:^|[\s;,|"])[-−+]?[0-9][0-9.,]*"?[\s;,|]+"?[-−+]?[0-9.]""", RegexOptions.CultureInvariant)]
    private static partial Regex NumbersInARow();

    [GeneratedRegex(
        @"million|\bmio\b|10\s*\^?\s*[-−]?\s*[6⁶](?![0-9])|\be[-+]?0?6\b|1e[-+]?0?6\b",
        RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex Millions();

    [GeneratedRegex(@"thousand|\bk\b|10\s*\^?\s*[-−]?\s*[3³](?![0-9])|1e[-+]?0?3\b", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex Thousands();
}
