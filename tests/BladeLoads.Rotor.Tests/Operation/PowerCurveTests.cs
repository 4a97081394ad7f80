using BladeLoads.Rotor.Operation;

namespace BladeLoads.Rotor.Tests.Operation;

public sealed class PowerCurveTests
{
    private static readonly double[] Winds = [.. Enumerable.Range(3, 23).Select(v => (double)v)];

    [Fact]
    public void From_the_rated_wind_speed_up_the_pitch_holds_rated_power()
    {
        var curve = CaseSolver.Solve(
            InventedRotor.Case(
                InventedRotor.VariableSpeed(ratedPower: 1.5e6, maxRotorSpeed: 1.9, finePitchDeg: 2), Winds, efficiency: 0.94), default);
        Assert.NotNull(curve.RatedWindSpeed);
        Assert.Equal(PointMarks.None, curve.Marks);
        foreach (var point in curve.Points)
        {
            if (point.Operation.WindSpeed < curve.RatedWindSpeed)
            {
                Assert.Equal(double.DegreesToRadians(2), point.Operation.Pitch);
                Assert.True(point.ElectricalPower < 1.5e6);
            }
            else
            {
                Assert.Equal(Region.RatedPower, point.Region);
                Assert.Equal(1.5e6, point.ElectricalPower, 1.5e6 * 1e-9);
                Assert.Equal(1.5e6, point.Loads!.Power * 0.94, 1.5e6 * 1e-9);
            }
        }
        var pitches = curve.Points.Where(p => p.Region == Region.RatedPower).Select(p => p.Operation.Pitch).ToArray();
        Assert.Equal(pitches.Order(), pitches);
    }

    [Fact]
    public void At_the_rated_wind_speed_the_rotor_at_fine_pitch_makes_rated_power()
    {
        var control = InventedRotor.VariableSpeed(ratedPower: 1.5e6, maxRotorSpeed: 1.9);
        var rated = CaseSolver.Solve(InventedRotor.Case(control, Winds), default).RatedWindSpeed!.Value;
        var there = InventedRotor.Solve(InventedRotor.Case(control with { RatedPower = null }, [rated]))[0];
        Assert.Equal(1.5e6, there.ElectricalPower, 1.5e6 * 1e-9);
        var below = InventedRotor.Solve(InventedRotor.Case(control with { RatedPower = null }, [rated - 1e-3]))[0];
        Assert.True(below.ElectricalPower < 1.5e6);
    }

    [Fact]
    public void A_rotor_that_stalls_below_rated_at_fine_pitch_still_follows_the_feather_branch()
    {
        // Slow for its blades: at fine pitch power peaks above rated, and falls below it again in stall.
        var control = InventedRotor.VariableSpeed(ratedPower: 0.6e6, maxRotorSpeed: 1.1);
        var unheld = InventedRotor.Solve(InventedRotor.Case(control with { RatedPower = null }, Winds, dropWidthDeg: 6));
        var held = CaseSolver.Solve(InventedRotor.Case(control, Winds, dropWidthDeg: 6), default);
        Assert.Contains(unheld, p => p.Operation.WindSpeed > held.RatedWindSpeed && p.ElectricalPower < 0.45e6);
        foreach (var point in held.Points.Where(p => p.Operation.WindSpeed >= held.RatedWindSpeed))
        {
            Assert.Equal(0.6e6, point.ElectricalPower, 0.6e6 * 1e-6);
            Assert.Equal(Region.RatedPower, point.Region);
        }
    }

    [Fact]
    public void Where_power_rises_with_pitch_at_rated_the_jump_of_pitch_is_marked()
    {
        // Fine pitch far below the best: at the speed limit more pitch means more power.
        var control = InventedRotor.VariableSpeed(ratedPower: 0.8e6, maxRotorSpeed: 1.25, finePitchDeg: -3);
        var curve = CaseSolver.Solve(InventedRotor.Case(control, Winds), default);
        Assert.Equal(PointMarks.PitchJump, curve.Marks);
        var first = curve.Points.First(p => p.Region == Region.RatedPower);
        Assert.True((first.Marks & PointMarks.PitchJump) != 0);
        Assert.True(first.Operation.Pitch > control.FinePitch + 0.01);
        Assert.Single(curve.Points, p => (p.Marks & PointMarks.PitchJump) != 0);
    }

    [Theory]
    [InlineData(0.3)]
    [InlineData(0.05)]
    public void In_sharp_stall_no_pitch_above_the_branch_makes_rated_power(double dropWidthDeg)
    {
        var control = InventedRotor.VariableSpeed(ratedPower: 0.7e6, maxRotorSpeed: 1.2, finePitchDeg: 1);
        double[] winds = [9, 11, 13.3, 16, 19, 22];
        var curve = CaseSolver.Solve(InventedRotor.Case(control, winds, dropWidthDeg: dropWidthDeg), default);
        var model = new RotorModel(InventedRotor.Case(control, winds, dropWidthDeg: dropWidthDeg));
        foreach (var point in curve.Points.Where(p => p.Region == Region.RatedPower))
            for (var deg = double.RadiansToDegrees(point.Operation.Pitch) + 0.01; deg < 60; deg += deg < 45 ? 0.02 : 0.5)
                Assert.True(
                    model.Solve(point.Operation with { Pitch = double.DegreesToRadians(deg) })!.Power < 0.7e6,
                    $"{point.Operation.WindSpeed} m/s: rated at {deg} degrees too");
        Assert.Contains(curve.Points, p => (p.Marks & PointMarks.SeveralBalances) != 0 && p.Region == Region.RatedPower);
    }

    [Fact]
    public void A_row_above_rated_at_fine_pitch_counts_as_rated_however_short_the_stretch()
    {
        // In sharp stall power at fine pitch may pass rated for some hundredths of a metre a second only.
        var free = InventedRotor.VariableSpeed(maxRotorSpeed: 1.1);
        double[] winds = [.. Enumerable.Range(0, 401).Select(i => 7 + (0.01 * i))];
        var powers = InventedRotor.Solve(InventedRotor.Case(free, winds, dropWidthDeg: 0.3)).Select(p => p.ElectricalPower).ToArray();
        var top = Array.IndexOf(powers, powers.Max());
        var rated = powers[top] * (1 - 1e-9);
        var curve = CaseSolver.Solve(InventedRotor.Case(free with { RatedPower = rated }, winds, dropWidthDeg: 0.3), default);
        Assert.NotNull(curve.RatedWindSpeed);
        Assert.True(curve.RatedWindSpeed <= winds[top]);
        Assert.DoesNotContain(curve.Points, p => (p.Marks & PointMarks.ExceedsRated) != 0);
    }

    [Fact]
    public void A_rotor_that_never_makes_rated_power_is_reported()
    {
        var curve = CaseSolver.Solve(InventedRotor.Case(InventedRotor.VariableSpeed(ratedPower: 5e7, maxRotorSpeed: 1.5), Winds), default);
        Assert.Null(curve.RatedWindSpeed);
        Assert.Equal(PointMarks.RatedNotReached, curve.Marks);
        Assert.DoesNotContain(curve.Points, p => p.Region == Region.RatedPower);
    }

    [Fact]
    public void Without_pitch_control_what_exceeds_rated_power_is_marked()
    {
        var control = InventedRotor.VariableSpeed(ratedPower: 1.5e6, maxRotorSpeed: 1.9, aboveRated: AboveRated.None);
        var curve = CaseSolver.Solve(InventedRotor.Case(control, Winds), default);
        foreach (var point in curve.Points)
        {
            Assert.Equal(0, point.Operation.Pitch);
            Assert.Equal(point.ElectricalPower > 1.5e6, (point.Marks & PointMarks.ExceedsRated) != 0);
        }
        Assert.Contains(curve.Points, p => (p.Marks & PointMarks.ExceedsRated) != 0);
    }

    [Fact]
    public void Rotor_speed_follows_the_wind_between_its_limits()
    {
        var control = InventedRotor.VariableSpeed(minRotorSpeed: 1, maxRotorSpeed: 1.9);
        var cone = double.DegreesToRadians(3);
        foreach (var point in InventedRotor.Solve(InventedRotor.Case(control, Winds, cone: cone)))
        {
            var wanted = 7 * point.Operation.WindSpeed / (40 * Math.Cos(cone));
            Assert.Equal(Math.Clamp(wanted, 1, 1.9), point.Operation.RotorSpeed, 1e-12);
            Assert.Equal(wanted < 1 ? Region.MinimumSpeed : wanted > 1.9 ? Region.MaximumSpeed : Region.BestTipSpeedRatio, point.Region);
        }
    }

    [Fact]
    public void A_rotor_that_takes_power_makes_none_and_idles()
    {
        var point = InventedRotor.Solve(InventedRotor.Case(new Control.FixedSpeed(3, 0, null), [3]))[0];
        Assert.True(point.Loads!.Power < 0);
        Assert.Equal(0, point.ElectricalPower);
        Assert.Equal(Region.Idle, point.Region);
    }

    [Fact]
    public void Outside_the_wind_speeds_of_operation_the_rotor_is_at_rest()
    {
        var curve = InventedRotor.Solve(InventedRotor.Case(InventedRotor.VariableSpeed(), [3, 4, 20, 21], cutIn: 4, cutOut: 20));
        Assert.Equal([PointMarks.BelowCutIn, PointMarks.None, PointMarks.None, PointMarks.AboveCutOut], curve.Select(p => p.Marks));
        foreach (var point in new[] { curve[0], curve[3] })
        {
            Assert.Equal((0, 0, Region.Idle), (point.Operation.RotorSpeed, point.ElectricalPower, point.Region));
            Assert.True(point.Loads!.Thrust > 0);
            Assert.All(point.Elements, e => Assert.Equal((0, 0), (e.AxialInduction, e.TangentialInduction)));
        }
    }

    [Fact]
    public void A_schedule_is_followed_linearly_between_its_rows()
    {
        var schedule = new Control.Schedule([new(4, 1, 0), new(10, 2, 0.06), new(12, 2, 0.1)], null);
        var points = InventedRotor.Solve(InventedRotor.Case(schedule, [4, 7, 11, 12]));
        Assert.Equal([1, 1.5, 2, 2], points.Select(p => p.Operation.RotorSpeed));
        Assert.Equal([0, 0.03, 0.08, 0.1], points.Select(p => Math.Round(p.Operation.Pitch, 12)));
        Assert.All(points, p => Assert.Equal(Region.Schedule, p.Region));
    }

    [Fact]
    public void Torque_times_rotor_speed_is_power_and_coefficients_hang_together()
    {
        foreach (var point in InventedRotor.Solve(InventedRotor.Case(InventedRotor.VariableSpeed(), Winds, cone: 0.05)))
        {
            var loads = point.Loads!;
            Assert.Equal(loads.Torque * point.Operation.RotorSpeed, loads.Power, 1e-9 * loads.Power);
            Assert.Equal(loads.TorqueCoefficient * loads.TipSpeedRatio, loads.PowerCoefficient, 1e-12);
            var turned = (loads.RootFlapwiseMoment * loads.RootFlapwiseMoment) + (loads.RootEdgewiseMoment * loads.RootEdgewiseMoment);
            var plain = (loads.RootOutOfPlaneMoment * loads.RootOutOfPlaneMoment) + (loads.RootInPlaneMoment * loads.RootInPlaneMoment);
            Assert.Equal(plain, turned, 1e-9 * plain);
        }
    }

    [Fact]
    public void A_wind_speed_alone_gives_the_same_digits_as_within_a_curve()
    {
        var control = InventedRotor.VariableSpeed(ratedPower: 1.5e6, maxRotorSpeed: 1.9);
        var curve = CaseSolver.Solve(InventedRotor.Case(control, Winds), default);
        foreach (var v in new[] { 5.0, 9, 14, 25 })
        {
            // The last wind speed stays, because it bounds the search for the rated wind speed.
            var alone = CaseSolver.Solve(InventedRotor.Case(control, v == 25 ? [v] : [v, 25]), default).Points[0];
            var within = curve.Points.Single(p => p.Operation.WindSpeed == v);
            Assert.Equal(within.Loads, alone.Loads);
            Assert.True(within.Elements.SequenceEqual(alone.Elements));
        }
    }

    [Fact]
    public void A_cancelled_case_stops_between_two_points()
    {
        using var cancellation = new CancellationTokenSource();
        cancellation.Cancel();
        Assert.Throws<OperationCanceledException>(
            () => CaseSolver.Solve(InventedRotor.Case(InventedRotor.VariableSpeed(), Winds), cancellation.Token));
    }
}
