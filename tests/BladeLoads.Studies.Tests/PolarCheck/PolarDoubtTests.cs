namespace BladeLoads.Studies.Tests.PolarCheck;

/// <summary>Each doubt, told whole, on a sound table with one thing changed.</summary>
public sealed class PolarDoubtTests
{
    private static FellTable Fell => new();

    [Fact]
    public void A_sound_table_raises_no_doubt() => Is([], Fell.Doubts());

    [Fact]
    public void A_sound_table_that_names_no_Reynolds_number_raises_none_either() => Is([], Fell.At(null).Doubts());

    [Fact]
    public void Angles_that_end_are_told_as_reading_tells_them() => Is(
        ["3:1: angles reach from -20 to 30 deg; beyond them the end value serves, and each use is marked outside-angles"],
        Fell.Without(a => a is < -20 or > 30).Doubts());

    [Fact]
    public void A_table_that_ends_before_stall_is_told_at_its_last_row() => Is(
        [
            "3:1: angles reach from -20 to 8 deg; beyond them the end value serves, and each use is marked outside-angles",
            "16:7: the rows end at 8 deg, before stall; measure on, or extend the table, which then rests on a guess",
        ],
        Fell.Without(a => a is < -20 or > 8).Doubts());

    [Fact]
    public void Rows_far_apart_are_told_by_where_they_are_missing() => Is(
        [
            "23:5: no row between -4 and 2 deg, and the curve there is a guess; from -10 to 20 deg give one every 2.5 deg or closer",
            "33:5: no row between 20 and 30 deg, and the curve there is a guess; from -20 to 30 deg give one every 5 deg or closer",
            "37:5: no row between 75 and 105 deg, and the curve there is a guess; far from the working range give one every 15 deg or closer",
        ],
        Fell.Without(a => a is -2 or 0 or 25 or 90).Doubts());

    [Fact]
    public void Rows_are_far_apart_by_the_narrowest_range_that_they_reach_into() => Is(
        ["35:5: no row between 19 and 23 deg, and the curve there is a guess; from -10 to 20 deg give one every 2.5 deg or closer"],
        Fell.Without(a => a is 20).With(19, "0.69", "0.1455").With(23, "0.689", "0.2115").Doubts());

    [Fact]
    public void Two_rows_at_one_angle_are_told() => Is(
        ["27:5: alpha_deg 4 and 4.04 are hardly two angles (row 26 to 27); keep one of them, or their mean"],
        Fell.With(4.04, "0.736", "0.0101").Doubts());

    [Fact]
    public void Two_rows_near_one_angle_are_one_angle_where_they_contradict_each_other() => Is(
        ["27:5: alpha_deg 4 and 4.1 are hardly two angles (row 26 to 27); keep one of them, or their mean"],
        Fell.With(4.1, "0.77", "0.0101").Doubts());

    [Fact]
    public void A_copied_row_is_told() => Is(
        ["33:8: cl and cd are 0.795 and 0.0972 in 2 rows running, from 16 to 18 deg: copied? Measure there, or leave all but the first out"],
        Fell.With(18, "0.795", "0.0972").With(20, "0.795", "0.13").With(25, "0.78", "0.23").Doubts());

    [Fact]
    public void Drag_at_the_limit_of_an_instrument_is_told() => Is(
        ["35:14: cd is 0.1294 in 3 rows running, from 18 to 25 deg: the limit of an instrument? Measure there, or leave all but the first out"],
        Fell.With(20, "0.676", "0.1294").With(25, "0.707", "0.1294").Doubts());

    [Fact]
    public void Lift_at_the_limit_of_an_instrument_is_told() => Is(
        ["36:8: cl is 0.7 in 4 rows running, from 18 to 30 deg: the limit of an instrument? Measure there, or leave all but the first out"],
        Fell.With(18, "0.7", "0.1294").With(20, "0.7", "0.1622").With(25, "0.7", "0.2469").With(30, "0.7", "0.3397").Doubts());

    [Fact]
    public void A_row_off_the_line_of_its_neighbours_is_told_with_how_far()
    {
        Is(
            ["26:7: cl is 0.632 at 4 deg, 0.0895 below the line of its neighbours; compare it with the source, or leave the row out"],
            Fell.With(4, "0.632", "0.0101").Doubts());
        Is(
            ["26:13: cd is 0.0191 at 4 deg, 0.0084 above the line of its neighbours; compare it with the source, or leave the row out"],
            Fell.With(4, "0.732", "0.0191").Doubts());
    }

    [Fact]
    public void The_row_that_sticks_out_is_told_and_not_its_neighbour_which_it_makes_look_so() => Is(
        ["26:7: cl is 0.84 at 4 deg, 0.082 above the line of its neighbours; compare it with the source, or leave the row out"],
        Fell.With(4, "0.84", "0.0101").With(6, "0.9", "0.0121").Doubts());

    [Fact]
    public void A_second_row_that_sticks_out_is_told_in_the_place_of_the_third() => Is(
        [
            "3:1: angles reach from -4 to 30 deg; beyond them the end value serves, and each use is marked outside-angles",
            "4:8: cl is 0.207 at -2 deg, 0.112 above the line of its neighbours; compare it with the source, or leave the row out",
        ],
        Fell.Without(a => a is < -4 or > 30).With(-2, "0.207", "0.0095").With(0, "0.3", "0.0091").Doubts());

    [Fact]
    public void Drag_in_percent_is_doubted_where_lift_is_that_of_a_slender_section()
    {
        Is(
            [
                "3:1: angles reach from -8 to 18 deg; beyond them the end value serves, and each use is marked outside-angles",
                "7:13: cd is 0.91 at least, and lift rises by 0.975 of 2 pi to 1.094, as that of slender sections does; they have a tenth of such "
                + "drag and less: is it in percent?",
            ],
            Fell.Without(a => a is < -8 or > 18).Changed(r => (r.Angle, r.Lift, 100 * r.Drag)).Doubts());
        // Half the slope, or half the lift: as thick sections near the root have them.
        Assert.DoesNotContain(
            Fell.Without(a => a is < -8 or > 18).Changed(r => (r.Angle, 0.5 * r.Lift, 100 * r.Drag)).Doubts(),
            doubt => doubt.Contains("percent", StringComparison.Ordinal));
    }

    [Fact]
    public void A_table_that_scatters_as_a_whole_is_told_once() => Is(
        ["20:8: cl scatters: 10 of 24 rows from -30 to 30 deg lie off the line of their neighbours; smooth the table"],
        Fell.Changed(r => (r.Angle, r.Lift + (r.Angle % 4 == 0 ? 0.04 : -0.04) * (Math.Abs(r.Angle) < 13 ? 1 : 0), r.Drag)).Doubts());

    [Fact]
    public void A_slope_far_from_two_pi_is_told() => Is(
        [
            "23:8: lift rises by 4.29 a radian about -2.99 deg, 0.683 of 2 pi; slender sections have 0.8 to 1.35 of it: is lift there scattered, "
            + "augmented, or in another unit?",
        ],
        Fell.Changed(r => (r.Angle, Math.Round(0.7 * r.Lift, 4), r.Drag)).Doubts());

    [Fact]
    public void A_turned_sign_of_lift_is_told() => Is(
        [
            "6:10: cl is -0.9 at -135 deg, where lift is positive; is a sign turned in the extension?",
            "12:9: cl is 0.9 at -45 deg, where lift is negative; is a sign turned in the extension?",
            "24:7: cl falls from 0.109 at -4 deg to -0.732 at 4 deg; is the sign of cl or of alpha_deg turned?",
            "37:8: cl is -0.9 at 45 deg, where lift is positive; is a sign turned in the extension?",
            "43:9: cl is 0.9 at 135 deg, where lift is negative; is a sign turned in the extension?",
        ],
        Fell.Changed(r => (r.Angle, -r.Lift, r.Drag)).Doubts());

    [Fact]
    public void A_section_upside_down_is_told_by_its_zero_lift_angle() => Is(
        [
            "26:7: lift is 0 at 2.99 deg, so the section lifts downwards at 0 deg; blade sections lift upwards there: is a sign turned?",
        ],
        Fell.Changed(r => (-r.Angle, -r.Lift, r.Drag)).Doubts());

    [Fact]
    public void Shifted_angles_are_told_by_the_zero_lift_angle() => Is(
        [
            "3:1: angles reach from -36 to 24 deg; beyond them the end value serves, and each use is marked outside-angles",
            "13:8: lift is 0 at -8.99 deg; of blade sections it is between -8 and 0 deg: are the angles shifted?",
            "19:7: the largest lift is at 4 deg; slender sections stall beyond 5 deg: are the angles in another unit?",
            "25:5: no row between 14 and 19 deg, and the curve there is a guess; from -10 to 20 deg give one every 2.5 deg or closer",
            "26:5: no row between 19 and 24 deg, and the curve there is a guess; from -10 to 20 deg give one every 2.5 deg or closer",
        ],
        Fell.Without(a => a is < -30 or > 30).Changed(r => (r.Angle - 6, r.Lift, r.Drag)).Doubts());

    [Fact]
    public void A_largest_lift_that_no_section_has_is_told() => Is(
        ["29:8: the largest lift is 0.6564, at 10 deg; slender sections reach 0.7 to 2.2: is it in another unit, or of a section with a flap?"],
        Fell.Changed(r => (r.Angle, 0.6 * r.Lift, r.Drag)).Doubts().Where(d => !d.Contains("of 2 pi", StringComparison.Ordinal)));

    [Fact]
    public void Drag_below_that_of_a_laminar_plate_is_told_by_row()
    {
        Is(
            ["24:13: cd is 0.0024, and a laminar plate has 0.00266 at Reynolds number 1e6; drag of pressure alone, or a slip?"],
            Fell.With(0, "0.322", "0.0024").With(-2, "0.107", "0.003").With(2, "0.532", "0.003")
                .With(-4, "-0.109", "0.006").With(4, "0.732", "0.006").Doubts());
        Is(
            [
                "3:8: cd is 0, and a laminar plate has 0.000266 even at Reynolds number 1e8; drag of pressure alone, or a slip?",
                "46:7: cd is 0, and a laminar plate has 0.000266 even at Reynolds number 1e8; drag of pressure alone, or a slip?",
            ],
            Fell.At(null).With(-180, "0", "0").With(180, "0", "0").Doubts());
    }

    [Fact]
    public void Drag_between_that_of_a_laminar_and_of_a_turbulent_plate_is_no_doubt() => Is(
        [], Fell.Changed(r => (r.Angle, r.Lift, Math.Abs(r.Angle) < 40 ? 0.6 * r.Drag : r.Drag)).Doubts());

    [Fact]
    public void A_jump_is_told_with_both_its_rows()
    {
        Is(
            ["33:14: cd jumps from 0.0972 to 0.3794 between 16 and 18 deg (row 32 to 33); give rows between them, or mend the slip"],
            Fell.Changed(r => (r.Angle, r.Lift, r.Angle is > 17 and < 40 ? r.Drag + 0.25 : r.Drag)).Doubts());
        Is(
            ["24:7: cl jumps from -0.107 to 0.422 between -2 and 0 deg (row 23 to 24); give rows between them, or mend the slip"],
            Fell.Changed(r => (r.Angle, r.Lift + (r.Angle is > -13 and < -1 ? -0.214 : r.Angle is > -1 and < 11 ? 0.1 : 0), r.Drag)).Doubts()
                .Where(d => d.Contains("jumps", StringComparison.Ordinal)));
    }

    [Fact]
    public void A_sharp_stall_is_told_once_from_its_first_row_to_its_last_with_its_steepest_fall() => Is(
        [
            "32:8: cl falls from 1.045 to 0.53 between 12 and 16 deg, by up to 0.135 a degree (row 30 to 32): a sharp stall, in which several "
            + "balances are likely; expect loads to jump there",
        ],
        Fell.With(14, "0.8", "0.0671").With(16, "0.53", "0.0972").With(18, "0.54", "0.1294").With(20, "0.6", "0.1622").Doubts());

    [Fact]
    public void A_stall_as_steep_as_attached_lift_rises_is_not_sharp()
    {
        // 2 pi a radian is 0.10966 a degree.
        Assert.Empty(SharpStalls("0.826"));    // 0.1095 a degree
        Assert.Single(SharpStalls("0.825"));   // 0.11
        static IEnumerable<string> SharpStalls(string lift)
            => Fell.With(14, lift, "0.0671").With(16, "0.75", "0.0972").Doubts().Where(d => d.Contains("sharp stall", StringComparison.Ordinal));
    }

    [Fact]
    public void Lift_and_drag_unlike_at_the_two_ends_are_told() => Is(
        [
            "46:9: cl is 0.1 at 180 deg and 0 at -180 deg; these are one angle and should have one lift",
            "46:13: cd is 0.06 at 180 deg and 0.02 at -180 deg; these are one angle and should have one drag",
        ],
        Fell.With(180, "0.1", "0.06").Doubts());

    [Fact]
    public void Drag_across_the_wind_that_no_plate_has_is_told() => Is(
        [
            "9:11: cd is 0.78 at -90 deg; a plate across the wind has 1.1 to 2.0, and about 1.3 as long as a blade",
            "40:10: cd is 2.24 at 90 deg; a plate across the wind has 1.1 to 2.0, and about 1.3 as long as a blade",
        ],
        Fell.Changed(
            r => (r.Angle, r.Lift, r.Angle is < -40 and > -140 ? 0.6 * r.Drag : r.Angle is > 70 and < 110 ? r.Drag + 0.94 : r.Drag)).Doubts());

    [Fact]
    public void Exchanged_columns_are_told_alone() => Is(
        [
            "3:1: angles reach from 0 to 20 deg; beyond them the end value serves, and each use is marked outside-angles",
            "3:7: cd rises from 0.322 at 0 deg to 1.094 at 10 deg, and cl is 0.0256 at most; are cl and cd exchanged?",
        ],
        Fell.Without(a => a is < 0 or > 20).Changed(r => (r.Angle, r.Drag, r.Lift)).Doubts());

    [Fact]
    public void A_head_that_says_augmented_is_told() => Is(
        [
            "1: the rows are augmented for rotation, by the head: 'snel-1993, c/r 0.21'; they hold for one rotor and one radius, and are not to be "
            + "augmented again",
        ],
        Fell.WithHead("# Augmented: snel-1993, c/r 0.21").Doubts());

    [Fact]
    public void A_bluff_section_is_not_measured_by_what_slender_ones_do() => Is(
        [], FellTable.DoubtsOf("alpha_deg,cl,cd\n-180,0,0.6\n0,0,0.6\n180,0,0.6\n"));

    [Fact]
    public void Reynolds_numbers_that_differ_by_little_raise_no_doubt() => Is([], Fell.Doubts(
        Fell.At("3e6").Changed(r => (r.Angle, r.Lift * 1.05, Math.Abs(r.Angle) < 40 ? 0.7 * r.Drag : r.Drag))));

    [Fact]
    public void Rows_copied_from_another_Reynolds_number_are_told() => Is(
        ["47:1: every row is as at Reynolds number 1e6; measure there, or leave one of the two out"], Fell.Doubts(Fell.At("3e6")));

    [Fact]
    public void Attached_lift_that_differs_between_Reynolds_numbers_is_told() => Is(
        [
            "70:7: cl at 5 deg is 0.621, and 0.822 at Reynolds number 1e6; attached lift hardly depends on it: are the two of one section "
            + "and one tunnel?",
        ],
        Fell.Doubts(
            Fell.At("3e6").Changed(r => (r.Angle, r.Lift - (r.Angle is > -13 and < 45 ? 0.2 * Math.Min(1, (r.Angle + 13) / 15) : 0), r.Drag))));

    [Fact]
    public void A_largest_lift_that_jumps_between_Reynolds_numbers_is_told() => Is(
        [
            "74:8: the largest lift is 1.745, and 1.094 at Reynolds number 1e6; that is a jump: give a Reynolds number between them, or "
            + "mend the slip",
        ],
        Fell.Doubts(Fell.At("2e6").Changed(r => (
            r.Angle,
            r.Lift + r.Angle switch
            {
                8 => 0.25,
                10 => 0.5,
                12 => 0.7,
                14 => 0.75,
                16 => 0.7,
                18 => 0.6,
                20 => 0.5,
                25 => 0.3,
                30 => 0.1,
                _ => 0,
            },
            r.Drag))));

    [Theory]
    [InlineData(1.5, "0.0136")]
    [InlineData(0.35, "0.0032")]
    public void Least_drag_that_jumps_between_Reynolds_numbers_is_told(double factor, string drag) => Is(
        [
            $"68:13: the least drag is {drag}, and 0.0091 at Reynolds number 1e6; drag falls with it, and no faster than its square root: are the two "
            + "of one section, equally smooth?",
        ],
        Fell.Doubts(Fell.At("2e6").Changed(r => (r.Angle, r.Lift, Math.Abs(r.Angle) < 40 ? Math.Round(factor * r.Drag, 4) : r.Drag))));

    private static void Is(IEnumerable<string> expected, IEnumerable<string> doubts)
        => Assert.Equal(string.Join('\n', expected), string.Join('\n', doubts));
}
