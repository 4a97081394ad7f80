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
    public void A_thrust_limit_below_what_feathered_blades_take_is_marked_at_the_pitch_with_the_least_thrust()
    {
        // A rotor that hardly turns: its feathered blades take 1.2 kN at 22 m/s, and less than a kilonewton up to 18.
        const double Limit = 1e3;
        double[] winds = [3, 10, 15, 18, 19.5, 21, 22, 22.5];
        var control = InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 0.05, thrustLimit: Limit);
        var model = new RotorModel(InventedRotor.Case(control, winds));
        var curve = CaseSolver.Solve(InventedRotor.Case(control, winds), default).Points;
        foreach (var point in curve)
        {
            var least = double.PositiveInfinity;
            for (var i = 0; i <= 8800; i++)
                least = Math.Min(least, model.Solve(point.Operation with { Pitch = double.DegreesToRadians(2 + (0.01 * i)) })!.Thrust);
            Assert.Equal(least > Limit, (point.Marks & PointMarks.ThrustNotHeld) != 0);
            if (least > Limit)
                Assert.Equal(least, point.Loads!.Thrust, 1e-3 * least);
            else
                Assert.True(point.Loads!.Thrust <= Limit * (1 + 1e-6));
        }
        Assert.Equal([19.5, 21, 22, 22.5], curve.Where(p => (p.Marks & PointMarks.ThrustNotHeld) != 0).Select(p => p.Operation.WindSpeed));
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
