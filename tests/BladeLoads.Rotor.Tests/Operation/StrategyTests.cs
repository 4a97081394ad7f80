using BladeLoads.Rotor.Operation;

namespace BladeLoads.Rotor.Tests.Operation;

/// <summary>Thrust limit, pitch to stall, pitch followed where the rotor speed is limited, and the points worth a name.</summary>
public sealed class StrategyTests
{
    private static readonly double[] Winds = [.. Enumerable.Range(6, 40).Select(i => 0.5 * i)];

    private static PowerCurve Solve(Control control, double dropWidthDeg = 20, double cutIn = 0)
        => CaseSolver.Solve(InventedRotor.Case(control, Winds, dropWidthDeg: dropWidthDeg, cutIn: cutIn), default);

    [Theory]
    [InlineData(20)]
    [InlineData(2)]
    public void Thrust_never_exceeds_its_limit_and_pitch_is_the_smallest_that_holds_it(double dropWidthDeg)
    {
        const double Limit = 160e3;
        var curve = Solve(InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9, thrustLimit: Limit), dropWidthDeg);
        Assert.Contains(curve.Points, p => p.Region == Region.ThrustLimit);
        var model = new RotorModel(InventedRotor.Case(InventedRotor.VariableSpeed(), Winds, dropWidthDeg: dropWidthDeg));
        foreach (var point in curve.Points)
        {
            Assert.True(point.Loads!.Thrust <= Limit * (1 + 1e-6));
            if (point.Region != Region.ThrustLimit)
                continue;
            Assert.Equal(Limit, point.Loads.Thrust, Limit * 1e-6);
            for (var deg = double.RadiansToDegrees(point.Operation.Pitch); deg < 90; deg += 0.5)
                Assert.True(model.Solve(point.Operation with { Pitch = double.DegreesToRadians(deg) })!.Thrust <= Limit * (1 + 1e-6));
        }
    }

    [Fact]
    public void With_rated_power_and_a_thrust_limit_the_larger_pitch_wins()
    {
        var limited = Solve(InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9, thrustLimit: 160e3));
        var free = Solve(InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9));
        foreach (var (l, f) in limited.Points.Zip(free.Points))
        {
            Assert.True(l.Operation.Pitch >= f.Operation.Pitch - 1e-9);
            Assert.True(l.ElectricalPower <= f.ElectricalPower * (1 + 1e-9));
        }
        Assert.Contains(limited.Points, p => p.Region == Region.RatedPower);
    }

    [Fact]
    public void A_thrust_limit_that_feathering_cannot_hold_is_marked_at_the_pitch_with_the_least_thrust()
    {
        var control = InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9, thrustLimit: -1e6);
        var model = new RotorModel(InventedRotor.Case(control, Winds));
        foreach (var point in Solve(control).Points)
        {
            Assert.True((point.Marks & PointMarks.ThrustNotHeld) != 0);
            for (var deg = 2; deg <= 90; deg += 4)
                Assert.True(
                    model.Solve(point.Operation with { Pitch = double.DegreesToRadians(deg) })!.Thrust
                    >= point.Loads!.Thrust - (1e-3 * Math.Abs(point.Loads.Thrust)));
        }
    }

    [Fact]
    public void On_the_side_of_stall_a_thrust_limit_that_the_stalled_blades_hold_changes_nothing()
    {
        var control = InventedRotor.VariableSpeed(0.9e6, 2, maxRotorSpeed: 1.4, aboveRated: AboveRated.PitchToStall);
        var free = Solve(control, dropWidthDeg: 12);
        var limit = free.Points.Max(p => p.Loads!.Thrust) * 1.001;
        var limited = Solve(control with { ThrustLimit = limit }, dropWidthDeg: 12);
        Assert.Equal(free.Points.Select(p => p.Loads), limited.Points.Select(p => p.Loads));
    }

    [Fact]
    public void Under_a_thrust_limit_the_rated_wind_speed_is_where_rated_power_is_held()
    {
        var curve = Solve(InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9, thrustLimit: 160e3));
        var free = Solve(InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9));
        Assert.True(curve.RatedWindSpeed > free.RatedWindSpeed);
        var there = CaseSolver.Solve(
            InventedRotor.Case(
                InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9, thrustLimit: 160e3), [curve.RatedWindSpeed!.Value, 22.5]), default).Points[0];
        Assert.Equal(1.5e6, there.ElectricalPower, 1.5e6 * 1e-6);
        var never = Solve(InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9, thrustLimit: 30e3));
        Assert.Null(never.RatedWindSpeed);
        Assert.Equal(PointMarks.RatedNotReached, never.Marks);
    }

    [Fact]
    public void Pitch_to_stall_holds_rated_power_on_the_side_of_stall()
    {
        var curve = Solve(InventedRotor.VariableSpeed(0.9e6, 2, maxRotorSpeed: 1.4, aboveRated: AboveRated.PitchToStall), dropWidthDeg: 12);
        var rated = curve.Points.Where(p => p.Region == Region.RatedPower).ToArray();
        Assert.NotEmpty(rated);
        foreach (var point in rated)
        {
            Assert.True(point.Operation.Pitch <= double.DegreesToRadians(2) + 1e-9);
            if ((point.Marks & PointMarks.PowerJump) == 0)
                Assert.Equal(0.9e6, point.ElectricalPower, 0.9e6 * 1e-6);
            else
                Assert.True(point.ElectricalPower >= 0.9e6);
        }
    }

    /// <summary>
    /// From the pitch below rated down in steps of 0.02 degrees, the first plain solution on the other side of rated power lies just beyond the
    /// pitch taken.
    /// </summary>
    [Theory]
    [InlineData(2, SpeedLimitedPitch.Hold)]
    [InlineData(6, SpeedLimitedPitch.Hold)]
    [InlineData(2, SpeedLimitedPitch.Best)]
    public void Pitch_to_stall_takes_the_pitch_nearest_the_one_below_rated(double finePitchDeg, SpeedLimitedPitch speedLimitedPitch)
    {
        const double Degree = Math.PI / 180, StepDeg = 0.02, Rated = 0.9e6;
        var control = InventedRotor.VariableSpeed(
            Rated, finePitchDeg, maxRotorSpeed: 1.4, aboveRated: AboveRated.PitchToStall, speedLimitedPitch: speedLimitedPitch);
        var unlimited = Solve(control with { RatedPower = null }, dropWidthDeg: 12).Points;
        var model = new RotorModel(InventedRotor.Case(control, Winds, dropWidthDeg: 12));
        var held = Solve(control, dropWidthDeg: 12).Points.Where(p => p.Region == Region.RatedPower).ToArray();
        Assert.True(held.Length > 5, $"{held.Length} rows");
        foreach (var point in held)
        {
            var start = unlimited.Single(p => p.Operation.WindSpeed == point.Operation.WindSpeed).Operation;
            bool IsAbove(int steps) => model.Solve(start with { Pitch = start.Pitch - (StepDeg * Degree * steps) })!.Power >= Rated;
            var crossed = Enumerable.Range(1, 2000).First(steps => IsAbove(steps) != IsAbove(0));
            var beyondDeg = (start.Pitch / Degree) - (StepDeg * crossed);
            Assert.InRange(point.Operation.Pitch / Degree, beyondDeg - 1e-9, beyondDeg + StepDeg + 1e-9);
        }
    }

    [Fact]
    public void Pitch_followed_where_the_rotor_speed_is_limited_never_makes_less_power_and_removes_the_jump()
    {
        var held = Solve(InventedRotor.VariableSpeed(0.8e6, -3, minRotorSpeed: 0.9, maxRotorSpeed: 1.25));
        var followed = Solve(
            InventedRotor.VariableSpeed(0.8e6, -3, minRotorSpeed: 0.9, maxRotorSpeed: 1.25, speedLimitedPitch: SpeedLimitedPitch.Best));
        Assert.Equal(PointMarks.PitchJump, held.Marks);
        Assert.Equal(PointMarks.None, followed.Marks);
        Assert.True(followed.RatedWindSpeed < held.RatedWindSpeed);
        foreach (var (h, f) in held.Points.Zip(followed.Points))
            Assert.True(f.ElectricalPower >= h.ElectricalPower - 1e-3);
    }

    [Fact]
    public void Regions_begin_where_the_design_points_say()
    {
        var control = InventedRotor.VariableSpeed(1.1e6, 2, minRotorSpeed: 0.9, maxRotorSpeed: 1.3, thrustLimit: 150e3);
        var curve = Solve(control);
        var names = curve.DesignPoints.Select(p => p.Name).ToArray();
        Assert.Contains("rated power begins", names);
        Assert.Contains("largest thrust", names);
        var radius = 40.0;
        Assert.Equal(0.9 * radius / 7, Single("best tip-speed ratio begins").Operation.WindSpeed, 1e-8);
        Assert.Equal(1.3 * radius / 7, Single("maximum speed begins").Operation.WindSpeed, 1e-8);
        foreach (var point in curve.DesignPoints.Where(p => p.Name.EndsWith(" begins", StringComparison.Ordinal)))
        {
            var at = point.Point.Operation.WindSpeed;
            var sides = CaseSolver.Solve(InventedRotor.Case(control, [at - 1e-6, at + 1e-6, 22.5]), default).Points;
            Assert.NotEqual(sides[0].Region, sides[1].Region);
            Assert.Equal(point.Name, $"{RegionWords.Of(sides[1].Region)} begins");
        }
        CurvePoint Single(string name) => curve.DesignPoints.Single(p => p.Name == name).Point;
    }

    [Fact]
    public void The_largest_thrust_is_found_between_the_wind_speeds_of_the_grid()
    {
        var control = InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9);
        var curve = Solve(control);
        var largest = curve.DesignPoints.Single(p => p.Name == "largest thrust").Point;
        var rated = curve.RatedWindSpeed!.Value;
        var dense = CaseSolver.Solve(
            InventedRotor.Case(control, [.. Enumerable.Range(-200, 401).Select(i => rated + (0.001 * i)), 22.5]), default);
        Assert.True(largest.Loads!.Thrust >= dense.Points.Max(p => p.Loads!.Thrust) * (1 - 1e-9));
    }

    [Fact]
    public void Slopes_by_pitch_are_those_of_the_curve_beside_the_point()
    {
        var control = InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9);
        foreach (var point in Solve(control).Points.Where(p => p.Operation.WindSpeed > 12))
        {
            var model = new RotorModel(InventedRotor.Case(control, Winds));
            var more = model.Solve(point.Operation with { Pitch = point.Operation.Pitch + 1e-3 })!;
            var less = model.Solve(point.Operation with { Pitch = point.Operation.Pitch - 1e-3 })!;
            // The curve bends: a wider step differs in the third digit.
            Assert.Equal((more.Power - less.Power) / 2e-3, point.Margins!.PowerPerPitch, 5e-3 * Math.Abs(point.Margins.PowerPerPitch));
            Assert.Equal((more.Thrust - less.Thrust) / 2e-3, point.Margins.ThrustPerPitch, 5e-3 * Math.Abs(point.Margins.ThrustPerPitch));
            Assert.True(point.Margins.PowerPerPitch < 0 && point.Margins.ThrustPerPitch < 0);
        }
    }

    [Fact]
    public void Stall_margin_is_the_distance_to_the_largest_lift_of_the_table()
    {
        // The invented lift is largest at 10 degrees or a row beside it.
        foreach (var point in Solve(InventedRotor.VariableSpeed()).Points)
        {
            var largest = point.Elements.Where(e => e.Radius >= 20).Max(e => e.AngleOfAttack);
            Assert.Equal(double.DegreesToRadians(10) - largest, point.Margins!.StallMargin, double.DegreesToRadians(1.01));
            Assert.Contains(point.Elements, e => e.Radius == point.Margins.StallRadius);
        }
    }

    [Fact]
    public void Tip_Mach_number_counts_the_wind_as_well()
    {
        var point = Solve(InventedRotor.VariableSpeed()).Points[^1];
        Assert.Equal(Math.Sqrt(49 + 1) * point.Operation.WindSpeed / 340.29, point.Margins!.TipMach, 1e-12);
    }

    [Fact]
    public void A_surface_has_every_pair_and_marks_its_best()
    {
        var rotorCase = InventedRotor.Case(InventedRotor.VariableSpeed(), [8]);
        var surface = CoefficientSurface.Solve(rotorCase, [4, 6, 8, 10], [0, 0.05, 0.1], 9, default);
        Assert.Equal(12, surface.Points.Length);
        Assert.Equal((4, 0.05), (surface.Points[1].TipSpeedRatio, surface.Points[1].Pitch));
        Assert.All(surface.Points, p => Assert.True(p.Loads!.PowerCoefficient <= surface.Points[surface.Best].Loads!.PowerCoefficient));
        Assert.All(surface.Points, p => Assert.Equal(p.TipSpeedRatio, p.Loads!.TipSpeedRatio, 1e-12));
    }

    [Fact]
    public void An_efficiency_by_load_is_that_of_the_electrical_power_itself()
    {
        (double, double)[] rows = [(0.05, 0.7), (0.25, 0.9), (1, 0.95)];
        var drivetrain = Drivetrain.ByLoad(rows, 2e6);
        foreach (var rotorPower in new[] { 1e3, 1e5, 3e5, 6e5, 1e6, 2e6, 2.5e6 })
        {
            var electrical = drivetrain.Electrical(rotorPower);
            var load = electrical / 2e6;
            var efficiency = load <= 0.05 ? 0.7
                : load <= 0.25 ? 0.7 + (0.2 * (load - 0.05) / 0.2)
                : load <= 1 ? 0.9 + (0.05 * (load - 0.25) / 0.75)
                : 0.95;
            Assert.Equal(rotorPower * efficiency, electrical, 1e-9 * rotorPower);
        }
        Assert.Equal(0, drivetrain.Electrical(-5));
        Assert.Throws<ArgumentException>(() => Drivetrain.ByLoad([(0, 0.9), (0, 0.95)], 2e6));
        Assert.Throws<ArgumentException>(() => Drivetrain.Constant(1.01));
    }
}
