using System.Globalization;
using System.Text;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.PolarCheck;
using BladeLoads.Studies.PolarCheck;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Batch.Tests.PolarCheck;

/// <summary>On an invented section whose largest lift and least drag both jump from one Reynolds number to the next, at the same angles.</summary>
public sealed class KindOfDoubtTests
{
    private static readonly CheckedTable Table = Of(Rows("1e6", 1.2, 0.008) + Rows("2e6", 1.8, 0.02));

    [Fact]
    public void Doubts_of_one_kind_about_two_columns_are_two()
    {
        var kinds = KindOfDoubt.Of(Table, null).Where(kind => kind.First.Kind == DoubtKinds.ReynoldsNumbers).ToList();
        Assert.Equal(
            [
                "cd 23: the least drag is 0.02, and 0.008 at Reynolds number 1e6; drag falls with it, and no faster than its square root: are the two of "
                + "one section, equally smooth?",
                "cl 28: the largest lift is 1.8, and 1.2 at Reynolds number 1e6; that is a jump: give a Reynolds number between them, or mend the slip",
            ],
            kinds.Select(k => $"{k.First.Column} {k.First.Finding.Line}: {k.First.Finding.Text}"));
        Assert.All(kinds, kind => Assert.Empty(kind.OtherLines));
    }

    [Fact]
    public void A_jump_of_largest_lift_at_one_angle_concerns_the_blades_that_work_about_it()
    {
        var jump = Table.Doubts.Single(doubt => doubt.Finding.Text.StartsWith("the largest lift", StringComparison.Ordinal));
        var use = new TableUse(Table.Table.Section);
        foreach (var angle in (double[])[7.5, 8.5, 10, 11.5, 12.5])
            use.Add(FellRotor.Element(0) with { AngleOfAttack = double.DegreesToRadians(angle), Reynolds = 2e6 }, 1);
        // Three of five lie within 2 degrees of the peak at 10.
        Assert.Equal(0.6, FirstToLookAt.ShareOf(jump, use), 1e-12);
    }

    private static string Rows(string reynolds, double largestLift, double leastDrag)
    {
        var rows = new StringBuilder();
        for (var angle = -10; angle <= 20; angle += 2)
        {
            var lift = angle switch { < 8 => 0.1 * (angle + 2), 8 => largestLift - 0.1, 10 => largestLift, _ => largestLift - (0.05 * (angle - 10)) };
            rows.Append(CultureInfo.InvariantCulture, $"{reynolds},{angle},{lift:0.##},{leastDrag + (0.0001 * angle * angle):0.####}\n");
        }
        return rows.ToString();
    }

    private static CheckedTable Of(string rows)
        => CheckedTable.Of(StoredPolars.FromBytes("fell.csv", Encoding.UTF8.GetBytes("reynolds,alpha_deg,cl,cd\n" + rows), out _)!, "fell.csv");
}
