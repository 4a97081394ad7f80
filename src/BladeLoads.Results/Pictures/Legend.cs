using System.Collections.Immutable;
using SkiaSharp;

namespace BladeLoads.Results.Pictures;

/// <summary>What the lines of a page are, above its diagrams and never over a curve.</summary>
internal sealed class Legend
{
    private const float Size = 10;
    private const float Line = 15;
    private const float Sample = 34;
    private const float Gap = 6;
    private const float Between = 18;

    private readonly ImmutableArray<(string Text, LineLook? Look, float Left, int Row)> _entries;

    private Legend(ImmutableArray<(string Text, LineLook? Look, float Left, int Row)> entries) => _entries = entries;

    public float Height => (_entries.Max(e => e.Row) + 1) * Line;

    /// <param name="width">px</param>
    public static Legend Of(PolarLines lines, float width)
    {
        var layout = new Layout(width);
        var tabulated = lines.All.Where(l => l.Kind == LineKind.Tabulated).ToList();
        layout.NewRow(tabulated.Count > 0 ? "Reynolds number" : null);
        foreach (var line in tabulated)
            layout.Add(line.Label, line.Look);
        // Lines worked out at several Reynolds numbers, or earlier ones, look alike and are told once.
        foreach (var kind in lines.All.Where(l => l.Kind != LineKind.Tabulated).OrderBy(l => l.Kind ?? (LineKind)int.MaxValue).GroupBy(l => l.Kind))
        {
            layout.NewRow(null);
            foreach (var line in kind.DistinctBy(l => l.Label))
                layout.Add(line.Label, line.Kind is null ? LineLook.Earlier(null) : line.Look);
        }
        return new Legend(layout.Entries);
    }

    /// <summary>Of lines that all are told one after the other.</summary>
    public static Legend Of(IEnumerable<(string Label, LineLook Look)> lines, float width)
    {
        var layout = new Layout(width);
        layout.NewRow(null);
        foreach (var (label, look) in lines)
            layout.Add(label, look);
        return new Legend(layout.Entries);
    }

    public void Draw(SKCanvas canvas, float left, float top, bool withDashes)
    {
        foreach (var (text, look, at, row) in _entries)
        {
            var baseline = top + (row * Line) + Size;
            if (look is not null)
                PanelDrawing.DrawSample(canvas, look, new SKPoint(left + at, baseline - (Size * 0.36f)), Sample, withDashes);
            PolarPage.Write(canvas, text, left + at + (look is null ? 0 : Sample + Gap), baseline, Size);
        }
    }

    private sealed class Layout(float width)
    {
        private readonly ImmutableArray<(string, LineLook?, float, int)>.Builder _entries = ImmutableArray.CreateBuilder<(string, LineLook?, float, int)>();
        private float _left;
        private int _row = -1;

        public ImmutableArray<(string Text, LineLook? Look, float Left, int Row)> Entries => _entries.ToImmutable();

        public void NewRow(string? heading)
        {
            if (_row >= 0 && _left == 0)
                return;
            (_left, _row) = (0, _row + 1);
            if (heading is null)
                return;
            _entries.Add((heading, null, 0, _row));
            _left = PictureFont.Width(heading, Size) + Between;
        }

        public void Add(string label, LineLook look)
        {
            var text = PictureText.Fit(PictureText.Of(label), width - Sample - Gap, Size);
            var needed = Sample + Gap + PictureFont.Width(text, Size);
            if (_left > 0 && _left + needed > width)
                NewRow(null);
            _entries.Add((text, look, _left, _row));
            _left += needed + Between;
        }
    }
}
