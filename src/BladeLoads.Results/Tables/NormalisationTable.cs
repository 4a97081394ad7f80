using System.Collections.Immutable;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Energy;
using BladeLoads.Rotor.Operation;
using static BladeLoads.Results.Tables.FileUnits;

namespace BladeLoads.Results.Tables;

/// <summary>
/// <c>density-normalisation.csv</c>: the curve brought to a reference density by both ways of the standard, beside the curve solved at
/// that density. The columns are a promise (docs/formats.md).
/// </summary>
public static class NormalisationTable
{
    public const string FileName = "density-normalisation.csv";

    public static ImmutableArray<string> Columns { get; } =
    [
        "wind_speed_m_s", "electrical_power_kW", "power_scaled_electrical_power_kW", "scaled_wind_speed_m_s",
        "wind_speed_scaled_electrical_power_kW", "solved_electrical_power_kW", "status",
    ];

    /// <summary>The table as UTF-8: a row a wind speed of operation.</summary>
    /// <param name="curve">At the case's density, kg/m3.</param>
    /// <param name="solved">At the reference density, on the same wind speeds.</param>
    public static byte[] Write(PowerCurve curve, double density, PowerCurve solved, double referenceDensity)
    {
        var steady = SteadyPower.Of(curve);
        using var table = new TableWriter(Columns.AsSpan());
        foreach (var (point, afresh) in curve.Points.Zip(solved.Points))
        {
            if ((point.Marks & (PointMarks.BelowCutIn | PointMarks.AboveCutOut)) != 0 || steady is null)
                continue;
            var windSpeed = point.Operation.WindSpeed;
            table.Number(windSpeed);
            table.Number(Kilo(point.ElectricalPower));
            table.Number(Kilo(DensityNormalisation.Power(point.ElectricalPower, density, referenceDensity)));
            table.Number(DensityNormalisation.WindSpeed(windSpeed, density, referenceDensity));
            // The scaled curve is read where its own wind speed, scaled, is that of the row.
            var unscaled = DensityNormalisation.WindSpeed(windSpeed, referenceDensity, density);
            table.Number(unscaled >= steady.First && unscaled <= steady.Last ? Kilo(steady.At(unscaled)) : null);
            table.Number(Kilo(afresh.ElectricalPower));
            table.Text(StatusWords.Of(point.Marks | afresh.Marks));
            table.EndRow();
        }
        return table.ToBytes();
    }
}
