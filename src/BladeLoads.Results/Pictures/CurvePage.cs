using System.Collections.Immutable;
using BladeLoads.Results.Comparison;
using SkiaSharp;

namespace BladeLoads.Results.Pictures;

/// <summary>Six diagrams over wind speed, in three rows below a legend, as wide as A4.</summary>
internal sealed class CurvePage
{
    private const float Diagram = 230;
    private const float Gap = 6;

    private static readonly (string Column, string Label)[] Quantities =
    [
        ("electrical_power_kW", "electrical power, kW"), ("power_coefficient", "power coefficient, -"), ("thrust_kN", "thrust, kN"),
        ("aero_root_flapwise_moment_kNm", "root flapwise moment, kNm"), ("rotor_speed_rpm", "rotor speed, rpm"), ("pitch_deg", "pitch, deg"),
    ];

    private readonly ImmutableArray<(CurveLine Line, LineLook Look)> _lines;
    private readonly Legend _legend;

    public CurvePage(CurvePicture picture)
    {
        PictureFont.Use();
        var drawn = picture.Lines.Where(line => line.IsDrawn).ToList();
        _lines = [.. drawn.Select((line, i) => (line, LineLook.Tabulated(i, drawn.Count) with { Mark = null, Width = 1.4f }))];
        _legend = Legend.Of(_lines.Select(line => (line.Line.Label, line.Look)), PolarPage.Width);
    }

    public float Height => _legend.Height + Gap + (Quantities.Length / 2 * (Diagram + Gap));

    public IEnumerable<LineLook> Looks => _lines.Select(line => line.Look);

    public void Draw(SKCanvas canvas)
    {
        canvas.DrawColor(SKColors.White);
        _legend.Draw(canvas, 0, 0, withDashes: false);
        const float Wide = (PolarPage.Width - Gap) / 2;
        for (var i = 0; i < Quantities.Length; i++)
            PanelDrawing.Draw(
                canvas, PanelOf(Quantities[i].Column, Quantities[i].Label),
                SKRect.Create(i % 2 * (Wide + Gap), _legend.Height + Gap + (i / 2 * (Diagram + Gap)), Wide, Diagram), withDashes: false, withNumbers: true);
    }

    private Panel PanelOf(string column, string label)
    {
        var speeds = _lines.SelectMany(line => line.Line.Curve.Points).Select(point => point.WindSpeed).ToList();
        var values = _lines.SelectMany(line => line.Line.Curve.Points).Select(point => point[column] ?? 0);
        return new Panel(
            new PanelAxis("wind speed, m/s", speeds.Min(), speeds.Max()), PanelAxis.Around(label, values.Append(0), narrowest: 1e-3),
            [.. _lines.Select(line => CurveOf(line.Line.Curve, column, line.Look))], HasMarks: false);
    }

    // Straight between the rows; nothing beside a row without a number.
    private static Curve CurveOf(StoredCurve curve, string column, LineLook look)
    {
        var speeds = curve.Points.Select(point => point.WindSpeed).ToImmutableArray();
        var values = curve.Points.Select(point => point[column] ?? double.NaN).ToArray();
        return new Curve(look, speeds[0], speeds[^1], speeds, At);

        (double, double) At(double speed)
        {
            var row = speeds.BinarySearch(speed);
            if (row >= 0)
                return (speed, values[row]);
            var after = Math.Clamp(~row, 1, speeds.Length - 1);
            var share = (speed - speeds[after - 1]) / (speeds[after] - speeds[after - 1]);
            return (speed, values[after - 1] + (share * (values[after] - values[after - 1])));
        }
    }
}
