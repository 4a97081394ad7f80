using System.Globalization;
using System.Text;
using BladeLoads.Results.Wording;

namespace BladeLoads.Results.Pictures;

/// <summary>Text from a user made fit for a picture.</summary>
internal static class PictureText
{
    private const string Left = "...";

    /// <summary>As <see cref="Printable"/>, and with every character that the shipped font lacks as its <c>\uXXXX</c>: a box says nothing.</summary>
    public static string Of(string text)
    {
        var printable = Printable.Of(text);
        if (printable.All(char.IsAscii))
            return printable;
        var result = new StringBuilder(printable.Length + 16);
        foreach (var rune in printable.EnumerateRunes())
            if (PictureFont.Has(rune.Value))
                result.Append(rune);
            else
                result.Append(CultureInfo.InvariantCulture, $"\\u{rune.Value:x4}");
        return result.ToString();
    }

    /// <summary>The text, or as much of its beginning and end as a width has room for.</summary>
    /// <param name="width">px</param>
    public static string Fit(string text, float width, float size, bool bold = false)
    {
        if (PictureFont.Width(text, size, bold) <= width)
            return text;
        var runes = text.EnumerateRunes().ToArray();
        var (fits, tooMany) = (0, runes.Length);
        while (tooMany - fits > 1)
        {
            var middle = (fits + tooMany) / 2;
            if (PictureFont.Width(Shortened(runes, middle), size, bold) <= width)
                fits = middle;
            else
                tooMany = middle;
        }
        return Shortened(runes, fits);
    }

    private static string Shortened(Rune[] runes, int kept)
        => string.Concat(runes[..((kept + 1) / 2)]) + Left + string.Concat(runes[^(kept / 2)..]);
}
