using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Sections;

public sealed class StallPointTests
{
    private static Polar Table(params (double AngleDeg, double Lift)[] rows) => Polar.FromRows(
        1e6, [.. rows.Select(r => double.DegreesToRadians(r.AngleDeg))], [.. rows.Select(r => r.Lift)], [.. rows.Select(_ => 0.01)]);

    [Fact]
    public void The_first_peak_counts_and_not_the_lift_of_a_plate_far_beyond_it()
        => Assert.Equal(2, StallPoint.Above(Table((0, 0), (5, 0.5), (12, 1.0), (18, 0.6), (40, 1.3), (60, 0.9))));

    [Fact]
    public void A_dip_of_less_than_a_tenth_is_not_stall()
        => Assert.Equal(4, StallPoint.Above(Table((0, 0), (5, 0.94), (8, 0.9), (12, 1.0), (14, 1.1), (18, 0.6))));

    [Fact]
    public void Lift_that_falls_off_slowly_stalls_where_it_is_largest()
        => Assert.Equal(2, StallPoint.Above(Table((0, 0), (5, 0.5), (12, 1.0), (18, 0.96))));

    [Fact]
    public void A_table_that_ends_while_lift_rises_shows_no_stall()
    {
        Assert.Null(StallPoint.Above(Table((0, 0), (5, 0.5), (12, 1.0))));
        Assert.Null(StallPoint.Below(Table((-8, -0.8), (-5, -0.5), (0, 0))));
    }

    [Fact]
    public void Lift_of_the_other_sign_on_the_way_to_zero_lift_is_no_stall()
    {
        Assert.Equal(2, StallPoint.Below(Table((-18, -0.4), (-14, -0.5), (-11, -0.8), (-5, -0.2), (-2, 0.125), (0, 0.35))));
        Assert.Equal(3, StallPoint.Above(Table((-2, -0.3), (0.5, -0.01), (5, 0.4), (12, 1.0), (18, 0.6))));
        Assert.Null(StallPoint.Below(Table((-5, -0.2), (-2, 0.125), (0, 0.35))));
    }

    [Fact]
    public void Below_zero_the_lowest_lift_counts()
        => Assert.Equal(2, StallPoint.Below(Table((-40, -1.2), (-18, -0.5), (-12, -0.8), (-5, -0.4), (0, 0.1))));
}
