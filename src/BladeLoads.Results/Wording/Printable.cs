using System.Globalization;
using System.Text;

namespace BladeLoads.Results.Wording;

/// <summary>Text from a user made fit for a terminal or a log.</summary>
public static class Printable
{
    /// <summary>
    /// The text with every control character, line or paragraph separator, lone surrogate and invisible format character (those that
    /// turn the direction of writing among them) replaced by its <c>\uXXXX</c>; everything else unchanged.
    /// </summary>
    /// <remarks>Within a JSON string the replacement is an escape for the same character, so JSON text stays JSON.</remarks>
    public static string Of(string text)
    {
        if (!text.AsSpan().ContainsAnyExceptInRange(' ', '~'))
            return text;
        var result = new StringBuilder(text.Length + 16);
        for (var i = 0; i < text.Length;)
        {
            var whole = Rune.TryGetRuneAt(text, i, out var rune);
            var length = whole ? rune.Utf16SequenceLength : 1;
            if (whole && IsShown(rune))
                result.Append(text, i, length);
            else
                foreach (var unit in text.AsSpan(i, length))
                    result.Append(CultureInfo.InvariantCulture, $"\\u{(int)unit:x4}");
            i += length;
        }
        return result.ToString();
    }

    private static bool IsShown(Rune rune) => Rune.GetUnicodeCategory(rune) is not (
        UnicodeCategory.Control or UnicodeCategory.Format or UnicodeCategory.LineSeparator or UnicodeCategory.ParagraphSeparator
        or UnicodeCategory.Surrogate);
}
