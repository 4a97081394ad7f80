using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Sections;

public sealed class PolarFiguresTests
{
    private const double Degree = Math.PI / 180;

    private static Polar Table(params (double AngleDeg, double Lift, double Drag)[] rows) => Polar.FromRows(
        1e6, [.. rows.Select(r => r.AngleDeg * Degree)], [.. rows.Select(r => r.Lift)], [.. rows.Select(r => r.Drag)]);

    // Lift 6 a radian from -4 degrees; drag 0.008 + 0.01 cl^2, whose best ratio is 1/(2 sqrt(0.008 x 0.01)) at cl = sqrt(0.8), by calculus.
    private static readonly Polar Parabola = Table(
        [.. Enumerable.Range(-100, 221).Select(i => i / 10.0).Select(a => (a, 6 * (a + 4) * Degree, 0.008 + (0.01 * 36 * Math.Pow((a + 4) * Degree, 2))))]);

    [Fact]
    public void The_best_lift_to_drag_of_a_parabola_is_where_calculus_has_it()
    {
        var figures = PolarFigures.Of(Parabola);
        var best = figures.BestLiftToDrag!.Value;
        // The nearest row is up to half a step of 0.1 degrees away, where a peak so flat has lost less than 1e-4 of itself.
        Assert.Equal(1 / (2 * Math.Sqrt(0.008 * 0.01)), best.Value, 1e-4 * best.Value);
        Assert.Equal((Math.Sqrt(0.8) / 6 / Degree) - 4, best.Angle / Degree, 0.05);
        Assert.Equal(0.008, figures.LeastDrag!.Value.Value, 1e-15);
        Assert.Equal(-4, figures.LeastDrag!.Value.Angle / Degree, 1e-9);
        Assert.Equal(6 / (2 * Math.PI), figures.SlopeRatio!.Value, 1e-12);
        Assert.False(figures.IsBluff);
    }

    [Fact]
    public void A_table_that_ends_before_stall_says_so_of_its_largest_lift()
    {
        var figures = PolarFigures.Of(Parabola);
        Assert.Equal(new PolarExtreme(220, Parabola.Angles[220], Parabola.Lift[220], AtEnd: true), figures.LargestLift);
        Assert.Equal(new PolarExtreme(0, Parabola.Angles[0], Parabola.Lift[0], AtEnd: true), figures.LowestLift);
        Assert.Equal(12 * Degree, figures.FirstPeakAngle, 1e-12);
    }

    [Fact]
    public void A_round_section_is_bluff_and_has_no_lift_to_tell()
    {
        var figures = PolarFigures.Of(Table((-180, 0, 0.6), (0, 0, 0.6), (180, 0, 0.6)));
        Assert.True(figures.IsBluff);
        Assert.Null(figures.Attached);
        Assert.Null(figures.SlopeRatio);
        Assert.Null(figures.LargestLift);
        Assert.Null(figures.LowestLift);
        Assert.Null(figures.BestLiftToDrag);
        Assert.Equal(double.PositiveInfinity, figures.FirstPeakAngle);
    }

    [Fact]
    public void A_table_without_a_row_near_zero_degrees_has_no_least_drag_and_is_not_called_bluff()
    {
        var figures = PolarFigures.Of(Table((-180, 0, 0.02), (-90, 0, 1.3), (90, 0, 1.3), (180, 0, 0.02)));
        Assert.Null(figures.LeastDrag);
        Assert.False(figures.IsBluff);
    }

    [Fact]
    public void A_dip_of_less_than_two_hundredths_is_no_peak()
    {
        Assert.Equal(12 * Degree, FirstLiftPeak.Of(Table((0, 0.2, 0.01), (4, 0.6, 0.01), (6, 0.585, 0.01), (12, 1.1, 0.02), (14, 1.0, 0.1))).Peak, 1e-12);
        Assert.Equal(4 * Degree, FirstLiftPeak.Of(Table((0, 0.2, 0.01), (4, 0.6, 0.01), (6, 0.57, 0.01), (12, 1.1, 0.02), (14, 1.0, 0.1))).Peak, 1e-12);
    }

    [Fact]
    public void A_little_lift_on_the_way_up_is_no_peak()
    {
        var round = FirstLiftPeak.Of(Table((-20, 0, 1.1), (-10, 0.004, 1.1), (20, 0, 1.1)));
        Assert.Equal((double.PositiveInfinity, double.PositiveInfinity), round);
        var cambered = FirstLiftPeak.Of(Table((-20, 0.01, 0.3), (-10, -0.8, 0.02), (-3, 0, 0.01), (12, 1.4, 0.03), (16, 1.1, 0.2)));
        Assert.Equal((-3 * Degree, 12 * Degree), cambered);
    }
}
