using BladeLoads.Results.Receipts;

namespace BladeLoads.Batch.Plan;

/// <summary>In what two results differ by what they were made from.</summary>
public static class MadeFrom
{
    private const int Shown = 3;

    /// <summary>
    /// One sentence in the plan's own words: <c>section tarn-18: table changed; air.density_kg_m3 1.225 -> 1.05</c>; empty where both
    /// were made from the same.
    /// </summary>
    public static string Difference(Receipt old, Receipt now)
    {
        var reasons = Differences.OfValues(old.Values, now.Values, [], _ => null).ToList();
        if (old.SolverVersion != now.SolverVersion)
            reasons.Insert(0, new StaleReason.SolverChanged(old.SolverVersion, now.SolverVersion));
        return string.Join("; ", reasons.Take(Shown).Select(r => r.Sentence))
            + (reasons.Count > Shown ? FormattableString.Invariant($"; and {reasons.Count - Shown} more") : "");
    }
}
