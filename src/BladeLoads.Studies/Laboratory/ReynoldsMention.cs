using System.Text.RegularExpressions;

namespace BladeLoads.Studies.Laboratory;

/// <summary>
/// Whether a line means to give a Reynolds number, in words or signs from which none is read: <c>Re = one million</c>, <c>Re = -1.5e6</c>.
/// Passed over as prose it would be lost, and the table serve at every Reynolds number.
/// </summary>
internal static partial class ReynoldsMention
{
    /// <param name="text">A line, or its beginning, from which no Reynolds number was read.</param>
    public static bool IsIn(string text) => Pattern().IsMatch(text);

    // The full name with a power of ten in words, not as the unit of others; with a number in words behind a sign.
    // The letters with any number behind "="; with a power of ten; with a signed number; as another one: Re,c or ReD.
    // Behind ":" less is taken for a number: letters are answered so.
    [GeneratedRegex(
        """
        (?<![\p{L}\p{N}_])
        (?: reynolds(?![\p{L}\p{N}]) (?:
              [^;|]*? (?<!\bin\s+|[(\[{]\s*) \b(?:millions?|thousands?|hundreds?|mio|mln|millionen|tausend)\b
            | [^;|=:]* [=:] \s* (?:(?:about|approx\.?|ca\.?)\s+)?
              (?:one|two|three|four|five|six|seven|eight|nine|ten|twelve|twenty|half|a\shalf)\b )
          | (?: re(?:_\w+|c|yn?)?\.? (?:[-\s]+(?:numbers?|no\.?|nr\.?))? | rn ) (?![\p{L}\p{N}_]) (?:
              \s* [=≈] [^,;|=]*? (?: [0-9] | \b(?:one|two|three|four|five|six|seven|eight|nine|ten|twelve|twenty|half|millions?|thousands?|hundred)\b )
            | (?:\s*:)? (?:\s+\p{L}+\.?){0,4} \s+ (?:million|thousand|mio|mln|tausend)\b
            | (?:\s*:)? (?:\s+\p{L}+\.?){0,2} \s* [:~≈+−–—-]? \s* [0-9][0-9.,]*
              (?: e\+?0?[4-8](?![0-9]) | \s*[x×*·]\s*10\s*(?:\^|\*\*)?\s*[4-8⁴⁵⁶⁷⁸](?![0-9]) | \s*(?:million|mio|mln)\b )
            | (?:\s*:)? \s* [+−–—-] \s* [0-9]{5,9}(?![0-9]) )
          | re (?: [_,.]\s?\{?\p{L}{1,8}\}? | _?∞ | (?-i:(?<=Re)[A-Z]) ) \s*[=≈]\s*[+−–-]?[0-9] )
        """,
        RegexOptions.IgnoreCase | RegexOptions.IgnorePatternWhitespace | RegexOptions.CultureInvariant)]
    private static partial Regex Pattern();
}
