using System.Globalization;
using BladeLoads.Studies;

namespace BladeLoads.Screen;

/// <summary>A number with its noun.</summary>
internal static class Count
{
    /// <summary>Of findings, counting those that others stand for.</summary>
    public static string Of(IEnumerable<InputFinding> findings, string noun) => Of(findings.Sum(finding => finding.Times), noun);

    /// <summary><c>1 case</c>, <c>2 cases</c>.</summary>
    public static string Of(int number, string noun) => string.Create(CultureInfo.InvariantCulture, $"{number} {noun}{(number == 1 ? "" : "s")}");
}
