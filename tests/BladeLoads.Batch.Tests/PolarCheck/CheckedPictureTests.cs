using System.Text;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Batch.Tests.Pictures;
using BladeLoads.Results.Pictures;
using BladeLoads.Results.PolarCheck;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.PolarCheck;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Batch.Tests.PolarCheck;

public sealed class CheckedPictureTests
{
    private const string RingColour = "#C00020";

    // One row off its line, at 4 degrees; nothing else.
    private static readonly CheckedTable Table = Of("polars/clean/fell-18.csv", """
        alpha_deg,cl,cd
        -4,0.1,0.01
        -2,0.3,0.01
        0,0.5,0.01
        2,0.7,0.01
        4,0.8,0.01
        6,1.1,0.01
        8,1.3,0.012
        10,1.2,0.03
        12,1.1,0.06

        """);

    [Fact]
    public void Rows_in_doubt_have_a_ring_in_the_diagrams_of_their_column_and_stand_in_words_below_the_title()
    {
        var svg = PictureFile.Svg(CheckedPicture.Of(Table, null, "clean"));
        // Lift, lift-to-drag ratio and lift over drag, not drag; this table has no more angles than the working range.
        Assert.Equal(3, CountOf(RingColour, svg));
        var page = new DrawnPage(svg);
        Assert.Contains("line 6, scatter: cl is 0.8 at 4 deg, 0.1 below the line of its neighbours", page.Words);
        Assert.Contains("Red rings: rows in doubt.", page.Words);
        Assert.DoesNotContain(page.Words, word => word.StartsWith("Shaded", StringComparison.Ordinal));
    }

    [Fact]
    public void A_doubt_stands_there_with_all_that_was_found_and_nothing_of_what_would_do()
    {
        var table = Of("polars/clean/round.csv", "# augmented: snel-1993; c/r 0.2\nalpha_deg,cl,cd\n-180,0,0.6\n0,0,0.6\n180,0,0.6\n");
        Assert.Contains(
            "line 1, augmented: the rows are augmented for rotation, by the head: 'snel-1993; c/r 0.2'",
            new DrawnPage(PictureFile.Svg(CheckedPicture.Of(table, null, "clean"))).Words);
    }

    [Fact]
    public void Over_all_angles_no_ring_stands_where_another_diagram_shows_the_row()
    {
        var polar = Sections.Rows(1e6, [-180, -90, -20, 0, 10, 30, 90, 180], deg => Math.Sin(double.DegreesToRadians(2 * deg)), _ => 0.5);
        var picture = PolarPicture.Of(Section.FromPolars("fell-18", [polar]), "clean", "fell-18.csv") with
        {
            Ringed = [.. ((int[])[1, 3, 4, 5]).Select(row => new RingedRow(polar, row, RingedCoefficient.Both))],
        };
        var svg = PictureFile.Svg(picture);
        // 0, 10 and 30 degrees in the four diagrams of the working range; -90 and 30 degrees, where those end, in the two of all angles.
        Assert.Equal((3 * 4) + (2 * 2), CountOf(RingColour, svg));
        Assert.Contains(
            "Red rings: rows in doubt; in the two diagrams of all angles only those at -20 deg and below, or at 30 deg and above.",
            new DrawnPage(svg).Words);
    }

    [Fact]
    public void The_angles_at_which_blades_work_are_shaded()
    {
        var use = new TableUse(Table.Table.Section);
        for (var tenth = 0; tenth < 100; tenth++)
            use.Add(FellRotor.Element(0) with { AngleOfAttack = double.DegreesToRadians(tenth / 10.0), Reynolds = 1e6 }, 0.01);
        var picture = CheckedPicture.Of(Table, use, "clean");
        // A hundred elements from 0 to 9.9 degrees: 5 and 95 % lie at 0.5 and 9.5, to the tenth to which they are counted.
        Assert.Equal(0.5, double.RadiansToDegrees(picture.Shaded!.Value.From), 0.1);
        Assert.Equal(9.5, double.RadiansToDegrees(picture.Shaded!.Value.To), 0.1);
        var page = new DrawnPage(PictureFile.Svg(picture));
        Assert.Contains("Shaded: the angles at which blades work, from 5 to 95 % of what works in this table.", page.Words);
    }

    [Fact]
    public void A_picture_without_doubts_and_use_is_that_of_polar_draw()
    {
        var sound = Of("polars/clean/round.csv", "alpha_deg,cl,cd\n-180,0,0.6\n0,0,0.6\n180,0,0.6\n");
        Assert.Equal(
            Encoding.UTF8.GetString(PictureFile.Svg(PolarPicture.Of(sound.Table.Section, "clean", "polars/clean/round.csv"))),
            Encoding.UTF8.GetString(PictureFile.Svg(CheckedPicture.Of(sound, null, "clean"))));
    }

    [Fact]
    public void Tables_of_several_sets_have_files_of_different_names()
    {
        CheckedTable Named(string file) => Of(file, "alpha_deg,cl,cd\n-180,0,0.6\n0,0,0.6\n180,0,0.6\n");
        string[] Names(params string[] files) => [.. CheckedPicture.Files(
            new CheckedTables([.. files.Select(Named)], []), new Dictionary<string, TableUse>(), new TableNames(files, "fell")).Select(f => f.Name)];
        Assert.Equal(["round.svg", "tip.svg"], Names("polars/clean/round.csv", "polars/clean/tip.csv"));
        Assert.Equal(["clean~tip.svg", "soiled~tip.svg"], Names("polars/clean/tip.csv", "polars/soiled/tip.csv"));
        Assert.Equal(["a~clean~tip.svg", "a%7Eclean~tip.svg"], Names("polars/a/clean/tip.csv", "polars/a~clean/tip.csv"));
        Assert.Equal(["a%7E~b~tip.svg", "a~%7Eb~tip.svg"], Names("polars/a~/b/tip.csv", "polars/a/~b/tip.csv"));
        Assert.Equal(["a%257E~tip.svg", "a%7E~tip.svg"], Names("polars/a%7E/tip.csv", "polars/a~/tip.csv"));
        Assert.Equal(["polars~tip.svg", "tables~tip.svg"], Names("polars/tip.csv", "tables/tip.csv"));
        Assert.Equal(["polars~tip.svg", "polars~soiled~tip.svg", "~~tip.svg"], Names("polars/tip.csv", "polars/soiled/tip.csv", "tip.csv"));
        Assert.Equal(["tip.svg"], Names("tip.csv"));
    }

    private static int CountOf(string colour, byte[] svg)
        => Encoding.UTF8.GetString(svg).Split($"stroke=\"{colour}\"").Length - 1;

    private static CheckedTable Of(string file, string text)
        => CheckedTable.Of(StoredPolars.FromBytes(file, Encoding.UTF8.GetBytes(text), out _)!, file);
}
