using System.Collections.Immutable;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;
using static BladeLoads.Results.Tables.FileUnits;

namespace BladeLoads.Results.Tables;

/// <summary><c>power-curve.csv</c>: a row an operating point. The columns and their order are a promise (docs/formats.md).</summary>
public static class CurveTable
{
    public const string FileName = "power-curve.csv";

    public static ImmutableArray<string> Columns { get; } =
    [
        "wind_speed_m_s", "rotor_speed_rpm", "pitch_deg", "tip_speed_ratio", "tip_speed_m_s",
        "power_coefficient", "thrust_coefficient", "torque_coefficient",
        "rotor_power_kW", "electrical_power_kW", "thrust_kN", "torque_kNm",
        "aero_root_out_of_plane_moment_kNm", "aero_root_in_plane_moment_kNm",
        "aero_root_flapwise_moment_kNm", "aero_root_edgewise_moment_kNm",
        "region", "status",
        "rotor_power_per_pitch_kW_per_deg", "thrust_per_pitch_kN_per_deg", "stall_margin_deg", "stall_margin_radius_m", "tip_mach",
        "mean_electrical_power_kW",
    ];

    /// <summary>The table of a case without turbulence.</summary>
    public static byte[] Write(PowerCurve curve) => Write(curve, null);

    /// <summary>The table as UTF-8. What an unbalanced point leaves open is an empty cell.</summary>
    /// <param name="meanPower">W, at a wind speed in m/s; null where the case has no turbulence.</param>
    public static byte[] Write(PowerCurve curve, Func<double, double>? meanPower)
    {
        using var table = new TableWriter(Columns.AsSpan());
        foreach (var point in curve.Points)
            WriteRow(table, point, meanPower);
        return table.ToBytes();
    }

    internal static void WriteRow(TableWriter table, CurvePoint point, Func<double, double>? meanPower)
    {
        table.Number(point.Operation.WindSpeed);
        table.Number(Rpm(point.Operation.RotorSpeed));
        table.Number(Deg(point.Operation.Pitch));
        WriteLoads(table, point.Loads, point.ElectricalPower);
        table.Text(RegionWords.Of(point.Region));
        table.Text(StatusWords.Of(point.Marks));
        WriteMargins(table, point.Margins);
        table.Number(IsAtRest(point) ? null : meanPower?.Invoke(point.Operation.WindSpeed) is { } mean ? Kilo(mean) : null);
        table.EndRow();
    }

    private static bool IsAtRest(CurvePoint point) => (point.Marks & (PointMarks.BelowCutIn | PointMarks.AboveCutOut)) != 0;

    private static void WriteLoads(TableWriter table, RotorLoads? loads, double electricalPower)
    {
        table.Number(loads?.TipSpeedRatio);
        table.Number(loads?.TipSpeed);
        table.Number(loads?.PowerCoefficient);
        table.Number(loads?.ThrustCoefficient);
        table.Number(loads?.TorqueCoefficient);
        table.Number(loads is null ? null : Kilo(loads.Power));
        table.Number(loads is null ? null : Kilo(electricalPower));
        table.Number(loads is null ? null : Kilo(loads.Thrust));
        table.Number(loads is null ? null : Kilo(loads.Torque));
        table.Number(loads is null ? null : Kilo(loads.RootOutOfPlaneMoment));
        table.Number(loads is null ? null : Kilo(loads.RootInPlaneMoment));
        table.Number(loads is null ? null : Kilo(loads.RootFlapwiseMoment));
        table.Number(loads is null ? null : Kilo(loads.RootEdgewiseMoment));
    }

    private static void WriteMargins(TableWriter table, PointMargins? margins)
    {
        table.Number(margins is null ? null : Kilo(PerDeg(margins.PowerPerPitch)));
        table.Number(margins is null ? null : Kilo(PerDeg(margins.ThrustPerPitch)));
        table.Number(margins is null ? null : Deg(margins.StallMargin));
        table.Number(margins?.StallRadius);
        table.Number(margins?.TipMach);
    }
}
