using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>Doubts of one kind about a table, and how much of the blades works where they matter.</summary>
/// <param name="Share">Of all blades at work, over all tables, 0 to 1.</param>
/// <param name="File">The table.</param>
/// <param name="Kind">A few words.</param>
/// <param name="Most">Of several doubts that where most works; null for what only use shows.</param>
/// <param name="Doubts">How many there are of the kind.</param>
public sealed record Priority(double Share, string File, string Kind, PolarDoubt? Most, int Doubts);

/// <summary>What to look at first: what concerns most of the blades.</summary>
public static class FirstToLookAt
{
    private const double Least = 0.001;
    private const double FarFromOne = 2;   // times, either way: common practice, no source

    /// <param name="use">By the file of the table; tables that nothing uses may be left out.</param>
    /// <returns>The largest share first; doubts of no consequence are not among them.</returns>
    public static ImmutableArray<Priority> Of(IEnumerable<CheckedTable> tables, IReadOnlyDictionary<string, TableUse> use)
    {
        var whole = use.Values.Sum(u => u.Blades);
        return [.. tables.SelectMany(table => use.TryGetValue(table.File, out var u) ? OfTable(table, u, u.Blades / whole) : [])
            .Where(p => p.Share >= Least).OrderByDescending(p => p.Share)];
    }

    /// <summary>How much of a table's own use a doubt concerns, 0 to 1.</summary>
    public static double ShareOf(PolarDoubt doubt, TableUse use) => ShareOf([doubt], use);

    // About the table as a whole, reading's own doubts and a head: its use shows whether they matter.
    private static IEnumerable<Priority> OfTable(CheckedTable table, TableUse use, double ofBlades)
    {
        yield return new Priority(use.OutsideAngles * ofBlades, table.File, "used outside its angles", null, 0);
        yield return OutsideReynolds(table, use, ofBlades);
        yield return new Priority(use.SeveralBalances * ofBlades, table.File, "elements with several balances", null, 0);
        foreach (var kind in table.Doubts.Where(doubt => !double.IsNaN(doubt.FromDeg)).GroupBy(doubt => doubt.Kind))
            yield return new Priority(
                ShareOf([.. kind], use) * ofBlades, table.File, kind.Key, kind.MaxBy(doubt => ShareOf(doubt, use)), kind.Count());
    }

    // Of one Reynolds number, as most tables of a laboratory are, every use is outside; a little away says nothing.
    private static Priority OutsideReynolds(CheckedTable table, TableUse use, double ofBlades)
    {
        if (table.Table.Section.Polars is not [{ Reynolds: > 0 and var one }])
            return new Priority(use.OutsideReynolds * ofBlades, table.File, "used outside its Reynolds numbers", null, 0);
        var (from, to) = (use.ReynoldsBelow(0.05), use.ReynoldsBelow(0.95));
        return new Priority(
            use.OutsideOf(one / FarFromOne, one * FarFromOne) * ofBlades, table.File,
            string.Create(
                CultureInfo.InvariantCulture, $"used far from its one Reynolds number, {ReynoldsNumber.Text(one)}, from {from:0.0e0} to {to:0.0e0}"),
            null, 0);
    }

    private static double ShareOf(PolarDoubt[] doubts, TableUse use)
        => doubts.GroupBy(doubt => doubt.Polar).Sum(of => Array.Exists([.. of], doubt => double.IsNaN(doubt.FromDeg))
            ? of.Key < 0 ? 1 : use.At(of.Key)
            : use.Within(of.Key, [.. of.Select(doubt => (doubt.FromDeg, doubt.ToDeg))]));
}
