using System.Collections.Immutable;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Publishing;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Batch.Plan;

/// <summary>In what two results differ by what they were made from.</summary>
public static class MadeFrom
{
    private const int Shown = 3;
    private const int Levels = 3;

    /// <summary>
    /// One sentence in the plan's own words: <c>polar tarn-18.csv: table changed; air.density_kg_m3 1.225 -> 1.05</c>, with the rows of a
    /// table where both are kept; empty where both were made from the same, or where that is not known.
    /// </summary>
    public static string Difference(StoredResult old, StoredResult now)
    {
        if (old.Receipt is not { } was || now.Receipt is not { } receipt)
            return "";
        var changed = receipt.Values.Where(v => was.Values.GetValueOrDefault(v.Key) != v.Value)
            .Select(v => TableOf(v.Key, v.Value, now)).OfType<CanonicalTable>().ToImmutableArray();
        var reasons = Differences.OfValues(was.Values, receipt.Values, changed, hash => RowsOf(old, hash)).ToList();
        if (was.SolverVersion != receipt.SolverVersion)
            reasons.Insert(0, new StaleReason.SolverChanged(was.SolverVersion, receipt.SolverVersion));
        return string.Join("; ", reasons.Take(Shown).Select(r => r.Sentence))
            + (reasons.Count > Shown ? FormattableString.Invariant($"; and {reasons.Count - Shown} more") : "");
    }

    // Its file is left open: it may have another name than it had then.
    private static CanonicalTable? TableOf(string key, string value, StoredResult result)
        => Differences.IsTable(value) && RowsOf(result, value) is { } rows
            ? new CanonicalTable(key, value, file: "", () => rows.Split('\n', StringSplitOptions.RemoveEmptyEntries)) : null;

    // Tables lie in the study's results: beside a current result, two levels above one that was replaced or kept.
    private static string? RowsOf(StoredResult result, string hash)
    {
        var folder = Path.GetDirectoryName(Path.TrimEndingDirectorySeparator(Path.GetFullPath(result.Folder)));
        for (var level = 0; level < Levels && Path.GetDirectoryName(folder) is { } root; level++, folder = root)
            if (TableArchive.Read(new ResultsFolder(root, Path.GetFileName(folder)!), hash) is { } rows)
                return rows;
        return null;
    }
}
