using System.Collections.Immutable;
using SkiaSharp;

namespace BladeLoads.Results.Pictures;

/// <summary>
/// The page of a section, as wide as A4: title, legend, and three rows of diagrams, the third only where tables go beyond the working range.
/// </summary>
internal sealed class PolarPage
{
    public const float Width = 794;      // A4 at 96 px an inch

    private const float Margin = 26;
    private const float TitleSize = 16;
    private const float NoteSize = 10;
    private const float TitleLine = 24;
    private const float NoteLine = 14;
    private const float FootLine = 12;
    private const float FootSize = 8.5f;
    private const float Diagram = 306;
    private const float DiagramAboveStrip = 246;
    private const float WholeDiagram = 256;
    private const float Strip = 98;
    private const float Gap = 6;

    private const string AboutLines =
        "Marks: rows of the tables, where they do not crowd. Lines: the shape-preserving cubic (PCHIP) between them, with which rotors are solved.";
    private const string AboutEarlier =
        "Broad pale lines: before, in the colour of their Reynolds number where the tables still have it. Change: now less before, at each angle.";

    private const string AboutRings = "Red rings: rows in doubt.";
    private const string AboutFewerRings =
        "Red rings: rows in doubt; in the two diagrams of all angles only those at -20 deg and below, or at 30 deg and above.";
    private const string AboutShade = "Shaded: the angles at which blades work, from 5 to 95 % of what works in this table.";

    private static readonly SKColor Ink = new(0x20, 0x20, 0x20);

    private readonly PolarLines _lines;
    private readonly PolarPanels _panels;
    private readonly Legend _legend;
    private readonly ImmutableArray<string> _foot;

    public PolarPage(PolarPicture picture)
    {
        PictureFont.Use();
        _lines = PolarLines.Of(picture);
        _panels = PolarPanels.Of(_lines).With(picture);
        _legend = Legend.Of(_lines, Width - (2 * Margin));
        _foot =
        [
            AboutLines,
            .. picture.Earlier is null ? (string[])[] : [AboutEarlier],
            .. picture.Ringed.IsEmpty ? (string[])[] : [_panels.WholeLift is null ? AboutRings : AboutFewerRings],
            .. picture.Shaded is null ? (string[])[] : [AboutShade],
        ];
        Title = Fit(picture.Title, TitleSize, bold: true);
        Notes = [.. picture.Notes.Select(note => Fit(note, NoteSize))];
    }

    public string Title { get; }

    public ImmutableArray<string> Notes { get; }

    /// <summary>Where the title stands, px from the upper left corner of the page.</summary>
    public SKRect TitlePlace => SKRect.Create(Margin, Margin, PictureFont.Width(Title, TitleSize, bold: true), TitleSize + 2);

    public float Height => DiagramsTop + Row(_panels.LiftDifference) + Gap + Row(_panels.LiftToDragDifference) + Gap
        + (_panels.WholeLift is null ? 0 : WholeDiagram + Gap) + (_foot.Length * FootLine) + Margin;

    private float DiagramsTop => Margin + TitleLine + (Notes.Length * NoteLine) + Gap + _legend.Height + Gap;

    /// <summary>How the lines of the page are drawn.</summary>
    public IEnumerable<LineLook> Looks => _lines.All.Select(line => line.Look);

    /// <param name="withDashes">See <see cref="PanelDrawing.Draw"/>.</param>
    public void Draw(SKCanvas canvas, bool withDashes)
    {
        canvas.DrawColor(SKColors.White);
        Write(canvas, Title, Margin, Margin + TitleSize, TitleSize, bold: true);
        for (var i = 0; i < Notes.Length; i++)
            Write(canvas, Notes[i], Margin, Margin + TitleLine + (i * NoteLine) + NoteSize, NoteSize);
        _legend.Draw(canvas, Margin, Margin + TitleLine + (Notes.Length * NoteLine) + Gap, withDashes);

        var top = DiagramsTop;
        DrawWithStrip(canvas, _panels.Lift, _panels.LiftDifference, 0, top, withDashes);
        DrawWithStrip(canvas, _panels.Drag, _panels.DragDifference, 1, top, withDashes);
        top += Row(_panels.LiftDifference) + Gap;
        DrawWithStrip(canvas, _panels.LiftToDrag, _panels.LiftToDragDifference, 0, top, withDashes);
        PanelDrawing.Draw(canvas, _panels.LiftOverDrag, Place(1, top, Row(_panels.LiftToDragDifference)), withDashes, withNumbers: true);
        top += Row(_panels.LiftToDragDifference) + Gap;
        if (_panels is { WholeLift: { } lift, WholeDrag: { } drag })
        {
            PanelDrawing.Draw(canvas, lift, Place(0, top, WholeDiagram), withDashes, withNumbers: true);
            PanelDrawing.Draw(canvas, drag, Place(1, top, WholeDiagram), withDashes, withNumbers: true);
            top += WholeDiagram + Gap;
        }
        for (var i = 0; i < _foot.Length; i++)
            Write(canvas, _foot[i], Margin, top + (i * FootLine) + FootSize, FootSize);
    }

    public static void Write(SKCanvas canvas, string text, float left, float baseline, float size, bool bold = false)
    {
        using var font = PictureFont.Of(size, bold);
        using var paint = new SKPaint { Color = Ink, IsAntialias = true };
        canvas.DrawText(text, left, baseline, font, paint);
    }

    private static void DrawWithStrip(SKCanvas canvas, Panel panel, Panel? strip, int column, float top, bool withDashes)
    {
        PanelDrawing.Draw(canvas, panel, Place(column, top, strip is null ? Diagram : DiagramAboveStrip), withDashes, withNumbers: strip is null);
        if (strip is not null)
            PanelDrawing.Draw(canvas, strip, Place(column, top + DiagramAboveStrip, Strip), withDashes, withNumbers: true);
    }

    private static float Row(Panel? strip) => strip is null ? Diagram : DiagramAboveStrip + Strip;

    private static SKRect Place(int column, float top, float height)
    {
        const float wide = (Width - (2 * Margin) - Gap) / 2;
        return SKRect.Create(Margin + (column * (wide + Gap)), top, wide, height);
    }

    private static string Fit(string text, float size, bool bold = false)
        => PictureText.Fit(PictureText.Of(text), Width - (2 * Margin), size, bold);
}
