using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Batch.Plan;

/// <summary>Rows of a table that are not as they were.</summary>
/// <param name="What">changed, added or removed.</param>
/// <param name="From">The lowest angle (deg), radius (m) or wind speed (m/s) among them.</param>
/// <param name="To">The highest.</param>
/// <param name="Reynolds">The Reynolds numbers of a polar at which they lie, rising; empty where the table has none.</param>
public sealed record RowChange(string What, int Rows, double From, double To, ImmutableArray<double> Reynolds)
{
    private const int MostListed = 4;

    /// <summary><c>31 rows changed between 8 and 16 deg at Reynolds numbers 3e6, 1.5e7</c>.</summary>
    /// <param name="unit">Of the angle, radius or wind speed.</param>
    internal string Sentence(string unit)
    {
        var where = From == To ? $"at {Text(From)} {unit}" : $"between {Text(From)} and {Text(To)} {unit}";
        return $"{Count(Rows)} {What} {where}{(Reynolds.IsEmpty ? "" : $" at {Numbers(Reynolds)}")}";
    }

    internal static string Count(int rows) => string.Create(CultureInfo.InvariantCulture, $"{rows} row{(rows == 1 ? "" : "s")}");

    /// <summary><c>Reynolds number 3e6</c>, <c>Reynolds numbers 3e6, 1.5e7</c>, <c>12 Reynolds numbers from 1e6 to 1.5e7</c>.</summary>
    internal static string Numbers(ImmutableArray<double> reynolds) => reynolds switch
    {
        [var only] => $"Reynolds number {ReynoldsNumber.Text(only)}",
        { Length: <= MostListed } => $"Reynolds numbers {string.Join(", ", reynolds.Select(ReynoldsNumber.Text))}",
        _ => string.Create(CultureInfo.InvariantCulture,
            $"{reynolds.Length} Reynolds numbers from {ReynoldsNumber.Text(reynolds[0])} to {ReynoldsNumber.Text(reynolds[^1])}"),
    };

    private static string Text(double value) => value.ToString(CultureInfo.InvariantCulture);
}

/// <summary>All rows of one or several Reynolds numbers, which are new in a table or gone from it.</summary>
/// <param name="What">added or removed.</param>
public sealed record ReynoldsChange(string What, int Rows, ImmutableArray<double> Reynolds)
{
    /// <summary><c>Reynolds number 6e6 added (112 rows)</c>; a table without Reynolds numbers says so.</summary>
    internal string Sentence => Reynolds.IsEmpty
        ? $"rows without Reynolds number {What} ({RowChange.Count(Rows)})"
        : $"{RowChange.Numbers(Reynolds)} {What} ({RowChange.Count(Rows)})";
}
