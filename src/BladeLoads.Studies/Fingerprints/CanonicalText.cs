using System.Globalization;

namespace BladeLoads.Studies.Fingerprints;

/// <summary>One text a value, whatever way it was written: 1.0, 1.00 and 1 are all <c>1</c>.</summary>
internal static class CanonicalText
{
    /// <summary>The shortest text that reads back as the same number: <c>1e-05</c>, <c>1e20</c>; zero has no sign.</summary>
    public static string Of(double value)
        => (value + 0.0).ToString("R", CultureInfo.InvariantCulture)
            .Replace("E+", "e", StringComparison.Ordinal).Replace('E', 'e');

    public static string Of(IEnumerable<double> values) => string.Join(',', values.Select(Of));
}
