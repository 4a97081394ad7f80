using ScottPlot;
using ScottPlot.TickGenerators;
using SkiaSharp;

namespace BladeLoads.Results.Pictures;

/// <summary>Draws a panel with the plotting library.</summary>
internal static class PanelDrawing
{
    public const float TickSize = 9.5f;
    public const float LabelSize = 10.5f;

    private const float Left = 52;
    private const float Right = 8;
    private const float Top = 6;
    private const float Bottom = 36;
    private const float BottomWithoutNumbers = 8;

    private const float NumberDrop = 1.8f;   // px; brings the middle of a digit level with its tick

    private const float LargestMark = 4;
    private const float SmallestMark = 1.8f;
    private const float CurvesInLargeMarks = 7;

    private static readonly MarkerShape[] Shapes =
    [
        MarkerShape.FilledCircle, MarkerShape.OpenSquare, MarkerShape.FilledTriangleUp, MarkerShape.OpenCircle, MarkerShape.FilledSquare,
        MarkerShape.OpenTriangleDown, MarkerShape.FilledDiamond,
    ];

    private static readonly Color Ink = Color.FromHex("#202020");
    private static readonly Color Grid = Color.FromHex("#E4E4E4");
    private static readonly Color ZeroLine = Color.FromHex("#8A8A8A");
    private static readonly Color Shade = Color.FromHex("#B8A860").WithAlpha(0.16);
    private static readonly Color Ring = Color.FromHex("#C00020");
    private const float RingSize = 9;
    private const float RingWidth = 1.4f;

    /// <param name="withDashes">Whether lines are broken into their dashes; else they are solid, and a later step breaks them.</param>
    /// <param name="withNumbers">Whether the lower axis has its numbers and label; another panel below may have them for both.</param>
    public static void Draw(SKCanvas canvas, Panel panel, SKRect place, bool withDashes, bool withNumbers)
    {
        using var plot = new Plot();
        // It would clear the whole page, other panels included; in SVG it leaves a black sheet behind.
        plot.RenderManager.ClearCanvasBeforeEachRender = false;
        var frame = FrameOf(panel, place, withNumbers);
        foreach (var curve in panel.Curves)
            Add(plot, curve, frame, withDashes, panel.HasMarks ? LargestMark * Math.Min(1, CurvesInLargeMarks / panel.Curves.Length) : 0);
        AddRings(plot, [.. panel.Rings.Where(frame.Contains).Select(p => new Coordinates(p.X, p.Y))]);
        if (panel.HasZeroLine)
        {
            var zero = plot.Add.HorizontalLine(0, 0.8f, ZeroLine);
            plot.MoveToBack(zero);
        }
        if (panel.Shade is { } shade)
        {
            var span = plot.Add.HorizontalSpan(shade.From, shade.To, Shade);
            span.LineWidth = 0;
            plot.MoveToBack(span);
        }
        Style(plot, panel, withNumbers);
        plot.Layout.Fixed(new PixelPadding(Left, Right, withNumbers ? Bottom : BottomWithoutNumbers, Top));
        // The first time, the library draws all twice, one over the other.
        var rectangle = new PixelRect(place.Left, place.Right, place.Bottom, place.Top);
        using (var nowhere = new SKNoDrawCanvas((int)place.Right, (int)place.Bottom))
            plot.Render(nowhere, rectangle);
        plot.Render(canvas, rectangle);
    }

    /// <summary>A short piece of a line with its mark, as the legend shows it.</summary>
    public static void DrawSample(SKCanvas canvas, LineLook look, SKPoint from, float length, bool withDashes)
    {
        using var paint = Paint.NewDisposablePaint();
        var style = StyleOf(look, withDashes);
        style.Render(canvas, new PixelLine(from.X, from.Y, from.X + length, from.Y), paint);
        if (look.Mark is { } mark)
            Marker(mark, LargestMark, look).Render(canvas, new Pixel(from.X + (length / 2), from.Y), paint);
    }

    private static Frame FrameOf(Panel panel, SKRect place, bool withNumbers)
        => panel.Frame(place.Width - Left - Right, place.Height - Top - (withNumbers ? Bottom : BottomWithoutNumbers));

    private static void Add(Plot plot, Curve curve, Frame frame, bool withDashes, float largestMark)
    {
        foreach (var piece in curve.Pieces(frame))
        {
            var line = plot.Add.ScatterLine(piece.Select(p => new Coordinates(p.X, p.Y)).ToArray(), ColorOf(curve.Look));
            line.LineStyle = StyleOf(curve.Look, withDashes);
        }
        if (largestMark == 0 || curve.Look.Mark is not { } mark)
            return;
        var rows = curve.Rows.Where(frame.Contains).ToList();
        if (rows.Count == 0)
            return;
        var size = Math.Min(largestMark, 0.6f * frame.Width / rows.Count);
        if (size < SmallestMark)
            return;
        var marks = plot.Add.ScatterPoints(rows.Select(p => new Coordinates(p.X, p.Y)).ToArray(), ColorOf(curve.Look));
        marks.MarkerStyle = Marker(mark, size, curve.Look);
    }

    private static void AddRings(Plot plot, Coordinates[] places)
    {
        if (places.Length == 0)
            return;
        var rings = plot.Add.ScatterPoints(places, Ring);
        rings.MarkerStyle = new MarkerStyle(MarkerShape.OpenCircle, RingSize, Ring);
        rings.MarkerStyle.LineStyle.Width = RingWidth;
    }

    private static MarkerStyle Marker(int mark, float size, LineLook look)
    {
        var style = new MarkerStyle(Shapes[mark % Shapes.Length], size, ColorOf(look));
        style.LineStyle.Width = 0.8f;
        return style;
    }

    private static void Style(Plot plot, Panel panel, bool withNumbers)
    {
        plot.Axes.SetLimits(panel.Across.From, panel.Across.To, panel.Up.From, panel.Up.To);
        plot.Axes.Top.IsVisible = plot.Axes.Right.IsVisible = true;
        plot.Grid.MajorLineColor = Grid;
        plot.Grid.MajorLineWidth = 0.6f;
        plot.DataBorder.Width = 0;
        Style(plot.Axes.Bottom, panel.Across);
        Style(plot.Axes.Left, panel.Up);
        plot.Axes.Left.TickLabelStyle.OffsetY = NumberDrop;
        plot.Axes.Bottom.TickLabelStyle.IsVisible = withNumbers;
        plot.Axes.Bottom.Label.IsVisible = withNumbers;
        foreach (var axis in (IAxis[])[plot.Axes.Top, plot.Axes.Right])
            axis.FrameLineStyle.Width = 0.8f;
    }

    private static void Style(IAxis axis, PanelAxis said)
    {
        axis.Label.Text = said.IsLogarithmic ? said.Label + " (logarithmic scale)" : said.Label;
        axis.Label.FontSize = LabelSize;
        axis.Label.Bold = false;
        axis.Label.ForeColor = Ink;
        axis.TickLabelStyle.FontSize = TickSize;
        axis.TickLabelStyle.ForeColor = Ink;
        axis.FrameLineStyle.Width = 0.8f;
        axis.MajorTickStyle.Width = 0.8f;
        axis.MinorTickStyle.Length = 0;
        axis.TickGenerator = said.Ticks.IsEmpty
            ? new NumericAutomatic { LabelFormatter = PanelAxis.NumberText }
            : new NumericManual([.. said.Ticks.Select(t => t.At)], [.. said.Ticks.Select(t => t.Text)]);
    }

    private static Color ColorOf(LineLook look) => Color.FromHex($"#{look.Colour:X6}");

    private static LineStyle StyleOf(LineLook look, bool withDashes)
    {
        var pattern = look.Dashes.IsEmpty || !withDashes ? LinePattern.Solid : new LinePattern([.. look.Dashes], 0, "");
        return new LineStyle(look.Width, ColorOf(look), pattern) { StrokeJoin = SKStrokeJoin.Round };
    }
}
