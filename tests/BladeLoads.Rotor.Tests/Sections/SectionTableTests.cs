using BladeLoads.Rotor.Sections;
using MathNet.Numerics.Interpolation;

namespace BladeLoads.Rotor.Tests.Sections;

public sealed class SectionTableTests
{
    private static double Rad(double deg) => double.DegreesToRadians(deg);

    private static Polar Limited(double reynolds, double lift)
        => Polar.FromRows(reynolds, [Rad(-10), Rad(0), Rad(10)], [-lift, 0, lift], [0.02, 0.01, 0.02]);

    [Fact]
    public void Beyond_its_angles_a_polar_gives_its_end_value_and_says_so()
    {
        var table = Section.FromPolars("a", [Limited(1e6, 1)]).Table;
        var place = table.Place(Math.Log(1e6));
        Assert.False(place.Outside);
        Assert.Equal(new Coefficients(1, 0.02), table.At(Rad(50), place));
        Assert.Equal(new Coefficients(-1, 0.02), table.At(Rad(-170), place));
        Assert.True(table.IsOutsideAngles(Rad(10.001), place));
        Assert.False(table.IsOutsideAngles(Rad(10), place));
    }

    [Theory]
    [InlineData(1e6, 1.0, false)]
    [InlineData(4e6, 2.0, false)]
    [InlineData(2e6, 1.5, false)]
    [InlineData(5e5, 1.0, true)]
    [InlineData(9e6, 2.0, true)]
    public void Coefficients_are_linear_in_the_logarithm_of_the_Reynolds_number(double reynolds, double lift, bool outside)
    {
        var table = Section.FromPolars("a", [Limited(1e6, 1), Limited(4e6, 2)]).Table;
        var place = table.Place(Math.Log(reynolds));
        Assert.Equal(outside, place.Outside);
        Assert.Equal(lift, table.At(Rad(10), place).Lift, 1e-12);
    }

    [Fact]
    public void A_polar_without_a_Reynolds_number_serves_at_all_of_them()
    {
        var table = Section.FromPolars("a", [Limited(double.NaN, 1)]).Table;
        Assert.False(table.Place(Math.Log(1e3)).Outside);
        Assert.Equal(1, table.At(Rad(10), table.Place(Math.Log(1e9))).Lift);
    }

    [Fact]
    public void Several_polars_on_different_angles_give_the_same_as_each_alone()
    {
        var random = new Random(7);
        Polar[] polars = [.. Enumerable.Range(1, 3).Select(i => RandomPolar(random, i * 1e6))];
        var together = Section.FromPolars("all", polars).Table;
        foreach (var polar in polars)
        {
            var alone = Section.FromPolars("one", [polar]).Table;
            var log = Math.Log(polar.Reynolds);
            for (var angle = -Math.PI; angle <= Math.PI; angle += 0.0137)
            {
                var (a, b) = (alone.At(angle, alone.Place(log)), together.At(angle, together.Place(log)));
                Assert.Equal(a.Lift, b.Lift, 1e-12);
                Assert.Equal(a.Drag, b.Drag, 1e-12);
            }
        }
    }

    [Fact]
    public void Bounds_over_a_range_of_angles_hold_at_every_angle_of_it()
    {
        var random = new Random(8);
        for (var i = 0; i < 2000; i++)
        {
            var table = Section.FromPolars("a", [RandomPolar(random, 1e6), RandomPolar(random, 3e6)]).Table;
            var place = table.Place(Math.Log(1e6 + (2e6 * random.NextDouble())));
            var from = -Math.PI + (2 * Math.PI * random.NextDouble());
            var to = from + ((Math.PI - from) * random.NextDouble() * random.NextDouble());
            var range = table.Range(from, to, place);
            for (var j = 0; j <= 20; j++)
            {
                var (lift, drag) = table.At(from + ((to - from) * j / 20), place);
                Assert.InRange(lift, range.LeastLift - 1e-12, range.LargestLift + 1e-12);
                Assert.InRange(drag, range.LeastDrag - 1e-12, range.LargestDrag + 1e-12);
            }
        }
    }

    private static Polar RandomPolar(Random random, double reynolds)
    {
        double[] angles = [.. Enumerable.Range(0, random.Next(3, 60)).Select(_ => random.NextDouble() * 2 * Math.PI - Math.PI).Distinct().Order()];
        return Polar.FromRows(
            reynolds, angles, [.. angles.Select(_ => (random.NextDouble() * 4) - 2)], [.. angles.Select(_ => random.NextDouble())]);
    }

    // Between rows by the same interpolant of MathNet.Numerics, between Reynolds numbers half way by hand.
    [Fact]
    public void A_section_by_itself_gives_what_the_solver_takes()
    {
        double[] angles = [Rad(-10), Rad(-2), Rad(0), Rad(7), Rad(10), Rad(15)];
        double[] lift = [-0.7, 0.1, 0.35, 1.1, 1.25, 0.9];
        double[] drag = [0.03, 0.009, 0.008, 0.011, 0.02, 0.15];
        var section = Section.FromPolars("a", [Polar.FromRows(1e6, angles, lift, drag), Polar.FromRows(4e6, angles, [.. lift.Select(l => 1.2 * l)], drag)]);
        var (expectedLift, expectedDrag) = (CubicSpline.InterpolatePchip(angles, lift), CubicSpline.InterpolatePchip(angles, drag));
        foreach (var deg in new[] { -9.3, -1, 3.3, 8.1, 12.7 })
        {
            Assert.Equal(expectedLift.Interpolate(Rad(deg)), section.At(Rad(deg), 1e6).Lift, 1e-12);
            Assert.Equal(expectedDrag.Interpolate(Rad(deg)), section.At(Rad(deg), 4e6).Drag, 1e-12);
            Assert.Equal(1.1 * expectedLift.Interpolate(Rad(deg)), section.At(Rad(deg), 2e6).Lift, 1e-12);
        }
        Assert.Equal(new Coefficients(0.9, 0.15), section.At(Rad(100), 5e5));
    }
}
