using BladeLoads.Rotor.Operation;

namespace BladeLoads.Rotor.Tests.Operation;

/// <summary>What a curve says of a rotor that never makes its rated power, and what it must not say of one that does.</summary>
public sealed class RatedNotReachedTests
{
    private static readonly double[] Winds = [.. Enumerable.Range(6, 40).Select(i => 0.5 * i)];

    [Theory]
    [InlineData(AboveRated.PitchToFeather, null)]
    [InlineData(AboveRated.PitchToStall, null)]
    [InlineData(AboveRated.None, null)]
    [InlineData(AboveRated.PitchToFeather, 160e3)]
    public void A_rotor_that_never_makes_rated_power_is_marked_at_the_row_with_the_most_electrical_power(AboveRated aboveRated, double? limit)
    {
        var control = InventedRotor.VariableSpeed(5e7, 2, maxRotorSpeed: 1.5, aboveRated: aboveRated, thrustLimit: limit);
        var curve = CaseSolver.Solve(InventedRotor.Case(control, Winds, cutIn: 4, cutOut: 20), default);
        Assert.Null(curve.RatedWindSpeed);
        Assert.Equal(PointMarks.RatedNotReached, curve.Marks);
        var marked = Assert.Single(curve.Points, p => (p.Marks & PointMarks.RatedNotReached) != 0);
        Assert.Equal(curve.Points.Max(p => p.ElectricalPower), marked.ElectricalPower);
        Assert.All(curve.Points, p => Assert.NotEqual(Region.RatedPower, p.Region));
        Assert.All(
            curve.DesignPoints.Where(d => d.Point.Operation == marked.Operation), d => Assert.Equal(marked.Marks, d.Point.Marks));
    }

    [Fact]
    public void A_thrust_limit_that_keeps_the_rotor_from_rated_power_marks_it_too()
    {
        var curve = Limited(30e3, Winds);
        Assert.Null(curve.RatedWindSpeed);
        Assert.Equal(PointMarks.RatedNotReached, curve.Marks);
        var marked = Assert.Single(curve.Points, p => (p.Marks & PointMarks.RatedNotReached) != 0);
        Assert.Equal(curve.Points.Max(p => p.ElectricalPower), marked.ElectricalPower);
        Assert.Equal(Region.ThrustLimit, marked.Region);
    }

    [Fact]
    public void Where_no_row_makes_power_none_is_marked()
    {
        var control = InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9);
        var curve = CaseSolver.Solve(InventedRotor.Case(control, [3, 4], cutIn: 5, cutOut: 5.5), default);
        Assert.Equal(PointMarks.RatedNotReached, curve.Marks);
        Assert.All(curve.Points, p => Assert.Equal(PointMarks.BelowCutIn, p.Marks));
    }

    [Fact]
    public void Under_a_thrust_limit_the_rated_wind_speed_is_where_rated_power_is_held()
    {
        var curve = Limited(160e3, Winds);
        Assert.True(curve.RatedWindSpeed > CaseSolver.Solve(InventedRotor.Case(Control(null), Winds), default).RatedWindSpeed);
        var there = Limited(160e3, [curve.RatedWindSpeed!.Value, 22.5]).Points[0];
        Assert.Equal(1.5e6, there.ElectricalPower, 1.5e6 * 1e-6);
        var below = Limited(160e3, [curve.RatedWindSpeed.Value - 1e-6, 22.5]).Points[0];
        Assert.Equal(Region.ThrustLimit, below.Region);
    }

    [Theory]
    [InlineData(4, 6)]
    [InlineData(18, 20)]
    public void Wind_speeds_that_stop_short_of_rated_power_do_not_pass_for_a_rotor_that_never_makes_it(double first, double second)
    {
        var whole = Limited(160e3, Winds);
        var some = CaseSolver.Solve(InventedRotor.Case(Control(160e3), [first, second], cutOut: 22.5), default);
        Assert.Equal(whole.RatedWindSpeed!.Value, some.RatedWindSpeed!.Value, 1e-8);
        Assert.Equal(PointMarks.None, some.Marks);
        Assert.All(some.Points, p => Assert.Equal(PointMarks.None, p.Marks));
    }

    [Fact]
    public void A_cut_out_below_the_rated_wind_speed_leaves_rated_power_out_of_reach()
    {
        var some = CaseSolver.Solve(InventedRotor.Case(Control(160e3), [4, 6], cutOut: 8), default);
        Assert.Null(some.RatedWindSpeed);
        Assert.Equal([PointMarks.None, PointMarks.RatedNotReached], some.Points.Select(p => p.Marks));
    }

    private static Control.VariableSpeed Control(double? limit) => InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9, thrustLimit: limit);

    private static PowerCurve Limited(double limit, double[] winds) => CaseSolver.Solve(InventedRotor.Case(Control(limit), winds), default);
}
