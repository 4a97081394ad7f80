using System.Globalization;
using BladeLoads.Results.Keeping;
using BladeLoads.Results.Wording;

namespace BladeLoads.Screen;

/// <summary>What tidying would remove, on the screen.</summary>
internal static class TidyLines
{
    private const int WidestName = 40;
    private const int RowsShown = 100;

    public static void Write(Tidying tidying, TextWriter output, bool wholeNames)
    {
        var byCase = tidying.Results.GroupBy(r => r.Result.Case, StringComparer.Ordinal).ToList();
        var table = new TextTable("case", "replaced results", "solved", "replaced", "room");
        foreach (var one in byCase.Take(RowsShown))
            table.Add(
            [
                wholeNames ? Printable.Of(one.Key) : ShortName.Of(Printable.Of(one.Key), WidestName),
                one.Count().ToString(CultureInfo.InvariantCulture),
                Days(one.Select(r => r.Result.SolvedAt)), Days(one.Select(r => r.ReplacedAt)), Room.Of(one.Sum(r => r.Bytes)),
            ]);
        if (byCase.Count > 0)
            table.Write(output);
        if (byCase.Count > RowsShown)
            output.WriteLine($"... and {byCase.Count - RowsShown} cases more");
        var tables = tidying.Tables.IsEmpty
            ? "" : $" and {Count.Of(tidying.Tables.Length, "table")} that no result names ({Room.Of(tidying.Tables.Sum(t => t.Bytes))})";
        output.WriteLine(
            $"this would free {Room.Of(tidying.Bytes)}: {Count.Of(tidying.Results.Length, "replaced result")}{tables}; "
            + (tidying.Staying == 0 ? "none stays" : $"{tidying.Staying} {(tidying.Staying == 1 ? "stays" : "stay")}"));
    }

    private static string Days(IEnumerable<DateTime> times)
    {
        var all = times.ToList();
        var (first, last) = (Day(all.Min()), Day(all.Max()));
        return first == last ? first : $"{first} to {last}";
    }

    private static string Day(DateTime time) => time.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);
}
