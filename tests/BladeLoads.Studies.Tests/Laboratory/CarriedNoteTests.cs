using System.Text;
using BladeLoads.Studies.Laboratory;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Tests.Laboratory;

public class CarriedNoteTests
{
    private const string Note = "augmented: snel-1993, c/r 0.2";
    private const string Rows = "alpha;cl;cd\n-5;-0,4;0,01\n0;0,1;0,009\n5;0,6;0,01\n";

    [Theory]
    [InlineData("# augmented: snel-1993, c/r 0.2", "")]
    [InlineData("  ##  Augmented : snel-1993, c/r 0.2 ", "")]
    [InlineData("% augmented: snel-1993, c/r 0.2", "")]
    [InlineData("!! AUGMENTED: snel-1993, c/r 0.2", "")]
    [InlineData("// # augmented: snel-1993, c/r 0.2", "")]
    [InlineData("C augmented: snel-1993, c/r 0.2", "--comment C")]
    [InlineData("au augmented: snel-1993, c/r 0.2", "--comment au")]
    [InlineData("\"# augmented: snel-1993, c/r 0.2\"", "")]
    [InlineData("\"# augmented: snel-1993, c/r 0.2\";;", "")]
    [InlineData("# augmented: snel-1993, c/r 0.2;;", "")]
    public void A_note_that_the_rows_are_augmented_is_carried_on_whatever_the_comment_mark(string line, string options)
    {
        Assert.Equal([Note], Carried(Foreign.Read($"{line}\n{Rows}", options)));
        Assert.Equal([Note], Carried(Foreign.Read($"{Rows}{line}\n", options)));
    }

    [Fact]
    public void A_note_beside_the_lines_that_hold_the_table_is_carried_on_too()
        => Assert.Equal([Note], Carried(Foreign.Read($"# {Note}\nold;old;old\n{Rows}", "--lines 3-6")));

    [Fact]
    public void Notes_that_differ_are_carried_on_once_each() => Assert.Equal(
        [Note, "augmented: by hand"], Carried(Foreign.Read($"# {Note}\n{Rows}# augmented: by hand\n# {Note}\n")));

    [Theory]
    [InlineData("# not augmented: as measured")]
    [InlineData("# augmented by hand")]
    [InlineData("# to be augmented: later")]
    public void Another_comment_is_none(string line) => Assert.Empty(Carried(Foreign.Read($"{line}\n{Rows}")));

    [Fact]
    public void The_new_table_says_that_it_is_augmented()
    {
        var head = string.Concat(Foreign.Read($"% {Note}\n{Rows}").Record.Select(line => $"# {line}\n"));

        var table = StoredPolars.FromBytes(
            "t18.csv", Encoding.UTF8.GetBytes($"{head}alpha_deg,cl,cd\n-5,-0.4,0.01\n0,0.1,0.009\n5,0.6,0.01\n"), out _);

        Assert.Equal("snel-1993, c/r 0.2", table!.Augmented?.Text);
    }

    private static string[] Carried(LaboratoryTable table)
    {
        Assert.Equal("-5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01", Foreign.Outcome(table));
        return [.. table.Record.Where(line => line.Contains("augmented", StringComparison.Ordinal))];
    }
}
