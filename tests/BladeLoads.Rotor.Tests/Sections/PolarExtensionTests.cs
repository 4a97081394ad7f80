using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Sections;

/// <summary>What becomes of tables of every reach; the relation itself is held to published figures in Published/DeepStallTests.</summary>
public sealed class PolarExtensionTests
{
    private const double AspectRatio = 12;
    private const double LargestDrag = 1.11 + (0.018 * AspectRatio);

    private static double Rad(double deg) => Math.Clamp(double.DegreesToRadians(deg), -Math.PI, Math.PI);

    private static Polar Table(double reynolds, params (double AngleDeg, double Lift, double Drag)[] rows) => Polar.FromRows(
        reynolds, [.. rows.Select(r => Rad(r.AngleDeg))], [.. rows.Select(r => r.Lift)], [.. rows.Select(r => r.Drag)]);

    // An invented section that stalls at 12 and at -9 degrees.
    private static readonly (double, double, double)[] Cambered =
    [
        (-14, -0.4, 0.12), (-11, -0.55, 0.06), (-9, -0.7, 0.03), (-4, -0.1, 0.012), (0, 0.35, 0.01), (4, 0.8, 0.01), (8, 1.2, 0.014), (12, 1.4, 0.03),
        (15, 1.2, 0.09), (18, 1.0, 0.2),
    ];

    private static (double Lift, double Drag) At(Polar polar, double angleDeg)
    {
        var i = polar.Angles.ToList().FindIndex(a => Math.Abs(a - Rad(angleDeg)) < 1e-9);
        Assert.True(i >= 0, $"no row at {angleDeg} degrees");
        return (polar.Lift[i], polar.Drag[i]);
    }

    private static bool Has(Polar polar, double angleDeg) => polar.Angles.Any(a => Math.Abs(a - Rad(angleDeg)) < 1e-9);

    [Fact]
    public void Joined_at_its_end_a_table_keeps_every_row()
    {
        var extended = PolarExtension.Extend(Table(1e6, Cambered), AspectRatio, ExtensionJoin.End);
        foreach (var (angle, lift, drag) in Cambered)
            Assert.Equal((lift, drag), At(extended.Polar, angle));
        Assert.Equal((ExtensionKind.FromEnd, ExtensionKind.FromEnd), (extended.Above.Kind, extended.Below.Kind));
        Assert.Equal((Rad(18), Rad(-14)), (extended.Above.JoinAngle, extended.Below.JoinAngle));
        Assert.Equal((true, true), (extended.Above.ShowsStall, extended.Below.ShowsStall));
        Assert.Equal((0, 0), (extended.Above.RowsLeftOut, extended.Below.RowsLeftOut));
    }

    [Fact]
    public void Joined_at_stall_a_table_loses_the_rows_beyond_its_largest_and_lowest_lift()
    {
        var extended = PolarExtension.Extend(Table(1e6, Cambered), AspectRatio, ExtensionJoin.Stall);
        Assert.Equal((1.4, 0.03), At(extended.Polar, 12));
        Assert.Equal((-0.7, 0.03), At(extended.Polar, -9));
        Assert.False(Has(extended.Polar, 18) || Has(extended.Polar, -14));
        Assert.Equal((ExtensionKind.FromStall, ExtensionKind.FromStall), (extended.Above.Kind, extended.Below.Kind));
        Assert.Equal((2, 2), (extended.Above.RowsLeftOut, extended.Below.RowsLeftOut));
    }

    [Fact]
    public void Across_the_wind_a_section_has_no_lift_and_the_drag_of_a_plate()
    {
        var polar = PolarExtension.Extend(Table(1e6, Cambered), AspectRatio, ExtensionJoin.Stall).Polar;
        Assert.Equal((0, LargestDrag), At(polar, 90));
        Assert.Equal((0, LargestDrag), At(polar, -90));
    }

    [Fact]
    public void Beyond_a_right_angle_lift_is_mirrored_with_seven_tenths()
    {
        var polar = PolarExtension.Extend(Table(1e6, Cambered), AspectRatio, ExtensionJoin.Stall).Polar;
        foreach (var angle in new[] { 15.0, 30, 45, 60, 85 })
        {
            var (lift, drag) = At(polar, angle);
            Assert.Equal(-0.7 * lift, At(polar, 180 - angle).Lift, 1e-12);
            Assert.Equal(0.7 * lift, At(polar, angle - 180).Lift, 1e-12);
            Assert.Equal(drag, At(polar, 180 - angle).Drag, 1e-12);
            Assert.Equal(drag, At(polar, angle - 180).Drag, 1e-12);
        }
        Assert.Equal(-0.7 * 1.4, At(polar, 168).Lift, 1e-12);
    }

    [Fact]
    public void At_both_ends_of_the_circle_there_is_one_lift_and_one_drag()
    {
        foreach (var join in new[] { ExtensionJoin.Stall, ExtensionJoin.End })
        {
            var polar = PolarExtension.Extend(Table(1e6, Cambered), AspectRatio, join).Polar;
            Assert.Equal((-Math.PI, Math.PI), (polar.Angles[0], polar.Angles[^1]));
            // No lift, and the drag at zero lift, by hand: 0.1/0.45 of the way from -4 degrees to 0.
            Assert.Equal(0, polar.Lift[^1]);
            Assert.Equal(0.012 - (0.002 * 0.1 / 0.45), polar.Drag[^1], 1e-12);
            Assert.Equal((polar.Lift[^1], polar.Drag[^1]), (polar.Lift[0], polar.Drag[0]));
        }
    }

    [Fact]
    public void Below_zero_the_curve_goes_through_the_tables_own_join()
    {
        // By hand: the relation mirrored with 0.7 of the lift through (-9 deg, -0.7, 0.03).
        var mirrored = DeepStall.Through(Rad(9), 0.7 / 0.7, 0.03, LargestDrag);
        var polar = PolarExtension.Extend(Table(1e6, Cambered), AspectRatio, ExtensionJoin.Stall).Polar;
        foreach (var angle in new[] { 9.5, 12.5, 25, 50, 87.5 })
        {
            var (lift, drag) = mirrored.At(Rad(angle));
            Assert.Equal(-0.7 * lift, At(polar, -angle).Lift, 1e-12);
            Assert.Equal(drag, At(polar, -angle).Drag, 1e-12);
        }
    }

    [Fact]
    public void A_table_that_begins_before_it_stalls_passes_to_the_mirrored_stall_point()
    {
        var extended = PolarExtension.Extend(Table(1e6, [.. Cambered.Skip(3)]), AspectRatio, ExtensionJoin.Stall);
        Assert.Equal(ExtensionKind.Mirrored, extended.Below.Kind);
        Assert.False(extended.Below.ShowsStall);
        Assert.Equal(Rad(-4), extended.Below.JoinAngle);
        Assert.Equal((-0.7 * 1.4, 0.03), At(extended.Polar, -12));
        // Its lift line would lead to -0.98 only within half a degree of -12: a straight line.
        Assert.Equal(-0.1 - (0.88 * 3.5 / 8), At(extended.Polar, -7.5).Lift, 1e-12);
        Assert.Equal(-0.7 * At(extended.Polar, 30).Lift, At(extended.Polar, -30).Lift, 1e-12);
        // By hand: the slope of the line, (-0.98 + 0.1)/(-8 deg), less the secant of the first two rows, 0.45/(4 deg).
        Assert.Equal(((0.88 / 8) - (0.45 / 4)) * 180 / Math.PI, extended.Below.LiftSlopeBreak, 1e-6);
    }

    [Fact]
    public void A_table_that_begins_above_zero_lift_goes_down_along_its_lift_line()
    {
        // Lift 0.1 a degree through -2 degrees to 8; stall at 14 degrees with 1.1, so -0.77 at -14.
        var polar = Table(1e6, (-1, 0.1, 0.01), (2, 0.4, 0.01), (5, 0.7, 0.01), (8, 1.0, 0.012), (14, 1.1, 0.04), (18, 0.8, 0.2));
        var extended = PolarExtension.Extend(polar, AspectRatio, ExtensionJoin.End);
        Assert.Equal(ExtensionKind.Mirrored, extended.Below.Kind);
        Assert.Equal(-0.05, At(extended.Polar, -2.5).Lift, 1e-12);
        Assert.Equal(-0.55, At(extended.Polar, -7.5).Lift, 1e-12);
        // The line meets -0.77 at -9.7.
        Assert.Equal(-0.77, At(extended.Polar, -9.7).Lift, 1e-12);
        Assert.Equal(-0.77, At(extended.Polar, -12.5).Lift, 1e-12);
        Assert.Equal((-0.77, 0.04), (Math.Round(At(extended.Polar, -14).Lift, 12), At(extended.Polar, -14).Drag));
        Assert.Equal(0.01 + (0.03 * 11.5 / 13), At(extended.Polar, -12.5).Drag, 1e-12);
        Assert.Equal(0, extended.Below.LiftSlopeBreak, 1e-6);
        var (before, after) = (PotentialLift.Of(polar)!.Value, PotentialLift.Of(extended.Polar)!.Value);
        Assert.Equal(before.ZeroLiftAngle, after.ZeroLiftAngle, 1e-12);
        Assert.Equal(before.LiftSlope, after.LiftSlope, 1e-12);
    }

    [Fact]
    public void A_table_that_ends_before_stall_is_joined_at_its_end_and_says_so()
    {
        foreach (var join in new[] { ExtensionJoin.Stall, ExtensionJoin.End })
        {
            var extended = PolarExtension.Extend(Table(1e6, [.. Cambered.Take(7)]), AspectRatio, join);
            Assert.Equal((ExtensionKind.FromEnd, Rad(8), false), (extended.Above.Kind, extended.Above.JoinAngle, extended.Above.ShowsStall));
            Assert.Equal((1.2, 0.014), At(extended.Polar, 8));
        }
    }

    [Fact]
    public void The_break_of_slope_is_that_of_the_relation_less_the_last_secant()
    {
        var extended = PolarExtension.Extend(Table(1e6, Cambered), AspectRatio, ExtensionJoin.End);
        // By hand: d/da of A1 sin 2a + A2 cos2 a/sin a and of B1 sin2 a + B2 cos a at 18 degrees.
        var (sin, cos) = Math.SinCos(Rad(18));
        var a2 = (1.0 - (LargestDrag * sin * cos)) * sin / (cos * cos);
        var b2 = (0.2 - (LargestDrag * sin * sin)) / cos;
        var liftSlope = (LargestDrag * Math.Cos(Rad(36))) - (a2 * cos * (2 + (cos * cos / (sin * sin))));
        var dragSlope = (LargestDrag * Math.Sin(Rad(36))) - (b2 * sin);
        Assert.Equal(liftSlope + (0.2 / Rad(3)), extended.Above.LiftSlopeBreak, 1e-4);
        Assert.Equal(dragSlope - (0.11 / Rad(3)), extended.Above.DragSlopeBreak, 1e-4);
    }

    [Fact]
    public void A_complete_table_is_left_as_it_is()
    {
        var polar = Table(1e6, (-180, 0.1, 0.02), (0, 0.2, 0.01), (12, 1.2, 0.02), (18, 0.9, 0.2), (180, 0.1, 0.02));
        var extended = PolarExtension.Extend(polar, AspectRatio, ExtensionJoin.Stall);
        Assert.Same(polar, extended.Polar);
        Assert.Equal((ExtensionKind.Complete, ExtensionKind.Complete), (extended.Above.Kind, extended.Below.Kind));
    }

    [Fact]
    public void A_table_complete_on_one_side_is_extended_on_the_other_and_meets_itself()
    {
        var above = PolarExtension.Extend(
            Table(1e6, (-4, -0.2, 0.01), (0, 0.2, 0.01), (12, 1.2, 0.02), (18, 0.9, 0.2), (90, 0.05, 1.8), (180, 0.1, 0.04)), AspectRatio, ExtensionJoin.Stall);
        Assert.Equal((ExtensionKind.Complete, ExtensionKind.Mirrored), (above.Above.Kind, above.Below.Kind));
        Assert.Equal((0.05, 1.8), At(above.Polar, 90));
        Assert.Equal((0.1, 0.04), (above.Polar.Lift[0], above.Polar.Drag[0]));

        var below = PolarExtension.Extend(
            Table(1e6, (-180, -0.1, 0.03), (-90, 0, 1.7), (-10, -0.8, 0.02), (0, 0.2, 0.01), (12, 1.2, 0.02), (18, 0.9, 0.2)), AspectRatio, ExtensionJoin.End);
        Assert.Equal((ExtensionKind.FromEnd, ExtensionKind.Complete), (below.Above.Kind, below.Below.Kind));
        Assert.Equal((0, 1.7), At(below.Polar, -90));
        Assert.Equal((-0.1, 0.03), (below.Polar.Lift[^1], below.Polar.Drag[^1]));
    }

    [Fact]
    public void A_table_that_ends_beyond_a_right_angle_fades_into_the_mirrored_curve()
    {
        var extended = PolarExtension.Extend(
            Table(1e6, (-4, -0.2, 0.01), (0, 0.2, 0.01), (12, 1.2, 0.02), (18, 0.9, 0.2), (90, 0.1, 2), (100, -0.3, 1.9)), AspectRatio, ExtensionJoin.End);
        Assert.Equal((ExtensionKind.FromEnd, Rad(100)), (extended.Above.Kind, extended.Above.JoinAngle));
        Assert.Equal((-0.3, 1.9), At(extended.Polar, 100));
        // By hand: the mirrored relation through stall, and half of the difference at 100 degrees.
        var curve = DeepStall.Through(Rad(12), 1.2, 0.02, LargestDrag);
        var (there, here) = (curve.At(Rad(80)), curve.At(Rad(40)));
        Assert.Equal((-0.7 * here.Lift) + (0.5 * (-0.3 + (0.7 * there.Lift))), At(extended.Polar, 140).Lift, 1e-12);
        Assert.Equal(here.Drag + (0.5 * (1.9 - there.Drag)), At(extended.Polar, 140).Drag, 1e-12);
        Assert.Equal(0, extended.Polar.Lift[^1]);
    }

    [Fact]
    public void A_round_section_goes_on_as_it_ends()
    {
        var extended = PolarExtension.Extend(Table(double.NaN, (-20, 0, 1.1), (0, 0, 1.1), (20, 0.004, 1.1)), AspectRatio, ExtensionJoin.Stall);
        Assert.Equal((ExtensionKind.CarriedOn, ExtensionKind.CarriedOn), (extended.Above.Kind, extended.Below.Kind));
        Assert.Equal(5, extended.Polar.Angles.Length);
        Assert.All(extended.Polar.Drag, drag => Assert.Equal(1.1, drag));
        Assert.Equal((0.0, 0.0), (extended.Polar.Lift[0], extended.Polar.Lift[^1]));
    }

    [Fact]
    public void A_table_without_a_row_between_zero_and_a_right_angle_cannot_be_extended()
    {
        var polar = Table(1e6, (-20, -0.9, 0.2), (-10, -0.8, 0.02), (-2, 0.1, 0.01));
        Assert.False(PolarExtension.CanExtend(polar));
        Assert.Throws<ArgumentException>(() => PolarExtension.Extend(polar, AspectRatio, ExtensionJoin.End));
        Assert.True(PolarExtension.CanExtend(Table(1e6, Cambered)));
        Assert.Throws<ArgumentOutOfRangeException>(() => PolarExtension.Extend(Table(1e6, Cambered), 0, ExtensionJoin.End));
    }

    [Fact]
    public void Added_rows_never_have_less_drag_than_a_plate_along_the_wind()
    {
        // A panel method's drag, far too low: 2 x 1.328/sqrt(1e5) is 0.0084.
        var polar = Table(1e5, (-6, -0.6, 0.002), (0, 0, 0.001), (6, 0.6, 0.002));
        var extended = PolarExtension.Extend(polar, AspectRatio, ExtensionJoin.End);
        // On either side 6.5 degrees, just beyond the join, and 174, 175, 177.5 and 180, where drag passes to that at zero lift.
        Assert.Equal(10, extended.RaisedToFloor);
        Assert.Equal(2 * 1.328 / Math.Sqrt(1e5), extended.Polar.Drag[^1], 1e-15);
        Assert.Equal((0, 0.001), At(extended.Polar, 0));
        Assert.Equal(0, PolarExtension.Extend(Table(double.NaN, (-6, -0.6, 0.002), (0, 0, 0.001), (6, 0.6, 0.002)), AspectRatio, ExtensionJoin.End).RaisedToFloor);
    }

    [Fact]
    public void A_symmetric_section_has_no_lift_at_zero_angle_extended_or_augmented()
    {
        foreach (var join in new[] { ExtensionJoin.Stall, ExtensionJoin.End })
        {
            var polar = Table(1e6, (-16, -0.8, 0.1), (-12, -1.1, 0.03), (-6, -0.65, 0.01), (0, 0, 0.008), (6, 0.65, 0.01), (12, 1.1, 0.03), (16, 0.8, 0.1));
            var extended = PolarExtension.Extend(polar, AspectRatio, join).Polar;
            Assert.Equal((0, 0.008), At(extended, 0));
            var augmented = RotationalAugmentation.Augment(extended, AugmentationFactors.Full);
            Assert.Equal((0, 0.008), At(augmented, 0));
        }
    }
}
