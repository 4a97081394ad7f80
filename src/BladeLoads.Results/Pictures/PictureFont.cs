using ScottPlot;
using SkiaSharp;

namespace BladeLoads.Results.Pictures;

/// <summary>
/// The font of every text in a picture, carried within the program: where fonts are looked for on the machine and none is there, the
/// plotting library leaves all texts out and says nothing.
/// </summary>
internal static class PictureFont
{
    public const string Family = "DejaVu Sans";

    private static readonly SKTypeface Regular = Load("DejaVuSans.ttf");
    private static readonly SKTypeface Bold = Load("DejaVuSans-Bold.ttf");
    private static readonly Lock Once = new();
    private static bool _isSet;

    /// <summary>Makes it the plotting library's only font. That is a setting of the whole process, so it is made once.</summary>
    public static void Use()
    {
        lock (Once)
        {
            if (_isSet)
                return;
            Fonts.FontResolvers.Clear();
            Fonts.FontResolvers.Add(new Carried());
            Fonts.Default = Family;
            _isSet = true;
        }
    }

    /// <summary>To be disposed by the caller.</summary>
    /// <param name="size">px</param>
    public static SKFont Of(float size, bool bold = false)
        => new(bold ? Bold : Regular, size) { Subpixel = true, Edging = SKFontEdging.Antialias, Hinting = SKFontHinting.None };

    /// <summary>Width of a text, px.</summary>
    public static float Width(string text, float size, bool bold = false)
    {
        using var font = Of(size, bold);
        return font.MeasureText(text);
    }

    public static bool Has(int character) => Regular.GetGlyph(character) != 0 && Bold.GetGlyph(character) != 0;

    private static SKTypeface Load(string name)
    {
        using var stream = typeof(PictureFont).Assembly.GetManifestResourceStream(name)!;
        return SKTypeface.FromStream(stream) ?? throw new InvalidOperationException($"the font {name} cannot be read");
    }

    private sealed class Carried : IFontResolver
    {
        public SKTypeface CreateTypeface(string fontName, FontWeight weight, FontSlant slant, FontSpacing spacing)
            => CreateTypeface(fontName, weight >= FontWeight.SemiBold, slant != FontSlant.Upright);

        public SKTypeface CreateTypeface(string fontName, bool bold, bool italic) => bold ? Bold : Regular;
    }
}
