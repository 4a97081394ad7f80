using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Energy;
using BladeLoads.Rotor.Operation;
using static BladeLoads.Results.Tables.FileUnits;

namespace BladeLoads.Results.Tables;

/// <summary>
/// <c>annual-energy.csv</c>: a row for the site and one for each of other mean wind speeds. The columns are a promise (docs/formats.md).
/// </summary>
public static class EnergyTable
{
    public const string FileName = "annual-energy.csv";

    public static ImmutableArray<string> Columns { get; } =
    [
        "climate", "mean_wind_speed_m_s", "weibull_shape",
        "gross_energy_MWh", "net_energy_MWh", "capacity_factor", "full_load_hours",
        "turbulent_gross_energy_MWh", "turbulent_net_energy_MWh", "turbulent_capacity_factor", "turbulent_full_load_hours",
        "status",
    ];

    // What a year must not be read without: points that no machine would be let run at.
    private const PointMarks Broken = PointMarks.ExceedsRated | PointMarks.ThrustNotHeld | PointMarks.RatedNotReached;

    /// <summary>
    /// The table as UTF-8. Energies of a curve with a missing bin are empty cells, and the status names the bins; it also carries the marks
    /// of points that exceed what the case asks for.
    /// </summary>
    public static byte[] Write(EnergyYield energy, PowerCurve curve)
    {
        using var table = new TableWriter(Columns.AsSpan());
        var marks = StatusWords.Of(curve.Points.Aggregate(curve.Marks, (all, point) => all | point.Marks) & Broken);
        var status = $"{Status(energy.MissingBins)} {marks}".Trim();
        for (var i = 0; i < energy.Rows.Length; i++)
        {
            var row = energy.Rows[i];
            table.Text(i == 0 ? "site" : "mean wind speed");
            table.Number(row.Climate.Mean);
            table.Number((row.Climate as WindClimate.Weibull)?.Shape);
            WriteYear(table, row.Steady);
            WriteYear(table, row.Turbulent);
            table.Text(status);
            table.EndRow();
        }
        return table.ToBytes();
    }

    /// <summary><c>missing-bins:11.5/12</c>; empty for none.</summary>
    public static string Status(ImmutableArray<double> missingBins) => missingBins.IsEmpty
        ? ""
        : $"missing-bins:{string.Join('/', missingBins.Select(v => v.ToString("0.#", CultureInfo.InvariantCulture)))}";

    private static void WriteYear(TableWriter table, YearOfEnergy? year)
    {
        table.Number(year is null ? null : MegawattHours(year.Gross));
        table.Number(year is null ? null : MegawattHours(year.Net));
        table.Number(year?.CapacityFactor);
        table.Number(year?.FullLoadTime is { } time ? Hours(time) : null);
    }
}
