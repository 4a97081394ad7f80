using System.Globalization;
using System.Text;

namespace BladeLoads.Studies.Files;

/// <summary>Text of a user's file, made fit to be shown: it moves no cursor, turns no direction of writing, does not run on.</summary>
internal static class VisibleText
{
    private const int LongestQuote = 80;

    /// <summary>Every control, format, line-separating or broken character as <c>\u001B</c>.</summary>
    public static string Escape(string text)
    {
        if (text.All(c => c is >= ' ' and <= '~'))
            return text;
        var visible = new StringBuilder(text.Length + 8);
        foreach (var rune in text.EnumerateRunes())
            if (IsHidden(rune) || rune == Rune.ReplacementChar)
                visible.Append(CultureInfo.InvariantCulture, $"\\u{rune.Value:X4}");
            else
                visible.Append(rune);
        return visible.ToString();
    }

    /// <summary>In single quotes, shortened when long.</summary>
    public static string Quote(string text)
        => text.Length <= LongestQuote ? $"'{text}'" : $"'{text[..(LongestQuote - 3)]}...'";

    public static bool HasHidden(string text) => text.EnumerateRunes().Any(IsHidden);

    /// <summary>Names for a message: all of a few, the first of many.</summary>
    public static string Enumerate(IEnumerable<string> names, string none)
    {
        const int most = 12;
        var all = names.Order(StringComparer.Ordinal).ToList();
        if (all.Count == 0)
            return none;
        var shown = string.Join(", ", all.Take(most));
        return all.Count <= most ? shown : $"{shown} and {(all.Count - most).ToString(CultureInfo.InvariantCulture)} more";
    }

    private static bool IsHidden(Rune rune) => Rune.GetUnicodeCategory(rune) is
        UnicodeCategory.Control or UnicodeCategory.Format or UnicodeCategory.LineSeparator or UnicodeCategory.ParagraphSeparator;
}
