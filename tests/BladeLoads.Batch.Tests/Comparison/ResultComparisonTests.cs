using System.Text;
using System.Text.Json;
using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Tables;
using static BladeLoads.Batch.Tests.Building.StoredResults;

namespace BladeLoads.Batch.Tests.Comparison;

public sealed class ResultComparisonTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Figures_read_back_from_the_table_are_those_of_the_receipt()
    {
        var results = Runs.Results(_folder);
        Runs.Solve(results, [FellRotor.Case("clean", FellRotor.Rotor(windSpeeds: 9))]);
        var stored = StoredResult.Read(results.Case("clean"));
        var summary = stored.Receipt!.Summary;
        (double? Value, double? WindSpeed)[] written =
        [
            (summary.BestPowerCoefficient?.Value, summary.BestPowerCoefficient?.WindSpeed),
            (summary.RatedWindSpeed, null),
            .. new[]
            {
                summary.LargestElectricalPower, summary.LargestThrust, summary.LargestOutOfPlaneMoment, summary.LargestInPlaneMoment,
                summary.LargestFlapwiseMoment, summary.LargestEdgewiseMoment,
            }.Select(e => (e?.Value / 1000, e?.WindSpeed)),
        ];
        Assert.Equal(written, Figures.All.Select(f => (f.Of(stored)?.Value, f.Of(stored)?.WindSpeed)));
        Assert.Empty(stored.Doubts);
    }

    [Fact]
    public void Each_figure_has_its_difference_and_percent_of_the_older()
    {
        var compared = Compare([new(8, 200), new(10, 400)], [new(8, 200), new(10, 450)]);
        Assert.Equal(("largest electrical power", "kW", 50.0, 12.5), Told(compared, "largest electrical power"));
        Assert.Equal(("largest thrust", "kN", 5.0, 12.5), Told(compared, "largest thrust"));
        Assert.Equal(("largest root flapwise moment", "kNm", 25.0, 12.5), Told(compared, "largest root flapwise moment"));
        Assert.Equal(("best power coefficient", "", 0.0, 0.0), Told(compared, "best power coefficient"));
        Assert.Equal(12.5, compared.LargestPercent, 12);
    }

    [Fact]
    public void A_moment_that_grows_to_the_negative_side_has_grown()
    {
        var compared = Compare([new(8, 200, Edgewise: -100)], [new(8, 200, Edgewise: -110)]);
        Assert.Equal(("largest root edgewise moment", "kNm", 10.0, 10.0), Told(compared, "largest root edgewise moment"));
    }

    [Fact]
    public void A_moment_of_the_same_size_to_the_other_side_is_told()
    {
        var change = Compare([new(8, 200, Edgewise: -100)], [new(8, 200, Edgewise: 100)]).Figures.Single(f => f.HasTurned);
        Assert.Equal(("largest root edgewise moment", 0.0), (change.Name, change.Difference));
        Assert.True(change.IsMoreThan(50));
    }

    [Fact]
    public void The_largest_change_of_power_is_found_at_common_wind_speeds_and_the_others_are_told()
    {
        var compared = Compare(
            [new(4, 40), new(6, 100), new(8, 200), new(10, 400)],
            [new(6 + 1e-12, 90), new(8, 230), new(9, 900), new(10, 380)]);
        var power = compared.Curves[0];
        Assert.Equal(("electrical power where it changed most", 8.0, 200.0, 230.0, 30.0, 15.0), (
            power.Name, power.New!.WindSpeed!.Value, power.Old!.Value, power.New.Value, power.Difference!.Value, power.Percent!.Value));
        Assert.Equal((3, 4.0, 9.0), (
            compared.WindSpeeds.Common, Assert.Single(compared.WindSpeeds.OnlyOld), Assert.Single(compared.WindSpeeds.OnlyNew)));
    }

    [Fact]
    public void The_last_digits_of_a_root_finder_are_no_change()
        => Assert.False(Compare([new(8, 2000.0000000000002)], [new(8, 2000.0000000000007)]).HasChanged);

    [Fact]
    public void A_figure_that_came_or_went_is_a_change_without_a_percentage()
    {
        var compared = Compare([new(8, 200, Edgewise: null)], [new(8, 200)]);
        var change = compared.Changes.Single(f => f.IsMoreThan(99));
        Assert.Equal(("largest root edgewise moment", null, null), (change.Name, change.Difference, change.Percent));
        Assert.Null(Compare([new(8, 0)], [new(8, 5)]).Figures.Single(f => f.Name == "largest thrust").Percent);
    }

    [Fact]
    public void New_and_lost_marks_are_told_with_their_wind_speeds()
    {
        var compared = Compare(
            [new(6, 1, "outside-angles"), new(8, 1, "outside-angles several-balances"), new(9, 1)],
            [new(6, 1, "outside-angles"), new(8, 1), new(9, 1, "outside-angles pitch-jump")]);
        Assert.Equal(
            ["outside-angles 2->2 +9 -8", "pitch-jump ->1 +9 -", "several-balances 1-> + -8"],
            compared.Marks.Select(m => $"{m.Mark} {m.OldPoints}->{m.NewPoints} +{string.Join(' ', m.NewAt)} -{string.Join(' ', m.LostAt)}"));
    }

    [Fact]
    public void A_mark_of_the_curve_alone_is_told_too()
    {
        var old = Write(_folder, "old", new Point(8, 1));
        var now = WriteReceipt(WriteCurve(_folder, "new", new Point(8, 1)), "new", 10.5, new Dictionary<string, int> { ["pitch-jump"] = 0 });
        var mark = Assert.Single(Compare(old, now).Marks);
        Assert.Equal(("pitch-jump", null, 0), (mark.Mark, mark.OldPoints, mark.NewPoints));
    }

    [Fact]
    public void Without_a_receipt_the_tables_are_compared_and_the_rated_wind_speed_is_left_open()
    {
        var compared = Compare(WriteCurve(_folder, "old", new Point(8, 200)), Write(_folder, "new", new Point(8, 300)));
        Assert.Equal("old: the receipt is not there", Assert.Single(compared.Doubts));
        Assert.Null(compared.Figures.Single(f => f.Name == "rated wind speed").Old);
        Assert.Equal(50, compared.Figures.Single(f => f.Name == "largest electrical power").Percent);
    }

    [Fact]
    public void A_table_that_is_not_what_was_written_is_compared_in_doubt()
    {
        var old = Write(_folder, "old", new Point(8, 200));
        var now = Write(_folder, "new", new Point(8, 200));
        WriteCurve(_folder, "new", new Point(8, 300));
        Assert.Equal("new: power-curve.csv has other bytes than were written", Assert.Single(Compare(old, now).Doubts));
    }

    [Fact]
    public void A_table_cut_at_any_byte_is_told_and_never_compared_in_silence()
    {
        var old = Write(_folder, "old", new Point(8, 200, "pitch-jump"), new Point(9, 250));
        var now = Write(_folder, "new", new Point(8, 200, "pitch-jump"), new Point(9, 250));
        var path = Path.Join(now, CurveTable.FileName);
        var whole = File.ReadAllBytes(path);
        for (var length = 0; length < whole.Length; length++)
        {
            File.WriteAllBytes(path, whole[..length]);
            var comparison = ResultComparison.OfFolders(old, now, MadeFrom.Difference);
            if (comparison is CaseComparison.Compared compared)
                Assert.NotEmpty(compared.Doubts);
            else
                Assert.StartsWith("new: power-curve.csv is ", ((CaseComparison.NotCompared)comparison).Note, StringComparison.Ordinal);
        }
    }

    [Theory]
    [InlineData("wind_speed_m_s,thrust_kN\n8,1;2\n", "power-curve.csv is damaged: line 2 holds what is no number")]
    [InlineData("wind_speed_m_s,thrust_kN\n8\n", "power-curve.csv is damaged: line 2 has 1 values where the header names 2 columns")]
    [InlineData("wind_speed_m_s,thrust_kN\n,1\n", "power-curve.csv is damaged: line 2 has no wind speed")]
    [InlineData("wind_speed_m_s,thrust_kN\n8,NaN\n", "power-curve.csv is damaged: line 2 holds what is no number")]
    [InlineData("radius_m\n8\n", "power-curve.csv is no power curve: its columns are not those of one")]
    [InlineData("", "power-curve.csv is empty")]
    public void What_is_no_power_curve_is_told(string text, string message)
        => Assert.Equal(message, Assert.Throws<UnreadableCurveException>(() => StoredCurve.Parse(Encoding.UTF8.GetBytes(text))).Message);

    [Fact]
    public void What_two_results_were_made_from_is_told_in_the_words_of_the_plan()
    {
        var old = WriteReceipt(WriteCurve(_folder, "old", new Point(8, 1)), "clean", 10, new Dictionary<string, int>(), values: Values("1.225", "a"));
        var now = WriteReceipt(WriteCurve(_folder, "new", new Point(8, 1)), "clean", 10, new Dictionary<string, int>(), values: Values("1.05", "b"));
        Assert.Equal("air.density_kg_m3 1.225 -> 1.05; polar fell-30.csv: table changed", Compare(old, now).Why);

        static Dictionary<string, string> Values(string density, string digit) => new()
        {
            ["air.density_kg_m3"] = density,
            ["section.fell-30"] = string.Concat(Enumerable.Repeat(digit, 64)),
        };
    }

    [Theory]
    [InlineData("fell/kept/signed/clean")]
    [InlineData("fell/replaced/clean/20260101-000000~f")]
    public void Rows_of_a_table_are_told_where_both_are_kept(string old)
    {
        string[] tables = ["-,0,0.1,0.01\n-,5,0.6,0.01\n-,9,0.8,0.02\n", "-,0,0.1,0.01\n-,5,0.7,0.01\n-,9,0.8,0.02\n"];
        Directory.CreateDirectory(Runs.Results(_folder).Tables);
        foreach (var table in tables)
            File.WriteAllText(Path.Join(Runs.Results(_folder).Tables, FellRotor.Hash(table) + ".csv"), table);
        var compared = Compare(Result(old, tables[0]), Result("fell/clean", tables[1]));
        Assert.Equal("polar fell-30.csv: 1 row changed at 5 deg", compared.Why);

        string Result(string place, string table) => WriteReceipt(
            WriteCurve(_folder, place, new Point(8, 1)), "clean", 10, new Dictionary<string, int>(),
            values: new Dictionary<string, string> { ["section.fell-30"] = FellRotor.Hash(table) });
    }

    [Fact]
    public void The_table_of_changes_has_a_row_a_figure()
    {
        var compared = Compare([new(8, 200, "pitch-jump"), new(9, 100)], [new(8, 250), new(10, 100)]);
        var failed = new CaseComparison.NotCompared("b", null, NoComparison.Failed, "=1+1");
        Assert.Equal("""
            case,old_case,comparison,figure,unit,old,old_wind_speed_m_s,new,new_wind_speed_m_s,difference,difference_percent,note,why
            new,old,compared,best power coefficient,,0.4,8,0.4,8,0,0,,
            new,old,compared,rated wind speed,m/s,10.5,,10.5,,0,0,,
            new,old,compared,largest electrical power,kW,200,8,250,8,50,25,,
            new,old,compared,largest thrust,kN,20,8,25,8,5,25,,
            new,old,compared,largest root out-of-plane moment,kNm,100,8,125,8,25,25,,
            new,old,compared,largest root in-plane moment,kNm,7,8,7,8,0,0,,
            new,old,compared,largest root flapwise moment,kNm,100,8,125,8,25,25,,
            new,old,compared,largest root edgewise moment,kNm,1,8,1,8,0,0,,
            new,old,compared,electrical power where it changed most,kW,200,8,250,8,50,25,,
            new,old,compared,thrust where it changed most,kN,20,8,25,8,5,25,,
            new,old,compared,mark pitch-jump,points,1,,,,-1,,lost at 8 m/s,
            new,old,compared,wind speeds,points,2,,2,,0,,1 in both; only old 9 m/s; only new 10 m/s,
            b,,failed,,,,,,,,,"'=1+1",

            """, Encoding.UTF8.GetString(ChangesTable.Write([compared, failed])));
    }

    [Fact]
    public void Json_holds_the_same_numbers()
    {
        var compared = Compare([new(8, 200)], [new(8, 250, "pitch-jump"), new(9, 1)]);
        using var json = JsonDocument.Parse(ComparisonJson.Write("/old", "/new", [compared, new CaseComparison.NotCompared("b", null, NoComparison.OnlyNew, "")]));
        var cases = json.RootElement.GetProperty("cases");
        var power = cases[0].GetProperty("figures").EnumerateArray().Single(f => f.GetProperty("figure").GetString() == "largest electrical power");
        Assert.Equal((200, 250, 25), (
            power.GetProperty("old").GetDouble(), power.GetProperty("new").GetDouble(), power.GetProperty("difference_percent").GetDouble()));
        Assert.Equal(8, cases[0].GetProperty("marks")[0].GetProperty("new_at_m_s")[0].GetDouble());
        Assert.Equal(9, cases[0].GetProperty("wind_speeds").GetProperty("only_new_m_s")[0].GetDouble());
        Assert.Equal("only in the new results", cases[1].GetProperty("comparison").GetString());
    }

    [Fact]
    public void Sets_are_compared_case_by_case_and_a_single_result_with_the_case_of_its_name()
    {
        foreach (var (set, names) in new[] { ("one", new[] { "a", "b" }), ("two", ["b", "c"]) })
            foreach (var name in names)
                WriteReceipt(WriteCurve(_folder, $"{set}/{name}", new Point(8, 1)), name, 10, new Dictionary<string, int>());
        var (one, two) = (Set("one"), Set("two"));
        Assert.Equal(
            [("a", "only in the old results"), ("b", "compared"), ("c", "only in the new results")],
            ResultSet.Compare(one, two, MadeFrom.Difference).Select(c => (c.Case, c.Word)));
        Assert.Equal([("b", "compared")], ResultSet.Compare(one, Set("two/b"), MadeFrom.Difference).Select(c => (c.Case, c.Word)));
        Assert.Equal([("b", "compared")], ResultSet.Compare(Set("one/a"), Set("two/b"), MadeFrom.Difference).Select(c => (c.Case, c.Word)));
        Assert.Null(ResultSet.In(_folder.Path, "nothing"));

        ResultSet Set(string name) => ResultSet.In(Path.Join(_folder.Path, name), name)!;
    }

    private CaseComparison.Compared Compare(Point[] old, Point[] now) => Compare(Write(_folder, "old", old), Write(_folder, "new", now));

    private static CaseComparison.Compared Compare(string old, string now)
        => Assert.IsType<CaseComparison.Compared>(ResultComparison.OfFolders(old, now, MadeFrom.Difference));

    private static (string Name, string Unit, double Difference, double Percent) Told(CaseComparison.Compared compared, string name)
    {
        var change = compared.Figures.Single(f => f.Name == name);
        return (change.Name, change.Unit, Math.Round(change.Difference!.Value, 12), Math.Round(change.Percent!.Value, 12));
    }
}
