using System.Text;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Report;

namespace BladeLoads.Batch.Tests.Report;

public sealed class StoredChangesTests
{
    private static readonly string Header = string.Join(',', ChangesTable.Columns);

    [Fact]
    public void What_moved_was_lost_or_could_not_be_compared_is_read_back_case_by_case()
    {
        var changes = Parse($"""
            {Header}
            a,a,compared,largest thrust,kN,100,8,101,9,1,1,,"blade.csv: 2 rows, ""two"" of them"
            a,a,compared,rated wind speed,m/s,11,,,,,,,"blade.csv: 2 rows, ""two"" of them"
            a,a,compared,mark rated-not-reached,points,0,,1,,1,,new at 15 m/s,"blade.csv: 2 rows, ""two"" of them"
            a,a,compared,annual energy,MWh,1000,,1000.001,,0.001,0.0001,,"blade.csv: 2 rows, ""two"" of them"
            b,,no earlier result,,,,,,,,,,
            c,c,compared,largest thrust,kN,100,8,100.001,8,0.001,0.001,,
            d,,failed,,,,,,,,,its folder is a file,

            """);

        Assert.Equal(["a", "d"], changes.Select(c => c.Case));
        Assert.Equal(("blade.csv: 2 rows, \"two\" of them", ""), (changes[0].Why, changes[0].Note));
        Assert.Equal<MovedFigure>(
            [
                new MovedFigure("largest thrust", "kN", 100, 8, 101, 9, 1, ""), new MovedFigure("rated wind speed", "m/s", 11, null, null, null, null, ""),
                new MovedFigure("mark rated-not-reached", "points", 0, null, 1, null, null, "new at 15 m/s"),
            ],
            changes[0].Figures);
        Assert.Equal(("failed: its folder is a file", 0), (changes[1].Note, changes[1].Figures.Length));
    }

    [Theory]
    [InlineData("")]
    [InlineData("case,old_case\na,b\n")]
    [InlineData("\"never closed")]
    public void A_table_that_is_not_one_of_changes_tells_nothing(string text) => Assert.Empty(Parse(text));

    private static MovedCase[] Parse(string text) => [.. StoredChanges.Parse(Encoding.UTF8.GetBytes(text))];
}
