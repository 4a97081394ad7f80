using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Laboratory;

/// <summary>Reynolds numbers as people write them: with thousands set apart, in millions, with either decimal sign.</summary>
internal static class ReynoldsText
{
    private const string Groupers = " '_\u2019\u00A0\u2009\u202F";

    /// <summary>The plausible numbers that the text can mean, the smallest first, whatever its decimal sign is.</summary>
    /// <param name="power">Of ten, that the number is to be multiplied by.</param>
    public static ImmutableArray<double> Readings(string text, int power)
        => [.. Enum.GetValues<DecimalSign>().Select(sign => Read(text, power, sign)).OfType<double>().Where(PolarLimits.IsReynoldsOfABlade)
            .Distinct().Order()];

    /// <summary>Null where it is no number in that way of writing.</summary>
    public static double? Read(string text, int power, DecimalSign sign)
    {
        var exponentAt = text.AsSpan().IndexOfAny("eEdD");
        var mantissa = exponentAt < 0 ? text : text[..exponentAt];
        var exponent = 0;
        if (exponentAt >= 0 && !int.TryParse(text.AsSpan(exponentAt + 1), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out exponent))
            return null;
        var (point, other) = sign == DecimalSign.Point ? ('.', ',') : (',', '.');
        var parts = mantissa.Split(point);
        if (parts.Length > 2 || Ungrouped(parts[0], other) is not { } whole
            || parts.Length == 2 && parts[1].AsSpan().IndexOfAnyExceptInRange('0', '9') >= 0
            || whole.Length == 0 && (parts.Length == 1 || parts[1].Length == 0) || Math.Abs(exponent) > 30)
            return null;
        var decimals = parts.Length == 2 ? parts[1] : "";
        // In one step from the text: a product with a power of ten could end a digit off.
        return double.Parse(string.Create(CultureInfo.InvariantCulture, $"{whole}.{decimals}0E{exponent + power}"), CultureInfo.InvariantCulture);
    }

    // The digits of 1'000'000 or 1 000 000; null where they are not set apart by threes with one sign.
    private static string? Ungrouped(string text, char other)
    {
        var at = text.AsSpan().IndexOfAny(Groupers + other);
        if (at < 0)
            return text.AsSpan().IndexOfAnyExceptInRange('0', '9') < 0 ? text : null;
        var groups = text.Split(text[at]);
        return groups[0].Length is >= 1 and <= 3 && groups[0][0] != '0' && groups.Skip(1).All(g => g.Length == 3)
            && groups.All(g => g.AsSpan().IndexOfAnyExceptInRange('0', '9') < 0)
                ? string.Concat(groups)
                : null;
    }
}
