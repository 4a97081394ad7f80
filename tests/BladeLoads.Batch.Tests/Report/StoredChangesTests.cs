using System.Text;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Report;

namespace BladeLoads.Batch.Tests.Report;

public sealed class StoredChangesTests
{
    private static readonly string Header = string.Join(',', ChangesTable.Columns);

    [Fact]
    public void What_moved_is_read_back_the_largest_first_and_rows_without_a_percentage_are_left_out()
    {
        var changes = Parse($"""
            {Header}
            a,a,compared,largest thrust,kN,100,8,101,8,1,1,,"blade.csv: 2 rows, ""two"" of them"
            a,a,compared,annual energy,MWh,1000,,900,,-100,-10,,
            b,,no earlier result,,,,,,,,,nothing to compare with,
            c,c,compared,largest thrust,kN,100,8,100.001,8,0.001,0.001,,

            """);

        Assert.Equal(
            [new ReportedChange("a", "annual energy", "MWh", 1000, 900, -10), new ReportedChange("a", "largest thrust", "kN", 100, 101, 1)], changes);
    }

    [Theory]
    [InlineData("")]
    [InlineData("case,old_case\na,b\n")]
    [InlineData("\"never closed")]
    public void A_table_that_is_not_one_of_changes_tells_nothing(string text) => Assert.Empty(Parse(text));

    private static ReportedChange[] Parse(string text) => [.. StoredChanges.Parse(Encoding.UTF8.GetBytes(text))];
}
