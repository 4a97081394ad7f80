using System.Buffers;
using System.Globalization;
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
        if (AmbiguousComma().IsMatch(text))
            return $"{name} is {quoted}; write decimals with a point, thousands without a separator: "
                + $"{text.Replace(',', '.')} or {text.Replace(",", "", StringComparison.Ordinal)}";
        if (DecimalComma().IsMatch(text))
            return $"{name} is {quoted}; write decimals with a point: {text.Replace(',', '.')}";
        if (Thousands().IsMatch(text))
            return $"{name} is {quoted}; write it without separators: {text.Replace(",", "", StringComparison.Ordinal)}";
        if (char.IsDigit(text[^1])
            && double.TryParse(text, Plain, CultureInfo.InvariantCulture, out var value) && double.IsInfinity(value))
            return $"{name} is {quoted}, beyond all numbers that can be kept; give a smaller one";
        return $"{name} is {quoted}; {(NotFinite().IsMatch(text) ? "give a finite number" : "give a number, such as 0.8")}";
    }

    private const NumberStyles Plain
        = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;

    [GeneratedRegex(@"^[+-]?[1-9]\d{0,2},\d{3}$")]
    private static partial Regex AmbiguousComma();

    [GeneratedRegex(@"^[+-]?\d*,\d+([eE][+-]?\d+)?$")]
    private static partial Regex DecimalComma();

    [GeneratedRegex(@"^[+-]?\d{1,3}(,\d{3})+(\.\d*)?$")]
    private static partial Regex Thousands();

    [GeneratedRegex(@"^[+-]?(nan|inf(inity)?|∞)$", RegexOptions.IgnoreCase)]
    private static partial Regex NotFinite();
}
