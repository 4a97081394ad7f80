using System.Collections.Immutable;
using BladeLoads.Results.Pictures;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Batch.Tests.Pictures;

public sealed class PolarLinesTests
{
    private static readonly (double, double) Working = (-0.35, 0.52);

    private static PolarPicture Picture(Section section) => PolarPicture.Of(section, "clean", "fell-21.csv");

    [Fact]
    public void The_straight_pieces_of_a_curve_are_nowhere_further_from_it_than_an_eye_sees()
    {
        var polar = Sections.Lifting(1e6);
        var section = Section.FromPolars("a", [polar]);
        var curve = Assert.Single(PolarLines.Of(Picture(section)).OverAngle(Working, c => c.Lift));
        var frame = new Frame(-20, 30, -1.5, 1.5, 330, 260);
        var piece = Assert.Single(curve.Pieces(frame));
        for (var deg = -12.0; deg <= 20; deg += 0.01)
        {
            var right = piece.ToList().FindIndex(p => p.X >= deg);
            if (right <= 0)
                continue;
            var (a, b) = (piece[right - 1], piece[right]);
            var drawn = a.Y + ((deg - a.X) / (b.X - a.X) * (b.Y - a.Y));
            var expected = section.At(double.DegreesToRadians(deg), 1e6).Lift;
            Assert.Equal(expected, drawn, 0.3 * 3 / 260);
        }
    }

    [Fact]
    public void What_an_update_changed_is_now_less_before()
    {
        var (before, now) = (Section.FromPolars("a", [Sections.Lifting(1e6)]), Section.FromPolars("a", [Sections.Lifting(1e6, 1.1)]));
        var curve = Assert.Single(PolarLines.Of(Picture(now).Over(before, "old")).Differences(Working, c => c.Lift));
        Assert.Equal(0.04, curve.At(double.DegreesToRadians(4)).Y, 1e-12);    // 0.1 of 0.4
        Assert.Equal(4, curve.At(double.DegreesToRadians(4)).X, 1e-12);
    }

    [Theory]
    [InlineData(2e6, 0.5)]      // linear in the logarithm: half way from 1e6 to 4e6
    [InlineData(5e5, 0.4)]
    [InlineData(9e6, 0.6)]
    public void At_another_Reynolds_number_the_earlier_tables_stand_for_what_the_solver_would_take(double reynolds, double earlierLift)
    {
        var before = Section.FromPolars("a", [Sections.Lifting(1e6), Sections.Lifting(4e6, 1.5)]);
        var now = Section.FromPolars("a", [Sections.Lifting(reynolds)]);
        var curve = Assert.Single(PolarLines.Of(Picture(now).Over(before, "old")).Differences(Working, c => c.Lift));
        Assert.Equal(0.4 - earlierLift, curve.At(double.DegreesToRadians(4)).Y, 1e-12);
    }

    [Fact]
    public void Where_only_one_of_two_tables_reaches_nothing_is_compared()
    {
        var before = Section.FromPolars("a", [Sections.Lifting(1e6, 1, 0, 8)]);
        var now = Section.FromPolars("a", [Sections.Lifting(1e6, 1, 4, 16)]);
        var curve = Assert.Single(PolarLines.Of(Picture(now).Over(before, "old")).Differences(Working, c => c.Drag));
        Assert.Equal((4, 8), (Math.Round(double.RadiansToDegrees(curve.From), 9), Math.Round(double.RadiansToDegrees(curve.To), 9)));
    }

    [Fact]
    public void A_picture_over_earlier_tables_has_three_strips_of_change_and_says_what_lies_beneath()
    {
        var page = new DrawnPage(PictureFile.Svg(Picture(Sections.Of(1e6)).Over(Sections.Of(1e6), "old/fell-21.csv")));
        Assert.Equal(3, page.Words.Count(w => w == "change"));
        Assert.Contains("before: old/fell-21.csv", page.Words);
        Assert.Contains(page.Words, w => w.StartsWith("Broad pale lines: before", StringComparison.Ordinal));
    }

    [Fact]
    public void An_extension_is_drawn_beyond_the_rows_that_it_kept()
    {
        var polar = Sections.Lifting(1e6);
        var extended = PolarExtension.Extend(polar, 15, ExtensionJoin.End).Polar;
        var line = Assert.Single(ExtendedLines.Of(Section.FromPolars("a", [polar]), Section.FromPolars("a", [extended])));
        Assert.Equal(LineKind.Extended, line.Kind);
        Assert.Equal([-Math.PI, polar.Angles[0], polar.Angles[^1], Math.PI], line.Parts.SelectMany(p => new[] { p.From, p.To }));

        var page = new DrawnPage(PictureFile.Svg(Picture(Section.FromPolars("a", [polar])).With(line)));
        Assert.Contains("extended, Viterna and Corrigan 1982", page.Words);
        Assert.Contains("4 2.5", page.Dashes);
        Assert.Contains("-135", page.Words);       // the full circle
    }

    [Fact]
    public void A_table_that_needed_no_extension_has_no_line_of_one()
        => Assert.Empty(ExtendedLines.Of(Sections.Round(), Sections.Round()));

    [Theory]
    [InlineData(0, "0")]
    [InlineData(1.2e-17, "0")]
    [InlineData(0.0001, "0.0001")]
    [InlineData(0.00005, "5e-5")]
    [InlineData(-0.25, "-0.25")]
    [InlineData(190000, "190000")]
    [InlineData(-1.5e7, "-1.5e7")]
    public void Numbers_beside_an_axis_take_no_more_room_than_there_is(double value, string text)
        => Assert.Equal(text, PanelAxis.NumberText(value));

    [Fact]
    public void Augmented_lines_of_one_label_stand_in_the_legend_once_and_look_alike()
    {
        var lines = new[] { ("at a", 1.2), ("at b", 1.3), ("at a", 1.4) }
            .Select(l => new PolarLine(Sections.Lifting(1e6, l.Item2), LineKind.Augmented, l.Item1)).ToImmutableArray();
        var picture = Picture(Sections.Of(1e6)).With(lines);
        Assert.Single(new DrawnPage(PictureFile.Svg(picture)).Words, w => w == "at a");
        var looks = PolarLines.Of(picture).All.Skip(1).Select(l => l.Look).ToList();
        Assert.Equal(looks[0], looks[2]);
        Assert.NotEqual(looks[0], looks[1]);
    }
}
