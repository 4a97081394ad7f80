using System.Text;
using BladeLoads.Studies.Tables;
using BladeLoads.Studies.Tests.PolarCheck;

namespace BladeLoads.Studies.Tests.Tables;

public class HeadOfATableTests
{
    private const string Rows = "alpha_deg,cl,cd\n-10,-0.8,0.02\n0,0.2,0.01\n10,1.1,0.015\n";

    /// <summary>Signs at which some programs end a line, and the reader of rows does not.</summary>
    public static TheoryData<string> NoLineEnds => ["\f", "\v", "\u0085", "\u2028", "\u2029"];

    [Theory, MemberData(nameof(NoLineEnds))]
    public void A_sign_that_ends_no_line_leaves_the_head_whole(string sign)
    {
        var table = Read($"# page 1{sign}page 2\n# augmented: snel-1993\n# {sign}end\n{Rows}");

        Assert.Equal([$"page 1{sign}page 2", "augmented: snel-1993", "end"], table.Head.ToArray());
        Assert.Equal((2, "snel-1993"), table.Augmented);
    }

    [Theory, MemberData(nameof(NoLineEnds))]
    public void A_sign_that_ends_no_line_moves_no_finding(string sign)
    {
        var broken = new FellTable().With(18, "0.795", "0.0972").With(20, "0.795", "0.13").With(25, "0.78", "0.23");
        var plain = broken.Doubts().ToList();

        Assert.NotEmpty(plain);
        Assert.Equal(plain, broken.WithHead($"# page 1{sign}cl,cd,alpha_deg").Doubts());
    }

    [Theory]
    [InlineData("\r\n")]
    [InlineData("\r")]
    public void Other_line_ends_leave_the_head_as_it_is(string end)
    {
        var table = Read($"# page 1\n\n# augmented: snel-1993\n{Rows}".Replace("\n", end, StringComparison.Ordinal));

        Assert.Equal(["page 1", "augmented: snel-1993"], table.Head.ToArray());
        Assert.Equal((3, "snel-1993"), table.Augmented);
        Assert.Equal([5, 6, 7], table.RowLines.Single().ToArray());
    }

    private static StoredPolars Read(string text)
    {
        var table = StoredPolars.FromBytes("t18.csv", Encoding.UTF8.GetBytes(text), out var errors);
        Told.Exactly([], errors);
        return table!;
    }
}
