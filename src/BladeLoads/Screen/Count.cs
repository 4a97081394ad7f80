using System.Globalization;

namespace BladeLoads.Screen;

/// <summary>A number with its noun.</summary>
internal static class Count
{
    /// <summary><c>1 case</c>, <c>2 cases</c>.</summary>
    public static string Of(int number, string noun) => string.Create(CultureInfo.InvariantCulture, $"{number} {noun}{(number == 1 ? "" : "s")}");
}
