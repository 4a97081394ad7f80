using System.Collections.Immutable;
using BladeLoads.Studies.PolarCheck;

namespace BladeLoads.Results.PolarCheck;

/// <summary>Doubts of one kind about one column of a table. The same is often found at each Reynolds number, and at many rows.</summary>
/// <param name="First">That where most works, which stands for all; the first where nothing does.</param>
/// <param name="OtherLines">Lines of the others, that of the first not among them.</param>
public sealed record KindOfDoubt(PolarDoubt First, ImmutableArray<int> OtherLines)
{
    /// <summary>All doubts of a table, in the order of the lines of those that stand for their kind.</summary>
    /// <param name="use">Null for a table that nothing uses.</param>
    public static ImmutableArray<KindOfDoubt> Of(CheckedTable table, TableUse? use)
        => [.. table.Doubts.GroupBy(doubt => (doubt.Kind, doubt.Column)).Select(kind =>
        {
            var first = use is null ? kind.First() : kind.MaxBy(doubt => FirstToLookAt.ShareOf(doubt, use))!;
            return new KindOfDoubt(first, [.. kind.Select(doubt => doubt.Finding.Line).Where(line => line != first.Finding.Line).Distinct()]);
        }).OrderBy(kind => kind.First.Finding.Line)];
}
