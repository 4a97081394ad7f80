using System.Text.RegularExpressions;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Toml;

/// <summary>What is wrong with a line that is not TOML, in the words of someone who writes a case file.</summary>
internal static partial class SyntaxSentence
{
    /// <summary>The mistake of a line, where the line alone tells; null otherwise.</summary>
    /// <returns>The column, from 1, and the sentence.</returns>
    public static (int Column, string Sentence)? ForLine(string line)
    {
        if (OpenHeader().Match(line).Groups["name"] is { Success: true } table)
            return (table.Index, $"[{table.Value} has no closing bracket; write [{table.Value}]");
        if (KeyAndRest().Match(line) is not { Success: true } parts)
            return null;
        var key = parts.Groups["key"].Value.Trim('"');
        var rest = parts.Groups["rest"].Value;
        var column = parts.Groups["rest"].Index + 1;
        if (!parts.Groups["equals"].Success)
            return rest.Length > 0 && rest[0] == ':'
                ? (column, $"'{key}' is followed by a colon; write {key} = and the value")
                : (parts.Groups["key"].Index + 1, $"'{key}' has no value; write {key} = and the value");
        if (rest.Length == 0)
            return (column, $"{key} has no value; write one after the =");
        if (NumberText.Misprint(rest) is { } misprint)
            return (column, $"{key} is {VisibleText.Quote(rest)}{misprint}");
        if (LeadingZero().Match(rest) is { Success: true } zero)
            return (column, $"{key} is '{rest}'; write it without leading zeros: {zero.Groups["value"].Value}");
        if (NumberAndMore().Match(rest) is { Success: true } number)
            return (column, $"{key} is '{rest}'; write the number alone: {number.Groups["number"].Value}");
        if (BareWords().IsMatch(rest))
            return rest.ToLowerInvariant() is "true" or "false" or "nan" or "inf"
                ? (column, $"{key} is '{rest}'; write {rest.ToLowerInvariant()}")
                : (column, $"{key} is {VisibleText.Quote(rest)} without quotes; write text in quotes: \"{rest}\"");
        return null;
    }

    /// <summary>The parser's finding, made a sentence that says what would do.</summary>
    public static string Of(string parserMessage, string line)
    {
        if (parserMessage.Contains("closing `]`", StringComparison.Ordinal))
            return "a list that was opened before is not closed here; close it with ]";
        if (parserMessage.StartsWith("Invalid", StringComparison.Ordinal)
            && parserMessage.Contains("string", StringComparison.OrdinalIgnoreCase))
            return "a text is not closed; close it with the quote that opened it, in the same line";
        if (parserMessage.StartsWith("Unable to parse integer", StringComparison.Ordinal))
            return "a whole number is too large here; write a smaller one";
        var detail = parserMessage.Trim().TrimEnd('.');
        return line.Trim().Length == 0
            ? $"not TOML here: {detail}"
            : $"not TOML here: {detail}; the line reads {VisibleText.Quote(line.Trim())}";
    }

    [GeneratedRegex(@"^\s*\[(?<name>[A-Za-z0-9_.-]+)\s*(#.*)?$")]
    private static partial Regex OpenHeader();

    [GeneratedRegex(@"^\s*(?<key>[A-Za-z0-9_.-]+|""[^""]*"")\s*(?<equals>=)?\s*(?<rest>[^#""'\[\]{}=]*?)\s*(#.*)?$")]
    private static partial Regex KeyAndRest();

    [GeneratedRegex(@"^[+-]?0+(?<value>\d+(\.\d+)?)$")]
    private static partial Regex LeadingZero();

    [GeneratedRegex(@"^(?<number>[+-]?\d+(\.\d+)?([eE][+-]?\d+)?)\s*[^\d\s.,_:-].*$")]
    private static partial Regex NumberAndMore();

    [GeneratedRegex(@"^[A-Za-z_./][^,]*$")]
    private static partial Regex BareWords();
}
