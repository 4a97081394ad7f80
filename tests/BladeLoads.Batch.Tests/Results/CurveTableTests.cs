using System.Globalization;
using System.Text;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Tables;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Batch.Tests.Results;

public class CurveTableTests
{
    [Fact]
    public void The_columns_are_those_promised_in_their_order()
    {
        const string promised =
            "wind_speed_m_s,rotor_speed_rpm,pitch_deg,tip_speed_ratio,tip_speed_m_s,power_coefficient,thrust_coefficient,"
            + "torque_coefficient,rotor_power_kW,electrical_power_kW,thrust_kN,torque_kNm,aero_root_out_of_plane_moment_kNm,"
            + "aero_root_in_plane_moment_kNm,aero_root_flapwise_moment_kNm,aero_root_edgewise_moment_kNm,region,status,"
            + "rotor_power_per_pitch_kW_per_deg,thrust_per_pitch_kN_per_deg,stall_margin_deg,stall_margin_radius_m,tip_mach,mean_electrical_power_kW";
        Assert.Equal(promised, Lines(FellRotor.Curve(FellRotor.Rotor()))[0]);
    }

    [Fact]
    public void A_row_holds_the_point_in_the_units_of_its_columns()
    {
        // rotor speed pi rad/s is 30 rpm, pitch pi/180 is 1 degree, 2000 W is 2 kW: by definition of the units
        Assert.Equal(
            "2,30,1,15.5,31,0.38,0.8,0.05,2,1.8,4,0.3,7,-0.1,5.8,0.05,fixed speed,several-balances outside-reynolds,"
            + "-0.1,2,5,7.5,0.25,",
            Lines(OnePoint(2, PointMarks.OutsideReynolds | PointMarks.SeveralBalances))[1]);
    }

    [Fact]
    public void An_unbalanced_point_says_so_and_leaves_its_numbers_blank()
        => Assert.Equal("2,30,1,,,,,,,,,,,,,,fixed speed,unbalanced,,,,,,", Lines(OnePoint(2, PointMarks.Unbalanced))[1]);

    [Fact]
    public void Not_a_number_and_infinity_are_blank_and_zero_has_no_sign()
    {
        var point = FellRotor.Point(2);
        var loads = point.Loads! with { PowerCoefficient = double.NaN, ThrustCoefficient = double.PositiveInfinity, Torque = -0.0 };
        var row = Lines(new PowerCurve([point with { Loads = loads }], null, null, [], PointMarks.None, 1))[1].Split(',');
        Assert.Equal(["", "", "0"], [row[5], row[6], row[11]]);
    }

    [Theory]
    [InlineData(1.0 / 3)]
    [InlineData(6.02214076e-23)]
    [InlineData(123456789.123456789)]
    [InlineData(-4.94065645841e-324)]
    public void Every_number_reads_back_to_12_digits(double value)
    {
        var point = FellRotor.Point(2);
        var text = Lines(new PowerCurve([point with { Loads = point.Loads! with { ThrustCoefficient = value } }], null, null, [], PointMarks.None, 1))[1];
        Assert.Equal(value, double.Parse(text.Split(',')[6], CultureInfo.InvariantCulture), Math.Abs(value) * 5e-12);
    }

    [Fact]
    public void What_a_conversion_of_units_leaves_over_is_not_written()
    {
        // 22 rpm in rad/s and back is 21.999999999999996.
        var point = FellRotor.Point(2) with { Operation = new OperatingPoint(2, 22 * Math.Tau / 60, 0) };
        Assert.StartsWith("2,22,0,", Lines(new PowerCurve([point], null, null, [], PointMarks.None, 1))[1], StringComparison.Ordinal);
    }

    [Fact]
    public void The_mean_power_in_turbulence_stands_last_and_not_at_a_rotor_at_rest()
    {
        static string[] Rows(PointMarks marks)
            => Encoding.UTF8.GetString(CurveTable.Write(OnePoint(2, marks), windSpeed => 1500 * windSpeed)).Split('\n');
        Assert.EndsWith(",0.25,3", Rows(PointMarks.None)[1], StringComparison.Ordinal);
        Assert.EndsWith(",0.25,", Rows(PointMarks.AboveCutOut)[1], StringComparison.Ordinal);
    }

    [Fact]
    public void The_culture_of_the_machine_leaves_no_trace()
    {
        var expected = CurveTable.Write(OnePoint(2.5, PointMarks.None));
        var before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = new CultureInfo("de-DE");
            Assert.Equal(expected, CurveTable.Write(OnePoint(2.5, PointMarks.None)));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void All_marks_have_their_words_in_their_order()
    {
        const PointMarks all = (PointMarks)2047 & ~PointMarks.Unbalanced;
        Assert.EndsWith(
            ",several-balances outside-angles outside-reynolds exceeds-rated power-jump pitch-jump rated-not-reached below-cut-in above-cut-out "
                + "thrust-not-held,-0.1,2,5,7.5,0.25,",
            Lines(OnePoint(2, all))[1], StringComparison.Ordinal);
    }

    private static PowerCurve OnePoint(double windSpeed, PointMarks marks)
        => new([FellRotor.Point(windSpeed, marks: marks)], null, null, [], PointMarks.None, 1);

    private static string[] Lines(PowerCurve curve) => Encoding.UTF8.GetString(CurveTable.Write(curve)).Split('\n');
}
