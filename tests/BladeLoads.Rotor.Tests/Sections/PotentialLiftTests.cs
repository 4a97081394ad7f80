using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Sections;

public sealed class PotentialLiftTests
{
    private static double Rad(double deg) => double.DegreesToRadians(deg);

    private static Polar Table(params (double AngleDeg, double Lift, double Drag)[] rows) => Polar.FromRows(
        1e6, [.. rows.Select(r => Rad(r.AngleDeg))], [.. rows.Select(r => r.Lift)], [.. rows.Select(r => r.Drag)]);

    // Lift 6 a radian through -3 degrees, to 8 degrees; then stall.
    private static Polar Straight(params double[] anglesDeg) => Table(
        [.. anglesDeg.Select(a => (a, a <= 8 ? 6 * Rad(a + 3) : 0.9, 0.01 + (0.0001 * a * a)))]);

    [Fact]
    public void A_straight_lift_line_is_found_whatever_its_rows()
    {
        foreach (var polar in new[] { Straight(-10, -5, 0, 5, 10, 15), Straight(-6, -4, -2, 0, 2, 4, 12), Straight(-8, -3, 8, 20), Straight(0, 2, 4, 6) })
        {
            var lift = PotentialLift.Of(polar)!.Value;
            Assert.Equal(Rad(-3), lift.ZeroLiftAngle, 1e-12);
            Assert.Equal(6, lift.LiftSlope, 1e-12);
            Assert.Equal(6 * Math.Sin(Rad(33)), lift.At(Rad(30)), 1e-12);
        }
    }

    [Fact]
    public void Of_several_places_without_lift_the_one_nearest_to_zero_degrees_counts()
    {
        var polar = Table((-180, 0, 0.1), (-170, 0.6, 0.1), (-90, 0, 1.8), (-15, -0.5, 0.1), (-13, 0.1, 0.1), (-11, -0.5, 0.03), (-1, 0, 0.01), (8, 1, 0.01), (180, 0, 0.1));
        Assert.Equal(Rad(-1), PotentialLift.Of(polar)!.Value.ZeroLiftAngle, 1e-12);
    }

    [Fact]
    public void A_section_that_does_not_lift_has_none()
    {
        Assert.Null(PotentialLift.Of(Table((-180, 0, 1), (0, 0, 1), (180, 0, 1))));
        Assert.Null(PotentialLift.Of(Table((-10, 0.5, 1), (0, 0, 1), (10, -0.5, 1))));
        Assert.Null(PotentialLift.Of(Table((-180, 0, 1), (0, 0.3, 1), (180, 0, 1))));
    }

    [Fact]
    public void Drag_at_zero_lift_lies_between_the_rows_beside_it()
    {
        Assert.Equal(0.015, PotentialLift.ZeroLiftDrag(Table((-5, -0.2, 0.02), (-1, 0.2, 0.01), (9, 1, 0.03))), 1e-12);
        Assert.Equal(0.9, PotentialLift.ZeroLiftDrag(Table((-180, 0, 1), (0, 0, 0.9), (180, 0, 1))));
    }
}
