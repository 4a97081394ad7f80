using BladeLoads.Results.Comparison;

namespace BladeLoads.Batch.Plan;

/// <summary>In what two results differ by what they were made from.</summary>
public static class MadeFrom
{
    private const int Shown = 3;

    /// <summary>
    /// One sentence in the plan's own words: <c>polar tarn-18.csv: table changed; air.density_kg_m3 1.225 -> 1.05</c>; empty where both
    /// were made from the same, or where that is not known.
    /// </summary>
    public static string Difference(StoredResult old, StoredResult now)
    {
        if (old.Receipt is not { } was || now.Receipt is not { } receipt)
            return "";
        var reasons = Differences.OfValues(was.Values, receipt.Values, [], _ => null).ToList();
        if (was.SolverVersion != receipt.SolverVersion)
            reasons.Insert(0, new StaleReason.SolverChanged(was.SolverVersion, receipt.SolverVersion));
        return string.Join("; ", reasons.Take(Shown).Select(r => r.Sentence))
            + (reasons.Count > Shown ? FormattableString.Invariant($"; and {reasons.Count - Shown} more") : "");
    }
}
