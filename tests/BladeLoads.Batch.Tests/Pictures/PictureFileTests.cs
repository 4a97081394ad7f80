using BladeLoads.Results.Pictures;
using BladeLoads.Rotor.Sections;
using SkiaSharp;

namespace BladeLoads.Batch.Tests.Pictures;

public sealed class PictureFileTests
{
    private static PolarPicture Picture(params double[] reynolds) => PolarPicture.Of(Sections.Of(reynolds), "clean", "study fell, polars/clean/fell-21.csv");

    private static DrawnPage Page(PolarPicture picture) => new(PictureFile.Svg(picture));

    [Fact]
    public void Every_text_of_a_picture_stands_in_its_svg()
    {
        var page = Page(Picture(3e5, 3e6));
        string[] expected =
        [
            "Section fell-21, set clean", "study fell, polars/clean/fell-21.csv", "Reynolds numbers 3e5, 3e6; 34 rows from -12 to 20 deg",
            "Reynolds number", "3e5", "3e6", "angle of attack, deg", "lift coefficient, -", "drag coefficient, -", "lift-to-drag ratio, -", "-20", "30",
            "Marks: rows of the tables, where they do not crowd. Lines: the shape-preserving cubic (PCHIP) between them, with which rotors are solved.",
        ];
        Assert.Empty(expected.Except(page.Words));
        Assert.Equal("Section fell-21, set clean", page.Title);
    }

    [Fact]
    public void A_range_a_little_wider_than_sixty_degrees_has_numbers_every_ten()
    {
        var section = Section.FromPolars("fell-21", [Sections.Lifting(1e6, fromDeg: -20.2, toDeg: 55)]);
        var words = Page(PolarPicture.Of(section, "clean", "fell-21.csv")).Words;
        Assert.Contains("50", words);
        Assert.DoesNotContain("45", words);
    }

    // Without a font the plotting library draws no text and says nothing of it: this is how it would be noticed.
    [Fact]
    public void Every_text_of_the_svg_has_ink_in_the_png()
    {
        var picture = Picture(3e5, 3e6).Over(Sections.Of(1e6), "an earlier table");
        using var png = SKBitmap.Decode(PictureFile.Png(picture));
        foreach (var text in Page(picture).Texts.Where(t => t.Text.Any(char.IsLetterOrDigit)))
        {
            var (left, top, right, bottom) = text.Box;
            var (dark, all) = (0, 0);
            for (var x = (int)(2 * left); x < 2 * right; x++)
                for (var y = (int)(2 * top); y < 2 * bottom; y++, all++)
                    if (png.GetPixel(x, y) is var p && p.Red + p.Green + p.Blue < 300)
                        dark++;
            // Letters of this font cover 15 to 40 % of their box: measured here, no source.
            Assert.True(dark > 0.08 * all, $"'{text.Text}' at {text.Box}: {dark} dark pixels of {all}");
        }
    }

    [Fact]
    public void The_same_picture_gives_the_same_bytes_whatever_was_drawn_between()
    {
        var (svg, png) = (PictureFile.Svg(Picture(3e5, 3e6)), PictureFile.Png(Picture(3e5, 3e6)));
        PictureFile.Svg(Picture(1e6));
        Assert.Equal(svg, PictureFile.Svg(Picture(3e5, 3e6)));
        Assert.Equal(png, PictureFile.Png(Picture(3e5, 3e6)));
    }

    [Theory]
    [InlineData("lift coefficient, -", 0, 1, 0.4)]      // cl at 4 deg: see Sections.Lifting
    [InlineData("lift-to-drag ratio, -", 0, 20, 0.4 / 0.0132)]
    public void A_row_stands_where_the_numbers_of_the_axes_say(string axis, int low, int high, double expected)
    {
        var page = Page(Picture(3e6));
        var label = page.Texts.First(t => t.Text == axis && !t.IsUpright);
        // The numbers of this panel: those nearest to its label, to the right of it and below.
        PlacedText Up(string text) => page.Texts.Where(t => t.Text == text && t.X > label.X && t.X < label.X + 60).MinBy(t => Math.Abs(t.MiddleY - label.MiddleY))!;
        PlacedText Across(string text) => page.Texts.Where(t => t.Text == text && t.MiddleY > label.MiddleY && t.X > label.X + 40)
            .MinBy(t => (t.MiddleY - label.MiddleY) + Math.Abs(t.X - label.X))!;
        double TickAt(PlacedText number) => page.Ticks.Where(t => t.Y0 == t.Y1 && Math.Abs(t.X1 - t.X0) < 6 && Math.Abs(t.X0 - number.Box.Right) < 15)
            .MinBy(t => Math.Abs(t.Y0 - number.MiddleY)).Y0;
        double TickUnder(PlacedText number) => page.Ticks.Where(t => t.X0 == t.X1 && Math.Abs(t.Y1 - t.Y0) < 6 && Math.Abs(t.Y0 - number.Box.Top) < 15)
            .MinBy(t => Math.Abs(t.X0 - number.MiddleX)).X0;

        var (y0, y1) = (TickAt(Up($"{low}")), TickAt(Up($"{high}")));
        var y = y0 + ((expected - low) / (high - low) * (y1 - y0));
        var (x0, x10) = (TickUnder(Across("0")), TickUnder(Across("10")));
        var x = x0 + (4.0 / 10 * (x10 - x0));
        Assert.True(
            page.Circles.Any(c => Math.Abs(c.X - x) < 0.1 && Math.Abs(c.Y - y) < 0.1),
            $"no mark at {x:0.00}, {y:0.00}; the nearest is {page.Circles.MinBy(c => Math.Abs(c.X - x) + Math.Abs(c.Y - y))}");
    }

    [Fact]
    public void A_round_section_of_three_rows_without_a_Reynolds_number_is_drawn()
    {
        var svg = PictureFile.Svg(PolarPicture.Of(Sections.Round(), "clean", "round.csv"));
        Assert.DoesNotContain("NaN", System.Text.Encoding.UTF8.GetString(svg), StringComparison.Ordinal);
        Assert.Empty(new[] { "no Reynolds number; 3 rows from -180 to 180 deg", "any", "-135", "0.6" }.Except(new DrawnPage(svg).Words));
    }

    [Fact]
    public void A_table_far_from_the_working_range_is_drawn_over_its_own()
    {
        var section = Section.FromPolars("deep", [Sections.Rows(1e6, [60, 70, 80], _ => 0.9, deg => deg / 60)]);
        Assert.Empty(new[] { "60", "65", "80" }.Except(Page(PolarPicture.Of(section, "clean", "deep.csv")).Words));
    }

    [Fact]
    public void Drag_of_nothing_at_a_row_is_drawn_and_no_ratio_there()
    {
        var section = Section.FromPolars("still", [Sections.Rows(1e6, [-10, 0, 10], deg => 0.1 * deg, deg => Math.Abs(deg) / 1000)]);
        var svg = PictureFile.Svg(PolarPicture.Of(section, "clean", "still.csv"));
        Assert.DoesNotContain("NaN", System.Text.Encoding.UTF8.GetString(svg), StringComparison.Ordinal);
        Assert.DoesNotContain("nfinity", System.Text.Encoding.UTF8.GetString(svg), StringComparison.Ordinal);
    }

    [Fact]
    public void Fourteen_Reynolds_numbers_stand_in_the_legend_each_with_its_look()
    {
        double[] reynolds = [.. Enumerable.Range(1, 14).Select(i => i * 5e5)];
        var page = Page(Picture(reynolds));
        Assert.Empty(reynolds.Select(re => re.ToString("0.######e0", System.Globalization.CultureInfo.InvariantCulture)).Except(page.Words));
        Assert.Contains("14 Reynolds numbers from 5e5 to 7e6; 238 rows from -12 to 20 deg", page.Words);
        var looks = Enumerable.Range(0, 14).Select(i => LineLook.Tabulated(i, 14)).ToList();
        Assert.Equal(14, looks.Select(l => l.Colour).Distinct().Count());
        Assert.Equal(14, looks.Select(l => (l.Dashes, l.Mark)).Distinct().Count());
    }

    [Fact]
    public void Names_are_text_whatever_they_hold()
    {
        var section = Section.FromPolars("a\"b'<script>&\u0007\u202e\n\u4e2d", [Sections.Lifting(1e6)]);
        var picture = PolarPicture.Of(section, "<!--", "]]>.csv").Over(Sections.Of(1e6), "</text>&amp;");
        var page = Page(picture);
        const string title = @"Section a""b'<script>&\u0007\u202e\u000a\u4e2d, set <!--";
        Assert.Equal(title, page.Title);
        Assert.Empty(new[] { title, "]]>.csv", "before: </text>&amp;" }.Except(page.Words));
        Assert.Equal(["clipPath", "desc", "ellipse", "g", "path", "rect", "svg", "text", "title"], page.Elements.Order(StringComparer.Ordinal));
    }

    [Fact]
    public void A_name_that_is_too_long_loses_its_middle_on_the_page_alone()
    {
        var name = new string('w', 300);
        var page = Page(PolarPicture.Of(Section.FromPolars(name, [Sections.Lifting(1e6)]), "clean", "w.csv"));
        Assert.Equal($"Section {name}, set clean", page.Title);
        var title = Assert.Single(page.Texts, t => t.Size == 16);
        Assert.Matches("^Section w+\\.\\.\\.w+, set clean$", title.Text);
        Assert.InRange(title.Width, 700, 742);
    }

    [Fact]
    public void A_file_of_ours_is_known_by_its_beginning()
    {
        Assert.True(PictureFile.IsOwn(PictureFile.Svg(Picture(1e6)).AsSpan()[..PictureFile.BytesToKnow]));
        Assert.True(PictureFile.IsOwn(PictureFile.Png(Picture(1e6)).AsSpan()[..PictureFile.BytesToKnow]));
        Assert.False(PictureFile.IsOwn("<svg xmlns=\"http://www.w3.org/2000/svg\"/>"u8));
        Assert.False(PictureFile.IsOwn([]));
    }

    // The check sum of an empty IEND chunk, AE 42 60 82, stands in every PNG: key png in docs/sources.md.
    [Fact]
    public void A_png_tells_its_size_on_paper_in_a_chunk_with_a_right_check_sum()
    {
        Assert.Equal([0, 0, 0, 0, (byte)'I', (byte)'E', (byte)'N', (byte)'D', 0xAE, 0x42, 0x60, 0x82], PngChunks.Chunk("IEND", []));
        var png = PictureFile.Png(Picture(1e6)).AsSpan();
        var at = png.IndexOf("pHYs"u8);
        Assert.Equal([0, 0, 0x1D, 0x87, 0, 0, 0x1D, 0x87, 1], png.Slice(at + 4, 9).ToArray());   // 7559 a metre: 192 an inch
    }
}
