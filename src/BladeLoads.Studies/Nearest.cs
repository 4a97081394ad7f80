namespace BladeLoads.Studies;

/// <summary>The known name that a mistyped one was most likely meant to be.</summary>
internal static class Nearest
{
    /// <summary>
    /// Within a third of its length in letters changed, else the closest that contains it or is contained in it; letter case does not
    /// count. Null when nothing is near.
    /// </summary>
    public static string? Of(string found, IEnumerable<string> known)
    {
        var text = found.ToLowerInvariant();
        var ranked = known.Select(name => (name, changes: Changes(text, name.ToLowerInvariant()))).OrderBy(x => x.changes).ToList();
        var close = ranked.FirstOrDefault(x => x.changes <= Math.Max(1, Math.Min(x.name.Length, found.Length) / 3));
        if (close.name is not null)
            return close.name;
        return ranked.FirstOrDefault(x => found.Length >= 3 && x.name.Length >= 3
            && (x.name.Contains(text, StringComparison.OrdinalIgnoreCase) || text.Contains(x.name, StringComparison.OrdinalIgnoreCase))).name;
    }

    // Levenshtein's distance, one row at a time; what is longer than any name of ours is far from all of them.
    private static int Changes(string a, string b)
    {
        if (a.Length > 100 || b.Length > 300)
            return int.MaxValue;
        var row = Enumerable.Range(0, b.Length + 1).ToArray();
        for (var i = 1; i <= a.Length; i++)
        {
            var diagonal = row[0];
            row[0] = i;
            for (var j = 1; j <= b.Length; j++)
                (diagonal, row[j]) = (row[j], Math.Min(Math.Min(row[j] + 1, row[j - 1] + 1), diagonal + (a[i - 1] == b[j - 1] ? 0 : 1)));
        }
        return row[^1];
    }
}
