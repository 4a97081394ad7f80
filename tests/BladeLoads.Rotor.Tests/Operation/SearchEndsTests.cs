using BladeLoads.Rotor.Operation;

namespace BladeLoads.Rotor.Tests.Operation;

/// <summary>Places where a search for a pitch might end beside the pitch that is asked for.</summary>
public sealed class SearchEndsTests
{
    private const double Degree = Math.PI / 180;

    /// <summary>Where the search meets rated power to its last digit, its bracket may still be wide; it is closed all the same.</summary>
    [Theory]
    [InlineData(0.80e6, 11.96)]
    [InlineData(0.86e6, 12.12)]
    [InlineData(0.86e6, 15.88)]
    public void On_the_stall_branch_power_without_a_jump_is_rated_and_not_marked(double ratedPower, double windSpeed)
    {
        var control = InventedRotor.VariableSpeed(ratedPower, 4, maxRotorSpeed: 1.4, aboveRated: AboveRated.PitchToStall);
        var rotorCase = InventedRotor.Case(control, [windSpeed, 25], dropWidthDeg: 12, model: InventedRotor.Model with { Elements = 8 });
        var point = CaseSolver.Solve(rotorCase, default).Points[0];
        Assert.Equal(Region.RatedPower, point.Region);
        Assert.Equal(ratedPower, point.ElectricalPower, 1e-9 * ratedPower);
        Assert.Equal(PointMarks.None, point.Marks & PointMarks.PowerJump);
    }

    /// <summary>The same where thrust meets its limit to the last digit.</summary>
    [Fact]
    public void A_held_thrust_is_its_limit()
    {
        // Rotor 8 of ThrustLimitTests.
        var control = InventedRotor.VariableSpeed(1.3e6, 3, maxRotorSpeed: 1.66);
        RotorCase CaseOf(Control.VariableSpeed c) => InventedRotor.Case(
            c, [.. Enumerable.Range(3, 23).Select(v => (double)v)], stallDeg: 8 + (0.3 * 8), bladeCount: 2, solidityFactor: 0.8 + (0.1 * 3), cone: 0.01 * 2,
            model: InventedRotor.Model with { Elements = 8 });
        var limit = CaseSolver.Solve(CaseOf(control), default).Points.Max(p => p.Loads!.Thrust) * 0.52;
        var point = CaseSolver.Solve(CaseOf(control with { ThrustLimit = limit }), default).Points.Single(p => p.Operation.WindSpeed == 11);
        Assert.Equal(Region.ThrustLimit, point.Region);
        Assert.Equal(limit, point.Loads!.Thrust, 1e-6 * limit);
    }

    /// <summary>A limit that more pitch than fine pitch holds, on a rotor whose power rises with pitch, lets it make rated power early.</summary>
    [Fact]
    public void Under_a_thrust_limit_power_does_not_exceed_rated_below_the_wind_speed_at_which_fine_pitch_makes_it()
    {
        var control = InventedRotor.VariableSpeed(0.8e6, -3, maxRotorSpeed: 1.25, thrustLimit: 150e3);
        var curve = CaseSolver.Solve(InventedRotor.Case(control, [8.4, 8.5, 8.55, 8.6, 8.65, 8.7, 9, 25]), default);
        Assert.All(curve.Points, p => Assert.True(
            p.ElectricalPower <= 0.8e6 * (1 + 1e-7), $"{p.Operation.WindSpeed} m/s: {p.ElectricalPower / 0.8e6:F4} of rated power, {p.Region}"));
    }

    [Fact]
    public void A_jump_of_pitch_that_a_thrust_limit_bridges_is_not_marked()
    {
        var control = InventedRotor.VariableSpeed(0.8e6, -3, maxRotorSpeed: 1.25, thrustLimit: 110e3);
        double[] winds = [.. Enumerable.Range(0, 61).Select(i => 8 + (0.05 * i)), 25];
        var curve = CaseSolver.Solve(InventedRotor.Case(control, winds), default);
        var first = curve.Points.First(p => p.Region == Region.RatedPower);
        var before = curve.Points.Last(p => p.Operation.WindSpeed < first.Operation.WindSpeed);
        Assert.Equal(Region.ThrustLimit, before.Region);
        Assert.InRange(first.Operation.Pitch - before.Operation.Pitch, 0, 0.3 * Degree);
        Assert.DoesNotContain(curve.Points, p => (p.Marks & PointMarks.PitchJump) != 0);
    }

    /// <summary>The pitch with the most power lies on the edge of a jump; thrust there breaks the limit on a stretch too narrow for the walk.</summary>
    [Fact]
    public void A_pitch_that_is_followed_to_the_edge_of_stall_keeps_the_thrust_limit()
    {
        var control = InventedRotor.VariableSpeed(null, 0, maxRotorSpeed: 1.1, speedLimitedPitch: SpeedLimitedPitch.Best);
        RotorCase CaseOf(Control c) => InventedRotor.Case(c, [7.59, 25], dropWidthDeg: 0.3, model: InventedRotor.Model with { Elements = 16 });
        var limit = CaseSolver.Solve(CaseOf(control), default).Points[0].Loads!.Thrust * (1 - 1e-4);
        var point = CaseSolver.Solve(CaseOf(control with { ThrustLimit = limit }), default).Points[0];
        Assert.True(point.Loads!.Thrust <= limit * (1 + 1e-6), $"{(point.Loads.Thrust / limit) - 1:E2} above the limit, {point.Region}, {point.Marks}");
    }
}
