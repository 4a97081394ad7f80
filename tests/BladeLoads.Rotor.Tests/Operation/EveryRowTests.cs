using BladeLoads.Rotor.Operation;

namespace BladeLoads.Rotor.Tests.Operation;

/// <summary>What holds at every row and every design point, whatever the strategy.</summary>
public sealed class EveryRowTests
{
    private static readonly double[] _winds = [.. Enumerable.Range(6, 45).Select(i => 0.5 * i)];

    // Sums of 40 elements in another order.
    private const double Digits = 1e-12;

    private static readonly (string Name, Control Control, Drivetrain Drivetrain)[] _strategies =
    [
        ("feather", InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9), Drivetrain.Constant(0.94)),
        ("feather, by load", InventedRotor.VariableSpeed(1.5e6, 2, minRotorSpeed: 0.9, maxRotorSpeed: 1.9),
            Drivetrain.ByLoad([(0.02, 0.7), (0.1, 0.88), (0.3, 0.93), (1, 0.95)], 1.5e6)),
        ("stall", InventedRotor.VariableSpeed(0.9e6, 2, maxRotorSpeed: 1.4, aboveRated: AboveRated.PitchToStall), Drivetrain.Constant(0.94)),
        ("no pitch above rated", InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9, aboveRated: AboveRated.None), Drivetrain.Constant(0.94)),
        ("thrust limit", InventedRotor.VariableSpeed(1.5e6, 2, maxRotorSpeed: 1.9, thrustLimit: 160e3), Drivetrain.Constant(0.94)),
        ("best", InventedRotor.VariableSpeed(
            1.5e6, null, null, minRotorSpeed: 0.9, maxRotorSpeed: 1.9, speedLimitedPitch: SpeedLimitedPitch.Best), Drivetrain.Constant(0.94)),
        ("fixed speed", new Control.FixedSpeed(1.2, 0.03, 1e6), Drivetrain.Constant(0.9)),
        ("schedule", new Control.Schedule([new(3, 0.8, 0.05), new(9, 1.6, 0), new(25, 1.8, 0.4)], 1e6), Drivetrain.Constant(0.9)),
    ];

    public static TheoryData<string> Strategies => new(_strategies.Select(s => s.Name));

    [Theory]
    [MemberData(nameof(Strategies))]
    public void Torque_times_rotor_speed_is_power_and_all_is_the_sum_of_the_elements(string strategy)
    {
        var (rotorCase, curve) = Solve(strategy);
        var cosCone = Math.Cos(rotorCase.Cone);
        foreach (var point in Every(curve))
        {
            var (loads, wind, speed) = (point.Loads!, point.Operation.WindSpeed, point.Operation.RotorSpeed);
            Near(loads.Torque * speed, loads.Power);
            Near(rotorCase.BladeCount * cosCone * point.Elements.Sum(e => e.TangentialForcePerLength * e.Length * e.Radius), loads.Torque);
            Near(rotorCase.BladeCount * cosCone * point.Elements.Sum(e => e.NormalForcePerLength * e.Length), loads.Thrust);

            var radius = rotorCase.Blade.TipRadius * cosCone;
            var force = 0.5 * rotorCase.Air.Density * wind * wind * Math.PI * radius * radius;
            Near(loads.Thrust / force, loads.ThrustCoefficient);
            Near(loads.Power / (force * wind), loads.PowerCoefficient);
            Near(loads.Torque / (force * radius), loads.TorqueCoefficient);
            Near(speed * radius / wind, loads.TipSpeedRatio);
            Near(loads.TorqueCoefficient * loads.TipSpeedRatio, loads.PowerCoefficient);
        }
    }

    [Theory]
    [MemberData(nameof(Strategies))]
    public void Electrical_power_is_what_the_drivetrain_makes_of_it_and_exceeds_rated_only_where_that_is_marked(string strategy)
    {
        var (rotorCase, curve) = Solve(strategy);
        var rated = rotorCase.Control.RatedPower!.Value;
        foreach (var point in Every(curve))
        {
            Near(rotorCase.Drivetrain.Electrical(point.Loads!.Power), point.ElectricalPower);
            Assert.True(point.ElectricalPower <= point.Loads.Power || point.Loads.Power < 0);
            Assert.Equal(point.ElectricalPower > rated * (1 + 1e-7), (point.Marks & PointMarks.ExceedsRated) != 0);
        }
        // The strategies that let power exceed rated are these, and on this rotor they do.
        Assert.Equal(
            strategy is "no pitch above rated" or "fixed speed" or "schedule", Every(curve).Any(p => (p.Marks & PointMarks.ExceedsRated) != 0));
    }

    private static (RotorCase Case, PowerCurve Curve) Solve(string strategy)
    {
        var (_, control, drivetrain) = _strategies.Single(s => s.Name == strategy);
        var rotorCase = InventedRotor.Case(control, _winds, dropWidthDeg: 12, cone: 0.05) with { Drivetrain = drivetrain };
        var curve = CaseSolver.Solve(rotorCase, default);
        Assert.Equal(_winds.Length, curve.Points.Length);
        Assert.NotEmpty(curve.DesignPoints);
        return (rotorCase, curve);
    }

    private static IEnumerable<CurvePoint> Every(PowerCurve curve) => curve.Points.Concat(curve.DesignPoints.Select(d => d.Point));

    private static void Near(double expected, double found) => Assert.Equal(expected, found, Digits * Math.Abs(expected));
}
