using System.Text;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Tables;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Batch.Tests.Results;

public class SummaryTableTests
{
    [Fact]
    public void The_figures_of_a_curve_stand_with_the_wind_speeds_where_they_were_found()
    {
        var summary = CaseSummary.Of(FellRotor.Curve(FellRotor.Rotor(windSpeeds: 3)));
        Assert.Equal(new Extreme(0.39, 1), summary.BestPowerCoefficient);
        Assert.Equal(31, summary.BestTipSpeedRatio);
        Assert.Equal(new Extreme(2700, 3), summary.LargestElectricalPower);
        Assert.Equal(new Extreme(6000, 3), summary.LargestThrust);
        Assert.Equal(2.5, summary.RatedWindSpeed);
        Assert.Equal(new Extreme(-100, 1), summary.LargestInPlaneMoment);
        Assert.Equal(new Extreme(5900, 1), summary.LargestFlapwiseMoment);
        Assert.Equal((3, 0), (summary.Points, summary.UnbalancedPoints));
    }

    [Fact]
    public void Power_held_at_rated_is_found_at_the_lowest_wind_speed_that_has_it()
    {
        var points = new[] { (11.0, 1.9e6), (12.0, 2e6), (13.0, 2e6 + 1e-5) }
            .Select(p => FellRotor.Point(p.Item1) with { ElectricalPower = p.Item2 });
        Assert.Equal(12, CaseSummary.Of(new PowerCurve([.. points], 11.5, null, [], PointMarks.None, 3)).LargestElectricalPower!.WindSpeed);
    }

    [Fact]
    public void The_largest_are_taken_over_design_points_too_and_not_over_a_rotor_at_rest()
    {
        var parked = FellRotor.Point(26, marks: PointMarks.AboveCutOut) with { Loads = FellRotor.Loads(26) with { Thrust = 9e6 } };
        var peak = FellRotor.Point(11.2) with { Loads = FellRotor.Loads(11.2) with { Thrust = 40e3 } };
        var curve = new PowerCurve(
            [FellRotor.Point(11), FellRotor.Point(12), parked], null, null, [new DesignPoint("largest thrust", peak)], PointMarks.None, 3);
        Assert.Equal(new Extreme(40e3, 11.2), CaseSummary.Of(curve).LargestThrust);
        Assert.Equal(12, CaseSummary.Of(curve).LargestElectricalPower!.WindSpeed);
    }

    [Fact]
    public void The_largest_thrust_of_a_flat_top_is_where_the_design_points_have_it()
    {
        // Held at a limit: a row before it has the same thrust but for its last digits.
        CurvePoint At(double windSpeed, double thrust)
            => FellRotor.Point(windSpeed) with { Loads = FellRotor.Loads(windSpeed) with { Thrust = thrust } };
        var top = At(9.4, 280e3);
        var curve = new PowerCurve(
            [At(9, 280e3 * (1 - 5e-10)), top, At(10, 280e3)], null, null, [new DesignPoint("largest thrust", top)], PointMarks.None, 3);
        Assert.Equal(new Extreme(280e3, 9.4), CaseSummary.Of(curve).LargestThrust);
    }

    [Fact]
    public void The_best_point_and_the_energy_stand_in_the_units_of_their_columns()
    {
        var summary = Summary(0.5, 1, 1) with
        {
            Best = new BestPoint(8.25, Math.PI / 90, 0.48, Searched: true),
            Energy = new EnergySummary(7.2e12, 0.25, null, null),
        };
        var rows = Lines("base", new SummaryRow("base", "", "", "current", summary with { Energy = new EnergySummary(7.2e12 / 1.1, 0.2, null, null) }),
            new SummaryRow("one", "", "", "current", summary));
        Assert.EndsWith(",8.25,2,yes,2000,0.25,,,10,25", rows[2], StringComparison.Ordinal);
    }

    [Fact]
    public void A_curve_without_a_balanced_point_has_no_figures()
    {
        var summary = CaseSummary.Of(FellRotor.Curve(FellRotor.Rotor(windSpeeds: 2), PointMarks.Unbalanced));
        Assert.Null(summary.BestPowerCoefficient);
        Assert.Null(summary.LargestThrust);
        Assert.Equal(2, summary.UnbalancedPoints);
        Assert.Equal("unbalanced:2", summary.MarksText);
    }

    [Fact]
    public void Marks_are_counted_and_a_mark_of_the_curve_alone_has_no_count()
    {
        var curve = FellRotor.Curve(FellRotor.Rotor(windSpeeds: 2), PointMarks.OutsideReynolds | PointMarks.SeveralBalances);
        Assert.Equal(
            "several-balances:2 outside-reynolds:2 pitch-jump",
            CaseSummary.Of(curve with { Marks = PointMarks.PitchJump }).MarksText);
    }

    [Fact]
    public void A_case_without_a_current_result_keeps_its_row_and_has_no_figures()
    {
        var lines = Lines(null, new SummaryRow("clean", "Clean", "abc", "out of date", null));
        Assert.Equal("clean,Clean,abc,,,,,,,,,,,,,,,,,,,,out of date,,,,,,,", lines[1]);
    }

    [Fact]
    public void Each_case_is_compared_with_the_baseline_in_percent()
    {
        var one = Summary(cp: 0.45, flapwise: -5500, rated: 11);
        var difference = BaselineDifference.Between(one, Summary(cp: 0.5, flapwise: 5000, rated: null));
        Assert.Equal(-10, difference.BestPowerCoefficient!.Value, 1e-12);
        Assert.Equal(10, difference.LargestFlapwiseMoment!.Value, 1e-12);
        Assert.Equal(0, difference.LargestThrust);
        Assert.Null(difference.RatedWindSpeed);
    }

    [Fact]
    public void A_study_with_a_baseline_has_columns_more()
    {
        var row = new SummaryRow("clean", "", "", "current", Summary(0.5, 1, 1));
        Assert.Equal(SummaryTable.Columns.Length + SummaryTable.FurtherColumns.Length, Lines(null, row)[0].Split(',').Length);
        var compared = Lines("clean", row);
        Assert.EndsWith(
            ",state,best_power_coefficient_difference_percent,largest_electrical_power_difference_percent,"
            + "largest_thrust_difference_percent,rated_wind_speed_difference_percent,largest_aero_root_flapwise_moment_difference_percent,"
            + "tip_speed_ratio,fine_pitch_deg,searched,annual_energy_MWh,capacity_factor,turbulent_annual_energy_MWh,turbulent_capacity_factor,"
            + "annual_energy_difference_percent,capacity_factor_difference_percent",
            compared[0], StringComparison.Ordinal);
        Assert.EndsWith(",current,0,0,0,0,0,,,,,,,,,", compared[1], StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("=1+1", "\"'=1+1\"")]
    [InlineData("-2", "\"'-2\"")]
    [InlineData("+2", "\"'+2\"")]
    [InlineData("@x", "\"'@x\"")]
    [InlineData("\tx", "\"'\tx\"")]
    [InlineData("\rx", "\"'\rx\"")]
    [InlineData("\nx", "\"'\nx\"")]
    [InlineData("a \"b\", c", "\"a \"\"b\"\", c\"")]
    [InlineData("<script>", "<script>")]
    public void A_title_stays_text_in_a_spreadsheet(string title, string cell)
    {
        var table = Encoding.UTF8.GetString(SummaryTable.Write([new SummaryRow("clean", title, "", "missing", null)], null));
        Assert.Contains($"\nclean,{cell},,", table, StringComparison.Ordinal);
    }

    private static CaseSummary Summary(double cp, double flapwise, double? rated) => CaseSummary.Of(FellRotor.Curve(FellRotor.Rotor())) with
    {
        BestPowerCoefficient = new Extreme(cp, 8),
        LargestFlapwiseMoment = new Extreme(flapwise, 8),
        RatedWindSpeed = rated,
    };

    private static string[] Lines(string? baseline, params SummaryRow[] rows)
        => Encoding.UTF8.GetString(SummaryTable.Write(rows, baseline)).TrimEnd('\n').Split('\n');
}
