using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Tables;

/// <summary>A control schedule as read.</summary>
/// <param name="Points">Wind speeds rising; empty when an error keeps the table from being used.</param>
/// <param name="Canonical">The parsed values.</param>
internal sealed record ScheduleTable(ImmutableArray<OperatingPoint> Points, CanonicalTable Canonical, InputFile Input)
{
    private static readonly ImmutableArray<Column> Columns =
        [new("wind_speed_m_s", true), new("rotor_speed_rpm", true), new("pitch_deg", true)];

    public static ScheduleTable Parse(InputText input, Findings findings)
    {
        using var rows = new CsvRows(input, findings);
        var points = new List<OperatingPoint>();
        var lines = new List<string>();
        if (rows.ReadHeader(Columns))
        {
            var previous = (WindSpeed: double.NegativeInfinity, Line: 0);
            while (rows.Read())
            {
                var windSpeed = UpTo(Limits.WindSpeed, rows, "wind_speed_m_s");
                if (windSpeed <= previous.WindSpeed)
                    rows.Error("wind_speed_m_s",
                        Rising.Problem("wind_speed_m_s", previous, windSpeed, rows.Line, "wind speeds must rise"));
                var rotorSpeedRpm = UpTo(Limits.RotorSpeedRpm, rows, "rotor_speed_rpm");
                var pitchDeg = rows.Number("pitch_deg");
                if (Math.Abs(pitchDeg) > 180)
                    rows.Error("pitch_deg", $"pitch_deg is {CanonicalText.Of(pitchDeg)}; give an angle from -180 to 180");
                if (!double.IsNaN(windSpeed))
                    previous = (windSpeed, rows.Line);
                points.Add(new OperatingPoint(windSpeed, rotorSpeedRpm * Math.Tau / 60, double.DegreesToRadians(pitchDeg)));
                lines.Add(CanonicalText.Of([windSpeed, rotorSpeedRpm, pitchDeg]));
            }
            if (!rows.HasErrors && points.Count == 0)
                rows.Error(new Place(input.File, 0, 0), "has no row; a schedule needs one or more");
        }
        var contents = rows.HasErrors ? "schedule with errors" : string.Create(CultureInfo.InvariantCulture,
            $"{points.Count} wind speeds from {CanonicalText.Of(points[0].WindSpeed)} "
            + $"to {CanonicalText.Of(points[^1].WindSpeed)} m/s");
        return new ScheduleTable(rows.HasErrors ? [] : [.. points], Fingerprint.OfTable("control.schedule", input.File, () => lines),
            new InputFile(input.File, input.Sha256, contents));
    }

    private static double UpTo(double limit, CsvRows rows, string column)
    {
        var value = rows.Number(column);
        if (!(value < 0 || value > limit))
            return value;
        rows.Error(column, $"{column} is {CanonicalText.Of(value)}; it must be from 0 to {CanonicalText.Of(limit)}");
        return double.NaN;
    }
}
