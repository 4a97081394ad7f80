using System.Collections.Immutable;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Receipts;
using static BladeLoads.Results.Tables.FileUnits;

namespace BladeLoads.Results.Tables;

/// <summary>A row of the summary: a case of the study, with its figures where it has a current result.</summary>
/// <param name="State">A word: current, out of date, missing, failed, rejected.</param>
/// <param name="Summary">Null where there is no current result: no figure of an old one stands for it.</param>
public sealed record SummaryRow(string Case, string Title, string Fingerprint, string State, CaseSummary? Summary);

/// <summary>
/// <c>summary.csv</c>: a row a case. A study with a baseline has further columns. The columns are a promise
/// (docs/formats.md).
/// </summary>
public static class SummaryTable
{
    public const string FileName = "summary.csv";

    public static ImmutableArray<string> Columns { get; } =
    [
        "case", "title", "fingerprint",
        "best_power_coefficient", "best_power_coefficient_wind_speed_m_s", "best_power_coefficient_tip_speed_ratio",
        "largest_electrical_power_kW", "largest_electrical_power_wind_speed_m_s",
        "largest_thrust_kN", "largest_thrust_wind_speed_m_s",
        "rated_wind_speed_m_s",
        "largest_aero_root_out_of_plane_moment_kNm", "largest_aero_root_out_of_plane_moment_wind_speed_m_s",
        "largest_aero_root_in_plane_moment_kNm", "largest_aero_root_in_plane_moment_wind_speed_m_s",
        "largest_aero_root_flapwise_moment_kNm", "largest_aero_root_flapwise_moment_wind_speed_m_s",
        "largest_aero_root_edgewise_moment_kNm", "largest_aero_root_edgewise_moment_wind_speed_m_s",
        "points", "unbalanced_points", "marks", "state",
    ];

    public static ImmutableArray<string> BaselineColumns { get; } =
    [
        "best_power_coefficient_difference_percent", "largest_electrical_power_difference_percent",
        "largest_thrust_difference_percent", "rated_wind_speed_difference_percent",
        "largest_aero_root_flapwise_moment_difference_percent",
    ];

    /// <summary>What later versions added, after all others.</summary>
    public static ImmutableArray<string> FurtherColumns { get; } =
    [
        "tip_speed_ratio", "fine_pitch_deg", "searched", "annual_energy_MWh", "capacity_factor", "turbulent_annual_energy_MWh",
        "turbulent_capacity_factor",
    ];

    public static ImmutableArray<string> FurtherBaselineColumns { get; } =
        ["annual_energy_difference_percent", "capacity_factor_difference_percent"];

    /// <summary>The table as UTF-8.</summary>
    /// <param name="baseline">The case that others are compared with, by name; null for none.</param>
    public static byte[] Write(IReadOnlyCollection<SummaryRow> rows, string? baseline)
    {
        var compared = baseline is null ? null : rows.FirstOrDefault(r => r.Case == baseline)?.Summary;
        using var table = new TableWriter(baseline is null
            ? [.. Columns, .. FurtherColumns]
            : [.. Columns, .. BaselineColumns, .. FurtherColumns, .. FurtherBaselineColumns]);
        foreach (var row in rows)
        {
            table.Text(row.Case);
            table.Text(row.Title);
            table.Text(row.Fingerprint);
            WriteFigures(table, row.Summary);
            table.Text(row.State);
            var difference = row.Summary is null || compared is null ? null : BaselineDifference.Between(row.Summary, compared);
            if (baseline is not null)
                WriteDifference(table, difference);
            WriteFurther(table, row.Summary);
            if (baseline is not null)
                WriteFurtherDifference(table, difference);
            table.EndRow();
        }
        return table.ToBytes();
    }

    private static void WriteFigures(TableWriter table, CaseSummary? summary)
    {
        WriteExtreme(table, summary?.BestPowerCoefficient, value => value);
        table.Number(summary?.BestTipSpeedRatio);
        WriteExtreme(table, summary?.LargestElectricalPower, Kilo);
        WriteExtreme(table, summary?.LargestThrust, Kilo);
        table.Number(summary?.RatedWindSpeed);
        WriteExtreme(table, summary?.LargestOutOfPlaneMoment, Kilo);
        WriteExtreme(table, summary?.LargestInPlaneMoment, Kilo);
        WriteExtreme(table, summary?.LargestFlapwiseMoment, Kilo);
        WriteExtreme(table, summary?.LargestEdgewiseMoment, Kilo);
        table.Number(summary?.Points);
        table.Number(summary?.UnbalancedPoints);
        table.Text(summary?.MarksText);
    }

    private static void WriteExtreme(TableWriter table, Extreme? extreme, Func<double, double> toFile)
    {
        table.Number(extreme is null ? null : toFile(extreme.Value));
        table.Number(extreme?.WindSpeed);
    }

    private static void WriteDifference(TableWriter table, BaselineDifference? difference)
    {
        table.Number(difference?.BestPowerCoefficient);
        table.Number(difference?.LargestElectricalPower);
        table.Number(difference?.LargestThrust);
        table.Number(difference?.RatedWindSpeed);
        table.Number(difference?.LargestFlapwiseMoment);
    }

    private static void WriteFurther(TableWriter table, CaseSummary? summary)
    {
        var (best, energy) = (summary?.Best, summary?.Energy);
        table.Number(best?.TipSpeedRatio);
        table.Number(best is null ? null : Deg(best.FinePitch));
        table.Text(best is { Searched: true } ? "yes" : "");
        table.Number(energy?.AnnualEnergy is { } steady ? MegawattHours(steady) : null);
        table.Number(energy?.CapacityFactor);
        table.Number(energy?.TurbulentAnnualEnergy is { } turbulent ? MegawattHours(turbulent) : null);
        table.Number(energy?.TurbulentCapacityFactor);
    }

    private static void WriteFurtherDifference(TableWriter table, BaselineDifference? difference)
    {
        table.Number(difference?.AnnualEnergy);
        table.Number(difference?.CapacityFactor);
    }
}
