namespace BladeLoads.Studies;

/// <summary>The known name that a mistyped one was most likely meant to be.</summary>
public static class Nearest
{
    /// <summary>
    /// Within a third of its length in letters changed, else the closest that contains it or is contained in it; letter case does
    /// not count. Null when nothing is near.
    /// </summary>
    public static string? Of(string found, IEnumerable<string> known)
    {
        var text = found.ToLowerInvariant();
        var ranked = known
            .Select(name => (name, lower: name.ToLowerInvariant(), changes: Changes(text, name.ToLowerInvariant())))
            .OrderBy(x => x.changes).ToList();
        var close = ranked.FirstOrDefault(x => x.changes <= Math.Max(1, Math.Min(x.name.Length, found.Length) / 3));
        if (close.name is not null)
            return close.name;
        return ranked.FirstOrDefault(x => found.Length >= 3 && x.name.Length >= 3
            && (x.lower.Contains(text, StringComparison.Ordinal) || text.Contains(x.lower, StringComparison.Ordinal))).name;
    }

    // Letters put in, left out, changed, or two exchanged: each counts 1. What is longer than any name of ours is far from all.
    private static int Changes(string a, string b)
    {
        if (a.Length > 100 || b.Length > 300)
            return int.MaxValue;
        var changes = new int[a.Length + 1, b.Length + 1];
        for (var i = 0; i <= a.Length; i++)
            for (var j = 0; j <= b.Length; j++)
            {
                if (i == 0 || j == 0)
                {
                    changes[i, j] = i + j;
                    continue;
                }
                var putInOrLeftOut = Math.Min(changes[i - 1, j], changes[i, j - 1]) + 1;
                var best = Math.Min(putInOrLeftOut, changes[i - 1, j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1));
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                    best = Math.Min(best, changes[i - 2, j - 2] + 1);
                changes[i, j] = best;
            }
        return changes[a.Length, b.Length];
    }
}
