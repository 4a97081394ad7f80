using System.Text;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Tables;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Batch.Tests.Results;

public class SpanwiseTableTests
{
    [Fact]
    public void The_columns_are_those_promised_in_their_order()
    {
        const string promised =
            "wind_speed_m_s,radius_m,chord_m,twist_deg,section,inflow_angle_deg,angle_of_attack_deg,reynolds,axial_induction,"
            + "tangential_induction,loss_factor,lift_coefficient,drag_coefficient,normal_force_N_per_m,tangential_force_N_per_m,status,element_length_m";
        Assert.Equal(promised, Lines(FellRotor.Curve(FellRotor.Rotor()))[0]);
    }

    [Fact]
    public void There_is_a_row_an_element_of_every_point()
        => Assert.Equal(1 + 3 * 2, Lines(FellRotor.Curve(FellRotor.Rotor(elements: 2, windSpeeds: 3))).Length);

    [Fact]
    public void Only_the_wind_speeds_asked_for_are_written_whatever_their_last_digit()
    {
        var lines = Lines(FellRotor.Curve(FellRotor.Rotor(windSpeeds: 3)), 2.0000000000000004, 3);
        Assert.Equal(["2", "2", "3", "3"], lines.Skip(1).Select(l => l.Split(',')[0]));
    }

    [Fact]
    public void A_case_that_asks_for_none_has_no_table()
        => Assert.Null(SpanwiseTable.Write(FellRotor.Curve(FellRotor.Rotor()), []));

    [Fact]
    public void An_unbalanced_element_keeps_its_geometry_and_leaves_its_numbers_blank()
    {
        var element = FellRotor.Element(0) with
        {
            Twist = 0,
            InflowAngle = double.NaN,
            AngleOfAttack = double.NaN,
            AxialInduction = double.NaN,
            TangentialInduction = double.NaN,
            LossFactor = double.NaN,
            LiftCoefficient = double.NaN,
            DragCoefficient = double.NaN,
            NormalForcePerLength = double.NaN,
            TangentialForcePerLength = double.NaN,
            Marks = ElementMarks.Unbalanced | ElementMarks.OutsideReynolds,
        };
        var point = FellRotor.Point(2) with { Elements = [element] };
        Assert.Equal(
            "2,2.5,0.75,0,fell-30,,,1500000,,,,,,,,unbalanced outside-reynolds,1",
            Lines(new PowerCurve([point], null, null, [], PointMarks.None, 1))[1]);
    }

    private static string[] Lines(PowerCurve curve, params double[] windSpeeds)
        => Encoding.UTF8.GetString(SpanwiseTable.Write(curve, windSpeeds.Length == 0 ? null : [.. windSpeeds])!).TrimEnd('\n').Split('\n');
}
