using System.Text.RegularExpressions;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Laboratory;

/// <summary>A line that names a Reynolds number: <c>Re = 1.0e6</c>, <c>Reynolds number 1 000 000</c>, <c>Re (millions) 1.5</c>.</summary>
/// <param name="Line">Counted from 1.</param>
/// <param name="Text">Of the line.</param>
/// <param name="Value">NaN where the number cannot be told.</param>
/// <param name="Problem">Why it cannot be told: how the text names it.</param>
internal readonly partial record struct ReynoldsLine(int Line, string Text, double Value, string Problem)
{
    private const int LongestLook = 200;   // characters: a line that announces something does so early
    private const string Several = "names more than one Reynolds number";
    private const string NotUnderstood = "names a Reynolds number in a way that is not understood";

    public bool IsUnderstood => !double.IsNaN(Value);

    /// <summary>Null for a line that names none.</summary>
    /// <param name="unit">Of numbers beside which none stands.</param>
    public static ReynoldsLine? In(string whole, int line, ReynoldsUnit? unit)
    {
        var text = whole.Length <= LongestLook ? whole : whole[..LongestLook];
        // Most lines of a file are asked, and patterns are slow.
        if (text.AsSpan().IndexOfAny('r', 'R') < 0)
            return null;
        var values = new HashSet<double>();
        string? problem = null;
        foreach (Match match in Naming().Matches(text))
        {
            if (match.Groups["number"].Success)
                problem = Read(match, text, unit, values) ?? problem;
            else if (match.Groups["whole"].Success && text.AsSpan(match.Index).IndexOfAnyInRange('0', '9') >= 0
                || ReynoldsSurroundings.Compares(match.Groups["remark"].Value + text[(match.Index + match.Length)..]))
                problem ??= NotUnderstood;
        }
        problem ??= values.Count > 1 ? Several : values.Count == 0 && ReynoldsMention.IsIn(text) ? NotUnderstood : null;
        return problem is not null ? new ReynoldsLine(line, whole.Trim(), double.NaN, problem)
            : values.Count == 1 ? new ReynoldsLine(line, whole.Trim(), values.First(), "")
            : null;
    }

    // What is wrong with the number; null where it is one of the values.
    private static string? Read(Match match, string text, ReynoldsUnit? unit, HashSet<double> values)
    {
        var number = match.Groups["number"].Value.TrimEnd(' ', '.', ',', '\'', '\u2019', '\u00A0', '\u2009', '\u202F');
        var isMultiplied = match.Groups["times"].Success || match.Groups["million"].Success || match.Groups["thousand"].Success;
        var end = isMultiplied ? match.Index + match.Length : match.Groups["number"].Index + number.Length;
        var (before, after) = (text[..match.Index], text[end..]);
        if (ReynoldsSurroundings.NamesAnother(before, after))
            return Several;
        if (MoreNumbers().IsMatch(after) || NumbersInARow().IsMatch(after))
            return "names a Reynolds number, and another number stands right behind it";
        if (GoesOn().IsMatch(after))
            return NotUnderstood;
        var power = PowerOf(match);
        if (power == 0 && number.AsSpan().IndexOfAny("eEdD") < 0)
            power = (int)(unit ?? 0);
        switch (ReynoldsText.Readings(number, power))
        {
            case [var value]:
                values.Add(value);
                return ReynoldsSurroundings.Qualifier(before, Remark(match), after) is { } qualifier
                    ? $"names a Reynolds number, and {VisibleText.Quote(qualifier)} beside it may make it another than that of the rows"
                    : null;
            case [var one, var other]:
                return $"names a Reynolds number that can be {CanonicalText.Of(one)} or {CanonicalText.Of(other)}";
            default:
                return $"names a Reynolds number of {number}, and those of blades are {PolarLimits.ReynoldsInWords}"
                    + (power == 0 ? ", so give its unit (--reynolds millions or thousands)" : "");
        }
    }

    /// <summary>Whether a cell of a row names a Reynolds number: a remark that matters, or a line that ran into the row.</summary>
    public static bool IsNamedIn(string cell) => InCell().IsMatch(cell.Length <= LongestLook ? cell : cell[..LongestLook]);

    /// <summary>
    /// The power of ten in a remark on a Reynolds number, such as <c>millions</c>, <c>x 10^6</c>, <c>/1e6</c>; 0 where there is none.
    /// </summary>
    /// <remarks>Whether it multiplies or divides cannot be told from its sign, and need not: only one of the two gives such a number.</remarks>
    public static int PowerIn(string remark) => Millions().IsMatch(remark) ? 6 : Thousands().IsMatch(remark) ? 3 : 0;

    private static string Remark(Match match) => match.Groups["suffix"].Success ? $"({match.Groups["suffix"].Value})" : match.Groups["remark"].Value;

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
        (?: (?<whole>reynolds (?:[-\s]*(?:numbers?|no\.?|nr\.?|zahl))?
              (?:,?\s+(?:(?:based\s+)?on\s+)?(?:the\s+)?(?:mean\s+)?(?:aerodynamic\s+|section\s+|aerofoil\s+)?chord(?:\s+length)?(?![\p{L}\p{N}_]))?
              (?:,?\s+re(?![\p{L}\p{N}_]))?)
          | (?:re[-\s]+(?:numbers?|no\.?|nr\.?) | reyn?\.? | re\.)(?=\s*[=:]) | rec(?=\s*=)
          | re(?:_(?<suffix>c|chord|nom|mean|max|min|crit|unit))? | rn ) (?![\p{L}\p{N}_])
        \s*
        (?<remark> [(\[{<][^)\]}>]*[)\]}>] | [x×*·/]\s*(?:10\s*\^?\s*[-−]?\s*[0-9⁰¹²³⁴⁵⁶⁷⁸⁹]+ | 1e[-+]?[0-9]+) )?
        (?:
          [\s:=;,|"~≈]* (?:(?:is|of|about)\s+)?
          (?<number> (?:[0-9](?:[0-9.,'’\u00A0\u2009\u202F\x20] | _(?=[0-9]{3}(?![0-9])))* | [.,][0-9]+) (?:(?<=[0-9.])[ed][-+]?[0-9]+)? )
          (?: \s*[x×*·]\s*10\s*(?:\^|\*\*)?\s*(?<times>[0-9⁰¹²³⁴⁵⁶⁷⁸⁹]{1,2})(?![0-9])
            | \s*(?<million>millions?|mill?\b\.?|mio\b\.?|mln\b\.?|(?-i:M)(?![\p{L}\p{N}]))
            | \s*(?<thousand>thousand|tsd\b\.?|k(?![\p{L}\p{N}])) )?
        )?
        """,
        RegexOptions.IgnoreCase | RegexOptions.IgnorePatternWhitespace | RegexOptions.CultureInvariant)]
    private static partial Regex Naming();

    // Another number right behind it.
    [GeneratedRegex(
        @"^\s*(?:[,;/&~±–−+|-]|to\b|and\b|or\b|bis\b|\.\.+)?\s*[-+.,]?[0-9]", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex MoreNumbers();

    // As a word.
    [GeneratedRegex(@"^[\p{L}\p{N}^]", RegexOptions.CultureInvariant)]
    private static partial Regex GoesOn();

    [GeneratedRegex(@"re(?:ynolds[^=:0-9]*)?\s*[=:]\s*[0-9]", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex InCell();

    // Numbers with nothing but separators between: a row of the table that has run into the line.
    [GeneratedRegex("""(?:^|[\s;,|"])[-−+]?[0-9][0-9.,]*"?[\s;,|]+"?[-−+]?[0-9.]""", RegexOptions.CultureInvariant)]
    private static partial Regex NumbersInARow();

    [GeneratedRegex(
        @"million|\bmio\b|\bmln\b|10\s*\^?\s*[-−]?\s*[6⁶](?![0-9])|\be[-+]?0?6\b|1e[-+]?0?6\b",
        RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex Millions();

    [GeneratedRegex(@"thousand|\bk\b|10\s*\^?\s*[-−]?\s*[3³](?![0-9])|1e[-+]?0?3\b", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex Thousands();
}
