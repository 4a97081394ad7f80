using SkiaSharp;

namespace BladeLoads.Results.Pictures;

/// <summary>The files of a picture: the same bytes for the same picture.</summary>
public static class PictureFile
{
    private const int PixelsPerPx = 2;      // 192 an inch: what a printer needs for lines this thin

    private static readonly string[] Known = [SvgPicture.Mark, PngChunks.Mark];

    /// <summary>An SVG page whose texts are texts, right in a browser without the font too.</summary>
    public static byte[] Svg(PolarPicture picture)
    {
        var page = new PolarPage(picture);
        return Svg(page.Height, canvas => page.Draw(canvas, withDashes: false), page.Looks, picture.Title, picture.Notes);
    }

    /// <summary>The same for curves over wind speed.</summary>
    public static byte[] Svg(CurvePicture picture)
    {
        var page = new CurvePage(picture);
        return Svg(page.Height, page.Draw, page.Looks, picture.Title, []);
    }

    private static byte[] Svg(float height, Action<SKCanvas> draw, IEnumerable<LineLook> looks, string title, IEnumerable<string> notes)
    {
        using var drawn = new MemoryStream();
        using (var canvas = SKSvgCanvas.Create(SKRect.Create(PolarPage.Width, height), drawn))
            draw(canvas);
        return SvgPicture.Finish(drawn.ToArray(), height, looks, PictureText.Of(title), notes.Select(PictureText.Of));
    }

    /// <summary>A PNG page of 192 pixels an inch.</summary>
    public static byte[] Png(PolarPicture picture)
    {
        var page = new PolarPage(picture);
        using var surface = SKSurface.Create(
            new SKImageInfo((int)PolarPage.Width * PixelsPerPx, (int)Math.Ceiling(page.Height) * PixelsPerPx, SKColorType.Rgba8888, SKAlphaType.Opaque));
        surface.Canvas.Scale(PixelsPerPx);
        page.Draw(surface.Canvas, withDashes: true);
        using var image = surface.Snapshot();
        using var encoded = image.Encode(SKEncodedImageFormat.Png, 100);
        return PngChunks.Added(encoded.ToArray(), 96 * PixelsPerPx);
    }

    /// <summary>Whether a file is a picture that was written here, and so may be drawn anew.</summary>
    /// <param name="beginning">The first <see cref="BytesToKnow"/> bytes of it, or all of a shorter one.</param>
    public static bool IsOwn(ReadOnlySpan<byte> beginning)
    {
        foreach (var mark in Known)
            if (beginning.IndexOf(System.Text.Encoding.ASCII.GetBytes(mark)) >= 0)
                return true;
        return false;
    }

    public const int BytesToKnow = 1024;
}
