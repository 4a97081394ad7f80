using System.Collections.Immutable;
using System.Globalization;

namespace BladeLoads.Batch.Plan;

/// <summary>Which rows of a table are not as they were, from its canonical text before and now.</summary>
internal static class TableRows
{
    /// <summary>Null where the rows cannot be told apart.</summary>
    /// <param name="table">As a reason names it: <c>polar tarn-24.csv</c>.</param>
    /// <param name="key">Which kind of table: <c>blade</c>, <c>section.NAME</c>, <c>control.schedule</c>, <c>site.histogram</c>.</param>
    public static StaleReason? Between(string table, string key, string was, string now)
    {
        var isPolar = key.StartsWith("section.", StringComparison.Ordinal);
        if (Blocks(was, isPolar) is not { } before || Blocks(now, isPolar) is not { } after)
            return null;
        var shared = before.Keys.Intersect(after.Keys).ToList();
        ImmutableArray<RowChange> rows =
        [
            .. Rows("changed", shared.SelectMany(r => before[r].Where(row => after[r].TryGetValue(row.Key, out var to) && to != row.Value)
                .Select(row => (r, row.Key)))),
            .. Rows("added", shared.SelectMany(r => after[r].Keys.Where(at => !before[r].ContainsKey(at)).Select(at => (r, at)))),
            .. Rows("removed", shared.SelectMany(r => before[r].Keys.Where(at => !after[r].ContainsKey(at)).Select(at => (r, at)))),
        ];
        ImmutableArray<ReynoldsChange> whole = [.. Whole("added", after, before), .. Whole("removed", before, after)];
        var unit = isPolar ? "deg" : key == "blade" ? "m" : "m/s";
        return rows.IsEmpty && whole.IsEmpty ? null : new StaleReason.TableRowsChanged(table, unit, rows, whole);
    }

    // By Reynolds number, NaN for none; within it the rest of a row by its angle, radius or wind speed.
    private static SortedDictionary<double, Dictionary<double, string>>? Blocks(string text, bool hasReynolds)
    {
        var blocks = new SortedDictionary<double, Dictionary<double, string>>();
        foreach (var line in text.Split('\n', StringSplitOptions.RemoveEmptyEntries))
        {
            var rest = line;
            var reynolds = double.NaN;
            if (hasReynolds && (!TryCut(ref rest, out var first) || first != "-" && !TryNumber(first, out reynolds)))
                return null;
            if (!TryCut(ref rest, out var at) || !TryNumber(at, out var place))
                return null;
            if (!blocks.TryGetValue(reynolds, out var block))
                blocks.Add(reynolds, block = []);
            if (!block.TryAdd(place, rest))
                return null;
        }
        return blocks;
    }

    private static bool TryCut(ref string rest, out string first)
    {
        var comma = rest.IndexOf(',', StringComparison.Ordinal);
        first = comma < 0 ? "" : rest[..comma];
        rest = rest[(comma + 1)..];
        return comma >= 0;
    }

    private static bool TryNumber(string text, out double value)
        => double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out value) && double.IsFinite(value);

    private static IEnumerable<RowChange> Rows(string what, IEnumerable<(double Reynolds, double At)> found)
    {
        var rows = found.ToList();
        if (rows.Count > 0)
            yield return new RowChange(
                what, rows.Count, rows.Min(r => r.At), rows.Max(r => r.At),
                [.. rows.Select(r => r.Reynolds).Where(double.IsFinite).Distinct().Order()]);
    }

    private static IEnumerable<ReynoldsChange> Whole(
        string what, SortedDictionary<double, Dictionary<double, string>> here, SortedDictionary<double, Dictionary<double, string>> there)
    {
        foreach (var hasNumber in new[] { false, true })
        {
            var only = here.Where(block => double.IsFinite(block.Key) == hasNumber && !there.ContainsKey(block.Key)).ToList();
            if (only.Count > 0)
                yield return new ReynoldsChange(
                    what, only.Sum(block => block.Value.Count), hasNumber ? [.. only.Select(block => block.Key)] : []);
        }
    }
}
