using System.Collections.Immutable;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Operation;
using static BladeLoads.Results.Tables.FileUnits;

namespace BladeLoads.Results.Tables;

/// <summary>
/// <c>coefficient-surface.csv</c>: a row a pair of tip-speed ratio and pitch. The columns are a promise (docs/formats.md).
/// </summary>
public static class SurfaceTable
{
    public const string FileName = "coefficient-surface.csv";

    public static ImmutableArray<string> Columns { get; } =
        ["tip_speed_ratio", "pitch_deg", "power_coefficient", "thrust_coefficient", "torque_coefficient", "best", "status"];

    /// <summary>The table as UTF-8.</summary>
    public static byte[] Write(CoefficientSurface surface)
    {
        using var table = new TableWriter(Columns.AsSpan());
        for (var i = 0; i < surface.Points.Length; i++)
        {
            var point = surface.Points[i];
            table.Number(point.TipSpeedRatio);
            table.Number(Deg(point.Pitch));
            table.Number(point.Loads?.PowerCoefficient);
            table.Number(point.Loads?.ThrustCoefficient);
            table.Number(point.Loads?.TorqueCoefficient);
            table.Text(i == surface.Best && point.Loads is not null ? "yes" : "");
            table.Text(StatusWords.Of(point.Marks));
            table.EndRow();
        }
        return table.ToBytes();
    }
}
