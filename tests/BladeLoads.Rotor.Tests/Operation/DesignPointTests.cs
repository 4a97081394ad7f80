using BladeLoads.Rotor.Operation;

namespace BladeLoads.Rotor.Tests.Operation;

public sealed class DesignPointTests
{
    private static readonly double[] Winds = [.. Enumerable.Range(6, 40).Select(i => 0.5 * i)];

    [Fact]
    public void Regions_begin_where_the_design_points_say()
    {
        var control = InventedRotor.VariableSpeed(1.1e6, 2, minRotorSpeed: 0.9, maxRotorSpeed: 1.3, thrustLimit: 150e3);
        var curve = Solve(control, Winds);
        var names = curve.DesignPoints.Select(p => p.Name).ToArray();
        Assert.Contains("rated power begins", names);
        Assert.Contains("largest thrust", names);
        var radius = 40.0;
        Assert.Equal(0.9 * radius / 7, Single(curve, "best tip-speed ratio begins").Operation.WindSpeed, 1e-8);
        Assert.Equal(1.3 * radius / 7, Single(curve, "maximum speed begins").Operation.WindSpeed, 1e-8);
        foreach (var point in curve.DesignPoints.Where(p => p.Name.EndsWith(" begins", StringComparison.Ordinal)))
        {
            var at = point.Point.Operation.WindSpeed;
            var sides = Solve(control, [at - 1e-6, at + 1e-6, 22.5]).Points;
            Assert.NotEqual(sides[0].Region, sides[1].Region);
            Assert.Equal(point.Name, $"{RegionWords.Of(sides[1].Region)} begins");
        }
    }

    [Theory]
    [InlineData(0.9)]
    [InlineData(0.97)]
    [InlineData(1)]
    [InlineData(1.02)]
    [InlineData(1.3)]
    public void Between_two_speed_limits_that_are_one_there_is_no_region(double rotorSpeed)
    {
        // 7 times the wind speed over a tip radius of 40 m is the rotor speed: a wind speed of the case as well, at which both limits are met.
        var met = rotorSpeed * 40 / 7;
        foreach (var winds in new double[][] { [4, 7, 10, 13], [4, met, 10], [met, 10], [4, met] })
        {
            var curve = Solve(InventedRotor.VariableSpeed(null, 2, minRotorSpeed: rotorSpeed, maxRotorSpeed: rotorSpeed), winds);
            var begins = curve.DesignPoints.Where(p => p.Name != DesignPoint.LargestThrust).ToArray();
            Assert.All(begins, p => Assert.Equal(met, p.Point.Operation.WindSpeed, 2e-9));
            Assert.DoesNotContain(begins, p => p.Name == "best tip-speed ratio begins" && winds[^1] > met);
            Assert.True(begins.Length <= 1, string.Join(", ", begins.Select(p => p.Name)));
        }
    }

    [Fact]
    public void The_largest_thrust_of_a_row_that_nothing_exceeds_is_that_of_the_row()
    {
        // Thrust falls from rated up, so the first row has the most.
        var control = InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9);
        var falling = Solve(control, [13, 15, 17, 19]);
        Assert.Equal(13, Single(falling, "largest thrust").Operation.WindSpeed);
        Assert.Same(falling.Points[0], Single(falling, "largest thrust"));
        // Without a rated power it rises with the wind, so the last one has.
        var rising = Solve(InventedRotor.VariableSpeed(null, 2), [5, 7, 9]);
        Assert.Same(rising.Points[2], Single(rising, "largest thrust"));
    }

    [Theory]
    [InlineData(20.3, true)]
    [InlineData(13.3, false)]
    public void At_cut_out_and_cut_in_between_two_rows_the_largest_thrust_is_found(double end, bool isCutOut)
    {
        // Rising to cut-out without a rated power; falling from cut-in above it.
        var control = InventedRotor.VariableSpeed(isCutOut ? null : 1.5e6, 2, maxRotorSpeed: isCutOut ? double.PositiveInfinity : 1.9);
        var rotorCase = InventedRotor.Case(
            control, [10, 12, 14, 16, 18, 20, 21, 22], cutIn: isCutOut ? 0 : end, cutOut: isCutOut ? end : double.PositiveInfinity);
        var largest = Single(CaseSolver.Solve(rotorCase, default), "largest thrust");
        Assert.Equal(end, largest.Operation.WindSpeed, 1e-9);
        Assert.Equal(Solve(control, [end, 22.5]).Points[0].Loads!.Thrust, largest.Loads!.Thrust, 1e-8 * largest.Loads.Thrust);
    }

    [Fact]
    public void At_the_kink_of_rated_power_the_largest_thrust_is_found()
    {
        var control = InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9);
        foreach (var winds in new[] { Winds, [3, 9, 15, 21, 22.5] })
        {
            var curve = Solve(control, winds);
            var largest = Single(curve, "largest thrust");
            Assert.Equal(curve.RatedWindSpeed!.Value, largest.Operation.WindSpeed, 1e-8);
            Assert.True(largest.Loads!.Thrust >= DenseThrust(control, curve.RatedWindSpeed.Value) * (1 - 1e-9));
        }
    }

    [Fact]
    public void A_smooth_top_of_thrust_between_two_rows_is_found()
    {
        // At one rotor speed the blades stall with more wind, and thrust has a round top.
        var control = InventedRotor.VariableSpeed(null, 2, maxRotorSpeed: 1.4);
        var largest = Single(Solve(control, [6, 9, 12, 15, 18]), "largest thrust");
        var model = new RotorModel(InventedRotor.Case(control, [6]));
        double Thrust(double v) => model.Solve(new OperatingPoint(v, Math.Min(1.4, 7 * v / 40), double.DegreesToRadians(2)))!.Thrust;
        var top = Enumerable.Range(0, 1201).Select(i => 6 + (0.01 * i)).MaxBy(Thrust);
        Assert.InRange(top, 9.01, 14.99);
        Assert.Equal(top, largest.Operation.WindSpeed, 0.01);
        Assert.True(largest.Loads!.Thrust >= Enumerable.Range(-100, 201).Max(i => Thrust(top + (1e-4 * i))) * (1 - 1e-12));
        Assert.DoesNotContain(new[] { 6.0, 9, 12, 15, 18 }, v => v == largest.Operation.WindSpeed);
    }

    [Fact]
    public void The_largest_thrust_of_a_flat_top_is_at_its_lowest_wind_speed()
    {
        var control = InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9, thrustLimit: 160e3);
        var curve = Solve(control, Winds);
        var atLimit = curve.Points.Concat(curve.DesignPoints.Select(d => d.Point))
            .Where(p => Math.Abs(p.Loads!.Thrust - 160e3) <= 160e3 * 1e-9).Select(p => p.Operation.WindSpeed).ToArray();
        Assert.True(atLimit.Length > 3);
        Assert.Equal(atLimit.Min(), Single(curve, "largest thrust").Operation.WindSpeed);
    }

    [Fact]
    public void A_rotor_at_rest_beyond_cut_out_takes_no_largest_thrust()
    {
        // At fine pitch and at rest the blades take more than the limit lets them take in operation.
        var control = InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9, thrustLimit: 30e3);
        var curve = CaseSolver.Solve(InventedRotor.Case(control, [6, 8, 10, 20, 22], cutOut: 21), default);
        Assert.True(curve.Points[^1].Loads!.Thrust > 40e3);
        Assert.Equal(30e3, Single(curve, "largest thrust").Loads!.Thrust, 1e-3);
    }

    private static double DenseThrust(Control control, double about)
        => Solve(control, [.. Enumerable.Range(-200, 401).Select(i => about + (0.001 * i)), 22.5]).Points.Max(p => p.Loads!.Thrust);

    private static PowerCurve Solve(Control control, double[] winds) => CaseSolver.Solve(InventedRotor.Case(control, winds), default);

    private static CurvePoint Single(PowerCurve curve, string name) => Assert.Single(curve.DesignPoints, p => p.Name == name).Point;
}
