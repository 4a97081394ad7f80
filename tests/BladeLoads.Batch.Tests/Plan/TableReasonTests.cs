using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Publishing;
using BladeLoads.Studies;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Batch.Tests.Plan;

public sealed class TableReasonTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    private ResultsFolder Results => Runs.Results(_folder);

    public void Dispose() => _folder.Dispose();

    [Theory]
    [InlineData("3000000,8,1,0.02", "3000000,8,1.1,0.02", "1 row changed at 8 deg at Reynolds number 3e6")]
    [InlineData("3000000,8,1,0.02", "3000000,8.5,1,0.02", "1 row added at 8.5 deg at Reynolds number 3e6, 1 row removed at 8 deg at Reynolds number 3e6")]
    [InlineData("15000000,16,1,0.02", "", "1 row removed at 16 deg at Reynolds number 1.5e7")]
    [InlineData("", "15000000,20,1,0.1", "1 row added at 20 deg at Reynolds number 1.5e7")]
    public void A_row_of_a_polar_is_told_by_its_angle_and_Reynolds_number(string row, string by, string told)
        => Assert.Equal($"out of date: polar tarn-24.csv: {told}", Said("section.tarn-24", "polars/clean/tarn-24.csv", Polar, Replace(Polar, row, by)));

    [Fact]
    public void Many_rows_are_told_by_their_range_and_all_their_Reynolds_numbers()
        => Assert.Equal(
            "out of date: polar tarn-24.csv: 4 rows changed between 8 and 16 deg at Reynolds numbers 3e6, 1.5e7",
            Said("section.tarn-24", "polars/clean/tarn-24.csv", Polar, Polar.Replace(",8,1,", ",8,1.1,", StringComparison.Ordinal)
                .Replace(",16,1,", ",16,0.9,", StringComparison.Ordinal)));

    [Fact]
    public void Whole_Reynolds_numbers_that_come_and_go_are_told_as_such()
        => Assert.Equal(
            "out of date: polar tarn-24.csv: Reynolds number 6e6 added (3 rows), Reynolds number 1.5e7 removed (3 rows)",
            Said("section.tarn-24", "polars/clean/tarn-24.csv", Polar, Polar.Replace("15000000,", "6000000,", StringComparison.Ordinal)));

    [Fact]
    public void A_table_without_Reynolds_numbers_is_told_without_them()
    {
        const string table = "-,0,0,0.01\n-,4,0.5,0.01\n-,8,1,0.02\n";
        Assert.Equal("out of date: polar a.csv: 1 row changed at 4 deg", Said("section.a", "polars/a.csv", table, Replace(table, "0.5", "0.6")));
        Assert.Equal(
            "out of date: polar a.csv: Reynolds number 3e6 added (3 rows), rows without Reynolds number removed (3 rows)",
            Said("section.a", "polars/a.csv", table, table.Replace("-,", "3000000,", StringComparison.Ordinal)));
    }

    [Fact]
    public void Many_Reynolds_numbers_are_told_by_their_range()
    {
        var one = string.Concat(Enumerable.Range(1, 12).Select(i => $"{i}000000,0,0.1,0.01\n"));
        Assert.Equal(
            "out of date: polar a.csv: 12 rows changed at 0 deg at 12 Reynolds numbers from 1e6 to 1.2e7",
            Said("section.a", "polars/a.csv", one, one.Replace(",0.1,", ",0.2,", StringComparison.Ordinal)));
    }

    [Fact]
    public void Rows_of_a_blade_are_told_by_radius_and_those_of_a_schedule_by_wind_speed()
    {
        const string blade = "1,0.8,12,root\n3,0.6,5,root\n5,0.4,1,tip\n";
        Assert.Equal(
            "out of date: blade fell.csv: 2 rows changed between 3 and 5 m",
            Said("blade", "blades/fell.csv", blade, blade.Replace("5,root", "5,tip", StringComparison.Ordinal).Replace("0.4", "0.5", StringComparison.Ordinal)));
        const string schedule = "4,40,0\n8,70,3\n";
        Assert.Equal(
            "out of date: schedule gentle.csv: 1 row added at 10 m/s",
            Said("control.schedule", "schedules/gentle.csv", schedule, schedule + "10,70,5\n"));
    }

    [Fact]
    public void Where_the_table_of_the_result_is_kept_no_more_it_is_only_told_that_it_changed()
    {
        Solve("section.a", "polars/a.csv", Polar);
        Directory.Delete(Results.Tables, recursive: true);
        Assert.Equal("out of date: polar a.csv: table changed", Said("section.a", "polars/a.csv", Replace(Polar, "3000000,8,1,", "3000000,8,2,")));
    }

    [Fact]
    public void A_kept_table_that_is_damaged_is_taken_for_none()
    {
        Solve("section.a", "polars/a.csv", Polar);
        var kept = Assert.Single(Directory.EnumerateFiles(Results.Tables));
        File.WriteAllText(kept, File.ReadAllText(kept).Replace("16", "61", StringComparison.Ordinal));
        Assert.Equal("out of date: polar a.csv: table changed", Said("section.a", "polars/a.csv", Replace(Polar, "3000000,8,1,", "3000000,8,2,")));
    }

    [Fact]
    public void Tables_are_kept_once_each_under_the_hash_of_their_bytes()
    {
        Solve("section.a", "polars/a.csv", Polar);
        Solve("section.a", "polars/a.csv", Polar);
        var kept = Assert.Single(Directory.EnumerateFiles(Results.Tables));
        Assert.Equal(FellRotor.Hash(Polar) + ".csv", Path.GetFileName(kept));
        Assert.Equal(Polar, File.ReadAllText(kept));
    }

    private const string Polar = """
        3000000,0,0,0.01
        3000000,8,1,0.02
        3000000,16,1,0.02
        15000000,0,0,0.01
        15000000,8,1,0.02
        15000000,16,1,0.02

        """;

    private static string Replace(string text, string row, string by)
        => row.Length == 0 ? text + by + "\n" : text.Replace(row + (by.Length == 0 ? "\n" : ""), by, StringComparison.Ordinal);

    private string Said(string key, string file, string was, string now)
    {
        Solve(key, file, was);
        return Said(key, file, now);
    }

    private string Said(string key, string file, string now)
    {
        var state = StudyPlan.Make(FellRotor.Study(Case(key, file, now)), Results, 1).Cases.Single().State;
        return $"{state.Word}: {state.Reason}";
    }

    private void Solve(string key, string file, string text) => Assert.Equal(1, Runs.Solve(Results, [Case(key, file, text)]).Solved);

    private static StudyCase Case(string key, string file, string text)
        => FellRotor.Case("clean", values: (key, FellRotor.Hash(text))) with
        {
            Tables = [new CanonicalTable(key, FellRotor.Hash(text), file, () => text.Split('\n', StringSplitOptions.RemoveEmptyEntries))],
        };
}
