using System.Globalization;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Tables;

/// <summary>What to say where a column that must rise does not.</summary>
internal static class Rising
{
    /// <param name="rule">What must rise, and within what.</param>
    public static string Problem(string column, (double Value, int Line) before, double value, int line, string rule)
    {
        var (from, to) = (CanonicalText.Of(before.Value), CanonicalText.Of(value));
        var found = from == to ? $"is {to} again" : $"falls from {from} to {to}";
        return string.Create(CultureInfo.InvariantCulture, $"{column} {found} (row {before.Line} to {line}); {rule}");
    }
}
