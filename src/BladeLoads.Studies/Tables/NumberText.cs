using System.Buffers;
using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Tables;

/// <summary>Numbers as tables write them: decimal point, no thousands separators, no words.</summary>
internal static partial class NumberText
{
    private static readonly SearchValues<byte> PartsOfNumbers = SearchValues.Create("0123456789+-.eE"u8);

    /// <param name="text">Trimmed; UTF-8.</param>
    /// <param name="value">Finite where the answer is true.</param>
    public static bool TryParse(ReadOnlySpan<byte> text, out double value)
    {
        value = double.NaN;
        // The framework also takes NaN, Infinity and NULs at the end: none is made of these characters only.
        var isNumber = text.IndexOfAnyExcept(PartsOfNumbers) < 0
            && double.TryParse(text, Plain, CultureInfo.InvariantCulture, out value) && double.IsFinite(value);
        value += 0.0; // -0 is 0: one fingerprint, one result
        return isNumber;
    }

    /// <summary>What is wrong with a text that <see cref="TryParse"/> refused, and what would do.</summary>
    public static string Problem(string name, string text)
    {
        if (text.Length == 0)
            return $"{name} is empty; give a number";
        var quoted = VisibleText.Quote(text);
        if (Misprint(text) is { } misprint)
            return $"{name} is {quoted}{misprint}";
        if (char.IsDigit(text[^1])
            && double.TryParse(text, Plain, CultureInfo.InvariantCulture, out var value) && double.IsInfinity(value))
            return $"{name} is {quoted}, beyond all numbers that can be kept; give a smaller one";
        return $"{name} is {quoted}; {(NotFinite().IsMatch(text) ? "give a finite number" : "give a number, such as 0.8")}";
    }

    /// <summary>
    /// What to say after <c>name is 'text'</c> of a number that is written in another way than ours; null for any other text.
    /// </summary>
    public static string? Misprint(string text)
    {
        if (ForeignSigns(text) is { } signs)
            return signs;
        if (WholeThousands().IsMatch(text) || Thousands().IsMatch(text) && !AmbiguousComma().IsMatch(text))
            return $"; write it without separators: {WithoutCommas(text)}";
        if (AmbiguousComma().IsMatch(text))
            return $"; write {WithoutCommas(text)} or {text.Replace(',', '.')}, whichever is meant";
        return DecimalComma().IsMatch(text) ? $"; write decimals with a point: {WithPoint(text)}" : null;
    }

    private static string? ForeignSigns(string text)
    {
        var plain = text;
        var found = new List<string>();
        foreach (var (sign, name, instead) in Signs)
            if (plain.Contains(sign, StringComparison.Ordinal))
            {
                plain = plain.Replace(sign.ToString(), instead, StringComparison.Ordinal).Trim();
                found.Add(string.Create(CultureInfo.InvariantCulture, $"{name} (U+{(int)sign:X4})"));
            }
        return found.Count > 0 && TryParse(Encoding.UTF8.GetBytes(plain), out _)
            ? $", with {string.Join(" and ", found)}; write {plain}"
            : null;
    }

    // A digit before the point: case files ask for one.
    private static string WithPoint(string text)
        => text.Replace(",", text.TrimStart('+', '-')[0] == ',' ? "0." : ".", StringComparison.Ordinal);

    private static string WithoutCommas(string text) => text.Replace(",", "", StringComparison.Ordinal);

    private static readonly (char Sign, string Name, string Instead)[] Signs =
    [
        ('\u2212', "a minus sign", "-"), ('\u2010', "a hyphen", "-"), ('\u2011', "a hyphen", "-"), ('\u2013', "a dash", "-"),
        ('\u2014', "a dash", "-"), ('\u00B0', "a degree sign", ""), ('\u00BA', "an ordinal sign", ""),
    ];

    private const NumberStyles Plain
        = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;

    // Nobody writes three decimals that are all zero.
    [GeneratedRegex(@"^[+-]?[1-9]\d{0,2},000$")]
    private static partial Regex WholeThousands();

    [GeneratedRegex(@"^[+-]?[1-9]\d{0,2},\d{3}$")]
    private static partial Regex AmbiguousComma();

    [GeneratedRegex(@"^[+-]?\d*,\d+([eE][+-]?\d+)?$")]
    private static partial Regex DecimalComma();

    [GeneratedRegex(@"^[+-]?[1-9]\d{0,2}(,\d{3})+(\.\d*)?$")]
    private static partial Regex Thousands();

    [GeneratedRegex(@"^[+-]?(nan|inf(inity)?|∞)$", RegexOptions.IgnoreCase)]
    private static partial Regex NotFinite();
}
