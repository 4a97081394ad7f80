using System.Globalization;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Laboratory;

/// <summary>Numbers as laboratories write angles and coefficients: either decimal sign, no thousands, exponents with e or d.</summary>
internal static class ForeignNumber
{
    // Minus signs of typesetters: no other reading of them before a digit makes a number.
    private const string MinusSigns = "\u2212\u2013\u2010\u2011";

    private static readonly string[] Absent
        = [
            "-", "--", "---", "*", "**", "***", "n/a", "na", "n.a.", "nan", "null", "none", "nil", "inf", "-inf", "+inf", "infinity", "-infinity",
            "#n/a", "#nv",
        ];

    /// <param name="value">Finite where the answer is true; zero has no sign.</param>
    public static bool TryParse(string text, DecimalSign sign, out double value)
    {
        value = double.NaN;
        if (Plain(text, sign) is not { } plain
            || !double.TryParse(plain, NumberStyles.Float, CultureInfo.InvariantCulture, out value) || !double.IsFinite(value))
            return false;
        value += 0.0;
        return value != 0 || !HasDigitAboveZero(plain);
    }

    /// <summary>Whether someone meant a number, whatever sign is decimal.</summary>
    public static bool LooksLikeOne(string text)
    {
        var digits = false;
        foreach (var c in WithoutDegreeSign(text))
            if (char.IsAsciiDigit(c))
                digits = true;
            else if (!(c is '+' or '-' or '.' or ',' or '\'' or 'e' or 'E' or 'd' or 'D' || MinusSigns.Contains(c)))
                return false;
        return digits && !char.IsAsciiLetter(text[0]);
    }

    /// <summary>Right behind the last digit, as angles may bear it.</summary>
    public static bool HasDegreeSign(string text) => text is [.., >= '0' and <= '9', '\u00B0' or '\u00BA'];

    public static string WithoutDegreeSign(string text) => HasDegreeSign(text) ? text[..^1] : text;

    public static bool HasForeignMinus(string text) => text.AsSpan().IndexOfAny(MinusSigns) >= 0;

    /// <summary>A word or sign that stands for a value that is not there.</summary>
    public static bool IsAbsent(string text)
        => text.Length == 0 || Absent.Contains(text.ToLowerInvariant()) || IsErrorOfASpreadsheet(text);

    /// <summary><c>#N/A</c>, <c>#DIV/0!</c>, <c>#WERT!</c>: no comment, though it begins with its mark.</summary>
    public static bool IsErrorOfASpreadsheet(string text)
        => text.Length > 2 && text[0] == '#' && text.AsSpan().IndexOfAny(' ', '\t') < 0
            && (text.ToUpperInvariant() is "#N/A" or "#NV" || text[^1] is '!' or '?' && char.IsUpper(text[1]));

    /// <summary>What is wrong with a text that <see cref="TryParse"/> refused.</summary>
    public static string Problem(string name, string text, DecimalSign sign)
    {
        if (text.Length == 0)
            return $"{name} is empty; give a number, or leave such rows out with --leave-out incomplete";
        var quoted = VisibleText.Quote(text);
        if (VisibleText.HasHidden(text))
            return $"{name} is {quoted}, with a hidden character in it; take that out";
        if (text[0] == '=')
            return $"{name} is {quoted}, a formula; give its value";
        if (IsAbsent(text))
            return $"{name} is {quoted}, no number; leave such rows out with --leave-out incomplete";
        if (text[^1] == '%' && TryParse(text[..^1].TrimEnd(), sign, out _))
            return $"{name} is {quoted}, in percent; only ratios are read, so give the table as such";
        var other = sign == DecimalSign.Point ? DecimalSign.Comma : DecimalSign.Point;
        if (TryParse(text, other, out _))
            return sign == DecimalSign.Point
                ? $"{name} is {quoted}, with a comma where other numbers have a decimal point"
                : $"{name} is {quoted}, with a point where other numbers have a decimal comma";
        if (HasLostSign(text.TrimStart('+', '-')))
            return $"{name} is {quoted}; a whole number that begins with 0 has lost its decimal sign, it seems";
        if (Plain(text, sign) is { } plain && double.TryParse(plain, NumberStyles.Float, CultureInfo.InvariantCulture, out var value))
            return double.IsInfinity(value)
                ? $"{name} is {quoted}, beyond all numbers that can be kept"
                : $"{name} is {quoted}, too small a number to be kept";
        return $"{name} is {quoted}; give a number";
    }

    // The number as the framework reads it; null where it is none.
    private static string? Plain(string text, DecimalSign sign)
    {
        var negative = text.Length > 0 && (text[0] == '-' || MinusSigns.Contains(text[0]));
        var rest = negative || text.StartsWith('+') ? text.AsSpan(1) : text;
        if (HasLostSign(rest))
            return null;
        var point = sign == DecimalSign.Point ? '.' : ',';
        var whole = Digits(rest, 0);
        var at = whole;
        var decimals = 0;
        if (at < rest.Length && rest[at] == point)
        {
            decimals = Digits(rest, at + 1);
            // "1." is a number of many programs; "1," is a number and a separator.
            if (decimals == 0 && (whole == 0 || sign == DecimalSign.Comma))
                return null;
            at += 1 + decimals;
        }
        if (whole + decimals == 0)
            return null;
        var mantissa = at;
        if (at < rest.Length && rest[at] is 'e' or 'E' or 'd' or 'D')
        {
            at++;
            if (at < rest.Length && rest[at] is '+' or '-')
                at++;
            var exponent = Digits(rest, at);
            if (exponent == 0)
                return null;
            at += exponent;
        }
        if (at < rest.Length)
            return null;
        var power = mantissa < rest.Length ? $"E{rest[(mantissa + 1)..]}" : "";
        return $"{(negative ? "-" : "")}{rest[..mantissa].ToString().Replace(',', '.')}{power}";
    }

    private static int Digits(ReadOnlySpan<char> text, int from)
    {
        var at = from;
        while (at < text.Length && char.IsAsciiDigit(text[at]))
            at++;
        return at - from;
    }

    private static bool HasLostSign(ReadOnlySpan<char> text)
        => text.Length > 1 && text[0] == '0' && text.IndexOfAnyExceptInRange('0', '9') < 0;

    private static bool HasDigitAboveZero(string plain)
    {
        var mantissa = plain.Split('E')[0];
        return mantissa.AsSpan().IndexOfAnyInRange('1', '9') >= 0;
    }
}
