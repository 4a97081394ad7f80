using System.Globalization;

namespace BladeLoads.Studies.Laboratory;

/// <summary>Numbers of lines in words.</summary>
internal static class LineNumbers
{
    private const int MostShown = 6;

    /// <summary><c>line 3</c>, <c>lines 3, 5 to 9 and 12</c>; of many ranges the first.</summary>
    public static string InWords(IReadOnlyList<int> lines)
    {
        var ranges = new List<(int From, int To)>();
        foreach (var line in lines.Order().Distinct())
            if (ranges.Count > 0 && ranges[^1].To == line - 1)
                ranges[^1] = (ranges[^1].From, line);
            else
                ranges.Add((line, line));
        var shown = ranges.Take(MostShown).Select(range => range.From == range.To
            ? range.From.ToString(CultureInfo.InvariantCulture)
            : string.Create(CultureInfo.InvariantCulture, $"{range.From} to {range.To}")).ToList();
        if (ranges.Count > MostShown)
            shown.Add("more");
        return (lines.Count == 1 ? "line " : "lines ")
            + (shown.Count == 1 ? shown[0] : $"{string.Join(", ", shown.Take(shown.Count - 1))} and {shown[^1]}");
    }
}
