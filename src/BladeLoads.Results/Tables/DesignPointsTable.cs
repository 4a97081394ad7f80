using System.Collections.Immutable;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Results.Tables;

/// <summary>
/// <c>design-points.csv</c>: a row an operating point worth a name, off the grid of wind speeds. The columns are a promise
/// (docs/formats.md).
/// </summary>
public static class DesignPointsTable
{
    public const string FileName = "design-points.csv";

    public static ImmutableArray<string> Columns { get; } = ["point", .. CurveTable.Columns];

    /// <summary>The table as UTF-8.</summary>
    /// <param name="meanPower">W, at a wind speed in m/s; null where the case has no turbulence.</param>
    public static byte[] Write(PowerCurve curve, Func<double, double>? meanPower)
    {
        using var table = new TableWriter(Columns.AsSpan());
        foreach (var (name, point) in curve.DesignPoints)
        {
            table.Text(name);
            CurveTable.WriteRow(table, point, meanPower);
        }
        return table.ToBytes();
    }
}
